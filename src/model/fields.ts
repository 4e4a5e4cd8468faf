/**
 * Every value a run can carry: one line per field, read by the CSV reader, the schema, the window and the
 * documents alike. Inside the program values are SI with temperatures in °C.
 *
 * To add a column: add its line here, then use it in `resolve/`.
 */
import type { Quantity } from './quantities.ts'

interface Base<K extends string = string> {
  /** Name inside the program; its unit ends the name. */
  readonly key: K
  /** Header of the CSV column; its unit ends the name. */
  readonly column: string
  /** What people read in the window. */
  readonly label: string
}

export interface NumberField<K extends string = string> extends Base<K> {
  readonly kind: 'number'
  readonly quantity: Quantity
  /** Allowed range in the SI unit of the key, both ends allowed. */
  readonly min: number
  readonly max: number
  readonly whole?: true
}
export interface TextField<K extends string = string> extends Base<K> {
  readonly kind: 'text'
  readonly maxLength: number
}
export interface ChoiceField<K extends string = string, C extends string = string> extends Base<K> {
  readonly kind: 'choice'
  readonly choices: readonly C[]
}
export interface FlagField<K extends string = string> extends Base<K> {
  readonly kind: 'flag'
}
export type Field = NumberField | TextField | ChoiceField | FlagField

const number = <K extends string>(
  key: K,
  column: string,
  label: string,
  quantity: Quantity,
  min: number,
  max: number,
): NumberField<K> => ({ key, column, label, kind: 'number', quantity, min, max })

/** How many of something: a whole number. */
const count = <K extends string>(key: K, label: string): NumberField<K> => ({
  ...number(key, key, label, 'count', 0, 10_000),
  whole: true,
})

const text = <K extends string>(
  key: K,
  column: string,
  label: string,
  maxLength: number,
): TextField<K> => ({ key, column, label, kind: 'text', maxLength })

const choice = <K extends string, C extends string>(
  key: K,
  column: string,
  label: string,
  choices: readonly C[],
): ChoiceField<K, C> => ({ key, column, label, kind: 'choice', choices })

const flag = <K extends string>(key: K, column: string, label: string): FlagField<K> => ({
  key,
  column,
  label,
  kind: 'flag',
})

export const shapes = ['pipe', 'round-duct', 'rect-duct', 'flat', 'sphere', 'vessel'] as const
export const orientations = ['horizontal', 'vertical', 'inclined', 'up', 'down'] as const
export const headForms = ['domed', 'flat'] as const
export const methods = ['detailed', 'simplified'] as const
export const fittingStates = ['bare', 'lagged'] as const
export const stepSeries = ['metric', 'inch', 'both'] as const
export const media = ['water', 'steam', 'air', 'glycol', 'oil', 'other'] as const
export const touchClasses = [
  'smooth-metal',
  'coated-metal',
  'ceramic-glass-stone',
  'plastic',
  'wood',
] as const

export const fields = [
  text('tag', 'tag', 'Tag', 60),
  text('description', 'description', 'Run', 200),
  text('place', 'place', 'Place', 80),
  text('service', 'service', 'Service', 80),
  text('group', 'group', 'Group', 80),

  choice('shape', 'shape', 'Shape', shapes),
  text('size', 'size', 'Size', 40),
  number('outerDiameterM', 'od_mm', 'Outside diameter', 'size', 0.001, 20),
  number('wallM', 'wall_mm', 'Wall', 'size', 0.0001, 0.5),
  text('pipeMaterial', 'pipe_material', 'Pipe material', 60),
  number('widthM', 'width_mm', 'Width', 'size', 0.01, 50),
  number('heightM', 'height_mm', 'Height', 'size', 0.01, 50),
  number('lengthM', 'length_m', 'Length', 'length', 0, 1e6),
  number('areaM2', 'area_m2', 'Area', 'area', 0, 1e6),
  choice('orientation', 'orientation', 'Lies', orientations),
  number('riseM', 'rise_m', 'Rise', 'length', 0.05, 500),
  choice('heads', 'heads', 'Heads', headForms),
  number('buryDepthM', 'bury_depth_m', 'Buried, to its axis', 'length', 0.05, 50),
  number('soilWPerMK', 'soil_w_mk', 'Soil conducts', 'conductivity', 0.1, 5),
  count('bends', 'Bends'),
  count('tees', 'Tees'),
  count('reducers', 'Reducers'),
  count('flanges', 'Flange pairs'),
  count('valves', 'Valves'),
  count('strainers', 'Strainers'),
  count('supports', 'Supports'),
  count('ends', 'Open ends'),
  choice('fittings', 'fittings', 'Fittings are', fittingStates),

  choice('medium', 'medium', 'What flows', media),
  number('mediumC', 'medium_c', 'Medium', 'temperature', -200, 1000),
  number('mediumMaxC', 'medium_max_c', 'Medium, hottest', 'temperature', -200, 1000),
  number('mediumMinC', 'medium_min_c', 'Medium, coldest', 'temperature', -200, 1000),
  number('pressureGaugePa', 'pressure_bar_g', 'Steam pressure', 'gaugePressure', -0.95e5, 217e5),

  number('flowKgPerS', 'flow_kg_s', 'Flow', 'massFlow', 1e-6, 1e5),
  number('velocityMPerS', 'velocity_m_s', 'Air velocity inside', 'speed', 0.01, 60),
  number(
    'heatCapacityJPerKgK',
    'heat_capacity_j_kgk',
    'Heat capacity',
    'heatCapacity',
    100,
    20_000,
  ),
  number('insideFilmWPerM2K', 'inside_film_w_m2k', 'Film inside', 'filmCoefficient', 0.5, 1e5),

  number('airC', 'air_c', 'Air', 'temperature', -70, 200),
  number('surroundingsC', 'surroundings_c', 'Surroundings', 'temperature', -100, 400),
  number('windMPerS', 'wind_m_s', 'Wind', 'speed', 0, 60),
  number('humidity', 'humidity_pct', 'Humidity', 'percentage', 0.01, 1),
  number('altitudeM', 'altitude_m', 'Altitude', 'length', -500, 6000),
  number('solarWPerM2', 'solar_w_m2', 'Sun on the surface', 'heatFlux', 0, 1400),
  number('skyView', 'sky_view', 'Clear sky seen, share', 'fraction', 0, 1),
  number('filmWPerM2K', 'film_w_m2k', 'Film outside', 'filmCoefficient', 0.5, 500),
  text('monthlyAirC', 'monthly_air_c', 'Air, by the month', 160),
  number('touchAirC', 'touch_air_c', 'Air, hottest day', 'temperature', -70, 200),
  number('dampAirC', 'damp_air_c', 'Air, most humid', 'temperature', -40, 80),
  number('frostAirC', 'frost_air_c', 'Air, coldest', 'temperature', -70, 100),
  number('frostWindMPerS', 'frost_wind_m_s', 'Wind, coldest', 'speed', 0, 60),

  text('material', 'material', 'Lagging', 60),
  text('layers', 'layers', 'Layers', 400),
  number('conductivityWPerMK', 'conductivity_w_mk', 'Conductivity', 'conductivity', 0.001, 5),
  number('thicknessM', 'thickness_mm', 'Fixed thickness', 'size', 0, 1),
  text('finish', 'finish', 'Finish', 60),
  number('emissivity', 'emissivity', 'Emissivity', 'fraction', 0.01, 1),
  number('bareEmissivity', 'bare_emissivity', 'Emissivity, bare', 'fraction', 0.01, 1),
  choice('steps', 'steps', 'Thickness steps', stepSeries),
  choice('method', 'method', 'Film method', methods),

  number('maxSurfaceC', 'max_surface_c', 'Surface, at most', 'temperature', -50, 400),
  flag('reach', 'reach', 'Within reach'),
  text('reachReason', 'reach_reason', 'Why out of reach', 200),
  number('contactS', 'contact_s', 'Contact time', 'duration', 0.5, 2_592_000),
  choice('touchClass', 'touch_class', 'Touch class', touchClasses),
  number('maxLossWPerM', 'max_loss_w_m', 'Loss, at most', 'heatLossPerLength', 0.01, 1e6),
  number('maxLossWPerM2', 'max_loss_w_m2', 'Loss, at most', 'heatFlux', 0.01, 1e6),
  number('dewMarginK', 'dew_margin_k', 'Dew-point margin', 'temperatureDifference', 0, 20),

  number('frostHours', 'frost_hours', 'Must not freeze for', 'hours', 0.01, 10_000),
  number('frostStartC', 'frost_start_c', 'Water at first', 'temperature', 0, 100),
  number('frostFraction', 'frost_fraction', 'Ice allowed, share', 'fraction', 0, 1),
  number('maxDropK', 'max_drop_k', 'Drop, at most', 'temperatureDifference', 0.001, 500),
  text('codeTable', 'code_table', 'Code table', 60),
  number('codeFactor', 'code_factor', 'Factor on the code', 'fraction', 0.05, 10),
  number('maxOuterDiameterM', 'max_od_mm', 'Overall, at most', 'size', 0.005, 30),

  number('measuredSurfaceC', 'measured_surface_c', 'Surface, measured', 'temperature', -200, 1000),
  number('surveyMediumC', 'survey_medium_c', 'Medium that day', 'temperature', -200, 1000),
  number('surveyAirC', 'survey_air_c', 'Air that day', 'temperature', -70, 200),
  number(
    'surveySurroundingsC',
    'survey_surroundings_c',
    'Surroundings that day',
    'temperature',
    -100,
    400,
  ),
  number('surveyWindMPerS', 'survey_wind_m_s', 'Wind that day', 'speed', 0, 60),
  number('surveyEmissivity', 'survey_emissivity', 'Emissivity, as found', 'fraction', 0.01, 1),
  number(
    'surveyToleranceK',
    'survey_tolerance_k',
    'Thermometer, ±',
    'temperatureDifference',
    0,
    50,
  ),

  flag('money', 'money', 'Weigh the cost'),
  text('fuel', 'fuel', 'Fuel', 60),
  number('hoursPerYear', 'hours_per_year', 'Hours a year', 'hoursPerYear', 0, 8784),
  number('fuelPricePerKWh', 'fuel_price_per_kwh', 'Fuel price', 'pricePerEnergy', 0, 100),
  number('efficiency', 'efficiency', 'Efficiency', 'fraction', 0.05, 1.2),
  number('cop', 'cop', 'Cooling COP', 'fraction', 0.1, 20),
  number('discount', 'discount', 'Discount rate', 'fraction', -0.2, 1),
  number('growth', 'growth', 'Price growth', 'fraction', -0.2, 1),
  { ...number('lifeYears', 'life_years', 'Life', 'years', 1, 100), whole: true },
  text('currency', 'currency', 'Currency', 8),
] as const

type FieldOf = (typeof fields)[number]
export type FieldKey = FieldOf['key']
type ValueOf<F> = F extends NumberField
  ? number
  : F extends FlagField
    ? boolean
    : F extends ChoiceField<string, infer C>
      ? C
      : string

/** The values of one run; what is not given is absent. SI units, temperatures in °C. */
export type RunValues = { [F in FieldOf as F['key']]?: ValueOf<F> }

const byKey = new Map<string, Field>(fields.map((field) => [field.key, field]))

export function fieldOf(key: FieldKey): Field {
  const field = byKey.get(key)
  if (!field) throw new Error(`No field ${key}`)
  return field
}
