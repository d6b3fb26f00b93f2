CREATE TRIGGER "yard_of_job" BEFORE INSERT OR UPDATE OF "job_id", "yard_id" ON "job_waits" FOR EACH ROW EXECUTE FUNCTION app_yard_of_job();--> statement-breakpoint
CREATE TRIGGER "yard_of_step" BEFORE INSERT OR UPDATE OF "step_id", "yard_id" ON "step_painters" FOR EACH ROW EXECUTE FUNCTION app_yard_of_step();--> statement-breakpoint
CREATE TRIGGER "yard_of_job" BEFORE INSERT OR UPDATE OF "job_id", "yard_id" ON "plans" FOR EACH ROW EXECUTE FUNCTION app_yard_of_job();--> statement-breakpoint
CREATE TRIGGER "yard_of_step" BEFORE INSERT OR UPDATE OF "step_id", "yard_id" ON "plan_steps" FOR EACH ROW EXECUTE FUNCTION app_yard_of_step();--> statement-breakpoint
CREATE TRIGGER "yard_of_step" BEFORE INSERT OR UPDATE OF "step_id", "yard_id" ON "plan_answers" FOR EACH ROW EXECUTE FUNCTION app_yard_of_step();--> statement-breakpoint
SELECT app_count_revisions('absences');--> statement-breakpoint
SELECT app_keep_record(it) FROM unnest(array['job_waits', 'step_painters', 'plans', 'plan_steps', 'plan_answers', 'absences']::regclass[]) it;
