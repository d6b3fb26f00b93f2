-- Both come with the server and are trusted: who owns the database may add them.
CREATE EXTENSION IF NOT EXISTS pg_trgm;--> statement-breakpoint
CREATE EXTENSION IF NOT EXISTS btree_gin;--> statement-breakpoint
-- A comparison that might tell of a row waits until row-level security has judged the row, and so
-- cannot go by an index. These look as the tables' owner, in one yard, if it is the person's, and
-- tell one row twice where two names hold the words. They go by the yard's indexes even where one
-- yard is most of a table.
CREATE FUNCTION app_like_pattern(words text) RETURNS text LANGUAGE sql IMMUTABLE PARALLEL SAFE
	RETURN '%' || regexp_replace(words, '([\\%_])', '\\\1', 'g') || '%';--> statement-breakpoint
CREATE FUNCTION app_boats_like(of_yard uuid, words text, most int) RETURNS SETOF uuid
	LANGUAGE plpgsql STABLE SECURITY DEFINER SET search_path = pg_catalog, public
	SET enable_seqscan = off
	AS $$ BEGIN
		IF of_yard NOT IN (SELECT app_yards()) THEN
			RETURN;
		END IF;
		-- Planned for the words at hand: two letters have no trigram to go by.
		RETURN QUERY EXECUTE '
			SELECT id FROM boats WHERE yard_id = $1 AND name ILIKE $2
			UNION ALL SELECT boats.id FROM boats JOIN users ON users.id = boats.owner_id
				WHERE boats.yard_id = $1 AND users.name ILIKE $2
			UNION ALL SELECT boats.id FROM boats JOIN stands ON stands.id = boats.stand_id
				WHERE boats.yard_id = $1 AND stands.yard_id = $1 AND stands.name ILIKE $2
			LIMIT $3'
			USING of_yard, app_like_pattern(words), most;
	END $$;--> statement-breakpoint
CREATE FUNCTION app_jobs_like(of_yard uuid, words text, most int) RETURNS SETOF uuid
	LANGUAGE plpgsql STABLE SECURITY DEFINER SET search_path = pg_catalog, public
	SET enable_seqscan = off
	AS $$ BEGIN
		IF of_yard NOT IN (SELECT app_yards()) THEN
			RETURN;
		END IF;
		RETURN QUERY EXECUTE '
			SELECT id FROM jobs WHERE yard_id = $1 AND name ILIKE $2
			UNION ALL SELECT jobs.id FROM jobs
				WHERE jobs.boat_id IN (SELECT app_boats_like($1, $3, $4))
			LIMIT $4'
			USING of_yard, app_like_pattern(words), words, most;
	END $$;
