import type { FinishPrice, LabourTerms, PriceModel } from '#catalogue/types.ts'

/** What of one layer is priced: per metre of run, or per m² of a flat surface. */
export interface PricedLayer {
  readonly price: PriceModel
  /** Insulation volume [m³ per m or m²]. */
  readonly volumeM3: number
  /** Outer area of the layer [m² per m or m²]. */
  readonly outerAreaM2: number
  /** Number of pieces laid over each other. */
  readonly pieces: number
}

export interface PricedFinish {
  readonly price: FinishPrice
  readonly outerAreaM2: number
}

/** Labour factor for a number of layers: the last one given for more. */
export function layerFactor(labour: LabourTerms, pieces: number): number {
  const factors = labour.layerFactors
  return factors[Math.min(pieces, factors.length) - 1] ?? 1
}

/**
 * Installed cost of a build-up, per metre of run or per m² of a flat surface.
 *
 * Material p_vol·V + p_area·A + p_fix with waste, labour (a + b·A)·layer factor at the hourly rate, finish alike. The
 * currency is that of the price rows. Source: estimating practice, no single source (illustrative until the user owns
 * a price book).
 */
export function installedCost(
  layers: readonly PricedLayer[],
  finish: PricedFinish | null,
  labour: LabourTerms,
): number {
  let cost = 0
  for (const { price, volumeM3, outerAreaM2, pieces } of layers) {
    const material = price.perM3 * volumeM3 + (price.perM2 * outerAreaM2 + price.perM) * pieces
    const hours =
      (price.labourHoursPerM + price.labourHoursPerM2 * outerAreaM2) * layerFactor(labour, pieces)
    cost += material * (1 + price.wasteFraction) + hours * labour.ratePerHour
  }
  if (finish) {
    const { price, outerAreaM2 } = finish
    const hours = price.labourHoursPerM + price.labourHoursPerM2 * outerAreaM2
    cost += price.perM2 * outerAreaM2 * (1 + price.wasteFraction) + hours * labour.ratePerHour
  }
  return cost
}
