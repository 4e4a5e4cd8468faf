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
  return viscosityPaS(temperatureK, Math.log(temperatureK / COLLISION_ENERGY_K))
}

/** The logarithm is handed in: the conductivity shares it on the hot path. */
function viscosityPaS(temperatureK: number, lnReduced: number): number {
  const x = lnReduced
  const lnOmega = 0.431 + x * (-0.4623 + x * (0.08406 + x * (0.005341 + x * -0.00331)))
  return 1e-6 * VISCOSITY_SCALE * Math.sqrt(temperatureK) * Math.exp(-lnOmega)
}

/** ln(132.6312/103.3): from the temperature reduced by the collision energy to that reduced by the critical one. */
const LN_REDUCING_RATIO = Math.log(REDUCING_TEMPERATURE_K / COLLISION_ENERGY_K)

/**
 * Thermal conductivity of dilute air [W/(m·K)].
 *
 * Absolute temperature [K] and viscosity at it [Pa·s]. Source: Lemmon and Jacobsen 2004, eq. (6).
 */
export function airConductivityWPerMK(temperatureK: number, viscosity: number): number {
  return conductivityWPerMK(Math.log(temperatureK / COLLISION_ENERGY_K), viscosity)
}

function conductivityWPerMK(lnReduced: number, viscosity: number): number {
  // tau^-0.3 and tau^-1.1 are the third and eleventh power of one exponential: this line is on the hot path.
  const tenth = Math.exp(0.1 * (lnReduced - LN_REDUCING_RATIO))
  const third = tenth * tenth * tenth
  const fourth = third * tenth
  return 1e-3 * (1.308e6 * viscosity + 1.405 * fourth * fourth * third - 1.036 * third)
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
  const lnReduced = Math.log(T / COLLISION_ENERGY_K)
  const viscosity = viscosityPaS(T, lnReduced)
  const conductivity = conductivityWPerMK(lnReduced, viscosity)
  return {
    conductivityWPerMK: conductivity,
    kinematicViscosityM2PerS: (viscosity * GAS_CONSTANT_J_PER_KG_K * T) / pressurePa,
    prandtl: (viscosity * airHeatCapacityJPerKgK(T)) / conductivity,
  }
}

/** Density of dry air [kg/m³] at a temperature [°C] and pressure [Pa]. Source: ideal gas. */
export function airDensityKgPerM3(tempC: number, pressurePa: number): number {
  return pressurePa / (GAS_CONSTANT_J_PER_KG_K * kelvin(tempC))
}

/**
 * Standard pressure at an altitude [Pa].
 *
 * Altitude [m], −5000 to 11 000 m. Source: ASHRAE Handbook Fundamentals 2021, chapter 1, eq. (3).
 */
export function standardPressurePa(altitudeM: number): number {
  return 101325 * (1 - 2.25577e-5 * altitudeM) ** 5.2559
}
