/** What the layers of one face do to a heat flux that passes through them; fluxes on the outer area. */
import { layerDifferenceK } from './conductivity.ts'
import type { FaceShape } from './geometry.ts'
import type { Layer, System } from './types.ts'

/** Inner minus outer temperature over all layers [K]. */
export function acrossLayersK(
  layers: readonly Layer[],
  formsM: readonly number[],
  surfaceC: number,
  fluxWPerM2: number,
): number {
  let differenceK = 0
  for (let index = layers.length - 1; index >= 0; index -= 1) {
    const layer = layers[index] as Layer
    differenceK += layerDifferenceK(
      layer.conductivity,
      surfaceC + differenceK,
      fluxWPerM2 * (formsM[index] as number),
    )
  }
  return differenceK
}

/** Temperatures from the bare thing's surface to the outer surface [°C]. */
export function interfacesC(
  layers: readonly Layer[],
  formsM: readonly number[],
  surfaceC: number,
  fluxWPerM2: number,
): number[] {
  const tempsC = new Array<number>(layers.length + 1).fill(surfaceC)
  let tempC = surfaceC
  for (let index = layers.length - 1; index >= 0; index -= 1) {
    const layer = layers[index] as Layer
    tempC += layerDifferenceK(layer.conductivity, tempC, fluxWPerM2 * (formsM[index] as number))
    tempsC[index] = tempC
  }
  return tempsC
}

/** Resistance of the film inside [m²·K/W]; 0 where it is neglected. */
export const insideM2KPerW = (
  { insideFilmWPerM2K }: System,
  { outerOverInner }: FaceShape,
): number => (insideFilmWPerM2K === null ? 0 : outerOverInner / insideFilmWPerM2K)
