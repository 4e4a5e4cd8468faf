/**
 * How every quantity is shown: unit, factor and decimals, in SI and in US customary units. Inside the program values
 * are SI with temperatures in °C; energy is kWh in both, because that is how fuel prices are quoted here.
 * Names shared with `model/fields.ts` mean the same quantity.
 */
import {
  BTU_J,
  FOOT_M,
  INCH_M,
  MILE_PER_HOUR_M_PER_S,
  POUND_FORCE_PER_INCH2_PA,
  POUND_KG,
} from './definitions.ts'

export type UnitSystem = 'si' | 'us'

/** Shown value = stored value / `size` + `zero`. */
export interface DisplayUnit {
  readonly label: string
  /** How many stored units one shown unit is. */
  readonly size: number
  /** What the scale shows at a stored value of nought; only temperatures have one. */
  readonly zero: number
  /** Fixed decimals. */
  readonly decimals: number
}

const unit = (label: string, size: number, decimals: number, zero = 0): DisplayUnit => ({
  label,
  size,
  zero,
  decimals,
})
const same = (label: string, decimals: number) => {
  const shown = unit(label, 1, decimals)
  return { si: shown, us: shown }
}

const HOUR_S = 3600
const FOOT2_M2 = FOOT_M ** 2
const BTU_PER_HOUR_W = BTU_J / HOUR_S
/** One degree Fahrenheit of difference [K]. */
const FAHRENHEIT_K = 5 / 9

const quantities = {
  thickness: { si: unit('mm', 0.001, 0), us: unit('in', INCH_M, 2) },
  size: { si: unit('mm', 0.001, 1), us: unit('in', INCH_M, 3) },
  length: { si: unit('m', 1, 1), us: unit('ft', FOOT_M, 1) },
  area: { si: unit('m²', 1, 1), us: unit('ft²', FOOT2_M2, 1) },
  temperature: { si: unit('°C', 1, 1), us: unit('°F', FAHRENHEIT_K, 1, 32) },
  temperatureDifference: { si: unit('K', 1, 1), us: unit('°F diff.', FAHRENHEIT_K, 1) },
  gaugePressure: { si: unit('bar g', 1e5, 2), us: unit('psi g', POUND_FORCE_PER_INCH2_PA, 1) },
  speed: { si: unit('m/s', 1, 1), us: unit('mph', MILE_PER_HOUR_M_PER_S, 1) },
  conductivity: {
    si: unit('W/mK', 1, 4),
    us: unit('Btu·in/h·ft²°F', (BTU_PER_HOUR_W * INCH_M) / (FOOT2_M2 * FAHRENHEIT_K), 3),
  },
  heatLossPerLength: { si: unit('W/m', 1, 1), us: unit('Btu/h·ft', BTU_PER_HOUR_W / FOOT_M, 1) },
  heatFlux: { si: unit('W/m²', 1, 1), us: unit('Btu/h·ft²', BTU_PER_HOUR_W / FOOT2_M2, 1) },
  filmCoefficient: {
    si: unit('W/m²K', 1, 1),
    us: unit('Btu/h·ft²°F', BTU_PER_HOUR_W / (FOOT2_M2 * FAHRENHEIT_K), 2),
  },
  resistance: {
    si: unit('m²K/W', 1, 3),
    us: unit('h·ft²°F/Btu', (FOOT2_M2 * FAHRENHEIT_K) / BTU_PER_HOUR_W, 2),
  },
  massFlow: { si: unit('kg/s', 1, 3), us: unit('lb/h', POUND_KG / HOUR_S, 0) },
  condensate: { si: unit('kg/h', 1 / HOUR_S, 1), us: unit('lb/h', POUND_KG / HOUR_S, 1) },
  heatCapacity: {
    si: unit('J/kgK', 1, 0),
    us: unit('Btu/lb°F', BTU_J / (POUND_KG * FAHRENHEIT_K), 3),
  },
  count: same('', 0),
  power: { si: unit('W', 1, 0), us: unit('Btu/h', BTU_PER_HOUR_W, 0) },
  plantPower: { si: unit('kW', 1000, 1), us: unit('kBtu/h', 1000 * BTU_PER_HOUR_W, 1) },
  energy: same('kWh', 0),
  mass: { si: unit('kg', 1, 0), us: unit('lb', POUND_KG, 0) },
  duration: same('s', 0),
  hours: same('h', 1),
  hoursPerYear: same('h/year', 0),
  years: same('years', 1),
  fraction: same('', 2),
  percentage: { si: unit('%', 0.01, 0), us: unit('%', 0.01, 0) },
  money: same('', 0),
  moneyPerLength: { si: unit('per m', 1, 2), us: unit('per ft', 1 / FOOT_M, 2) },
  moneyPerArea: { si: unit('per m²', 1, 2), us: unit('per ft²', 1 / FOOT2_M2, 2) },
  moneyPerPiece: same('each', 0),
  pricePerEnergy: same('per kWh', 3),
} as const satisfies Record<string, Record<UnitSystem, DisplayUnit>>

export type QuantityName = keyof typeof quantities

export function displayUnit(quantity: QuantityName, system: UnitSystem): DisplayUnit {
  return quantities[quantity][system]
}
