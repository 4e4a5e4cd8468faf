/** What sizing takes: one run with everything looked up and checked. SI units, temperatures in °C. */
import type { FinishPrice, LabourTerms, PriceModel } from '#catalogue/types.ts'
import type { EnergyTerms } from '#money/energy-cost.ts'
import type { Conductivity, Shape, Surroundings } from '#solver/types.ts'
import type { Note } from './result.ts'

/** The worst the run meets for one question. */
export interface Condition {
  readonly around: Surroundings
  readonly mediumC: number
  /** Of the jacket: aged for loss, new for touch and damp. */
  readonly emissivity: number
  /** Of the bare surface. */
  readonly bareEmissivity: number
}

export interface LayerMaterial {
  readonly name: string
  readonly conductivity: Conductivity
  /** Null where no range is stated, as for a conductivity given by hand. */
  readonly serviceMinC: number | null
  readonly serviceMaxC: number | null
  readonly price: PriceModel | null
}

/** One material of a build-up, inside to outside; its thickness is fixed, or null for the one that is sized. */
export interface BuildUpLayer {
  readonly material: LayerMaterial
  readonly thicknessM: number | null
  /** Thickness of each piece where it is fixed [m]. */
  readonly piecesM: readonly number[]
}

export interface FinishChoice {
  readonly name: string
  readonly surfaceMaxC: number | null
  readonly price: FinishPrice | null
}

/** One thickness of the sized layer that can be bought. */
export interface Step {
  /** True thickness [m]. */
  readonly thicknessM: number
  readonly nominalThicknessM: number | null
  /** Pieces it is made of, inside to outside [m]. */
  readonly piecesM: readonly number[]
}

/** A surface passes only below it. */
export interface BurnLimit {
  readonly thresholdC: number
  /** The touched surface and the contact time in words: "smooth metal", "1 min". */
  readonly surface: string
  readonly contact: string
}

export interface Limits {
  /** Stated surface limit [°C], passes at or below. */
  readonly maxSurfaceC: number | null
  /** Burn threshold of the jacket; null where touch is not judged by the burn curve. */
  readonly burn: BurnLimit | null
  /** Burn threshold of the bare surface. */
  readonly bareBurn: BurnLimit | null
  readonly maxLossWPerM: number | null
  readonly maxLossWPerM2: number | null
  /** Dew point of the damp air and the margin; null where damp is not judged. */
  readonly damp: { readonly dewPointC: number; readonly marginK: number } | null
}

export interface MoneyTerms {
  readonly energy: EnergyTerms
  readonly fuelName: string
  readonly co2KgPerKWh: number | null
  readonly currency: string
  readonly discount: number
  readonly growth: number
  readonly lifeYears: number
  readonly labour: LabourTerms
}

export interface Problem {
  readonly tag: string
  readonly shape: Shape
  readonly insideFilmWPerM2K: number | null
  /** Length of a pipe or duct [m], or area of a flat surface [m²]; null where not given. */
  readonly extent: number | null
  readonly layers: readonly BuildUpLayer[]
  readonly finish: FinishChoice | null
  /** Rungs in order for the sized layer; empty where every thickness is fixed. */
  readonly steps: readonly Step[]
  readonly conditions: {
    readonly loss: Condition
    readonly touch: Condition
    readonly damp: Condition
  }
  readonly limits: Limits
  /** Null where the cost is not weighed. */
  readonly money: MoneyTerms | null
  /** Yearly running hours; null where not given. */
  readonly hoursPerYear: number | null
  /** Assumptions made while the run was put together. */
  readonly notes: readonly Note[]
}
