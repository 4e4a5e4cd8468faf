/** Forced convection by the detailed formulas, as lines, to h_w. */
import {
  airViscosityPaS,
  type FaceShape,
  isCylinder,
  kelvin,
  nusseltCylinderInWind,
  nusseltPlateInWind,
  nusseltSphereInWind,
  sphereWind,
  TURBULENT_REYNOLDS,
  type Weather,
} from '#solver/index.ts'
import { airSteps } from './air.ts'
import type { Ledger } from './ledger.ts'
import { pedigreeOf } from './pedigree.ts'

export function windSteps(
  ledger: Ledger,
  shape: FaceShape,
  weather: Weather,
  excessK: number,
): void {
  if (shape.flow === 'sphere') {
    sphereSteps(ledger, shape, weather, excessK)
    return
  }
  const isRound = isCylinder(shape.flow)
  const length = isRound ? 'D_w' : 'L_w'
  const reynolds = ledger.step('Reynolds number of the wind', 'Re', `v × ${length} / ν`, '')
  const wind = { reynolds, prandtl: ledger.valueAt('Pr') }
  const used = isRound ? nusseltCylinderInWind : nusseltPlateInWind
  ledger.step(
    isRound ? 'Nusselt number of a cylinder across the wind' : 'Nusselt number of a plate in wind',
    'Nu_w',
    isRound
      ? '0.3 + 0.62 × sqrt(Re) × cbrt(Pr) / (1 + (0.4 / Pr)^(2 / 3))^(1 / 4) × (1 + (Re / 282000)^(5 / 8))^(4 / 5)'
      : reynolds < TURBULENT_REYNOLDS
        ? 'cbrt(Pr) × max(0.664 × sqrt(Re), 0.037 × Re^0.8)'
        : 'cbrt(Pr) × 0.037 × Re^0.8',
    '',
    { value: used(wind), ...pedigreeOf(used, wind) },
  )
  ledger.step('Coefficient of the wind', 'h_w', `Nu_w × λ_a / ${length}`, 'W/(m²·K)')
}

/** A sphere in wind reads the air at its own temperature, and the viscosity at the surface too. */
function sphereSteps(ledger: Ledger, shape: FaceShape, weather: Weather, excessK: number): void {
  const wind = sphereWind(shape, weather).windAt(excessK)
  const surfaceC = weather.airC + excessK
  ledger.step('Absolute temperature of the air', 'T_w', 'θ_a + 273.15', 'K')
  airSteps(ledger, weather.airC, weather.pressurePa, '_w')
  ledger.step('Absolute temperature of the surface', 'T_v', 'θ_s + 273.15', 'K')
  ledger.step('Its logarithm over the collision energy', 'x_v', 'ln(T_v / 103.3)', '')
  ledger.step(
    'Collision integral at the surface',
    'Ω_v',
    'exp(0.431 − 0.4623 × x_v + 0.08406 × x_v^2 + 0.005341 × x_v^3 − 0.00331 × x_v^4)',
    '',
  )
  ledger.step(
    'Viscosity of the air at the surface',
    'μ_v',
    '1e-6 × 0.0266958 × sqrt(28.9586 × T_v) / (0.36^2 × Ω_v)',
    'Pa·s',
    { value: airViscosityPaS(kelvin(surfaceC)) },
  )
  ledger.step('Reynolds number of the wind', 'Re', 'v × D_w / ν_w', '', { value: wind.reynolds })
  ledger.step(
    'Nusselt number of a sphere in wind',
    'Nu_w',
    '2 + (0.4 × sqrt(Re) + 0.06 × Re^(2 / 3)) × Pr_w^0.4 × (μ_w / μ_v)^(1 / 4)',
    '',
    { value: nusseltSphereInWind(wind), ...pedigreeOf(nusseltSphereInWind, wind) },
  )
  ledger.step('Coefficient of the wind', 'h_w', 'Nu_w × λ_a_w / D_w', 'W/(m²·K)')
}
