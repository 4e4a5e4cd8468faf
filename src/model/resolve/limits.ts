/** The limits of a run: touch, loss and damp, with the assumptions behind them. */
import type { Finish, TouchClass } from '#catalogue/types.ts'
import type { BurnLimit, Condition, Limits } from '#sizing/problem.ts'
import { dewPointC } from '#solver/index.ts'
import {
  burnThreshold,
  contactWords,
  LEAST_BURN_THRESHOLD_C,
  surfaceWords,
  type Threshold,
  type TouchedSurface,
} from '#touch/burn-threshold.ts'
import type { RunValues } from '../fields.ts'
import { resolveArrival } from './arrival.ts'
import { resolveCode } from './code.ts'
import type { Conditions } from './conditions.ts'
import { Findings, plain } from './findings.ts'
import { resolveFrost } from './frost.ts'
import type { CatalogueIndex } from './index-catalogue.ts'
import { differs, type Thing } from './standing.ts'

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
  noteOverallSize(values, thing, findings)
  const { burn, bareBurn } = resolveBurn(values, thing, finish, conditions, index, findings)
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

/** No lagging makes a thing smaller than it is. */
function noteOverallSize(
  { maxOuterDiameterM, shape: word }: RunValues,
  thing: Thing | null,
  findings: Findings,
): void {
  if (maxOuterDiameterM === undefined || !thing) return
  const { shape } = thing
  if (shape.kind === 'flat') return
  const ownM =
    shape.kind === 'rect-duct' ? Math.max(shape.widthM, shape.heightM) : shape.outerDiameterM
  if (maxOuterDiameterM >= ownM || !differs(maxOuterDiameterM, ownM)) return
  const name = word?.replace('-', ' ').replace('rect ', '') ?? 'run'
  findings.fault(
    'maxOuterDiameterM',
    `${plain(maxOuterDiameterM * 1000)} mm`,
    `more than ${plain(ownM * 1000)} mm: the ${name} alone measures ${plain(ownM * 1000)} mm`,
  )
}

/** False where nothing around a run gets as hot as what burns at the longest contact. */
export const canBurn = ({ mediumC, around, sunWPerM2 }: Condition): boolean =>
  sunWPerM2 > 0 || Math.max(mediumC, around.airC, around.surroundingsC) >= LEAST_BURN_THRESHOLD_C

function resolveBurn(
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
  const contactS = values.contactS ?? usualLimits.contactS
  // Touch is judged all the same, but what was assumed for it decides nothing.
  if (conditions && !canBurn(conditions.touch)) {
    return burnOf(values, thing, finish, contactS, index, new Findings())
  }
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

function resolveDamp(
  values: RunValues,
  thing: Thing | null,
  { damp }: Conditions,
  findings: Findings,
): Limits['damp'] {
  if (thing?.shape.kind === 'buried-pipe') return null
  if (values.humidity === undefined) {
    if (damp.mediumC < damp.around.airC) {
      findings.note(
        'damp-not-judged',
        'Damp is not judged: no humidity_pct is given. The surface may drip.',
      )
    }
    if (values.dewMarginK !== undefined)
      findings.note('unused', 'dew_margin_k is not used: no humidity_pct is given.')
    return null
  }
  // No surface gets colder than the coldest of medium, air and surroundings.
  if (Math.min(damp.mediumC, damp.around.surroundingsC) >= damp.around.airC) return null
  if (values.dewMarginK === undefined) {
    findings.note(
      'dew-margin-assumed',
      `The surface is kept ${usualLimits.dewMarginK} K above the dew point: no other margin is given.`,
    )
  }
  if (damp.around.airC < 0) {
    findings.note(
      'humidity-over-ice',
      'Below 0 °C humidity is taken over ice, as ASHRAE does; over water, as weather services give it, the dew point would be higher.',
    )
  }
  return {
    dewPointC: dewPointC({ airC: damp.around.airC, humidity: values.humidity }),
    marginK: values.dewMarginK ?? usualLimits.dewMarginK,
  }
}
