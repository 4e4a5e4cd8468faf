/** Touch: the burn threshold of the surface that a run is touched on, with the assumptions behind it. */
import type { Finish, TouchClass } from '#catalogue/types.ts'
import type { BurnLimit, Condition, Limits } from '#sizing/problem.ts'
import {
  burnThreshold,
  contactWords,
  LEAST_BURN_THRESHOLD_C,
  surfaceWords,
  type Threshold,
  type TouchedSurface,
} from '#touch/burn-threshold.ts'
import type { RunValues } from '../fields.ts'
import type { Conditions } from './conditions.ts'
import { Findings, plain } from './findings.ts'
import type { CatalogueIndex } from './index-catalogue.ts'
import type { Thing } from './standing.ts'

/** Contact time where adults work [s]. Source: ASTM C1055 industrial design time, as quoted publicly. */
export const USUAL_CONTACT_S = 5

/** False where nothing around a run gets as hot as what burns at the longest contact. */
export const canBurn = ({ mediumC, around, sunWPerM2 }: Condition): boolean =>
  sunWPerM2 > 0 || Math.max(mediumC, around.airC, around.surroundingsC) >= LEAST_BURN_THRESHOLD_C

export function resolveBurn(
  values: RunValues,
  thing: Thing | null,
  finish: Finish | null,
  conditions: Conditions | null,
  index: CatalogueIndex,
  findings: Findings,
): Pick<Limits, 'burn' | 'bareBurn'> {
  // Underground nobody reaches it; a note of the shape says so.
  if (thing?.shape.kind === 'buried-pipe') return { burn: null, bareBurn: null }
  if (values.reach === false) {
    if (values.reachReason === undefined) {
      findings.fault(
        'reachReason',
        'nothing',
        'why nobody can touch the run, e.g. under the ceiling, 4 m up',
      )
    } else {
      findings.note('out-of-reach', `Touch is not judged: out of reach (${values.reachReason}).`)
    }
    return { burn: null, bareBurn: null }
  }
  const contactS = values.contactS ?? USUAL_CONTACT_S
  // Touch is judged all the same, but what was assumed for it decides nothing.
  if (conditions && !canBurn(conditions.touch)) {
    return burnOf(values, thing, finish, contactS, index, new Findings())
  }
  if (values.contactS === undefined && values.reach === undefined) {
    findings.note(
      'reach-assumed',
      `Touch is judged for a surface within reach of adults at work, ${USUAL_CONTACT_S} s of contact: nothing else is given.`,
    )
  } else if (values.contactS === undefined) {
    findings.note(
      'contact-assumed',
      `Touch is judged for ${USUAL_CONTACT_S} s of contact, where adults work.`,
    )
  }
  return burnOf(values, thing, finish, contactS, index, findings)
}

function burnOf(
  values: RunValues,
  thing: Thing | null,
  finish: Finish | null,
  contactS: number,
  index: CatalogueIndex,
  findings: Findings,
): Pick<Limits, 'burn' | 'bareBurn'> {
  const surface = touchedSurface(values, thing, finish, findings)
  const threshold = burnThreshold(index.catalogue.burnThresholds, surface, contactS)
  if (!threshold) {
    findings.note(
      'threshold-missing',
      'The catalogue holds no burn thresholds: touch was not judged.',
    )
    return { burn: null, bareBurn: null }
  }
  if (threshold.because !== null) {
    findings.note(
      'threshold-stricter',
      `Touch is judged as ${surfaceWords(threshold.surface)}: ${threshold.because}.`,
    )
  }
  if (threshold.confidence !== 'found') {
    findings.note(
      'threshold-recalled',
      `The burn threshold of ${plain(threshold.thresholdC)} °C (${surfaceWords(threshold.surface)}, ${contactWords(contactS)}) rests on figures recalled, not read: verify it against your own copy of ISO 13732-1.`,
    )
  }
  const burn = burnLimit(threshold, contactS)
  if (values.thicknessM === 0) return { burn, bareBurn: burn }
  // The bare run beside a lagged one is judged as what it is, not as the jacket it does not wear.
  const wallClass = thing?.wall?.touchClass ?? 'smooth-metal'
  const bareSurface = { touchClass: wallClass, coating: null, coatingThicknessM: null }
  const bareThreshold = burnThreshold(index.catalogue.burnThresholds, bareSurface, contactS)
  return {
    burn,
    bareBurn: bareThreshold && burnLimit(bareThreshold, contactS),
  }
}

const burnLimit = ({ thresholdC, surface, read }: Threshold, contactS: number): BurnLimit => ({
  thresholdC,
  surface: surfaceWords(surface),
  contact: contactWords(contactS),
  read,
})

function touchedSurface(
  values: RunValues,
  thing: Thing | null,
  finish: Finish | null,
  findings: Findings,
): TouchedSurface {
  const bareRun = values.thicknessM === 0
  const own = bareRun ? (thing?.wall?.touchClass ?? null) : (finish?.touchClass ?? null)
  let touchClass: TouchClass | null = values.touchClass ?? own
  if (touchClass === null) {
    touchClass = 'smooth-metal'
    findings.note(
      'touch-class-assumed',
      'The surface is judged as smooth metal, the strictest class: no finish is given.',
    )
  }
  const coated = !bareRun && finish !== null
  return {
    touchClass,
    coating: coated ? finish.coating : null,
    coatingThicknessM: coated ? finish.coatingThicknessM : null,
  }
}
