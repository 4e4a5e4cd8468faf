/** Conduction through layers with films of given coefficients, through the whole of `solve`. */
import { solve } from '#solver/solve.ts'
import type { Shape, Solution } from '#solver/types.ts'
import type { PublishedRow, Within } from '../../published.ts'
import { constant, plainFilm, still } from '../systems.ts'

export interface Example {
  readonly shape: Shape
  /** Thickness [m] and conductivity, inside to outside. */
  readonly layers: readonly (readonly [thicknessM: number, conductivityWPerMK: number])[]
  readonly insideC: number
  readonly outsideC: number
  readonly insideFilmWPerM2K?: number
  readonly outsideFilmWPerM2K?: number
}

/** A film that lets through whatever comes, where the example has none. */
const NO_RESISTANCE_W_PER_M2_K = 1e9

export function worked({ shape, layers, insideC, outsideC, ...films }: Example): Solution {
  return solve({
    ...plainFilm,
    shape,
    layers: layers.map((layer) => constant(...layer)),
    mediumC: insideC,
    insideFilmWPerM2K: films.insideFilmWPerM2K ?? null,
    film: { fixedWPerM2K: films.outsideFilmWPerM2K ?? NO_RESISTANCE_W_PER_M2_K },
    around: still(outsideC),
  })
}

export const perM = (given: Example): number => worked(given).heatLossWPerM ?? Number.NaN
export const border =
  (j: number) =>
  (given: Example): number =>
    worked(given).interfaceTempsC[j] ?? Number.NaN

export const row = (
  from: string,
  given: Example,
  printed: string,
  within?: Within,
): PublishedRow<Example> => ({ from, given, printed, ...(within ? { within } : {}) })
