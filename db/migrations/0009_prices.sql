-- A price shape, not a price list: per metre of run, material = per_m3 * volume + per_m2 * outer area + per_m, and
-- labour hours = (labour_hours_per_m + labour_hours_per_m2 * outer area) * layer factor. All shipped figures are
-- illustrative until a firm enters its own; no currency belongs to them.
CREATE TABLE price_model (
  material_id         TEXT PRIMARY KEY REFERENCES material (id),
  per_m3              REAL NOT NULL CHECK (per_m3 >= 0),
  per_m2              REAL NOT NULL CHECK (per_m2 >= 0),
  per_m               REAL NOT NULL CHECK (per_m >= 0),
  labour_hours_per_m  REAL NOT NULL CHECK (labour_hours_per_m >= 0),
  labour_hours_per_m2 REAL NOT NULL CHECK (labour_hours_per_m2 >= 0),
  waste_fraction      REAL NOT NULL CHECK (waste_fraction BETWEEN 0 AND 1),
  note                TEXT NOT NULL,
  source              TEXT NOT NULL CHECK (source <> ''),
  confidence          TEXT NOT NULL CHECK (confidence IN ('found', 'memory', 'estimate')),
  origin              TEXT NOT NULL DEFAULT 'shipped' CHECK (origin IN ('shipped', 'user'))
) STRICT;

CREATE TABLE finish_price (
  finish_id           TEXT PRIMARY KEY REFERENCES finish (id),
  per_m2              REAL NOT NULL CHECK (per_m2 >= 0),
  labour_hours_per_m  REAL NOT NULL CHECK (labour_hours_per_m >= 0),
  labour_hours_per_m2 REAL NOT NULL CHECK (labour_hours_per_m2 >= 0),
  waste_fraction      REAL NOT NULL CHECK (waste_fraction BETWEEN 0 AND 1),
  note                TEXT NOT NULL,
  source              TEXT NOT NULL CHECK (source <> ''),
  confidence          TEXT NOT NULL CHECK (confidence IN ('found', 'memory', 'estimate')),
  origin              TEXT NOT NULL DEFAULT 'shipped' CHECK (origin IN ('shipped', 'user'))
) STRICT;

CREATE TABLE labour_rate (
  id                 TEXT PRIMARY KEY,
  rate_per_hour      REAL NOT NULL CHECK (rate_per_hour >= 0),
  rate_low_per_hour  REAL NOT NULL CHECK (rate_low_per_hour <= rate_per_hour),
  rate_high_per_hour REAL NOT NULL CHECK (rate_high_per_hour >= rate_per_hour),
  currency           TEXT NOT NULL CHECK (length(currency) BETWEEN 1 AND 8),
  note               TEXT NOT NULL,
  source             TEXT NOT NULL CHECK (source <> ''),
  confidence         TEXT NOT NULL CHECK (confidence IN ('found', 'memory', 'estimate')),
  origin             TEXT NOT NULL DEFAULT 'shipped' CHECK (origin IN ('shipped', 'user'))
) STRICT;

-- What a second and third layer do to the labour of the whole.
CREATE TABLE layer_factor (
  layers      INTEGER PRIMARY KEY CHECK (layers BETWEEN 1 AND 9),
  factor      REAL NOT NULL CHECK (factor >= 1),
  factor_low  REAL NOT NULL CHECK (factor_low <= factor),
  factor_high REAL NOT NULL CHECK (factor_high >= factor),
  source      TEXT NOT NULL CHECK (source <> ''),
  confidence  TEXT NOT NULL CHECK (confidence IN ('found', 'memory', 'estimate')),
  origin      TEXT NOT NULL DEFAULT 'shipped' CHECK (origin IN ('shipped', 'user'))
) STRICT;
