import { kelvin, STEFAN_BOLTZMANN_W_PER_M2_K4 } from './constants.ts'

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
