/** The inputs of a run, how far each is moved, and the run that each gives. */
import type { Settled } from './build-up.ts'
import {
  boundedEmissivity,
  boundedHours,
  boundedHumidity,
  humidityOf,
  withAir,
  withConductivity,
  withEmissivity,
  withFuelPrice,
  withHours,
  withHumidity,
  withMedium,
  withWind,
} from './moved.ts'
import type { Problem } from './problem.ts'
import type { Sensitivity, SensitivityInput } from './result.ts'

/** How far each input is moved to either side. */
export interface SensitivityRanges {
  readonly mediumK: number
  readonly airK: number
  /** Share of the wind, and where it is calm what it may rise to [m/s]. */
  readonly windShare: number
  readonly windFromCalmMPerS: number
  readonly emissivity: number
  readonly conductivityShare: number
  readonly thicknessShare: number
  readonly fuelPriceShare: number
  readonly hoursShare: number
  /** Relative humidity, as a fraction. */
  readonly humidity: number
}

/** What a run is asked where nothing else is said. Source: common practice, no source. */
export const usualRanges: SensitivityRanges = {
  mediumK: 5,
  airK: 5,
  windShare: 0.5,
  windFromCalmMPerS: 1,
  emissivity: 0.1,
  conductivityShare: 0.1,
  thicknessShare: 0.1,
  fuelPriceShare: 0.2,
  hoursShare: 0.2,
  humidity: 0.05,
}

/** One input, and what becomes of a run at either end of its range. */
export interface Move {
  readonly input: SensitivityInput
  readonly unit: Sensitivity['unit']
  readonly ends: readonly MoveEnd[]
}

export interface MoveEnd {
  readonly change: number
  /** The run with the input moved; the thickness as laid leaves it as it was. */
  readonly problem: (given: Problem) => Problem
  readonly settled: (given: Problem, base: Settled) => Settled
}

/** The compared build-up in the moved run: the same thicknesses of what its layers are there. */
function asMoved(moved: Problem, base: Settled): Settled {
  return {
    ...base,
    layers: base.layers.map((layer) => {
      const own = moved.layers.find(({ material }) => material.name === layer.material.name)
      return own ? { ...layer, material: own.material } : layer
    }),
  }
}

type Change = (given: Problem, by: number) => Problem

const move = (
  input: SensitivityInput,
  unit: Sensitivity['unit'],
  changes: readonly number[],
  change: Change,
): Move => ({
  input,
  unit,
  ends: changes.map((by) => ({
    change: by,
    problem: (given) => change(given, by),
    settled: asMoved,
  })),
})

const bothSides = (by: number): number[] => [-by, by]

/** To both sides of a value as far as it can go: at an end of what it may be only to the other. */
const within = (value: number, by: number, bounded: (value: number) => number): number[] =>
  bothSides(by)
    .map((change) => {
      const wanted = value + change
      const moved = bounded(wanted)
      return moved === wanted ? change : moved - value
    })
    .filter((change) => change !== 0)

export function movesOf(problem: Problem, ranges: SensitivityRanges): Move[] {
  const { conditions, layers, money, hoursPerYear } = problem
  const { bareEmissivity, emissivity, around } = conditions.loss
  const isBare = layers.length === 0
  const seen = isBare ? bareEmissivity : emissivity
  const humidity = humidityOf(problem)
  const hours = money?.energy.hoursPerYear ?? hoursPerYear
  const winds =
    around.windMPerS > 0
      ? bothSides(around.windMPerS * ranges.windShare)
      : [ranges.windFromCalmMPerS]
  return [
    move('medium', 'K', bothSides(ranges.mediumK), withMedium),
    move('air', 'K', bothSides(ranges.airK), withAir),
    move('wind', 'm/s', winds, withWind),
    move(
      'emissivity',
      'fraction',
      within(seen, ranges.emissivity, boundedEmissivity),
      withEmissivity,
    ),
    ...(isBare
      ? []
      : [move('conductivity', 'share', bothSides(ranges.conductivityShare), withConductivity)]),
    ...(money
      ? [move('fuel price', 'share', bothSides(ranges.fuelPriceShare), withFuelPrice)]
      : []),
    ...(hours
      ? [
          move(
            'hours',
            'share',
            within(1, ranges.hoursShare, (share) => boundedHours(hours * share) / hours),
            withHours,
          ),
        ]
      : []),
    ...(humidity === null
      ? []
      : [
          move(
            'humidity',
            'fraction',
            within(humidity, ranges.humidity, boundedHumidity),
            withHumidity,
          ),
        ]),
  ]
}

/** The thickness as laid: pressed, or generous. The rung that was chosen stays so. */
export function thicknessMoves({ layers }: Settled, ranges: SensitivityRanges): Move[] {
  if (layers.length === 0) return []
  const ends = bothSides(ranges.thicknessShare).map((change) => ({
    change,
    problem: (given: Problem) => given,
    settled: (_: Problem, base: Settled) => thickened(base, 1 + change),
  }))
  return [{ input: 'thickness', unit: 'share', ends }]
}

function thickened(base: Settled, factor: number): Settled {
  const layers = base.layers.map((layer) => ({
    ...layer,
    thicknessM: (layer.thicknessM ?? 0) * factor,
  }))
  return { ...base, layers, thicknessM: base.thicknessM * factor }
}
