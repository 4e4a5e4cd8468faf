/** Sizes one run: its values and the job's defaults, looked up in the catalogue, solved on the whole ladder. */
import type { Catalogue } from '#catalogue/types.ts'
import type { RunDetail, RunOutcome } from '#sizing/result.ts'
import type { RunValues } from './fields.ts'

/** Catalogue prepared for look-up by id; made once per catalogue. */
export interface CatalogueIndex {
  readonly catalogue: Catalogue
}

export function indexCatalogue(catalogue: Catalogue): CatalogueIndex {
  return { catalogue }
}

export function sizeRun(values: RunValues, defaults: RunValues, index: CatalogueIndex): RunOutcome {
  void [values, defaults, index]
  return { ok: false, issues: [] }
}

/** Exact ends of the limits of one run; null where the run cannot be sized. */
export function detailRun(values: RunValues, defaults: RunValues, index: CatalogueIndex): RunDetail | null {
  void [values, defaults, index]
  return null
}
