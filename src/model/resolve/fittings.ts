/** What flanges, valves, supports and ends add to the loss of a run. */
import type { Fittings } from '#sizing/problem.ts'
import type { RunValues } from '../fields.ts'
import type { Findings } from './findings.ts'
import type { CatalogueIndex } from './index-catalogue.ts'
import type { Thing } from './standing.ts'

export function resolveFittings(
  _values: RunValues,
  _thing: Thing | null,
  _index: CatalogueIndex,
  _findings: Findings,
): Fittings {
  return {
    bareAreaM2: 0,
    laggedLengthM: 0,
    areBare: false,
    supportShare: 0,
    ends: 0,
    convention: '',
  }
}
