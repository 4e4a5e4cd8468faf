import { yearlyKWh } from '#money/energy-cost.ts'
import { notesOf as solverNotes } from '#solver/index.ts'
import { arrival } from './arrival.ts'
import type { Settled } from './build-up.ts'
import { rungMoney } from './cost.ts'
import { curveNotes, EXTRAPOLATED } from './curve-notes.ts'
import { judge } from './limits.ts'
import type { Condition, Problem } from './problem.ts'
import type { Note, Rating } from './result.ts'
import { runLoss, yearlyFlowPerUnit, yearlyRunLossW } from './run-loss.ts'
import { serviceHeeds } from './service.ts'
import { hottestFace, type States, solveStates, systemOf } from './states.ts'

export interface Rated {
  readonly rating: Rating
  readonly states: States
  /** Heat flow to be made up for a metre, m² or piece, mean of the year [W]. */
  readonly yearlyFlowPerUnit: number
  /** What the solver had to say at the loss, touch and damp conditions, and what is near its maximum. */
  readonly notes: () => readonly Note[]
}

/**
 * One build-up rated: solved at each condition, judged by every limit, priced. `bareStates` are those of the bare run,
 * whose flux its bare fittings lose; null where this is the bare run.
 */
export function rate(problem: Problem, settled: Settled, bareStates: States | null): Rated {
  const states = solveStates(problem, settled)
  const { loss, touch, damp } = states
  const asBare = bareStates ?? states
  const arrives = arrival(problem, settled, states, asBare)
  const limits = judge({ problem, settled, states, arrives: () => arrives })
  const total = runLoss(problem, settled, loss, asBare.loss)
  const yearlyMeanLossW = yearlyRunLossW(problem, settled, states, asBare)
  const flow = yearlyFlowPerUnit(problem, states)
  return {
    rating: {
      thicknessM: settled.thicknessM,
      nominalThicknessM: settled.nominalThicknessM,
      piecesM: settled.piecesM,
      outerDiameterM: loss.outerDiameterM,
      heatLossWPerM: loss.heatLossWPerM,
      heatFluxWPerM2: loss.heatFluxWPerM2,
      heatLossW: total?.totalW ?? null,
      fittingsLossW: total?.fittingsW ?? null,
      yearlyMeanLossW,
      yearlyKWh:
        yearlyMeanLossW === null || problem.hoursPerYear === null
          ? null
          : yearlyKWh(yearlyMeanLossW, problem.hoursPerYear),
      surfaceTempC: states.surface.surfaceTempC,
      convectionWPerM2K: loss.convectionWPerM2K,
      radiationWPerM2K: loss.radiationWPerM2K,
      interfaceTempsC: states.surface.interfaceTempsC,
      touchSurfaceC: hottestFace(touch).surfaceTempC,
      timeToFreezeH: limits.find(({ limit }) => limit === 'frost')?.value ?? null,
      arrivalTempC: arrives?.arrivalTempC ?? null,
      condensateKgPerS: arrives?.condensateKgPerS ?? null,
      limits,
      pass: limits.every((limit) => limit.pass),
      money: problem.money ? rungMoney(problem, settled, problem.money, flow) : null,
    },
    states,
    yearlyFlowPerUnit: flow,
    notes: () => {
      const { conditions } = problem
      const said = (condition: Condition, state: typeof loss): readonly Note[] =>
        solverNotes(systemOf(problem, settled, condition), state).filter(
          ({ code }) => code !== EXTRAPOLATED,
        )
      return [
        ...said(conditions.loss, loss),
        ...said(conditions.touch, touch),
        ...(damp ? said(conditions.damp, damp) : []),
        ...curveNotes(settled, damp ? [loss, touch, damp] : [loss, touch]),
        ...serviceHeeds(problem, settled, states),
      ]
    },
  }
}
