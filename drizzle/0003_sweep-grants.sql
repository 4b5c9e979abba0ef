GRANT SELECT, INSERT ON stored_files, traces, trace_blocks, readings, suspects TO neap_app;
--> statement-breakpoint
-- A sweep never changes: only its place in the line of record and its archiving may.
GRANT SELECT, INSERT, UPDATE (on_record, archived_at) ON sweeps TO neap_app;
--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE, DELETE ON clocks, ladders, ladder_steps, reports, report_sweeps TO neap_app;
--> statement-breakpoint
-- Measured levels hardly compress; trying costs time at every import.
ALTER TABLE trace_blocks ALTER COLUMN bytes SET STORAGE EXTERNAL;
--> statement-breakpoint
-- What a report said when it was issued stays as it was said, and only drafts are thrown away.
CREATE FUNCTION keep_issued_report() RETURNS trigger
LANGUAGE plpgsql AS $$
BEGIN
  IF OLD.state = 'draft' THEN
    RETURN CASE WHEN TG_OP = 'DELETE' THEN OLD ELSE NEW END;
  END IF;
  IF TG_OP = 'DELETE' THEN
    RAISE EXCEPTION 'an issued report is never deleted';
  END IF;
  IF (OLD.build_id, OLD.ladder_id, OLD.replaces_id, OLD.title, OLD.summary, OLD.paper, OLD.number,
      OLD.snapshot, OLD.sha256, OLD.issued_by, OLD.issued_at)
    IS DISTINCT FROM
     (NEW.build_id, NEW.ladder_id, NEW.replaces_id, NEW.title, NEW.summary, NEW.paper, NEW.number,
      NEW.snapshot, NEW.sha256, NEW.issued_by, NEW.issued_at)
     OR NEW.state = 'draft' THEN
    RAISE EXCEPTION 'an issued report is never edited';
  END IF;
  RETURN NEW;
END
$$;
--> statement-breakpoint
CREATE TRIGGER keep_issued_report BEFORE UPDATE OR DELETE ON reports
FOR EACH ROW EXECUTE FUNCTION keep_issued_report();
--> statement-breakpoint
-- Identities are made here alone, for the team of the unit of work. Somebody who has an identity
-- already keeps name and password and only becomes a member of one more team.
CREATE FUNCTION add_member(person_name text, address text, hash text, new_role text)
RETURNS uuid
LANGUAGE plpgsql SECURITY DEFINER SET search_path = public, pg_temp AS $$
DECLARE
  team uuid := nullif(current_setting('neap.team_id', true), '')::uuid;
  person uuid;
BEGIN
  IF team IS NULL THEN
    RAISE EXCEPTION 'no team is set';
  END IF;
  INSERT INTO users (email, name, password_hash)
    VALUES (lower(trim(address)), person_name, hash)
    ON CONFLICT (email) DO NOTHING;
  SELECT id INTO person FROM users WHERE email = lower(trim(address));
  INSERT INTO members (team_id, user_id, role) VALUES (team, person, new_role);
  RETURN person;
END
$$;
--> statement-breakpoint
REVOKE ALL ON FUNCTION add_member(text, text, text, text) FROM PUBLIC;
--> statement-breakpoint
GRANT EXECUTE ON FUNCTION add_member(text, text, text, text) TO neap_app;
