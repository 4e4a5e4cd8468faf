/** Heat flow of a whole run: its straight length with supports, fittings and ends, at the mean of the year and by the month. */
import { grown } from '#solver/index.ts'
import type { Solution } from '#solver/types.ts'
import type { Settled } from './build-up.ts'
import type { Problem } from './problem.ts'
import type { States } from './states.ts'

export interface RunLoss {
  /** Outwards [W]. */
  readonly totalW: number
  /** What of it supports, fittings and ends add [W]. */
  readonly fittingsW: number
}

/**
 * Loss of the whole run in one state, by the convention of its fittings: bare ones lose the flux of the bare run over
 * their own surface, lagged ones as much as their equivalent length; supports add a share of the lagged run's loss;
 * an end loses the flux of the run over its disc, or where fittings stay bare that of the bare run. Null where the
 * length is not known.
 */
export function runLoss(
  { shape, extent, fittings }: Problem,
  settled: Settled,
  state: Solution,
  bareState: Solution,
): RunLoss | null {
  if (extent === null) return null
  const isBare = settled.layers.length === 0
  const straightW = state.heatFlowWPerUnit * extent
  const supportsW = isBare ? 0 : straightW * fittings.supportShare
  const fittingsAreBare = isBare || fittings.areBare
  const ownW = fittingsAreBare
    ? bareState.heatFluxWPerM2 * fittings.bareAreaM2
    : state.heatFlowWPerUnit * fittings.laggedLengthM
  const endsW =
    state.unit !== 'm' || fittings.ends === 0
      ? 0
      : fittingsAreBare
        ? bareState.heatFluxWPerM2 * fittings.ends * grown(shape, 0).volumeM3
        : state.heatFluxWPerM2 * fittings.ends * grown(shape, settled.thicknessM).volumeM3
  const fittingsW = supportsW + ownW + endsW
  return { totalW: straightW + fittingsW, fittingsW }
}

/** Days of the months, January first, of a common year. */
export const MONTH_DAYS = [31, 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31]
const YEAR_DAYS = 365

/** One part of the year: its share, and the state that stands for it, lagged and bare. */
interface YearPart {
  readonly share: number
  readonly state: Solution
  readonly bareState: Solution
}

function yearParts(states: States, bareStates: States): YearPart[] {
  if (states.months.length === 0) {
    return [{ share: 1, state: states.loss, bareState: bareStates.loss }]
  }
  return states.months.map((state, month) => ({
    share: (MONTH_DAYS[month] ?? 0) / YEAR_DAYS,
    state,
    bareState: bareStates.months[month] ?? bareStates.loss,
  }))
}

/** Heat that has to be made up flows one way; in a month in which it flows the other way nothing has to be. */
export const isMadeUp = (flow: number, way: number): boolean => way === 0 || flow > 0 === way > 0

const madeUp = (flow: number, way: number): number => (isMadeUp(flow, way) ? flow : 0)

/**
 * The way in which heat has to be made up: positive outwards, for a run that is heated. The sun may turn the flow
 * round, but a run hotter than its air is heated all the same, and what the sun brings it costs nothing.
 */
export function madeUpWay({ conditions: { loss } }: Problem, yearlyFlow: number): number {
  const differenceK = loss.mediumC - loss.around.airC
  return loss.sunWPerM2 === 0 || differenceK === 0 ? yearlyFlow : differenceK
}

/** Heat flow to be made up for one unit, mean of the year [W]. */
export function yearlyFlowPerUnit(problem: Problem, states: States): number {
  const way = madeUpWay(problem, states.loss.heatFlowWPerUnit)
  return yearParts(states, states).reduce(
    (sum, { share, state }) => sum + share * madeUp(state.heatFlowWPerUnit, way),
    0,
  )
}

/** The same for the whole run [W]; null where its length is not known. */
export function yearlyRunLossW(
  problem: Problem,
  settled: Settled,
  states: States,
  bareStates: States,
): number | null {
  const yearly = runLoss(problem, settled, states.loss, bareStates.loss)
  if (yearly === null) return null
  const way = madeUpWay(problem, yearly.totalW)
  let sumW = 0
  for (const { share, state, bareState } of yearParts(states, bareStates)) {
    const loss = runLoss(problem, settled, state, bareState)
    sumW += share * madeUp(loss?.totalW ?? 0, way)
  }
  return sumW
}
