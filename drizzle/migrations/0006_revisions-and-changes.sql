CREATE TABLE "changes" (
	"id" bigserial PRIMARY KEY NOT NULL,
	"yard_id" uuid NOT NULL,
	"at" timestamp with time zone DEFAULT now() NOT NULL,
	"person_id" uuid,
	"person_name" text,
	"subject" text NOT NULL,
	"row_id" text NOT NULL,
	"boat_id" uuid,
	"action" text NOT NULL,
	"before" jsonb,
	"after" jsonb
);
--> statement-breakpoint
ALTER TABLE "changes" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "stands" ADD COLUMN "revision" integer DEFAULT 1 NOT NULL;--> statement-breakpoint
ALTER TABLE "yards" ADD COLUMN "revision" integer DEFAULT 1 NOT NULL;--> statement-breakpoint
ALTER TABLE "boats" ADD COLUMN "revision" integer DEFAULT 1 NOT NULL;--> statement-breakpoint
ALTER TABLE "faces" ADD COLUMN "revision" integer DEFAULT 1 NOT NULL;--> statement-breakpoint
ALTER TABLE "jobs" ADD COLUMN "revision" integer DEFAULT 1 NOT NULL;--> statement-breakpoint
ALTER TABLE "sheets" ADD COLUMN "revision" integer DEFAULT 1 NOT NULL;--> statement-breakpoint
ALTER TABLE "steps" ADD COLUMN "revision" integer DEFAULT 1 NOT NULL;--> statement-breakpoint
ALTER TABLE "changes" ADD CONSTRAINT "changes_yard_id_yards_id_fk" FOREIGN KEY ("yard_id") REFERENCES "public"."yards"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "changes_yard_id_id_index" ON "changes" USING btree ("yard_id","id");--> statement-breakpoint
CREATE INDEX "changes_yard_id_subject_row_id_id_index" ON "changes" USING btree ("yard_id","subject","row_id","id");--> statement-breakpoint
CREATE POLICY "web_wall" ON "changes" AS PERMISSIVE FOR SELECT TO "yardglass_web" USING ("changes"."yard_id" in (select app_yards()));