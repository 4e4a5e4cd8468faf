/** Conduction through the corners of an insulated rectangular duct, in two forms to be compared. */

export interface RectangularSection {
  /** Perimeter of the inner side of the layer [m]. */
  readonly innerPerimeterM: number
  readonly thicknessM: number
}

export interface RectangularLayer extends RectangularSection {
  readonly conductivityWPerMK: number
}

/** Shape factor of one edge between two walls of one thickness. Source: textbooks of heat transfer (Holman, table 3-1), from memory; walls longer than a fifth of their thickness. */
const EDGE_SHAPE_FACTOR = 0.54

/** What the mean perimeter, P_i + 4d, takes for one edge. */
const MEAN_PERIMETER_EDGE = 1

const resistanceMKPerW = (
  { innerPerimeterM, thicknessM, conductivityWPerMK }: RectangularLayer,
  edge: number,
): number => thicknessM / (conductivityWPerMK * (innerPerimeterM + 4 * edge * thicknessM))

/**
 * Resistance per metre of duct with the mean perimeter [m·K/W]: R = 2d/(λ(P_i + P_e)), P_e = P_i + 8d.
 *
 * Source: ISO 12241:2022 as quoted in a public building-energy model.
 */
export function meanPerimeterResistanceMKPerW(layer: RectangularLayer): number {
  return resistanceMKPerW(layer, MEAN_PERIMETER_EDGE)
}

/**
 * Resistance per metre of duct with the shape factor of its edges [m·K/W]: 1/R = λ(P_i/d + 4 · 0.54).
 *
 * Within half a per cent of the two-dimensional field of a usual duct; the exact edge between long walls is
 * 1 − (2/π) ln 2 = 0.5587. Source: textbooks of heat transfer, from memory.
 */
export function edgeFactorResistanceMKPerW(layer: RectangularLayer): number {
  return resistanceMKPerW(layer, EDGE_SHAPE_FACTOR)
}

/**
 * By how much the mean perimeter overstates the flow through the layer, as a fraction from 0 to 0.85: the more, the
 * thicker the layer on a small duct.
 */
export function cornerExcess({ innerPerimeterM, thicknessM }: RectangularSection): number {
  const excessM = 4 * (MEAN_PERIMETER_EDGE - EDGE_SHAPE_FACTOR) * thicknessM
  return excessM / (innerPerimeterM + 4 * EDGE_SHAPE_FACTOR * thicknessM)
}
