/** Radiation of one face, as lines: what it sees, and what passes between. */
import { clearSky, STEFAN_BOLTZMANN_W_PER_M2_K4, sources } from '#solver/index.ts'
import type { Condition } from '../problem.ts'
import type { FaceAt } from './face.ts'
import type { Ledger } from './ledger.ts'
import { pedigreeOf } from './pedigree.ts'

/** Puts down h_r and q_r; air and surface, θ_a and θ_s, must stand above. */
export function radiationSteps(ledger: Ledger, { system, face, sky }: FaceAt): void {
  ledger.given('Emissivity of the surface', 'ε', system.emissivity, '')
  surroundingsSteps(ledger, sky, system.around.surroundingsC)
  ledger.given('Stefan-Boltzmann constant', 'σ', STEFAN_BOLTZMANN_W_PER_M2_K4, 'W/(m²·K⁴)', {
    source: 'CODATA 2018',
  })
  ledger.step('Surface, absolute', 'T_s', 'θ_s + 273.15', 'K')
  ledger.step('Surroundings, absolute', 'T_r', 'θ_r + 273.15', 'K')
  ledger.step(
    'Coefficient of radiation, on surface minus surroundings',
    'h_r',
    'ε × σ × (T_s^2 + T_r^2) × (T_s + T_r)',
    'W/(m²·K)',
    { value: face.radiationWPerM2K, source: `${sources.ashrae2021ch23}, eq. (11)` },
  )
  ledger.step('Flux by radiation', 'q_r', 'h_r × (θ_s − θ_r)', 'W/m²')
}

/** What the surface sees, θ_r: one temperature, or sky and ground mixed as they radiate. */
function surroundingsSteps(ledger: Ledger, sky: Condition['sky'], surroundingsC: number): void {
  if (sky === null) {
    ledger.given('Surroundings that the surface sees', 'θ_r', surroundingsC, '°C')
    return
  }
  ledger.given('Share of clear sky in what the surface sees', 'f_S', sky.view, '')
  ledger.given('Ground and walls, the rest of it', 'θ_g', sky.groundC, '°C')
  ledger.step('Clear sky, absolute', 'T_S', '0.0552 × (θ_a + 273.15)^1.5', 'K', {
    ...pedigreeOf(clearSky, { airC: ledger.valueAt('θ_a') }),
  })
  ledger.step('Ground and walls, absolute', 'T_g', 'θ_g + 273.15', 'K')
  ledger.step(
    'One temperature that radiates as both together do',
    'θ_r',
    '(f_S × T_S^4 + (1 − f_S) × T_g^4)^(1 / 4) − 273.15',
    '°C',
    { value: surroundingsC, source: 'Stefan-Boltzmann law' },
  )
}
