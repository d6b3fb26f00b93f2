-- Where a boat stands is written down by the database, as the tables' owner: the web process reads it.
-- What one person turns and shifts within ten minutes is one stay, not one for each stroke of a key.
CREATE FUNCTION app_note_stay() RETURNS trigger LANGUAGE plpgsql SECURITY DEFINER
	SET search_path = pg_catalog, public
	AS $$
	DECLARE
		person uuid := app_person();
		person_called text := (SELECT name FROM users WHERE id = person);
		open_stay stays%ROWTYPE;
	BEGIN
		SELECT * INTO open_stay FROM stays WHERE boat_id = NEW.id AND until IS NULL
			ORDER BY since DESC LIMIT 1;
		IF open_stay.id IS NOT NULL THEN
			IF open_stay.stand_id IS NOT DISTINCT FROM NEW.stand_id AND open_stay.heading = NEW.heading THEN
				RETURN NULL;
			END IF;
			IF open_stay.person_id IS NOT DISTINCT FROM person
				AND open_stay.stand_id IS NOT DISTINCT FROM NEW.stand_id
				AND open_stay.since > now() - interval '10 minutes' THEN
				UPDATE stays SET heading = NEW.heading WHERE id = open_stay.id;
				RETURN NULL;
			END IF;
			UPDATE stays SET until = now() WHERE id = open_stay.id;
		END IF;
		IF NEW.stand_id IS NOT NULL THEN
			INSERT INTO stays (boat_id, stand_id, stand_name, heading, person_id, person_name)
				VALUES (NEW.id, NEW.stand_id, (SELECT name FROM stands WHERE id = NEW.stand_id),
					NEW.heading, person, person_called);
		END IF;
		RETURN NULL;
	END $$;--> statement-breakpoint
CREATE TRIGGER "yard_of_boat" BEFORE INSERT OR UPDATE OF "boat_id", "yard_id" ON "stays" FOR EACH ROW EXECUTE FUNCTION app_yard_of_boat();--> statement-breakpoint
INSERT INTO stays (boat_id, yard_id, stand_id, stand_name, heading, since)
	SELECT boats.id, boats.yard_id, stands.id, stands.name, boats.heading, coalesce(boats.hauled_on::timestamptz, now())
	FROM boats JOIN stands ON stands.id = boats.stand_id;--> statement-breakpoint
CREATE TRIGGER "note_stay" AFTER INSERT OR UPDATE OF "stand_id", "heading" ON "boats" FOR EACH ROW EXECUTE FUNCTION app_note_stay();
