/** The design conditions: the same place judged at its worst for each question. */

import type { Finish } from '#catalogue/types.ts'
import type { Condition } from '#sizing/problem.ts'
import type { RunValues } from '../fields.ts'
import { type Findings, plain } from './findings.ts'
import type { Medium } from './medium.ts'
import type { Thing } from './standing.ts'

/** Emissivity of a surface without a finish of the catalogue. Source: non-metallic surfaces, ASHRAE 2021 ch. 23 table 12. */
const PLAIN_EMISSIVITY = 0.9
/** Emissivity of bare steel pipe in service. Source: ASHRAE Handbook Fundamentals 2021, ch. 23, table 12. */
const BARE_STEEL_EMISSIVITY = 0.8

export interface Conditions {
  readonly loss: Condition
  readonly touch: Condition
  readonly damp: Condition
}

export function resolveConditions(
  values: RunValues,
  medium: Medium,
  thing: Thing,
  finish: Finish | null,
  findings: Findings,
): Conditions | null {
  const { airC } = values
  if (airC === undefined) {
    findings.fault('airC', 'nothing', 'the temperature of the air around the run in °C')
    return null
  }
  const bareEmissivity = bareEmissivityOf(values, thing, findings)
  const jacket = jacketEmissivity(values, finish)
  const touchAirC = values.touchAirC ?? airC
  const dampAirC = values.dampAirC ?? airC
  const given = values.surroundingsC
  // Surroundings are given once, for the yearly mean. Where a question's air is harder than they are, they follow it.
  const surroundings = {
    loss: given ?? airC,
    touch: Math.max(given ?? touchAirC, touchAirC),
    damp: Math.min(given ?? dampAirC, dampAirC),
  }
  const at = (
    question: 'loss' | 'touch' | 'damp',
    conditionAirC: number,
    mediumC: number,
    emissivity: number,
  ): Condition => ({
    around: {
      airC: conditionAirC,
      surroundingsC: surroundings[question],
      windMPerS: question === 'loss' ? (values.windMPerS ?? 0) : 0,
      altitudeM: values.altitudeM ?? 0,
    },
    mediumC,
    emissivity,
    bareEmissivity,
  })
  return {
    loss: at('loss', airC, medium.mediumC, jacket.agedEmissivity),
    touch: at('touch', touchAirC, medium.hottestC, jacket.newEmissivity),
    damp: at('damp', dampAirC, medium.coldestC, jacket.newEmissivity),
  }
}

function jacketEmissivity(
  { emissivity }: RunValues,
  finish: Finish | null,
): { agedEmissivity: number; newEmissivity: number } {
  return {
    agedEmissivity: emissivity ?? finish?.emissivityAged ?? PLAIN_EMISSIVITY,
    newEmissivity: emissivity ?? finish?.emissivityNew ?? PLAIN_EMISSIVITY,
  }
}

function bareEmissivityOf(values: RunValues, { wall }: Thing, findings: Findings): number {
  if (values.thicknessM === 0 && values.emissivity !== undefined) return values.emissivity
  if (values.bareEmissivity !== undefined) return values.bareEmissivity
  const emissivity = wall?.emissivityBare ?? BARE_STEEL_EMISSIVITY
  findings.note(
    'bare-emissivity-assumed',
    `The bare surface is taken with an emissivity of ${plain(emissivity, 2)}${wall ? `, ${wall.name.toLowerCase()} as found in service` : ''}.`,
  )
  return emissivity
}

/** Says what was assumed of the surface and of the air, once the limits are known. */
export function noteConditions(
  values: RunValues,
  finish: Finish | null,
  conditions: Conditions,
  judged: { readonly touch: boolean; readonly damp: boolean },
  findings: Findings,
): void {
  noteSurroundings(values.surroundingsC, conditions, judged, findings)
  if (
    values.thicknessM !== 0 &&
    values.finish === undefined &&
    values.emissivity === undefined &&
    !finish
  ) {
    findings.note(
      'finish-assumed',
      `No finish is given: the surface is taken with an emissivity of ${PLAIN_EMISSIVITY}.`,
    )
  }
  if (judged.touch && values.touchAirC === undefined) {
    findings.note(
      'touch-air-assumed',
      `Touch is judged at the air of the run, ${plain(values.airC ?? 0)} °C: no hottest-day air is given.`,
    )
  }
  if (judged.damp && values.dampAirC === undefined) {
    findings.note(
      'damp-air-assumed',
      `Damp is judged at the air of the run, ${plain(values.airC ?? 0)} °C: no most-humid air is given.`,
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
  if (judged.damp && damp.around.surroundingsC < given) {
    findings.note(
      'damp-surroundings',
      `Damp is judged with surroundings at the most humid air, ${plain(damp.around.surroundingsC)} °C, since those given are warmer.`,
    )
  }
}
