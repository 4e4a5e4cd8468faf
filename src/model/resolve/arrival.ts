/** What flows, how much of it, and how much colder it may arrive. */
import type { ArrivalLimit } from '#sizing/problem.ts'
import type { RunValues } from '../fields.ts'
import type { Conditions } from './conditions.ts'
import type { Findings } from './findings.ts'
import type { CatalogueIndex } from './index-catalogue.ts'
import type { Thing } from './standing.ts'

export function resolveArrival(
  _values: RunValues,
  _thing: Thing | null,
  _conditions: Conditions | null,
  _index: CatalogueIndex,
  _findings: Findings,
): ArrivalLimit | null {
  return null
}
