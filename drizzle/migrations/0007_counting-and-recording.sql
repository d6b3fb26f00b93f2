-- Counting changes of a row, whatever is given: who changes it must name the count they saw.
CREATE FUNCTION app_count_revision() RETURNS trigger LANGUAGE plpgsql
	AS $$ BEGIN
		NEW.revision := OLD.revision + 1;
		RETURN NEW;
	END $$;--> statement-breakpoint
-- Writes down who changed what, as the tables' owner: the web process can only read it. Those who
-- own the tables may lay or restore a yard without a record of every row.
CREATE FUNCTION app_note_change() RETURNS trigger LANGUAGE plpgsql SECURITY DEFINER
	SET search_path = pg_catalog, public
	AS $$
	DECLARE
		old_row jsonb := CASE WHEN TG_OP <> 'INSERT' THEN to_jsonb(OLD) END;
		new_row jsonb := CASE WHEN TG_OP <> 'DELETE' THEN to_jsonb(NEW) END;
		whole jsonb := coalesce(new_row, old_row);
		unsaid text[] := array['revision', 'updated_at', 'yard_id', 'token_hash'];
		of_yard uuid := coalesce(whole->>'yard_id', whole->>'id')::uuid;
		of_boat uuid := (whole->>'boat_id')::uuid;
		was jsonb;
		is_now jsonb;
	BEGIN
		IF session_user <> 'yardglass_web' AND current_setting('app.unrecorded', true) = 'yes' THEN
			RETURN NULL;
		END IF;
		-- With a whole yard goes its record.
		IF TG_OP = 'DELETE' AND NOT EXISTS (SELECT 1 FROM yards WHERE id = of_yard) THEN
			RETURN NULL;
		END IF;
		SELECT jsonb_object_agg(key, value) INTO was FROM jsonb_each(old_row)
			WHERE key <> ALL (unsaid) AND (new_row IS NULL OR new_row->key IS DISTINCT FROM value);
		SELECT jsonb_object_agg(key, value) INTO is_now FROM jsonb_each(new_row)
			WHERE key <> ALL (unsaid) AND (old_row IS NULL OR old_row->key IS DISTINCT FROM value);
		IF was IS NULL AND is_now IS NULL THEN
			RETURN NULL;
		END IF;
		IF TG_TABLE_NAME = 'boats' THEN
			of_boat := (whole->>'id')::uuid;
		ELSIF of_boat IS NULL AND whole ? 'job_id' THEN
			SELECT boat_id INTO of_boat FROM jobs WHERE id = (whole->>'job_id')::uuid;
		ELSIF of_boat IS NULL AND whole ? 'step_id' THEN
			SELECT jobs.boat_id INTO of_boat FROM steps JOIN jobs ON jobs.id = steps.job_id
				WHERE steps.id = (whole->>'step_id')::uuid;
		END IF;
		INSERT INTO changes (yard_id, person_id, person_name, subject, row_id, boat_id, action, before, after)
			VALUES (of_yard, app_person(), (SELECT name FROM users WHERE id = app_person()), TG_TABLE_NAME,
				coalesce(whole->>'id', concat_ws(' ', whole->>'boat_id', whole->>'step_id',
					whole->>'face_id', whole->>'user_id', whole->>'email')),
				of_boat, TG_OP, was, is_now);
		RETURN NULL;
	END $$;--> statement-breakpoint
CREATE FUNCTION app_keep_record(subject regclass) RETURNS void LANGUAGE plpgsql
	AS $$ BEGIN
		EXECUTE format('CREATE TRIGGER "note_change" AFTER INSERT OR UPDATE OR DELETE ON %s
			FOR EACH ROW EXECUTE FUNCTION app_note_change()', subject);
	END $$;--> statement-breakpoint
CREATE FUNCTION app_count_revisions(subject regclass) RETURNS void LANGUAGE plpgsql
	AS $$ BEGIN
		EXECUTE format('CREATE TRIGGER "count_revision" BEFORE UPDATE ON %s
			FOR EACH ROW EXECUTE FUNCTION app_count_revision()', subject);
	END $$;--> statement-breakpoint
REVOKE EXECUTE ON FUNCTION app_keep_record(regclass), app_count_revisions(regclass) FROM PUBLIC;--> statement-breakpoint
SELECT app_count_revisions(it) FROM unnest(array['yards', 'stands', 'boats', 'faces', 'sheets', 'jobs', 'steps']::regclass[]) it;--> statement-breakpoint
SELECT app_keep_record(it) FROM unnest(array['yards', 'stands', 'boats', 'boat_painters', 'faces', 'sheets', 'jobs', 'steps', 'step_faces', 'memberships', 'invitations']::regclass[]) it;
