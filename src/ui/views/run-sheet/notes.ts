/** Which notes of a result need a look, rather than saying what was assumed. */
import type { Note } from '#sizing/result.ts'

const lookCodes: ReadonlySet<string> = new Set([
  'film-range',
  'film-jump',
  'conductivity-extrapolated',
  'price-missing',
  'service-heed',
])

export function needsLook({ code }: Note): boolean {
  return lookCodes.has(code)
}
