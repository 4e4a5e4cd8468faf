import { kelvin, STEFAN_BOLTZMANN_W_PER_M2_K4, ZERO_CELSIUS_K } from './constants.ts'

/**
 * Radiation coefficient of a small grey surface in large surroundings [W/(m²·K)], on the difference surface minus
 * surroundings; exact, since T⁴ − T_r⁴ is factored.
 *
 * Temperatures [°C], emissivity 0 to 1. Source: Stefan-Boltzmann law; ASHRAE Handbook Fundamentals 2021, ch. 23, eq. (11).
 */
export function radiationWPerM2K(
  emissivity: number,
  surfaceTempC: number,
  surroundingsC: number,
): number {
  const Ts = kelvin(surfaceTempC)
  const Tr = kelvin(surroundingsC)
  return emissivity * STEFAN_BOLTZMANN_W_PER_M2_K4 * (Ts * Ts + Tr * Tr) * (Ts + Tr)
}

/** What more a grey surface radiates for each kelvin that it is hotter: 4εσT³ [W/(m²·K)]. Temperature [°C]. */
export function radiationSlopeWPerM2K(emissivity: number, surfaceTempC: number): number {
  const T = kelvin(surfaceTempC)
  return 4 * emissivity * STEFAN_BOLTZMANN_W_PER_M2_K4 * T * T * T
}

/** Temperature at which a grey surface radiates a flux to its surroundings [°C]. Flux [W/m²], ≥ 0; emissivity > 0. */
export function radiativeC(emissivity: number, surroundingsC: number, fluxWPerM2: number): number {
  const Tr = kelvin(surroundingsC)
  const fourth = Tr * Tr * Tr * Tr + fluxWPerM2 / (emissivity * STEFAN_BOLTZMANN_W_PER_M2_K4)
  return Math.sqrt(Math.sqrt(fourth)) - ZERO_CELSIUS_K
}
