-- What was done, by whom, when and why: written in the transaction of the change it tells of, and never changed.
-- Each entry bears a keyed mac over itself and the mac before it; the key lies outside the database, and so does the
-- last mac. The chain's name is part of every mac, so that no entry can pass for one of another chain.

CREATE TABLE audit_chain (
  single boolean PRIMARY KEY DEFAULT true CHECK (single),
  name uuid NOT NULL DEFAULT gen_random_uuid()
);
INSERT INTO audit_chain DEFAULT VALUES;

CREATE TABLE audit_entry (
  -- Without gaps, in the order of the chain.
  id bigint PRIMARY KEY CHECK (id >= 1),
  at timestamptz(3) NOT NULL,
  actor_kind text NOT NULL CHECK (actor_kind IN ('person', 'token', 'command', 'program')),
  actor_id text,
  actor_name text NOT NULL CHECK (actor_name <> ''),
  action text NOT NULL CHECK (action <> ''),
  subject_kind text NOT NULL CHECK (subject_kind <> ''),
  subject_id text NOT NULL CHECK (subject_id <> ''),
  stream_id bigint,
  -- json, not jsonb: the mac covers the text as it was written.
  before json,
  after json,
  why text,
  mac bytea NOT NULL CHECK (octet_length(mac) = 32),
  CHECK ((actor_kind IN ('person', 'token')) = (actor_id IS NOT NULL))
);

-- Holds the chain until the transaction ends and tells its end. Whoever holds it and then falls silent is cut off, so
-- that a suspended process does not hold up all others.
CREATE FUNCTION hold_audit_chain() RETURNS TABLE (name uuid, id bigint, mac bytea) LANGUAGE plpgsql AS $$
BEGIN
  PERFORM pg_advisory_xact_lock(69118, 3);
  PERFORM set_config('idle_in_transaction_session_timeout', '10s', true);
  RETURN QUERY SELECT c.name, e.id, e.mac FROM audit_chain c
    LEFT JOIN LATERAL (SELECT a.id, a.mac FROM audit_entry a ORDER BY a.id DESC LIMIT 1) e ON true;
END $$;

-- An entry goes at the end of the chain or nowhere.
CREATE FUNCTION link_audit_entry() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  PERFORM pg_advisory_xact_lock(69118, 3);
  IF NEW.id <> (SELECT coalesce(max(id), 0) + 1 FROM audit_entry) THEN
    RAISE EXCEPTION 'the audit chain has moved on' USING ERRCODE = 'serialization_failure';
  END IF;
  RETURN NEW;
END $$;
CREATE TRIGGER audit_entry_link BEFORE INSERT ON audit_entry FOR EACH ROW EXECUTE FUNCTION link_audit_entry();
CREATE TRIGGER audit_entry_is_final BEFORE UPDATE OR DELETE ON audit_entry FOR EACH ROW EXECUTE FUNCTION refuse_change();
CREATE TRIGGER audit_entry_stays BEFORE TRUNCATE ON audit_entry FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();
CREATE TRIGGER audit_chain_is_final BEFORE INSERT OR UPDATE OR DELETE ON audit_chain FOR EACH ROW EXECUTE FUNCTION refuse_change();
CREATE TRIGGER audit_chain_stays BEFORE TRUNCATE ON audit_chain FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();

-- What the accounts library writes by itself, outside our transactions: waits here to be taken into the chain. Never a
-- password, its hash or a token. A transaction that tells the chain itself says so by evenohm.audited.
CREATE TABLE access_event (
  id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  at timestamptz(3) NOT NULL DEFAULT clock_timestamp(),
  action text NOT NULL,
  -- Whether the person it concerns did it, or it was done to them.
  by_person boolean NOT NULL,
  person_id text NOT NULL,
  person_name text NOT NULL,
  before json,
  after json
);

CREATE FUNCTION note_access(action text, by_person boolean, person text, before json, after json) RETURNS void LANGUAGE plpgsql AS $$
BEGIN
  IF current_setting('evenohm.audited', true) = 'on' THEN RETURN; END IF;
  INSERT INTO access_event (action, by_person, person_id, person_name, before, after)
  VALUES (action, by_person, person, coalesce((SELECT p.name FROM person p WHERE p.id = person), person), before, after);
END $$;

CREATE FUNCTION note_person() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF TG_OP = 'INSERT' THEN
    PERFORM note_access('added a person', false, NEW.id, NULL, json_build_object('name', NEW.name, 'email', NEW.email));
  ELSIF TG_OP = 'DELETE' THEN
    PERFORM note_access('removed a person', false, OLD.id, json_build_object('name', OLD.name, 'email', OLD.email), NULL);
  ELSIF (NEW.name, NEW.email, NEW.email_verified, NEW.demonstration, NEW.deactivated_at) IS DISTINCT FROM
        (OLD.name, OLD.email, OLD.email_verified, OLD.demonstration, OLD.deactivated_at) THEN
    PERFORM note_access('changed a person', false, NEW.id,
      json_build_object('name', OLD.name, 'email', OLD.email, 'deactivatedAt', OLD.deactivated_at),
      json_build_object('name', NEW.name, 'email', NEW.email, 'deactivatedAt', NEW.deactivated_at));
  END IF;
  RETURN NULL;
END $$;
CREATE TRIGGER person_noted AFTER INSERT OR UPDATE OR DELETE ON person FOR EACH ROW EXECUTE FUNCTION note_person();

-- A session that ran out and is cleared away is nobody's act.
CREATE FUNCTION note_session() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF TG_OP = 'INSERT' THEN
    PERFORM note_access('signed in', true, NEW.person_id, NULL,
      json_build_object('address', NEW.ip_address, 'browser', left(NEW.user_agent, 200)));
  ELSIF OLD.expires_at > now() THEN
    PERFORM note_access('ended a session', false, OLD.person_id, json_build_object('since', OLD.created_at), NULL);
  END IF;
  RETURN NULL;
END $$;
CREATE TRIGGER session_noted AFTER INSERT OR DELETE ON session FOR EACH ROW EXECUTE FUNCTION note_session();

CREATE FUNCTION note_account() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF TG_OP = 'INSERT' THEN
    PERFORM note_access('added a way to sign in', false, NEW.person_id, NULL, json_build_object('way', NEW.provider_id));
  ELSIF TG_OP = 'DELETE' THEN
    PERFORM note_access('removed a way to sign in', false, OLD.person_id, json_build_object('way', OLD.provider_id), NULL);
  ELSIF NEW.person_id <> OLD.person_id OR NEW.account_id <> OLD.account_id THEN
    PERFORM note_access('changed a way to sign in', false, NEW.person_id, NULL, json_build_object('way', NEW.provider_id));
  ELSIF NEW.password IS DISTINCT FROM OLD.password THEN
    PERFORM note_access('changed a password', false, NEW.person_id, NULL, NULL);
  END IF;
  RETURN NULL;
END $$;
CREATE TRIGGER account_noted AFTER INSERT OR UPDATE OR DELETE ON account FOR EACH ROW EXECUTE FUNCTION note_account();

CREATE FUNCTION note_role() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  PERFORM note_access('changed roles', false, coalesce(NEW.person_id, OLD.person_id),
    CASE WHEN TG_OP <> 'INSERT' THEN json_build_object('role', OLD.role, 'streams', OLD.stream_ids) END,
    CASE WHEN TG_OP <> 'DELETE' THEN json_build_object('role', NEW.role, 'streams', NEW.stream_ids) END);
  RETURN NULL;
END $$;
CREATE TRIGGER role_grant_noted AFTER INSERT OR UPDATE OR DELETE ON role_grant FOR EACH ROW EXECUTE FUNCTION note_role();
