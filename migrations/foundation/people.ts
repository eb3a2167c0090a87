/** Who works here, how they sign in, and the requests that are answered once. */
export const people = `
CREATE TABLE people (
  id integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  name text NOT NULL CHECK (char_length(name) BETWEEN 1 AND 120),
  email text NOT NULL UNIQUE CHECK (email = lower(email) AND char_length(email) <= 254),
  password_hash text,
  roles text[] NOT NULL DEFAULT '{}'
    CHECK (roles <@ ARRAY['owner','manager','designer','cutter','packer','counter']::text[]),
  place text CHECK (char_length(place) <= 60),
  active boolean NOT NULL DEFAULT true,
  created_at timestamptz NOT NULL DEFAULT now()
);

CREATE TABLE sessions (
  id uuid PRIMARY KEY,
  person_id integer NOT NULL REFERENCES people ON DELETE CASCADE,
  created_at timestamptz NOT NULL DEFAULT now(),
  last_seen_at timestamptz NOT NULL DEFAULT now(),
  expires_at timestamptz NOT NULL,
  revoked_at timestamptz,
  device text CHECK (char_length(device) <= 200)
);
CREATE INDEX sessions_person ON sessions (person_id) WHERE revoked_at IS NULL;

CREATE TABLE sign_in_attempts (
  id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  email text NOT NULL,
  address text NOT NULL,
  succeeded boolean NOT NULL,
  at timestamptz NOT NULL DEFAULT now()
);
CREATE INDEX sign_in_attempts_email ON sign_in_attempts (email, at);
CREATE INDEX sign_in_attempts_address ON sign_in_attempts (address, at);

CREATE TABLE invitations (
  id integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  person_id integer NOT NULL REFERENCES people ON DELETE CASCADE,
  token_hash text NOT NULL UNIQUE,
  purpose text NOT NULL CHECK (purpose IN ('join','new-password')),
  made_by integer REFERENCES people,
  created_at timestamptz NOT NULL DEFAULT now(),
  expires_at timestamptz NOT NULL,
  used_at timestamptz
);

-- The client makes the id before sending; the row is inserted first, a repeat returns the stored result.
CREATE TABLE requests (
  id uuid PRIMARY KEY,
  actor_id integer NOT NULL REFERENCES people,
  kind text NOT NULL,
  content_hash text NOT NULL,
  result jsonb,
  created_at timestamptz NOT NULL DEFAULT now()
);
CREATE INDEX requests_created ON requests (created_at);

CREATE FUNCTION refuse_change() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  RAISE EXCEPTION '% is append-only: % refused', TG_TABLE_NAME, TG_OP USING ERRCODE = 'integrity_constraint_violation';
END $$;

-- Who changed what.
CREATE TABLE changes (
  id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  at timestamptz NOT NULL DEFAULT now(),
  person_id integer REFERENCES people,
  subject text NOT NULL,
  subject_id text NOT NULL,
  act text NOT NULL,
  details jsonb NOT NULL DEFAULT '{}'
);
CREATE INDEX changes_subject ON changes (subject, subject_id, id);
CREATE TRIGGER changes_append_only BEFORE UPDATE OR DELETE ON changes FOR EACH ROW EXECUTE FUNCTION refuse_change();
`;
