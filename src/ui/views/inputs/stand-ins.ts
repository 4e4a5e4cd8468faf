/** What is taken where a field is left empty and the job has no default either. */
import type { FieldKey, RunValues } from '#model/fields.ts'
import { usualLimits } from '#model/resolve/limits.ts'
import { usualMoney } from '#model/resolve/money.ts'
import { SOIL_W_PER_M_K } from '#model/resolve/standing.ts'
import { usualTolerances } from '#model/resolve/survey.ts'
import { readText } from '#ui/state/cell-text.ts'
import type { UnitSystem } from '#units/quantities.ts'

/** In words or, where it is a figure, as a reader would have typed it. */
export function standInFor(key: FieldKey, { shape }: RunValues, units: UnitSystem): string {
  if (key === 'orientation' && (shape === 'vessel' || shape === 'flat')) return 'vertical'
  if (key === 'bareEmissivity' && shape !== undefined && shape !== 'pipe') return 'of the wall'
  const standIn = standIns[key] ?? ''
  return typeof standIn === 'number' ? readText(key, standIn, units) : standIn
}

/** Figures are in SI, as the values of a run. */
const standIns: Readonly<Partial<Record<FieldKey, string | number>>> = {
  orientation: 'horizontal',
  riseM: 'the length',
  heads: 'domed',
  buryDepthM: 'not buried',
  soilWPerMK: SOIL_W_PER_M_K,

  valves: 'none',
  flanges: 'none',
  strainers: 'none',
  bends: 'none',
  tees: 'none',
  reducers: 'none',
  supports: 'none',
  ends: 'none',
  fittings: 'as the run',

  mediumMaxC: 'as the medium',
  mediumMinC: 'as the medium',
  flowKgPerS: 'not known',
  velocityMPerS: 'not known',
  heatCapacityJPerKgK: 'of the medium',
  insideFilmWPerM2K: 'neglected',

  surroundingsC: 'as the air',
  touchAirC: 'as the air',
  dampAirC: 'as the air',
  windMPerS: 'none',
  solarWPerM2: 'none',
  skyView: 'none',
  monthlyAirC: 'the yearly mean',
  altitudeM: 'sea level',
  filmWPerM2K: 'worked out',

  thicknessM: 'found for you',
  emissivity: 'of the finish',
  bareEmissivity: 'of the pipe',
  steps: 'metric',
  method: 'detailed',

  reach: 'yes',
  touchClass: 'of the finish',
  contactS: usualLimits.contactS,
  dewMarginK: usualLimits.dewMarginK,
  codeTable: 'none',
  codeFactor: 1,
  maxDropK: 'not judged',
  maxOuterDiameterM: 'not judged',

  frostHours: 'not judged',
  frostAirC: 'as the air',
  frostWindMPerS: 'as the wind',
  frostStartC: 'the coldest medium',
  frostFraction: 'none',

  measuredSurfaceC: 'not measured',
  surveyMediumC: 'as the medium',
  surveyAirC: 'as the air',
  surveySurroundingsC: 'as that air',
  surveyWindMPerS: 'none',
  surveyEmissivity: 'of the aged finish',
  surveyToleranceK: usualTolerances.thermometerK,

  money: 'if fuel and hours are given',
  fuelPricePerKWh: 'of the fuel',
  efficiency: 'of the fuel',
  cop: usualMoney.cop,
  discount: usualMoney.discount,
  growth: usualMoney.growth,
  lifeYears: usualMoney.lifeYears,
  currency: 'of the prices',
}
