/** The row of a code table that holds for a run. */
import type { CodeLimit } from '#sizing/problem.ts'
import type { RunValues } from '../fields.ts'
import type { Conditions } from './conditions.ts'
import type { Findings } from './findings.ts'
import type { CatalogueIndex } from './index-catalogue.ts'
import type { Thing } from './standing.ts'

export function resolveCode(
  _values: RunValues,
  _thing: Thing | null,
  _conditions: Conditions | null,
  _index: CatalogueIndex,
  _findings: Findings,
): CodeLimit | null {
  return null
}
