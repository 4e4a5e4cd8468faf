/** Which value of a run fixes its lagging at a thickness: its own thickness, or the sized layer of several. */
import type { RunValues } from '#model/fields.ts'

export type ThicknessOverride =
  | { readonly key: 'thicknessM'; readonly value: number }
  | { readonly key: 'layers'; readonly value: string }

/** `thicknessM` is that of the whole build-up; with layers, the one written `?` takes what the others leave. */
export function thicknessOverride({ layers }: RunValues, thicknessM: number): ThicknessOverride {
  if (layers === undefined) return { key: 'thicknessM', value: thicknessM }
  const parts = layers.split(';').map((layer) => layer.split(':').map((word) => word.trim()))
  const fixedMm = parts.reduce((sum, [, size]) => sum + (size === '?' ? 0 : Number(size)), 0)
  const sizedMm = Number((thicknessM * 1000 - fixedMm).toFixed(3))
  const value = parts.map(([material, size]) => `${material}:${size === '?' ? sizedMm : size}`)
  return { key: 'layers', value: value.join(';') }
}
