/** Pixels of the ladder: rungs at their true thickness, the cost above them, one bar per limit below. */
import type { LimitEnd, LimitName, Rating } from '#sizing/result.ts'
import { formatQuantity, thicknessDecimals } from '#units/format.ts'
import type { UnitSystem } from '#units/quantities.ts'
import { type BarPiece, barPiece } from './bar-pieces.ts'
import { type DrawnCost, drawCost } from './ladder-cost.ts'
import { rungsInReach } from './ladder-reach.ts'
import { limitBars } from './limit-bars.ts'

const LABELS = 62
/** Room for the names of the cost lines. */
const NAMES = 46
/** How far bars go on beyond the thickest rung. */
const OVERHANG = 14
const COST_TOP = 26
const COST_HEIGHT = 104
const BAR_HEIGHT = 16
const BAR_STEP = 25
/** More rungs than this stand close. */
const DENSE = 14
/** Room one thickness label needs beside the next. */
const LABEL_ROOM = 21

export interface DrawnRung {
  readonly index: number
  readonly x: number
  readonly label: string
  /** False where the label would run into its neighbour. */
  readonly hasLabel: boolean
}

export interface DrawnBar {
  readonly limit: LimitName
  readonly y: number
  /** None where no rung passes. */
  readonly pieces: readonly BarPiece[]
}

export interface LadderDrawing {
  readonly width: number
  readonly height: number
  readonly left: number
  readonly right: number
  readonly top: number
  readonly bottom: number
  readonly costBottom: number
  readonly barHeight: number
  readonly rungs: readonly DrawnRung[]
  /** Rungs stand so close that full marks would touch. */
  readonly isDense: boolean
  /** How many rungs are shown unless all are asked for. */
  readonly reach: number
  readonly bars: readonly DrawnBar[]
  readonly cost: DrawnCost | null
}

export interface LadderInput {
  readonly ladder: readonly Rating[]
  readonly ends: readonly LimitEnd[]
  /** Rungs with an upright of their own: the shown one and the chosen one. The first keeps its label. */
  readonly marked: readonly number[]
  readonly chosen: number | null
  /** Also the rungs far beyond what decides. */
  readonly isWhole: boolean
  readonly width: number
  readonly units: UnitSystem
}

export function drawLadder(input: LadderInput): LadderDrawing {
  const { marked, chosen, width, units } = input
  const limits = limitBars(input.ladder, input.ends)
  const chosenM = (chosen === null ? undefined : input.ladder[chosen]?.thicknessM) ?? null
  const reach = rungsInReach(input.ladder, limits, chosenM)
  const ladder = input.isWhole ? input.ladder : input.ladder.slice(0, reach)
  const hasMoney = ladder.length > 0 && ladder.every((rung) => rung.money !== null)
  // With costs the names of their lines stand to the right.
  const right = width - (hasMoney ? NAMES : 2)
  const x = thicknessScale(ladder, LABELS + 12, right - OVERHANG)
  const top = hasMoney ? COST_TOP : 4
  const costBottom = hasMoney ? COST_TOP + COST_HEIGHT : top
  const barsTop = costBottom + (hasMoney ? 20 : 6)
  const uprights = marked.flatMap((index) => ladder[index] ?? []).map((rung) => x(rung.thicknessM))
  const field = { x, left: LABELS, right, uprights, units }
  const bars = limits.map(({ limit, stretches }, at) => ({
    limit,
    y: barsTop + at * BAR_STEP,
    pieces: stretches.map((stretch) => barPiece(stretch, field)),
  }))
  const bottom = barsTop + bars.length * BAR_STEP + 2
  return {
    width,
    height: bottom + 22,
    left: LABELS,
    right,
    top,
    bottom,
    costBottom,
    barHeight: BAR_HEIGHT,
    rungs: withRoom(drawRungs(ladder, x, units), marked[0]),
    isDense: ladder.length > DENSE,
    reach,
    bars,
    cost: hasMoney ? drawCost(ladder, { x, top: COST_TOP, height: COST_HEIGHT }) : null,
  }
}

/** The rung nearest to a place on the drawing. */
export function nearestRung({ rungs }: LadderDrawing, x: number): number | null {
  const nearest = rungs.reduce<DrawnRung | null>(
    (best, rung) => (best === null || Math.abs(rung.x - x) < Math.abs(best.x - x) ? rung : best),
    null,
  )
  return nearest?.index ?? null
}

function drawRungs(
  ladder: readonly Rating[],
  x: (thicknessM: number) => number,
  units: UnitSystem,
): DrawnRung[] {
  const thicknessesM = ladder.map(({ thicknessM }) => thicknessM)
  const decimals = units === 'us' ? 1 : thicknessDecimals(thicknessesM, units)
  return thicknessesM.map((thicknessM, index) => ({
    index,
    x: x(thicknessM),
    label: formatQuantity(thicknessM, 'thickness', units, decimals),
    hasLabel: true,
  }))
}

/** From a little below the thinnest rung, or nought where that is near, to the thickest. */
function thicknessScale(
  ladder: readonly Rating[],
  left: number,
  right: number,
): (thicknessM: number) => number {
  const thinnestM = ladder[0]?.thicknessM ?? 0
  const thickestM = ladder.at(-1)?.thicknessM ?? 0.1
  const startM = Math.max(0, thinnestM - (thickestM - thinnestM) * 0.06)
  const spanM = Math.max(thickestM - startM, 0.001)
  return (thicknessM) => left + ((thicknessM - startM) / spanM) * (right - left)
}

/** Labels from left to right where there is room; the marked rung always has its own. */
function withRoom(rungs: readonly DrawnRung[], marked: number | undefined): DrawnRung[] {
  const markedX = rungs.find(({ index }) => index === marked)?.x ?? Number.NEGATIVE_INFINITY
  let lastX = Number.NEGATIVE_INFINITY
  return rungs.map((rung) => {
    const isMarked = rung.index === marked
    const room = LABEL_ROOM + Math.max(0, rung.label.length - 2) * 6
    const hasLabel = isMarked || (rung.x - lastX >= room && Math.abs(rung.x - markedX) >= room)
    if (hasLabel) lastX = rung.x
    return { ...rung, hasLabel }
  })
}
