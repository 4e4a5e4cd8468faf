/** The limits of a run: touch, loss and damp, with the assumptions behind them. */
import type { Finish, TouchClass } from '#catalogue/types.ts'
import type { BurnLimit, Limits } from '#sizing/problem.ts'
import { dewPointC } from '#solver/index.ts'
import {
  burnThreshold,
  contactWords,
  surfaceWords,
  type Threshold,
  type TouchedSurface,
} from '#touch/burn-threshold.ts'
import type { RunValues } from '../fields.ts'
import { resolveArrival } from './arrival.ts'
import { resolveCode } from './code.ts'
import type { Conditions } from './conditions.ts'
import { type Findings, plain } from './findings.ts'
import { resolveFrost } from './frost.ts'
import type { CatalogueIndex } from './index-catalogue.ts'
import type { Thing } from './standing.ts'

/** What a limit takes where nothing is given; each is said in a note, and the form shows it. */
export const usualLimits = {
  /** Contact time where adults work [s]. Source: ASTM C1055 industrial design time, as quoted publicly. */
  contactS: 5,
  /** Margin above the dew point [K]. Source: common practice, 0.5 to 1 K. */
  dewMarginK: 1,
}

/** Without a thing or conditions (their own faults are already found) the rest is checked all the same. */
export function resolveLimits(
  values: RunValues,
  thing: Thing | null,
  finish: Finish | null,
  conditions: Conditions | null,
  index: CatalogueIndex,
  findings: Findings,
): Limits {
  const { shape } = values
  const isByMetre = shape !== 'flat' && shape !== 'sphere' && shape !== 'vessel'
  if (!isByMetre && values.maxLossWPerM !== undefined) {
    findings.fault(
      'maxLossWPerM',
      `${plain(values.maxLossWPerM)} W/m`,
      `nothing for a ${shape === 'flat' ? 'flat surface' : shape}: give max_loss_w_m2`,
    )
  }
  if (shape === 'flat' && values.maxOuterDiameterM !== undefined) {
    findings.fault(
      'maxOuterDiameterM',
      `${plain(values.maxOuterDiameterM * 1000)} mm`,
      'nothing for a flat surface: it has no diameter',
    )
  }
  const { burn, bareBurn } = resolveBurn(values, thing, finish, index, findings)
  return {
    maxSurfaceC: values.maxSurfaceC ?? null,
    burn,
    bareBurn,
    maxLossWPerM: values.maxLossWPerM ?? null,
    maxLossWPerM2: values.maxLossWPerM2 ?? null,
    damp: conditions && resolveDamp(values, thing, conditions, findings),
    frost: resolveFrost(values, thing, conditions, findings),
    arrival: resolveArrival(values, thing, conditions, index, findings),
    code: resolveCode(values, thing, conditions, index, findings),
    maxOuterDiameterM: values.maxOuterDiameterM ?? null,
  }
}

function resolveBurn(
  values: RunValues,
  thing: Thing | null,
  finish: Finish | null,
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
  const contactS = values.contactS ?? usualLimits.contactS
  if (values.contactS === undefined && values.reach === undefined) {
    findings.note(
      'reach-assumed',
      `Touch is judged for a surface within reach of adults at work, ${usualLimits.contactS} s of contact: nothing else is given.`,
    )
  } else if (values.contactS === undefined) {
    findings.note(
      'contact-assumed',
      `Touch is judged for ${usualLimits.contactS} s of contact, where adults work.`,
    )
  }
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

function resolveDamp(
  values: RunValues,
  thing: Thing | null,
  { damp }: Conditions,
  findings: Findings,
): Limits['damp'] {
  if (values.humidity === undefined || thing?.shape.kind === 'buried-pipe') return null
  // No surface gets colder than the coldest of medium, air and surroundings.
  if (Math.min(damp.mediumC, damp.around.surroundingsC) >= damp.around.airC) return null
  if (values.dewMarginK === undefined) {
    findings.note(
      'dew-margin-assumed',
      `The surface is kept ${usualLimits.dewMarginK} K above the dew point: no other margin is given.`,
    )
  }
  return {
    dewPointC: dewPointC({ airC: damp.around.airC, humidity: values.humidity }),
    marginK: values.dewMarginK ?? usualLimits.dewMarginK,
  }
}
