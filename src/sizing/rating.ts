import { yearlyKWh } from '#money/energy-cost.ts'
import type { Settled } from './build-up.ts'
import { flowPerUnit, rungMoney } from './cost.ts'
import { judge } from './limits.ts'
import type { Problem } from './problem.ts'
import type { Note, Rating } from './result.ts'
import { serviceHeeds } from './service.ts'
import { hottestFace, solveStates } from './states.ts'

export interface Rated {
  readonly rating: Rating
  /** What the solver had to say at the loss, touch and damp conditions, and what is near its maximum. */
  readonly notes: () => readonly Note[]
}

/** One build-up rated: solved at each condition, judged by every limit, priced. */
export function rate(problem: Problem, settled: Settled): Rated {
  const states = solveStates(problem, settled)
  const { loss, touch, damp } = states
  const limits = judge(problem, settled, states)
  const heatLossW = problem.extent === null ? null : flowPerUnit(loss) * problem.extent
  return {
    rating: {
      thicknessM: settled.thicknessM,
      nominalThicknessM: settled.nominalThicknessM,
      piecesM: settled.piecesM,
      outerDiameterM: loss.outerDiameterM,
      heatLossWPerM: loss.heatLossWPerM,
      heatFluxWPerM2: loss.heatFluxWPerM2,
      heatLossW,
      yearlyKWh:
        heatLossW === null || problem.hoursPerYear === null
          ? null
          : yearlyKWh(heatLossW, problem.hoursPerYear),
      surfaceTempC: loss.surfaceTempC,
      convectionWPerM2K: loss.convectionWPerM2K,
      radiationWPerM2K: loss.radiationWPerM2K,
      interfaceTempsC: loss.interfaceTempsC,
      touchSurfaceC: hottestFace(touch).surfaceTempC,
      limits,
      pass: limits.every((limit) => limit.pass),
      money: problem.money ? rungMoney(problem, settled, problem.money, flowPerUnit(loss)) : null,
    },
    notes: () => [
      ...loss.notes,
      ...touch.notes,
      ...(damp?.notes ?? []),
      ...serviceHeeds(problem, settled, states),
    ],
  }
}
