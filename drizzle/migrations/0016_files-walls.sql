-- The yard of a file is that of the boat or sheet it belongs to; only of the stands' picture it is what is given.
CREATE FUNCTION app_yard_of_file() RETURNS trigger LANGUAGE plpgsql
	AS $$ BEGIN
		IF NEW.boat_id IS NOT NULL THEN
			NEW.yard_id := (SELECT yard_id FROM public.boats WHERE id = NEW.boat_id);
		ELSIF NEW.sheet_id IS NOT NULL THEN
			NEW.yard_id := (SELECT yard_id FROM public.sheets WHERE id = NEW.sheet_id);
		END IF;
		RETURN NEW;
	END $$;--> statement-breakpoint
CREATE TRIGGER "yard_of_file" BEFORE INSERT OR UPDATE OF "boat_id", "sheet_id", "yard_id" ON "files" FOR EACH ROW EXECUTE FUNCTION app_yard_of_file();--> statement-breakpoint
SELECT app_count_revisions('files');--> statement-breakpoint
SELECT app_keep_record('files');
