import { Balance } from './balance.ts'
import type { Weather } from './film.ts'
import { type FaceShape, type Wall, wallOf } from './geometry.ts'
import { interfacesC } from './layers.ts'
import { standardPressurePa } from './properties/air.ts'
import { bracketedRoot, type Root, risingRoot } from './root.ts'
import type { Closure, Face, Solution, System } from './types.ts'

/**
 * Steady heat balance of a lagged or bare surface.
 *
 * The unknown of each face is the excess of its surface over the air. A trial excess gives the flux of film, radiation
 * and sun; that flux, carried inwards layer by layer, gives the medium temperature that would drive it; the excess is
 * right when that is the medium's own. So λ(T) is integrated exactly, any number of layers needs no inner iteration, and
 * the balance is one search in one unknown. It rises with the unknown save where a correlation steps; there the search
 * ends on one of the answers that close it, or on the step itself, and `closure` says so. Temperatures between −200 and
 * 1000 °C; layers inside to outside. Never throws and never gives NaN for finite input in the ranges of
 * `model/fields.ts`.
 */
export function solve(system: System): Solution {
  const wall = wallOf(system.shape, system.layers)
  const weather = weatherOf(system)
  const faces: Face[] = []
  let filmEvaluations = 0
  for (const shape of wall.faces) {
    const solved = solveFace(system, shape, weather)
    faces.push(solved.face)
    filmEvaluations += solved.filmEvaluations
  }
  return { ...areaMean(system, wall, faces), faces, filmEvaluations }
}

export const weatherOf = ({ around }: System): Weather => ({
  airC: around.airC,
  windMPerS: around.windMPerS,
  pressurePa: standardPressurePa(around.altitudeM),
})

function areaMean(
  system: System,
  wall: Wall,
  faces: readonly Face[],
): Omit<Solution, 'faces' | 'filmEvaluations'> {
  const [only] = faces
  const mean = (pick: (face: Face) => number): number => {
    let sum = 0
    for (const face of faces) sum += face.share * pick(face)
    return sum
  }
  const averaged =
    only && faces.length === 1
      ? only
      : {
          heatFluxWPerM2: mean((face) => face.heatFluxWPerM2),
          surfaceTempC: mean((face) => face.surfaceTempC),
          convectionWPerM2K: mean((face) => face.convectionWPerM2K),
          radiationWPerM2K: mean((face) => face.radiationWPerM2K),
          interfaceTempsC: Array.from({ length: system.layers.length + 1 }, (_, index) =>
            mean((face) => face.interfaceTempsC[index] ?? face.surfaceTempC),
          ),
        }
  const heatFlowWPerUnit = averaged.heatFluxWPerM2 * wall.outerAreaM2PerUnit
  return {
    unit: wall.unit,
    heatFlowWPerUnit,
    outerAreaM2PerUnit: wall.outerAreaM2PerUnit,
    heatLossWPerM: wall.unit === 'm' ? heatFlowWPerUnit : null,
    heatFluxWPerM2: averaged.heatFluxWPerM2,
    surfaceTempC: averaged.surfaceTempC,
    convectionWPerM2K: averaged.convectionWPerM2K,
    radiationWPerM2K: averaged.radiationWPerM2K,
    interfaceTempsC: averaged.interfaceTempsC,
    outerDiameterM: wall.outerDiameterM,
  }
}

interface SolvedFace {
  readonly face: Face
  readonly filmEvaluations: number
}

function solveFace(system: System, shape: FaceShape, weather: Weather): SolvedFace {
  const balance = new Balance(system, shape, weather)
  const { excessK, fluxWPerM2, convectionWPerM2K, closure } = closed(balance)
  const surfaceTempC = system.around.airC + excessK
  return {
    face: {
      side: shape.side,
      surfaceTempC,
      heatFluxWPerM2: fluxWPerM2,
      convectionWPerM2K,
      radiationWPerM2K: balance.radiationWPerM2K(excessK),
      interfaceTempsC: interfacesC(system.layers, shape.formsM, surfaceTempC, fluxWPerM2),
      share: shape.share,
      closure,
    },
    filmEvaluations: balance.filmEvaluations,
  }
}

/** Where a balance closes, and how. */
interface Closed {
  readonly excessK: number
  readonly fluxWPerM2: number
  readonly convectionWPerM2K: number
  readonly closure: Closure
}

/** The balance counts as closed when film and conduction differ by less than this share of the driving difference. */
const CLOSED = 1e-11
/** More than this share left over means that the search ended on a jump of a correlation. */
const JUMP = 1e-9
/** And never less than this is left over [K]: a difference of almost nothing has no share to judge by. */
const NOTHING_K = 1e-12

function closed(balance: Balance): Closed {
  if (balance.isOpen) return closedBy(balance, balance.mediumExcessK, null)
  const { low, high } = balance.bracketK()
  // ∫λ dT over the layers is the flux times their form: more of it is felt at the inner end, by the λ there.
  const innerM2KPerW = balance.resistanceM2KPerW(balance.mediumExcessK)
  // What drives the heat: the temperatures, or what sun and surroundings would drive through the layers.
  const drivingK = Math.max(
    high - low,
    innerM2KPerW *
      Math.max(
        balance.sunAbsorbedWPerM2,
        Math.abs(balance.radiationWPerM2K(0) * balance.surroundingsExcessK),
      ),
  )
  const root = risingRoot((excessK) => balance.missingK(excessK, balance.fluxWPerM2(excessK)), {
    low,
    high,
    guess: {
      at: guessedExcessK(balance),
      slopeAt: (excessK) =>
        innerM2KPerW / balance.resistanceM2KPerW(excessK) +
        innerM2KPerW *
          (balance.convectionWPerM2K(excessK) * balance.rough.stiffening +
            balance.radiationSlopeWPerM2K(excessK)),
    },
    value: CLOSED * drivingK,
  })
  if (Math.abs(root.value) > Math.max(JUMP * drivingK, NOTHING_K)) return onJump(balance, root)
  const isExact = Math.abs(root.value) <= CLOSED * (high - low)
  return closedBy(balance, root.at, isExact ? null : root.value / innerM2KPerW)
}

/** How often the first guess is put into its own rough film; only speed depends on it. */
const GUESS_ROUNDS = 2

/** Where the balance may close, by a rough film: the layers' own resistance is known. */
function guessedExcessK(balance: Balance): number {
  const { mediumExcessK, surroundingsExcessK, sunAbsorbedWPerM2, rough } = balance
  const resistanceM2KPerW = balance.resistanceM2KPerW(mediumExcessK / 2)
  let guessK = mediumExcessK / 2
  for (let round = 0; round < GUESS_ROUNDS; round += 1) {
    const radiation = balance.radiationWPerM2K(guessK)
    guessK =
      (mediumExcessK + resistanceM2KPerW * (radiation * surroundingsExcessK + sunAbsorbedWPerM2)) /
      (1 + resistanceM2KPerW * (rough.film(guessK) + radiation))
  }
  return guessK
}

/** By the flux of the film; where that is off by so much, by the flux that the layers carry. */
function closedBy(balance: Balance, excessK: number, offWPerM2: number | null): Closed {
  const filmFlux = balance.fluxWPerM2(excessK)
  // Behind much lagging the last digits of the film's flux are kelvins at the medium: there the layers tell the flux.
  const fluxWPerM2 =
    offWPerM2 === null
      ? filmFlux
      : secant((trial) => balance.missingK(excessK, trial), filmFlux, filmFlux - offWPerM2)
  const convectionWPerM2K = balance.convectionWPerM2K(excessK)
  return { excessK, fluxWPerM2, convectionWPerM2K, closure: 'closed' }
}

/**
 * The bracket closed in on a jump between two ranges of a correlation: the flux that the layers carry lies between the
 * fluxes of the two sides, and that flux closes the balance.
 */
function onJump(balance: Balance, { at: excessK, otherEnd }: Root): Closed {
  const fluxHere = balance.fluxWPerM2(excessK)
  const fluxBeyond = balance.fluxWPerM2(otherEnd)
  if (Math.abs(fluxHere - fluxBeyond) <= JUMP * Math.abs(fluxHere)) {
    return { ...closedBy(balance, excessK, null), closure: 'steep' }
  }
  const fluxWPerM2 = bracketedRoot(
    (trial) => balance.missingK(excessK, trial),
    { low: Math.min(fluxHere, fluxBeyond), high: Math.max(fluxHere, fluxBeyond) },
    { width: 0, value: 0 },
  ).at
  const radiated = balance.radiatedWPerM2(excessK) - balance.sunAbsorbedWPerM2
  const convectionWPerM2K = (fluxWPerM2 - radiated) / excessK
  return { excessK, fluxWPerM2, convectionWPerM2K, closure: 'on-jump' }
}

/** One step of the rule of false position from two points that are near a root. */
function secant(f: (x: number) => number, x0: number, x1: number): number {
  const f0 = f(x0)
  const f1 = f(x1)
  return f1 === f0 ? x1 : x1 - (f1 * (x1 - x0)) / (f1 - f0)
}
