CREATE TABLE "files" (
	"id" uuid PRIMARY KEY NOT NULL,
	"yard_id" uuid NOT NULL,
	"boat_id" uuid,
	"sheet_id" uuid,
	"kind" text NOT NULL,
	"media_type" text NOT NULL,
	"bytes" integer NOT NULL,
	"sha256" text NOT NULL,
	"sent_sha256" text NOT NULL,
	"width" integer,
	"height" integer,
	"name" text NOT NULL,
	"caption" text DEFAULT '' NOT NULL,
	"uploaded_by" uuid,
	"uploaded_at" timestamp with time zone DEFAULT now() NOT NULL,
	"revision" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "files_of_one" CHECK (num_nonnulls("files"."boat_id", "files"."sheet_id") <= 1),
	CONSTRAINT "files_plan" CHECK (("files"."kind" = 'plan') = (num_nonnulls("files"."boat_id", "files"."sheet_id") = 0))
);
--> statement-breakpoint
ALTER TABLE "files" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "kept_blobs" (
	"yard_id" uuid NOT NULL,
	"sha256" text NOT NULL,
	"kept_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "kept_blobs_yard_id_sha256_pk" PRIMARY KEY("yard_id","sha256")
);
--> statement-breakpoint
ALTER TABLE "kept_blobs" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "files" ADD CONSTRAINT "files_yard_id_yards_id_fk" FOREIGN KEY ("yard_id") REFERENCES "public"."yards"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "files" ADD CONSTRAINT "files_boat_id_boats_id_fk" FOREIGN KEY ("boat_id") REFERENCES "public"."boats"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "files" ADD CONSTRAINT "files_sheet_id_sheets_id_fk" FOREIGN KEY ("sheet_id") REFERENCES "public"."sheets"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "files" ADD CONSTRAINT "files_uploaded_by_users_id_fk" FOREIGN KEY ("uploaded_by") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "files_yard_id_sha256_index" ON "files" USING btree ("yard_id","sha256");--> statement-breakpoint
CREATE INDEX "files_boat_id_uploaded_at_index" ON "files" USING btree ("boat_id","uploaded_at");--> statement-breakpoint
CREATE INDEX "files_sheet_id_index" ON "files" USING btree ("sheet_id");--> statement-breakpoint
CREATE POLICY "web_wall" ON "files" AS PERMISSIVE FOR ALL TO "yardglass_web" USING ("files"."yard_id" in (select app_yards())) WITH CHECK ("files"."yard_id" in (select app_yards()));--> statement-breakpoint
CREATE POLICY "web_wall" ON "kept_blobs" AS PERMISSIVE FOR ALL TO "yardglass_web" USING ("kept_blobs"."yard_id" in (select app_yards())) WITH CHECK ("kept_blobs"."yard_id" in (select app_yards()));