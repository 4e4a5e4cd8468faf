/** What a measured surface temperature says of the run as it stands. */
import {
  conductionFluxWPerM2,
  effectiveConductivityWPerMK,
  fluxOf,
  type SurfaceFlux,
  solve,
} from '#solver/index.ts'
import type { System } from '#solver/types.ts'
import { settle } from './build-up.ts'
import type { Condition, Problem, SurveyReading } from './problem.ts'
import type { Note, SurveyResult, Uncertain } from './result.ts'
import { systemOf } from './states.ts'

/** Null where nothing was measured. */
export function surveyOf(problem: Problem): SurveyResult | null {
  const { survey: reading, extent } = problem
  const { survey: condition } = problem.conditions
  if (reading === null || condition === null) return null
  const settled = settle(problem.layers, null)
  const isSettled = problem.layers.every(({ thicknessM }) => thicknessM !== null)
  const day: Day = {
    surfaceTempC: reading.surfaceTempC,
    system: systemOf(problem, settled, condition),
  }
  const varied = variations(day, reading)
  const flux = uncertain(day, varied, ({ heatFluxWPerM2 }) => heatFluxWPerM2)
  const flow = uncertain(day, varied, ({ heatFlowWPerUnit }) => heatFlowWPerUnit)
  const { unit } = fluxOf(day.system, day.surfaceTempC)
  const isTold = Math.abs(flux.value) > flux.plusMinus
  const effective = isSettled && isTold ? effectiveOf(day, varied) : null
  return {
    measuredSurfaceC: reading.surfaceTempC,
    heatFluxWPerM2: flux,
    heatLossWPerM: isSettled && unit === 'm' ? flow : null,
    heatLossW: isSettled && extent !== null ? times(flow, extent) : null,
    effectiveWPerMK: effective,
    soundWPerMK: isSettled ? soundWPerMK(day) : null,
    expectedSurfaceC: isSettled ? solve(day.system).surfaceTempC : null,
    notes: [
      ...readingNotes(problem, condition, reading),
      ...tellingNotes(day, { isSettled, isTold, effective }),
    ],
  }
}

/** The reading and what it was read in. */
interface Day {
  readonly surfaceTempC: number
  readonly system: System
}

/** Two readings as far off to either side as is believed; `share` of their difference is one half width. */
interface Variation {
  readonly low: Day
  readonly high: Day
  readonly share: number
}

/** What the emissivity of a surface may be: neither none nor more than all. */
export const EMISSIVITIES = { least: 0.01, most: 1 }

/** Thermometer, air and emissivity, in this order. */
export function variations(day: Day, reading: SurveyReading): Variation[] {
  const { surfaceTempC, system } = day
  const { least, most } = EMISSIVITIES
  const lowEmissivity = Math.max(least, system.emissivity - reading.emissivity)
  const highEmissivity = Math.min(most, system.emissivity + reading.emissivity)
  const widthEmissivity = highEmissivity - lowEmissivity
  const withSurface = (byK: number): Day => ({ system, surfaceTempC: surfaceTempC + byK })
  const withAir = (byK: number): Day => ({ surfaceTempC, system: inOtherAir(system, byK) })
  const withEmissivity = (emissivity: number): Day => ({
    surfaceTempC,
    system: { ...system, emissivity },
  })
  return [
    {
      low: withSurface(-reading.thermometerK),
      high: withSurface(reading.thermometerK),
      share: 0.5,
    },
    { low: withAir(-reading.airK), high: withAir(reading.airK), share: 0.5 },
    {
      low: withEmissivity(lowEmissivity),
      high: withEmissivity(highEmissivity),
      // At the end of what an emissivity may be, the slope of the inner side stands for both.
      share: widthEmissivity > 0 ? reading.emissivity / widthEmissivity : 0,
    },
  ]
}

/** Surroundings that are at the air are so because nothing else is known of them: they go with it. */
function inOtherAir(system: System, byK: number): System {
  const { around } = system
  const airC = around.airC + byK
  const surroundingsC = around.surroundingsC === around.airC ? airC : around.surroundingsC
  return { ...system, around: { ...around, airC, surroundingsC } }
}

/** Root of the sum of squares of what each variation changes. */
const together = (changes: readonly number[]): number => Math.hypot(...changes)

function uncertain(
  day: Day,
  varied: readonly Variation[],
  pick: (flux: SurfaceFlux) => number,
): Uncertain {
  const at = ({ system, surfaceTempC }: Day): number => pick(fluxOf(system, surfaceTempC))
  return {
    value: at(day),
    plusMinus: together(varied.map(({ low, high, share }) => (at(high) - at(low)) * share)),
  }
}

/** Null where some reading within what is believed fits no conductivity. */
function effectiveOf(day: Day, varied: readonly Variation[]): Uncertain | null {
  const value = effectiveAt(day)
  if (value === null) return null
  const changes: number[] = []
  for (const { low, high, share } of varied) {
    const atLow = effectiveAt(low)
    const atHigh = effectiveAt(high)
    if (atLow === null || atHigh === null) return null
    changes.push((atHigh - atLow) * share)
  }
  return { value, plusMinus: together(changes) }
}

function effectiveAt({ system, surfaceTempC }: Day): number | null {
  const { heatFluxWPerM2 } = fluxOf(system, surfaceTempC)
  return effectiveConductivityWPerMK(system, surfaceTempC, heatFluxWPerM2)
}

function soundWPerMK({ system, surfaceTempC }: Day): number | null {
  if (system.layers.length === 0) return null
  const flux = conductionFluxWPerM2(system, surfaceTempC)
  return flux === null ? null : effectiveConductivityWPerMK(system, surfaceTempC, flux)
}

const times = ({ value, plusMinus }: Uncertain, extent: number): Uncertain => ({
  value: value * extent,
  plusMinus: plusMinus * extent,
})

function readingNotes(problem: Problem, condition: Condition, reading: SurveyReading): Note[] {
  const isBare = problem.layers.length === 0
  const emissivity = isBare ? condition.bareEmissivity : condition.emissivity
  const { thermometerK, airK } = reading
  const notes: Note[] = [
    {
      code: 'survey-readings',
      text: `What the survey says may be off by what its readings may: surface ±${short(thermometerK)} K, air ±${short(airK)} K, emissivity ${short(emissivity)} ±${short(reading.emissivity)}.`,
    },
  ]
  const hasFaces = problem.shape.kind === 'vessel' || problem.shape.kind === 'rect-duct'
  if (hasFaces) {
    notes.push({
      code: 'survey-faces',
      text: 'The surface measured is taken to hold on every side of the run.',
    })
  }
  return notes
}

const short = (value: number): string => String(Number(value.toFixed(3)))
const degrees = (tempC: number): string =>
  `${String(Number(tempC.toFixed(1))).replace('-', '−')} °C`

function tellingNotes(
  { system, surfaceTempC }: Day,
  told: {
    readonly isSettled: boolean
    readonly isTold: boolean
    readonly effective: Uncertain | null
  },
): Note[] {
  if (!told.isTold) {
    return [
      {
        code: 'survey-unclear',
        text: 'The surface stands so near to the air and its surroundings that, within what the readings may be off, it cannot be told how much heat passes nor how well the lagging conducts.',
      },
    ]
  }
  if (!told.isSettled) {
    return [
      {
        code: 'survey-thickness',
        text: 'How thick the lagging is as found is not given: the flux is that of a surface of the bare diameter; loss and conductivity cannot be told. Give thickness_mm.',
      },
    ]
  }
  if (system.layers.length === 0 || told.effective !== null) return []
  const isAgainst =
    (system.mediumC - surfaceTempC) * fluxOf(system, surfaceTempC).heatFluxWPerM2 <= 0
  return [
    {
      code: 'survey-contradiction',
      text: isAgainst
        ? `The surface read is not between medium (${degrees(system.mediumC)}) and air (${degrees(system.around.airC)}): heat would flow against the difference. Check the medium, the thermometer and the sun; no conductivity can be told.`
        : 'Between medium and surface too little is left to tell a conductivity within what the readings may be off.',
    },
  ]
}
