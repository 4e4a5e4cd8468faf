/** The space limit: the lagged run fits where it has to go. */
import type { Solution } from '#solver/types.ts'
import type { Settled } from './build-up.ts'
import type { Problem } from './problem.ts'
import type { LimitResult } from './result.ts'

/** Overall diameter of a round run, or the larger outer side of a duct [m]; null for a flat surface. */
export function overallSizeM({ shape }: Problem, thicknessM: number): number | null {
  switch (shape.kind) {
    case 'flat':
      return null
    case 'rect-duct':
      return Math.max(shape.widthM, shape.heightM) + 2 * thicknessM
    default:
      return shape.outerDiameterM + 2 * thicknessM
  }
}

/** Metres this near are the same: 60.3 + 2 × 40 is 140.3, not 140.30000000000001. */
const SAME_M = 1e-9

export function spaceLimits(
  problem: Problem,
  settled: Settled,
  { outerDiameterM }: Solution,
): LimitResult[] {
  const bound = problem.limits.maxOuterDiameterM
  const value = overallSizeM(problem, settled.thicknessM)
  if (bound === null || value === null) return []
  return [
    {
      limit: 'space',
      pass: value <= bound + SAME_M,
      value,
      rule: 'at most',
      bound,
      unit: 'm',
      condition: 'loss',
      what: outerDiameterM === null ? 'larger outer side' : 'overall diameter',
    },
  ]
}
