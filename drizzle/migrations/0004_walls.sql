-- The web process's role, what it may touch, and the functions its row-level security asks.
-- A role belongs to the whole server: another database of it may have made it already.
DO $$ BEGIN
	CREATE ROLE "yardglass_web" NOLOGIN;
EXCEPTION WHEN duplicate_object OR unique_violation THEN NULL;
END $$;--> statement-breakpoint
GRANT USAGE ON SCHEMA public TO "yardglass_web";--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE, DELETE ON ALL TABLES IN SCHEMA public TO "yardglass_web";--> statement-breakpoint
ALTER DEFAULT PRIVILEGES IN SCHEMA public GRANT SELECT, INSERT, UPDATE, DELETE ON TABLES TO "yardglass_web";--> statement-breakpoint
CREATE FUNCTION app_person() RETURNS uuid LANGUAGE sql STABLE PARALLEL SAFE
	RETURN nullif(current_setting('app.person', true), '')::uuid;--> statement-breakpoint
CREATE FUNCTION app_duty() RETURNS text LANGUAGE sql STABLE PARALLEL SAFE
	RETURN coalesce(current_setting('app.duty', true), '');--> statement-breakpoint
-- As the owner of the tables, or the wall of memberships would ask itself.
CREATE FUNCTION app_yards() RETURNS SETOF uuid LANGUAGE sql STABLE SECURITY DEFINER
	SET search_path = pg_catalog, public
	AS $$ SELECT yard_id FROM memberships WHERE user_id = app_person() $$;--> statement-breakpoint
CREATE FUNCTION app_fellows() RETURNS SETOF uuid LANGUAGE sql STABLE SECURITY DEFINER
	SET search_path = pg_catalog, public
	AS $$ SELECT theirs.user_id FROM memberships mine
		JOIN memberships theirs ON theirs.yard_id = mine.yard_id
		WHERE mine.user_id = app_person() $$;--> statement-breakpoint
-- The queue's tables are the worker's alone; this asks it for a task, once for each key.
CREATE FUNCTION app_ask_worker(task text, payload json, job_key text) RETURNS void
	LANGUAGE plpgsql SECURITY DEFINER SET search_path = pg_catalog
	AS $$ BEGIN
		PERFORM graphile_worker.add_job(task, payload, job_key := app_ask_worker.job_key);
	END $$;--> statement-breakpoint
REVOKE EXECUTE ON FUNCTION app_ask_worker(text, json, text) FROM PUBLIC;--> statement-breakpoint
GRANT EXECUTE ON FUNCTION app_ask_worker(text, json, text) TO "yardglass_web";--> statement-breakpoint
-- The yard of a row is that of the boat, job or step it hangs on, whatever is given.
CREATE FUNCTION app_yard_of_boat() RETURNS trigger LANGUAGE plpgsql
	AS $$ BEGIN
		NEW.yard_id := (SELECT yard_id FROM public.boats WHERE id = NEW.boat_id);
		RETURN NEW;
	END $$;--> statement-breakpoint
CREATE FUNCTION app_yard_of_job() RETURNS trigger LANGUAGE plpgsql
	AS $$ BEGIN
		NEW.yard_id := (SELECT yard_id FROM public.jobs WHERE id = NEW.job_id);
		RETURN NEW;
	END $$;--> statement-breakpoint
CREATE FUNCTION app_yard_of_step() RETURNS trigger LANGUAGE plpgsql
	AS $$ BEGIN
		NEW.yard_id := (SELECT yard_id FROM public.steps WHERE id = NEW.step_id);
		RETURN NEW;
	END $$;--> statement-breakpoint
-- Or what hangs on it would stay behind in the other yard's sight.
CREATE FUNCTION app_yard_stays() RETURNS trigger LANGUAGE plpgsql
	AS $$ BEGIN
		IF NEW.yard_id IS DISTINCT FROM OLD.yard_id THEN
			RAISE EXCEPTION 'A boat stays in its yard: row-level security goes by it.';
		END IF;
		RETURN NEW;
	END $$;
