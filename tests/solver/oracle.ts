/**
 * A second solver for the tests, written from the formulas and not from `src/`: bisection on the surface temperature;
 * for each trial, a march from the medium outwards in which the far side of every layer is found by bisection on the
 * mean conductivity, integrated by Simpson's rule. Slow and plain on purpose; it shares no code with what it examines.
 */
import type { Conductivity, System } from '#solver/types.ts'
import { airNumbers, released } from './oracle-film.ts'
import { type Surface, surfacesOf } from './oracle-geometry.ts'

export interface OracleSurface {
  readonly side: string
  readonly surfaceC: number
  readonly flux: number
  readonly interfacesC: readonly number[]
}

export interface OracleAnswer {
  /** Of a metre of run, a square metre or the whole piece. */
  readonly flowW: number
  readonly areaM2: number
  readonly surfaces: readonly OracleSurface[]
}

export function oracle(system: System): OracleAnswer {
  const surfaces = surfacesOf(system)
  const solved = surfaces.map((surface) => solveSurface(system, surface))
  return {
    flowW: surfaces.reduce((sum, { area }, index) => sum + area * (solved[index]?.flux ?? 0), 0),
    areaM2: surfaces.reduce((sum, { area }) => sum + area, 0),
    surfaces: solved,
  }
}

function surfaceAt(system: System, face: number): Surface {
  const surface = surfacesOf(system)[face]
  if (!surface) throw new Error(`no face ${face}`)
  return surface
}

/** How far the march from medium to surface misses a surface temperature, for the flow that its film takes away [K]. */
export function missK(system: System, face: number, surfaceC: number): number {
  const surface = surfaceAt(system, face)
  const temps = march(system, surface, released(system, surface, surfaceC))
  return (temps.at(-1) ?? Number.NaN) - surfaceC
}

/** The dimensionless numbers of one face at a surface temperature, for tests that judge ranges and blends. */
export function filmNumbers(system: System, face: number, surfaceC: number) {
  const surface = surfaceAt(system, face)
  const { T, k, pr, ra, re } = airNumbers(system, surface, surfaceC)
  return {
    kind: surface.kind,
    filmC: T - 273.15,
    airConductivityWPerMK: k,
    prandtl: pr,
    rayleigh: ra,
    reynolds: re,
    slenderness: surface.length / surface.across,
  }
}

function solveSurface(system: System, surface: Surface): OracleSurface {
  const { airC, surroundingsC } = system.around
  const arrivedC = (trial: number): number =>
    march(system, surface, released(system, surface, trial)).at(-1) ?? Number.NaN
  let cold = Math.min(airC, surroundingsC, system.mediumC)
  let hot = Math.max(airC, surroundingsC, system.mediumC)
  // The sun may heat a surface above everything around it.
  if (system.sunAbsorbedWPerM2 > 0) while (arrivedC(hot) > hot) hot += 100
  for (let i = 0; i < 64; i += 1) {
    const trial = (cold + hot) / 2
    if (arrivedC(trial) > trial) cold = trial
    else hot = trial
  }
  const surfaceC = (cold + hot) / 2
  const flux = released(system, surface, surfaceC)
  return { side: surface.side, surfaceC, flux, interfacesC: march(system, surface, flux) }
}

/** Temperatures met on the way from the medium outwards, for a flux on the outer area: inner surface to outer surface. */
function march(system: System, { through }: Surface, flux: number): number[] {
  const flow = flux * through.outerArea
  const film =
    system.insideFilmWPerM2K === null ? 0 : 1 / (system.insideFilmWPerM2K * through.innerArea)
  const temps = [system.mediumC - flow * film]
  system.layers.forEach(({ conductivity }, j) => {
    temps.push(
      farSideC(conductivity, temps[j] ?? Number.NaN, flow * (through.coefficients[j] ?? 0)),
    )
  })
  return temps
}

/** Temperature on the outer side of a layer that carries `flow` = λ·difference, by bisection. */
function farSideC(conductivity: Conductivity, nearC: number, flow: number): number {
  const least =
    conductivity.kind === 'constant'
      ? conductivity.conductivityWPerMK
      : Math.min(...conductivity.valuesWPerMK)
  let [low, high] = flow > 0 ? [nearC - flow / least, nearC] : [nearC, nearC - flow / least]
  for (let i = 0; i < 64; i += 1) {
    const trial = (low + high) / 2
    if (meanConductivity(conductivity, nearC, trial) * (nearC - trial) > flow) low = trial
    else high = trial
  }
  return (low + high) / 2
}

/** Mean conductivity between two temperatures: by Simpson's rule, or read at the mean temperature. */
export function meanConductivity(conductivity: Conductivity, fromC: number, toC: number): number {
  if (conductivity.kind === 'constant') return conductivity.conductivityWPerMK
  if (conductivity.basis === 'mean' || fromC === toC) {
    return lambdaAt(conductivity, (fromC + toC) / 2)
  }
  const [low, high] = fromC < toC ? [fromC, toC] : [toC, fromC]
  // Simpson's rule between the corners of the curve, where it is smooth.
  const corners = [low, ...conductivity.pointsC.filter((t) => t > low && t < high), high]
  let integral = 0
  for (let i = 1; i < corners.length; i += 1) {
    const a = corners[i - 1] ?? 0
    const b = corners[i] ?? 0
    integral +=
      ((b - a) / 6) *
      (lambdaAt(conductivity, a) +
        4 * lambdaAt(conductivity, (a + b) / 2) +
        lambdaAt(conductivity, b))
  }
  return integral / (high - low)
}

/** Straight between points, flat below the first, the last slope above the last (flat if that slope falls). */
export function lambdaAt(conductivity: Conductivity, tempC: number): number {
  if (conductivity.kind === 'constant') return conductivity.conductivityWPerMK
  const points = conductivity.pointsC.map((t, i) => [t, conductivity.valuesWPerMK[i] ?? 0] as const)
  const first = points.at(0) ?? [0, 0]
  const last = points.at(-1) ?? [0, 0]
  if (tempC <= first[0]) return first[1]
  if (tempC >= last[0]) {
    const before = points.at(-2)
    const slope = before ? (last[1] - before[1]) / (last[0] - before[0]) : 0
    return last[1] + Math.max(slope, 0) * (tempC - last[0])
  }
  for (let i = 1; i < points.length; i += 1) {
    const [t0, k0] = points[i - 1] ?? first
    const [t1, k1] = points[i] ?? last
    if (tempC <= t1) return (k0 * (t1 - tempC) + k1 * (tempC - t0)) / (t1 - t0)
  }
  return last[1]
}
