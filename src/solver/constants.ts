/** Physical constants of the whole solver. */

/** Stefan-Boltzmann constant [W/(m²·K⁴)]. Source: CODATA 2018. */
export const STEFAN_BOLTZMANN_W_PER_M2_K4 = 5.670374419e-8

/** Standard gravity [m/s²]. Source: ISO 80000-3. */
export const GRAVITY_M_PER_S2 = 9.80665

/** 0 °C in kelvin. Source: ISO 80000-5. */
export const ZERO_CELSIUS_K = 273.15

export const kelvin = (tempC: number): number => tempC + ZERO_CELSIUS_K
