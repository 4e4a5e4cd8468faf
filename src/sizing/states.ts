/** The solved states of one build-up: one solution for each design condition that a question needs. */

import { solve } from '#solver/index.ts'
import type { Face, Solution, System } from '#solver/types.ts'
import { type Settled, solverLayers } from './build-up.ts'
import type { Condition, Problem } from './problem.ts'

export interface States {
  /** Yearly mean, aged finish: loss and money. */
  readonly loss: Solution
  /** The same for the temperatures: an inclined pipe takes its lower film for them, all else is one with `loss`. */
  readonly surface: Solution
  /** As `loss` in each month, January first; empty where the yearly mean stands for all. */
  readonly months: readonly Solution[]
  /** Hottest day and medium, no wind, new finish: touch and the hot end of service. */
  readonly touch: Solution
  /** Most humid air, coldest medium, no wind, new finish: damp and the cold end of service. */
  readonly damp: Solution | null
}

export function systemOf(problem: Problem, settled: Settled, condition: Condition): System {
  const isBare = settled.layers.length === 0
  return {
    shape: problem.shape,
    layers: solverLayers(settled),
    emissivity: isBare ? condition.bareEmissivity : condition.emissivity,
    mediumC: condition.mediumC,
    insideFilmWPerM2K: problem.insideFilmWPerM2K,
    around: condition.around,
    sunAbsorbedWPerM2:
      condition.sunWPerM2 * (isBare ? condition.bareSolarAbsorptance : condition.solarAbsorptance),
    film: condition.film,
    inclinedFilm: condition.inclinedFilm,
  }
}

/** True where the medium gets colder than the air it passes through, so that the cold side is a question. */
export function getsCold(problem: Problem): boolean {
  const { damp } = problem.conditions
  return damp.mediumC < damp.around.airC
}

/** The surface may also be colder than the air because it faces colder surroundings: damp asks for either. */
const asksDamp = (problem: Problem): boolean => getsCold(problem) || problem.limits.damp !== null

export const isInclined = ({ shape }: Problem): boolean =>
  shape.kind === 'pipe' && shape.orientation === 'inclined'

export function solveStates(problem: Problem, settled: Settled): States {
  const { loss, months, touch, damp } = problem.conditions
  const lossState = solve(systemOf(problem, settled, loss))
  return {
    loss: lossState,
    surface: isInclined(problem)
      ? solve(systemOf(problem, settled, { ...loss, inclinedFilm: 'lower' }))
      : lossState,
    months: months.map((month) => solve(systemOf(problem, settled, month))),
    touch: solve(systemOf(problem, settled, touch)),
    damp: asksDamp(problem) ? solve(systemOf(problem, settled, damp)) : null,
  }
}

const isHotter = (a: Face, b: Face): Face => (b.surfaceTempC > a.surfaceTempC ? b : a)

export const hottestFace = ({ faces }: Solution): Face => faces.reduce(isHotter)
