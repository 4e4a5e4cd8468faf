/** The films of the second solver, written out from the formulas: nothing comes from `src/`. */
import type { System } from '#solver/types.ts'
import type { Surface } from './oracle-geometry.ts'

const SIGMA = 5.670374419e-8
const G = 9.80665
const R_AIR = 287.05

/** Convection and radiation away from a surface, less the sun that it takes up [W/m²]. */
export function released(system: System, surface: Surface, surfaceC: number): number {
  const { airC, surroundingsC } = system.around
  const { film, emissivity, sunAbsorbedWPerM2 } = system
  if (surface.kind === 'soil') {
    return (surfaceC - airC) / (surface.soil * surface.area) - sunAbsorbedWPerM2
  }
  if (typeof film === 'object') return film.fixedWPerM2K * (surfaceC - airC) - sunAbsorbedWPerM2
  const convection =
    film === 'simplified' && hasSimplified(surface)
      ? simplified(system, surface, surfaceC)
      : detailed(system, surface, surfaceC)
  const radiation = emissivity * SIGMA * ((surfaceC + 273.15) ** 4 - (surroundingsC + 273.15) ** 4)
  return convection * (surfaceC - airC) + radiation - sunAbsorbedWPerM2
}

const isRound = ({ kind }: Surface): boolean =>
  kind === 'lying' || kind === 'standing' || kind === 'leaning'

const hasSimplified = (surface: Surface): boolean => isRound(surface) || surface.kind === 'wall'

/** Equations in the ISO 12241 form; the larger of still air and wind. */
function simplified(system: System, surface: Surface, surfaceC: number): number {
  const { airC, windMPerS: v } = system.around
  const dT = Math.abs(surfaceC - airC)
  const { length: H, across: D } = surface
  const pipe = D ** 3 * dT <= 10 ? 1.25 * (dT / D) ** 0.25 : 1.21 * dT ** (1 / 3)
  const wall = H ** 3 * dT <= 10 ? 1.32 * (dT / H) ** 0.25 : 1.74 * dT ** (1 / 3)
  const leaning = system.inclinedFilm === 'higher' ? Math.max(pipe, wall) : Math.min(pipe, wall)
  const free = surface.kind === 'lying' ? pipe : surface.kind === 'leaning' ? leaning : wall
  if (v === 0) return free
  if (!isRound(surface)) {
    const forced = v * D <= 8 ? 3.96 * (v / D) ** 0.5 : 5.76 * (v ** 4 / D) ** 0.2
    return Math.max(free, forced)
  }
  const forced =
    v * D <= windBranchesMeet ? 8.1e-3 / D + 3.14 * (v / D) ** 0.5 : (8.9 * v ** 0.9) / D ** 0.1
  return Math.max(free, forced)
}

/** vD where 8.1e-3 + 3.14 (vD)^0.5 = 8.9 (vD)^0.9, by bisection [m²/s]. */
const windBranchesMeet = ((): number => {
  let [low, high] = [1e-2, 1]
  for (let i = 0; i < 80; i += 1) {
    const x = (low + high) / 2
    if (8.1e-3 + 3.14 * x ** 0.5 > 8.9 * x ** 0.9) low = x
    else high = x
  }
  return low
})()

function detailed(system: System, surface: Surface, surfaceC: number): number {
  const { windMPerS } = system.around
  const free = freeCoefficient(system, surface, surfaceC)
  if (windMPerS === 0) return free
  const { k, pr, re } = airNumbers(system, surface, surfaceC)
  const forced =
    surface.kind === 'ball'
      ? whitaker(system, surface, surfaceC)
      : ((isRound(surface) ? churchillBernstein(re, pr) : windPlate(re, pr)) * k) / surface.across
  const j = isRound(surface) || surface.kind === 'ball' ? 4 : 3
  const larger = Math.max(free, forced)
  return larger * ((free / larger) ** j + (forced / larger) ** j) ** (1 / j)
}

function freeCoefficient(system: System, surface: Surface, surfaceC: number): number {
  if (surface.kind === 'leaning') {
    const { across } = surface
    const lying = freeCoefficient(system, { ...surface, kind: 'lying', length: across }, surfaceC)
    const standing = freeCoefficient(system, { ...surface, kind: 'standing' }, surfaceC)
    return system.inclinedFilm === 'higher' ? Math.max(lying, standing) : Math.min(lying, standing)
  }
  const { k, pr, ra } = airNumbers(system, surface, surfaceC)
  return (freeNusselt(surface, ra, pr, surfaceC > system.around.airC) * k) / surface.length
}

/** Air at film temperature, and the dimensionless numbers of one surface. */
export function airNumbers({ around }: System, surface: Surface, surfaceC: number) {
  const { airC, windMPerS } = around
  const T = (surfaceC + airC) / 2 + 273.15
  const { k, nu, pr } = airAt(T, around.altitudeM)
  const ra = ((G / T) * Math.abs(surfaceC - airC) * surface.length ** 3 * pr) / nu ** 2
  return { T, k, pr, ra, re: (windMPerS * surface.across) / nu }
}

function airAt(T: number, altitudeM: number) {
  const pressure = 101325 * (1 - 2.25577e-5 * altitudeM) ** 5.2559
  const density = pressure / (R_AIR * T)
  const k = conductivityOfAir(T)
  const cp = 1057.5 - 0.4489 * T + 1.1407e-3 * T ** 2 - 7.9999e-7 * T ** 3 + 1.9327e-10 * T ** 4
  const nu = viscosity(T) / density
  const alpha = k / (density * cp)
  return { k, nu, pr: nu / alpha }
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

/** Soil and leaning pipes have none of their own. */
function freeNusselt(surface: Surface, ra: number, pr: number, isWarm: boolean): number {
  const churchillChu = (constant: number, inPr: number): number =>
    (constant + (0.387 * ra ** (1 / 6)) / (1 + (inPr / pr) ** (9 / 16)) ** (8 / 27)) ** 2
  switch (surface.kind) {
    case 'lying':
      return churchillChu(0.6, 0.559)
    case 'wall':
      return churchillChu(0.825, 0.492)
    case 'ball':
      return (
        2 +
        ((0.589 * ra ** 0.25) / (1 + (0.469 / pr) ** (9 / 16)) ** (4 / 9)) *
          (1 + (7.44e-8 * ra) / (1 + (0.469 / pr) ** (9 / 16)) ** (16 / 9)) ** (1 / 12)
      )
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
    case 'soil':
    case 'leaning':
      return Number.NaN
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

/** Properties at air temperature; the viscosity at the surface only in its ratio. */
function whitaker({ around }: System, surface: Surface, surfaceC: number): number {
  const T = around.airC + 273.15
  const { k, nu, pr } = airAt(T, around.altitudeM)
  const re = (around.windMPerS * surface.across) / nu
  const ratio = viscosity(T) / viscosity(surfaceC + 273.15)
  const nusselt = 2 + (0.4 * re ** 0.5 + 0.06 * re ** (2 / 3)) * pr ** 0.4 * ratio ** 0.25
  return (nusselt * k) / surface.across
}
