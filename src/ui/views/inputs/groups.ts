/** The fields of a run as a form: in groups, the usual ones first, the rest behind "More". */
import type { FieldKey, RunValues } from '#model/fields.ts'

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
      'heads',
    ],
    more: ['outerDiameterM', 'wallM', 'pipeMaterial', 'buryDepthM', 'soilWPerMK', 'group'],
  },
  {
    title: 'Fittings',
    usual: ['valves', 'flanges', 'supports', 'fittings'],
    more: ['strainers', 'bends', 'tees', 'reducers', 'ends'],
  },
  {
    title: 'Service',
    usual: ['service', 'medium', 'mediumC', 'pressureGaugePa'],
    more: [
      'mediumMaxC',
      'mediumMinC',
      'flowKgPerS',
      'velocityMPerS',
      'heatCapacityJPerKgK',
      'insideFilmWPerM2K',
    ],
  },
  {
    title: 'Place',
    usual: ['place', 'airC', 'humidity', 'windMPerS'],
    more: [
      'surroundingsC',
      'solarWPerM2',
      'skyView',
      'touchAirC',
      'dampAirC',
      'monthlyAirC',
      'altitudeM',
      'filmWPerM2K',
    ],
  },
  {
    title: 'Lagging',
    usual: ['material', 'finish', 'thicknessM'],
    more: ['layers', 'conductivityWPerMK', 'emissivity', 'bareEmissivity', 'steps', 'method'],
  },
  {
    title: 'Limits',
    usual: [
      'reach',
      'reachReason',
      'contactS',
      'maxSurfaceC',
      'maxLossWPerM',
      'maxLossWPerM2',
      'codeTable',
      'codeFactor',
    ],
    more: ['maxDropK', 'maxOuterDiameterM', 'touchClass', 'dewMarginK'],
  },
  {
    title: 'Frost',
    usual: ['frostHours', 'frostAirC', 'frostWindMPerS', 'frostStartC', 'frostFraction'],
    more: [],
  },
  {
    title: 'Money',
    usual: ['money', 'fuel', 'hoursPerYear'],
    more: ['fuelPricePerKWh', 'efficiency', 'cop', 'discount', 'growth', 'lifeYears', 'currency'],
  },
  {
    title: 'Survey',
    usual: [
      'measuredSurfaceC',
      'surveyMediumC',
      'surveyAirC',
      'surveyEmissivity',
      'surveyToleranceK',
    ],
    more: ['surveySurroundingsC', 'surveyWindMPerS'],
  },
]

/** A group as it stands for one run: what has a say, and what its shape cannot do without. */
export function groupFor(group: FieldGroup, values: RunValues): FieldGroup {
  const isUsual = (key: FieldKey) => group.usual.includes(key) || isNeeded(key, values)
  const all = [...group.usual, ...group.more].filter((key) => isRelevant(key, values))
  const [first, rest] = [all.filter(isUsual), all.filter((key) => !isUsual(key))]
  return { title: group.title, usual: inOrder(first), more: rest }
}

/** Only a diameter gives a sphere or vessel its size. */
const isNeeded = (key: FieldKey, { shape }: RunValues): boolean =>
  key === 'outerDiameterM' && isPiece(shape)

/** A size stands where sizes stand, before the length. */
function inOrder(keys: readonly FieldKey[]): readonly FieldKey[] {
  if (!keys.includes('outerDiameterM')) return keys
  const others: readonly FieldKey[] = keys.filter((key) => key !== 'outerDiameterM')
  return others.toSpliced(others.indexOf('shape') + 1, 0, 'outerDiameterM')
}

/** Things that are counted by the piece. */
const isPiece = (shape: RunValues['shape']): boolean => shape === 'sphere' || shape === 'vessel'

/** Whether a field has a say for this run. What has a value is always shown. */
function isRelevant(key: FieldKey, values: RunValues): boolean {
  if (values[key] !== undefined) return true
  const has = sayOf[key]
  return has === undefined || has(asked(values))
}

interface Asked extends RunValues {
  readonly shape: NonNullable<RunValues['shape']>
  readonly isBuried: boolean
  /** A pipe or a duct, which something flows through. */
  readonly isLine: boolean
  readonly isDuct: boolean
}

function asked(values: RunValues): Asked {
  const { shape = 'pipe', buryDepthM } = values
  const isDuct = shape === 'round-duct' || shape === 'rect-duct'
  return {
    ...values,
    shape,
    isDuct,
    isLine: isDuct || shape === 'pipe',
    isBuried: buryDepthM !== undefined,
  }
}

type Say = (run: Asked) => boolean
const onLine: Say = ({ isLine }) => isLine
const inAir: Say = ({ isBuried }) => !isBuried
const surveyed: Say = ({ measuredSurfaceC }) => measuredSurfaceC !== undefined
const frosty: Say = ({ frostHours }) => frostHours !== undefined
const isRound: Say = ({ shape }) => shape === 'pipe' || shape === 'round-duct'
const hasValves: Say = isRound

/** When a field has a say; those that always have are left out. */
const sayOf: Readonly<Partial<Record<FieldKey, Say>>> = {
  size: ({ isLine }) => isLine,
  outerDiameterM: ({ shape }) => shape !== 'rect-duct' && shape !== 'flat',
  wallM: ({ shape }) => shape !== 'flat',
  pipeMaterial: ({ shape }) => shape !== 'flat',
  widthM: ({ shape }) => shape === 'rect-duct' || shape === 'flat',
  heightM: ({ shape }) => shape === 'rect-duct' || shape === 'flat',
  lengthM: ({ shape }) => shape !== 'flat' && shape !== 'sphere',
  areaM2: ({ shape }) => shape === 'flat',
  orientation: ({ shape, isBuried }) => shape !== 'sphere' && !isBuried,
  riseM: ({ orientation, isLine }) =>
    isLine && (orientation === 'vertical' || orientation === 'inclined'),
  heads: ({ shape }) => shape === 'vessel',
  buryDepthM: isRound,
  soilWPerMK: ({ isBuried }) => isBuried,

  valves: hasValves,
  flanges: hasValves,
  strainers: hasValves,
  supports: onLine,
  bends: onLine,
  tees: onLine,
  reducers: onLine,
  ends: onLine,
  fittings: ({ valves = 0, flanges = 0, strainers = 0, ends = 0, thicknessM }) =>
    valves + flanges + strainers + ends > 0 && thicknessM !== 0,

  pressureGaugePa: ({ medium }) => medium === 'steam',
  flowKgPerS: onLine,
  velocityMPerS: ({ isDuct }) => isDuct,
  heatCapacityJPerKgK: ({ isLine, flowKgPerS, maxDropK }) =>
    isLine && (flowKgPerS !== undefined || maxDropK !== undefined),

  humidity: inAir,
  windMPerS: inAir,
  surroundingsC: inAir,
  solarWPerM2: inAir,
  skyView: inAir,
  filmWPerM2K: inAir,
  touchAirC: inAir,
  dampAirC: ({ isBuried, humidity }) => !isBuried && humidity !== undefined,

  reach: inAir,
  maxSurfaceC: inAir,
  reachReason: ({ reach }) => reach === false,
  contactS: ({ isBuried, reach }) => !isBuried && reach !== false,
  touchClass: ({ isBuried, reach }) => !isBuried && reach !== false,
  maxLossWPerM: onLine,
  maxLossWPerM2: ({ isLine }) => !isLine,
  codeFactor: ({ codeTable }) => codeTable !== undefined,
  maxDropK: onLine,
  maxOuterDiameterM: ({ shape }) => shape !== 'flat',
  dewMarginK: ({ isBuried, humidity }) => !isBuried && humidity !== undefined,

  frostHours: ({ shape, medium }) =>
    shape === 'pipe' && (medium === undefined || medium === 'water'),
  frostAirC: frosty,
  frostWindMPerS: ({ frostHours, isBuried }) => frostHours !== undefined && !isBuried,
  frostStartC: frosty,
  frostFraction: frosty,

  surveyMediumC: surveyed,
  surveyAirC: surveyed,
  surveySurroundingsC: surveyed,
  surveyWindMPerS: surveyed,
  surveyEmissivity: surveyed,
  surveyToleranceK: surveyed,

  cop: ({ medium, mediumC, airC = 20 }) =>
    mediumC === undefined ? medium !== 'steam' : mediumC < airC,
}
