/** The shop's own settings: one row, and its tax rates with their dates. */
export const shop = `
CREATE TABLE shops (
  id integer PRIMARY KEY DEFAULT 1 CHECK (id = 1),
  name text NOT NULL CHECK (char_length(name) BETWEEN 1 AND 120),
  address text NOT NULL DEFAULT '' CHECK (char_length(address) <= 400),
  email text NOT NULL DEFAULT '',
  currency char(3) NOT NULL,
  locale text NOT NULL DEFAULT 'en-US',
  time_zone text NOT NULL DEFAULT 'UTC',
  system text NOT NULL CHECK (system IN ('yards','metres')),
  paper text NOT NULL DEFAULT 'letter' CHECK (paper IN ('letter','a4')),
  -- lengths in 1/160 mm
  seam_allowance integer NOT NULL CHECK (seam_allowance > 0),
  ruler_step integer NOT NULL CHECK (ruler_step > 0),
  selling_step integer NOT NULL CHECK (selling_step > 0),
  least_cut integer NOT NULL CHECK (least_cut >= 0),
  straightening integer NOT NULL CHECK (straightening >= 0),
  mis_cut_basis_points integer NOT NULL DEFAULT 200 CHECK (mis_cut_basis_points BETWEEN 0 AND 5000),
  end_of_bolt integer NOT NULL DEFAULT 0 CHECK (end_of_bolt >= 0),
  saleable_remnant integer NOT NULL CHECK (saleable_remnant > 0),
  labour_rate integer NOT NULL DEFAULT 0 CHECK (labour_rate >= 0),
  tax_by text NOT NULL DEFAULT 'line' CHECK (tax_by IN ('line','sale')),
  tax_included boolean NOT NULL DEFAULT false,
  cash_step integer NOT NULL DEFAULT 1 CHECK (cash_step > 0),
  updated_at timestamptz NOT NULL DEFAULT now()
);

CREATE TABLE tax_rates (
  id integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
  name text NOT NULL CHECK (char_length(name) BETWEEN 1 AND 60),
  goods text NOT NULL CHECK (goods IN ('fabric','kit','notion')),
  -- 1/10 000 of a percent: 6.5 % is 65 000
  rate integer NOT NULL CHECK (rate BETWEEN 0 AND 1000000),
  valid_from date NOT NULL,
  valid_to date,
  CHECK (valid_to IS NULL OR valid_to > valid_from)
);
CREATE INDEX tax_rates_goods ON tax_rates (goods, valid_from);
`;
