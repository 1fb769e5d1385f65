-- Files that a machine or a command elsewhere sends.
ALTER TABLE intake_batch DROP CONSTRAINT intake_batch_origin_check,
  ADD CHECK (origin IN ('page', 'command', 'network', 'demonstration'));

-- Who drew limits up, where a person did: names are not unique, and four eyes need two people.
ALTER TABLE limit_revision ADD COLUMN author_id text REFERENCES person (id);
