/** Cautions that stand beside the numbers they belong to (product requirement: in the window where the number is). */
import type { RunValues } from '#model/fields.ts'
import type { RunResult } from '#sizing/result.ts'

/** Below the limits of a run: what a passed limit does not promise. */
export function limitCautions(values: RunValues, result: RunResult): string[] {
  const judged = new Set(result.limits.map(({ limit }) => limit))
  return [
    ...(judged.has('touch')
      ? [
          'Burn thresholds are for a brief touch of a small area of healthy skin. Where children, the public or older people can reach it, take a contact time of 60 s or more in the inputs. In doubt the safety officer and the labour inspectorate decide.',
        ]
      : []),
    ...(judged.has('damp')
      ? [
          'The vapour barrier has to stay closed at every joint and support, else damp gets in behind it.',
        ]
      : []),
    ...(judged.has('frost')
      ? [
          'Lagging delays freezing and does not prevent it: water that stands for longer freezes all the same.',
        ]
      : []),
    ...(judged.has('code')
      ? ['The figures of a code are to be verified against your own edition of it.']
      : []),
    ...(isLaggedOutdoors(values, result)
      ? ['Keep the weather barrier sealed: a pipe corrodes unseen under wet lagging.']
      : []),
  ]
}

/** Below every run sheet. */
export const standingCaution =
  'Estimate for competent people. Valves, flanges, supports and damaged spots run hotter than the run itself. Local codes and the licensed professional decide.'

/** Beside costs. */
export const priceCaution =
  'Prices and labour are illustrative until you put your own in their place.'

/** Wind on a lagged run means that it lies outdoors. */
function isLaggedOutdoors({ windMPerS }: RunValues, { chosen }: RunResult): boolean {
  return (windMPerS ?? 0) > 0 && chosen !== null && chosen.thicknessM > 0
}
