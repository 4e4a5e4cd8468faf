/** The limits of a run: loss, damp and overall size here, the others beside; with the assumptions behind them. */
import type { Finish } from '#catalogue/types.ts'
import type { Limits } from '#sizing/problem.ts'
import { dewPointC } from '#solver/index.ts'
import type { RunValues } from '../fields.ts'
import { resolveArrival } from './arrival.ts'
import { resolveCode } from './code.ts'
import type { Conditions } from './conditions.ts'
import { type Findings, plain } from './findings.ts'
import { resolveFrost } from './frost.ts'
import type { CatalogueIndex } from './index-catalogue.ts'
import { differs, type Thing } from './standing.ts'
import { resolveBurn, USUAL_CONTACT_S } from './touch.ts'

/** What a limit takes where nothing is given; each is said in a note, and the form shows it. */
export const usualLimits = {
  contactS: USUAL_CONTACT_S,
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
