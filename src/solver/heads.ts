/** The heads of a vessel. */
import type { Heads } from './types.ts'

/**
 * Radius of the half sphere that has the area of a domed head, by the diameter of the vessel. The head is a half
 * ellipsoid half as high as wide; its area is π/4·D²·[1 + (1 − e²)/e·artanh e] with e² = 3/4. Source: geometry.
 */
export const DOME_RADIUS_PER_DIAMETER = Math.sqrt(
  (1 + (0.25 / Math.sqrt(0.75)) * Math.atanh(Math.sqrt(0.75))) / 8,
)

/** Outer area of one head of a vessel, lagged [m²]. */
export function headOuterAreaM2(heads: Heads, bareDiameterM: number, thicknessM: number): number {
  if (heads === 'flat') return (Math.PI / 4) * (bareDiameterM + 2 * thicknessM) ** 2
  return 2 * Math.PI * (bareDiameterM * DOME_RADIUS_PER_DIAMETER + thicknessM) ** 2
}

/** Volume enclosed by one head of a vessel, lagged; of a flat one the lagging alone [m³]. */
export function headVolumeM3(heads: Heads, bareDiameterM: number, thicknessM: number): number {
  if (heads === 'flat') return headOuterAreaM2(heads, bareDiameterM, thicknessM) * thicknessM
  return (2 / 3) * Math.PI * (bareDiameterM * DOME_RADIUS_PER_DIAMETER + thicknessM) ** 3
}
