/** Conduction through the corners of an insulated rectangular duct, in two forms to be compared. */

export interface RectangularLayer {
  /** Perimeter of the inner side of the layer [m]. */
  readonly innerPerimeterM: number
  readonly thicknessM: number
  readonly conductivityWPerMK: number
}

/** Shape factor of one edge between two walls of the same thickness. Source: Holman, Heat Transfer, table 3-1; walls longer than a fifth of their thickness. */
const EDGE_SHAPE_FACTOR = 0.54

/** What the mean-perimeter form takes for one edge, since P_e = P_i + 8d makes the mean perimeter P_i + 4d. */
const MEAN_PERIMETER_EDGE = 1

const withEdges = (
  { innerPerimeterM, thicknessM, conductivityWPerMK }: RectangularLayer,
  edge: number,
): number => thicknessM / (conductivityWPerMK * (innerPerimeterM + 4 * edge * thicknessM))

/**
 * Resistance per metre of duct with the mean perimeter [m·K/W]: R = 2d/(λ(P_i + P_e)).
 *
 * Source: ISO 12241:2022 as quoted in a public building-energy model.
 */
export function meanPerimeterResistanceMKPerW(layer: RectangularLayer): number {
  return withEdges(layer, MEAN_PERIMETER_EDGE)
}

/**
 * Resistance per metre of duct with the shape factor of its edges [m·K/W]: 1/R = λ(P_i/d + 4 · 0.54).
 *
 * Close to the exact field between two temperatures; the film resistance outside blunts the corners a little more.
 */
export function edgeFactorResistanceMKPerW(layer: RectangularLayer): number {
  return withEdges(layer, EDGE_SHAPE_FACTOR)
}

/** By how much the mean-perimeter form overstates the flow through the layer, 0 to 0.85: the more, the thicker the layer on a small duct. */
export function cornerExcessFraction(layer: RectangularLayer): number {
  const { innerPerimeterM, thicknessM } = layer
  const excessEdge = MEAN_PERIMETER_EDGE - EDGE_SHAPE_FACTOR
  return (4 * excessEdge * thicknessM) / (innerPerimeterM + 4 * EDGE_SHAPE_FACTOR * thicknessM)
}
