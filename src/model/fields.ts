/**
 * Every value a run can carry: one line per field, read by the CSV reader, the schema, the window and the
 * documents alike. Inside the program values are SI with temperatures in °C; `perUnit` says how many SI units one
 * unit of the CSV column is (0.001 for mm, 0.01 for per cent).
 *
 * To add a column: add its line here, then use it in `resolve/`.
 */

interface Base {
  /** Name inside the program; its unit ends the name. */
  readonly key: string
  /** Header of the CSV column; its unit ends the name. */
  readonly column: string
  /** What people read in the window. */
  readonly label: string
}

export interface NumberField extends Base {
  readonly kind: 'number'
  readonly quantity: Quantity
  /** Allowed range in the SI unit of the key, both ends allowed. */
  readonly min: number
  readonly max: number
  readonly whole?: true
}
export interface TextField extends Base {
  readonly kind: 'text'
  readonly maxLength: number
}
export interface ChoiceField extends Base {
  readonly kind: 'choice'
  readonly choices: readonly string[]
}
export interface FlagField extends Base {
  readonly kind: 'flag'
}
export type Field = NumberField | TextField | ChoiceField | FlagField

/** How a CSV number becomes the SI number: value * perUnit + offset. `twin` is the US form of the same column. */
interface QuantityForm {
  readonly unit: string
  readonly suffix: string
  readonly perUnit: number
  readonly twin?: {
    readonly unit: string
    readonly suffix: string
    readonly toSi: (value: number) => number
  }
}

const inch = { unit: 'in', suffix: 'in', toSi: (value: number) => value * 0.0254 }
const foot = { unit: 'ft', suffix: 'ft', toSi: (value: number) => value * 0.3048 }
const fahrenheit = { unit: '°F', suffix: 'f', toSi: (value: number) => ((value - 32) * 5) / 9 }

export const quantities = {
  length: { unit: 'm', suffix: 'm', perUnit: 1, twin: foot },
  size: { unit: 'mm', suffix: 'mm', perUnit: 0.001, twin: inch },
  area: { unit: 'm²', suffix: 'm2', perUnit: 1 },
  temperature: { unit: '°C', suffix: 'c', perUnit: 1, twin: fahrenheit },
  temperatureDifference: { unit: 'K', suffix: 'k', perUnit: 1 },
  gaugePressure: { unit: 'bar g', suffix: 'bar_g', perUnit: 1e5 },
  speed: { unit: 'm/s', suffix: 'm_s', perUnit: 1 },
  percentage: { unit: '%', suffix: 'pct', perUnit: 0.01 },
  fraction: { unit: '', suffix: '', perUnit: 1 },
  conductivity: { unit: 'W/mK', suffix: 'w_mk', perUnit: 1 },
  heatLossPerLength: { unit: 'W/m', suffix: 'w_m', perUnit: 1 },
  heatFlux: { unit: 'W/m²', suffix: 'w_m2', perUnit: 1 },
  duration: { unit: 's', suffix: 's', perUnit: 1 },
  hoursPerYear: { unit: 'h/year', suffix: 'hours_per_year', perUnit: 1 },
  years: { unit: 'years', suffix: 'years', perUnit: 1 },
  pricePerEnergy: { unit: 'per kWh', suffix: 'per_kwh', perUnit: 1 },
} as const satisfies Record<string, QuantityForm>
export type Quantity = keyof typeof quantities

export const shapes = ['pipe', 'round-duct', 'rect-duct', 'flat'] as const
export const orientations = ['horizontal', 'vertical', 'up', 'down'] as const
export const methods = ['detailed'] as const
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
  { key: 'tag', column: 'tag', label: 'Tag', kind: 'text', maxLength: 60 },
  { key: 'description', column: 'description', label: 'Run', kind: 'text', maxLength: 200 },
  { key: 'place', column: 'place', label: 'Place', kind: 'text', maxLength: 80 },
  { key: 'service', column: 'service', label: 'Service', kind: 'text', maxLength: 80 },
  { key: 'group', column: 'group', label: 'Group', kind: 'text', maxLength: 80 },

  { key: 'shape', column: 'shape', label: 'Shape', kind: 'choice', choices: shapes },
  { key: 'size', column: 'size', label: 'Size', kind: 'text', maxLength: 40 },
  {
    key: 'outerDiameterM',
    column: 'od_mm',
    label: 'Outside diameter',
    kind: 'number',
    quantity: 'size',
    min: 0.001,
    max: 20,
  },
  {
    key: 'wallM',
    column: 'wall_mm',
    label: 'Wall',
    kind: 'number',
    quantity: 'size',
    min: 0.0001,
    max: 0.5,
  },
  {
    key: 'pipeMaterial',
    column: 'pipe_material',
    label: 'Pipe material',
    kind: 'text',
    maxLength: 60,
  },
  {
    key: 'widthM',
    column: 'width_mm',
    label: 'Width',
    kind: 'number',
    quantity: 'size',
    min: 0.01,
    max: 50,
  },
  {
    key: 'heightM',
    column: 'height_mm',
    label: 'Height',
    kind: 'number',
    quantity: 'size',
    min: 0.01,
    max: 50,
  },
  {
    key: 'lengthM',
    column: 'length_m',
    label: 'Length',
    kind: 'number',
    quantity: 'length',
    min: 0,
    max: 1e6,
  },
  {
    key: 'areaM2',
    column: 'area_m2',
    label: 'Area',
    kind: 'number',
    quantity: 'area',
    min: 0,
    max: 1e6,
  },
  {
    key: 'orientation',
    column: 'orientation',
    label: 'Lies',
    kind: 'choice',
    choices: orientations,
  },
  {
    key: 'riseM',
    column: 'rise_m',
    label: 'Rise',
    kind: 'number',
    quantity: 'length',
    min: 0.05,
    max: 500,
  },

  { key: 'medium', column: 'medium', label: 'Medium', kind: 'choice', choices: media },
  {
    key: 'mediumC',
    column: 'medium_c',
    label: 'Medium',
    kind: 'number',
    quantity: 'temperature',
    min: -200,
    max: 1000,
  },
  {
    key: 'mediumMaxC',
    column: 'medium_max_c',
    label: 'Medium, hottest',
    kind: 'number',
    quantity: 'temperature',
    min: -200,
    max: 1000,
  },
  {
    key: 'mediumMinC',
    column: 'medium_min_c',
    label: 'Medium, coldest',
    kind: 'number',
    quantity: 'temperature',
    min: -200,
    max: 1000,
  },
  {
    key: 'pressureGaugePa',
    column: 'pressure_bar_g',
    label: 'Steam pressure',
    kind: 'number',
    quantity: 'gaugePressure',
    min: -0.95e5,
    max: 217e5,
  },

  {
    key: 'airC',
    column: 'air_c',
    label: 'Air',
    kind: 'number',
    quantity: 'temperature',
    min: -70,
    max: 200,
  },
  {
    key: 'surroundingsC',
    column: 'surroundings_c',
    label: 'Surroundings',
    kind: 'number',
    quantity: 'temperature',
    min: -100,
    max: 400,
  },
  {
    key: 'windMPerS',
    column: 'wind_m_s',
    label: 'Wind',
    kind: 'number',
    quantity: 'speed',
    min: 0,
    max: 60,
  },
  {
    key: 'humidity',
    column: 'humidity_pct',
    label: 'Humidity',
    kind: 'number',
    quantity: 'percentage',
    min: 0.01,
    max: 1,
  },
  {
    key: 'altitudeM',
    column: 'altitude_m',
    label: 'Altitude',
    kind: 'number',
    quantity: 'length',
    min: -500,
    max: 6000,
  },
  {
    key: 'touchAirC',
    column: 'touch_air_c',
    label: 'Air, hottest day',
    kind: 'number',
    quantity: 'temperature',
    min: -70,
    max: 200,
  },
  {
    key: 'dampAirC',
    column: 'damp_air_c',
    label: 'Air, most humid',
    kind: 'number',
    quantity: 'temperature',
    min: -40,
    max: 80,
  },

  { key: 'material', column: 'material', label: 'Lagging', kind: 'text', maxLength: 60 },
  { key: 'layers', column: 'layers', label: 'Layers', kind: 'text', maxLength: 400 },
  {
    key: 'conductivityWPerMK',
    column: 'conductivity_w_mk',
    label: 'Conductivity',
    kind: 'number',
    quantity: 'conductivity',
    min: 0.001,
    max: 5,
  },
  {
    key: 'thicknessM',
    column: 'thickness_mm',
    label: 'Fixed thickness',
    kind: 'number',
    quantity: 'size',
    min: 0,
    max: 1,
  },
  { key: 'finish', column: 'finish', label: 'Finish', kind: 'text', maxLength: 60 },
  {
    key: 'emissivity',
    column: 'emissivity',
    label: 'Emissivity',
    kind: 'number',
    quantity: 'fraction',
    min: 0.01,
    max: 1,
  },
  {
    key: 'bareEmissivity',
    column: 'bare_emissivity',
    label: 'Emissivity, bare',
    kind: 'number',
    quantity: 'fraction',
    min: 0.01,
    max: 1,
  },
  { key: 'steps', column: 'steps', label: 'Thickness steps', kind: 'choice', choices: stepSeries },
  { key: 'method', column: 'method', label: 'Film method', kind: 'choice', choices: methods },

  {
    key: 'maxSurfaceC',
    column: 'max_surface_c',
    label: 'Surface, at most',
    kind: 'number',
    quantity: 'temperature',
    min: -50,
    max: 400,
  },
  { key: 'reach', column: 'reach', label: 'Within reach', kind: 'flag' },
  {
    key: 'reachReason',
    column: 'reach_reason',
    label: 'Why out of reach',
    kind: 'text',
    maxLength: 200,
  },
  {
    key: 'contactS',
    column: 'contact_s',
    label: 'Contact time',
    kind: 'number',
    quantity: 'duration',
    min: 0.5,
    max: 2_592_000,
  },
  {
    key: 'touchClass',
    column: 'touch_class',
    label: 'Touch class',
    kind: 'choice',
    choices: touchClasses,
  },
  {
    key: 'maxLossWPerM',
    column: 'max_loss_w_m',
    label: 'Loss, at most',
    kind: 'number',
    quantity: 'heatLossPerLength',
    min: 0.01,
    max: 1e6,
  },
  {
    key: 'maxLossWPerM2',
    column: 'max_loss_w_m2',
    label: 'Loss, at most',
    kind: 'number',
    quantity: 'heatFlux',
    min: 0.01,
    max: 1e6,
  },
  {
    key: 'dewMarginK',
    column: 'dew_margin_k',
    label: 'Dew-point margin',
    kind: 'number',
    quantity: 'temperatureDifference',
    min: 0,
    max: 20,
  },

  { key: 'money', column: 'money', label: 'Weigh the cost', kind: 'flag' },
  { key: 'fuel', column: 'fuel', label: 'Fuel', kind: 'text', maxLength: 60 },
  {
    key: 'hoursPerYear',
    column: 'hours_per_year',
    label: 'Hours a year',
    kind: 'number',
    quantity: 'hoursPerYear',
    min: 0,
    max: 8784,
  },
  {
    key: 'fuelPricePerKWh',
    column: 'fuel_price_per_kwh',
    label: 'Fuel price',
    kind: 'number',
    quantity: 'pricePerEnergy',
    min: 0,
    max: 100,
  },
  {
    key: 'efficiency',
    column: 'efficiency',
    label: 'Efficiency',
    kind: 'number',
    quantity: 'fraction',
    min: 0.05,
    max: 1.2,
  },
  {
    key: 'cop',
    column: 'cop',
    label: 'Cooling COP',
    kind: 'number',
    quantity: 'fraction',
    min: 0.1,
    max: 20,
  },
  {
    key: 'discount',
    column: 'discount',
    label: 'Discount rate',
    kind: 'number',
    quantity: 'fraction',
    min: -0.2,
    max: 1,
  },
  {
    key: 'growth',
    column: 'growth',
    label: 'Price growth',
    kind: 'number',
    quantity: 'fraction',
    min: -0.2,
    max: 1,
  },
  {
    key: 'lifeYears',
    column: 'life_years',
    label: 'Life',
    kind: 'number',
    quantity: 'years',
    min: 1,
    max: 100,
    whole: true,
  },
  { key: 'currency', column: 'currency', label: 'Currency', kind: 'text', maxLength: 8 },
] as const satisfies readonly Field[]

type FieldOf = (typeof fields)[number]
export type FieldKey = FieldOf['key']
type ValueOf<F> = F extends { kind: 'number' }
  ? number
  : F extends { kind: 'flag' }
    ? boolean
    : F extends { kind: 'choice'; choices: readonly (infer C)[] }
      ? C
      : string

/** The values of one run; what is not given is absent. SI units, temperatures in °C. */
export type RunValues = { [F in FieldOf as F['key']]?: ValueOf<F> }

/** Columns of the finished program that this version does not compute yet: refused by name, never ignored. */
export const laterColumns = [
  'solar_w_m2',
  'frost_air_c',
  'frost_wind_m_s',
  'frost_hours',
  'frost_start_c',
  'frost_fraction',
  'max_drop_k',
  'flow_kg_s',
  'code_table',
  'code_factor',
  'max_od_mm',
  'measured_surface_c',
  'bends',
  'tees',
  'flanges',
  'valves',
  'supports',
  'reducers',
  'ends',
  'strainers',
  'fittings',
  'bury_depth_m',
  'soil_w_mk',
  'floor_height_m',
  'access',
  'survey_air_c',
  'survey_surroundings_c',
  'survey_wind_m_s',
  'survey_medium_c',
  'survey_emissivity',
  'survey_tolerance_k',
  'state',
  'contact_situation',
] as const

/** Choices of the finished program that this version does not compute yet, by column. */
export const laterChoices: Readonly<Record<string, readonly string[]>> = {
  shape: ['sphere', 'vessel'],
  orientation: ['inclined'],
  method: ['simplified'],
}

const byKey = new Map<string, Field>(fields.map((field) => [field.key, field]))

export function fieldOf(key: FieldKey): Field {
  const field = byKey.get(key)
  if (!field) throw new Error(`No field ${key}`)
  return field
}
