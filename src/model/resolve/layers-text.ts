/** Reads `material:mm;material:?`, inside to outside. */

export interface LayerText {
  readonly name: string
  /** Null for the layer that is sized, written `?`. */
  readonly thicknessM: number | null
}

export type LayersText =
  | { readonly ok: true; readonly layers: readonly LayerText[] }
  | { readonly ok: false; readonly allowed: string }

const FORM =
  'material:mm;material:mm from inside to outside, with ? in place of the mm of the layer to size, e.g. calcium_silicate:40;stone_wool_pipe_section:?'
const MOST_LAYERS = 8
const THICKEST_M = 1

export function parseLayers(text: string): LayersText {
  const parts = text
    .split(';')
    .map((part) => part.trim())
    .filter((part) => part !== '')
  if (parts.length === 0) return { ok: false, allowed: FORM }
  if (parts.length > MOST_LAYERS) return { ok: false, allowed: `at most ${MOST_LAYERS} layers` }
  const layers: LayerText[] = []
  for (const part of parts) {
    const match = /^(.+?)\s*:\s*(\?|\d+(?:[.,]\d+)?)\s*(?:mm)?$/.exec(part)
    if (!match) return { ok: false, allowed: FORM }
    const [, name = '', thickness = ''] = match
    const thicknessM = thickness === '?' ? null : Number(thickness.replace(',', '.')) / 1000
    if (thicknessM !== null && !(thicknessM > 0 && thicknessM <= THICKEST_M)) {
      return {
        ok: false,
        allowed: `a thickness above 0 and up to ${THICKEST_M * 1000} mm for ${name}`,
      }
    }
    layers.push({ name, thicknessM })
  }
  if (layers.filter(({ thicknessM }) => thicknessM === null).length > 1) {
    return { ok: false, allowed: 'at most one ?: only one layer is sized' }
  }
  return { ok: true, layers }
}
