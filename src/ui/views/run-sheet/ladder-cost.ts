/** Pixels of the cost above the ladder: what it costs to own each rung, and its two parts. */
import type { Rating } from '#sizing/result.ts'

/** Room one name needs below the next. */
const NAME_STEP = 13

interface Point {
  readonly x: number
  readonly y: number
}

export interface DrawnCost {
  readonly total: readonly Point[]
  readonly lagging: readonly Point[]
  readonly heat: readonly Point[]
  /** Right of the last point: the name of each line, pushed apart where they would touch. */
  readonly names: readonly { readonly name: 'total' | 'lagging' | 'heat'; readonly y: number }[]
}

interface Field {
  readonly x: (thicknessM: number) => number
  readonly top: number
  readonly height: number
}

/** From nought upwards, so that a flat curve looks flat, to the dearest rung, so that none leaves the drawing. */
export function drawCost(ladder: readonly Rating[], { x, top, height }: Field): DrawnCost {
  const totals = ladder.map((rung) => rung.money?.lifeCycle ?? 0)
  const reach = Math.max(1e-9, ...totals)
  const line = (cost: (rung: Rating) => number) =>
    ladder.map((rung) => ({
      x: x(rung.thicknessM),
      y: top + height * (1 - Math.max(0, cost(rung)) / reach),
    }))
  const lines = {
    total: line((rung) => rung.money?.lifeCycle ?? 0),
    lagging: line((rung) => rung.money?.installed ?? 0),
    heat: line((rung) => (rung.money?.lifeCycle ?? 0) - (rung.money?.installed ?? 0)),
  }
  const names = (['total', 'lagging', 'heat'] as const).map((name) => ({
    name,
    y: lines[name].at(-1)?.y ?? top,
  }))
  return { ...lines, names: apart(names, top) }
}

/** Names keep their distance, in the order of their lines. */
function apart<N extends { readonly y: number }>(names: readonly N[], top: number): N[] {
  const placed: N[] = []
  for (const name of names.toSorted((a, b) => a.y - b.y)) {
    const above = placed.at(-1)
    placed.push({ ...name, y: Math.max(name.y, above ? above.y + NAME_STEP : top) })
  }
  return placed
}
