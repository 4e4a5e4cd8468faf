import type { Layer } from '#solver/types.ts'
import type { BuildUpLayer, Problem, Step } from './problem.ts'

/** A build-up with every thickness settled: one rung of the ladder, or the fixed one. */
export interface Settled {
  readonly layers: readonly BuildUpLayer[]
  readonly thicknessM: number
  readonly nominalThicknessM: number | null
  readonly piecesM: readonly number[]
}

/** The bare run. */
export const bare: Settled = { layers: [], thicknessM: 0, nominalThicknessM: null, piecesM: [] }

/** The build-up with a step in place of its sized layer; without one, as it stands. */
export function settle(layers: readonly BuildUpLayer[], step: Step | null): Settled {
  const settled = layers.map((layer) =>
    layer.thicknessM === null && step
      ? { ...layer, thicknessM: step.thicknessM, piecesM: step.piecesM }
      : layer,
  )
  return {
    layers: settled,
    thicknessM: settled.reduce((sum, layer) => sum + (layer.thicknessM ?? 0), 0),
    nominalThicknessM: step?.nominalThicknessM ?? null,
    piecesM: settled.flatMap((layer) => layer.piecesM),
  }
}

/** The rungs of a problem in order; a single one where every thickness is fixed, none for a bare run. */
export function rungsOf(problem: Problem): Settled[] {
  if (problem.layers.length === 0) return []
  if (problem.layers.every((layer) => layer.thicknessM !== null)) {
    return [settle(problem.layers, null)]
  }
  return problem.steps.map((step) => settle(problem.layers, step))
}

/** The layers as the solver sees them: neighbours of one material conduct as one. */
export function solverLayers({ layers }: Settled): Layer[] {
  return layers.map(({ material, thicknessM }) => ({
    thicknessM: thicknessM ?? 0,
    conductivity: material.conductivity,
  }))
}
