CREATE TABLE "stays" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"boat_id" uuid NOT NULL,
	"yard_id" uuid DEFAULT null NOT NULL,
	"stand_id" uuid,
	"stand_name" text NOT NULL,
	"heading" double precision NOT NULL,
	"since" timestamp with time zone DEFAULT now() NOT NULL,
	"until" timestamp with time zone,
	"person_id" uuid,
	"person_name" text
);
--> statement-breakpoint
ALTER TABLE "stays" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "forecast_keys" (
	"yard_id" uuid NOT NULL,
	"provider" text NOT NULL,
	"sealed" text NOT NULL,
	"set_at" timestamp with time zone DEFAULT now() NOT NULL,
	"set_by" text NOT NULL,
	CONSTRAINT "forecast_keys_yard_id_provider_pk" PRIMARY KEY("yard_id","provider")
);
--> statement-breakpoint
ALTER TABLE "forecast_keys" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "stands" ADD COLUMN "x" double precision;--> statement-breakpoint
ALTER TABLE "stands" ADD COLUMN "y" double precision;--> statement-breakpoint
ALTER TABLE "yards" ADD COLUMN "quiet_hours" jsonb DEFAULT '[]'::jsonb NOT NULL;--> statement-breakpoint
ALTER TABLE "yards" ADD COLUMN "holidays" jsonb DEFAULT '[]'::jsonb NOT NULL;--> statement-breakpoint
ALTER TABLE "yards" ADD COLUMN "hoists" jsonb DEFAULT '[]'::jsonb NOT NULL;--> statement-breakpoint
ALTER TABLE "yards" ADD COLUMN "shelters" jsonb;--> statement-breakpoint
ALTER TABLE "yards" ADD COLUMN "slip_free_days" integer DEFAULT 0 NOT NULL;--> statement-breakpoint
ALTER TABLE "yards" ADD COLUMN "slip_per" text DEFAULT 'day' NOT NULL;--> statement-breakpoint
ALTER TABLE "yards" ADD COLUMN "days_ahead" integer DEFAULT 4 NOT NULL;--> statement-breakpoint
ALTER TABLE "yards" ADD COLUMN "ground_width" double precision DEFAULT 120 NOT NULL;--> statement-breakpoint
ALTER TABLE "yards" ADD COLUMN "ground_depth" double precision DEFAULT 80 NOT NULL;--> statement-breakpoint
ALTER TABLE "yards" ADD COLUMN "ground_bearing" double precision DEFAULT 0 NOT NULL;--> statement-breakpoint
ALTER TABLE "stays" ADD CONSTRAINT "stays_boat_id_boats_id_fk" FOREIGN KEY ("boat_id") REFERENCES "public"."boats"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "stays" ADD CONSTRAINT "stays_stand_id_stands_id_fk" FOREIGN KEY ("stand_id") REFERENCES "public"."stands"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "stays" ADD CONSTRAINT "stays_person_id_users_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "forecast_keys" ADD CONSTRAINT "forecast_keys_yard_id_yards_id_fk" FOREIGN KEY ("yard_id") REFERENCES "public"."yards"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "stays_boat_id_since_index" ON "stays" USING btree ("boat_id","since" DESC NULLS LAST);--> statement-breakpoint
CREATE POLICY "web_wall" ON "stays" AS PERMISSIVE FOR SELECT TO "yardglass_web" USING ("stays"."yard_id" in (select app_yards()));--> statement-breakpoint
CREATE POLICY "web_wall" ON "forecast_keys" AS PERMISSIVE FOR ALL TO "yardglass_web" USING ("forecast_keys"."yard_id" in (select app_yards())) WITH CHECK ("forecast_keys"."yard_id" in (select app_yards()));