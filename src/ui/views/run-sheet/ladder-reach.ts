/** How far the picture of the ladder goes: thick rungs that nobody would take would squeeze those that matter. */
import type { Rating } from '#sizing/result.ts'
import type { LimitBar } from './limit-bars.ts'

/** What matters lies below this many times the thickest thickness that decides something. */
const REACH = 2.2
/** Fewer rungs than this are always shown. */
const FEWEST = 8

/** Number of rungs, from the thinnest on, that the picture shows. */
export function rungsInReach(
  ladder: readonly Rating[],
  bars: readonly LimitBar[],
  chosenM: number | null,
): number {
  if (chosenM === null) return ladder.length
  const starts = bars.flatMap(({ stretches }) => stretches.map(({ fromM }) => fromM ?? 0))
  const reachM = REACH * Math.max(chosenM, cheapestM(ladder), ...starts)
  const count = ladder.filter(({ thicknessM }) => thicknessM <= reachM).length
  return Math.max(count, Math.min(FEWEST, ladder.length))
}

function cheapestM(ladder: readonly Rating[]): number {
  const cheapest = ladder.reduce<Rating | null>((best, rung) => {
    if (rung.money === null) return best
    return best?.money && best.money.lifeCycle <= rung.money.lifeCycle ? best : rung
  }, null)
  return cheapest?.thicknessM ?? 0
}
