CREATE TABLE pipe_size (
  system           TEXT NOT NULL CHECK (system <> ''),
  standard         TEXT NOT NULL CHECK (standard <> ''),
  wall_material_id TEXT NOT NULL REFERENCES wall_material (id),
  label            TEXT NOT NULL CHECK (label <> ''),
  dn               INTEGER CHECK (dn > 0),
  nps_in           REAL CHECK (nps_in > 0),
  series           TEXT NOT NULL CHECK (series <> ''),
  outer_diameter_m REAL NOT NULL CHECK (outer_diameter_m BETWEEN 0.003 AND 3),
  wall_m           REAL NOT NULL CHECK (wall_m BETWEEN 0.0003 AND 0.2),
  inner_diameter_m REAL NOT NULL CHECK (inner_diameter_m > 0),
  note             TEXT NOT NULL,
  source           TEXT NOT NULL CHECK (source <> ''),
  confidence       TEXT NOT NULL CHECK (confidence IN ('found', 'memory', 'estimate')),
  origin           TEXT NOT NULL DEFAULT 'shipped' CHECK (origin IN ('shipped', 'user')),
  PRIMARY KEY (system, label, series),
  CHECK (inner_diameter_m < outer_diameter_m),
  -- Tables print three figures each rounded by itself: they must agree within the rounding.
  CHECK (abs(wall_m - (outer_diameter_m - inner_diameter_m) / 2) <= 2e-5)
) STRICT;

CREATE TABLE duct_size (
  standard          TEXT NOT NULL CHECK (standard <> ''),
  label             TEXT NOT NULL CHECK (label <> ''),
  shape             TEXT NOT NULL CHECK (shape IN ('round', 'rectangular')),
  diameter_m        REAL CHECK (diameter_m BETWEEN 0.02 AND 5),
  width_m           REAL CHECK (width_m BETWEEN 0.02 AND 10),
  height_m          REAL CHECK (height_m BETWEEN 0.02 AND 10),
  -- Usual sheet by size; less sure than the size itself.
  sheet_thickness_m REAL NOT NULL CHECK (sheet_thickness_m BETWEEN 0.0002 AND 0.01),
  preferred         INTEGER NOT NULL CHECK (preferred IN (0, 1)),
  sheet_confidence  TEXT NOT NULL CHECK (sheet_confidence IN ('found', 'memory', 'estimate')),
  source            TEXT NOT NULL CHECK (source <> ''),
  confidence        TEXT NOT NULL CHECK (confidence IN ('found', 'memory', 'estimate')),
  origin            TEXT NOT NULL DEFAULT 'shipped' CHECK (origin IN ('shipped', 'user')),
  PRIMARY KEY (standard, label),
  CHECK ((shape = 'round' AND diameter_m IS NOT NULL AND width_m IS NULL AND height_m IS NULL)
      OR (shape = 'rectangular' AND diameter_m IS NULL AND width_m IS NOT NULL AND height_m IS NOT NULL))
) STRICT;
