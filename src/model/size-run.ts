/** Sizes one run: its values and the job's defaults, looked up in the catalogue, solved on the whole ladder. */
import { limitEnds } from '#sizing/continuous.ts'
import type { RunDetail, RunOutcome } from '#sizing/result.ts'
import { size } from '#sizing/size.ts'
import type { RunValues } from './fields.ts'
import type { CatalogueIndex } from './resolve/index-catalogue.ts'
import { resolve } from './resolve/resolve.ts'

export { type CatalogueIndex, indexCatalogue } from './resolve/index-catalogue.ts'

export function sizeRun(values: RunValues, defaults: RunValues, index: CatalogueIndex): RunOutcome {
  const resolved = resolve(withDefaults(values, defaults), index)
  return resolved.ok ? { ok: true, result: size(resolved.problem) } : resolved
}

/** Exact ends of the limits of one run; null where the run cannot be sized. */
export function detailRun(
  values: RunValues,
  defaults: RunValues,
  index: CatalogueIndex,
): RunDetail | null {
  const resolved = resolve(withDefaults(values, defaults), index)
  return resolved.ok ? { ends: limitEnds(resolved.problem) } : null
}

/** The values a run is sized with: its own, else the job's; a build-up of its own replaces the job's as a whole. */
export function withDefaults(values: RunValues, defaults: RunValues): RunValues {
  const merged = { ...defaults, ...values }
  const given = buildUpKeys.filter((key) => values[key] !== undefined)
  if (given.length === 0) return merged
  for (const key of buildUpKeys) {
    if (values[key] === undefined && clashes(key, values)) delete merged[key]
  }
  return merged
}

const buildUpKeys = ['material', 'conductivityWPerMK', 'thicknessM', 'layers'] as const

/** Layers stand alone; the other three may come together. */
const clashes = (key: (typeof buildUpKeys)[number], own: RunValues): boolean =>
  own.layers !== undefined ? key !== 'layers' : key === 'layers'
