/**
 * Standing water in a pipe on its way to ice: first it cools, then it freezes.
 *
 * Supercooling before the first crystal is left out, which errs on the early side. A pipe bursts where ice shuts water
 * in, not where ice first touches the wall, so that a share of ice is a measure and no limit of strength.
 */

/** Water that stands in pipes: density [kg/m³] and heat capacity [J/(kg·K)], 0 to 20 °C. Source: from memory; tables of water give 998 to 1000 and 4180 to 4220. */
export const WATER_KG_PER_M3 = 1000
export const WATER_J_PER_KG_K = 4190

/** Freezing point of fresh water [°C]. Source: definition of the Celsius scale. */
export const FREEZING_C = 0

/** Density of ice [kg/m³] and heat of freezing [J/kg]. Source: ISO 12241 form, from memory; tables give 917 and 333.5e3 to 334e3. */
export const ICE_KG_PER_M3 = 920
export const ICE_LATENT_J_PER_KG = 334e3

/** Conductivity of ice at 0 °C [W/(m·K)]. Source: from memory; tables give 2.1 to 2.2. */
export const ICE_W_PER_M_K = 2.2

/** The share of ice that a line may hold when its time is up. Source: usual value of the ISO 12241 form, from memory. */
export const USUAL_ICE_FRACTION = 0.25

/** Heat capacity of the water in a full pipe, per metre [J/(m·K)]; bore [m]. */
export function waterCapacityJPerMK(boreM: number): number {
  return areaM2(boreM) * WATER_KG_PER_M3 * WATER_J_PER_KG_K
}

export interface PipeWall {
  readonly outerDiameterM: number
  readonly boreM: number
  readonly densityKgPerM3: number
  readonly heatCapacityJPerKgK: number
}

/** Heat capacity of the wall of a pipe, per metre [J/(m·K)]. */
export function wallCapacityJPerMK({
  outerDiameterM,
  boreM,
  densityKgPerM3,
  heatCapacityJPerKgK,
}: PipeWall): number {
  return (areaM2(outerDiameterM) - areaM2(boreM)) * densityKgPerM3 * heatCapacityJPerKgK
}

const areaM2 = (diameterM: number): number => (Math.PI / 4) * diameterM * diameterM

export interface Cooling {
  /** Of water, wall and whatever cools with them, per metre of pipe. */
  readonly capacityJPerMK: number
  /** From the water to the air, films included, per metre of pipe. */
  readonly resistanceMKPerW: number
  readonly startC: number
  readonly endC: number
  readonly airC: number
}

/**
 * Time in which standing content cools from start to end [s]; 0 where it is as cold already, null where the air is not
 * colder than the end, so that it never gets there.
 *
 * t = C R ln[(θ0 − θa)/(θ1 − θa)], the content at one temperature throughout.
 * Source: ASHRAE Handbook Fundamentals 2021, ch. 23, eqs. (1) and (2).
 */
export function coolingTimeS({
  capacityJPerMK,
  resistanceMKPerW,
  startC,
  endC,
  airC,
}: Cooling): number | null {
  if (startC <= endC) return 0
  if (airC >= endC) return null
  return capacityJPerMK * resistanceMKPerW * Math.log((startC - airC) / (endC - airC))
}

export interface Freezing {
  /** Share of the bore that turns to ice, 0 to 1. */
  readonly iceFraction: number
  readonly boreM: number
  /** From the inner wall of the pipe to the air, per metre of pipe. */
  readonly resistanceMKPerW: number
  readonly airC: number
}

/**
 * Time in which a share of the water freezes, from 0 °C on [s]; null where the air does not freeze it.
 *
 * The ice grows inward from the wall and hinders its own growth:
 * t = ρ h_f π r² / (−θa) · [f R + (f + (1 − f) ln(1 − f)) / (4πλ_ice)].
 * Source: energy balance of a ring of ice, quasi-steady; the first term alone is `freezingTimeOfThinIceS`.
 */
export function freezingTimeS(freezing: Freezing): number | null {
  const { iceFraction: f, resistanceMKPerW } = freezing
  // The integral of −ln(1 − f) over f; its last term tends to 0 where all is ice.
  const growth = f < 1 ? f + (1 - f) * Math.log1p(-f) : 1
  return timeS(freezing, f * resistanceMKPerW + growth / (4 * Math.PI * ICE_W_PER_M_K))
}

/**
 * The same without the resistance of the ice itself [s]: shorter, so on the safe side; null where the air does not freeze it.
 *
 * Source: ISO 12241 form, from memory.
 */
export function freezingTimeOfThinIceS(freezing: Freezing): number | null {
  return timeS(freezing, freezing.iceFraction * freezing.resistanceMKPerW)
}

/** Heat of freezing of the whole bore through a mean resistance that already carries the share of ice. */
function timeS({ iceFraction, boreM, airC }: Freezing, sharedMKPerW: number): number | null {
  if (iceFraction === 0) return 0
  if (airC >= FREEZING_C) return null
  const heatJPerM = areaM2(boreM) * ICE_KG_PER_M3 * ICE_LATENT_J_PER_KG
  return (heatJPerM * sharedMKPerW) / (FREEZING_C - airC)
}
