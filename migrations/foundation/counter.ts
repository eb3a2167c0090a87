/** Tills, cash, sales and their lines. */
export const counter = `
CREATE TABLE tills (
  id integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  name text NOT NULL UNIQUE CHECK (char_length(name) BETWEEN 1 AND 60)
);

CREATE TABLE till_sessions (
  id integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  till_id integer NOT NULL REFERENCES tills,
  opened_by integer NOT NULL REFERENCES people,
  opened_at timestamptz NOT NULL DEFAULT now(),
  closed_by integer REFERENCES people,
  closed_at timestamptz,
  -- counted blind; the difference is written down, not corrected
  counted integer CHECK (counted >= 0),
  expected integer,
  CHECK ((closed_at IS NULL) = (counted IS NULL))
);
CREATE UNIQUE INDEX till_sessions_open ON till_sessions (till_id) WHERE closed_at IS NULL;

CREATE TABLE sales (
  id integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  receipt text NOT NULL UNIQUE,
  till_session_id integer NOT NULL REFERENCES till_sessions,
  person_id integer NOT NULL REFERENCES people,
  request_id uuid NOT NULL UNIQUE,
  -- when it happened at the till; recorded_at is when it reached the book
  at timestamptz NOT NULL DEFAULT now(),
  recorded_at timestamptz NOT NULL DEFAULT now(),
  goods integer NOT NULL CHECK (goods >= 0),
  tax integer NOT NULL CHECK (tax >= 0),
  rounding integer NOT NULL DEFAULT 0,
  total integer NOT NULL CHECK (total >= 0),
  currency char(3) NOT NULL
);

CREATE TABLE sale_lines (
  id integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  sale_id integer NOT NULL REFERENCES sales,
  position integer NOT NULL,
  item text NOT NULL CHECK (item IN ('fabric','kit','notion')),
  description text NOT NULL,
  fabric_id integer REFERENCES fabrics,
  bolt_id integer REFERENCES bolts,
  run_kit_id integer REFERENCES run_kits,
  notion_id integer REFERENCES notions,
  cut_id integer REFERENCES cuts,
  length integer CHECK (length > 0),
  count integer NOT NULL DEFAULT 1 CHECK (count > 0),
  unit_price integer NOT NULL CHECK (unit_price >= 0),
  amount integer NOT NULL CHECK (amount >= 0),
  tax integer NOT NULL CHECK (tax >= 0),
  UNIQUE (sale_id, position)
);
CREATE UNIQUE INDEX sale_lines_kit ON sale_lines (run_kit_id) WHERE run_kit_id IS NOT NULL;

CREATE TABLE tenders (
  id integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  sale_id integer NOT NULL REFERENCES sales,
  kind text NOT NULL CHECK (kind IN ('cash','card','gift-card','store-credit')),
  amount integer NOT NULL CHECK (amount > 0),
  given integer NOT NULL CHECK (given >= amount),
  change_given integer NOT NULL DEFAULT 0 CHECK (change_given >= 0),
  CHECK (given = amount + change_given)
);

-- Every cash movement has a reason; positive goes into the drawer.
CREATE TABLE cash_moves (
  id bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  till_session_id integer NOT NULL REFERENCES till_sessions,
  amount integer NOT NULL CHECK (amount <> 0),
  kind text NOT NULL CHECK (kind IN ('float','sale','refund','pay-in','pay-out')),
  reason text NOT NULL CHECK (char_length(reason) BETWEEN 1 AND 200),
  sale_id integer REFERENCES sales,
  person_id integer NOT NULL REFERENCES people,
  request_id uuid,
  at timestamptz NOT NULL DEFAULT now()
);
CREATE INDEX cash_moves_session ON cash_moves (till_session_id);
CREATE TRIGGER cash_moves_append_only BEFORE UPDATE OR DELETE ON cash_moves FOR EACH ROW EXECUTE FUNCTION refuse_change();
`;
