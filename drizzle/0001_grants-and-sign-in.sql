-- The app's role may work on rows of the team that row-level security lets it see.
-- It can neither delete identities nor change what the audit trail says.
GRANT USAGE ON SCHEMA public TO neap_app;
--> statement-breakpoint
GRANT SELECT, INSERT, UPDATE, DELETE ON programs, milestones, builds, members, benches, masks, program_masks TO neap_app;
--> statement-breakpoint
GRANT SELECT, UPDATE ON teams TO neap_app;
--> statement-breakpoint
GRANT SELECT ON users TO neap_app;
--> statement-breakpoint
GRANT SELECT, INSERT ON audit_events, signal_path_revisions, mask_revisions TO neap_app;
--> statement-breakpoint
-- Signing in happens before a team is known: this reads one identity by its address.
CREATE FUNCTION find_sign_in(address text)
RETURNS TABLE (user_id uuid, name text, email text, password_hash text, team_id uuid)
LANGUAGE sql STABLE SECURITY DEFINER SET search_path = public, pg_temp AS $$
  SELECT u.id, u.name, u.email, u.password_hash, m.team_id
  FROM users u
  JOIN members m ON m.user_id = u.id AND m.deactivated_at IS NULL
  WHERE u.email = lower(trim(address))
  ORDER BY m.created_at, m.team_id
  LIMIT 1
$$;
--> statement-breakpoint
REVOKE ALL ON FUNCTION find_sign_in(text) FROM PUBLIC;
--> statement-breakpoint
GRANT EXECUTE ON FUNCTION find_sign_in(text) TO neap_app;
--> statement-breakpoint
CREATE FUNCTION has_any_team() RETURNS boolean
LANGUAGE sql STABLE SECURITY DEFINER SET search_path = public, pg_temp AS $$
  SELECT EXISTS (SELECT 1 FROM teams)
$$;
--> statement-breakpoint
REVOKE ALL ON FUNCTION has_any_team() FROM PUBLIC;
--> statement-breakpoint
GRANT EXECUTE ON FUNCTION has_any_team() TO neap_app;
--> statement-breakpoint
-- First run: makes the first team and its admin, and only ever the first.
CREATE FUNCTION create_first_team(team_name text, person_name text, address text, hash text)
RETURNS uuid
LANGUAGE plpgsql SECURITY DEFINER SET search_path = public, pg_temp AS $$
DECLARE
  new_team uuid;
  new_user uuid;
BEGIN
  PERFORM pg_advisory_xact_lock(7316002);
  IF EXISTS (SELECT 1 FROM teams) THEN
    RETURN NULL;
  END IF;
  INSERT INTO teams (name) VALUES (team_name) RETURNING id INTO new_team;
  INSERT INTO users (email, name, password_hash)
    VALUES (lower(trim(address)), person_name, hash) RETURNING id INTO new_user;
  INSERT INTO members (team_id, user_id, role) VALUES (new_team, new_user, 'admin');
  INSERT INTO audit_events (team_id, actor_id, action, subject_type, subject_id)
    VALUES (new_team, new_user, 'team.create', 'team', new_team::text);
  RETURN new_team;
END
$$;
--> statement-breakpoint
REVOKE ALL ON FUNCTION create_first_team(text, text, text, text) FROM PUBLIC;
--> statement-breakpoint
GRANT EXECUTE ON FUNCTION create_first_team(text, text, text, text) TO neap_app;
