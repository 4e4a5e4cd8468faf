import { layerDifferenceK } from './conductivity.ts'
import { filmOf, radiates, roughFilmOf, type Weather } from './film.ts'
import { type FaceShape, type Wall, wallOf } from './geometry.ts'
import { standardPressurePa } from './properties/air.ts'
import { radiationSlopeWPerM2K, radiationWPerM2K, radiativeC } from './radiation.ts'
import { bracketedRoot, risingRoot } from './root.ts'
import type { Closure, Face, Layer, Solution, System } from './types.ts'

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

/** The balance counts as closed when film and conduction differ by less than this share of the driving difference. */
const CLOSED = 1e-11
/** More than this share left over means that the search ended on a jump of a correlation. */
const JUMP = 1e-9
/** And never less than this is left over [K]: a difference of almost nothing has no share to judge by. */
const NOTHING_K = 1e-12

interface SolvedFace {
  readonly face: Face
  readonly filmEvaluations: number
}

function solveFace(system: System, face: FaceShape, weather: Weather): SolvedFace {
  const { layers, emissivity, sunAbsorbedWPerM2 } = system
  const { airC, surroundingsC } = system.around
  const mediumExcessK = system.mediumC - airC
  const hasRadiation = radiates(face, system.film)
  const surroundingsExcessK = hasRadiation ? surroundingsC - airC : 0
  const insideKPerWPerM2 =
    system.insideFilmWPerM2K === null ? 0 : face.outerOverInner / system.insideFilmWPerM2K
  const film = filmOf(face, weather, system.film, system.inclinedFilm)

  let filmEvaluations = 0
  // The last film is kept: the search ends where it looked last, and its film is that of the answer.
  let filmAtK = Number.NaN
  let convection = 0
  const convectionAt = (excessK: number): number => {
    if (excessK !== filmAtK) {
      filmEvaluations += 1
      filmAtK = excessK
      convection = film(excessK)
    }
    return convection
  }
  const radiationAt = (excessK: number): number =>
    hasRadiation ? radiationWPerM2K(emissivity, airC + excessK, surroundingsC) : 0
  const fluxAt = (excessK: number): number =>
    (excessK === 0 ? 0 : convectionAt(excessK) * excessK) +
    radiationAt(excessK) * (excessK - surroundingsExcessK) -
    sunAbsorbedWPerM2
  // The sun can heat a surface above medium, air and surroundings, until radiation alone gives off all of it.
  const sunlitExcessK = (): number =>
    hasRadiation
      ? radiativeC(emissivity, surroundingsC, sunAbsorbedWPerM2) - airC
      : sunAbsorbedWPerM2 / film(1)
  const drivenK = (excessK: number, flux: number): number =>
    acrossLayersK(layers, face.formsM, airC + excessK, flux) + flux * insideKPerWPerM2

  const finished = (
    excessK: number,
    flux: number,
    convectionWPerM2K: number,
    closure: Closure,
  ): SolvedFace => ({
    face: {
      side: face.side,
      surfaceTempC: airC + excessK,
      heatFluxWPerM2: flux,
      convectionWPerM2K,
      radiationWPerM2K: radiationAt(excessK),
      interfaceTempsC: interfaces(layers, face.formsM, airC + excessK, flux),
      share: face.share,
      closure,
    },
    filmEvaluations,
  })

  if (layers.length === 0 && insideKPerWPerM2 === 0) {
    const flux = fluxAt(mediumExcessK)
    return finished(mediumExcessK, flux, convectionAt(mediumExcessK), 'closed')
  }

  const balance = (excessK: number): number =>
    excessK + drivenK(excessK, fluxAt(excessK)) - mediumExcessK
  const low = Math.min(mediumExcessK, surroundingsExcessK, 0)
  const high = Math.max(
    mediumExcessK,
    surroundingsExcessK,
    0,
    sunAbsorbedWPerM2 === 0 ? 0 : sunlitExcessK(),
  )

  // A first guess from a rough film: the layers' own resistance is known.
  const rough = roughFilmOf(face, weather, system.film)
  const resistanceAt = (excessK: number): number =>
    drivenK(excessK, TRIAL_W_PER_M2) / TRIAL_W_PER_M2
  const resistance = resistanceAt(mediumExcessK / 2)
  let guessK = mediumExcessK / 2
  for (let round = 0; round < GUESS_ROUNDS; round += 1) {
    const radiation = radiationAt(guessK)
    guessK =
      (mediumExcessK + resistance * (radiation * surroundingsExcessK + sunAbsorbedWPerM2)) /
      (1 + resistance * (rough.film(guessK) + radiation))
  }
  // ∫λ dT over the layers is the flux times their form: more of it is felt at the inner end, by the λ there.
  const innerResistance = resistanceAt(mediumExcessK)
  const slopeAt = (trialK: number): number =>
    innerResistance / resistanceAt(trialK) +
    innerResistance *
      (convectionAt(trialK) * rough.stiffening +
        (hasRadiation ? radiationSlopeWPerM2K(emissivity, airC + trialK) : 0))
  // What drives the heat: the temperatures, or what sun and surroundings would drive through the layers.
  const drivingK = Math.max(
    high - low,
    innerResistance * Math.max(sunAbsorbedWPerM2, Math.abs(radiationAt(0) * surroundingsExcessK)),
  )
  const root = risingRoot(balance, {
    low,
    high,
    guess: { at: guessK, slopeAt },
    value: CLOSED * drivingK,
  })
  const excessK = root.at
  if (Math.abs(root.value) <= Math.max(JUMP * drivingK, NOTHING_K)) {
    const filmFlux = fluxAt(excessK)
    // Behind much lagging the last digits of the film's flux are kelvins at the medium: there the layers tell the flux.
    const flux =
      Math.abs(root.value) <= CLOSED * (high - low)
        ? filmFlux
        : secant(
            (trial) => excessK + drivenK(excessK, trial) - mediumExcessK,
            filmFlux,
            filmFlux - root.value / innerResistance,
          )
    return finished(excessK, flux, convectionAt(excessK), 'closed')
  }

  // The bracket closed in on a jump between two ranges of a correlation: the flux that the layers carry lies between
  // the fluxes of the two sides, and that flux closes the balance.
  const fluxHere = fluxAt(excessK)
  const fluxBeyond = fluxAt(root.otherEnd)
  if (Math.abs(fluxHere - fluxBeyond) <= JUMP * Math.abs(fluxHere)) {
    return finished(excessK, fluxAt(excessK), convectionAt(excessK), 'steep')
  }
  const flux = bracketedRoot(
    (trial) => excessK + drivenK(excessK, trial) - mediumExcessK,
    { low: Math.min(fluxHere, fluxBeyond), high: Math.max(fluxHere, fluxBeyond) },
    { width: 0, value: 0 },
  ).at
  const radiated = radiationAt(excessK) * (excessK - surroundingsExcessK) - sunAbsorbedWPerM2
  return finished(excessK, flux, (flux - radiated) / excessK, 'on-jump')
}

/** One step of the rule of false position from two points that are near a root. */
function secant(f: (x: number) => number, x0: number, x1: number): number {
  const f0 = f(x0)
  const f1 = f(x1)
  return f1 === f0 ? x1 : x1 - (f1 * (x1 - x0)) / (f1 - f0)
}

/** So little that the layers stay at one temperature. */
const TRIAL_W_PER_M2 = 1e-3

/** How often the first guess is put into its own rough film; only speed depends on it. */
const GUESS_ROUNDS = 2

/** Inner minus outer temperature over all layers [K], for a flux on the outer area. */
export function acrossLayersK(
  layers: readonly Layer[],
  formsM: readonly number[],
  surfaceC: number,
  flux: number,
): number {
  let differenceK = 0
  for (let index = layers.length - 1; index >= 0; index -= 1) {
    const layer = layers[index] as Layer
    differenceK += layerDifferenceK(
      layer.conductivity,
      surfaceC + differenceK,
      flux * (formsM[index] as number),
    )
  }
  return differenceK
}

/** Temperatures from the bare thing's surface to the outer surface [°C]. */
function interfaces(
  layers: readonly Layer[],
  formsM: readonly number[],
  surfaceC: number,
  flux: number,
): number[] {
  const tempsC = new Array<number>(layers.length + 1).fill(surfaceC)
  let tempC = surfaceC
  for (let index = layers.length - 1; index >= 0; index -= 1) {
    const layer = layers[index] as Layer
    tempC += layerDifferenceK(layer.conductivity, tempC, flux * (formsM[index] as number))
    tempsC[index] = tempC
  }
  return tempsC
}
