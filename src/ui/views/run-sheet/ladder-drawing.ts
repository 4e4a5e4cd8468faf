/** Pixels of the ladder: rungs at their true thickness, the cost above them, one bar per limit below. */
import type { LimitEnd, LimitName, Rating } from '#sizing/result.ts'
import { formatQuantity, formatWithUnit, thicknessDecimals } from '#units/format.ts'
import type { UnitSystem } from '#units/quantities.ts'
import { limitBars, type PassStretch } from './limit-bars.ts'

const LABELS = 62
const RIGHT = 48
const COST_TOP = 26
const COST_HEIGHT = 104
const BAR_HEIGHT = 16
const BAR_STEP = 25
/** Room one thickness label needs beside the next. */
const LABEL_ROOM = 21
/** The dearest rung shown: beyond this many times the cheapest the curve leaves through the top. */
const COST_REACH = 2.2

interface Point {
  readonly x: number
  readonly y: number
}

export interface DrawnRung extends Point {
  readonly index: number
  readonly label: string
  /** False where the label would run into its neighbour. */
  readonly hasLabel: boolean
  readonly passes: boolean
}

export interface DrawnBar {
  readonly limit: LimitName
  readonly y: number
  readonly pieces: readonly {
    readonly x: number
    readonly width: number
    readonly words: string
    readonly isTight: boolean
  }[]
}

export interface DrawnCost {
  readonly total: readonly Point[]
  readonly lagging: readonly Point[]
  readonly heat: readonly Point[]
  /** Right of the last point: name of each line, pushed apart where they would touch. */
  readonly names: readonly { readonly name: 'total' | 'lagging' | 'heat'; readonly y: number }[]
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
  readonly bars: readonly DrawnBar[]
  readonly cost: DrawnCost | null
}

export interface LadderInput {
  readonly ladder: readonly Rating[]
  readonly ends: readonly LimitEnd[]
  /** The rung that must keep its label. */
  readonly marked: number | null
  readonly width: number
  readonly units: UnitSystem
}

export function drawLadder({ ladder, ends, marked, width, units }: LadderInput): LadderDrawing {
  const x = thicknessScale(ladder, LABELS + 12, width - RIGHT)
  const hasMoney = ladder.length > 0 && ladder.every((rung) => rung.money !== null)
  const top = hasMoney ? COST_TOP : 8
  const costBottom = hasMoney ? COST_TOP + COST_HEIGHT : top
  const barsTop = costBottom + (hasMoney ? 20 : 0)
  const bars = limitBars(ladder, ends).map(({ limit, stretches }, at) => ({
    limit,
    y: barsTop + at * BAR_STEP,
    pieces: stretches.map((stretch) =>
      piece(stretch, { x, left: LABELS, right: width - RIGHT + 18, units }),
    ),
  }))
  const bottom = barsTop + bars.length * BAR_STEP + 2
  const cost = hasMoney ? drawCost(ladder, x) : null
  const rungs = ladder.map((rung, index) => ({
    ...rungAt(rung, index, units, ladder),
    x: x(rung.thicknessM),
    y: cost?.total[index]?.y ?? top,
  }))
  return {
    width,
    height: bottom + 22,
    left: LABELS,
    right: width - RIGHT + 18,
    top,
    bottom,
    costBottom,
    barHeight: BAR_HEIGHT,
    rungs: withRoom(rungs, marked),
    bars,
    cost,
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

function rungAt(rung: Rating, index: number, units: UnitSystem, ladder: readonly Rating[]) {
  const decimals = thicknessDecimals(
    ladder.map(({ thicknessM }) => thicknessM),
    units,
  )
  const label = formatQuantity(rung.thicknessM, 'thickness', units, units === 'us' ? 1 : decimals)
  return { index, label, hasLabel: true, passes: rung.pass }
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

function piece(
  { fromM, toM }: PassStretch,
  field: { x: (m: number) => number; left: number; right: number; units: UnitSystem },
) {
  const start = fromM === null ? field.left : Math.max(field.left, field.x(fromM))
  const end = toM === null ? field.right : field.x(toM)
  const shown = (thicknessM: number) => formatWithUnit(thicknessM, 'thickness', field.units)
  const words =
    fromM !== null && toM !== null
      ? `${shown(fromM)} to ${shown(toM)}`
      : fromM !== null
        ? `passes from ${shown(fromM)}`
        : toM !== null
          ? `passes to ${shown(toM)}`
          : 'passes throughout'
  const width = Math.max(3, end - start)
  return { x: start, width, words, isTight: width < words.length * 6 }
}

function drawCost(ladder: readonly Rating[], x: (thicknessM: number) => number): DrawnCost {
  const totals = ladder.map((rung) => rung.money?.lifeCycle ?? 0)
  const reach = Math.max(1e-9, Math.min(Math.max(...totals), Math.min(...totals) * COST_REACH))
  const y = (cost: number) => COST_TOP + COST_HEIGHT * (1 - Math.max(0, cost) / reach)
  const line = (cost: (rung: Rating) => number) =>
    ladder.map((rung) => ({ x: x(rung.thicknessM), y: y(cost(rung)) }))
  const lagging = line((rung) => rung.money?.installed ?? 0)
  const heat = line((rung) => (rung.money?.lifeCycle ?? 0) - (rung.money?.installed ?? 0))
  const total = line((rung) => rung.money?.lifeCycle ?? 0)
  const names = (['total', 'lagging', 'heat'] as const).map((name) => ({
    name,
    y: { total, lagging, heat }[name].at(-1)?.y ?? 0,
  }))
  return { total, lagging, heat, names: apart(names) }
}

/** Names keep 13 px between them, in the order of their lines. */
function apart<N extends { readonly y: number }>(names: readonly N[]): N[] {
  const placed: N[] = []
  for (const name of names.toSorted((a, b) => a.y - b.y)) {
    const above = placed.at(-1)
    placed.push({ ...name, y: Math.max(name.y, above ? above.y + 13 : COST_TOP) })
  }
  return placed
}

/** Labels from left to right where there is room; the marked rung always has its own. */
function withRoom(rungs: readonly DrawnRung[], marked: number | null): DrawnRung[] {
  const markedX = rungs.find(({ index }) => index === marked)?.x ?? Number.NEGATIVE_INFINITY
  let lastX = Number.NEGATIVE_INFINITY
  return rungs.map((rung) => {
    const isMarked = rung.index === marked
    const room = rung.label.length > 2 ? LABEL_ROOM + 6 : LABEL_ROOM
    const hasLabel = isMarked || (rung.x - lastX >= room && Math.abs(rung.x - markedX) >= room)
    if (hasLabel) lastX = rung.x
    return { ...rung, hasLabel }
  })
}
