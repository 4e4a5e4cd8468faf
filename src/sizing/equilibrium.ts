/** The temperature of the medium at which a run would lose nothing: what its losses drive it towards. */
import { bracketedRoot } from '#solver/index.ts'
import type { Condition } from './problem.ts'

/** Found this near [K], well below what any input is known to. */
const EXACT_K = 1e-9

/**
 * Temperature [°C] that a run tends to under one condition: that of the air, unless the surroundings are at another
 * temperature or the sun shines. `flowAt` gives the heat flow outwards at a temperature of the medium [W or W/m]; it
 * rises with it. The layers do not matter where nothing flows, only the surface and its films.
 */
export function equilibriumC(
  { around, sunWPerM2 }: Condition,
  flowAt: (mediumC: number) => number,
): number {
  const { airC, surroundingsC } = around
  if (surroundingsC === airC && sunWPerM2 === 0) return airC
  const low = Math.min(airC, surroundingsC)
  const high = sunlitC(Math.max(airC, surroundingsC), sunWPerM2, flowAt)
  return bracketedRoot(flowAt, { low, high }, { width: EXACT_K, value: 0 }).at
}

/** Upper bracket: the sun can hold a run above air and surroundings. */
function sunlitC(warmestC: number, sunWPerM2: number, flowAt: (mediumC: number) => number): number {
  if (sunWPerM2 === 0) return warmestC
  let addedK = 0.1 * sunWPerM2
  while (flowAt(warmestC + addedK) < 0) addedK *= 2
  return warmestC + addedK
}
