/** What a reader should know of the formulas that a solved face used. */
import { kelvin } from './constants.ts'
import { nusseltCylinderInWind, nusseltPlateInWind } from './convection/forced.ts'
import {
  DRIVING_PLATE_STEPS_RAYLEIGH,
  type FreeFlow,
  nusseltHorizontalCylinder,
  nusseltPlateDrivingFlow,
  nusseltPlateHinderedFlow,
  nusseltSlenderCylinder,
  nusseltVerticalCylinder,
  nusseltVerticalPlate,
  TURBULENT_RAYLEIGH,
} from './convection/natural.ts'
import {
  branchUsed,
  simplifiedFreePipe,
  simplifiedFreeWall,
  simplifiedWindOnPipe,
  simplifiedWindOnWall,
  type TwoBranchFormula,
} from './convection/simplified.ts'
import { nusseltSphere, nusseltSphereInWind } from './convection/sphere.ts'
import { outOfRange, short } from './correlation.ts'
import {
  isCylinder,
  isDriving,
  isSimplified,
  rayleighNumber,
  sphereWind,
  type Weather,
} from './film.ts'
import type { FaceShape } from './geometry.ts'
import { airAt } from './properties/air.ts'
import type { FilmChoice, Note } from './types.ts'

/** Film temperatures for which the fits of the air properties hold [°C]: 200 to 1000 K. */
const FILM_RANGE_C = { from: -73.15, to: 726.85 }

/** A difference that is nothing makes no flow: no formula is in use. */
const NEGLIGIBLE_EXCESS_K = 0.01

/** Ranges left by the formulas of one face; a fixed coefficient and soil have none. */
export function filmNotes(
  face: FaceShape,
  weather: Weather,
  choice: FilmChoice,
  excessK: number,
): Note[] {
  if (face.flow === 'ground' || typeof choice === 'object') return []
  return choice === 'simplified' && isSimplified(face.flow)
    ? simplifiedNotes(face, weather, excessK).map((text) => ({ code: 'film-jump', text }))
    : detailedNotes(face, weather, excessK).map((text) => ({ code: 'film-range', text }))
}

/** So near to a step, as a share of the Rayleigh number, that a small change of the inputs may cross it. */
const BESIDE_STEP = 0.05
/** A smaller step is lost in the accuracy of the formulas. */
const STEP_WORTH_TELLING = 0.01

/** Where a formula of the detailed set has a step and the face stands beside it. */
export function stepNotes(
  face: FaceShape,
  weather: Weather,
  choice: FilmChoice,
  excessK: number,
): Note[] {
  if (typeof choice === 'object' || (choice === 'simplified' && isSimplified(face.flow))) return []
  const filmC = weather.airC + 0.5 * excessK
  const air = airAt(filmC, weather.pressurePa)
  const { prandtl } = air
  const rayleigh = rayleighNumber(air, kelvin(filmC), excessK, face.freeLengthM)
  const at = (steps: readonly number[], nusselt: (rayleigh: number) => number): Note[] =>
    steps
      .filter((step) => Math.abs(rayleigh / step - 1) <= BESIDE_STEP)
      .flatMap((step) => {
        const jump = nusselt(step * (1 + 1e-9)) / nusselt(step * (1 - 1e-9)) - 1
        return Math.abs(jump) < STEP_WORTH_TELLING
          ? []
          : [
              {
                code: 'film-jump',
                text: `${capital(face.side)}: the Rayleigh number of free convection, ${short(rayleigh)}, is near ${short(step)}, where the formula ${stepWords(jump)}.`,
              },
            ]
      })
  switch (face.flow) {
    case 'up':
    case 'down':
      return isDriving(face.flow, excessK)
        ? at(DRIVING_PLATE_STEPS_RAYLEIGH, (ra) =>
            nusseltPlateDrivingFlow({ rayleigh: ra, prandtl }),
          )
        : []
    case 'vertical-cylinder':
    case 'inclined-cylinder': {
      const slenderness = face.freeLengthM / face.windLengthM
      return at([TURBULENT_RAYLEIGH], (ra) =>
        nusseltVerticalCylinder({ rayleigh: ra, prandtl, slenderness }),
      )
    }
    default:
      return []
  }
}

const stepWords = (share: number): string =>
  `${share < 0 ? 'drops' : 'rises'} by ${Math.abs(100 * share).toFixed(0)} %`

export const capital = (word: string): string => word.charAt(0).toUpperCase() + word.slice(1)

/** Where a branch of the simplified set was taken beside a step of it. */
function simplifiedNotes(face: FaceShape, { windMPerS }: Weather, excessK: number): string[] {
  const differenceK = Math.abs(excessK)
  const diameterM = face.windLengthM
  const texts: string[] = []
  const add = <Inputs>(formula: TwoBranchFormula<Inputs>, inputs: Inputs): void => {
    const used = branchUsed(formula, inputs)
    if (!used.besideJump) return
    texts.push(
      `${formula.pedigree.name}: ${used.number} is ${short(used.value)}, near ${short(used.switchValue)}, where the formula ${stepWords(used.jumpFraction)}; the ${used.branch} branch was taken.`,
    )
  }
  if (windMPerS > 0 && isCylinder(face.flow)) add(simplifiedWindOnPipe, { windMPerS, diameterM })
  else if (windMPerS > 0) add(simplifiedWindOnWall, { windMPerS, lengthM: face.windLengthM })
  if (face.flow === 'horizontal-cylinder' || face.flow === 'inclined-cylinder')
    add(simplifiedFreePipe, { differenceK, diameterM })
  if (face.flow !== 'horizontal-cylinder')
    add(simplifiedFreeWall, { differenceK, heightM: face.freeLengthM })
  return texts
}

function detailedNotes(face: FaceShape, weather: Weather, excessK: number): string[] {
  const filmC = weather.airC + 0.5 * excessK
  const notes: string[] = []
  if (filmC < FILM_RANGE_C.from || filmC > FILM_RANGE_C.to) {
    notes.push(
      `Air at a film temperature of ${filmC.toFixed(0)} °C is outside the fitted range of its heat capacity, −73 to 727 °C.`,
    )
  }
  if (weather.windMPerS > 0) notes.push(...windNotes(face, weather, excessK))
  if (Math.abs(excessK) > NEGLIGIBLE_EXCESS_K) notes.push(...freeNotes(face, weather, excessK))
  return notes
}

function windNotes(face: FaceShape, weather: Weather, excessK: number): string[] {
  if (face.flow === 'sphere') {
    return outOfRange(nusseltSphereInWind, sphereWind(face, weather).windAt(excessK))
  }
  const air = airAt(weather.airC + 0.5 * excessK, weather.pressurePa)
  const reynolds = (weather.windMPerS * face.windLengthM) / air.kinematicViscosityM2PerS
  return outOfRange(isCylinder(face.flow) ? nusseltCylinderInWind : nusseltPlateInWind, {
    reynolds,
    prandtl: air.prandtl,
  })
}

function freeNotes(face: FaceShape, weather: Weather, excessK: number): string[] {
  const filmC = weather.airC + 0.5 * excessK
  const air = airAt(filmC, weather.pressurePa)
  const flow = (lengthM: number): FreeFlow => ({
    rayleigh: rayleighNumber(air, kelvin(filmC), excessK, lengthM),
    prandtl: air.prandtl,
  })
  const free = flow(face.freeLengthM)
  switch (face.flow) {
    case 'horizontal-cylinder':
      return outOfRange(nusseltHorizontalCylinder, free)
    case 'vertical-cylinder':
      return uprightNotes(face, free)
    case 'inclined-cylinder':
      return [
        ...uprightNotes(face, free),
        ...outOfRange(nusseltHorizontalCylinder, flow(face.windLengthM)),
      ]
    case 'vertical-plate':
      return outOfRange(nusseltVerticalPlate, free)
    case 'sphere':
      return outOfRange(nusseltSphere, free)
    case 'up':
    case 'down':
      return outOfRange(
        isDriving(face.flow, excessK) ? nusseltPlateDrivingFlow : nusseltPlateHinderedFlow,
        free,
      )
    case 'ground':
      return []
  }
}

function uprightNotes(face: FaceShape, free: FreeFlow): string[] {
  const slender = { ...free, slenderness: face.freeLengthM / face.windLengthM }
  return nusseltVerticalCylinder(slender) > nusseltVerticalPlate(free)
    ? outOfRange(nusseltSlenderCylinder, slender)
    : outOfRange(nusseltVerticalPlate, free)
}
