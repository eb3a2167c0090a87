/** Kit runs: serials, lengths to cut, reservations, claims and what the manager must look at. */
export const runs = `
CREATE TABLE runs (
  id integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  code text NOT NULL UNIQUE,
  colourway_id integer NOT NULL REFERENCES colourways,
  kits integer NOT NULL CHECK (kits BETWEEN 1 AND 999),
  purpose text NOT NULL DEFAULT 'shelf' CHECK (purpose IN ('shelf','class','orders')),
  due date,
  state text NOT NULL DEFAULT 'reserved' CHECK (state IN ('reserved','cutting','cut','packed','cancelled')),
  bolt_plan jsonb NOT NULL,
  note text NOT NULL DEFAULT '' CHECK (char_length(note) <= 400),
  made_by integer REFERENCES people,
  made_at timestamptz NOT NULL DEFAULT now()
);
CREATE INDEX runs_state ON runs (state, id);

CREATE TABLE run_kits (
  id integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  run_id integer NOT NULL REFERENCES runs,
  number integer NOT NULL CHECK (number > 0),
  serial text NOT NULL UNIQUE,
  state text NOT NULL DEFAULT 'waiting' CHECK (state IN ('waiting','cut','packed','sold','broken-down','cancelled')),
  shelf text NOT NULL DEFAULT '' CHECK (char_length(shelf) <= 40),
  packed_by integer REFERENCES people,
  packed_at timestamptz,
  UNIQUE (run_id, number)
);
CREATE INDEX run_kits_packed ON run_kits (run_id) WHERE state = 'packed';

CREATE TABLE run_lengths (
  id integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  run_id integer NOT NULL REFERENCES runs,
  run_kit_id integer NOT NULL REFERENCES run_kits,
  fabric_id integer NOT NULL REFERENCES fabrics,
  bolt_id integer REFERENCES bolts,
  length integer NOT NULL CHECK (length > 0),
  planned_width integer NOT NULL CHECK (planned_width > 0),
  -- order on the bolt-length list
  sequence integer NOT NULL,
  state text NOT NULL DEFAULT 'to-cut' CHECK (state IN ('to-cut','cut','short','cancelled')),
  cut_id integer UNIQUE REFERENCES cuts ON DELETE SET NULL,
  packed_at timestamptz,
  packed_by integer REFERENCES people
);
CREATE INDEX run_lengths_run ON run_lengths (run_id, sequence);
CREATE INDEX run_lengths_kit ON run_lengths (run_kit_id);
CREATE INDEX run_lengths_bolt ON run_lengths (bolt_id) WHERE state = 'to-cut';
ALTER TABLE cuts ADD FOREIGN KEY (run_length_id) REFERENCES run_lengths;
ALTER TABLE moves ADD FOREIGN KEY (run_kit_id) REFERENCES run_kits;

CREATE TABLE packed_notions (
  run_kit_id integer NOT NULL REFERENCES run_kits,
  notion_id integer NOT NULL REFERENCES notions,
  wanted integer NOT NULL CHECK (wanted > 0),
  count integer NOT NULL DEFAULT 0 CHECK (count >= 0 AND count <= wanted),
  PRIMARY KEY (run_kit_id, notion_id)
);

-- A reservation is rows: bolt, length, count, for whom. A held row fits on the bolt; a short one no longer does.
CREATE TABLE reservations (
  id integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  bolt_id integer NOT NULL REFERENCES bolts,
  length integer NOT NULL CHECK (length > 0),
  count integer NOT NULL CHECK (count >= 0),
  run_id integer REFERENCES runs,
  state text NOT NULL DEFAULT 'held' CHECK (state IN ('held','short','ended')),
  made_by integer REFERENCES people,
  made_at timestamptz NOT NULL DEFAULT now(),
  CHECK (count > 0 OR state = 'ended')
);
CREATE INDEX reservations_bolt ON reservations (bolt_id) WHERE state <> 'ended';
CREATE INDEX reservations_run ON reservations (run_id);

-- A scan claims a bolt for a station.
CREATE TABLE claims (
  bolt_id integer PRIMARY KEY REFERENCES bolts,
  station text NOT NULL CHECK (char_length(station) BETWEEN 1 AND 60),
  person_id integer NOT NULL REFERENCES people,
  run_id integer REFERENCES runs,
  claimed_at timestamptz NOT NULL DEFAULT now()
);

-- What a fact upset, for the manager.
CREATE TABLE exceptions (
  id integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  kind text NOT NULL CHECK (kind IN ('reservation-short','book-corrected','run-short','price-differs','kit-sold-twice','cut-elsewhere')),
  sentence text NOT NULL,
  bolt_id integer REFERENCES bolts,
  run_id integer REFERENCES runs,
  facts jsonb NOT NULL DEFAULT '{}',
  raised_at timestamptz NOT NULL DEFAULT now(),
  settled_at timestamptz,
  settled_by integer REFERENCES people,
  settlement text
);
CREATE INDEX exceptions_open ON exceptions (id) WHERE settled_at IS NULL;
`;
