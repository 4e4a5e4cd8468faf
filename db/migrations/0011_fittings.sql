-- Two conventions for the loss of valves and flange pairs, in two tables, since they must not be mixed.
-- Area: the bare surface of the fitting, which loses heat as the same area of bare pipe does.
CREATE TABLE fitting_area (
  item                  TEXT NOT NULL CHECK (item IN ('flange-pair', 'valve')),
  dn                    INTEGER NOT NULL CHECK (dn > 0),
  pipe_outer_diameter_m REAL NOT NULL CHECK (pipe_outer_diameter_m BETWEEN 0.003 AND 3),
  pressure_class        INTEGER NOT NULL CHECK (pressure_class > 0),
  area_m2               REAL NOT NULL CHECK (area_m2 > 0),
  note                  TEXT NOT NULL,
  source                TEXT NOT NULL CHECK (source <> ''),
  confidence            TEXT NOT NULL CHECK (confidence IN ('found', 'memory', 'estimate')),
  origin                TEXT NOT NULL DEFAULT 'shipped' CHECK (origin IN ('shipped', 'user')),
  PRIMARY KEY (item, pressure_class, pipe_outer_diameter_m)
) STRICT;

-- Length: metres of the adjoining INSULATED pipe that lose as much as the fitting does, bare or lagged, with the range
-- of the guideline. The outside diameter is that of EN 10220 for the DN.
CREATE TABLE fitting_length (
  item                  TEXT NOT NULL CHECK (item IN ('flange-pair', 'valve')),
  dn                    INTEGER NOT NULL CHECK (dn > 0),
  pipe_outer_diameter_m REAL NOT NULL CHECK (pipe_outer_diameter_m BETWEEN 0.003 AND 3),
  medium_c              REAL NOT NULL CHECK (medium_c BETWEEN -273.15 AND 2000),
  lagged                INTEGER NOT NULL CHECK (lagged IN (0, 1)),
  place                 TEXT NOT NULL CHECK (place IN ('indoors', 'outdoors', 'any')),
  length_m              REAL NOT NULL CHECK (length_m BETWEEN length_low_m AND length_high_m),
  length_low_m          REAL NOT NULL CHECK (length_low_m > 0),
  length_high_m         REAL NOT NULL,
  note                  TEXT NOT NULL,
  source                TEXT NOT NULL CHECK (source <> ''),
  confidence            TEXT NOT NULL CHECK (confidence IN ('found', 'memory', 'estimate')),
  origin                TEXT NOT NULL DEFAULT 'shipped' CHECK (origin IN ('shipped', 'user')),
  PRIMARY KEY (item, lagged, place, pipe_outer_diameter_m, medium_c)
) STRICT;

-- What hangers and supports in the lagging add to the loss of the straight pipe.
CREATE TABLE support_allowance (
  place         TEXT PRIMARY KEY CHECK (place IN ('indoors', 'outdoors')),
  loss_fraction REAL NOT NULL CHECK (loss_fraction BETWEEN 0 AND 5),
  note          TEXT NOT NULL,
  source        TEXT NOT NULL CHECK (source <> ''),
  confidence    TEXT NOT NULL CHECK (confidence IN ('found', 'memory', 'estimate')),
  origin        TEXT NOT NULL DEFAULT 'shipped' CHECK (origin IN ('shipped', 'user'))
) STRICT;
