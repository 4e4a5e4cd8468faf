/** From a surface temperature that was measured, or may have been, to the flux that leaves it. */
import {
  type FaceShape,
  filmOf,
  fluxOf,
  radiates,
  radiationWPerM2K,
  wallOf,
  weatherOf,
} from '#solver/index.ts'
import type { Face, System } from '#solver/types.ts'
import type { Condition } from '../problem.ts'
import { filmSteps } from './film.ts'
import { Ledger } from './ledger.ts'
import { conditionWords } from './state.ts'
import type { Section } from './types.ts'

/** A reading and what it was read in. */
export interface ReadingWorking {
  readonly system: System
  readonly surfaceTempC: number
  readonly condition: Condition
  /** What the sections are about: "Survey". */
  readonly title: string
  readonly surfaceWords: string
}

/** A section for the film of each face, and one that joins them. */
export function readingSections(reading: ReadingWorking): Section[] {
  const { system, condition, title, surfaceWords } = reading
  const isBare = system.layers.length === 0
  const { around, emissivity } = system
  const own = { ...condition, around, emissivity, bareEmissivity: emissivity }
  const faces = wallOf(system.shape, system.layers).faces.map((shape) => ({
    shape,
    face: faceOf(reading, shape),
  }))
  const films = faces.map(({ shape, face }) => {
    const of = shape.side === 'all round' ? '' : `, ${shape.side}`
    const ledger = new Ledger(`${title}: outer film${of}`, conditionWords(own, isBare))
    filmSteps(ledger, {
      system,
      shape,
      face,
      sunWPerM2: condition.sunWPerM2,
      sky: condition.sky,
      solarAbsorptance: isBare ? condition.bareSolarAbsorptance : condition.solarAbsorptance,
      surfaceWords,
    })
    return ledger.section()
  })
  return faces.length > 1
    ? [
        ...films,
        meanSection(
          reading,
          faces.map(({ face }) => face),
        ),
      ]
    : films
}

function faceOf({ system, surfaceTempC }: ReadingWorking, shape: FaceShape): Face {
  const { airC, surroundingsC } = system.around
  const film = filmOf(shape, weatherOf(system), system.film, system.inclinedFilm)
  const excessK = surfaceTempC - airC
  const convectionWPerM2K = film(excessK)
  const radiation = radiates(shape, system.film)
    ? radiationWPerM2K(system.emissivity, surfaceTempC, surroundingsC)
    : 0
  return {
    side: shape.side,
    surfaceTempC,
    heatFluxWPerM2:
      convectionWPerM2K * excessK +
      radiation * (surfaceTempC - surroundingsC) -
      system.sunAbsorbedWPerM2,
    convectionWPerM2K,
    radiationWPerM2K: radiation,
    interfaceTempsC: [],
    share: shape.share,
    closure: 'closed',
  }
}

function meanSection(
  { system, surfaceTempC, title }: ReadingWorking,
  faces: readonly Face[],
): Section {
  const ledger = new Ledger(`${title}: mean of the faces`, null)
  faces.forEach(({ side, share, heatFluxWPerM2 }, index) => {
    ledger.given(`Share of the ${side} in the outer area`, `a_${index + 1}`, share, '')
    ledger.given('Flux there, as above', `q_${index + 1}`, heatFluxWPerM2, 'W/m²')
  })
  const terms = faces.map((_, index) => `a_${index + 1} × q_${index + 1}`)
  ledger.step('Flux outwards on the outer area', 'q', terms.join(' + '), 'W/m²', {
    value: fluxOf(system, surfaceTempC).heatFluxWPerM2,
  })
  return ledger.section()
}
