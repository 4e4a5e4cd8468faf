/** Over which thicknesses each limit passes: stretches of the ladder, their ends exact where they are known. */
import { limitNames, passesLimit } from '#sizing/passes-limit.ts'
import type { LimitEnd, LimitName, Rating } from '#sizing/result.ts'

export interface PassStretch {
  /** Passes from this thickness on [m]; null from the very start. */
  readonly fromM: number | null
  /** To this thickness [m]; null without end. */
  readonly toM: number | null
}

export interface LimitBar {
  readonly limit: LimitName
  /** None where no rung passes. */
  readonly stretches: readonly PassStretch[]
}

/** One bar per limit that is judged, in the order of the results. */
export function limitBars(ladder: readonly Rating[], ends: readonly LimitEnd[]): LimitBar[] {
  return limitNames(ladder).map((limit) => ({
    limit,
    stretches: stretches(limit, ladder, {
      startM: exactStartM(limit, ends),
      endM: exactEndM(limit, ends),
    }),
  }))
}

/** Several ends of one limit: the strictest counts. */
function exactStartM(limit: LimitName, ends: readonly LimitEnd[]): number | null {
  const starts = ends.filter((end) => end.limit === limit).map(({ fromM }) => fromM)
  const known = starts.filter((fromM) => fromM !== null)
  return known.length === 0 || known.length < starts.length ? null : Math.max(...known)
}

/** Likewise of the thicknesses at which a limit ceases to pass, as that of the space does. */
function exactEndM(limit: LimitName, ends: readonly LimitEnd[]): number | null {
  const known = ends.flatMap((end) => (end.limit === limit ? (end.upToM ?? []) : []))
  return known.length === 0 ? null : Math.min(...known)
}

interface Exact {
  readonly startM: number | null
  readonly endM: number | null
}

function stretches(limit: LimitName, ladder: readonly Rating[], exact: Exact): PassStretch[] {
  const found: PassStretch[] = []
  ladder.forEach((rung, at) => {
    if (!passesLimit(rung, limit)) return
    const previous = ladder[at - 1]
    const goesOn = previous !== undefined && passesLimit(previous, limit)
    const last = found.at(-1)
    const toM = endM(rung.thicknessM, ladder[at + 1]?.thicknessM ?? null, exact.endM)
    if (goesOn && last) {
      found[found.length - 1] = { ...last, toM }
      return
    }
    found.push({ fromM: startM(rung.thicknessM, previous?.thicknessM ?? null, exact.startM), toM })
  })
  return found
}

/** The exact start where it lies between the rung that fails and the one that passes, else the rung itself. */
function startM(rungM: number, previousM: number | null, exactM: number | null): number | null {
  const isBetween = exactM !== null && exactM <= rungM && exactM > (previousM ?? 0)
  if (isBetween) return exactM
  return previousM === null ? null : rungM
}

/** The exact end where it lies between the rung that passes and the one that fails, or beyond them all; else the rung. */
function endM(rungM: number, nextM: number | null, exactM: number | null): number | null {
  const isBetween =
    exactM !== null && exactM >= rungM && exactM < (nextM ?? Number.POSITIVE_INFINITY)
  if (isBetween) return exactM
  return nextM === null ? null : rungM
}
