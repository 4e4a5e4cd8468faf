/** A single pipe in the ground. */

export interface BuriedPipe {
  /** From the surface of the ground to the axis [m]. */
  readonly depthM: number
  /** Over insulation and jacket [m]. */
  readonly outerDiameterM: number
  readonly soilWPerMK: number
}

/**
 * Resistance of the soil between a buried pipe and the surface of the ground, per metre of pipe [m·K/W]; null for a
 * pipe that is not wholly in the ground.
 *
 * Exact for an even soil under a surface of one temperature: R = arcosh(2H/D) / (2πλ). Source: conduction shape factor
 * of a cylinder below a plane, in any textbook of heat transfer, from memory.
 */
export function soilResistanceMKPerW({
  depthM,
  outerDiameterM,
  soilWPerMK,
}: BuriedPipe): number | null {
  const ratio = (2 * depthM) / outerDiameterM
  return ratio < 1 ? null : Math.acosh(ratio) / (2 * Math.PI * soilWPerMK)
}
