/** What the shapes have in common: the thing they resolve to, how it stands, its wall. */
import type { WallMaterial } from '#catalogue/types.ts'
import type { Shape } from '#solver/types.ts'
import type { RunValues } from '../fields.ts'
import { type Findings, plain } from './findings.ts'
import type { CatalogueIndex } from './index-catalogue.ts'

/** What is lagged: shape, size and extent of a run, and the wall as a bare surface. */
export interface Thing {
  readonly shape: Shape
  /** Length [m], or area of a flat surface [m²]; null where not given. */
  readonly extent: number | null
  /** Film between the medium and the wall [W/(m²·K)]; null where it is neglected. */
  readonly insideFilmWPerM2K: number | null
  readonly wall: WallMaterial | null
}

/** Diameters this near are the same [m]: a size and an od_mm may both be given if they agree. */
const SAME_DIAMETER_M = 0.0002
export const differs = (a: number, b: number): boolean => Math.abs(a - b) > SAME_DIAMETER_M

export function cylinder(
  values: RunValues,
  outerDiameterM: number,
  findings: Findings,
): Shape | null {
  const orientation = lying(values, findings)
  if (orientation === 'horizontal') return { kind: 'pipe', outerDiameterM, orientation }
  const riseM = riseOf(values, findings)
  return riseM === null ? null : { kind: 'pipe', outerDiameterM, orientation: 'vertical', riseM }
}

/** Pipes and ducts lie or stand; only a flat surface faces up or down. */
export function lying(values: RunValues, findings: Findings): 'horizontal' | 'vertical' {
  const { orientation } = values
  if (orientation === 'up' || orientation === 'down') {
    findings.fault(
      'orientation',
      orientation,
      'horizontal or vertical; up and down are for flat surfaces',
    )
    return 'horizontal'
  }
  return orientation ?? 'horizontal'
}

/** Heights of a vertical run for which a film is worked out, as of the field `rise_m` [m]. */
const LEAST_RISE_M = 0.05
const MOST_RISE_M = 500

export function riseOf(values: RunValues, findings: Findings): number | null {
  const riseM = values.riseM ?? values.lengthM
  if (riseM === undefined) {
    findings.fault('riseM', 'nothing', 'the height of the vertical run in m, or its length_m')
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
