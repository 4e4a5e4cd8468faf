import { type Film, filmOf, radiates, type Weather } from './film.ts'
import type { FaceShape } from './geometry.ts'
import { acrossLayersK, insideM2KPerW } from './layers.ts'
import { radiationSlopeWPerM2K, radiationWPerM2K, radiativeC } from './radiation.ts'
import { type RoughFilm, roughFilmOf } from './rough-film.ts'
import type { System } from './types.ts'

/**
 * The heat balance of one face, by the excess of its surface over the air: what film, radiation and sun make of it, and
 * what drives that flux through the layers. Temperatures are excesses over the air [K], fluxes on the outer area,
 * positive outwards [W/m²].
 */
export class Balance {
  readonly mediumExcessK: number
  /** 0 where nothing is radiated. */
  readonly surroundingsExcessK: number
  readonly sunAbsorbedWPerM2: number
  readonly rough: RoughFilm
  /** True for a bare surface without a film inside, which is as hot as the medium. */
  readonly isOpen: boolean
  filmEvaluations = 0

  readonly #system: System
  readonly #formsM: readonly number[]
  readonly #hasRadiation: boolean
  readonly #insideM2KPerW: number
  readonly #film: Film
  // The last film is kept: the search ends where it looked last, and its film is that of the answer.
  #filmAtK = Number.NaN
  #convectionWPerM2K = 0

  constructor(system: System, face: FaceShape, weather: Weather) {
    const { airC, surroundingsC } = system.around
    this.#system = system
    this.#formsM = face.formsM
    this.#hasRadiation = radiates(face, system.film)
    this.#insideM2KPerW = insideM2KPerW(system, face)
    this.#film = filmOf(face, weather, system.film, system.inclinedFilm)
    this.rough = roughFilmOf(face, weather, system.film)
    this.mediumExcessK = system.mediumC - airC
    this.surroundingsExcessK = this.#hasRadiation ? surroundingsC - airC : 0
    this.sunAbsorbedWPerM2 = system.sunAbsorbedWPerM2
    this.isOpen = system.layers.length === 0 && this.#insideM2KPerW === 0
  }

  convectionWPerM2K(excessK: number): number {
    if (excessK !== this.#filmAtK) {
      this.filmEvaluations += 1
      this.#filmAtK = excessK
      this.#convectionWPerM2K = this.#film(excessK)
    }
    return this.#convectionWPerM2K
  }

  radiationWPerM2K(excessK: number): number {
    if (!this.#hasRadiation) return 0
    const { emissivity, around } = this.#system
    return radiationWPerM2K(emissivity, around.airC + excessK, around.surroundingsC)
  }

  radiationSlopeWPerM2K(excessK: number): number {
    if (!this.#hasRadiation) return 0
    return radiationSlopeWPerM2K(this.#system.emissivity, this.#system.around.airC + excessK)
  }

  radiatedWPerM2(excessK: number): number {
    return this.radiationWPerM2K(excessK) * (excessK - this.surroundingsExcessK)
  }

  /** What the surface gives off, the sun's share taken off. */
  fluxWPerM2(excessK: number): number {
    const convected = excessK === 0 ? 0 : this.convectionWPerM2K(excessK) * excessK
    return convected + this.radiatedWPerM2(excessK) - this.sunAbsorbedWPerM2
  }

  /** Medium over surface that drives a flux through the layers and the film inside [K]. */
  drivenK(excessK: number, fluxWPerM2: number): number {
    const { layers, around } = this.#system
    return (
      acrossLayersK(layers, this.#formsM, around.airC + excessK, fluxWPerM2) +
      fluxWPerM2 * this.#insideM2KPerW
    )
  }

  /** What the medium lacks to drive a flux to the surface [K]; 0 where the balance closes. */
  missingK(excessK: number, fluxWPerM2: number): number {
    return excessK + this.drivenK(excessK, fluxWPerM2) - this.mediumExcessK
  }

  /** Resistance of layers and inside film with all of them at one temperature [m²·K/W]. */
  resistanceM2KPerW(excessK: number): number {
    return this.drivenK(excessK, TRIAL_W_PER_M2) / TRIAL_W_PER_M2
  }

  /** Ends of what the surface can be: medium, surroundings and air, and above them what the sun can make of it. */
  bracketK(): { readonly low: number; readonly high: number } {
    return {
      low: Math.min(this.mediumExcessK, this.surroundingsExcessK, 0),
      high: Math.max(this.mediumExcessK, this.surroundingsExcessK, 0, this.#sunlitExcessK()),
    }
  }

  /** The sun can heat a surface above medium, air and surroundings, until radiation alone gives off all of it. */
  #sunlitExcessK(): number {
    const { emissivity, around } = this.#system
    if (this.sunAbsorbedWPerM2 === 0) return 0
    return this.#hasRadiation
      ? radiativeC(emissivity, around.surroundingsC, this.sunAbsorbedWPerM2) - around.airC
      : this.sunAbsorbedWPerM2 / this.#film(1)
  }
}

/** So little that the layers stay at one temperature. */
const TRIAL_W_PER_M2 = 1e-3
