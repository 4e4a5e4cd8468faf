/** Convection in wind: mean Nusselt numbers. Reynolds and Prandtl numbers at film temperature. */
import { correlation } from '../correlation.ts'

export interface Wind {
  /** vL/ν on the length that the formula names. */
  readonly reynolds: number
  readonly prandtl: number
}

/** Cylinder across the wind, on the outer diameter. */
export const nusseltCylinderInWind = correlation<Wind>(
  {
    name: 'Churchill-Bernstein, cylinder in crossflow',
    source: 'churchillBernstein1977',
    equation:
      'Nu = 0.3 + 0.62 Re^(1/2) Pr^(1/3) / [1 + (0.4/Pr)^(2/3)]^(1/4) · [1 + (Re/282000)^(5/8)]^(4/5)',
    valid: { reynolds: [0.3, 1e7] },
  },
  ({ reynolds, prandtl }) =>
    0.3 +
    ((0.62 * Math.sqrt(reynolds) * Math.cbrt(prandtl)) / (1 + (0.4 / prandtl) ** (2 / 3)) ** 0.25) *
      (1 + (reynolds / 282000) ** (5 / 8)) ** (4 / 5),
)

/** Above this Reynolds number a plate is taken as turbulent from its edge. */
export const TURBULENT_REYNOLDS = 5e5

/** Plate along the wind, on its length: the rough form, and the laminar one where that is larger below Re 5e5. */
export const nusseltPlateInWind = correlation<Wind>(
  {
    name: 'Plate in parallel wind',
    source: 'ashrae2021ch4',
    equation: 'Nu = 0.037 Re^(4/5) Pr^(1/3); 0.664 Re^(1/2) Pr^(1/3) where larger below Re 5e5',
    valid: { reynolds: [0, 1e8], prandtl: [0.6, 60] },
  },
  ({ reynolds, prandtl }) => {
    const rough = 0.037 * reynolds ** 0.8
    const laminar = 0.664 * Math.sqrt(reynolds)
    return Math.cbrt(prandtl) * (reynolds < TURBULENT_REYNOLDS && laminar > rough ? laminar : rough)
  },
)
