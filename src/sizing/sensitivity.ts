/**
 * Which inputs move the answer of a run most: each is moved on its own to both ends of a range, the whole run sized
 * again, and the build-up that was chosen compared with itself.
 */
import { bare, type Settled, settle } from './build-up.ts'
import type { Problem } from './problem.ts'
import { type Rated, rate } from './rating.ts'
import type { Rating, RunResult, Sensitivity, SensitivityEnd } from './result.ts'
import {
  type Move,
  type MoveEnd,
  movesOf,
  type SensitivityRanges,
  thicknessMoves,
  usualRanges,
} from './sensitivity-moves.ts'
import { size } from './size.ts'
import { solveStates } from './states.ts'

/** What moves the chosen rung comes first, then by influence. */
export function sensitivityOf(
  problem: Problem,
  ranges: SensitivityRanges = usualRanges,
): readonly Sensitivity[] {
  const result = size(problem)
  const base = compared(problem, result)
  return [...movesOf(problem, ranges), ...thicknessMoves(base.settled, ranges)]
    .map((move) => sensitivity(problem, base, move))
    .sort((a, b) => Number(b.movesRung) - Number(a.movesRung) || b.influence - a.influence)
}

/** The build-up that is compared: the chosen one, the thickest where none passes, or the bare run. */
interface Compared {
  readonly settled: Settled
  readonly rated: Rated
  readonly chosenThicknessM: number | null
}

function compared(problem: Problem, { chosen, ladder }: RunResult): Compared {
  const shown = chosen ?? ladder.at(-1) ?? null
  const settled = settledAs(problem, shown)
  return {
    settled,
    rated: ratedBesideBare(problem, settled),
    chosenThicknessM: chosen?.thicknessM ?? null,
  }
}

function settledAs(problem: Problem, shown: Rating | null): Settled {
  if (shown === null || shown.thicknessM === 0) return bare
  const fixedM = problem.layers.reduce((sumM, layer) => sumM + (layer.thicknessM ?? 0), 0)
  const step = problem.steps.find(
    ({ thicknessM }) => Math.abs(thicknessM + fixedM - shown.thicknessM) < SAME_M,
  )
  return settle(problem.layers, step ?? null)
}

const SAME_M = 1e-9

const ratedBesideBare = (problem: Problem, settled: Settled): Rated =>
  rate(problem, settled, settled.layers.length === 0 ? null : solveStates(problem, bare))

function sensitivity(given: Problem, base: Compared, { input, unit, ends }: Move): Sensitivity {
  const found = ends.map((end) => endOf(given, base, end, input === 'thickness'))
  const { rating } = base.rated
  const influences = found.map((end) =>
    rating.money && end.energyPerYearChange !== null
      ? share(end.energyPerYearChange, rating.money.energyPerYear)
      : share(end.heatFlowChangeWPerUnit, base.rated.states.loss.heatFlowWPerUnit),
  )
  return {
    input,
    unit,
    ends: found,
    movesRung: found.some((end) => end.chosenThicknessM !== base.chosenThicknessM),
    influence: Math.max(0, ...influences),
  }
}

/** Of nothing, any change is as large as it. */
function share(change: number, of: number): number {
  if (change === 0) return 0
  const found = Math.abs(change / of)
  return Number.isFinite(found) ? found : 1
}

function endOf(
  given: Problem,
  base: Compared,
  { change, problem, settled }: MoveEnd,
  isLaid: boolean,
): SensitivityEnd {
  const moved = problem(given)
  const rated = ratedBesideBare(moved, settled(moved, base.settled))
  const result = isLaid ? null : size(moved)
  const before = base.rated.rating
  const after = rated.rating
  return {
    change,
    heatFlowChangeWPerUnit:
      rated.states.loss.heatFlowWPerUnit - base.rated.states.loss.heatFlowWPerUnit,
    heatLossChangeW: difference(after.heatLossW, before.heatLossW),
    energyPerYearChange: difference(
      after.money?.energyPerYear ?? null,
      before.money?.energyPerYear ?? null,
    ),
    surfaceChangeK: after.surfaceTempC - before.surfaceTempC,
    touchSurfaceChangeK: after.touchSurfaceC - before.touchSurfaceC,
    chosenThicknessM: result ? (result.chosen?.thicknessM ?? null) : base.chosenThicknessM,
    governing: result?.governing ?? null,
    passes: after.pass,
  }
}

const difference = (after: number | null, before: number | null): number | null =>
  after === null || before === null ? null : after - before
