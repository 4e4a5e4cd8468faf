-- One coherent set per fuel: price, efficiency and CO2 factor all belong to the calorific basis of the row. Mixing a
-- gross price with a net efficiency costs 5 to 11 per cent unseen. `confidence` is the lowest of the three.
CREATE TABLE fuel (
  id                    TEXT PRIMARY KEY CHECK (id GLOB '[a-z]*' AND id NOT GLOB '*[^a-z0-9_]*'),
  name                  TEXT NOT NULL CHECK (name <> ''),
  -- Illustrative: the user enters the tariff of the site.
  price_per_kwh         REAL CHECK (price_per_kwh BETWEEN 0 AND 100),
  price_low_per_kwh     REAL CHECK (price_low_per_kwh <= price_per_kwh),
  price_high_per_kwh    REAL CHECK (price_high_per_kwh >= price_per_kwh),
  price_confidence      TEXT CHECK (price_confidence IN ('found', 'memory', 'estimate')),
  efficiency            REAL NOT NULL CHECK (efficiency > 0 AND efficiency <= 1.2),
  efficiency_low        REAL NOT NULL CHECK (efficiency_low <= efficiency),
  efficiency_high       REAL NOT NULL CHECK (efficiency_high >= efficiency),
  -- The plant the efficiency is typical of.
  efficiency_of         TEXT NOT NULL,
  efficiency_confidence TEXT NOT NULL CHECK (efficiency_confidence IN ('found', 'memory', 'estimate')),
  co2_kg_per_kwh        REAL CHECK (co2_kg_per_kwh BETWEEN 0 AND 2),
  co2_confidence        TEXT CHECK (co2_confidence IN ('found', 'memory', 'estimate')),
  basis                 TEXT NOT NULL CHECK (basis IN ('HHV', 'LHV', 'electricity', 'delivered heat')),
  note                  TEXT NOT NULL,
  source                TEXT NOT NULL CHECK (source <> ''),
  confidence            TEXT NOT NULL CHECK (confidence IN ('found', 'memory', 'estimate')),
  origin                TEXT NOT NULL DEFAULT 'shipped' CHECK (origin IN ('shipped', 'user')),
  CHECK ((price_per_kwh IS NULL) = (price_confidence IS NULL)),
  CHECK ((co2_kg_per_kwh IS NULL) = (co2_confidence IS NULL))
) STRICT;
