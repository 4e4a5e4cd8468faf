/** What stands in a pipe and how long it may not freeze. */
import type { FrostLimit } from '#sizing/problem.ts'
import type { RunValues } from '../fields.ts'
import type { Conditions } from './conditions.ts'
import type { Findings } from './findings.ts'
import type { CatalogueIndex } from './index-catalogue.ts'
import type { Thing } from './standing.ts'

export function resolveFrost(
  _values: RunValues,
  _thing: Thing | null,
  _conditions: Conditions | null,
  _index: CatalogueIndex,
  _findings: Findings,
): FrostLimit | null {
  return null
}
