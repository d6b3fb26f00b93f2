ALTER TABLE "sheets" DROP CONSTRAINT "sheets_yardId_name_version_unique";--> statement-breakpoint
ALTER TABLE "sheets" ALTER COLUMN "key" SET NOT NULL;--> statement-breakpoint
ALTER TABLE "sheets" ALTER COLUMN "sheet" SET NOT NULL;--> statement-breakpoint
ALTER TABLE "sheets" drop column "name";--> statement-breakpoint
ALTER TABLE "sheets" ADD COLUMN "name" text GENERATED ALWAYS AS (sheet ->> 'name') STORED NOT NULL;--> statement-breakpoint
CREATE INDEX "sheets_yard_id_name_index" ON "sheets" USING btree ("yard_id","name");--> statement-breakpoint
ALTER TABLE "sheets" DROP COLUMN "sample";--> statement-breakpoint
ALTER TABLE "sheets" DROP COLUMN "limits";--> statement-breakpoint
ALTER TABLE "sheets" DROP COLUMN "times";--> statement-breakpoint
ALTER TABLE "sheets" DROP COLUMN "hazards";--> statement-breakpoint
ALTER TABLE "sheets" DROP COLUMN "revision";--> statement-breakpoint
ALTER TABLE "sheets" ADD CONSTRAINT "sheets_yardId_key_version_unique" UNIQUE("yard_id","key","version");