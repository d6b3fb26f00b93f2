-- A stand taken away leaves its name in the stay but no stand: the boat's stay ends all the same.
CREATE OR REPLACE FUNCTION app_note_stay() RETURNS trigger LANGUAGE plpgsql SECURITY DEFINER
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
			IF open_stay.stand_id = NEW.stand_id AND open_stay.heading = NEW.heading THEN
				RETURN NULL;
			END IF;
			IF open_stay.person_id IS NOT DISTINCT FROM person
				AND open_stay.stand_id = NEW.stand_id
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
	END $$;
