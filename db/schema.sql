CREATE TABLE burn_threshold (
  surface    TEXT NOT NULL CHECK (surface <> ''),
  contact_s  REAL NOT NULL CHECK (contact_s BETWEEN 0.5 AND 28800),
  lower_c    REAL NOT NULL CHECK (lower_c BETWEEN 43 AND 200),
  -- Null where the standard gives one value or the upper end is not known.
  upper_c    REAL CHECK (upper_c >= lower_c),
  grade      TEXT NOT NULL CHECK (grade IN ('H', 'M', 'L')),
  note       TEXT NOT NULL,
  source     TEXT NOT NULL CHECK (source <> ''),
  confidence TEXT NOT NULL CHECK (confidence IN ('found', 'memory', 'estimate')),
  origin     TEXT NOT NULL DEFAULT 'shipped' CHECK (origin IN ('shipped', 'user')),
  PRIMARY KEY (surface, contact_s)
) STRICT;

CREATE TABLE code_factor (
  table_id   TEXT NOT NULL REFERENCES code_table (id),
  factor     REAL NOT NULL CHECK (factor > 0 AND factor <= 10),
  applies_to TEXT NOT NULL CHECK (applies_to <> ''),
  source     TEXT NOT NULL CHECK (source <> ''),
  confidence TEXT NOT NULL CHECK (confidence IN ('found', 'memory', 'estimate')),
  origin     TEXT NOT NULL DEFAULT 'shipped' CHECK (origin IN ('shipped', 'user')),
  PRIMARY KEY (table_id, applies_to)
) STRICT;

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
  origin                   TEXT NOT NULL DEFAULT 'shipped' CHECK (origin IN ('shipped', 'user')), vapour_tight TEXT CHECK (vapour_tight IN ('yes', 'if sealed', 'no')),
  CHECK (coating IS NULL OR touch_class = 'coated-metal')
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

CREATE TABLE layer_factor (
  layers      INTEGER PRIMARY KEY CHECK (layers BETWEEN 1 AND 9),
  factor      REAL NOT NULL CHECK (factor >= 1),
  factor_low  REAL NOT NULL CHECK (factor_low <= factor),
  factor_high REAL NOT NULL CHECK (factor_high >= factor),
  source      TEXT NOT NULL CHECK (source <> ''),
  confidence  TEXT NOT NULL CHECK (confidence IN ('found', 'memory', 'estimate')),
  origin      TEXT NOT NULL DEFAULT 'shipped' CHECK (origin IN ('shipped', 'user'))
) STRICT;

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

CREATE TABLE seed_state (
  id           INTEGER PRIMARY KEY CHECK (id = 1),
  content_hash TEXT NOT NULL
) STRICT;

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

CREATE TABLE support_allowance (
  place         TEXT PRIMARY KEY CHECK (place IN ('indoors', 'outdoors')),
  loss_fraction REAL NOT NULL CHECK (loss_fraction BETWEEN 0 AND 5),
  note          TEXT NOT NULL,
  source        TEXT NOT NULL CHECK (source <> ''),
  confidence    TEXT NOT NULL CHECK (confidence IN ('found', 'memory', 'estimate')),
  origin        TEXT NOT NULL DEFAULT 'shipped' CHECK (origin IN ('shipped', 'user'))
) STRICT;

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

CREATE UNIQUE INDEX one_code_row ON code_row (table_id, ifnull(size_min_m, 0), ifnull(fluid_min_c, -300),
  ifnull(conductivity_min_w_per_m_k, 0), quantity);

CREATE UNIQUE INDEX one_default_series ON conductivity_series (material_id) WHERE is_default = 1;

CREATE UNIQUE INDEX one_medium_state
  ON medium_state (medium_id, ifnull(mass_fraction, 0), temperature_c, ifnull(pressure_absolute_pa, 0));
