/** What the solver takes and gives. SI units, temperatures in °C; heat flow is positive outwards. */

/** Thermal conductivity of one layer. Curves are straight between their points. */
export type Conductivity =
  | { readonly kind: 'constant'; readonly conductivityWPerMK: number }
  | {
      readonly kind: 'curve'
      /** `point`: λ(T) itself, integrated over the layer. `mean`: read at the layer's mean temperature. */
      readonly basis: 'point' | 'mean'
      /** Rising temperatures [°C], at least one. */
      readonly pointsC: readonly number[]
      /** λ at those temperatures [W/(m·K)], all > 0. */
      readonly valuesWPerMK: readonly number[]
    }

export interface Layer {
  readonly thicknessM: number
  readonly conductivity: Conductivity
}

/** What is lagged: the bare thing the layers go around. */
export type Shape =
  | { readonly kind: 'pipe'; readonly outerDiameterM: number; readonly orientation: 'horizontal' }
  | {
      readonly kind: 'pipe'
      readonly outerDiameterM: number
      readonly orientation: 'vertical' | 'inclined'
      /** Height of the run [m]: the length of the boundary layer. */
      readonly riseM: number
    }
  | {
      /** Laid in soil whose surface is at the air's temperature. */
      readonly kind: 'buried-pipe'
      readonly outerDiameterM: number
      /** Of the axis below the surface [m]. */
      readonly depthM: number
      readonly soilWPerMK: number
    }
  | {
      readonly kind: 'rect-duct'
      readonly widthM: number
      readonly heightM: number
      /** Height of a riser [m]; null for a duct that lies, with sides, top and bottom. */
      readonly riseM: number | null
    }
  | {
      readonly kind: 'flat'
      readonly facing: 'vertical' | 'up' | 'down'
      /** Height of a vertical surface, area/perimeter of a horizontal one [m]. */
      readonly characteristicLengthM: number
    }
  | { readonly kind: 'sphere'; readonly outerDiameterM: number }
  | {
      readonly kind: 'vessel'
      readonly outerDiameterM: number
      /** Length or height of the cylindrical shell between its heads [m]. */
      readonly shellLengthM: number
      readonly orientation: 'horizontal' | 'vertical'
      readonly heads: Heads
    }

export type Heads = 'flat' | 'domed'

/** What heat flow and area are counted by: a metre of run, a square metre, or the whole thing. */
export type Unit = 'm' | 'm2' | 'piece'

/** The air and the surfaces around a run under one design condition. */
export interface Surroundings {
  readonly airC: number
  /** Mean radiant temperature of what the surface sees [°C]. */
  readonly surroundingsC: number
  readonly windMPerS: number
  readonly altitudeM: number
}

/**
 * How the outer film is worked out. A fixed coefficient is convection and radiation together on surface minus air,
 * and then emissivity and surroundings count for nothing.
 */
export type FilmChoice = 'detailed' | 'simplified' | { readonly fixedWPerM2K: number }

export interface System {
  readonly shape: Shape
  /** Inside to outside; none for a bare surface. */
  readonly layers: readonly Layer[]
  /** Total hemispherical emissivity of the outer surface, 0 < ε ≤ 1. */
  readonly emissivity: number
  readonly mediumC: number
  /** Film between medium and inner surface [W/(m²·K)]; null where it is neglected. */
  readonly insideFilmWPerM2K: number | null
  readonly around: Surroundings
  /** Sun taken up, absorptance times irradiance, on each m² of the outer surface [W/m²], ≥ 0. */
  readonly sunAbsorbedWPerM2: number
  readonly film: FilmChoice
  /** Inclined pipes lie between two films: the lower is cautious for a temperature, the higher for a loss. */
  readonly inclinedFilm: 'lower' | 'higher'
}

/**
 * A finding of the solver that a reader should know; never an exception. `code` is film-range, film-jump, film-method,
 * duct-corners, vessel-heads, soil-shallow, conductivity-extrapolated or conductivity-steep.
 */
export interface Note {
  readonly code: string
  readonly text: string
}

export type SideName =
  | 'all round'
  | 'side'
  | 'top'
  | 'bottom'
  | 'shell'
  | 'heads'
  | 'top head'
  | 'bottom head'

/** How the balance of a face was closed; the last two are said in a note. */
export type Closure = 'closed' | 'on-jump' | 'steep'

/** One face of the surface: all of a pipe; side, top or bottom of a rectangular duct; shell or head of a vessel. */
export interface Face {
  readonly side: SideName
  readonly surfaceTempC: number
  readonly heatFluxWPerM2: number
  readonly convectionWPerM2K: number
  readonly radiationWPerM2K: number
  /** Inside to outside, layers + 1 values: the bare thing's surface first, the outer surface last. */
  readonly interfaceTempsC: readonly number[]
  /** Share of the outer area. */
  readonly share: number
  readonly closure: Closure
}

export interface Solution {
  readonly unit: Unit
  /** Outwards, for one unit [W/m, W/m² or W]. */
  readonly heatFlowWPerUnit: number
  /** Outer area of one unit [m²]. */
  readonly outerAreaM2PerUnit: number
  /** Null where the unit is not a metre of run. */
  readonly heatLossWPerM: number | null
  /** On the outer area, mean of the faces: what passes outwards, the sun's share taken off. */
  readonly heatFluxWPerM2: number
  /** Area mean of the faces. */
  readonly surfaceTempC: number
  readonly convectionWPerM2K: number
  readonly radiationWPerM2K: number
  readonly interfaceTempsC: readonly number[]
  readonly faces: readonly Face[]
  /** Outer diameter of a pipe, round duct, sphere or vessel [m], else null. */
  readonly outerDiameterM: number | null
  /** How often the film was worked out, all faces together. */
  readonly filmEvaluations: number
}
