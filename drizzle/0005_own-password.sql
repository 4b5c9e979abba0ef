-- A new password for a person who is an active member of the unit of work's team; false otherwise.
CREATE FUNCTION change_own_password(person uuid, hash text) RETURNS boolean
LANGUAGE plpgsql SECURITY DEFINER SET search_path = public, pg_temp AS $$
DECLARE
  team uuid := nullif(current_setting('neap.team_id', true), '')::uuid;
BEGIN
  IF team IS NULL THEN
    RAISE EXCEPTION 'no team is set';
  END IF;
  UPDATE users u SET password_hash = hash
  WHERE u.id = person AND EXISTS (
    SELECT 1 FROM members m
    WHERE m.user_id = person AND m.team_id = team AND m.deactivated_at IS NULL
  );
  RETURN FOUND;
END
$$;
--> statement-breakpoint
REVOKE ALL ON FUNCTION change_own_password(uuid, text) FROM PUBLIC;
--> statement-breakpoint
GRANT EXECUTE ON FUNCTION change_own_password(uuid, text) TO neap_app;
--> statement-breakpoint
-- Nobody but the two functions below touches the tries; they belong to no team.
REVOKE ALL ON sign_in_attempts FROM PUBLIC, neap_app;
--> statement-breakpoint
-- Books a try before its password is looked at, so that many at once cannot slip past the count.
-- NULL when the address had its share within 15 minutes: 10 tries from one origin or 30 from all.
-- A refused try is not booked, so the wait ends even while somebody keeps knocking.
CREATE FUNCTION begin_sign_in(address text, origin text) RETURNS uuid
LANGUAGE plpgsql SECURITY DEFINER SET search_path = public, pg_temp AS $$
DECLARE
  address_key text := encode(sha256(convert_to(lower(trim(address)), 'UTF8')), 'hex');
  origin_key text := encode(sha256(convert_to(origin, 'UTF8')), 'hex');
  since timestamptz := clock_timestamp() - interval '15 minutes';
  from_here bigint;
  from_all bigint;
  booked uuid;
BEGIN
  PERFORM pg_advisory_xact_lock(7316003, hashtext(address_key));
  DELETE FROM sign_in_attempts WHERE id IN (
    SELECT id FROM sign_in_attempts WHERE at < since LIMIT 200 FOR UPDATE SKIP LOCKED
  );
  SELECT count(*) FILTER (WHERE origin_digest = origin_key), count(*)
    INTO from_here, from_all
    FROM sign_in_attempts WHERE address_digest = address_key AND at >= since;
  IF from_here >= 10 OR from_all >= 30 THEN
    RETURN NULL;
  END IF;
  INSERT INTO sign_in_attempts (address_digest, origin_digest, at)
    VALUES (address_key, origin_key, clock_timestamp()) RETURNING id INTO booked;
  RETURN booked;
END
$$;
--> statement-breakpoint
REVOKE ALL ON FUNCTION begin_sign_in(text, text) FROM PUBLIC;
--> statement-breakpoint
GRANT EXECUTE ON FUNCTION begin_sign_in(text, text) TO neap_app;
--> statement-breakpoint
-- The password was right: the tries for this address from this origin are forgotten. Those from
-- elsewhere stay, or a guesser could start again whenever the rightful person signs in.
CREATE FUNCTION prove_sign_in(attempt uuid) RETURNS void
LANGUAGE sql SECURITY DEFINER SET search_path = public, pg_temp AS $$
  DELETE FROM sign_in_attempts a USING sign_in_attempts mine
  WHERE mine.id = attempt
    AND a.address_digest = mine.address_digest AND a.origin_digest = mine.origin_digest
$$;
--> statement-breakpoint
REVOKE ALL ON FUNCTION prove_sign_in(uuid) FROM PUBLIC;
--> statement-breakpoint
GRANT EXECUTE ON FUNCTION prove_sign_in(uuid) TO neap_app;
