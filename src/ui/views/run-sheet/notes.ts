/** Which notes of a result need a look, rather than saying what was assumed. */
import type { Note } from '#sizing/result.ts'

const lookCodes: ReadonlySet<string> = new Set([
  'film-range',
  'film-jump',
  'conductivity-extrapolated',
  'conductivity-steep',
  'soil-shallow',
  'damp-not-judged',
  'flow-velocity',
  'vapour-open',
  'vapour-wrong-side',
  'form-unusual',
  'code-asks-nothing',
  'fittings-unknown',
  'arrival-unknown',
  'survey-contradiction',
  'survey-thickness',
  'survey-unclear',
  'price-missing',
  'service-heed',
])

export function needsLook({ code }: Note): boolean {
  return lookCodes.has(code)
}
