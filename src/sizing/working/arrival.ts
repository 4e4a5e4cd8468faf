/** Arrival: what the loss of the run does to the medium that flows through it. */
import { arrival, tendsTo } from '../arrival.ts'
import type { Settled } from '../build-up.ts'
import type { Problem } from '../problem.ts'
import type { Rating } from '../result.ts'
import { runLoss } from '../run-loss.ts'
import type { States } from '../states.ts'
import { Ledger } from './ledger.ts'
import { verdicts } from './limits.ts'
import { tabledStep } from './medium.ts'
import type { Section } from './types.ts'

export interface ArrivalWorking {
  readonly problem: Problem
  readonly settled: Settled
  readonly rating: Rating
  readonly states: States
  readonly bareStates: States
}

/** Null where the flow or the length is not known. */
export function arrivalSection(working: ArrivalWorking): Section | null {
  const { problem, settled, rating, states, bareStates } = working
  const limit = problem.limits.arrival
  const total = runLoss(problem, settled, states.loss, bareStates.loss)
  const arrives = arrival(problem, settled, states, bareStates)
  if (limit === null || total === null || arrives === null) return null
  const ledger = new Ledger('Arrival of what flows', null)
  let found: string | null = null
  ledger.given('Loss of the whole run, as above', 'Q', total.totalW, 'W')
  ledger.given('Flow', 'm', limit.flowKgPerS, 'kg/s')
  ledger.given('Medium as it sets out', 'θ_1', problem.conditions.loss.mediumC, '°C')
  if (limit.kind === 'condensate') {
    tabledStep(ledger, {
      words: 'Heat that a kilogram of the steam gives off as it condenses',
      symbol: 'r',
      unit: 'J/kg',
      value: limit.latentHeatJPerKg,
      cells: limit.cells,
      at: 'θ_1',
    })
    found = 'max(0, Q / r)'
    ledger.step(
      'Condensate, no more than the steam that flows',
      'm_c',
      'min(m, max(0, Q / r))',
      'kg/s',
      {
        value: arrives.condensateKgPerS ?? 0,
        source: 'energy balance',
      },
    )
  } else {
    tabledStep(ledger, {
      words: 'Heat capacity',
      symbol: 'c_m',
      unit: 'J/(kg·K)',
      value: limit.heatCapacityJPerKgK,
      cells: limit.cells,
      at: 'θ_1',
    })
    const tendsToC =
      total.totalW === 0 ? problem.conditions.loss.around.airC : tendsTo(problem, settled)
    ledger.given(
      'Temperature at which the run would lose nothing: of the air, unless surroundings or sun say otherwise',
      'θ_e',
      tendsToC,
      '°C',
    )
    if (arrives.arrivalTempC !== problem.conditions.loss.mediumC) {
      ledger.step('Heat transfer of the run', 'U', 'Q / (θ_1 − θ_e)', 'W/K')
      ledger.step('Medium as it arrives', 'θ_2', 'θ_e + (θ_1 − θ_e) × exp(−U / (m × c_m))', '°C', {
        value: arrives.arrivalTempC ?? Number.NaN,
        source: 'energy balance of plug flow',
      })
      found = 'abs(θ_1 − θ_2)'
    }
  }
  verdicts(ledger, 'arrival', rating.limits, { found: () => found })
  return ledger.section()
}
