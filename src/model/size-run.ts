/** Sizes one run: its values and the job's defaults, looked up in the catalogue, solved on the whole ladder. */
import { limitEnds } from '#sizing/continuous.ts'
import type { RunDetail, RunOutcome } from '#sizing/result.ts'
import { sensitivityOf } from '#sizing/sensitivity.ts'
import { size } from '#sizing/size.ts'
import type { Working } from '#sizing/working/types.ts'
import { workingOf } from '#sizing/working/working.ts'
import type { RunValues } from './fields.ts'
import type { CatalogueIndex } from './resolve/index-catalogue.ts'
import { resolve } from './resolve/resolve.ts'

export { type CatalogueIndex, indexCatalogue } from './resolve/index-catalogue.ts'

export function sizeRun(values: RunValues, defaults: RunValues, index: CatalogueIndex): RunOutcome {
  const resolved = resolve(withDefaults(values, defaults), index)
  return resolved.ok ? { ok: true, result: size(resolved.problem) } : resolved
}

/** The whole calculation of a run, line by line; null where the run cannot be sized. */
export function workRun(
  values: RunValues,
  defaults: RunValues,
  index: CatalogueIndex,
): Working | null {
  const resolved = resolve(withDefaults(values, defaults), index)
  return resolved.ok ? workingOf(resolved.problem) : null
}

/** What the run sheet shows besides; null where the run cannot be sized. */
export function detailRun(
  values: RunValues,
  defaults: RunValues,
  index: CatalogueIndex,
): RunDetail | null {
  const merged = withDefaults(values, defaults)
  const resolved = resolve(merged, index)
  if (!resolved.ok) return null
  const { thicknessM, ...free } = merged
  // A run with neither limit nor cost is sized by nothing: it has no ladder to choose from.
  const unfixed = thicknessM ? resolve(free, index) : null
  return {
    ends: limitEnds(unfixed?.ok ? unfixed.problem : resolved.problem),
    otherRungs: unfixed?.ok ? size(unfixed.problem).ladder : [],
    sensitivity: sensitivityOf(resolved.problem),
  }
}

/** The values a run is sized with: its own, else the job's. A lagging of its own replaces the job's as a whole. */
export function withDefaults(values: RunValues, defaults: RunValues): RunValues {
  const merged = { ...defaults, ...values }
  for (const key of replacedBy(values)) if (values[key] === undefined) delete merged[key]
  return merged
}

type BuildUpKey = 'material' | 'conductivityWPerMK' | 'thicknessM' | 'layers'

/** What of the job's build-up no longer holds beside a run's own; a fixed thickness of the job stays with a material. */
function replacedBy(own: RunValues): readonly BuildUpKey[] {
  if (own.layers !== undefined) return ['material', 'conductivityWPerMK', 'thicknessM']
  if (own.material !== undefined) return ['conductivityWPerMK', 'layers']
  if (own.conductivityWPerMK !== undefined || own.thicknessM !== undefined) return ['layers']
  return []
}
