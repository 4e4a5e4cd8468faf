-- What codes and laws ask for, by size and temperature of the medium. Facts with their edition; each table is to be
-- verified against the reader's own copy, and `warning` says so.
CREATE TABLE code_table (
  -- Ids as people type them in a list, e.g. ashrae-90.1-2010-heating.
  id           TEXT PRIMARY KEY CHECK (id GLOB '[a-z]*' AND id NOT GLOB '*[^a-z0-9.-]*'),
  name         TEXT NOT NULL CHECK (name <> ''),
  edition      TEXT NOT NULL CHECK (edition <> ''),
  service      TEXT NOT NULL CHECK (service <> ''),
  -- The measure of the pipe that the size bands count.
  size_basis   TEXT NOT NULL CHECK (size_basis IN ('nominal', 'outer-diameter', 'inner-diameter', 'any')),
  -- A value on the border of two bands belongs to the band above it or below it. The outermost ends belong to the table.
  size_border  TEXT NOT NULL CHECK (size_border IN ('band-above', 'band-below')),
  fluid_border TEXT NOT NULL CHECK (fluid_border IN ('band-above', 'band-below')),
  -- How a thickness carries over to another conductivity.
  conversion   TEXT NOT NULL CHECK (conversion IN ('conductivity-range', 'equal-loss', 'interpolate', 'none')),
  note         TEXT NOT NULL,
  warning      TEXT NOT NULL CHECK (warning <> ''),
  source       TEXT NOT NULL CHECK (source <> ''),
  confidence   TEXT NOT NULL CHECK (confidence IN ('found', 'memory', 'estimate')),
  origin       TEXT NOT NULL DEFAULT 'shipped' CHECK (origin IN ('shipped', 'user'))
) STRICT;

-- One cell: a band of sizes and of temperatures of the medium (null: open), and what is asked for there.
CREATE TABLE code_row (
  table_id                   TEXT NOT NULL REFERENCES code_table (id),
  size_min_m                 REAL CHECK (size_min_m >= 0),
  size_max_m                 REAL CHECK (size_max_m >= size_min_m),
  fluid_min_c                REAL CHECK (fluid_min_c >= -273.15),
  fluid_max_c                REAL CHECK (fluid_max_c >= fluid_min_c),
  -- Conductivity the thickness is for, as a range or one value twice, at a mean temperature.
  conductivity_min_w_per_m_k REAL CHECK (conductivity_min_w_per_m_k > 0),
  conductivity_max_w_per_m_k REAL CHECK (conductivity_max_w_per_m_k >= conductivity_min_w_per_m_k),
  rating_mean_c              REAL CHECK (rating_mean_c BETWEEN -273.15 AND 1000),
  quantity                   TEXT NOT NULL CHECK (quantity IN ('min-thickness', 'max-loss', 'min-resistance')),
  -- m, W/m (of a heat gain its amount) or m2K/W; null where a rule stands for the number.
  value                      REAL CHECK (value > 0),
  rule                       TEXT CHECK (rule IN ('inner-diameter')),
  -- What a loss is stated for. Emissivity null: that of the finish.
  condition_medium_c         REAL CHECK (condition_medium_c BETWEEN -273.15 AND 2000),
  condition_air_c            REAL CHECK (condition_air_c BETWEEN -70 AND 200),
  condition_wind_m_per_s     REAL CHECK (condition_wind_m_per_s BETWEEN 0 AND 100),
  condition_emissivity       REAL CHECK (condition_emissivity > 0 AND condition_emissivity <= 1),
  note                       TEXT NOT NULL,
  source                     TEXT NOT NULL CHECK (source <> ''),
  confidence                 TEXT NOT NULL CHECK (confidence IN ('found', 'memory', 'estimate')),
  origin                     TEXT NOT NULL DEFAULT 'shipped' CHECK (origin IN ('shipped', 'user')),
  CHECK ((value IS NULL) <> (rule IS NULL)),
  CHECK (rule IS NULL OR quantity = 'min-thickness'),
  CHECK ((conductivity_min_w_per_m_k IS NULL) = (conductivity_max_w_per_m_k IS NULL)),
  CHECK ((quantity = 'min-thickness') = (conductivity_min_w_per_m_k IS NOT NULL)),
  CHECK ((quantity = 'max-loss') = (condition_medium_c IS NOT NULL)),
  CHECK ((quantity = 'max-loss') = (condition_air_c IS NOT NULL)),
  CHECK ((quantity = 'max-loss') = (condition_wind_m_per_s IS NOT NULL)),
  CHECK (quantity = 'max-loss' OR condition_emissivity IS NULL)
) STRICT;

-- An index, not a primary key: keys may not hold nulls.
CREATE UNIQUE INDEX one_code_row ON code_row (table_id, ifnull(size_min_m, 0), ifnull(fluid_min_c, -300),
  ifnull(conductivity_min_w_per_m_k, 0), quantity);

-- Factors that a code puts on its own thicknesses, with the case they are for.
CREATE TABLE code_factor (
  table_id   TEXT NOT NULL REFERENCES code_table (id),
  factor     REAL NOT NULL CHECK (factor > 0 AND factor <= 10),
  applies_to TEXT NOT NULL CHECK (applies_to <> ''),
  source     TEXT NOT NULL CHECK (source <> ''),
  confidence TEXT NOT NULL CHECK (confidence IN ('found', 'memory', 'estimate')),
  origin     TEXT NOT NULL DEFAULT 'shipped' CHECK (origin IN ('shipped', 'user')),
  PRIMARY KEY (table_id, applies_to)
) STRICT;
