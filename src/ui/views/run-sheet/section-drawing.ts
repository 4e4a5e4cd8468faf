/** Pixels of the section drawing: where everything goes on a canvas of fixed size, to one scale. */
import { type Core, type SectionView, shells } from './section.ts'

export const SECTION_WIDTH = 176
export const SECTION_HEIGHT = 190
/** Largest drawn part; the rest is for the dimension line. */
const FIELD = 160
const CENTRE = { x: SECTION_WIDTH / 2, y: FIELD / 2 + 2 }
const SHELLS = 48
/** How much of a slab is cut out, and how much of the wall behind it is shown. */
const SLAB_SPAN = { side: 130, upOrDown: 112 }
const SLAB_WALL = 34

interface Outline {
  readonly x: number
  readonly y: number
  readonly width: number
  readonly height: number
  /** Half the width for a circle, 0 for a rectangle. */
  readonly corner: number
}

export interface SectionDrawing {
  readonly core: Outline
  readonly shells: readonly { readonly outline: Outline; readonly tempC: number }[]
  readonly joints: readonly Outline[]
  readonly jacket: Outline | null
  readonly dimension: {
    readonly from: Point
    readonly to: Point
    readonly isUpright: boolean
  } | null
  readonly label: Point & { readonly isInside: boolean }
}
interface Point {
  readonly x: number
  readonly y: number
}

/** `fitM` is the thickness that has to fit, so that walking the rungs keeps one scale where it can. */
export function drawSection(view: SectionView, fitM: number): SectionDrawing {
  const scale = pixelsPerMetre(view.core, Math.max(view.thicknessM, fitM))
  const outlineAt = (depthM: number) =>
    outline(view.core, depthM * scale, scale, view.thicknessM * scale)
  const core = outlineAt(0)
  const isLagged = view.thicknessM > 0
  const around = outlineAt(view.thicknessM)
  return {
    core,
    shells: shells(view, SHELLS).map(({ outerM, tempC }) => ({
      outline: outlineAt(outerM),
      tempC,
    })),
    joints: view.jointsM.map(outlineAt),
    jacket: isLagged ? around : null,
    dimension: isLagged ? dimension(view.core, core, around) : null,
    label: label(view.core, core),
  }
}

function pixelsPerMetre(core: Core, fitM: number): number {
  if (core.kind === 'round') return FIELD / (2 * (core.radiusM + fitM))
  if (core.kind === 'slab') return (FIELD - 50) / Math.max(fitM, 0.05)
  return FIELD / (2 * (Math.max(core.halfWidthM, core.halfHeightM) + fitM))
}

/** Outline of everything up to a depth of the lagging, in pixels. */
function outline(core: Core, depth: number, scale: number, thickness: number): Outline {
  if (core.kind === 'round') {
    const radius = core.radiusM * scale + depth
    return {
      x: CENTRE.x - radius,
      y: CENTRE.y - radius,
      width: 2 * radius,
      height: 2 * radius,
      corner: radius,
    }
  }
  if (core.kind === 'box') {
    const halfWidth = core.halfWidthM * scale + depth
    const halfHeight = core.halfHeightM * scale + depth
    return {
      x: CENTRE.x - halfWidth,
      y: CENTRE.y - halfHeight,
      width: 2 * halfWidth,
      height: 2 * halfHeight,
      corner: 0,
    }
  }
  return slabOutline(core.facing, depth, thickness)
}

/** A slab starts at its wall and grows towards the side it faces; wall and lagging together sit in the middle. */
function slabOutline(facing: 'side' | 'up' | 'down', depth: number, thickness: number): Outline {
  const start = (FIELD - SLAB_WALL - thickness) / 2
  const length = SLAB_WALL + depth
  // Left of the middle: the dimension stands to the right.
  const across = { x: 6, width: SLAB_SPAN.upOrDown, height: length, corner: 0 }
  switch (facing) {
    case 'side':
      return {
        x: 8 + start,
        y: CENTRE.y - SLAB_SPAN.side / 2,
        width: length,
        height: SLAB_SPAN.side,
        corner: 0,
      }
    case 'down':
      return { ...across, y: start }
    case 'up':
      return { ...across, y: FIELD - start - length }
  }
}

function dimension(core: Core, inner: Outline, outer: Outline): SectionDrawing['dimension'] {
  if (core.kind === 'slab' && core.facing !== 'side') {
    const x = outer.x + outer.width + 8
    const [from, to] =
      core.facing === 'up' ? [inner.y, outer.y] : [inner.y + inner.height, outer.y + outer.height]
    return { from: { x, y: from }, to: { x, y: to }, isUpright: true }
  }
  const y = outer.y + outer.height + 12
  return {
    from: { x: inner.x + inner.width, y },
    to: { x: outer.x + outer.width, y },
    isUpright: false,
  }
}

/** The medium's temperature stands inside where there is room, else in the corner with a leader. */
function label(core: Core, inner: Outline): SectionDrawing['label'] {
  const hasRoom = inner.width >= 62 && inner.height >= 40
  const middle = { x: inner.x + inner.width / 2, y: inner.y + inner.height / 2 }
  if (core.kind === 'slab') return { ...middle, isInside: core.facing !== 'side' }
  return hasRoom ? { ...middle, isInside: true } : { x: 2, y: 12, isInside: false }
}
