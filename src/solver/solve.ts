import { layerDifferenceK } from './conductivity.ts'
import { convectionWPerM2K, filmNotes, type Weather } from './film.ts'
import { type FaceShape, type Wall, wallOf } from './geometry.ts'
import { standardPressurePa } from './properties/air.ts'
import { radiationWPerM2K } from './radiation.ts'
import { bracketedRoot } from './root.ts'
import type { Conductivity, Face, Layer, Note, Solution, System } from './types.ts'

/**
 * Steady heat balance of a lagged or bare surface.
 *
 * The unknown of each face is the excess of its surface over the air. A trial excess gives the flux of film and
 * radiation; that flux, carried inwards layer by layer, gives the medium temperature that would drive it; the excess is
 * right when that is the medium's own. So λ(T) is integrated exactly, any number of layers needs no inner iteration, and
 * the balance is one search in one unknown. It rises with the unknown save where a correlation
 * steps; there the search ends on one of the answers that close it, or on the step itself, and says so. Temperatures between −200 and 1000 °C; layers inside to outside.
 * Never throws and never gives NaN for finite input in the ranges of `model/fields.ts`.
 */
export function solve(system: System): Solution {
  const wall = wallOf(system.shape, system.layers)
  const weather: Weather = {
    airC: system.around.airC,
    windMPerS: system.around.windMPerS,
    pressurePa: standardPressurePa(system.around.altitudeM),
  }
  const notes: Note[] = []
  const faces = wall.faces.map((face) => solveFace(system, wall, face, weather, notes))
  const mean = (pick: (face: Face) => number): number =>
    faces.reduce((sum, face) => sum + face.share * pick(face), 0)
  const heatFluxWPerM2 = mean((face) => face.heatFluxWPerM2)
  notes.push(...conductivityNotes(system.layers, faces))
  return {
    heatLossWPerM: wall.outerAreaM2PerM === null ? null : heatFluxWPerM2 * wall.outerAreaM2PerM,
    heatFluxWPerM2,
    surfaceTempC: mean((face) => face.surfaceTempC),
    convectionWPerM2K: mean((face) => face.convectionWPerM2K),
    radiationWPerM2K: mean((face) => face.radiationWPerM2K),
    interfaceTempsC: Array.from({ length: system.layers.length + 1 }, (_, index) =>
      mean((face) => face.interfaceTempsC[index] ?? face.surfaceTempC),
    ),
    faces,
    outerDiameterM: wall.outerDiameterM,
    outerAreaM2PerM: wall.outerAreaM2PerM,
    notes: withoutRepeats(notes),
  }
}

/** The balance counts as closed when film and conduction differ by less than this share of the driving difference. */
const CLOSED = 1e-12
/** More than this share left over means that the search ended on a jump of a correlation. */
const JUMP = 1e-9
/** And never less than this is left over [K]: a difference of almost nothing has no share to judge by. */
const NOTHING_K = 1e-12

function solveFace(
  system: System,
  wall: Wall,
  face: FaceShape,
  weather: Weather,
  notes: Note[],
): Face {
  const { airC, surroundingsC } = system.around
  const mediumExcessK = system.mediumC - airC
  const surroundingsExcessK = surroundingsC - airC
  const insideKPerWPerM2 =
    system.insideFilmWPerM2K === null ? 0 : wall.outerOverInner / system.insideFilmWPerM2K

  const radiated = (excessK: number): number =>
    radiationWPerM2K(system.emissivity, airC + excessK, surroundingsC) *
    (excessK - surroundingsExcessK)
  const convected = (excessK: number): number =>
    excessK === 0 ? 0 : convectionWPerM2K(face, weather, excessK) * excessK
  const released = (excessK: number): number => convected(excessK) + radiated(excessK)
  const drivenK = (excessK: number, flux: number): number =>
    acrossLayersK(system.layers, wall.formsM, airC + excessK, flux) + flux * insideKPerWPerM2

  const finish = (excessK: number, flux: number, convection: number): Face => {
    for (const text of filmNotes(face, weather, excessK)) notes.push({ code: 'film-range', text })
    return {
      side: face.side,
      surfaceTempC: airC + excessK,
      heatFluxWPerM2: flux,
      convectionWPerM2K: convection,
      radiationWPerM2K: radiationWPerM2K(system.emissivity, airC + excessK, surroundingsC),
      interfaceTempsC: interfaces(system.layers, wall.formsM, airC + excessK, flux),
      share: face.share,
    }
  }
  const finishOnFilm = (excessK: number): Face => {
    const convection = convectionWPerM2K(face, weather, excessK)
    return finish(excessK, convection * excessK + radiated(excessK), convection)
  }

  if (system.layers.length === 0 && insideKPerWPerM2 === 0) {
    return finishOnFilm(mediumExcessK)
  }

  const root = bracketedRoot(
    (excessK) => excessK + drivenK(excessK, released(excessK)) - mediumExcessK,
    {
      low: Math.min(mediumExcessK, surroundingsExcessK, 0),
      high: Math.max(mediumExcessK, surroundingsExcessK, 0),
    },
    { width: 0, value: CLOSED * Math.abs(mediumExcessK - surroundingsExcessK) },
  )
  const excessK = root.at
  const differenceK = Math.max(Math.abs(mediumExcessK - excessK), Math.abs(excessK))
  if (Math.abs(root.value) <= Math.max(JUMP * differenceK, NOTHING_K)) return finishOnFilm(excessK)

  // The bracket closed in on a jump between two ranges of a correlation: the flux that the layers carry lies between
  // the fluxes of the two sides, and that flux closes the balance.
  const fluxHere = released(excessK)
  const fluxBeyond = released(root.otherEnd)
  if (Math.abs(fluxHere - fluxBeyond) <= JUMP * Math.abs(fluxHere)) {
    notes.push({
      code: 'conductivity-steep',
      text: 'The conductivity falls so steeply with temperature that more than one state would fit: do not rely on this result.',
    })
    return finishOnFilm(excessK)
  }
  const flux = bracketedRoot(
    (trial) => excessK + drivenK(excessK, trial) - mediumExcessK,
    { low: Math.min(fluxHere, fluxBeyond), high: Math.max(fluxHere, fluxBeyond) },
    { width: 0, value: 0 },
  ).at
  notes.push({
    code: 'film-jump',
    text: `${capital(face.side)}: the balance falls on the jump between two ranges of the film formula; the coefficient that closes it lies between the two.`,
  })
  return finish(excessK, flux, (flux - radiated(excessK)) / excessK)
}

/** Inner minus outer temperature over all layers [K], for a flux on the outer area. */
function acrossLayersK(
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
  const tempsC = [surfaceC]
  let tempC = surfaceC
  for (let index = layers.length - 1; index >= 0; index -= 1) {
    const layer = layers[index] as Layer
    tempC += layerDifferenceK(layer.conductivity, tempC, flux * (formsM[index] as number))
    tempsC.unshift(tempC)
  }
  return tempsC
}

/** A layer read beyond the ends of its curve, judged at the layer's mean temperature. */
function conductivityNotes(layers: readonly Layer[], faces: readonly Face[]): Note[] {
  const notes: Note[] = []
  layers.forEach(({ conductivity }, index) => {
    for (const { interfaceTempsC } of faces) {
      const beyondK = beyondCurveK(
        conductivity,
        ((interfaceTempsC[index] ?? 0) + (interfaceTempsC[index + 1] ?? 0)) / 2,
      )
      if (beyondK === 0 || conductivity.kind === 'constant') continue
      const [first, last] = curveEndsC(conductivity)
      notes.push({
        code: 'conductivity-extrapolated',
        text: `Layer ${index + 1}: its mean temperature is ${Math.max(1, Math.abs(beyondK)).toFixed(0)} K ${beyondK > 0 ? 'above' : 'below'} the conductivity curve, which holds from ${first} to ${last} °C.`,
      })
      return
    }
  })
  return notes
}

/** How far a layer's mean temperature lies beyond its curve [K]: positive above, negative below, 0 within. */
export function beyondCurveK(conductivity: Conductivity, meanC: number): number {
  if (conductivity.kind === 'constant') return 0
  const [first, last] = curveEndsC(conductivity)
  return meanC > last ? meanC - last : meanC < first ? meanC - first : 0
}

function curveEndsC({ pointsC }: Extract<Conductivity, { kind: 'curve' }>): [number, number] {
  return [pointsC[0] ?? 0, pointsC[pointsC.length - 1] ?? 0]
}

function withoutRepeats(notes: readonly Note[]): Note[] {
  return notes.filter((note, index) => notes.findIndex(({ text }) => text === note.text) === index)
}

const capital = (word: string): string => word.charAt(0).toUpperCase() + word.slice(1)
