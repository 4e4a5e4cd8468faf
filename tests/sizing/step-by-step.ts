/**
 * A second, slow way to the times and temperatures of frost and arrival: small steps, each with the heat flow of that
 * very state, in place of the closed formulas with one resistance. Shares the solver, nothing of `src/sizing`.
 */
import { solve } from '#solver/index.ts'
import type { System } from '#solver/types.ts'

/** A system whose medium is stepped. */
export type Standing = Omit<System, 'mediumC'>

const flowAt = (standing: Standing, mediumC: number): number =>
  solve({ ...standing, mediumC }).heatFlowWPerUnit

/** Hours in which a content of so much heat capacity [J/(m·K)] cools from start to end, in steps of its temperature. */
export function coolingHours(
  standing: Standing,
  capacityJPerMK: number,
  startC: number,
  endC: number,
  steps = 60,
): number {
  const stepK = (startC - endC) / steps
  let seconds = 0
  for (let n = 0; n < steps; n += 1)
    seconds += (capacityJPerMK * stepK) / flowAt(standing, startC - (n + 0.5) * stepK)
  return seconds / 3600
}

/** Hours in which a share of the bore freezes, ring by ring: the ice lets through what the rest of the way takes. */
export function freezingHours(
  standing: Standing,
  boreM: number,
  iceFraction: number,
  rings = 60,
): number {
  const areaM2 = (Math.PI / 4) * boreM ** 2
  const heatJPerM = (920 * 334e3 * areaM2 * iceFraction) / rings
  let seconds = 0
  for (let n = 0; n < rings; n += 1) {
    const share = ((n + 0.5) / rings) * iceFraction
    const iceMKPerW = -Math.log(1 - share) / (4 * Math.PI * 2.2)
    // The wall temperature at which the ice passes on what leaves the pipe.
    let [low, high] = [-120, 0]
    for (let halving = 0; halving < 30; halving += 1) {
      const middle = (low + high) / 2
      if (flowAt(standing, middle) > -middle / iceMKPerW) high = middle
      else low = middle
    }
    seconds += heatJPerM / flowAt(standing, high)
  }
  return seconds / 3600
}

/** Temperature of a stream after a length, metre by metre. */
export function streamEndC(
  standing: Standing,
  startC: number,
  lengthM: number,
  capacityRateWPerK: number,
  steps = 120,
): number {
  let tempC = startC
  for (let n = 0; n < steps; n += 1) {
    const half = tempC - (flowAt(standing, tempC) * lengthM) / steps / capacityRateWPerK / 2
    tempC -= (flowAt(standing, half) * lengthM) / steps / capacityRateWPerK
  }
  return tempC
}
