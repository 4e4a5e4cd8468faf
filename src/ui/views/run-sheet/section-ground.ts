/** The ground over a buried run: its line and the depth of the axis below it, to scale as long as that fits. */
import type { Core } from './section.ts'

/** Room for the words above the line, and the most soil that is drawn between the line and the lagging [px]. */
const WORDS = 15
const MOST_SOIL = 14
/** Where the dimension of the depth stands [px]. */
const BESIDE = 4

export interface DrawnGround {
  readonly y: number
  readonly width: number
  /** The dimension of the depth goes from the ground down to the axis. */
  readonly x: number
  readonly axisY: number
  /** There is more soil than is drawn: the dimension is broken. */
  readonly isCut: boolean
}

export const isBuried = (core: Core): boolean => core.kind === 'round' && core.buriedM !== null

/** Soil between the ground and the lagging [m]; 0 where the lagging reaches out of it, and in the air. */
export function soilCoverM(core: Core, thicknessM: number): number {
  if (core.kind !== 'round' || core.buriedM === null) return 0
  return Math.max(0, core.buriedM - core.radiusM - thicknessM)
}

/** Room above the drawing [px]. */
export const groundRoom = (coverPx: number): number => WORDS + Math.min(coverPx, MOST_SOIL)

export function drawGround(
  core: { readonly y: number; readonly height: number },
  coverPx: number,
  width: number,
): DrawnGround {
  return {
    y: WORDS,
    width,
    x: BESIDE,
    axisY: core.y + core.height / 2,
    isCut: coverPx > MOST_SOIL,
  }
}
