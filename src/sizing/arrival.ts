/** The arrival limit: what flows arrives nearly as it set out. */
import { arrivalTempC, condensateKgPerS, solve } from '#solver/index.ts'
import { bare, type Settled } from './build-up.ts'
import { equilibriumC } from './equilibrium.ts'
import type { ArrivalLimit, Problem } from './problem.ts'
import type { LimitResult } from './result.ts'
import { runLoss } from './run-loss.ts'
import { type States, systemOf } from './states.ts'

export interface Arrival {
  /** Lost by the whole run [W]. */
  readonly heatFlowW: number
  /** Null where all steam has condensed on the way. */
  readonly arrivalTempC: number | null
  /** Of steam, no more than flows; null elsewhere [kg/s]. */
  readonly condensateKgPerS: number | null
}

/** How the medium arrives, at the loss condition; null where its flow or the length of the run is not known. */
export function arrival(
  problem: Problem,
  settled: Settled,
  states: States,
  bareStates: States,
): Arrival | null {
  const limit = problem.limits.arrival
  const heatFlowW = runLoss(problem, settled, states.loss, bareStates.loss)?.totalW
  if (limit === null || heatFlowW === undefined) return null
  if (limit.kind === 'drop') {
    const arrivesC = streamEndC(problem, settled, limit, heatFlowW)
    return { heatFlowW, arrivalTempC: arrivesC, condensateKgPerS: null }
  }
  const condensedKgPerS = condensed(limit, heatFlowW)
  return {
    heatFlowW,
    arrivalTempC: condensedKgPerS < limit.flowKgPerS ? problem.conditions.loss.mediumC : null,
    condensateKgPerS: Math.min(condensedKgPerS, limit.flowKgPerS),
  }
}

type Drop = Extract<ArrivalLimit, { kind: 'drop' }>
type Condensate = Extract<ArrivalLimit, { kind: 'condensate' }>

/** Nearer than this to where nothing flows, nothing changes along the run [K]. */
const NOTHING_K = 1e-6

/**
 * Temperature at the end of the run [°C]: the whole run with its fittings, its heat transfer taken from its loss with
 * the medium as it sets out, the difference being that to the temperature at which the run would lose nothing (of the
 * air, unless surroundings or sun say otherwise).
 *
 * The heat transfer is held the same along the run, though it changes as the stream nears the air. Against a run followed
 * metre by metre the drop is within 2 % for lagged runs, however much of the difference is used up, and within 4 % for
 * bare ones that use up a tenth of it. Bare ones that use up most of it come out too large where hot, by up to 20 % from
 * 250 °C, and up to 8 % too small where colder than the air.
 */
function streamEndC(
  problem: Problem,
  settled: Settled,
  { flowKgPerS, heatCapacityJPerKgK }: Drop,
  heatFlowW: number,
): number {
  const startC = problem.conditions.loss.mediumC
  if (heatFlowW === 0) return startC
  const tendsToC = tendsTo(problem, settled)
  const differenceK = startC - tendsToC
  if (Math.abs(differenceK) < NOTHING_K) return startC
  const uaWPerK = Math.max(0, heatFlowW / differenceK)
  return arrivalTempC({ startC, airC: tendsToC, uaWPerK, flowKgPerS, heatCapacityJPerKgK })
}

/** Temperature of the medium at which the whole run, its fittings included, would lose nothing [°C]. */
export function tendsTo(problem: Problem, settled: Settled): number {
  const condition = problem.conditions.loss
  const { areBare, bareAreaM2, ends } = problem.fittings
  const asksBare = settled.layers.length > 0 && areBare && (bareAreaM2 > 0 || ends > 0)
  return equilibriumC(condition, (mediumC) => {
    const state = (of: Settled) => solve(systemOf(problem, of, { ...condition, mediumC }))
    const own = state(settled)
    const bareState = asksBare ? state(bare) : own
    return runLoss(problem, settled, own, bareState)?.totalW ?? 0
  })
}

/** As if there were steam enough: more than the flow where all of it would condense. A run that gains heat makes none. */
const condensed = ({ latentHeatJPerKg }: Condensate, heatFlowW: number): number =>
  Math.max(0, condensateKgPerS({ heatFlowW, latentHeatJPerKg }))

export function arrivalLimits(
  { limits, conditions }: Problem,
  arrives: Arrival | null,
): LimitResult[] {
  const limit = limits.arrival
  if (limit === null || limit.maxDropK === null || arrives === null) return []
  const common = { limit: 'arrival', rule: 'at most', condition: 'loss' } as const
  if (limit.kind === 'condensate') {
    const value = condensed(limit, arrives.heatFlowW)
    const pass = value <= limit.flowKgPerS
    return [
      {
        ...common,
        pass,
        value,
        bound: limit.flowKgPerS,
        unit: 'kg/s',
        what: pass
          ? 'condensate, against the steam that flows'
          : 'condensate, against the steam that flows: all of it would condense',
      },
    ]
  }
  const startC = conditions.loss.mediumC
  const endC = arrives.arrivalTempC ?? startC
  const value = Math.abs(startC - endC)
  return [
    {
      ...common,
      pass: value <= limit.maxDropK,
      value,
      bound: limit.maxDropK,
      unit: 'K',
      what: `${endC > startC ? 'rise' : 'drop'} of the medium along the run`,
    },
  ]
}
