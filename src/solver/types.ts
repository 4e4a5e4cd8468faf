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
      readonly orientation: 'vertical'
      /** Height of the run [m]: the length of the boundary layer. */
      readonly riseM: number
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

/** The air and the surfaces around a run under one design condition. */
export interface Surroundings {
  readonly airC: number
  /** Mean radiant temperature of what the surface sees [°C]. */
  readonly surroundingsC: number
  readonly windMPerS: number
  readonly altitudeM: number
}

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
}

/** A finding of the solver that a reader should know; never an exception. `code` is film-range, film-jump, conductivity-extrapolated or conductivity-steep. */
export interface Note {
  readonly code: string
  readonly text: string
}

export type SideName = 'all round' | 'side' | 'top' | 'bottom'

/** One face of the surface: all of a pipe; side, top or bottom of a rectangular duct. */
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
}

export interface Solution {
  /** Null for a flat surface. */
  readonly heatLossWPerM: number | null
  /** On the outer area, mean of the faces. */
  readonly heatFluxWPerM2: number
  /** Area mean of the faces. */
  readonly surfaceTempC: number
  readonly convectionWPerM2K: number
  readonly radiationWPerM2K: number
  readonly interfaceTempsC: readonly number[]
  readonly faces: readonly Face[]
  /** Outer diameter of a pipe or round duct [m], else null. */
  readonly outerDiameterM: number | null
  /** Outer area per metre [m²/m]; null for a flat surface. */
  readonly outerAreaM2PerM: number | null
  readonly notes: readonly Note[]
}
