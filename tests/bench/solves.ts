/** What one solve costs: every rung of the runs at every condition, on one warm thread. */
import type { RunValues } from '#model/fields.ts'
import { bare, rungsOf } from '#sizing/build-up.ts'
import { systemOf } from '#sizing/states.ts'
import { solve } from '#solver/index.ts'
import type { System } from '#solver/types.ts'
import { problemOf, shippedCatalogue } from './runs.ts'

export interface SolveFigures {
  readonly nsPerSolve: number
  readonly solvesPerSecond: number
  readonly filmEvaluationsMedian: number
  readonly filmEvaluationsMax: number
}

const WARM_MS = 500
const MEASURED_MS = 2500

/** The systems that sizing these runs solves; a bare run is solved bare, a lagged one on its rungs. */
export function solvesOf(runs: readonly RunValues[]): System[] {
  const index = shippedCatalogue()
  return runs.flatMap((values) => {
    const problem = problemOf(values, index)
    const { loss, months, touch, damp, frost } = problem.conditions
    const conditions = [loss, ...months, touch, damp, ...(frost ? [frost] : [])]
    const rungs = problem.layers.length === 0 ? [bare] : rungsOf(problem)
    return rungs.flatMap((settled) =>
      conditions.map((condition) => systemOf(problem, settled, condition)),
    )
  })
}

export function measureSolves(systems: readonly System[]): SolveFigures {
  const looks = systems.map((system) => solve(system).filmEvaluations).sort((a, b) => a - b)
  roundsFor(WARM_MS, systems)
  const { solves, ms } = roundsFor(MEASURED_MS, systems)
  const nsPerSolve = (1e6 * ms) / solves
  return {
    nsPerSolve,
    solvesPerSecond: 1e9 / nsPerSolve,
    filmEvaluationsMedian: looks[Math.floor(looks.length / 2)] ?? 0,
    filmEvaluationsMax: looks.at(-1) ?? 0,
  }
}

/** Solves all, round after round, until the time is up. */
function roundsFor(leastMs: number, systems: readonly System[]): { solves: number; ms: number } {
  const start = performance.now()
  for (let solves = 0; ; ) {
    for (const system of systems) solve(system)
    solves += systems.length
    const ms = performance.now() - start
    if (ms >= leastMs) return { solves, ms }
  }
}
