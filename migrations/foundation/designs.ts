/** Blocks, quilts and kit designs as immutable versions; drafts beside them. */
export const designs = `
CREATE TABLE blocks (
  id integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  slug text NOT NULL UNIQUE CHECK (slug ~ '^[a-z0-9-]{1,80}$'),
  name text NOT NULL CHECK (char_length(name) BETWEEN 1 AND 120),
  traditional boolean NOT NULL DEFAULT false,
  made_by integer REFERENCES people,
  made_at timestamptz NOT NULL DEFAULT now(),
  archived_at timestamptz
);

CREATE TABLE block_versions (
  id integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  block_id integer NOT NULL REFERENCES blocks,
  version integer NOT NULL CHECK (version > 0),
  name text NOT NULL,
  drawing jsonb NOT NULL,
  width integer NOT NULL CHECK (width > 0),
  height integer NOT NULL CHECK (height > 0),
  roles jsonb NOT NULL,
  core_version text NOT NULL,
  made_by integer REFERENCES people,
  made_at timestamptz NOT NULL DEFAULT now(),
  UNIQUE (block_id, version)
);

CREATE TABLE block_drafts (
  block_id integer NOT NULL REFERENCES blocks ON DELETE CASCADE,
  person_id integer NOT NULL REFERENCES people ON DELETE CASCADE,
  revision integer NOT NULL DEFAULT 1,
  drawing jsonb NOT NULL,
  width integer NOT NULL CHECK (width > 0),
  height integer NOT NULL CHECK (height > 0),
  roles jsonb NOT NULL,
  based_on integer REFERENCES block_versions,
  saved_at timestamptz NOT NULL DEFAULT now(),
  PRIMARY KEY (block_id, person_id)
);

CREATE TABLE quilts (
  id integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  slug text NOT NULL UNIQUE CHECK (slug ~ '^[a-z0-9-]{1,80}$'),
  name text NOT NULL CHECK (char_length(name) BETWEEN 1 AND 120),
  made_by integer REFERENCES people,
  made_at timestamptz NOT NULL DEFAULT now(),
  archived_at timestamptz
);

-- design: a QuiltDesign whose blocks name block versions; block_version_ids holds the same ids for joining.
CREATE TABLE quilt_versions (
  id integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  quilt_id integer NOT NULL REFERENCES quilts,
  version integer NOT NULL CHECK (version > 0),
  name text NOT NULL,
  design jsonb NOT NULL,
  block_version_ids integer[] NOT NULL,
  width integer NOT NULL CHECK (width > 0),
  height integer NOT NULL CHECK (height > 0),
  core_version text NOT NULL,
  made_by integer REFERENCES people,
  made_at timestamptz NOT NULL DEFAULT now(),
  UNIQUE (quilt_id, version)
);

CREATE TABLE kit_designs (
  id integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  slug text NOT NULL UNIQUE CHECK (slug ~ '^[a-z0-9-]{1,80}$'),
  name text NOT NULL CHECK (char_length(name) BETWEEN 1 AND 120),
  made_by integer REFERENCES people,
  made_at timestamptz NOT NULL DEFAULT now(),
  archived_at timestamptz
);

CREATE TABLE kit_versions (
  id integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  kit_design_id integer NOT NULL REFERENCES kit_designs,
  version integer NOT NULL CHECK (version > 0),
  name text NOT NULL,
  quilt_version_id integer NOT NULL REFERENCES quilt_versions,
  format text NOT NULL DEFAULT 'lengths' CHECK (format IN ('lengths','fat-quarters','pre-cut')),
  -- AllowanceRules and CuttingRules as they stood when the version was made
  allowance jsonb NOT NULL,
  rules jsonb NOT NULL,
  -- [{"notionId": 3, "count": 1}]
  notions jsonb NOT NULL DEFAULT '[]',
  labour_minutes integer NOT NULL DEFAULT 0 CHECK (labour_minutes BETWEEN 0 AND 10000),
  sheet_cost integer NOT NULL DEFAULT 0 CHECK (sheet_cost >= 0),
  small_parts boolean NOT NULL DEFAULT false,
  core_version text NOT NULL,
  made_by integer REFERENCES people,
  made_at timestamptz NOT NULL DEFAULT now(),
  UNIQUE (kit_design_id, version)
);

CREATE FUNCTION refuse_version_change() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  RAISE EXCEPTION 'a version in % is never changed', TG_TABLE_NAME USING ERRCODE = 'integrity_constraint_violation';
END $$;
CREATE TRIGGER block_versions_immutable BEFORE UPDATE OR DELETE ON block_versions FOR EACH ROW EXECUTE FUNCTION refuse_version_change();
CREATE TRIGGER quilt_versions_immutable BEFORE UPDATE OR DELETE ON quilt_versions FOR EACH ROW EXECUTE FUNCTION refuse_version_change();
CREATE TRIGGER kit_versions_immutable BEFORE UPDATE OR DELETE ON kit_versions FOR EACH ROW EXECUTE FUNCTION refuse_version_change();

CREATE TABLE suppliers (
  id integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  name text NOT NULL UNIQUE CHECK (char_length(name) BETWEEN 1 AND 120),
  email text NOT NULL DEFAULT ''
);

CREATE TABLE fabrics (
  id integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  slug text NOT NULL UNIQUE CHECK (slug ~ '^[a-z0-9-]{1,80}$'),
  name text NOT NULL CHECK (char_length(name) BETWEEN 1 AND 120),
  reference text NOT NULL DEFAULT '' CHECK (char_length(reference) <= 60),
  description text NOT NULL DEFAULT '' CHECK (char_length(description) <= 200),
  supplier_id integer REFERENCES suppliers,
  width integer NOT NULL CHECK (width > 0),
  usable_width integer NOT NULL CHECK (usable_width > 0),
  fibre text NOT NULL DEFAULT '' CHECK (char_length(fibre) <= 120),
  origin text NOT NULL DEFAULT '' CHECK (char_length(origin) <= 60),
  one_way boolean NOT NULL DEFAULT false,
  -- the fabric's drawn tile under public/fabrics, and its colour as #rrggbb
  tile text NOT NULL DEFAULT '' CHECK (char_length(tile) <= 200),
  colour char(7) NOT NULL CHECK (colour ~ '^#[0-9a-fA-F]{6}$'),
  value text NOT NULL DEFAULT 'medium' CHECK (value IN ('light','medium','dark')),
  -- 1/10 000 of the major unit per yard or metre, as the shop measures
  price integer NOT NULL CHECK (price >= 0),
  cost integer NOT NULL CHECK (cost >= 0),
  low_mark integer NOT NULL DEFAULT 0 CHECK (low_mark >= 0),
  in_print boolean NOT NULL DEFAULT true,
  made_at timestamptz NOT NULL DEFAULT now(),
  CHECK (usable_width <= width)
);

CREATE TABLE notions (
  id integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  number text NOT NULL UNIQUE CHECK (char_length(number) BETWEEN 1 AND 40),
  gtin text UNIQUE CHECK (gtin ~ '^[0-9]{8,14}$'),
  name text NOT NULL CHECK (char_length(name) BETWEEN 1 AND 120),
  price integer NOT NULL CHECK (price >= 0),
  cost integer NOT NULL CHECK (cost >= 0),
  -- cached: the ledger's sum at the shelf
  on_hand integer NOT NULL DEFAULT 0
);

-- A colourway of a kit version: fabrics to roles, the price, and the lengths that a kit takes.
CREATE TABLE colourways (
  id integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  kit_version_id integer NOT NULL REFERENCES kit_versions,
  name text NOT NULL CHECK (char_length(name) BETWEEN 1 AND 120),
  -- role to fabric id
  fabrics jsonb NOT NULL,
  price integer NOT NULL CHECK (price >= 0),
  plan_hash text NOT NULL,
  core_version text NOT NULL,
  on_sale boolean NOT NULL DEFAULT true,
  made_by integer REFERENCES people,
  made_at timestamptz NOT NULL DEFAULT now(),
  UNIQUE (kit_version_id, name)
);

CREATE TABLE colourway_lengths (
  colourway_id integer NOT NULL REFERENCES colourways ON DELETE CASCADE,
  fabric_id integer NOT NULL REFERENCES fabrics,
  cut_length integer NOT NULL CHECK (cut_length > 0),
  planned_width integer NOT NULL CHECK (planned_width > 0),
  PRIMARY KEY (colourway_id, fabric_id)
);

-- Plans under the hash of their input and the version of the core.
CREATE TABLE plans (
  input_hash text NOT NULL,
  core_version text NOT NULL,
  kind text NOT NULL CHECK (kind IN ('kit','bolts')),
  input jsonb NOT NULL,
  result jsonb NOT NULL,
  made_at timestamptz NOT NULL DEFAULT now(),
  PRIMARY KEY (input_hash, core_version)
);
`;
