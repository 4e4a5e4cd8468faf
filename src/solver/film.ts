/** The outer film: a coefficient of convection on surface minus air, by the method chosen. */
import { GRAVITY_M_PER_S2, kelvin } from './constants.ts'
import { nusseltCylinderInWind, nusseltPlateInWind } from './convection/forced.ts'
import {
  nusseltHorizontalCylinder,
  nusseltPlateDrivingFlow,
  nusseltPlateHinderedFlow,
  nusseltVerticalCylinder,
  nusseltVerticalPlate,
} from './convection/natural.ts'
import {
  simplifiedFreePipe,
  simplifiedFreeWall,
  simplifiedWindOnPipe,
  simplifiedWindOnWall,
} from './convection/simplified.ts'
import { nusseltSphere, nusseltSphereInWind, type SphereWind } from './convection/sphere.ts'
import type { FaceShape, FlowKind } from './geometry.ts'
import { type Air, airAt, airViscosityPaS } from './properties/air.ts'
import type { FilmChoice, System } from './types.ts'

/** What the film needs of a design condition; the pressure is worked out once. */
export interface Weather {
  readonly airC: number
  readonly windMPerS: number
  readonly pressurePa: number
}

/** Coefficient of convection of one face [W/(m²·K)] by the excess of its surface over the air [K]. */
export type Film = (excessK: number) => number

export function filmOf(
  face: FaceShape,
  weather: Weather,
  choice: FilmChoice,
  inclinedFilm: System['inclinedFilm'],
): Film {
  if (face.flow === 'ground') return () => face.groundWPerM2K
  if (typeof choice === 'object') return () => choice.fixedWPerM2K
  return choice === 'simplified' && isSimplified(face.flow)
    ? simplifiedFilm(face, weather, inclinedFilm)
    : detailedFilm(face, weather, inclinedFilm)
}

/** Soil and a fixed coefficient hold all of the heat that passes: nothing is radiated beside them. */
export const radiates = (face: FaceShape, choice: FilmChoice): boolean =>
  face.flow !== 'ground' && typeof choice !== 'object'

/** Faces for which the simplified set has an equation; the others keep the detailed film. */
export const isSimplified = (flow: FlowKind): boolean =>
  flow !== 'up' && flow !== 'down' && flow !== 'sphere' && flow !== 'ground'

export const isCylinder = (flow: FlowKind): boolean =>
  flow === 'horizontal-cylinder' || flow === 'vertical-cylinder' || flow === 'inclined-cylinder'

/**
 * The `detailed` film: free and forced convection at film temperature, blended as (h_N^j + h_F^j)^(1/j), j = 4 for
 * cylinders and spheres and 3 for flat faces, always assisting: smooth, without a switch of regime. Source: Incropera,
 * mixed convection (from memory); the blend of the coefficients instead of the Nusselt numbers lets each part have its
 * own length.
 */
function detailedFilm(
  face: FaceShape,
  weather: Weather,
  inclinedFilm: System['inclinedFilm'],
): Film {
  const { airC, windMPerS, pressurePa } = weather
  const takesHigher = inclinedFilm === 'higher'
  if (windMPerS === 0) {
    return (excessK) => {
      const filmC = airC + 0.5 * excessK
      return freeWPerM2K(face, airAt(filmC, pressurePa), kelvin(filmC), excessK, takesHigher)
    }
  }
  const forcedWPerM2K = windFilm(face, weather)
  const isFlat = !isCylinder(face.flow) && face.flow !== 'sphere'
  return (excessK) => {
    const filmC = airC + 0.5 * excessK
    const air = airAt(filmC, pressurePa)
    const free = freeWPerM2K(face, air, kelvin(filmC), excessK, takesHigher)
    const forced = forcedWPerM2K(excessK, air)
    return isFlat
      ? Math.cbrt(free * free * free + forced * forced * forced)
      : Math.sqrt(Math.hypot(free * free, forced * forced))
  }
}

/** gβ|Δθ|L³Pr/ν² with β = 1/T_film. */
export function rayleighNumber(air: Air, filmK: number, excessK: number, lengthM: number): number {
  const viscosity = air.kinematicViscosityM2PerS
  return (
    ((GRAVITY_M_PER_S2 * Math.abs(excessK) * lengthM * lengthM * lengthM) /
      (filmK * viscosity * viscosity)) *
    air.prandtl
  )
}

/** True where buoyancy carries the air away from the surface: warm up, cold down. */
export const isDriving = (flow: 'up' | 'down', excessK: number): boolean =>
  flow === 'up' ? excessK >= 0 : excessK < 0

function freeWPerM2K(
  face: FaceShape,
  air: Air,
  filmK: number,
  excessK: number,
  takesHigher: boolean,
): number {
  const lengthM = face.freeLengthM
  const { prandtl } = air
  const rayleigh = rayleighNumber(air, filmK, excessK, lengthM)
  const perLength = air.conductivityWPerMK / lengthM
  switch (face.flow) {
    case 'horizontal-cylinder':
      return nusseltHorizontalCylinder({ rayleigh, prandtl }) * perLength
    case 'vertical-cylinder': {
      const slenderness = lengthM / face.windLengthM
      return nusseltVerticalCylinder({ rayleigh, prandtl, slenderness }) * perLength
    }
    case 'inclined-cylinder': {
      const slenderness = lengthM / face.windLengthM
      const upright = nusseltVerticalCylinder({ rayleigh, prandtl, slenderness }) * perLength
      const lyingRayleigh = rayleigh / (slenderness * slenderness * slenderness)
      const lying =
        (nusseltHorizontalCylinder({ rayleigh: lyingRayleigh, prandtl }) * air.conductivityWPerMK) /
        face.windLengthM
      return takesHigher ? Math.max(upright, lying) : Math.min(upright, lying)
    }
    case 'vertical-plate':
      return nusseltVerticalPlate({ rayleigh, prandtl }) * perLength
    case 'sphere':
      return nusseltSphere({ rayleigh, prandtl }) * perLength
    case 'up':
    case 'down':
      return isDriving(face.flow, excessK)
        ? nusseltPlateDrivingFlow({ rayleigh, prandtl }) * perLength
        : nusseltPlateHinderedFlow({ rayleigh, prandtl }) * perLength
    case 'ground':
      return face.groundWPerM2K
  }
}

/** Forced part by the excess and the air at film temperature; a sphere reads the air at its own temperature. */
function windFilm(face: FaceShape, weather: Weather): (excessK: number, air: Air) => number {
  const { windMPerS } = weather
  const lengthM = face.windLengthM
  if (face.flow === 'sphere') {
    const { windAt, conductivityWPerMK } = sphereWind(face, weather)
    return (excessK) => (nusseltSphereInWind(windAt(excessK)) * conductivityWPerMK) / lengthM
  }
  const nusselt = isCylinder(face.flow) ? nusseltCylinderInWind : nusseltPlateInWind
  return (_, air) => {
    const reynolds = (windMPerS * lengthM) / air.kinematicViscosityM2PerS
    return (nusselt({ reynolds, prandtl: air.prandtl }) * air.conductivityWPerMK) / lengthM
  }
}

/** The wind on a sphere by the excess of its surface, and the conductivity of the air that it is of. */
export function sphereWind({ windLengthM }: FaceShape, { airC, windMPerS, pressurePa }: Weather) {
  const { kinematicViscosityM2PerS, prandtl, conductivityWPerMK } = airAt(airC, pressurePa)
  const reynolds = (windMPerS * windLengthM) / kinematicViscosityM2PerS
  const viscosityPaS = airViscosityPaS(kelvin(airC))
  const windAt = (excessK: number): SphereWind => ({
    reynolds,
    prandtl,
    viscosityRatio: viscosityPaS / airViscosityPaS(kelvin(airC + excessK)),
  })
  return { windAt, conductivityWPerMK }
}

/**
 * The `simplified` film: the equations for indoors and for wind, the larger of the two, so that a faint breeze never
 * cools less than still air.
 */
function simplifiedFilm(
  face: FaceShape,
  { windMPerS }: Weather,
  inclinedFilm: System['inclinedFilm'],
): Film {
  const isPipe = isCylinder(face.flow)
  const forced =
    windMPerS === 0
      ? 0
      : isPipe
        ? simplifiedWindOnPipe({ windMPerS, diameterM: face.windLengthM })
        : simplifiedWindOnWall({ windMPerS, lengthM: face.windLengthM })
  return (excessK) => {
    const differenceK = Math.abs(excessK)
    const lying =
      face.flow === 'horizontal-cylinder' || face.flow === 'inclined-cylinder'
        ? simplifiedFreePipe({ differenceK, diameterM: face.windLengthM })
        : null
    const upright =
      face.flow === 'horizontal-cylinder'
        ? null
        : simplifiedFreeWall({ differenceK, heightM: face.freeLengthM })
    if (lying === null || upright === null) return Math.max(forced, lying ?? upright ?? 0)
    const free = inclinedFilm === 'higher' ? Math.max(lying, upright) : Math.min(lying, upright)
    return Math.max(forced, free)
  }
}
