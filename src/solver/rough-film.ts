/** The outer film for a first guess. */
import type { Film, Weather } from './film.ts'
import type { FaceShape } from './geometry.ts'
import type { FilmChoice } from './types.ts'

export interface RoughFilm {
  readonly film: Film
  /** What more the convection grows by, for each kelvin, than its coefficient: a film grows with its difference. */
  readonly stiffening: number
}

/**
 * A film for a first guess: right to some tens of per cent for the price of a square root. Only the speed of the search
 * depends on it; no result does.
 */
export function roughFilmOf(face: FaceShape, weather: Weather, choice: FilmChoice): RoughFilm {
  if (face.flow === 'ground') return { film: () => face.groundWPerM2K, stiffening: 1 }
  if (typeof choice === 'object') return { film: () => choice.fixedWPerM2K, stiffening: 1 }
  const lengthM = Math.min(face.freeLengthM, 0.3)
  const conducted = 0.01 / lengthM
  const free = (excessK: number): number =>
    conducted + 1.25 * Math.sqrt(Math.sqrt(Math.abs(excessK) / lengthM))
  const { windMPerS } = weather
  if (windMPerS === 0) return { film: free, stiffening: 1.25 }
  const forced = (4.2 * windMPerS ** 0.6) / face.windLengthM ** 0.4
  return {
    film: (excessK) => Math.max(free(excessK), forced),
    stiffening: forced > 5 ? 1 : 1.25,
  }
}
