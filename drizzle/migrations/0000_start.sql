CREATE TABLE "sessions" (
	"id" text PRIMARY KEY NOT NULL,
	"user_id" uuid NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "sign_in_attempts" (
	"key" text PRIMARY KEY NOT NULL,
	"failures" integer DEFAULT 0 NOT NULL,
	"window_started_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "users" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"email" text NOT NULL,
	"name" text NOT NULL,
	"password_hash" text NOT NULL,
	"wind_unit" text DEFAULT 'kn' NOT NULL,
	"temperature_unit" text DEFAULT '°C' NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "memberships" (
	"yard_id" uuid NOT NULL,
	"user_id" uuid NOT NULL,
	"role" text NOT NULL,
	CONSTRAINT "memberships_yard_id_user_id_pk" PRIMARY KEY("yard_id","user_id")
);
--> statement-breakpoint
CREATE TABLE "stands" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"yard_id" uuid NOT NULL,
	"name" text NOT NULL,
	"position" integer NOT NULL,
	CONSTRAINT "stands_yardId_name_unique" UNIQUE("yard_id","name")
);
--> statement-breakpoint
CREATE TABLE "yards" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"slug" text NOT NULL,
	"name" text NOT NULL,
	"latitude" double precision NOT NULL,
	"longitude" double precision NOT NULL,
	"elevation" double precision DEFAULT 0 NOT NULL,
	"time_zone" text NOT NULL,
	"roughness" double precision DEFAULT 0.03 NOT NULL,
	"albedo" double precision DEFAULT 0.2 NOT NULL,
	"work_hours" jsonb NOT NULL,
	"loose_sand" jsonb,
	"lift_gust" double precision DEFAULT 12 NOT NULL,
	"high_wind_gust" double precision DEFAULT 14.4 NOT NULL,
	"day_rate" double precision,
	"currency" text DEFAULT 'EUR' NOT NULL,
	"forecast_provider" text DEFAULT 'open-meteo' NOT NULL,
	"demo" boolean DEFAULT false NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "yards_slug_unique" UNIQUE("slug")
);
--> statement-breakpoint
CREATE TABLE "boat_painters" (
	"boat_id" uuid NOT NULL,
	"user_id" uuid NOT NULL,
	CONSTRAINT "boat_painters_boat_id_user_id_pk" PRIMARY KEY("boat_id","user_id")
);
--> statement-breakpoint
CREATE TABLE "boats" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"yard_id" uuid NOT NULL,
	"stand_id" uuid,
	"owner_id" uuid,
	"name" text NOT NULL,
	"heading" double precision NOT NULL,
	"hauled_on" date,
	"launch_by" date
);
--> statement-breakpoint
CREATE TABLE "faces" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"boat_id" uuid NOT NULL,
	"name" text NOT NULL,
	"side" text NOT NULL,
	"tilt" double precision NOT NULL,
	"bearing" double precision,
	"material" text NOT NULL,
	"finish" text NOT NULL,
	"solar_absorptance" double precision NOT NULL,
	"emissivity" double precision NOT NULL,
	"inside" jsonb,
	"both_sides" boolean DEFAULT false NOT NULL,
	"area" double precision,
	CONSTRAINT "faces_boatId_name_side_unique" UNIQUE("boat_id","name","side")
);
--> statement-breakpoint
CREATE TABLE "jobs" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"boat_id" uuid NOT NULL,
	"name" text NOT NULL,
	"position" integer NOT NULL
);
--> statement-breakpoint
CREATE TABLE "sheets" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"yard_id" uuid NOT NULL,
	"name" text NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"sample" boolean DEFAULT false NOT NULL,
	"limits" jsonb NOT NULL,
	"times" jsonb NOT NULL,
	"hazards" text[] DEFAULT '{}' NOT NULL,
	CONSTRAINT "sheets_yardId_name_version_unique" UNIQUE("yard_id","name","version")
);
--> statement-breakpoint
CREATE TABLE "step_faces" (
	"step_id" uuid NOT NULL,
	"face_id" uuid NOT NULL,
	CONSTRAINT "step_faces_step_id_face_id_pk" PRIMARY KEY("step_id","face_id")
);
--> statement-breakpoint
CREATE TABLE "steps" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"job_id" uuid NOT NULL,
	"position" integer NOT NULL,
	"name" text NOT NULL,
	"kind" text NOT NULL,
	"method" text NOT NULL,
	"duration_minutes" double precision NOT NULL,
	"sheet_id" uuid,
	"limits" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"times" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"shelter" text DEFAULT 'open' NOT NULL,
	"state" text DEFAULT 'queued' NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "forecast_runs" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"yard_id" uuid NOT NULL,
	"provider" text NOT NULL,
	"issued_at" timestamp with time zone NOT NULL,
	"fetched_at" timestamp with time zone NOT NULL,
	"hourly" jsonb NOT NULL,
	"members" jsonb
);
--> statement-breakpoint
CREATE TABLE "outlooks" (
	"key" text PRIMARY KEY NOT NULL,
	"step_id" uuid NOT NULL,
	"hours" jsonb NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "provider_states" (
	"yard_id" uuid NOT NULL,
	"provider" text NOT NULL,
	"etag" text,
	"last_modified" text,
	"expires_at" timestamp with time zone,
	"last_success_at" timestamp with time zone,
	"failures" integer DEFAULT 0 NOT NULL,
	"open_until" timestamp with time zone,
	"trouble" text,
	"trouble_at" timestamp with time zone,
	CONSTRAINT "provider_states_yard_id_provider_pk" PRIMARY KEY("yard_id","provider")
);
--> statement-breakpoint
ALTER TABLE "sessions" ADD CONSTRAINT "sessions_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "memberships" ADD CONSTRAINT "memberships_yard_id_yards_id_fk" FOREIGN KEY ("yard_id") REFERENCES "public"."yards"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "memberships" ADD CONSTRAINT "memberships_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "stands" ADD CONSTRAINT "stands_yard_id_yards_id_fk" FOREIGN KEY ("yard_id") REFERENCES "public"."yards"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "boat_painters" ADD CONSTRAINT "boat_painters_boat_id_boats_id_fk" FOREIGN KEY ("boat_id") REFERENCES "public"."boats"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "boat_painters" ADD CONSTRAINT "boat_painters_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "boats" ADD CONSTRAINT "boats_yard_id_yards_id_fk" FOREIGN KEY ("yard_id") REFERENCES "public"."yards"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "boats" ADD CONSTRAINT "boats_stand_id_stands_id_fk" FOREIGN KEY ("stand_id") REFERENCES "public"."stands"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "boats" ADD CONSTRAINT "boats_owner_id_users_id_fk" FOREIGN KEY ("owner_id") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "faces" ADD CONSTRAINT "faces_boat_id_boats_id_fk" FOREIGN KEY ("boat_id") REFERENCES "public"."boats"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "jobs" ADD CONSTRAINT "jobs_boat_id_boats_id_fk" FOREIGN KEY ("boat_id") REFERENCES "public"."boats"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sheets" ADD CONSTRAINT "sheets_yard_id_yards_id_fk" FOREIGN KEY ("yard_id") REFERENCES "public"."yards"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "step_faces" ADD CONSTRAINT "step_faces_step_id_steps_id_fk" FOREIGN KEY ("step_id") REFERENCES "public"."steps"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "step_faces" ADD CONSTRAINT "step_faces_face_id_faces_id_fk" FOREIGN KEY ("face_id") REFERENCES "public"."faces"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "steps" ADD CONSTRAINT "steps_job_id_jobs_id_fk" FOREIGN KEY ("job_id") REFERENCES "public"."jobs"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "steps" ADD CONSTRAINT "steps_sheet_id_sheets_id_fk" FOREIGN KEY ("sheet_id") REFERENCES "public"."sheets"("id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "forecast_runs" ADD CONSTRAINT "forecast_runs_yard_id_yards_id_fk" FOREIGN KEY ("yard_id") REFERENCES "public"."yards"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "outlooks" ADD CONSTRAINT "outlooks_step_id_steps_id_fk" FOREIGN KEY ("step_id") REFERENCES "public"."steps"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "provider_states" ADD CONSTRAINT "provider_states_yard_id_yards_id_fk" FOREIGN KEY ("yard_id") REFERENCES "public"."yards"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE UNIQUE INDEX "users_email_lower" ON "users" USING btree (lower("email"));--> statement-breakpoint
CREATE INDEX "boat_painters_user_id_index" ON "boat_painters" USING btree ("user_id");--> statement-breakpoint
CREATE INDEX "boats_yard_id_index" ON "boats" USING btree ("yard_id");--> statement-breakpoint
CREATE INDEX "boats_owner_id_index" ON "boats" USING btree ("owner_id");--> statement-breakpoint
CREATE INDEX "jobs_boat_id_index" ON "jobs" USING btree ("boat_id");--> statement-breakpoint
CREATE INDEX "steps_job_id_position_index" ON "steps" USING btree ("job_id","position");--> statement-breakpoint
CREATE INDEX "forecast_runs_yard_id_fetched_at_index" ON "forecast_runs" USING btree ("yard_id","fetched_at" DESC NULLS LAST);--> statement-breakpoint
CREATE INDEX "outlooks_step_id_index" ON "outlooks" USING btree ("step_id");