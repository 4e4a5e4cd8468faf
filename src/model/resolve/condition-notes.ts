/** What was assumed of the air, the surroundings and the film of each condition. */
import type { RunValues } from '../fields.ts'
import type { Conditions } from './conditions.ts'
import { type Findings, plain } from './findings.ts'

/** Said once the limits are known: only what was judged needs an assumption. */
export function noteConditions(
  values: RunValues,
  conditions: Conditions,
  judged: { readonly touch: boolean; readonly damp: boolean; readonly frost: boolean },
  findings: Findings,
): void {
  noteSurroundings(values.surroundingsC, conditions, judged, findings)
  const air = `the air of the run, ${plain(values.airC ?? 0)} °C`
  if (judged.touch && values.touchAirC === undefined) {
    findings.note('touch-air-assumed', `Touch is judged at ${air}: no hottest-day air is given.`)
  }
  if (judged.damp && values.dampAirC === undefined) {
    findings.note('damp-air-assumed', `Damp is judged at ${air}: no most-humid air is given.`)
  }
  if (judged.frost && values.frostAirC === undefined) {
    findings.note('frost-air-assumed', `Frost is judged at ${air}: no coldest air is given.`)
  }
  const { film } = conditions.loss
  if (typeof film === 'object') {
    findings.note(
      'film-fixed',
      `The film outside is fixed at ${plain(film.fixedWPerM2K, 2)} W/m²K, convection and radiation together, for loss and frost; touch and damp are judged with the film worked out.`,
    )
  } else if (film === 'simplified') {
    findings.note(
      'film-simplified',
      'Loss and frost are reckoned with the simplified film; touch, damp and service with the detailed one, since the simplified makes hot surfaces too cool.',
    )
  }
}

function noteSurroundings(
  given: number | undefined,
  { touch, damp }: Conditions,
  judged: { readonly touch: boolean; readonly damp: boolean },
  findings: Findings,
): void {
  if (given === undefined) return
  if (judged.touch && touch.around.surroundingsC > given) {
    findings.note(
      'touch-surroundings',
      `Touch is judged with surroundings at the air of the hottest day, ${plain(touch.around.surroundingsC)} °C, since those given are cooler.`,
    )
  }
  if (judged.damp && damp.around.airC < given) {
    findings.note(
      'damp-surroundings',
      `Damp is judged with surroundings at the most humid air, ${plain(damp.around.airC)} °C, since those given are warmer.`,
    )
  }
}
