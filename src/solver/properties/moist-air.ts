import { kelvin, ZERO_CELSIUS_K } from '../constants.ts'
import { bracketedRoot } from '../root.ts'

/**
 * Saturation pressure of water vapour [Pa], over liquid water from 0 °C up, over ice below.
 *
 * Temperature [°C], −100 to 200 °C. Source: Hyland and Wexler 1983, as ASHRAE Handbook Fundamentals 2021,
 * chapter 1, eqs. (5) and (6).
 */
export function saturationPressurePa(tempC: number): number {
  const T = kelvin(tempC)
  const lnT = Math.log(T)
  if (tempC < 0) {
    return Math.exp(
      -5.6745359e3 / T +
        6.3925247 +
        T * (-9.677843e-3 + T * (6.2215701e-7 + T * (2.0747825e-9 + T * -9.484024e-13))) +
        4.1635019 * lnT,
    )
  }
  return Math.exp(
    -5.8002206e3 / T +
      1.3914993 +
      T * (-4.8640239e-2 + T * (4.1764768e-5 + T * -1.4452093e-8)) +
      6.5459673 * lnT,
  )
}

const COLDEST_DEW_POINT_C = -100

/**
 * Dew point of moist air [°C]; below 0 °C the frost point (saturation over ice).
 *
 * Air temperature [°C], −40 to 80 °C; relative humidity as a fraction, 0.01 to 1, over water above 0 °C and over ice
 * below. Source: the definition, p_ws(dew point) = humidity · p_ws(air), solved with `saturationPressurePa`.
 */
export function dewPointC(air: { readonly airC: number; readonly humidity: number }): number {
  const { airC, humidity } = air
  if (humidity >= 1) return airC
  // Solved in ln p, where the curve is nearly straight in temperature.
  const target = Math.log(humidity * saturationPressurePa(airC))
  const root = bracketedRoot(
    (tempC) => Math.log(saturationPressurePa(tempC)) - target,
    { low: COLDEST_DEW_POINT_C, high: airC },
    { width: 1e-9, value: 0 },
  )
  return Math.max(root.at, -ZERO_CELSIUS_K)
}
