/** Bolts, the chain of cuts, flaws, and the double-entry ledger of every inch. */
export const stock = `
-- A bolt is a line from its first free end: 0 is where cutting began, put_up is the core.
CREATE TABLE bolts (
  id integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  tag text NOT NULL UNIQUE,
  fabric_id integer NOT NULL REFERENCES fabrics,
  lot text NOT NULL CHECK (char_length(lot) BETWEEN 1 AND 40),
  shelf text NOT NULL DEFAULT '' CHECK (char_length(shelf) <= 40),
  -- null: the fabric's own
  usable_width integer CHECK (usable_width > 0),
  invoiced integer CHECK (invoiced > 0),
  put_up integer NOT NULL CHECK (put_up > 0),
  -- cached: where the last cut ended, and the sum of what is held
  cut_edge integer NOT NULL DEFAULT 0 CHECK (cut_edge >= 0),
  reserved integer NOT NULL DEFAULT 0 CHECK (reserved >= 0),
  received_at timestamptz NOT NULL DEFAULT now(),
  retired_at timestamptz,
  CHECK (cut_edge <= put_up)
);
CREATE INDEX bolts_fabric ON bolts (fabric_id) WHERE retired_at IS NULL;
CREATE INDEX bolts_shelf ON bolts (shelf, id) WHERE retired_at IS NULL;

CREATE TABLE flaws (
  id integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  bolt_id integer NOT NULL REFERENCES bolts,
  starts_at integer NOT NULL CHECK (starts_at >= 0),
  ends_at integer NOT NULL,
  note text NOT NULL DEFAULT '' CHECK (char_length(note) <= 200),
  noted_by integer REFERENCES people,
  noted_at timestamptz NOT NULL DEFAULT now(),
  CHECK (ends_at > starts_at)
);
CREATE INDEX flaws_bolt ON flaws (bolt_id);

-- The chain: each cut begins where the one before it ended, so overlap, gaps and the removal of any but the last are refused.
CREATE TABLE cuts (
  id integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  bolt_id integer NOT NULL REFERENCES bolts,
  starts_at integer NOT NULL CHECK (starts_at >= 0),
  ends_at integer NOT NULL,
  begins_after integer GENERATED ALWAYS AS (NULLIF(starts_at, 0)) STORED,
  purpose text NOT NULL CHECK (purpose IN ('kit','sale','waste','mis-cut','sample','correction','piece')),
  run_length_id integer,
  person_id integer REFERENCES people,
  request_id uuid,
  at timestamptz NOT NULL DEFAULT now(),
  note text NOT NULL DEFAULT '' CHECK (char_length(note) <= 200),
  CHECK (ends_at > starts_at),
  UNIQUE (bolt_id, starts_at),
  UNIQUE (bolt_id, ends_at),
  FOREIGN KEY (bolt_id, begins_after) REFERENCES cuts (bolt_id, ends_at)
);
CREATE INDEX cuts_run_length ON cuts (run_length_id) WHERE run_length_id IS NOT NULL;

-- A remnant, return or fat quarter: a piece of its own with a tag.
CREATE TABLE pieces (
  id integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  tag text NOT NULL UNIQUE,
  fabric_id integer NOT NULL REFERENCES fabrics,
  bolt_id integer REFERENCES bolts,
  lot text NOT NULL,
  kind text NOT NULL CHECK (kind IN ('remnant','fat-quarter','flat-fold','return')),
  length integer NOT NULL CHECK (length > 0),
  width integer NOT NULL CHECK (width > 0),
  shelf text NOT NULL DEFAULT '',
  state text NOT NULL DEFAULT 'on-shelf' CHECK (state IN ('on-shelf','sold','used','written-off')),
  made_at timestamptz NOT NULL DEFAULT now()
);

-- Double entry: every move goes from a place to a place. Fabric in bolt-length (1/160 mm), the rest in counts.
CREATE TABLE moves (
  id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  at timestamptz NOT NULL DEFAULT now(),
  person_id integer REFERENCES people,
  request_id uuid,
  item text NOT NULL CHECK (item IN ('fabric','notion','kit')),
  fabric_id integer REFERENCES fabrics,
  notion_id integer REFERENCES notions,
  run_kit_id integer,
  quantity integer NOT NULL CHECK (quantity > 0),
  from_place text NOT NULL,
  from_id integer,
  to_place text NOT NULL,
  to_id integer,
  reason text NOT NULL CHECK (char_length(reason) BETWEEN 1 AND 200),
  cut_id integer,
  reverses_id bigint UNIQUE REFERENCES moves,
  CHECK (from_place IN ('supplier','bolt','piece','bag','bench','kit','shelf','customer','waste','sample','found-or-lost')),
  CHECK (to_place IN ('supplier','bolt','piece','bag','bench','kit','shelf','customer','waste','sample','found-or-lost')),
  CHECK (from_place NOT IN ('bolt','piece','bag','kit') OR from_id IS NOT NULL),
  CHECK (to_place NOT IN ('bolt','piece','bag','kit') OR to_id IS NOT NULL),
  CHECK ((from_place, COALESCE(from_id, 0)) IS DISTINCT FROM (to_place, COALESCE(to_id, 0))),
  CHECK ((item = 'fabric') = (fabric_id IS NOT NULL) AND (item = 'notion') = (notion_id IS NOT NULL) AND (item = 'kit') = (run_kit_id IS NOT NULL))
);
CREATE INDEX moves_from ON moves (from_place, from_id);
CREATE INDEX moves_to ON moves (to_place, to_id);
CREATE INDEX moves_cut ON moves (cut_id) WHERE cut_id IS NOT NULL;
CREATE TRIGGER moves_append_only BEFORE UPDATE OR DELETE ON moves FOR EACH ROW EXECUTE FUNCTION refuse_change();
CREATE TRIGGER moves_no_truncate BEFORE TRUNCATE ON moves FOR EACH STATEMENT EXECUTE FUNCTION refuse_change();
`;
