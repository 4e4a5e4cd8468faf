/** Exact thickness at which a limit begins to pass, between and beyond the rungs. */
import { bracketedRoot } from '#solver/index.ts'
import { type Settled, settle } from './build-up.ts'
import { judge } from './limits.ts'
import type { Problem } from './problem.ts'
import type { LimitEnd, LimitName, LimitResult } from './result.ts'
import { solveStates } from './states.ts'

const THINNEST_M = 1e-4
/** Where the search ends: well beyond what is bought as lagging [m]. */
const THICKEST_M = 0.6
const EXACT_M = 1e-7

/** How far one limit is from its bound, in its own unit: negative passes. */
function shortfall({ limit, value, bound }: LimitResult): number {
  return limit === 'damp' ? bound - value : value - bound
}

function settledAt(problem: Problem, thicknessM: number): Settled {
  return settle(problem.layers, { thicknessM, nominalThicknessM: null, piecesM: [thicknessM] })
}

/** The worst shortfall of the limits of one name; null where that limit is not set. */
function shortfallAt(problem: Problem, limit: LimitName, thicknessM: number): number | null {
  const settled = settledAt(problem, thicknessM)
  const judged = judge(problem, settled, solveStates(problem, settled)).filter(
    (result) => result.limit === limit,
  )
  return judged.length === 0 ? null : Math.max(...judged.map(shortfall))
}

/**
 * Thickness of the sized layer from which a limit passes [m]; 0 where the thinnest passes, null where none up to
 * 600 mm does. Searched from the thick end, since a thin layer on a small pipe may lose more than none.
 */
export function continuousThicknessM(problem: Problem, limit: LimitName): number | null {
  const at = (thicknessM: number): number => shortfallAt(problem, limit, thicknessM) ?? 0
  if (at(THINNEST_M) <= 0) return 0
  if (at(THICKEST_M) > 0) return null
  return bracketedRoot(
    (thicknessM) => -at(thicknessM),
    { low: THINNEST_M, high: THICKEST_M },
    { width: EXACT_M, value: 0 },
  ).at
}

/** The exact ends of the limits a problem sets, for the ladder picture. Service has no thickness end. */
export function limitEnds(problem: Problem): LimitEnd[] {
  if (!problem.layers.some((layer) => layer.thicknessM === null)) return []
  const { maxSurfaceC, burn, maxLossWPerM, maxLossWPerM2, damp } = problem.limits
  const set: LimitName[] = []
  if (maxSurfaceC !== null || burn !== null) set.push('touch')
  if (maxLossWPerM !== null || maxLossWPerM2 !== null) set.push('loss')
  if (damp !== null) set.push('damp')
  return set.map((limit) => ({ limit, fromM: continuousThicknessM(problem, limit) }))
}
