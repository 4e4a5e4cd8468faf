/** The properties of the air as lines. */
import {
  airAt,
  airDensityKgPerM3,
  airHeatCapacityJPerKgK,
  airViscosityPaS,
  kelvin,
  sources,
  standardPressurePa,
} from '#solver/index.ts'
import type { Ledger } from './ledger.ts'

export function pressureStep(ledger: Ledger, altitudeM: number): number {
  ledger.given('Altitude', 'z', altitudeM, 'm')
  return ledger.step('Pressure of the air', 'p', '101325 × (1 − 2.25577e-5 × z)^5.2559', 'Pa', {
    value: standardPressurePa(altitudeM),
    source: `${sources.ashrae2021ch1}, eq. (3)`,
  })
}

/** Fits of the heat capacity hold from 200 to 1000 K. */
const FIT_K = { from: 200, to: 1000 }

/**
 * Viscosity, conductivity, heat capacity, density and Prandtl number at a temperature `T…` that stands above with its
 * pressure `p`. The ending tells two sets of one section apart.
 */
export function airSteps(ledger: Ledger, tempC: number, pressurePa: number, ending = ''): void {
  const air = airAt(tempC, pressurePa)
  const temperatureK = kelvin(tempC)
  const viscosity = airViscosityPaS(temperatureK)
  const heatCapacity = airHeatCapacityJPerKgK(temperatureK)
  const [T, x, Ω, μ, τ] = ['T', 'x', 'Ω', 'μ', 'τ'].map((symbol) => symbol + ending)
  const source = sources.lemmonJacobsen2004
  ledger.step(
    'Temperature over the collision energy of air, logarithm',
    `${x}`,
    `ln(${T} / 103.3)`,
    '',
    {
      source,
    },
  )
  ledger.step(
    'Collision integral',
    `${Ω}`,
    `exp(0.431 − 0.4623 × ${x} + 0.08406 × ${x}^2 + 0.005341 × ${x}^3 − 0.00331 × ${x}^4)`,
    '',
    { source },
  )
  ledger.step(
    'Viscosity of the air',
    `${μ}`,
    `1e-6 × 0.0266958 × sqrt(28.9586 × ${T}) / (0.36^2 × ${Ω})`,
    'Pa·s',
    { value: viscosity, source },
  )
  ledger.step('Critical temperature of air over its temperature', `${τ}`, `132.6312 / ${T}`, '', {
    source,
  })
  ledger.step(
    'Conductivity of the air',
    `λ_a${ending}`,
    `0.001 × (1.308e6 × ${μ} + 1.405 × ${τ}^(−1.1) − 1.036 × ${τ}^(−0.3))`,
    'W/(m·K)',
    { value: air.conductivityWPerMK, source },
  )
  ledger.step(
    'Heat capacity of the air',
    `c${ending}`,
    `1057.5 − 0.4489 × ${T} + 1.1407e-3 × ${T}^2 − 7.9999e-7 × ${T}^3 + 1.9327e-10 × ${T}^4`,
    'J/(kg·K)',
    {
      value: heatCapacity,
      source: sources.airHeatCapacityFit,
      validity: `holds for T ${FIT_K.from} to ${FIT_K.to} K${temperatureK < FIT_K.from || temperatureK > FIT_K.to ? ' (here used beyond its range)' : ''}`,
    },
  )
  ledger.step('Density of the air', `ρ${ending}`, `p / (287.05 × ${T})`, 'kg/m³', {
    value: airDensityKgPerM3(tempC, pressurePa),
    source: 'ideal gas',
  })
  ledger.step('Kinematic viscosity', `ν${ending}`, `${μ} / ρ${ending}`, 'm²/s', {
    value: air.kinematicViscosityM2PerS,
  })
  ledger.step('Prandtl number', `Pr${ending}`, `${μ} × c${ending} / λ_a${ending}`, '', {
    value: air.prandtl,
  })
}
