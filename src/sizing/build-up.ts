import type { Layer } from '#solver/types.ts'
import type { BuildUpLayer, LayerMaterial, Problem, Step } from './problem.ts'

/** A build-up with every thickness settled: one rung of the ladder, or the fixed one. */
export interface Settled {
  readonly layers: readonly BuildUpLayer[]
  readonly thicknessM: number
  readonly nominalThicknessM: number | null
  readonly piecesM: readonly number[]
}

/** The bare run. */
export const bare: Settled = { layers: [], thicknessM: 0, nominalThicknessM: null, piecesM: [] }

/** The build-up with a step in place of its sized layer; without one, as it stands. Neighbours of one material are one. */
export function settle(layers: readonly BuildUpLayer[], step: Step | null): Settled {
  const settled = joined(
    layers.map((layer) =>
      layer.thicknessM === null && step
        ? { ...layer, thicknessM: step.thicknessM, piecesM: step.piecesM }
        : layer,
    ),
  )
  return {
    layers: settled,
    thicknessM: settled.reduce((sum, layer) => sum + (layer.thicknessM ?? 0), 0),
    nominalThicknessM: step?.nominalThicknessM ?? null,
    piecesM: settled.flatMap((layer) => layer.piecesM),
  }
}

/** Two layers of one material laid over each other: one conduction layer of as many pieces. */
function joined(layers: readonly BuildUpLayer[]): BuildUpLayer[] {
  const found: BuildUpLayer[] = []
  for (const layer of layers) {
    const inner = found.at(-1)
    if (inner && isSame(inner.material, layer.material)) {
      found[found.length - 1] = {
        material: inner.material,
        thicknessM: (inner.thicknessM ?? 0) + (layer.thicknessM ?? 0),
        piecesM: [...inner.piecesM, ...layer.piecesM],
      }
    } else found.push(layer)
  }
  return found
}

const isSame = (a: LayerMaterial, b: LayerMaterial): boolean =>
  a.name === b.name && a.conductivity === b.conductivity

/** The rungs of a problem in order; a single one where every thickness is fixed, none for a bare run. */
export function rungsOf(problem: Problem): Settled[] {
  if (problem.layers.length === 0) return []
  if (problem.layers.every((layer) => layer.thicknessM !== null)) {
    return [settle(problem.layers, null)]
  }
  return problem.steps.map((step) => settle(problem.layers, step))
}

/** The layers as the solver sees them. */
export function solverLayers({ layers }: Settled): Layer[] {
  return layers.map(({ material, thicknessM }) => ({
    thicknessM: thicknessM ?? 0,
    conductivity: material.conductivity,
  }))
}
