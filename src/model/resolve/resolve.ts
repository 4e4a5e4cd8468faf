/** From the values of a run to a problem that can be sized: everything looked up, checked and, where assumed, said. */
import { limitsWithLowerEnd } from '#sizing/continuous.ts'
import type { Problem } from '#sizing/problem.ts'
import type { Issue } from '#sizing/result.ts'
import type { RunValues } from '../fields.ts'
import { resolveBuildUp, resolveFinish } from './build-up.ts'
import { noteConditions } from './condition-notes.ts'
import { resolveConditions } from './conditions.ts'
import { Findings } from './findings.ts'
import { resolveFittings } from './fittings.ts'
import type { CatalogueIndex } from './index-catalogue.ts'
import { noteLayering } from './layering.ts'
import { resolveLimits } from './limits.ts'
import { resolveMedium, steamReading } from './medium.ts'
import { resolveMoney } from './money.ts'
import { resolveSurvey } from './survey.ts'
import { resolveThing } from './thing.ts'
import { canBurn } from './touch.ts'
import { withinGround } from './underground.ts'
import { noteVapour } from './vapour.ts'

export type Resolved =
  | { readonly ok: true; readonly problem: Problem }
  | { readonly ok: false; readonly issues: readonly Issue[] }

/** All faults of a run come back at once: each part is resolved even where another has failed. */
export function resolve(given: RunValues, index: CatalogueIndex): Resolved {
  const findings = new Findings()
  const values = withoutBlanks(given)
  const { tag } = values
  if (tag === undefined) {
    findings.fault('tag', 'nothing', 'a tag that no other run has')
  }
  const thing = resolveThing(values, index, findings)
  const medium = resolveMedium(values, index, findings)
  const finish = resolveFinish(values, index, findings)
  const conditions =
    thing && medium ? resolveConditions(values, medium, thing, finish, findings) : null
  if (!conditions && values.airC === undefined && !(thing && medium)) {
    findings.fault('airC', 'nothing', 'the temperature of the air around the run in °C')
  }
  const asGiven = resolveBuildUp(values, thing, index, findings)
  const buildUp = asGiven && thing ? withinGround(asGiven, thing.shape, findings) : asGiven
  const gainsHeat = conditions !== null && conditions.loss.mediumC < conditions.loss.around.airC
  const money = resolveMoney(values, gainsHeat, index, findings)
  const isBuried = thing?.shape.kind === 'buried-pipe'
  const faultsBefore = findings.issues.length
  const limits = resolveLimits(values, thing, finish, conditions, index, findings)
  const isAskedInVain = findings.issues.length > faultsBefore && asksMore(values)
  const fittings = resolveFittings(values, thing, medium, index, findings)
  const survey = resolveSurvey(values, conditions, findings)
  const finishPrice = finish && index.finishPrice(finish.id)
  const isWeighed =
    money !== null &&
    (finish === null || finishPrice !== null) &&
    buildUp?.layers.every(({ material }) => material.price !== null)
  const isSized = isWeighed || limitsWithLowerEnd(limits).length > 0 || isAskedInVain
  if (conditions && buildUp && buildUp.steps.length > 0 && !isSized) {
    findings.fault(
      isBuried ? 'maxLossWPerM' : 'reach',
      money === null ? 'no limit and no money' : 'no limit, and no price to weigh the cost with',
      `something to size by: ${isBuried ? '' : 'reach yes, '}a limit such as ${thing?.shape.kind === 'flat' ? 'max_loss_w_m2' : 'max_loss_w_m'}, or fuel and hours_per_year; or a thickness_mm to rate`,
    )
  }
  if (findings.issues.length > 0 || !tag || !thing || !conditions || !buildUp) {
    return { ok: false, issues: findings.issues }
  }
  if (values.thicknessM === 0 && finish) {
    findings.note(
      'unused',
      `The finish is not used for a bare run${isBuried ? '' : `: give its emissivity as bare_emissivity if the surface is not ${thing.wall?.name.toLowerCase() ?? 'steel'} as found in service`}.`,
    )
  }
  noteConditions(
    values,
    conditions,
    {
      touch: limits.maxSurfaceC !== null || (limits.burn !== null && canBurn(conditions.touch)),
      damp: limits.damp !== null,
      frost: limits.frost !== null,
    },
    findings,
  )
  if (!isBuried) {
    noteVapour(buildUp, finish, conditions, limits.damp?.dewPointC ?? null, findings)
  }
  noteLayering(values, thing, buildUp, finish, conditions, index, findings)
  return {
    ok: true,
    problem: {
      tag,
      shape: thing.shape,
      steam: steamReading(values, index),
      insideFilmWPerM2K: thing.insideFilmWPerM2K,
      insideAir: thing.insideAir ?? null,
      extent: thing.extent,
      layers: buildUp.layers,
      finish: finish && {
        name: finish.name,
        surfaceMaxC: finish.surfaceMaxC,
        vapourTight: finish.vapourTight ?? 'no',
        price: finishPrice,
      },
      steps: buildUp.steps,
      conditions,
      limits,
      fittings,
      survey,
      money,
      hoursPerYear: values.hoursPerYear ?? null,
      notes: findings.notes,
    },
  }
}

/** A text of nothing but spaces is not given: a blank reason is none, a blank material is no name to look up. */
function withoutBlanks(values: RunValues): RunValues {
  const kept = Object.entries(values).filter(
    ([, value]) => typeof value !== 'string' || value.trim() !== '',
  )
  return Object.fromEntries(kept)
}

/** A limit that is asked for but lacks something has its own fault: that the run has none would be no news. */
const asksMore = ({ frostHours, maxDropK, codeTable }: RunValues): boolean =>
  frostHours !== undefined || maxDropK !== undefined || codeTable !== undefined
