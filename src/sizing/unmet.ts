/** Why no rung passes: limits that no rung meets, and limits that exclude each other. */
import { searchedUpToM, wholeThicknessM } from './continuous.ts'
import { limitNames, passesLimit } from './passes-limit.ts'
import type { Problem } from './problem.ts'
import type { LimitName, LimitResult, Rating, UnmetLimit } from './result.ts'

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

function causeOf(
  { conditions, limits }: Problem,
  limit: LimitName,
  ladder: readonly Rating[],
): string | null {
  const failed = ladder
    .flatMap((rung) => rung.limits)
    .find((result) => result.limit === limit && !result.pass)
  if (!failed) return null
  switch (limit) {
    case 'touch':
      return touchCause(failed, conditions.touch.around.airC, conditions.touch.sunWPerM2)
    case 'damp':
      return limits.damp && failed.bound >= conditions.damp.around.airC
        ? 'the air itself is that near to its dew point'
        : 'the surface never comes nearer to the air'
    case 'service':
      return 'that place takes the temperature of the medium whatever the thickness'
    case 'space':
      return 'even the thinnest that can be bought is too large'
    default:
      return `no thickness up to ${searchedUpToM * 1000} mm would`
  }
}

function touchCause({ bound }: LimitResult, airC: number, sunWPerM2: number): string {
  if (airC >= bound) return 'the air of the hottest day is as hot itself'
  return sunWPerM2 > 0
    ? 'the sun alone heats the surface to that'
    : `no thickness up to ${searchedUpToM * 1000} mm would`
}
