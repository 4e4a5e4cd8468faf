/** The code limit: thickness or resistance not less, loss not more, than a table asks. */
import type { Settled } from './build-up.ts'
import type { Problem } from './problem.ts'
import type { LimitResult } from './result.ts'

export function codeLimits(_problem: Problem, _settled: Settled): LimitResult[] {
  return []
}
