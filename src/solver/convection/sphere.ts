/** Convection at a sphere: mean Nusselt numbers on the outer diameter. */
import { correlation } from '../correlation.ts'
import type { FreeFlow } from './natural.ts'

/**
 * Sphere in still air, Rayleigh and Prandtl numbers at film temperature.
 *
 * The extended form: its last factor carries the laminar formula, valid to Ra 1e11, into turbulence.
 */
export const nusseltSphere = correlation<FreeFlow>(
  {
    name: 'Churchill, sphere',
    source: 'churchill1983sphere',
    equation:
      'Nu = 2 + 0.589 Ra^(1/4) / [1 + (0.469/Pr)^(9/16)]^(4/9) · {1 + 7.44e-8 Ra / [1 + (0.469/Pr)^(9/16)]^(16/9)}^(1/12)',
    valid: { rayleigh: [0, 1e13] },
  },
  ({ rayleigh, prandtl }) => {
    const prandtlTerm = (1 + (0.469 / prandtl) ** (9 / 16)) ** (4 / 9)
    const laminar = (0.589 * rayleigh ** 0.25) / prandtlTerm
    return 2 + laminar * (1 + (7.44e-8 * rayleigh) / prandtlTerm ** 4) ** (1 / 12)
  },
)

export interface SphereWind {
  /** vD/ν at air temperature, not at film temperature as elsewhere. */
  readonly reynolds: number
  /** At air temperature. */
  readonly prandtl: number
  /** Viscosity at air temperature over viscosity at surface temperature. */
  readonly viscosityRatio: number
}

/**
 * Sphere in wind. A vessel leaves the range of the experiments at once; the handbook's own example uses it at Re 1.3e6.
 *
 * The printed range of Pr begins with air at 0.71; air of other temperatures wavers below that by some per cent.
 */
export const nusseltSphereInWind = correlation<SphereWind>(
  {
    name: 'Whitaker, sphere in wind',
    source: 'whitaker1972',
    equation: 'Nu = 2 + (0.4 Re^(1/2) + 0.06 Re^(2/3)) Pr^0.4 (μ/μs)^(1/4)',
    valid: { reynolds: [3.5, 7.6e4], prandtl: [0.68, 380] },
  },
  ({ reynolds, prandtl, viscosityRatio }) =>
    2 +
    (0.4 * Math.sqrt(reynolds) + 0.06 * Math.cbrt(reynolds) ** 2) *
      prandtl ** 0.4 *
      viscosityRatio ** 0.25,
)
