/** The arrival limit: what flows arrives nearly as it set out. */
import type { Settled } from './build-up.ts'
import type { Problem } from './problem.ts'
import type { LimitResult } from './result.ts'
import type { States } from './states.ts'

export interface Arrival {
  readonly arrivalTempC: number
  /** Of steam; null elsewhere [kg/s]. */
  readonly condensateKgPerS: number | null
}

/** How the medium arrives, at the loss condition; null where its flow is not known. */
export function arrival(
  _problem: Problem,
  _settled: Settled,
  _states: States,
  _bareStates: States,
): Arrival | null {
  return null
}

export function arrivalLimits(
  _problem: Problem,
  _settled: Settled,
  _states: States,
  _bareStates: States,
): LimitResult[] {
  return []
}
