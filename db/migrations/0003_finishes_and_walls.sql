-- Outer surfaces. Emissivity is the main figure of a row; the aged value serves loss and frost, the new one touch and
-- damp, since a bright jacket runs hotter and sweats sooner.
CREATE TABLE finish (
  id                       TEXT PRIMARY KEY CHECK (id GLOB '[a-z]*' AND id NOT GLOB '*[^a-z0-9_]*'),
  name                     TEXT NOT NULL CHECK (name <> ''),
  category                 TEXT NOT NULL,
  emissivity_new           REAL NOT NULL CHECK (emissivity_new > 0 AND emissivity_new <= 1),
  emissivity_aged          REAL NOT NULL CHECK (emissivity_aged > 0 AND emissivity_aged <= 1),
  emissivity_design        REAL NOT NULL CHECK (emissivity_design > 0 AND emissivity_design <= 1),
  touch_class              TEXT NOT NULL CHECK (touch_class IN ('smooth-metal', 'coated-metal', 'ceramic-glass-stone', 'plastic', 'wood')),
  -- Kind of coat on a coated metal. Without a known thickness the surface counts as bare metal.
  coating                  TEXT CHECK (coating <> ''),
  coating_thickness_m      REAL CHECK (coating_thickness_m BETWEEN 1e-6 AND 1e-2),
  surface_max_c            REAL CHECK (surface_max_c BETWEEN 0 AND 1500),
  indoor                   INTEGER NOT NULL CHECK (indoor IN (0, 1)),
  -- 1 where it stands the weather as it is; a condition ("with weather coat") makes it 0 and stands in where_note.
  outdoor                  INTEGER NOT NULL CHECK (outdoor IN (0, 1)),
  where_note               TEXT NOT NULL,
  vapour_tightness         TEXT NOT NULL,
  solar_absorptance_new    REAL NOT NULL CHECK (solar_absorptance_new > 0 AND solar_absorptance_new <= 1),
  solar_absorptance_aged   REAL NOT NULL CHECK (solar_absorptance_aged > 0 AND solar_absorptance_aged <= 1),
  solar_confidence         TEXT NOT NULL CHECK (solar_confidence IN ('found', 'memory', 'estimate')),
  conductivity_w_per_m_k   REAL NOT NULL CHECK (conductivity_w_per_m_k BETWEEN 0.001 AND 1000),
  density_kg_per_m3        REAL NOT NULL CHECK (density_kg_per_m3 BETWEEN 1 AND 25000),
  specific_heat_j_per_kg_k REAL NOT NULL CHECK (specific_heat_j_per_kg_k BETWEEN 100 AND 5000),
  thickness_min_m          REAL CHECK (thickness_min_m > 0),
  thickness_max_m          REAL CHECK (thickness_max_m >= thickness_min_m),
  properties_source        TEXT NOT NULL,
  note                     TEXT NOT NULL,
  source                   TEXT NOT NULL CHECK (source <> ''),
  confidence               TEXT NOT NULL CHECK (confidence IN ('found', 'memory', 'estimate')),
  origin                   TEXT NOT NULL DEFAULT 'shipped' CHECK (origin IN ('shipped', 'user')),
  CHECK (coating IS NULL OR touch_class = 'coated-metal')
) STRICT;

-- Pipe and duct walls, also as bare surfaces. The touch class follows from the kind of material; the sources do not
-- state it.
CREATE TABLE wall_material (
  id                       TEXT PRIMARY KEY CHECK (id GLOB '[a-z]*' AND id NOT GLOB '*[^a-z0-9_]*'),
  name                     TEXT NOT NULL CHECK (name <> ''),
  -- Temperature that conductivity and specific heat of this row belong to.
  temperature_c            REAL NOT NULL,
  conductivity_w_per_m_k   REAL NOT NULL CHECK (conductivity_w_per_m_k BETWEEN 0.01 AND 1000),
  density_kg_per_m3        REAL NOT NULL CHECK (density_kg_per_m3 BETWEEN 100 AND 25000),
  specific_heat_j_per_kg_k REAL NOT NULL CHECK (specific_heat_j_per_kg_k BETWEEN 100 AND 5000),
  emissivity_clean         REAL NOT NULL CHECK (emissivity_clean > 0 AND emissivity_clean <= 1),
  -- As found in service, and the range seen.
  emissivity_bare          REAL NOT NULL CHECK (emissivity_bare > 0 AND emissivity_bare <= 1),
  emissivity_bare_min      REAL NOT NULL CHECK (emissivity_bare_min > 0 AND emissivity_bare_min <= emissivity_bare),
  emissivity_bare_max      REAL NOT NULL CHECK (emissivity_bare_max >= emissivity_bare AND emissivity_bare_max <= 1),
  touch_class              TEXT NOT NULL CHECK (touch_class IN ('smooth-metal', 'coated-metal', 'ceramic-glass-stone', 'plastic', 'wood')),
  note                     TEXT NOT NULL,
  source                   TEXT NOT NULL CHECK (source <> ''),
  confidence               TEXT NOT NULL CHECK (confidence IN ('found', 'memory', 'estimate')),
  origin                   TEXT NOT NULL DEFAULT 'shipped' CHECK (origin IN ('shipped', 'user'))
) STRICT;

CREATE TABLE wall_material_point (
  wall_material_id         TEXT NOT NULL REFERENCES wall_material (id),
  temperature_c            REAL NOT NULL CHECK (temperature_c BETWEEN -273.15 AND 2000),
  conductivity_w_per_m_k   REAL NOT NULL CHECK (conductivity_w_per_m_k BETWEEN 0.01 AND 1000),
  specific_heat_j_per_kg_k REAL NOT NULL CHECK (specific_heat_j_per_kg_k BETWEEN 100 AND 5000),
  source                   TEXT NOT NULL CHECK (source <> ''),
  confidence               TEXT NOT NULL CHECK (confidence IN ('found', 'memory', 'estimate')),
  origin                   TEXT NOT NULL DEFAULT 'shipped' CHECK (origin IN ('shipped', 'user')),
  PRIMARY KEY (wall_material_id, temperature_c)
) STRICT;
