ALTER TABLE "account_links" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "invitations" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "mails" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "sessions" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "sign_in_attempts" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "users" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "memberships" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "stands" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "yards" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "boat_painters" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "boats" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "faces" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "jobs" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "sheets" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "step_faces" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "steps" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "forecast_runs" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "outlooks" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "provider_states" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "workers" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "boat_painters" ADD COLUMN "yard_id" uuid;--> statement-breakpoint
UPDATE "boat_painters" SET "yard_id" = "boats"."yard_id" FROM "boats" WHERE "boats"."id" = "boat_painters"."boat_id";--> statement-breakpoint
ALTER TABLE "boat_painters" ALTER COLUMN "yard_id" SET NOT NULL;--> statement-breakpoint
CREATE TRIGGER "yard_of_boat" BEFORE INSERT OR UPDATE OF "boat_id", "yard_id" ON "boat_painters" FOR EACH ROW EXECUTE FUNCTION app_yard_of_boat();--> statement-breakpoint
ALTER TABLE "faces" ADD COLUMN "yard_id" uuid;--> statement-breakpoint
UPDATE "faces" SET "yard_id" = "boats"."yard_id" FROM "boats" WHERE "boats"."id" = "faces"."boat_id";--> statement-breakpoint
ALTER TABLE "faces" ALTER COLUMN "yard_id" SET NOT NULL;--> statement-breakpoint
CREATE TRIGGER "yard_of_boat" BEFORE INSERT OR UPDATE OF "boat_id", "yard_id" ON "faces" FOR EACH ROW EXECUTE FUNCTION app_yard_of_boat();--> statement-breakpoint
ALTER TABLE "jobs" ADD COLUMN "yard_id" uuid;--> statement-breakpoint
UPDATE "jobs" SET "yard_id" = "boats"."yard_id" FROM "boats" WHERE "boats"."id" = "jobs"."boat_id";--> statement-breakpoint
ALTER TABLE "jobs" ALTER COLUMN "yard_id" SET NOT NULL;--> statement-breakpoint
CREATE TRIGGER "yard_of_boat" BEFORE INSERT OR UPDATE OF "boat_id", "yard_id" ON "jobs" FOR EACH ROW EXECUTE FUNCTION app_yard_of_boat();--> statement-breakpoint
ALTER TABLE "steps" ADD COLUMN "yard_id" uuid;--> statement-breakpoint
UPDATE "steps" SET "yard_id" = "jobs"."yard_id" FROM "jobs" WHERE "jobs"."id" = "steps"."job_id";--> statement-breakpoint
ALTER TABLE "steps" ALTER COLUMN "yard_id" SET NOT NULL;--> statement-breakpoint
CREATE TRIGGER "yard_of_job" BEFORE INSERT OR UPDATE OF "job_id", "yard_id" ON "steps" FOR EACH ROW EXECUTE FUNCTION app_yard_of_job();--> statement-breakpoint
ALTER TABLE "step_faces" ADD COLUMN "yard_id" uuid;--> statement-breakpoint
UPDATE "step_faces" SET "yard_id" = "steps"."yard_id" FROM "steps" WHERE "steps"."id" = "step_faces"."step_id";--> statement-breakpoint
ALTER TABLE "step_faces" ALTER COLUMN "yard_id" SET NOT NULL;--> statement-breakpoint
CREATE TRIGGER "yard_of_step" BEFORE INSERT OR UPDATE OF "step_id", "yard_id" ON "step_faces" FOR EACH ROW EXECUTE FUNCTION app_yard_of_step();--> statement-breakpoint
ALTER TABLE "outlooks" ADD COLUMN "yard_id" uuid;--> statement-breakpoint
UPDATE "outlooks" SET "yard_id" = "steps"."yard_id" FROM "steps" WHERE "steps"."id" = "outlooks"."step_id";--> statement-breakpoint
ALTER TABLE "outlooks" ALTER COLUMN "yard_id" SET NOT NULL;--> statement-breakpoint
CREATE TRIGGER "yard_of_step" BEFORE INSERT OR UPDATE OF "step_id", "yard_id" ON "outlooks" FOR EACH ROW EXECUTE FUNCTION app_yard_of_step();--> statement-breakpoint
CREATE TRIGGER "yard_stays" BEFORE UPDATE OF "yard_id" ON "boats" FOR EACH ROW EXECUTE FUNCTION app_yard_stays();--> statement-breakpoint
CREATE INDEX "memberships_user_id_index" ON "memberships" USING btree ("user_id");--> statement-breakpoint
CREATE POLICY "web_wall" ON "account_links" AS PERMISSIVE FOR ALL TO "yardglass_web" USING ((select app_duty()) = 'accounts') WITH CHECK ((select app_duty()) = 'accounts');--> statement-breakpoint
CREATE POLICY "web_wall" ON "invitations" AS PERMISSIVE FOR ALL TO "yardglass_web" USING ("invitations"."yard_id" in (select app_yards()) or (select app_duty()) = 'accounts') WITH CHECK ("invitations"."yard_id" in (select app_yards()) or (select app_duty()) = 'accounts');--> statement-breakpoint
CREATE POLICY "web_wall" ON "mails" AS PERMISSIVE FOR INSERT TO "yardglass_web" WITH CHECK (true);--> statement-breakpoint
CREATE POLICY "web_wall" ON "sessions" AS PERMISSIVE FOR ALL TO "yardglass_web" USING ("sessions"."user_id" = (select app_person()) or (select app_duty()) = 'accounts') WITH CHECK ("sessions"."user_id" = (select app_person()) or (select app_duty()) = 'accounts');--> statement-breakpoint
CREATE POLICY "web_wall" ON "sign_in_attempts" AS PERMISSIVE FOR ALL TO "yardglass_web" USING ((select app_duty()) = 'accounts') WITH CHECK ((select app_duty()) = 'accounts');--> statement-breakpoint
CREATE POLICY "web_wall" ON "users" AS PERMISSIVE FOR ALL TO "yardglass_web" USING ("users"."id" = (select app_person()) or "users"."id" in (select app_fellows()) or (select app_duty()) = 'accounts') WITH CHECK ("users"."id" = (select app_person()) or (select app_duty()) = 'accounts');--> statement-breakpoint
CREATE POLICY "web_wall" ON "memberships" AS PERMISSIVE FOR ALL TO "yardglass_web" USING ("memberships"."yard_id" in (select app_yards()) or (select app_duty()) = 'accounts') WITH CHECK ("memberships"."yard_id" in (select app_yards()) or (select app_duty()) = 'accounts');--> statement-breakpoint
CREATE POLICY "web_wall" ON "stands" AS PERMISSIVE FOR ALL TO "yardglass_web" USING ("stands"."yard_id" in (select app_yards())) WITH CHECK ("stands"."yard_id" in (select app_yards()));--> statement-breakpoint
CREATE POLICY "web_wall" ON "yards" AS PERMISSIVE FOR ALL TO "yardglass_web" USING ("yards"."id" in (select app_yards()) or (select app_duty()) = 'accounts') WITH CHECK ("yards"."id" in (select app_yards()) or (select app_duty()) = 'accounts');--> statement-breakpoint
CREATE POLICY "web_wall" ON "boat_painters" AS PERMISSIVE FOR ALL TO "yardglass_web" USING ("boat_painters"."yard_id" in (select app_yards()) or (select app_duty()) = 'accounts') WITH CHECK ("boat_painters"."yard_id" in (select app_yards()) or (select app_duty()) = 'accounts');--> statement-breakpoint
CREATE POLICY "web_wall" ON "boats" AS PERMISSIVE FOR ALL TO "yardglass_web" USING ("boats"."yard_id" in (select app_yards()) or (select app_duty()) = 'accounts') WITH CHECK ("boats"."yard_id" in (select app_yards()) or (select app_duty()) = 'accounts');--> statement-breakpoint
CREATE POLICY "web_wall" ON "faces" AS PERMISSIVE FOR ALL TO "yardglass_web" USING ("faces"."yard_id" in (select app_yards())) WITH CHECK ("faces"."yard_id" in (select app_yards()));--> statement-breakpoint
CREATE POLICY "web_wall" ON "jobs" AS PERMISSIVE FOR ALL TO "yardglass_web" USING ("jobs"."yard_id" in (select app_yards())) WITH CHECK ("jobs"."yard_id" in (select app_yards()));--> statement-breakpoint
CREATE POLICY "web_wall" ON "sheets" AS PERMISSIVE FOR ALL TO "yardglass_web" USING ("sheets"."yard_id" in (select app_yards()) or (select app_duty()) = 'accounts') WITH CHECK ("sheets"."yard_id" in (select app_yards()) or (select app_duty()) = 'accounts');--> statement-breakpoint
CREATE POLICY "web_wall" ON "step_faces" AS PERMISSIVE FOR ALL TO "yardglass_web" USING ("step_faces"."yard_id" in (select app_yards())) WITH CHECK ("step_faces"."yard_id" in (select app_yards()));--> statement-breakpoint
CREATE POLICY "web_wall" ON "steps" AS PERMISSIVE FOR ALL TO "yardglass_web" USING ("steps"."yard_id" in (select app_yards())) WITH CHECK ("steps"."yard_id" in (select app_yards()));--> statement-breakpoint
CREATE POLICY "web_wall" ON "forecast_runs" AS PERMISSIVE FOR ALL TO "yardglass_web" USING ("forecast_runs"."yard_id" in (select app_yards())) WITH CHECK ("forecast_runs"."yard_id" in (select app_yards()));--> statement-breakpoint
CREATE POLICY "web_wall" ON "outlooks" AS PERMISSIVE FOR ALL TO "yardglass_web" USING ("outlooks"."yard_id" in (select app_yards())) WITH CHECK ("outlooks"."yard_id" in (select app_yards()));--> statement-breakpoint
CREATE POLICY "web_wall" ON "provider_states" AS PERMISSIVE FOR ALL TO "yardglass_web" USING ("provider_states"."yard_id" in (select app_yards()) or (select app_duty()) = 'health') WITH CHECK ("provider_states"."yard_id" in (select app_yards()) or (select app_duty()) = 'health');--> statement-breakpoint
CREATE POLICY "web_wall" ON "workers" AS PERMISSIVE FOR ALL TO "yardglass_web" USING (true) WITH CHECK (true);