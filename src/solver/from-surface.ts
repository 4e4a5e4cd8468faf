/** Backwards from a surface temperature: what the surface gives off, what its layers carry, how well they conduct. */
import { filmOf, radiates } from './film.ts'
import { type FaceShape, type Wall, wallOf } from './geometry.ts'
import { acrossLayersK, insideM2KPerW } from './layers.ts'
import { radiationWPerM2K } from './radiation.ts'
import { bracketedRoot } from './root.ts'
import { weatherOf } from './solve.ts'
import type { System, Unit } from './types.ts'

/** Area mean over the faces, heat flow positive outwards. */
export interface SurfaceFlux {
  readonly heatFluxWPerM2: number
  /** On surface minus air. */
  readonly convectionWPerM2K: number
  /** On surface minus surroundings. */
  readonly radiationWPerM2K: number
  readonly unit: Unit
  /** Outwards, for one unit [W/m, W/m² or W]. */
  readonly heatFlowWPerUnit: number
}

/**
 * What a surface at a known temperature gives off by convection and radiation, the sun's share taken off. Every face
 * is taken at that temperature; medium and conductivities count for nothing. −200 to 1000 °C. Source: the heat balance
 * of `solve`, of which this is the outer half.
 */
export function fluxOf(system: System, surfaceTempC: number): SurfaceFlux {
  const wall = wallOf(system.shape, system.layers)
  const weather = weatherOf(system)
  const { airC, surroundingsC } = system.around
  const excessK = surfaceTempC - airC
  let convectionWPerM2K = 0
  let radiation = 0
  for (const face of wall.faces) {
    const film = filmOf(face, weather, system.film, system.inclinedFilm)
    if (excessK !== 0) convectionWPerM2K += face.share * film(excessK)
    if (radiates(face, system.film))
      radiation += face.share * radiationWPerM2K(system.emissivity, surfaceTempC, surroundingsC)
  }
  const heatFluxWPerM2 =
    convectionWPerM2K * excessK +
    radiation * (surfaceTempC - surroundingsC) -
    system.sunAbsorbedWPerM2
  return {
    heatFluxWPerM2,
    convectionWPerM2K,
    radiationWPerM2K: radiation,
    unit: wall.unit,
    heatFlowWPerUnit: heatFluxWPerM2 * wall.outerAreaM2PerUnit,
  }
}

/**
 * What the layers as given carry from the medium to an outer surface held at a temperature [W/m² on the outer area,
 * positive outwards]; null for a bare surface without a film inside, which carries whatever is asked of it.
 * Source: Fourier's law with ∫λ dT, as in `solve`, of which this is the inner half.
 */
export function conductionFluxWPerM2(system: System, surfaceTempC: number): number | null {
  const { faces } = wallOf(system.shape, system.layers)
  const differenceK = system.mediumC - surfaceTempC
  if (faces.some((face) => insideM2KPerW(system, face) + formOf(face) === 0)) return null
  if (differenceK === 0) return 0
  let flux = 0
  for (const face of faces) flux += face.share * faceFlux(system, face, surfaceTempC, differenceK)
  return flux
}

function faceFlux(
  system: System,
  face: FaceShape,
  surfaceTempC: number,
  differenceK: number,
): number {
  const insideFilmM2KPerW = insideM2KPerW(system, face)
  const short = (flux: number): number =>
    acrossLayersK(system.layers, face.formsM, surfaceTempC, flux) +
    flux * insideFilmM2KPerW -
    differenceK
  let far = differenceK
  while (short(far) * differenceK < 0) far *= 4
  const bracket = { low: Math.min(0, far), high: Math.max(0, far) }
  return bracketedRoot(short, bracket, { width: 0, value: 1e-12 * Math.abs(differenceK) }).at
}

const formOf = ({ formsM }: FaceShape): number => formsM.reduce((sumM, formM) => sumM + formM, 0)

/** Conductivities that are looked for [W/(m·K)]: far below any lagging, and far above any metal. */
const LEAST_W_PER_M_K = 1e-5
const MOST_W_PER_M_K = 1e4

/**
 * Conductivity of the build-up as one material that carries a given flux (area mean) from the medium to a surface at
 * a temperature: for one layer Kirchhoff's mean of λ between them. Null where no conductivity does: no layer, a flux
 * against the difference, or one that the film inside alone does not let through. [W/(m·K)]
 */
export function effectiveConductivityWPerMK(
  system: System,
  surfaceTempC: number,
  heatFluxWPerM2: number,
): number | null {
  const wall = wallOf(system.shape, system.layers)
  const differenceK = system.mediumC - surfaceTempC
  if (system.layers.length === 0 || differenceK * heatFluxWPerM2 <= 0) return null
  const wanted = heatFluxWPerM2 / differenceK
  const carried = (conductivityWPerMK: number): number =>
    conductanceWPerM2K(system, wall, conductivityWPerMK)
  const most = carried(MOST_W_PER_M_K)
  if (wanted >= most || wanted <= carried(LEAST_W_PER_M_K)) return null
  // Without a film inside the conductance is straight in λ, and the first step of the search is the answer.
  return bracketedRoot(
    (conductivityWPerMK) => carried(conductivityWPerMK) / wanted - 1,
    { low: LEAST_W_PER_M_K, high: MOST_W_PER_M_K },
    { width: 0, value: 1e-13 },
  ).at
}

function conductanceWPerM2K(system: System, { faces }: Wall, conductivityWPerMK: number): number {
  let conductance = 0
  for (const face of faces) {
    conductance += face.share / (formOf(face) / conductivityWPerMK + insideM2KPerW(system, face))
  }
  return conductance
}
