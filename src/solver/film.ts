/** The outer film by the `detailed` method: free and forced convection blended, properties at film temperature. */
import { GRAVITY_M_PER_S2, kelvin } from './constants.ts'
import { nusseltCylinderInWind, nusseltPlateInWind } from './convection/forced.ts'
import {
  type FreeFlow,
  nusseltHorizontalCylinder,
  nusseltPlateDrivingFlow,
  nusseltPlateHinderedFlow,
  nusseltSlenderCylinder,
  nusseltVerticalCylinder,
  nusseltVerticalPlate,
} from './convection/natural.ts'
import { type Correlation, outOfRange } from './correlation.ts'
import type { FaceShape } from './geometry.ts'
import { airAt } from './properties/air.ts'

/** What the film needs of a design condition; the pressure is worked out once. */
export interface Weather {
  readonly airC: number
  readonly windMPerS: number
  readonly pressurePa: number
}

/** Film properties and the dimensionless numbers of one face at one surface temperature. */
interface FilmState {
  readonly conductivityWPerMK: number
  readonly free: FreeFlow
  readonly reynolds: number
}

function filmState(face: FaceShape, weather: Weather, excessK: number): FilmState {
  const filmC = weather.airC + 0.5 * excessK
  const air = airAt(filmC, weather.pressurePa)
  const viscosity = air.kinematicViscosityM2PerS
  const lengthM = face.freeLengthM
  const rayleigh =
    ((GRAVITY_M_PER_S2 * Math.abs(excessK) * lengthM * lengthM * lengthM) /
      (kelvin(filmC) * viscosity * viscosity)) *
    air.prandtl
  return {
    conductivityWPerMK: air.conductivityWPerMK,
    free: { rayleigh, prandtl: air.prandtl },
    reynolds: (weather.windMPerS * face.windLengthM) / viscosity,
  }
}

/** True where buoyancy carries the air away from the surface: warm up, cold down. */
const isDriving = (flow: 'up' | 'down', excessK: number): boolean =>
  flow === 'up' ? excessK >= 0 : excessK < 0

function freeNusselt(face: FaceShape, free: FreeFlow, excessK: number): number {
  switch (face.flow) {
    case 'horizontal-cylinder':
      return nusseltHorizontalCylinder(free)
    case 'vertical-cylinder':
      return nusseltVerticalCylinder({
        rayleigh: free.rayleigh,
        prandtl: free.prandtl,
        slenderness: face.freeLengthM / face.windLengthM,
      })
    case 'vertical-plate':
      return nusseltVerticalPlate(free)
    case 'up':
    case 'down':
      return isDriving(face.flow, excessK)
        ? nusseltPlateDrivingFlow(free)
        : nusseltPlateHinderedFlow(free)
  }
}

const isCylinder = (face: FaceShape): boolean =>
  face.flow === 'horizontal-cylinder' || face.flow === 'vertical-cylinder'

/**
 * Convection coefficient of one face [W/(m²·K)].
 *
 * `excessK` is surface minus air [K]. Free and forced parts are blended as (h_N^j + h_F^j)^(1/j), j = 4 for cylinders
 * and 3 for flat faces, always assisting: smooth, without a switch of regime. Source: Incropera, mixed convection
 * (from memory); the blend of the coefficients instead of the Nusselt numbers lets each part have its own length.
 */
export function convectionWPerM2K(face: FaceShape, weather: Weather, excessK: number): number {
  const state = filmState(face, weather, excessK)
  const free =
    (freeNusselt(face, state.free, excessK) * state.conductivityWPerMK) / face.freeLengthM
  if (weather.windMPerS === 0) return free
  const wind = { reynolds: state.reynolds, prandtl: state.free.prandtl }
  const onWindLength = state.conductivityWPerMK / face.windLengthM
  if (isCylinder(face)) {
    const forced = nusseltCylinderInWind(wind) * onWindLength
    return (free ** 4 + forced ** 4) ** 0.25
  }
  const forced = nusseltPlateInWind(wind) * onWindLength
  return Math.cbrt(free ** 3 + forced ** 3)
}

/** Film temperatures for which the fits of the air properties hold [°C]: 200 to 1000 K. */
const FILM_RANGE_C = { from: -73.15, to: 726.85 }

/** What to say about the formulas that a solved face used. */
export function filmNotes(face: FaceShape, weather: Weather, excessK: number): string[] {
  const state = filmState(face, weather, excessK)
  const notes: string[] = []
  const filmC = weather.airC + 0.5 * excessK
  if (filmC < FILM_RANGE_C.from || filmC > FILM_RANGE_C.to) {
    notes.push(
      `Air at a film temperature of ${filmC.toFixed(0)} °C is outside the fitted range of its heat capacity, −73 to 727 °C.`,
    )
  }
  if (weather.windMPerS > 0) {
    const wind = { reynolds: state.reynolds, prandtl: state.free.prandtl }
    notes.push(...outOfRange(isCylinder(face) ? nusseltCylinderInWind : nusseltPlateInWind, wind))
  }
  // A difference that is nothing makes no flow: no formula is in use.
  if (Math.abs(excessK) > NEGLIGIBLE_EXCESS_K) notes.push(...freeNotes(face, state.free, excessK))
  return notes
}

const NEGLIGIBLE_EXCESS_K = 0.01

function freeNotes(face: FaceShape, free: FreeFlow, excessK: number): string[] {
  switch (face.flow) {
    case 'horizontal-cylinder':
      return outOfRange(nusseltHorizontalCylinder, free)
    case 'vertical-cylinder': {
      const slender = { ...free, slenderness: face.freeLengthM / face.windLengthM }
      const plate = nusseltVerticalPlate(free)
      const usesSlender = nusseltVerticalCylinder(slender) > plate
      return usesSlender
        ? outOfRange(nusseltSlenderCylinder, slender)
        : outOfRange(nusseltVerticalPlate, free)
    }
    case 'vertical-plate':
      return outOfRange(nusseltVerticalPlate, free)
    case 'up':
    case 'down': {
      const formula: Correlation<FreeFlow> = isDriving(face.flow, excessK)
        ? nusseltPlateDrivingFlow
        : nusseltPlateHinderedFlow
      return outOfRange(formula, free)
    }
  }
}
