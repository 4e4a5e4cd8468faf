/** The fields of a run as a form: in groups, the usual ones first, the rest behind "More". */
import type { FieldKey, RunValues } from '#model/fields.ts'
import { usualLimits } from '#model/resolve/limits.ts'
import { usualMoney } from '#model/resolve/money.ts'

export interface FieldGroup {
  readonly title: string
  readonly usual: readonly FieldKey[]
  readonly more: readonly FieldKey[]
}

export const groups: readonly FieldGroup[] = [
  {
    title: 'What it is',
    usual: [
      'tag',
      'description',
      'shape',
      'size',
      'widthM',
      'heightM',
      'lengthM',
      'areaM2',
      'orientation',
      'riseM',
    ],
    more: ['outerDiameterM', 'wallM', 'pipeMaterial', 'group'],
  },
  {
    title: 'Service',
    usual: ['service', 'medium', 'mediumC', 'pressureGaugePa'],
    more: ['mediumMaxC', 'mediumMinC'],
  },
  {
    title: 'Place',
    usual: ['place', 'airC', 'humidity', 'windMPerS'],
    more: ['surroundingsC', 'touchAirC', 'dampAirC', 'altitudeM'],
  },
  {
    title: 'Lagging',
    usual: ['material', 'finish', 'thicknessM'],
    more: ['layers', 'conductivityWPerMK', 'emissivity', 'bareEmissivity', 'steps', 'method'],
  },
  {
    title: 'Limits',
    usual: ['reach', 'reachReason', 'contactS', 'maxSurfaceC', 'maxLossWPerM', 'maxLossWPerM2'],
    more: ['touchClass', 'dewMarginK'],
  },
  {
    title: 'Money',
    usual: ['money', 'fuel', 'hoursPerYear'],
    more: ['fuelPricePerKWh', 'efficiency', 'cop', 'discount', 'growth', 'lifeYears', 'currency'],
  },
]

/** Whether a field has a say for a run of this shape. What has a value is always shown. */
export function isRelevant(key: FieldKey, values: RunValues): boolean {
  if (values[key] !== undefined) return true
  const { shape = 'pipe', orientation } = values
  switch (key) {
    case 'size':
    case 'outerDiameterM':
      return shape === 'pipe' || shape === 'round-duct'
    case 'wallM':
    case 'pipeMaterial':
      return shape !== 'flat'
    case 'widthM':
    case 'heightM':
      return shape === 'rect-duct' || shape === 'flat'
    case 'lengthM':
    case 'maxLossWPerM':
      return shape !== 'flat'
    case 'areaM2':
    case 'maxLossWPerM2':
      return shape === 'flat'
    case 'riseM':
      return orientation === 'vertical'
    case 'pressureGaugePa':
      return values.medium === 'steam'
    case 'reachReason':
      return values.reach === false
    case 'cop':
      return values.mediumC === undefined || values.mediumC < (values.airC ?? 20)
    default:
      return true
  }
}

/** What holds where a field is left empty and the job has no default either. */
export const standIns: Readonly<Partial<Record<FieldKey, string>>> = {
  orientation: 'horizontal',
  riseM: 'the length',
  mediumMaxC: 'as the medium',
  mediumMinC: 'as the medium',
  surroundingsC: 'as the air',
  touchAirC: 'as the air',
  dampAirC: 'as the air',
  windMPerS: 'none',
  altitudeM: 'sea level',
  thicknessM: 'found for you',
  emissivity: 'of the finish',
  bareEmissivity: 'of the pipe',
  steps: 'metric',
  method: 'detailed',
  reach: 'yes',
  touchClass: 'of the finish',
  contactS: String(usualLimits.contactS),
  dewMarginK: String(usualLimits.dewMarginK),
  money: 'if fuel and hours are given',
  fuelPricePerKWh: 'of the fuel',
  efficiency: 'of the fuel',
  cop: String(usualMoney.cop),
  discount: String(usualMoney.discount),
  growth: String(usualMoney.growth),
  lifeYears: String(usualMoney.lifeYears),
  currency: 'of the prices',
}
