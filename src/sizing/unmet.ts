/** Why no rung passes: limits that no rung meets, and limits that exclude each other. */
import { searchedUpToM, wholeThicknessM } from './continuous.ts'
import { limitNames, nearestMiss, passesLimit } from './passes-limit.ts'
import type { Problem } from './problem.ts'
import type { LimitName, LimitResult, Rating, UnmetLimit } from './result.ts'
import { curveWords } from './service.ts'

/** Every limit that no rung meets, with the thickness that would and, where none would, the cause that is known. */
export function unmetLimits(problem: Problem, ladder: readonly Rating[]): UnmetLimit[] {
  return limitNames(ladder)
    .filter((name) => !ladder.some((rung) => passesLimit(rung, name)))
    .map((limit) => {
      const neededM = hasThicknessEnd(limit) ? wholeThicknessM(problem, limit) : null
      return { limit, neededM, because: neededM === null ? causeOf(problem, limit, ladder) : null }
    })
}

/** A service range and the room there is are not met by more lagging. */
const hasThicknessEnd = (limit: LimitName): boolean => limit !== 'service' && limit !== 'space'

function causeOf(problem: Problem, limit: LimitName, ladder: readonly Rating[]): string | null {
  const failed = nearestMiss(ladder, limit)?.failed
  if (!failed) return null
  const { conditions, limits } = problem
  switch (limit) {
    case 'touch':
      return touchCause(failed, problem)
    case 'damp':
      return limits.damp && failed.bound >= conditions.damp.around.airC
        ? 'the air itself is that near to its dew point'
        : 'the surface never comes nearer to the air'
    case 'service':
      return serviceCause(failed, problem)
    case 'space':
      return 'even the thinnest that can be bought is too large'
    default:
      return noneWould(problem)
  }
}

/** As far as it was looked: under the ground no farther than the run fits. */
const noneWould = (problem: Problem): string =>
  `no thickness up to ${(searchedUpToM(problem) * 1000).toFixed(0)} mm would`

function touchCause({ bound }: LimitResult, problem: Problem): string {
  const { around, sunWPerM2 } = problem.conditions.touch
  if (around.airC >= bound) return 'the air of the hottest day is as hot itself'
  return sunWPerM2 > 0 ? 'the sun alone heats the surface to that' : noneWould(problem)
}

/** As near to the medium as that, a place takes its temperature at any thickness [K]. */
const MEDIUM_NEAR_K = 0.5

function serviceCause({ value, what }: LimitResult, { conditions }: Problem): string {
  if (what.endsWith(curveWords)) {
    return 'no conductivity is held for it there: take another material, or give conductivity_w_mk'
  }
  const isMedium = [conditions.touch.mediumC, conditions.damp.mediumC].some(
    (mediumC) => Math.abs(value - mediumC) < MEDIUM_NEAR_K,
  )
  return isMedium
    ? 'that is the medium itself, at any thickness'
    : 'no thickness brings it far enough'
}
