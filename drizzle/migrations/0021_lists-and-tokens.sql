CREATE TABLE "access_tokens" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"user_id" uuid NOT NULL,
	"of_yard" uuid,
	"name" text NOT NULL,
	"token_hash" text NOT NULL,
	"scopes" text[] NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"last_used_at" timestamp with time zone,
	CONSTRAINT "access_tokens_tokenHash_unique" UNIQUE("token_hash")
);
--> statement-breakpoint
ALTER TABLE "access_tokens" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
DROP INDEX "boats_yard_id_index";--> statement-breakpoint
DROP INDEX "changes_yard_id_id_index";--> statement-breakpoint
ALTER TABLE "access_tokens" ADD CONSTRAINT "access_tokens_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "access_tokens" ADD CONSTRAINT "access_tokens_of_yard_yards_id_fk" FOREIGN KEY ("of_yard") REFERENCES "public"."yards"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "access_tokens_user_id_index" ON "access_tokens" USING btree ("user_id");--> statement-breakpoint
CREATE INDEX "users_trigrams" ON "users" USING gin ("name" gin_trgm_ops);--> statement-breakpoint
CREATE INDEX "stands_yard_id_position_id_index" ON "stands" USING btree ("yard_id","position","id");--> statement-breakpoint
CREATE INDEX "boats_yard_id_name_id_index" ON "boats" USING btree ("yard_id","name","id");--> statement-breakpoint
CREATE INDEX "boats_stand_id_index" ON "boats" USING btree ("stand_id");--> statement-breakpoint
CREATE INDEX "boats_trigrams" ON "boats" USING gin ("yard_id","name" gin_trgm_ops);--> statement-breakpoint
CREATE INDEX "jobs_trigrams" ON "jobs" USING gin ("yard_id","name" gin_trgm_ops);--> statement-breakpoint
CREATE INDEX "steps_yard_id_updated_at_id_index" ON "steps" USING btree ("yard_id","updated_at","id");--> statement-breakpoint
CREATE INDEX "steps_yard_id_state_updated_at_id_index" ON "steps" USING btree ("yard_id","state","updated_at","id");--> statement-breakpoint
CREATE INDEX "steps_yard_id_kind_updated_at_id_index" ON "steps" USING btree ("yard_id","kind","updated_at","id");--> statement-breakpoint
CREATE INDEX "changes_yard_id_at_id_index" ON "changes" USING btree ("yard_id","at","id");--> statement-breakpoint
CREATE INDEX "changes_yard_id_person_id_at_id_index" ON "changes" USING btree ("yard_id","person_id","at","id");--> statement-breakpoint
CREATE INDEX "changes_yard_id_boat_id_at_id_index" ON "changes" USING btree ("yard_id","boat_id","at","id");--> statement-breakpoint
CREATE INDEX "changes_of_subject" ON "changes" USING btree ("yard_id","subject","at","id");--> statement-breakpoint
CREATE POLICY "web_wall" ON "access_tokens" AS PERMISSIVE FOR ALL TO "yardglass_web" USING ("access_tokens"."user_id" = (select app_person()) or (select app_duty()) = 'accounts') WITH CHECK ("access_tokens"."user_id" = (select app_person()) or (select app_duty()) = 'accounts');