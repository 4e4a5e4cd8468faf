/** Frost: how long standing water takes to reach 0 °C and to freeze, from two steady states. */
import {
  ICE_KG_PER_M3,
  ICE_LATENT_J_PER_KG,
  ICE_W_PER_M_K,
  solve,
  WATER_J_PER_KG_K,
  WATER_KG_PER_M3,
} from '#solver/index.ts'
import type { Settled } from '../build-up.ts'
import { equilibriumC } from '../equilibrium.ts'
import { timeToFreezeH } from '../frost.ts'
import type { FrostLimit, Problem } from '../problem.ts'
import type { Rating } from '../result.ts'
import { systemOf } from '../states.ts'
import { Ledger } from './ledger.ts'
import { verdicts } from './limits.ts'
import { stateSections } from './state.ts'
import type { Section } from './types.ts'

const COOLING = 'ASHRAE Handbook Fundamentals 2021 (SI), chapter 23, eqs. (1) and (2)'
const FREEZING = `energy balance of a ring of ice, quasi-steady; ice ${ICE_KG_PER_M3} kg/m³, ${ICE_LATENT_J_PER_KG / 1000} kJ/kg and ${ICE_W_PER_M_K} W/(m·K), from memory`

export function frostSections(problem: Problem, settled: Settled, rating: Rating): Section[] {
  const { frost } = problem.limits
  const condition = problem.conditions.frost
  const hours = timeToFreezeH(problem, settled)
  if (frost === null || condition === null || hours === null) return []
  const stateAt = (mediumC: number) => {
    const at = { ...condition, mediumC }
    return { condition: at, solution: solve(systemOf(problem, settled, at)) }
  }
  const tendsToC = equilibriumC(condition, (mediumC) => stateAt(mediumC).solution.heatFlowWPerUnit)
  const startC = condition.mediumC
  const cooling = stateAt(startC / 2)
  const freezing = stateAt(0)
  const ledger = new Ledger('Limit: frost', null)
  ledger.given('Water at the start', 'θ_1', startC, '°C')
  ledger.given(
    tendsToC === condition.around.airC
      ? 'Where the pipe tends to: the air'
      : 'Where the pipe tends to, found by search: there it loses nothing',
    'θ_e',
    tendsToC,
    '°C',
  )
  ledger.given('Bore of the pipe', 'd', frost.boreM, 'm')
  const last: string[] = []
  if (startC > 0) {
    ledger.step('Water halfway between its start and 0 °C', 'θ_h', 'θ_1 / 2', '°C')
    ledger.given('Loss of a metre then', 'Φ_h', cooling.solution.heatFlowWPerUnit, 'W/m')
    ledger.step('Resistance from the water to the place', 'R_h', '(θ_h − θ_e) / Φ_h', 'm·K/W')
    capacitySteps(ledger, problem, frost)
    ledger.step(
      'Time to cool to 0 °C',
      't_c',
      '(C_w + C_p) × R_h × ln((θ_1 − θ_e) / (0 − θ_e)) / 3600',
      'h',
      { source: COOLING },
    )
    last.push('t_c')
  }
  if (frost.iceFraction > 0) {
    ledger.given('Share that may be ice at the end', 'f', frost.iceFraction, '')
    ledger.given(
      'Loss of a metre with the water at 0 °C',
      'Φ_0',
      freezing.solution.heatFlowWPerUnit,
      'W/m',
    )
    ledger.step('Resistance then', 'R_0', '(0 − θ_e) / Φ_0', 'm·K/W')
    ledger.step(
      'Heat to freeze a metre',
      'H_f',
      `${ICE_KG_PER_M3} × ${ICE_LATENT_J_PER_KG} × π / 4 × d^2`,
      'J/m',
      {
        source: FREEZING,
      },
    )
    const growth = frost.iceFraction < 1 ? '(f + (1 − f) × ln(1 − f))' : '1'
    ledger.step(
      'Time to freeze that share, the ice hindering its own growth',
      't_f',
      `H_f / (0 − θ_e) × (f × R_0 + ${growth} / (4 × π × ${ICE_W_PER_M_K})) / 3600`,
      'h',
      { source: FREEZING },
    )
    last.push('t_f')
  }
  if (last.length > 0) ledger.step('Time in all', 't', last.join(' + '), 'h', { value: hours })
  verdicts(ledger, 'frost', rating.limits, { found: () => (last.length > 0 ? 't' : null) })
  const states = [
    ...(startC > 0 ? [{ ...cooling, title: 'Frost, water cooling' }] : []),
    ...(frost.iceFraction > 0 ? [{ ...freezing, title: 'Frost, water freezing' }] : []),
  ]
  return [
    ...states.flatMap((state) => stateSections({ problem, settled, ...state })),
    ledger.section(),
  ]
}

/** What the water and the wall of a metre hold for each kelvin, from the bore `d` above. */
function capacitySteps(ledger: Ledger, { shape }: Problem, frost: FrostLimit): void {
  ledger.step(
    'Heat capacity of the water in a metre',
    'C_w',
    `${WATER_KG_PER_M3} × ${WATER_J_PER_KG_K} × π / 4 × d^2`,
    'J/(m·K)',
    {
      value: frost.waterJPerMK,
      source: `water near 0 °C, rounded: ${WATER_KG_PER_M3} kg/m³ and ${WATER_J_PER_KG_K} J/(kg·K)`,
    },
  )
  if (!('outerDiameterM' in shape)) return
  ledger.given('Outer diameter of the pipe', 'D', shape.outerDiameterM, 'm')
  ledger.given('Density of the wall', 'ρ_p', frost.wall.densityKgPerM3, 'kg/m³')
  ledger.given('Its heat capacity', 'c_p', frost.wall.heatCapacityJPerKgK, 'J/(kg·K)')
  ledger.step(
    'Heat capacity of the pipe wall of a metre',
    'C_p',
    'ρ_p × c_p × π / 4 × (D^2 − d^2)',
    'J/(m·K)',
    { value: frost.wallJPerMK },
  )
}
