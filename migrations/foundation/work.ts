/** Work that goes on behind the pages: planning jobs, printing, e-mail, live revisions. */
export const work = `
CREATE TABLE planning_jobs (
  id uuid PRIMARY KEY,
  kind text NOT NULL CHECK (kind IN ('kit','bolts')),
  input jsonb NOT NULL,
  input_hash text NOT NULL,
  core_version text NOT NULL,
  state text NOT NULL DEFAULT 'waiting' CHECK (state IN ('waiting','running','done','stopped','failed')),
  -- in ten-thousandths
  progress integer NOT NULL DEFAULT 0 CHECK (progress BETWEEN 0 AND 10000),
  sentence text NOT NULL DEFAULT '',
  result jsonb,
  stop_asked boolean NOT NULL DEFAULT false,
  asked_by integer REFERENCES people,
  worker text,
  heartbeat_at timestamptz,
  created_at timestamptz NOT NULL DEFAULT now(),
  ended_at timestamptz
);
CREATE INDEX planning_jobs_waiting ON planning_jobs (created_at) WHERE state IN ('waiting','running');

CREATE TABLE print_jobs (
  id integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  printer text NOT NULL CHECK (printer IN ('label-4x6','label-small','receipt','sheet')),
  title text NOT NULL,
  -- a PrintDocument of labels/documents
  document jsonb NOT NULL,
  copies integer NOT NULL DEFAULT 1 CHECK (copies BETWEEN 1 AND 99),
  state text NOT NULL DEFAULT 'waiting' CHECK (state IN ('waiting','printing','printed','failed','withdrawn')),
  attempts integer NOT NULL DEFAULT 0,
  error text,
  asked_by integer REFERENCES people,
  asked_at timestamptz NOT NULL DEFAULT now(),
  taken_at timestamptz,
  printed_at timestamptz
);
CREATE INDEX print_jobs_waiting ON print_jobs (printer, id) WHERE state IN ('waiting','printing');

-- E-mail is written in the transaction that causes it, and sent afterwards.
CREATE TABLE outbox_messages (
  id integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  kind text NOT NULL,
  to_address text NOT NULL,
  subject text NOT NULL,
  body text NOT NULL,
  state text NOT NULL DEFAULT 'waiting' CHECK (state IN ('waiting','sent','failed')),
  attempts integer NOT NULL DEFAULT 0,
  next_attempt_at timestamptz NOT NULL DEFAULT now(),
  error text,
  created_at timestamptz NOT NULL DEFAULT now(),
  sent_at timestamptz
);
CREATE INDEX outbox_waiting ON outbox_messages (next_attempt_at) WHERE state = 'waiting';

-- Live views: a hint with a revision, after which the client fetches.
CREATE TABLE revisions (
  topic text PRIMARY KEY,
  revision bigint NOT NULL DEFAULT 1
);
`;
