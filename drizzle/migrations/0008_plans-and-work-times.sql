CREATE TABLE "job_waits" (
	"job_id" uuid NOT NULL,
	"yard_id" uuid DEFAULT null NOT NULL,
	"after_id" uuid NOT NULL,
	CONSTRAINT "job_waits_job_id_after_id_pk" PRIMARY KEY("job_id","after_id")
);
--> statement-breakpoint
ALTER TABLE "job_waits" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "step_painters" (
	"step_id" uuid NOT NULL,
	"yard_id" uuid DEFAULT null NOT NULL,
	"user_id" uuid NOT NULL,
	CONSTRAINT "step_painters_step_id_user_id_pk" PRIMARY KEY("step_id","user_id")
);
--> statement-breakpoint
ALTER TABLE "step_painters" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "plan_answers" (
	"plan_id" uuid NOT NULL,
	"step_id" uuid NOT NULL,
	"yard_id" uuid DEFAULT null NOT NULL,
	"user_id" uuid NOT NULL,
	"answer" text NOT NULL,
	"reason" text,
	"at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "plan_answers_plan_id_step_id_user_id_pk" PRIMARY KEY("plan_id","step_id","user_id")
);
--> statement-breakpoint
ALTER TABLE "plan_answers" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "plan_steps" (
	"plan_id" uuid NOT NULL,
	"step_id" uuid NOT NULL,
	"yard_id" uuid DEFAULT null NOT NULL,
	"start_at" timestamp with time zone NOT NULL,
	"finish_at" timestamp with time zone NOT NULL,
	"room" double precision,
	"limiter" text,
	CONSTRAINT "plan_steps_plan_id_step_id_pk" PRIMARY KEY("plan_id","step_id")
);
--> statement-breakpoint
ALTER TABLE "plan_steps" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "plans" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"job_id" uuid NOT NULL,
	"yard_id" uuid DEFAULT null NOT NULL,
	"aim" text NOT NULL,
	"taken_by" uuid,
	"taken_at" timestamp with time zone DEFAULT now() NOT NULL,
	"forecast_issued_at" timestamp with time zone NOT NULL,
	"held_members" integer,
	"members" integer,
	"launch_ready_at" timestamp with time zone,
	"launch_ready_assumed" boolean NOT NULL,
	"launch_at" timestamp with time zone,
	"slip_days" integer,
	"cost_of_slip" double precision,
	"ended_at" timestamp with time zone,
	"ended_by" uuid
);
--> statement-breakpoint
ALTER TABLE "plans" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "absences" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"yard_id" uuid NOT NULL,
	"user_id" uuid NOT NULL,
	"from_date" date NOT NULL,
	"to_date" date NOT NULL,
	"note" text DEFAULT '' NOT NULL,
	"revision" integer DEFAULT 1 NOT NULL
);
--> statement-breakpoint
ALTER TABLE "absences" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "memberships" ADD COLUMN "work_hours" jsonb;--> statement-breakpoint
ALTER TABLE "steps" ADD COLUMN "task" text;--> statement-breakpoint
ALTER TABLE "steps" ADD COLUMN "pinned_at" timestamp with time zone;--> statement-breakpoint
ALTER TABLE "steps" ADD COLUMN "started_at" timestamp with time zone;--> statement-breakpoint
ALTER TABLE "steps" ADD COLUMN "finished_at" timestamp with time zone;--> statement-breakpoint
ALTER TABLE "job_waits" ADD CONSTRAINT "job_waits_job_id_jobs_id_fk" FOREIGN KEY ("job_id") REFERENCES "public"."jobs"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "job_waits" ADD CONSTRAINT "job_waits_after_id_jobs_id_fk" FOREIGN KEY ("after_id") REFERENCES "public"."jobs"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "step_painters" ADD CONSTRAINT "step_painters_step_id_steps_id_fk" FOREIGN KEY ("step_id") REFERENCES "public"."steps"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "step_painters" ADD CONSTRAINT "step_painters_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "plan_answers" ADD CONSTRAINT "plan_answers_plan_id_plans_id_fk" FOREIGN KEY ("plan_id") REFERENCES "public"."plans"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "plan_answers" ADD CONSTRAINT "plan_answers_step_id_steps_id_fk" FOREIGN KEY ("step_id") REFERENCES "public"."steps"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "plan_answers" ADD CONSTRAINT "plan_answers_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "plan_steps" ADD CONSTRAINT "plan_steps_plan_id_plans_id_fk" FOREIGN KEY ("plan_id") REFERENCES "public"."plans"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "plan_steps" ADD CONSTRAINT "plan_steps_step_id_steps_id_fk" FOREIGN KEY ("step_id") REFERENCES "public"."steps"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "plans" ADD CONSTRAINT "plans_job_id_jobs_id_fk" FOREIGN KEY ("job_id") REFERENCES "public"."jobs"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "plans" ADD CONSTRAINT "plans_taken_by_users_id_fk" FOREIGN KEY ("taken_by") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "plans" ADD CONSTRAINT "plans_ended_by_users_id_fk" FOREIGN KEY ("ended_by") REFERENCES "public"."users"("id") ON DELETE set null ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "absences" ADD CONSTRAINT "absences_yard_id_yards_id_fk" FOREIGN KEY ("yard_id") REFERENCES "public"."yards"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "absences" ADD CONSTRAINT "absences_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "job_waits_after_id_index" ON "job_waits" USING btree ("after_id");--> statement-breakpoint
CREATE INDEX "step_painters_user_id_index" ON "step_painters" USING btree ("user_id");--> statement-breakpoint
CREATE INDEX "plan_steps_step_id_index" ON "plan_steps" USING btree ("step_id");--> statement-breakpoint
CREATE INDEX "plans_job_id_taken_at_index" ON "plans" USING btree ("job_id","taken_at");--> statement-breakpoint
CREATE UNIQUE INDEX "plans_in_force" ON "plans" USING btree ("job_id") WHERE "plans"."ended_at" is null;--> statement-breakpoint
CREATE INDEX "absences_yard_id_user_id_to_date_index" ON "absences" USING btree ("yard_id","user_id","to_date");--> statement-breakpoint
CREATE POLICY "web_wall" ON "job_waits" AS PERMISSIVE FOR ALL TO "yardglass_web" USING ("job_waits"."yard_id" in (select app_yards())) WITH CHECK ("job_waits"."yard_id" in (select app_yards()));--> statement-breakpoint
CREATE POLICY "web_wall" ON "step_painters" AS PERMISSIVE FOR ALL TO "yardglass_web" USING ("step_painters"."yard_id" in (select app_yards())) WITH CHECK ("step_painters"."yard_id" in (select app_yards()));--> statement-breakpoint
CREATE POLICY "web_wall" ON "plan_answers" AS PERMISSIVE FOR ALL TO "yardglass_web" USING ("plan_answers"."yard_id" in (select app_yards())) WITH CHECK ("plan_answers"."yard_id" in (select app_yards()));--> statement-breakpoint
CREATE POLICY "web_wall" ON "plan_steps" AS PERMISSIVE FOR ALL TO "yardglass_web" USING ("plan_steps"."yard_id" in (select app_yards())) WITH CHECK ("plan_steps"."yard_id" in (select app_yards()));--> statement-breakpoint
CREATE POLICY "web_wall" ON "plans" AS PERMISSIVE FOR ALL TO "yardglass_web" USING ("plans"."yard_id" in (select app_yards())) WITH CHECK ("plans"."yard_id" in (select app_yards()));--> statement-breakpoint
CREATE POLICY "web_wall" ON "absences" AS PERMISSIVE FOR ALL TO "yardglass_web" USING ("absences"."yard_id" in (select app_yards())) WITH CHECK ("absences"."yard_id" in (select app_yards()));