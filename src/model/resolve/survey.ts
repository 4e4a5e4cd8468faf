/** What was measured on the day, and how far it may be off. */
import type { SurveyReading } from '#sizing/problem.ts'
import type { RunValues } from '../fields.ts'
import type { Findings } from './findings.ts'

export function resolveSurvey(_values: RunValues, _findings: Findings): SurveyReading | null {
  return null
}
