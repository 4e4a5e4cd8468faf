/**
 * Steady conduction through layers by finite volumes, from the conservation law alone: what enters a cell leaves it.
 *
 * Nodes stand on the edges of the cells and on every joint between layers; between two nodes flows area × λ × drop over
 * distance, with area and λ read at the face in the middle. Newton's method on all nodes at once, tridiagonal
 * elimination in each step. No logarithm of radii and no integral of λ occurs: those are what this has to confirm.
 */
import type { Conductivity } from '#solver/types.ts'
import { at, eliminate, emptyTridiagonal } from './tridiagonal.ts'

export type RadialGeometry = 'plane' | 'cylinder' | 'sphere'

export interface RadialLayer {
  readonly thicknessM: number
  readonly lambda: (tempC: number) => number
  /** Temperatures at which λ(T) has a corner, and by how much its slope changes there [W/(m·K²)]. */
  readonly corners: readonly { readonly tempC: number; readonly slopeStep: number }[]
}

export interface RadialProblem {
  readonly geometry: RadialGeometry
  /** Of the bare thing; counts for nothing on a plane. */
  readonly innerRadiusM: number
  readonly layers: readonly RadialLayer[]
  readonly mediumC: number
  /** Null: the inner surface is at the medium's temperature. */
  readonly insideFilmWPerM2K: number | null
  /** Heat that the outer surface gives off at a temperature [W/m²]. */
  readonly outerFlux: (surfaceC: number) => number
  /** Where the search for the outer temperature starts [°C]. */
  readonly startC: number
}

export interface RadialAnswer {
  /** Flux on the outer area [W/m²]. */
  readonly fluxWPerM2: number
  /** Inside to outside, layers + 1. */
  readonly interfacesC: readonly number[]
}

export interface RefinedAnswer extends RadialAnswer {
  /** What the grid may still cost, as a share of the flux and of the drop from medium to surface. */
  readonly gridErrorShare: number
}

/** λ(T) of a solver's material, by its documented reading; a `mean` series has no value at a point and no place here. */
export function radialLayer(thicknessM: number, conductivity: Conductivity): RadialLayer {
  if (conductivity.kind === 'constant') {
    return { thicknessM, lambda: () => conductivity.conductivityWPerMK, corners: [] }
  }
  if (conductivity.basis === 'mean') throw new Error('A mean series is not λ(T).')
  const { pointsC, valuesWPerMK } = conductivity
  const slopes = pointsC.map((tempC, i) =>
    i === 0
      ? 0
      : ((valuesWPerMK[i] as number) - (valuesWPerMK[i - 1] as number)) /
        (tempC - (pointsC[i - 1] as number)),
  )
  slopes.push(Math.max(0, slopes[slopes.length - 1] as number))
  // λ as its first value plus every corner's contribution: a sum of ramps instead of a search for the right piece.
  const corners = pointsC.map((tempC, i) => ({
    tempC,
    slopeStep: (slopes[i + 1] as number) - (slopes[i] as number),
  }))
  const lambda = (tempC: number): number =>
    corners.reduce(
      (sum, corner) => sum + corner.slopeStep * Math.max(0, tempC - corner.tempC),
      valuesWPerMK[0] as number,
    )
  return { thicknessM, lambda, corners }
}

/** On a grid and on one twice as fine; the answer is extrapolated, as the error falls with the square of the step. */
export function refinedRadial(problem: RadialProblem, cellsPerLayer = 120): RefinedAnswer {
  const coarse = solveRadial(problem, cellsPerLayer)
  const fine = solveRadial(problem, 2 * cellsPerLayer)
  const better = (one: number, two: number): number => two + (two - one) / 3
  const surfaceC = fine.interfacesC.at(-1) as number
  const dropK = Math.max(1e-9, Math.abs(problem.mediumC - surfaceC))
  const shift = Math.max(
    Math.abs(fine.fluxWPerM2 - coarse.fluxWPerM2) / Math.max(1e-12, Math.abs(fine.fluxWPerM2)),
    ...fine.interfacesC.map(
      (tempC, i) => Math.abs(tempC - (coarse.interfacesC[i] as number)) / dropK,
    ),
  )
  return {
    fluxWPerM2: better(coarse.fluxWPerM2, fine.fluxWPerM2),
    interfacesC: fine.interfacesC.map((tempC, i) => better(coarse.interfacesC[i] as number, tempC)),
    // The square law holds for the smooth part of the error; the error at a corner of λ(T) also depends on where in its
    // cell the corner falls, so it may hide between the two grids and is bounded on its own.
    gridErrorShare: shift + coarse.cornerK / dropK,
  }
}

interface Grid {
  /** Area over distance of each face [m² per m, per unit]. */
  readonly reach: Float64Array
  readonly layerOfFace: readonly RadialLayer[]
  /** Node on the inner side of each layer, and the last node. */
  readonly joints: readonly number[]
  readonly innerArea: number
  readonly outerArea: number
}

export function solveRadial(
  problem: RadialProblem,
  cellsPerLayer: number,
): RadialAnswer & { readonly cornerK: number } {
  const grid = gridOf(problem, cellsPerLayer)
  const last = grid.layerOfFace.length
  const temps = Float64Array.from(
    { length: last + 1 },
    (_, i) => problem.mediumC + (i / last) * (problem.startC - problem.mediumC),
  )
  const scaleK = Math.max(1, Math.abs(problem.mediumC - problem.startC))
  for (let step = 0; step < 4 * NEWTON_STEPS; step += 1) {
    const moveK = stepOn(problem, grid, temps, step < NEWTON_STEPS)
    if (moveK < 1e-8 * scaleK) {
      return {
        fluxWPerM2: flowAt(grid, temps, last - 1) / grid.outerArea,
        interfacesC: grid.joints.map((node) => at(temps, node)),
        cornerK: cornerErrorK(grid, temps),
      }
    }
  }
  throw new Error('The finite-volume solve did not settle.')
}

function gridOf({ geometry, innerRadiusM, layers }: RadialProblem, cells: number): Grid {
  const areaAt = (radiusM: number): number => {
    if (geometry === 'plane') return 1
    return geometry === 'cylinder' ? 2 * Math.PI * radiusM : 4 * Math.PI * radiusM * radiusM
  }
  const reach: number[] = []
  const layerOfFace: RadialLayer[] = []
  const joints = [0]
  let startM = innerRadiusM
  for (const layer of layers) {
    const endM = startM + layer.thicknessM
    // Steps that grow with the radius resolve a thick layer on a thin pipe; on a plane they are even.
    const edge = (i: number): number =>
      geometry === 'plane'
        ? startM + (i / cells) * layer.thicknessM
        : startM * (endM / startM) ** (i / cells)
    for (let i = 0; i < cells; i += 1) {
      reach.push(areaAt((edge(i) + edge(i + 1)) / 2) / (edge(i + 1) - edge(i)))
      layerOfFace.push(layer)
    }
    joints.push(reach.length)
    startM = endM
  }
  return {
    reach: Float64Array.from(reach),
    layerOfFace,
    joints,
    innerArea: areaAt(innerRadiusM),
    outerArea: areaAt(startM),
  }
}

/** Heat through the face between nodes i and i + 1 [W per unit]. */
function flowAt({ reach, layerOfFace }: Grid, temps: Float64Array, i: number): number {
  const [inner, outer] = [at(temps, i), at(temps, i + 1)]
  return (
    at(reach, i) * (layerOfFace[i] as RadialLayer).lambda((inner + outer) / 2) * (inner - outer)
  )
}

/** What each node keeps of the heat that enters it [W per unit]: nothing, once solved. */
function kept(problem: RadialProblem, grid: Grid, temps: Float64Array): Float64Array {
  const last = grid.layerOfFace.length
  const film = problem.insideFilmWPerM2K
  const kept = new Float64Array(last + 1)
  kept[0] = film === null ? 0 : film * grid.innerArea * (problem.mediumC - at(temps, 0))
  for (let i = 0; i < last; i += 1) {
    const flow = flowAt(grid, temps, i)
    kept[i] = at(kept, i) - flow
    kept[i + 1] = flow
  }
  kept[last] = at(kept, last) - grid.outerArea * problem.outerFlux(at(temps, last))
  if (film === null) kept[0] = 0
  return kept
}

/** Newton's method settles in fewer, unless a corner of λ(T) catches it; then λ is held during each step instead. */
const NEWTON_STEPS = 25

/** One step, by Newton shortened while it makes the balance worse; returns how far it moved [K]. */
function stepOn(
  problem: RadialProblem,
  grid: Grid,
  temps: Float64Array,
  isNewton: boolean,
): number {
  const last = grid.layerOfFace.length
  const rows = emptyTridiagonal(last + 1)
  const before = kept(problem, grid, temps)
  const add = (values: Float64Array, i: number, by: number): void => {
    values[i] = at(values, i) + by
  }
  for (let i = 0; i < last; i += 1) {
    const layer = grid.layerOfFace[i] as RadialLayer
    const mean = (at(temps, i) + at(temps, i + 1)) / 2
    const drop = at(temps, i) - at(temps, i + 1)
    const slope = isNewton ? (layer.lambda(mean + 1e-4) - layer.lambda(mean - 1e-4)) / 2e-4 : 0
    const byInner = at(grid.reach, i) * (layer.lambda(mean) + (slope * drop) / 2)
    const byOuter = at(grid.reach, i) * (-layer.lambda(mean) + (slope * drop) / 2)
    add(rows.main, i, -byInner)
    add(rows.above, i, -byOuter)
    add(rows.below, i + 1, byInner)
    add(rows.main, i + 1, byOuter)
  }
  const surfaceC = at(temps, last)
  const filmSlope = (problem.outerFlux(surfaceC + 1e-4) - problem.outerFlux(surfaceC - 1e-4)) / 2e-4
  add(rows.main, last, -grid.outerArea * filmSlope)
  if (problem.insideFilmWPerM2K === null) {
    rows.main[0] = 1
    rows.above[0] = 0
  } else {
    add(rows.main, 0, -problem.insideFilmWPerM2K * grid.innerArea)
  }
  before.forEach((value, i) => {
    rows.right[i] = -value
  })
  const move = eliminate(rows)
  const size = (values: Float64Array): number => Math.hypot(...values)
  let share = 1
  for (;;) {
    const trial = temps.map((tempC, i) => tempC + share * at(move, i))
    if (!isNewton || share < 1e-3 || size(kept(problem, grid, trial)) <= size(before)) {
      temps.set(trial)
      return share * move.reduce((most, value) => Math.max(most, Math.abs(value)), 0)
    }
    share /= 2
  }
}

/**
 * Bound of what the corners of λ(T) cost [K]: over a step of ΔT that holds a corner, λ in the middle misses the mean
 * of λ by at most the change of slope times ΔT/8.
 */
function cornerErrorK(grid: Grid, temps: Float64Array): number {
  let sumK = 0
  grid.layerOfFace.forEach(({ corners, lambda }, i) => {
    const [one, two] = [at(temps, i), at(temps, i + 1)]
    for (const { tempC, slopeStep } of corners) {
      if ((tempC - one) * (tempC - two) > 0) continue
      sumK += (Math.abs(slopeStep) * (one - two) ** 2) / 8 / lambda(tempC)
    }
  })
  return sumK
}
