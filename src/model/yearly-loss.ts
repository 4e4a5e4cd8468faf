/** The loss of a run in one state, bare or as built. SI; heat flow positive outwards. */

/** `fixed`: as given. `chosen`: the rung that was sized. `thickest`: none meets the limits. */
export type Built = 'bare' | 'fixed' | 'chosen' | 'thickest'

/** Nulls: no length or area; no fuel. */
export interface YearlyLoss {
  /** Null for a flat surface, a sphere and a vessel. */
  readonly heatLossWPerM: number | null
  readonly heatFluxWPerM2: number
  /** Whole run with its fittings, at the loss condition [W]. */
  readonly heatLossW: number | null
  /** Of it what has to be made up, mean of the year [W]: heat, cost and CO2 of the year follow from it. */
  readonly yearlyMeanLossW: number | null
  readonly heatKWh: number | null
  readonly cost: number | null
  readonly co2Kg: number | null
}
