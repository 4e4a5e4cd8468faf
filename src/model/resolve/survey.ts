/** What was measured on the day, and how far it may be off. */
import type { SurveyReading } from '#sizing/problem.ts'
import type { RunValues } from '../fields.ts'
import type { Conditions } from './conditions.ts'
import { type Findings, plain } from './findings.ts'

/** How far each reading is believed to be off; all but the thermometer stand for every survey. */
export const usualTolerances = {
  /** Contact thermometer on a surface [K]. Source: common practice, no source. */
  thermometerK: 2,
  /** Air at the run against air of the room [K]. Source: common practice, no source. */
  airK: 1,
  /** Half width for a dull surface. Source: spread of the tables of finishes, e.g. 0.80 to 0.90 painted. */
  dullEmissivity: 0.05,
  /** Share for a bright one, whose emissivity doubles as it ages. Source: the same, e.g. 0.1 to 0.2 mill finish. */
  brightShare: 0.5,
}

/** Below this a surface is bright. */
const DULL_FROM = 0.5

export function resolveSurvey(
  values: RunValues,
  conditions: Conditions | null,
  findings: Findings,
): SurveyReading | null {
  const { measuredSurfaceC, surveyToleranceK } = values
  if (measuredSurfaceC === undefined) {
    if (givesDay(values)) {
      findings.note('unused', 'What is given of the day is not used: no surface was measured.')
    }
    return null
  }
  if (!conditions?.survey) return null
  const { around, mediumC, emissivity, bareEmissivity } = conditions.survey
  const seen = values.thicknessM === 0 ? bareEmissivity : emissivity
  const assumed = [
    values.surveyMediumC === undefined ? `a medium of ${plain(mediumC)} °C` : '',
    values.surveyAirC === undefined ? `air of ${plain(around.airC)} °C` : '',
    values.surveyWindMPerS === undefined ? 'still air' : '',
    values.surveyEmissivity === undefined ? `an emissivity of ${plain(seen, 2)}` : '',
    surveyToleranceK === undefined
      ? `a thermometer within ${plain(usualTolerances.thermometerK)} K`
      : '',
  ].filter((text) => text !== '')
  const taken = assumed.length > 0 ? `${assumed.join(', ')}, and ` : ''
  findings.note('survey-assumed', `The survey is taken with ${taken}the surface out of the sun.`)
  return {
    surfaceTempC: measuredSurfaceC,
    thermometerK: surveyToleranceK ?? usualTolerances.thermometerK,
    airK: usualTolerances.airK,
    emissivity:
      seen >= DULL_FROM ? usualTolerances.dullEmissivity : seen * usualTolerances.brightShare,
  }
}

const givesDay = (values: RunValues): boolean =>
  values.surveyMediumC !== undefined ||
  values.surveyAirC !== undefined ||
  values.surveySurroundingsC !== undefined ||
  values.surveyWindMPerS !== undefined ||
  values.surveyEmissivity !== undefined ||
  values.surveyToleranceK !== undefined
