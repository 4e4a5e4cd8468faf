/** Convection inside a pipe or an air duct: mean Nusselt numbers on the hydraulic diameter, far from the inlet. */
import { correlation } from '../correlation.ts'
import { airAt } from '../properties/air.ts'

export interface InsideFlow {
  /** vD/ν on the hydraulic diameter. */
  readonly reynolds: number
  readonly prandtl: number
}

/** Nusselt number of developed laminar flow in a tube of constant wall temperature. Source: ASHRAE Handbook Fundamentals 2021, ch. 4. */
const LAMINAR_NUSSELT = 3.66

/** Up to the first the flow is laminar, from the second the turbulent formula serves; common practice between them is a straight line. */
const LAMINAR_REYNOLDS = 2300
const TURBULENT_REYNOLDS = 4000

/**
 * Fanning friction factor of a smooth pipe.
 *
 * Reynolds number, 3000 to 5e6. Source: ASHRAE Handbook Fundamentals 2021, ch. 4, with Gnielinski's equation.
 */
export function smoothPipeFriction(reynolds: number): number {
  return (1.58 * Math.log(reynolds) - 3.28) ** -2
}

export interface RoughInsideFlow extends InsideFlow {
  /** Fanning friction factor: a quarter of Darcy's. */
  readonly friction: number
}

/** Turbulent flow in a pipe of known friction. */
export const nusseltTurbulentInside = correlation<RoughInsideFlow>(
  {
    name: 'Gnielinski, turbulent flow in a pipe',
    source: 'gnielinski1976',
    equation: 'Nu = (f/2)(Re − 1000) Pr / [1 + 12.7 (f/2)^(1/2) (Pr^(2/3) − 1)]',
    valid: { reynolds: [3000, 5e6], prandtl: [0.5, 2000] },
  },
  ({ reynolds, prandtl, friction }) =>
    ((friction / 2) * (reynolds - 1000) * prandtl) /
    (1 + 12.7 * Math.sqrt(friction / 2) * (Math.cbrt(prandtl) ** 2 - 1)),
)

/** Any flow in a smooth pipe or duct. */
export const nusseltInside = correlation<InsideFlow>(
  {
    name: 'Flow in a smooth pipe or duct',
    source: 'ashrae2021ch4',
    equation: 'Nu = 3.66 to Re 2300; Gnielinski from Re 4000; a straight line in Re between',
    valid: { reynolds: [0, 5e6], prandtl: [0.5, 2000] },
  },
  ({ reynolds, prandtl }) => {
    if (reynolds <= LAMINAR_REYNOLDS) return LAMINAR_NUSSELT
    if (reynolds >= TURBULENT_REYNOLDS) return turbulent(reynolds, prandtl)
    const way = (reynolds - LAMINAR_REYNOLDS) / (TURBULENT_REYNOLDS - LAMINAR_REYNOLDS)
    return LAMINAR_NUSSELT + way * (turbulent(TURBULENT_REYNOLDS, prandtl) - LAMINAR_NUSSELT)
  },
)

const turbulent = (reynolds: number, prandtl: number): number =>
  nusseltTurbulentInside({ reynolds, prandtl, friction: smoothPipeFriction(reynolds) })

export interface AirInside {
  /** Mean air speed [m/s], 0 or more. */
  readonly velocityMPerS: number
  /** Four times area over perimeter: the bore of a round one, 2ab/(a + b) of a rectangular one [m]. */
  readonly hydraulicDiameterM: number
  readonly airC: number
  readonly pressurePa: number
}

/**
 * Film coefficient of air inside a duct or pipe [W/(m²·K)].
 *
 * Without the inlet, bends and seams, all of which raise it: too little rather than too much. Standing air is taken as
 * conducting only. The properties are those of the air, not of the film, whose wall the caller need not know.
 */
export function insideFilmWPerM2K({
  velocityMPerS,
  hydraulicDiameterM,
  airC,
  pressurePa,
}: AirInside): number {
  const { conductivityWPerMK, kinematicViscosityM2PerS, prandtl } = airAt(airC, pressurePa)
  const reynolds = (velocityMPerS * hydraulicDiameterM) / kinematicViscosityM2PerS
  return (nusseltInside({ reynolds, prandtl }) * conductivityWPerMK) / hydraulicDiameterM
}
