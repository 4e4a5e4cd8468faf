import { kelvin } from '../constants.ts'

/** Dry air at one temperature and pressure. */
export interface Air {
  readonly conductivityWPerMK: number
  readonly kinematicViscosityM2PerS: number
  readonly prandtl: number
}

/** Specific gas constant of dry air [J/(kg·K)]. Source: ASHRAE Handbook Fundamentals 2021, chapter 1. */
const GAS_CONSTANT_J_PER_KG_K = 287.05

/** Molar mass [g/mol], collision diameter [nm] and energy [K] of air. Source: Lemmon and Jacobsen 2004, table 1. */
const MOLAR_MASS_G_PER_MOL = 28.9586
const COLLISION_DIAMETER_NM = 0.36
const COLLISION_ENERGY_K = 103.3
const REDUCING_TEMPERATURE_K = 132.6312
const VISCOSITY_SCALE =
  (0.0266958 * Math.sqrt(MOLAR_MASS_G_PER_MOL)) / (COLLISION_DIAMETER_NM * COLLISION_DIAMETER_NM)

/**
 * Dynamic viscosity of dilute air [Pa·s].
 *
 * Absolute temperature [K], 60 to 2000 K. Source: Lemmon and Jacobsen 2004, eqs. (1) to (3).
 */
export function airViscosityPaS(temperatureK: number): number {
  const x = Math.log(temperatureK / COLLISION_ENERGY_K)
  const omega = Math.exp(0.431 + x * (-0.4623 + x * (0.08406 + x * (0.005341 + x * -0.00331))))
  return (1e-6 * VISCOSITY_SCALE * Math.sqrt(temperatureK)) / omega
}

/**
 * Thermal conductivity of dilute air [W/(m·K)].
 *
 * Absolute temperature [K] and viscosity at it [Pa·s]. Source: Lemmon and Jacobsen 2004, eq. (6).
 */
export function airConductivityWPerMK(temperatureK: number, viscosityPaS: number): number {
  // tau^-0.3 and tau^-1.1 share one logarithm: this line is on the hot path.
  const lnTau = Math.log(REDUCING_TEMPERATURE_K / temperatureK)
  return (
    1e-3 *
    (1.308 * viscosityPaS * 1e6 + 1.405 * Math.exp(-1.1 * lnTau) - 1.036 * Math.exp(-0.3 * lnTau))
  )
}

/**
 * Isobaric heat capacity of air [J/(kg·K)].
 *
 * Absolute temperature [K], 200 to 1000 K. Source: `airHeatCapacityFit` in the bibliography (from memory).
 */
export function airHeatCapacityJPerKgK(temperatureK: number): number {
  const T = temperatureK
  return 1057.5 + T * (-0.4489 + T * (1.1407e-3 + T * (-7.9999e-7 + T * 1.9327e-10)))
}

/**
 * Properties of dry air for the films.
 *
 * Temperature [°C], pressure [Pa]; two plain numbers, since the solver calls this in its inner loop.
 */
export function airAt(tempC: number, pressurePa: number): Air {
  const T = kelvin(tempC)
  const viscosity = airViscosityPaS(T)
  const conductivity = airConductivityWPerMK(T, viscosity)
  return {
    conductivityWPerMK: conductivity,
    kinematicViscosityM2PerS: (viscosity * GAS_CONSTANT_J_PER_KG_K * T) / pressurePa,
    prandtl: (viscosity * airHeatCapacityJPerKgK(T)) / conductivity,
  }
}

/**
 * Standard pressure at an altitude [Pa].
 *
 * Altitude [m], −5000 to 11 000 m. Source: ASHRAE Handbook Fundamentals 2021, chapter 1, eq. (3).
 */
export function standardPressurePa(altitudeM: number): number {
  return 101325 * (1 - 2.25577e-5 * altitudeM) ** 5.2559
}
