/** One build-up at one condition: a section for the film and one for the layers of each face, and one that joins them. */
import { wallOf } from '#solver/index.ts'
import type { Solution } from '#solver/types.ts'
import { type Settled, solverLayers } from '../build-up.ts'
import type { Condition, Problem } from '../problem.ts'
import { systemOf } from '../states.ts'
import { printNumber } from './digits.ts'
import type { FaceAt } from './face.ts'
import { filmSteps } from './film.ts'
import { layerSteps } from './layers.ts'
import { Ledger } from './ledger.ts'
import type { Section } from './types.ts'

export interface StateWorking {
  readonly problem: Problem
  readonly settled: Settled
  readonly condition: Condition
  readonly solution: Solution
  /** What the sections are about: "Loss", "Touch", "Bare run". */
  readonly title: string
}

export function stateSections(state: StateWorking): Section[] {
  const { problem, settled, condition, solution, title } = state
  const system = systemOf(problem, settled, condition)
  const isBare = settled.layers.length === 0
  const shapes = wallOf(problem.shape, solverLayers(settled)).faces
  const words = conditionWords(condition, isBare, problem.shape.kind === 'buried-pipe')
  const sections = solution.faces.flatMap((face, index) => {
    const shape = shapes[index]
    if (!shape) return []
    const of = face.side === 'all round' ? '' : `, ${face.side}`
    const at: FaceAt = {
      system,
      shape,
      face,
      sunWPerM2: condition.sunWPerM2,
      sky: condition.sky,
      solarAbsorptance: isBare ? condition.bareSolarAbsorptance : condition.solarAbsorptance,
    }
    const film = new Ledger(`${title}: outer film${of}`, words)
    filmSteps(film, at)
    if (isBare && system.insideFilmWPerM2K === null) return [film.section()]
    const through = isBare ? 'through the film inside' : 'through the layers'
    const layers = new Ledger(`${title}: ${through}${of}`, words)
    if (face.closure === 'steep') {
      layers.say(
        'The conductivity falls so steeply with temperature that the balance did not close: do not rely on these lines.',
      )
    }
    layerSteps(layers, at, settled)
    return [film.section(), layers.section()]
  })
  return solution.faces.length > 1 ? [...sections, facesSection(state, words)] : sections
}

/** The mean of several faces. */
function facesSection({ title, solution }: StateWorking, words: string): Section {
  const ledger = new Ledger(`${title}: mean of the faces`, words)
  solution.faces.forEach((face, index) => {
    const at = index + 1
    ledger.given(`Share of the ${face.side} in the outer area`, `a_${at}`, face.share, '')
    ledger.given(`Flux there`, `q_${at}`, face.heatFluxWPerM2, 'W/m²')
    ledger.given(`Surface there`, `θ_s${at}`, face.surfaceTempC, '°C')
  })
  const joined = (symbol: string): string =>
    solution.faces.map((_, index) => `a_${index + 1} × ${symbol}${index + 1}`).join(' + ')
  ledger.step('Flux outwards on the outer area', 'q', joined('q_'), 'W/m²', {
    value: solution.heatFluxWPerM2,
  })
  ledger.step('Surface, mean', 'θ_s', joined('θ_s'), '°C', { value: solution.surfaceTempC })
  return ledger.section()
}

/** "air 28 °C, surroundings 28 °C, wind 0 m/s, medium 170.4 °C, emissivity 0.13" */
export function conditionWords(condition: Condition, isBare: boolean, isBuried = false): string {
  const { around, mediumC, emissivity, bareEmissivity, sunWPerM2, film } = condition
  const medium = `medium ${shown(mediumC)} °C`
  if (isBuried) return `surface of the ground ${shown(around.airC)} °C, ${medium}`
  const parts = [
    `air ${shown(around.airC)} °C`,
    `surroundings ${shown(around.surroundingsC)} °C`,
    `wind ${shown(around.windMPerS)} m/s`,
    medium,
    `emissivity ${shown(isBare ? bareEmissivity : emissivity)}`,
  ]
  if (sunWPerM2 > 0) parts.push(`sun ${shown(sunWPerM2)} W/m²`)
  parts.push(typeof film === 'object' ? 'fixed film' : `${film} film`)
  return parts.join(', ')
}

const shown = (value: number): string => printNumber(value, 5)
