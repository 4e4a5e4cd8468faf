/** What the shapes have in common: the thing they resolve to, how it stands, its wall. */
import type { WallMaterial } from '#catalogue/types.ts'
import type { InsideAir } from '#sizing/problem.ts'
import type { Shape } from '#solver/types.ts'
import type { RunValues } from '../fields.ts'
import { type Findings, plain } from './findings.ts'
import type { CatalogueIndex } from './index-catalogue.ts'

/** What is lagged: shape, size and extent of a run, and the wall as a bare surface. */
export interface Thing {
  readonly shape: Shape
  /** Length [m], area of a flat surface [m²], or 1 for a sphere or vessel; null where not given. */
  readonly extent: number | null
  /** Film between the medium and the wall [W/(m²·K)]; null where it is neglected. */
  readonly insideFilmWPerM2K: number | null
  /** What that film was worked out from; null where it was not. */
  readonly insideAir?: InsideAir | null
  readonly wall: WallMaterial | null
  /** Thickness of the wall [m]; null where neither given nor listed. */
  readonly wallM: number | null
  /** Nominal size of a pipe [m]; null where only a diameter is given. */
  readonly nominalM: number | null
}

/** Diameters this near are the same [m]: a size and an od_mm may both be given if they agree. */
const SAME_DIAMETER_M = 0.0002
export const differs = (a: number, b: number): boolean => Math.abs(a - b) > SAME_DIAMETER_M

export function cylinder(
  values: RunValues,
  outerDiameterM: number,
  findings: Findings,
): Shape | null {
  if (values.buryDepthM !== undefined) return buried(values, outerDiameterM, findings)
  const orientation = lying(values, findings)
  if (orientation === 'horizontal') {
    noteUnusedRise(values, findings)
    return { kind: 'pipe', outerDiameterM, orientation }
  }
  const riseM = riseOf(values, findings)
  return riseM === null ? null : { kind: 'pipe', outerDiameterM, orientation, riseM }
}

/** Soil of which nothing is known [W/(m·K)]. Source: common practice, no source; moist soil. */
export const SOIL_W_PER_M_K = 1.5

function buried(values: RunValues, outerDiameterM: number, findings: Findings): Shape | null {
  const { buryDepthM: depthM, orientation } = values
  if (depthM === undefined) return null
  if (orientation !== undefined && orientation !== 'horizontal') {
    findings.fault('orientation', orientation, 'horizontal, or nothing: the run is buried')
  }
  noteUnusedRise(values, findings)
  if (depthM <= outerDiameterM / 2) {
    findings.fault(
      'buryDepthM',
      `${plain(depthM, 3)} m`,
      `the depth of the axis below the surface, more than half the diameter, ${plain(outerDiameterM / 2, 3)} m`,
    )
    return null
  }
  if (values.soilWPerMK === undefined) {
    findings.note(
      'soil-assumed',
      `The soil is taken to conduct ${SOIL_W_PER_M_K} W/mK, as moist soil does: none is given.`,
    )
  }
  findings.note(
    'buried',
    'The run is buried: the surface of the soil is taken at the temperature of the air; touch and damp are not judged.',
  )
  return {
    kind: 'buried-pipe',
    outerDiameterM,
    depthM,
    soilWPerMK: values.soilWPerMK ?? SOIL_W_PER_M_K,
  }
}

/** What lies does not rise. */
export function noteUnusedRise({ riseM }: RunValues, findings: Findings): void {
  if (riseM !== undefined) findings.note('unused', 'rise_m is not used: the run is horizontal.')
}

/** Pipes and ducts lie, stand or slope; only a flat surface faces up or down. */
export function lying(
  { orientation }: RunValues,
  findings: Findings,
): 'horizontal' | 'vertical' | 'inclined' {
  if (orientation === 'up' || orientation === 'down') {
    findings.fault(
      'orientation',
      orientation,
      'horizontal, vertical or inclined; up and down are for flat surfaces',
    )
    return 'horizontal'
  }
  return orientation ?? 'horizontal'
}

/** The film inside as given by hand; null where it is left to others. */
export function givenInsideFilm({ insideFilmWPerM2K }: RunValues): number | null {
  return insideFilmWPerM2K ?? null
}

/** Heights of a vertical run for which a film is worked out, as of the field `rise_m` [m]. */
const LEAST_RISE_M = 0.05
const MOST_RISE_M = 500

export function riseOf(values: RunValues, findings: Findings): number | null {
  const riseM = values.riseM ?? values.lengthM
  if (riseM === undefined) {
    findings.fault('riseM', 'nothing', 'the height that the run rises in m, or its length_m')
    return null
  }
  if (riseM < LEAST_RISE_M || riseM > MOST_RISE_M) {
    findings.fault(
      'riseM',
      `nothing, and a length of ${plain(riseM, 3)} m`,
      `the height of the vertical run, from ${LEAST_RISE_M} to ${MOST_RISE_M} m`,
    )
    return null
  }
  // A length of 0 stands for fittings alone, of a run that rises all the same.
  const { lengthM } = values
  if (lengthM !== undefined && lengthM > 0 && riseM > lengthM) {
    findings.fault(
      'riseM',
      `${plain(riseM, 3)} m over a length of ${plain(lengthM, 3)} m`,
      'at most the length of the run: it cannot rise by more',
    )
  }
  if (values.riseM === undefined) {
    findings.note(
      'rise-assumed',
      `The run is taken to rise over its whole length, ${plain(riseM)} m.`,
    )
  }
  return riseM
}

export function wallOf(
  values: RunValues,
  usual: string,
  index: CatalogueIndex,
  findings: Findings,
): WallMaterial | null {
  const wall = index.wallMaterial(values.pipeMaterial ?? usual)
  if (wall.ok) return wall.item
  if (values.pipeMaterial !== undefined)
    findings.fault('pipeMaterial', values.pipeMaterial, wall.message)
  return null
}
