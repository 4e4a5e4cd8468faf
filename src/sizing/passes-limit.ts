import type { LimitName, LimitResult, Rating } from './result.ts'

/** A rung passes a limit that is judged more than once only if it passes every time. */
export function passesLimit(rung: Rating, limit: LimitName): boolean {
  return rung.limits.every((result) => result.limit !== limit || result.pass)
}

/** The limits that the rungs of a ladder are judged by, in the order of the results. */
export function limitNames(ladder: readonly Rating[]): LimitName[] {
  return [...new Set(ladder.flatMap((rung) => rung.limits.map(({ limit }) => limit)))]
}

/** A rung that misses a limit, and the result by which it misses it most. */
export interface Miss {
  readonly rung: Rating
  readonly failed: LimitResult
}

/** The rung that misses a limit by least, the thinnest of equals; null where none misses it. */
export function nearestMiss(ladder: readonly Rating[], limit: LimitName): Miss | null {
  const misses = ladder.flatMap((rung): Miss[] => {
    const failed = rung.limits.filter((result) => result.limit === limit && !result.pass)
    const [first, ...more] = failed
    if (!first) return []
    return [{ rung, failed: more.reduce((a, b) => (shortfall(b) > shortfall(a) ? b : a), first) }]
  })
  const [first, ...more] = misses
  if (!first) return null
  return more.reduce((a, b) => (shortfall(b.failed) < shortfall(a.failed) - EQUAL ? b : a), first)
}

const EQUAL = 1e-9

const shortfall = ({ value, bound }: LimitResult): number => Math.abs(value - bound)
