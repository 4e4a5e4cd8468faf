-- Insulation materials. `confidence` covers density and service range (with the source); the columns that are only
-- recollection say so in their own confidence columns.
CREATE TABLE material (
  id                                  TEXT PRIMARY KEY CHECK (id GLOB '[a-z]*' AND id NOT GLOB '*[^a-z0-9_]*'),
  name                                TEXT NOT NULL CHECK (name <> ''),
  family                              TEXT NOT NULL,
  form                                TEXT NOT NULL,
  product_standards                   TEXT NOT NULL,
  density_kg_per_m3                   REAL NOT NULL CHECK (density_kg_per_m3 BETWEEN 1 AND 3000),
  density_min_kg_per_m3               REAL NOT NULL,
  density_max_kg_per_m3               REAL NOT NULL,
  specific_heat_j_per_kg_k            REAL NOT NULL CHECK (specific_heat_j_per_kg_k BETWEEN 100 AND 5000),
  service_min_c                       REAL NOT NULL CHECK (service_min_c >= -273.15),
  service_max_c                       REAL NOT NULL CHECK (service_max_c <= 2000),
  vapour_resistance                   REAL CHECK (vapour_resistance >= 1),
  -- Mats do not lie close on small pipes: not on outside diameters of this or less.
  not_on_diameters_up_to_m            REAL CHECK (not_on_diameters_up_to_m > 0),
  chloride_note                       TEXT NOT NULL,
  reaction_to_fire                    TEXT NOT NULL,
  usual_forms                         TEXT NOT NULL,
  compression_note                    TEXT NOT NULL,
  note                                TEXT NOT NULL,
  specific_heat_and_vapour_confidence TEXT NOT NULL CHECK (specific_heat_and_vapour_confidence IN ('found', 'memory', 'estimate')),
  chloride_fire_forms_confidence      TEXT NOT NULL CHECK (chloride_fire_forms_confidence IN ('found', 'memory', 'estimate')),
  source                              TEXT NOT NULL CHECK (source <> ''),
  confidence                          TEXT NOT NULL CHECK (confidence IN ('found', 'memory', 'estimate')),
  origin                              TEXT NOT NULL DEFAULT 'shipped' CHECK (origin IN ('shipped', 'user')),
  CHECK (service_min_c < service_max_c),
  CHECK (density_kg_per_m3 BETWEEN density_min_kg_per_m3 AND density_max_kg_per_m3)
) STRICT;

-- A material has one default curve and may have others: specification maxima, fresh foam, measured pipe systems.
-- `point`: λ(T) itself, to be integrated over a layer. `mean`: measured across a whole lagged pipe, so each value is
-- already a mean over the layer and must not be integrated again.
CREATE TABLE conductivity_series (
  material_id TEXT NOT NULL REFERENCES material (id),
  name        TEXT NOT NULL CHECK (name <> ''),
  is_default  INTEGER NOT NULL CHECK (is_default IN (0, 1)),
  basis       TEXT NOT NULL CHECK (basis IN ('point', 'mean')),
  source      TEXT NOT NULL CHECK (source <> ''),
  -- The lowest confidence of its points.
  confidence  TEXT NOT NULL CHECK (confidence IN ('found', 'memory', 'estimate')),
  origin      TEXT NOT NULL DEFAULT 'shipped' CHECK (origin IN ('shipped', 'user')),
  PRIMARY KEY (material_id, name)
) STRICT;

CREATE UNIQUE INDEX one_default_series ON conductivity_series (material_id) WHERE is_default = 1;

CREATE TABLE conductivity_point (
  material_id            TEXT NOT NULL,
  series                 TEXT NOT NULL,
  temperature_c          REAL NOT NULL CHECK (temperature_c BETWEEN -273.15 AND 2000),
  conductivity_w_per_m_k REAL NOT NULL CHECK (conductivity_w_per_m_k BETWEEN 0.001 AND 5),
  -- What kind of value the source gives: typical, maximum, derived, measured system.
  value_kind             TEXT NOT NULL,
  note                   TEXT NOT NULL,
  source                 TEXT NOT NULL CHECK (source <> ''),
  confidence             TEXT NOT NULL CHECK (confidence IN ('found', 'memory', 'estimate')),
  origin                 TEXT NOT NULL DEFAULT 'shipped' CHECK (origin IN ('shipped', 'user')),
  PRIMARY KEY (material_id, series, temperature_c),
  FOREIGN KEY (material_id, series) REFERENCES conductivity_series (material_id, name)
) STRICT;
