ALTER TABLE "sheets" ADD COLUMN "key" text;--> statement-breakpoint
ALTER TABLE "sheets" ADD COLUMN "sheet" jsonb;--> statement-breakpoint
ALTER TABLE "sheets" ADD COLUMN "written_by" uuid;--> statement-breakpoint
ALTER TABLE "sheets" ADD COLUMN "written_at" timestamp with time zone DEFAULT now() NOT NULL;--> statement-breakpoint
ALTER TABLE "sheets" ADD CONSTRAINT "sheets_written_by_users_id_fk" FOREIGN KEY ("written_by") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;