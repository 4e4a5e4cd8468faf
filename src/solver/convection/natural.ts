/** Free convection: mean Nusselt numbers. Rayleigh and Prandtl numbers at film temperature. */
import { correlation } from '../correlation.ts'

export interface FreeFlow {
  /** gβ|θs − θa|L³Pr/ν² on the length that the formula names. */
  readonly rayleigh: number
  readonly prandtl: number
}

/** Horizontal cylinder, on the outer diameter. */
export const nusseltHorizontalCylinder = correlation<FreeFlow>(
  {
    name: 'Churchill-Chu, horizontal cylinder',
    source: 'churchillChu1975cylinder',
    equation: 'Nu = {0.60 + 0.387 Ra^(1/6) / [1 + (0.559/Pr)^(9/16)]^(8/27)}²',
    valid: { rayleigh: [1e-6, 1e13] },
  },
  ({ rayleigh, prandtl }) => {
    const prandtlTerm = (1 + (0.559 / prandtl) ** (9 / 16)) ** (8 / 27)
    const root = 0.6 + (0.387 * rayleigh ** (1 / 6)) / prandtlTerm
    return root * root
  },
)

/** Vertical plate, on its height. */
export const nusseltVerticalPlate = correlation<FreeFlow>(
  {
    name: 'Churchill-Chu, vertical plate',
    source: 'churchillChu1975plate',
    equation: 'Nu = {0.825 + 0.387 Ra^(1/6) / [1 + (0.492/Pr)^(9/16)]^(8/27)}²',
    valid: { rayleigh: [1e-1, 1e12] },
  },
  ({ rayleigh, prandtl }) => {
    const prandtlTerm = (1 + (0.492 / prandtl) ** (9 / 16)) ** (8 / 27)
    const root = 0.825 + (0.387 * rayleigh ** (1 / 6)) / prandtlTerm
    return root * root
  },
)

export interface SlenderFreeFlow extends FreeFlow {
  /** Height over diameter. */
  readonly slenderness: number
}

/** Vertical thin cylinder, on its height: it loses more than a plate of that height. */
export const nusseltSlenderCylinder = correlation<SlenderFreeFlow>(
  {
    name: 'Le Fevre-Ede, vertical cylinder',
    source: 'leFevreEde1956',
    equation: 'Nu = 4/3 [7 Ra Pr / (5(20 + 21 Pr))]^(1/4) + 4(272 + 315 Pr) L / (35(64 + 63 Pr) D)',
    valid: { rayleigh: [0, 1e9] },
  },
  ({ rayleigh, prandtl, slenderness }) =>
    (4 / 3) * ((7 * rayleigh * prandtl) / (5 * (20 + 21 * prandtl))) ** 0.25 +
    (4 * (272 + 315 * prandtl) * slenderness) / (35 * (64 + 63 * prandtl)),
)

/** Above this Rayleigh number the boundary layer is turbulent and the thin-cylinder form ends. */
export const TURBULENT_RAYLEIGH = 1e9

/** Vertical cylinder: the larger of plate and thin cylinder while laminar, the plate above. */
export function nusseltVerticalCylinder(flow: SlenderFreeFlow): number {
  const plate = nusseltVerticalPlate(flow)
  return flow.rayleigh <= TURBULENT_RAYLEIGH ? Math.max(plate, nusseltSlenderCylinder(flow)) : plate
}

/** Rayleigh numbers at which the formula for driving horizontal surfaces goes from one range to the next, with a step. */
export const DRIVING_PLATE_STEPS_RAYLEIGH = [200, 1e4, 8e6] as const

/** Horizontal surface whose warm side faces up or cold side faces down, on area over perimeter. */
export const nusseltPlateDrivingFlow = correlation<FreeFlow>(
  {
    name: 'Horizontal surface, warm up or cold down',
    source: 'ashrae2021ch4',
    equation:
      'Nu = 0.96 Ra^(1/6) to 200; 0.59 Ra^(1/4) to 1e4; 0.54 Ra^(1/4) to 8e6; 0.15 Ra^(1/3) above',
    valid: { rayleigh: [1, 1e11] },
  },
  ({ rayleigh }) => {
    if (rayleigh < 200) return 0.96 * rayleigh ** (1 / 6)
    if (rayleigh < 1e4) return 0.59 * rayleigh ** 0.25
    if (rayleigh < 8e6) return 0.54 * rayleigh ** 0.25
    return 0.15 * Math.cbrt(rayleigh)
  },
)

/** Horizontal surface whose warm side faces down or cold side faces up, on area over perimeter. */
export const nusseltPlateHinderedFlow = correlation<FreeFlow>(
  {
    name: 'Horizontal surface, warm down or cold up',
    source: 'ashrae2021ch4',
    equation: 'Nu = 0.27 Ra^(1/4)',
    valid: { rayleigh: [1e5, 1e10] },
  },
  ({ rayleigh }) => 0.27 * rayleigh ** 0.25,
)
