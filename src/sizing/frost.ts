/** The frost limit: how long stagnant water takes to reach 0 °C and to freeze. */
import type { Settled } from './build-up.ts'
import type { Problem } from './problem.ts'
import type { LimitResult } from './result.ts'

/** Hours until the water reaches 0 °C and freezes the stated fraction; null where frost is not asked about. */
export function timeToFreezeH(_problem: Problem, _settled: Settled): number | null {
  return null
}

export function frostLimits(_problem: Problem, _settled: Settled): LimitResult[] {
  return []
}
