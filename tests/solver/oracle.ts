/**
 * A second solver for the tests, written from the formulas and not from `src/`: bisection on the surface temperature;
 * for each trial, a march from the medium outwards in which the far side of every layer is found by bisection on the
 * mean conductivity, integrated by Simpson's rule. Slow and plain on purpose; it shares no code with what it examines.
 */
import type { Conductivity, Shape, System } from '#solver/types.ts'

const SIGMA = 5.670374419e-8
const G = 9.80665
const R_AIR = 287.05

interface Surface {
  readonly side: string
  readonly area: number
  readonly kind: 'lying' | 'standing' | 'wall' | 'up' | 'down'
  readonly length: number
  readonly across: number
}

/** Everything per metre of run (pipes, ducts) or per m² (flat): areas in m², resistances in K/W. */
interface Geometry {
  readonly innerArea: number
  readonly outerArea: number
  readonly surfaces: readonly Surface[]
  /** Resistance of layer j is `coefficient[j] / λ`. */
  readonly coefficients: readonly number[]
}

export interface OracleSurface {
  readonly side: string
  readonly surfaceC: number
  readonly flux: number
  readonly interfacesC: readonly number[]
}

export interface OracleAnswer {
  readonly flowW: number
  readonly fluxWPerM2: number
  readonly surfaces: readonly OracleSurface[]
}

export function oracle(system: System): OracleAnswer {
  const geometry = geometryOf(system)
  const surfaces = geometry.surfaces.map((surface) => solveSurface(system, geometry, surface))
  const flowW = geometry.surfaces.reduce(
    (sum, { area }, index) => sum + area * (surfaces[index]?.flux ?? 0),
    0,
  )
  return { flowW, fluxWPerM2: flowW / geometry.outerArea, surfaces }
}

/** How far the march from medium to surface misses a surface temperature, for the flow that its film takes away [K]. */
export function missK(system: System, face: number, surfaceC: number): number {
  const geometry = geometryOf(system)
  const surface = geometry.surfaces[face]
  if (!surface) throw new Error(`no face ${face}`)
  const temps = march(system, geometry, released(system, surface, surfaceC))
  return (temps.at(-1) ?? Number.NaN) - surfaceC
}

function solveSurface(system: System, geometry: Geometry, surface: Surface): OracleSurface {
  const { airC, surroundingsC } = system.around
  let cold = Math.min(airC, surroundingsC, system.mediumC)
  let hot = Math.max(airC, surroundingsC, system.mediumC)
  for (let i = 0; i < 64; i += 1) {
    const trial = (cold + hot) / 2
    const arrived = march(system, geometry, released(system, surface, trial)).at(-1) ?? Number.NaN
    if (arrived > trial) cold = trial
    else hot = trial
  }
  const surfaceC = (cold + hot) / 2
  const flux = released(system, surface, surfaceC)
  return { side: surface.side, surfaceC, flux, interfacesC: march(system, geometry, flux) }
}

/** Temperatures met on the way from the medium outwards, for a flux on the outer area: inner surface to outer surface. */
function march(system: System, geometry: Geometry, flux: number): number[] {
  const flow = flux * geometry.outerArea
  const film =
    system.insideFilmWPerM2K === null ? 0 : 1 / (system.insideFilmWPerM2K * geometry.innerArea)
  const temps = [system.mediumC - flow * film]
  system.layers.forEach(({ conductivity }, j) => {
    temps.push(
      farSideC(conductivity, temps[j] ?? Number.NaN, flow * (geometry.coefficients[j] ?? 0)),
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

function geometryOf({ shape, layers }: { shape: Shape; layers: System['layers'] }): Geometry {
  const thicknesses = layers.map(({ thicknessM }) => thicknessM)
  const total = thicknesses.reduce((sum, t) => sum + t, 0)
  if (shape.kind === 'flat') {
    const kind = shape.facing === 'vertical' ? ('wall' as const) : shape.facing
    const length = shape.characteristicLengthM
    return {
      innerArea: 1,
      outerArea: 1,
      coefficients: thicknesses,
      surfaces: [{ side: 'all round', area: 1, kind, length, across: length }],
    }
  }
  if (shape.kind === 'pipe') {
    const outer = shape.outerDiameterM + 2 * total
    let d = shape.outerDiameterM
    const coefficients = thicknesses.map((t) => {
      const inner = d
      d += 2 * t
      return Math.log(d / inner) / (2 * Math.PI)
    })
    const lying = shape.orientation === 'horizontal'
    const surface: Surface = {
      side: 'all round',
      area: Math.PI * outer,
      kind: lying ? 'lying' : 'standing',
      length: lying ? outer : shape.riseM,
      across: outer,
    }
    return {
      innerArea: Math.PI * shape.outerDiameterM,
      outerArea: Math.PI * outer,
      coefficients,
      surfaces: [surface],
    }
  }
  let perimeter = 2 * (shape.widthM + shape.heightM)
  const innerArea = perimeter
  const coefficients = thicknesses.map((t) => {
    const inner = perimeter
    perimeter += 8 * t
    return (2 * t) / (inner + perimeter)
  })
  const w = shape.widthM + 2 * total
  const h = shape.heightM + 2 * total
  const face = (
    side: string,
    kind: Surface['kind'],
    length: number,
    across: number,
    area: number,
  ): Surface => ({ side, kind, length, across, area })
  return {
    innerArea,
    outerArea: perimeter,
    coefficients,
    surfaces:
      shape.riseM === null
        ? [
            face('side', 'wall', h, h, 2 * h),
            face('top', 'up', w / 2, w, w),
            face('bottom', 'down', w / 2, w, w),
          ]
        : [face('all round', 'wall', shape.riseM, perimeter / 4, perimeter)],
  }
}

/** Convection and radiation away from a surface [W/m²]. */
function released(system: System, surface: Surface, surfaceC: number): number {
  const { airC, surroundingsC } = system.around
  const radiation =
    system.emissivity * SIGMA * ((surfaceC + 273.15) ** 4 - (surroundingsC + 273.15) ** 4)
  return film(system, surface, surfaceC) * (surfaceC - airC) + radiation
}

function film(system: System, surface: Surface, surfaceC: number): number {
  const { airC, windMPerS } = system.around
  const { k, pr, ra, re } = numbers(system, surface, surfaceC)
  const free = (freeNusselt(surface, ra, pr, surfaceC > airC) * k) / surface.length
  if (windMPerS === 0) return free
  const isRound = surface.kind === 'lying' || surface.kind === 'standing'
  const forced = ((isRound ? churchillBernstein(re, pr) : windPlate(re, pr)) * k) / surface.across
  const j = isRound ? 4 : 3
  const larger = Math.max(free, forced)
  return larger * ((free / larger) ** j + (forced / larger) ** j) ** (1 / j)
}

/** The dimensionless numbers of one face at a surface temperature, for tests that judge ranges and blends. */
export function filmNumbers(system: System, face: number, surfaceC: number) {
  const surface = geometryOf(system).surfaces[face]
  if (!surface) throw new Error(`no face ${face}`)
  const { T, k, pr, ra, re } = numbers(system, surface, surfaceC)
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

function numbers({ around }: System, surface: Surface, surfaceC: number) {
  const { airC, windMPerS, altitudeM } = around
  const T = (surfaceC + airC) / 2 + 273.15
  const pressure = 101325 * (1 - 2.25577e-5 * altitudeM) ** 5.2559
  const density = pressure / (R_AIR * T)
  const mu = viscosity(T)
  const k = conductivityOfAir(T)
  const cp = 1057.5 - 0.4489 * T + 1.1407e-3 * T ** 2 - 7.9999e-7 * T ** 3 + 1.9327e-10 * T ** 4
  const nu = mu / density
  const alpha = k / (density * cp)
  const ra = ((G / T) * Math.abs(surfaceC - airC) * surface.length ** 3) / (nu * alpha)
  return { T, k, pr: nu / alpha, ra, re: (windMPerS * surface.across) / nu }
}

function viscosity(T: number): number {
  const b = [0.431, -0.4623, 0.08406, 0.005341, -0.00331]
  const omega = Math.exp(b.reduce((sum, c, i) => sum + c * Math.log(T / 103.3) ** i, 0))
  return (1e-6 * 0.0266958 * Math.sqrt(28.9586 * T)) / (0.36 ** 2 * omega)
}

function conductivityOfAir(T: number): number {
  const tau = 132.6312 / T
  return 1e-3 * (1.308 * viscosity(T) * 1e6 + 1.405 * tau ** -1.1 - 1.036 * tau ** -0.3)
}

function freeNusselt(surface: Surface, ra: number, pr: number, isWarm: boolean): number {
  const churchillChu = (constant: number, inPr: number): number =>
    (constant + (0.387 * ra ** (1 / 6)) / (1 + (inPr / pr) ** (9 / 16)) ** (8 / 27)) ** 2
  switch (surface.kind) {
    case 'lying':
      return churchillChu(0.6, 0.559)
    case 'wall':
      return churchillChu(0.825, 0.492)
    case 'standing': {
      const plate = churchillChu(0.825, 0.492)
      if (ra > 1e9) return plate
      const leFevreEde =
        (4 / 3) * ((7 * ra * pr) / (5 * (20 + 21 * pr))) ** 0.25 +
        (4 * (272 + 315 * pr) * surface.length) / (35 * (64 + 63 * pr) * surface.across)
      return Math.max(plate, leFevreEde)
    }
    case 'up':
    case 'down': {
      const rises = (surface.kind === 'up') === isWarm
      if (!rises) return 0.27 * ra ** 0.25
      if (ra < 200) return 0.96 * ra ** (1 / 6)
      if (ra < 1e4) return 0.59 * ra ** 0.25
      return ra < 8e6 ? 0.54 * ra ** 0.25 : 0.15 * ra ** (1 / 3)
    }
  }
}

function churchillBernstein(re: number, pr: number): number {
  const base = (0.62 * re ** 0.5 * pr ** (1 / 3)) / (1 + (0.4 / pr) ** (2 / 3)) ** (1 / 4)
  return 0.3 + base * (1 + (re / 282000) ** (5 / 8)) ** (4 / 5)
}

function windPlate(re: number, pr: number): number {
  const rough = 0.037 * re ** 0.8 * pr ** (1 / 3)
  const laminar = 0.664 * re ** 0.5 * pr ** (1 / 3)
  return re < 5e5 ? Math.max(rough, laminar) : rough
}
