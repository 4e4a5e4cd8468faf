-- Thicknesses that can be bought. A step above max_single_layer_m is a total that is built up from thinner pieces.
-- The inch series holds the nominal thickness, exactly 25.4 mm to the inch; what lies on the pipe is in inch_section.
CREATE TABLE thickness_step (
  material_id               TEXT NOT NULL REFERENCES material (id),
  form                      TEXT NOT NULL CHECK (form <> ''),
  series                    TEXT NOT NULL CHECK (series IN ('metric', 'inch')),
  thickness_m               REAL NOT NULL CHECK (thickness_m BETWEEN 0.001 AND 0.5),
  max_single_layer_m        REAL NOT NULL CHECK (max_single_layer_m BETWEEN 0.001 AND 0.5),
  single_layer_only         INTEGER NOT NULL CHECK (single_layer_only IN (0, 1)),
  layering_rule             TEXT NOT NULL,
  single_layer_limit_source TEXT NOT NULL,
  source                    TEXT NOT NULL CHECK (source <> ''),
  confidence                TEXT NOT NULL CHECK (confidence IN ('found', 'memory', 'estimate')),
  origin                    TEXT NOT NULL DEFAULT 'shipped' CHECK (origin IN ('shipped', 'user')),
  PRIMARY KEY (material_id, form, series, thickness_m),
  CHECK (single_layer_only = 0 OR thickness_m <= max_single_layer_m)
) STRICT;

-- Nominal inch thickness is not real thickness: outside diameters follow a nesting ladder, so one nominal inch is
-- thinner on one pipe and thicker on the next. `rigid` is sectional insulation, `flexible` closed-cell tube.
-- The actual thickness of a rigid section is counted from the pipe, that of a tube is its wall.
CREATE TABLE inch_section (
  system                   TEXT NOT NULL CHECK (system IN ('rigid', 'flexible')),
  tube_kind                TEXT NOT NULL CHECK (tube_kind IN ('pipe', 'copper tube')),
  pipe_label               TEXT NOT NULL,
  pipe_outer_diameter_m    REAL NOT NULL CHECK (pipe_outer_diameter_m BETWEEN 0.003 AND 3),
  section_inner_diameter_m REAL NOT NULL CHECK (section_inner_diameter_m >= pipe_outer_diameter_m),
  nominal_thickness_m      REAL NOT NULL CHECK (nominal_thickness_m BETWEEN 0.005 AND 0.2),
  section_outer_diameter_m REAL NOT NULL CHECK (section_outer_diameter_m > section_inner_diameter_m),
  actual_thickness_m       REAL NOT NULL CHECK (actual_thickness_m BETWEEN 0.005 AND 0.2),
  source                   TEXT NOT NULL CHECK (source <> ''),
  confidence               TEXT NOT NULL CHECK (confidence IN ('found', 'memory', 'estimate')),
  origin                   TEXT NOT NULL DEFAULT 'shipped' CHECK (origin IN ('shipped', 'user')),
  PRIMARY KEY (system, pipe_outer_diameter_m, nominal_thickness_m)
) STRICT;

-- The trade rules behind layers and mats, for the reasons the program gives.
CREATE TABLE layering_rule (
  id         TEXT PRIMARY KEY,
  topic      TEXT NOT NULL,
  rule       TEXT NOT NULL CHECK (rule <> ''),
  value      REAL,
  unit       TEXT NOT NULL,
  source     TEXT NOT NULL CHECK (source <> ''),
  confidence TEXT NOT NULL CHECK (confidence IN ('found', 'memory', 'estimate')),
  origin     TEXT NOT NULL DEFAULT 'shipped' CHECK (origin IN ('shipped', 'user'))
) STRICT;
