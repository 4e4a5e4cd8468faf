/** Pixels of the section drawing: where everything goes, to one scale. */
import { type Core, type SectionView, shells } from './section.ts'
import { type DrawnGround, drawGround, groundRoom, isBuried, soilCoverM } from './section-ground.ts'

/** Room around what is drawn: half the width left over, the dimension line below, a label in the corner above. */
const MARGIN = { beside: 8, below: 28, above: 2, label: 12 }
/** Smallest core that has room for the medium's temperature. */
const LABEL = { width: 88, height: 36 }
const SHELLS = 48
/** How much of the wall behind a slab is shown, and the room for the dimension beside a lying one. */
const SLAB = { wall: 34, beside: 48, air: 16 }
interface Outline {
  readonly x: number
  readonly y: number
  readonly width: number
  readonly height: number
  /** Half the width for a circle, 0 for a rectangle. */
  readonly corner: number
}
interface Point {
  readonly x: number
  readonly y: number
}

export interface SectionDrawing {
  readonly width: number
  readonly height: number
  readonly core: Outline
  readonly shells: readonly { readonly outline: Outline; readonly tempC: number }[]
  readonly joints: readonly Outline[]
  readonly jacket: Outline | null
  readonly dimension: {
    readonly from: Point
    readonly to: Point
    readonly isUpright: boolean
  } | null
  readonly label: Point & { readonly place: 'inside' | 'above' | 'corner' }
  readonly ground: DrawnGround | null
}

export interface SectionFrame {
  /** Side of the square that the section fills [px]. */
  readonly field: number
  /** The thickness that has to fit, so that walking thinner rungs keeps one scale [m]. */
  readonly fitM: number
}

export function drawSection(view: SectionView, { field, fitM }: SectionFrame): SectionDrawing {
  const mostM = Math.max(view.thicknessM, fitM)
  const scale = pixelsPerMetre(view.core, mostM, field)
  const coverPx = soilCoverM(view.core, mostM) * scale
  const above = roomAbove(view.core, scale, coverPx)
  const outlineAt = (depthM: number) => outline(view, depthM * scale, { scale, field, above })
  const core = outlineAt(0)
  const isLagged = view.thicknessM > 0
  const around = outlineAt(view.thicknessM)
  return {
    width: field + 2 * MARGIN.beside,
    height: field + above + MARGIN.below,
    core,
    shells: shells(view, SHELLS).map(({ outerM, tempC }) => ({
      outline: outlineAt(outerM),
      tempC,
    })),
    joints: view.jointsM.map(outlineAt),
    jacket: isLagged ? around : null,
    dimension: isLagged ? dimension(view.core, core, around) : null,
    label: label(view.core, core, scale),
    ground: isBuried(view.core) ? drawGround(core, coverPx, field + 2 * MARGIN.beside) : null,
  }
}

function roomAbove(core: Core, scale: number, coverPx: number): number {
  if (isBuried(core)) return groundRoom(coverPx)
  return hasRoom(core, scale) ? MARGIN.above : MARGIN.label
}

function pixelsPerMetre(core: Core, fitM: number, field: number): number {
  if (core.kind === 'round') return field / (2 * (core.radiusM + fitM))
  if (core.kind === 'slab') return (field - SLAB.wall - SLAB.air) / Math.max(fitM, 0.05)
  return field / (2 * (Math.max(core.halfWidthM, core.halfHeightM) + fitM))
}

interface Sheet {
  readonly scale: number
  readonly field: number
  readonly above: number
}

/** Outline of everything up to a depth of the lagging. */
function outline(view: SectionView, depth: number, { scale, field, above }: Sheet): Outline {
  const { core } = view
  if (core.kind === 'slab') return slabOutline(core.facing, depth, view.thicknessM * scale, field)
  const middle = { x: field / 2 + MARGIN.beside, y: field / 2 + above }
  const [halfWidth, halfHeight] =
    core.kind === 'round'
      ? [core.radiusM * scale + depth, core.radiusM * scale + depth]
      : [core.halfWidthM * scale + depth, core.halfHeightM * scale + depth]
  return {
    x: middle.x - halfWidth,
    y: middle.y - halfHeight,
    width: 2 * halfWidth,
    height: 2 * halfHeight,
    corner: core.kind === 'round' ? halfWidth : 0,
  }
}

type Facing = Extract<Core, { kind: 'slab' }>['facing']

/** A slab starts at its wall and grows towards the side it faces; wall and lagging together sit in the middle. */
function slabOutline(facing: Facing, depth: number, thickness: number, field: number): Outline {
  const start = (field - SLAB.wall - thickness) / 2
  const length = SLAB.wall + depth
  const lying = { x: MARGIN.beside, width: field - SLAB.beside, height: length, corner: 0 }
  switch (facing) {
    case 'side':
      return { x: MARGIN.beside + start, y: 20, width: length, height: field - 24, corner: 0 }
    case 'down':
      return { ...lying, y: start }
    case 'up':
      return { ...lying, y: field - start - length }
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

function hasRoom(core: Core, scale: number): boolean {
  switch (core.kind) {
    case 'slab':
      return true
    case 'round':
      return 2 * core.radiusM * scale >= LABEL.width
    case 'box':
      return (
        2 * core.halfWidthM * scale >= LABEL.width && 2 * core.halfHeightM * scale >= LABEL.height
      )
  }
}

/** The medium's temperature stands inside where there is room, else in the corner with a leader. */
function label(core: Core, inner: Outline, scale: number): SectionDrawing['label'] {
  if (core.kind === 'slab' && core.facing === 'side') {
    return { x: inner.x, y: inner.y - 6, place: 'above' }
  }
  return hasRoom(core, scale)
    ? { x: inner.x + inner.width / 2, y: inner.y + inner.height / 2, place: 'inside' }
    : { x: 0, y: 10, place: 'corner' }
}
