/** What a line does to the stream in it. */

export interface Stream {
  readonly startC: number
  /** Air around the line [°C]. */
  readonly airC: number
  /** Heat transfer of the whole line: per metre times length [W/K]. */
  readonly uaWPerK: number
  readonly flowKgPerS: number
  readonly heatCapacityJPerKgK: number
}

/**
 * Temperature of the stream at the end of the line [°C].
 *
 * (θ − θa) = (θ0 − θa) exp(−UA/(ṁc)), for a loss proportional to the difference. A stream that stands still takes the
 * temperature of the air. Source: energy balance of plug flow.
 */
export function arrivalTempC({
  startC,
  airC,
  uaWPerK,
  flowKgPerS,
  heatCapacityJPerKgK,
}: Stream): number {
  // A line without loss keeps its temperature even where 0/0 would stand in the exponent.
  if (uaWPerK === 0) return startC
  return airC + (startC - airC) * Math.exp(-uaWPerK / (flowKgPerS * heatCapacityJPerKgK))
}

/**
 * Drop of temperature of a stream that gives off a known heat flow [K].
 *
 * Heat flow [W], mass flow [kg/s] above 0, heat capacity [J/(kg·K)]. Source: ASHRAE Handbook Fundamentals 2021, ch. 23, eq. (3).
 */
export function temperatureDropK({
  heatFlowW,
  flowKgPerS,
  heatCapacityJPerKgK,
}: {
  readonly heatFlowW: number
  readonly flowKgPerS: number
  readonly heatCapacityJPerKgK: number
}): number {
  return heatFlowW / (flowKgPerS * heatCapacityJPerKgK)
}

/**
 * Condensate that a heat loss makes of saturated steam [kg/s].
 *
 * Heat flow [W], latent heat at the pressure of the steam [J/kg]. Source: energy balance.
 */
export function condensateKgPerS({
  heatFlowW,
  latentHeatJPerKg,
}: {
  readonly heatFlowW: number
  readonly latentHeatJPerKg: number
}): number {
  return heatFlowW / latentHeatJPerKg
}
