CREATE TABLE medium_state (
  medium_id              TEXT NOT NULL CHECK (medium_id GLOB '[a-z]*' AND medium_id NOT GLOB '*[^a-z0-9_]*'),
  name                   TEXT NOT NULL CHECK (name <> ''),
  phase                  TEXT NOT NULL CHECK (phase IN ('liquid', 'vapour', 'gas')),
  -- Share of the dissolved substance by mass; null for a pure medium.
  mass_fraction          REAL CHECK (mass_fraction > 0 AND mass_fraction < 1),
  temperature_c          REAL NOT NULL CHECK (temperature_c BETWEEN -273.15 AND 2000),
  pressure_absolute_pa   REAL CHECK (pressure_absolute_pa > 0),
  density_kg_per_m3      REAL CHECK (density_kg_per_m3 > 0),
  specific_heat_j_per_kg_k REAL CHECK (specific_heat_j_per_kg_k BETWEEN 100 AND 200000),
  conductivity_w_per_m_k REAL CHECK (conductivity_w_per_m_k > 0),
  dynamic_viscosity_pa_s REAL CHECK (dynamic_viscosity_pa_s > 0),
  enthalpy_j_per_kg      REAL,
  note                   TEXT NOT NULL,
  source                 TEXT NOT NULL CHECK (source <> ''),
  confidence             TEXT NOT NULL CHECK (confidence IN ('found', 'memory', 'estimate')),
  origin                 TEXT NOT NULL DEFAULT 'shipped' CHECK (origin IN ('shipped', 'user'))
) STRICT;

-- An index, not a primary key: a pure liquid has neither fraction nor pressure, and keys may not hold nulls.
CREATE UNIQUE INDEX one_medium_state
  ON medium_state (medium_id, ifnull(mass_fraction, 0), temperature_c, ifnull(pressure_absolute_pa, 0));

CREATE TABLE steam_state (
  pressure_absolute_pa           REAL PRIMARY KEY CHECK (pressure_absolute_pa BETWEEN 611 AND 22064000),
  temperature_c                  REAL NOT NULL CHECK (temperature_c BETWEEN 0 AND 373.946),
  latent_heat_j_per_kg           REAL NOT NULL CHECK (latent_heat_j_per_kg > 0),
  enthalpy_liquid_j_per_kg       REAL NOT NULL,
  enthalpy_vapour_j_per_kg       REAL NOT NULL,
  density_liquid_kg_per_m3       REAL NOT NULL CHECK (density_liquid_kg_per_m3 > density_vapour_kg_per_m3),
  density_vapour_kg_per_m3       REAL NOT NULL CHECK (density_vapour_kg_per_m3 > 0),
  specific_heat_liquid_j_per_kg_k REAL NOT NULL CHECK (specific_heat_liquid_j_per_kg_k > 0),
  specific_heat_vapour_j_per_kg_k REAL NOT NULL CHECK (specific_heat_vapour_j_per_kg_k > 0),
  source                         TEXT NOT NULL CHECK (source <> ''),
  confidence                     TEXT NOT NULL CHECK (confidence IN ('found', 'memory', 'estimate')),
  origin                         TEXT NOT NULL DEFAULT 'shipped' CHECK (origin IN ('shipped', 'user'))
) STRICT;
