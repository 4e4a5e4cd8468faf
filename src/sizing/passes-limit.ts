import type { LimitName, Rating } from './result.ts'

/** A rung passes a limit that is judged more than once only if it passes every time. */
export function passesLimit(rung: Rating, limit: LimitName): boolean {
  return rung.limits.every((result) => result.limit !== limit || result.pass)
}

/** The limits that the rungs of a ladder are judged by, in the order of the results. */
export function limitNames(ladder: readonly Rating[]): LimitName[] {
  return [...new Set(ladder.flatMap((rung) => rung.limits.map(({ limit }) => limit)))]
}
