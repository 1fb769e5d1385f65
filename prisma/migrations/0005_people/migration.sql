-- A way in for someone without a password: a code that an administrator hands over, of which only the SHA-256 is kept.
CREATE TABLE invitation (
  person_id text PRIMARY KEY REFERENCES person (id),
  hash bytea NOT NULL UNIQUE CHECK (octet_length(hash) = 32),
  made_by text NOT NULL,
  made_at timestamptz NOT NULL DEFAULT now(),
  expires_at timestamptz NOT NULL
);

-- Files that a machine or a command elsewhere sends.
ALTER TABLE intake_batch DROP CONSTRAINT intake_batch_origin_check,
  ADD CHECK (origin IN ('page', 'command', 'network', 'demonstration'));

-- Who drew limits up, where a person did: names are not unique, and four eyes need two people.
ALTER TABLE limit_revision ADD COLUMN author_id text REFERENCES person (id);
