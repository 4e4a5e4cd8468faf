/** Units of the CSV columns: each quantity has one, and where the trade has it an inch, foot or Fahrenheit twin. */

/** How a CSV number becomes the SI number: value * perUnit + offset. `twin` is the US form of the same column. */
interface QuantityForm {
  readonly unit: string
  readonly suffix: string
  readonly perUnit: number
  readonly twin?: {
    readonly unit: string
    readonly suffix: string
    readonly toSi: (value: number) => number
  }
}

const inch = { unit: 'in', suffix: 'in', toSi: (value: number) => value * 0.0254 }
const foot = { unit: 'ft', suffix: 'ft', toSi: (value: number) => value * 0.3048 }
const fahrenheit = { unit: '°F', suffix: 'f', toSi: (value: number) => ((value - 32) * 5) / 9 }

export const quantities = {
  length: { unit: 'm', suffix: 'm', perUnit: 1, twin: foot },
  size: { unit: 'mm', suffix: 'mm', perUnit: 0.001, twin: inch },
  area: { unit: 'm²', suffix: 'm2', perUnit: 1 },
  temperature: { unit: '°C', suffix: 'c', perUnit: 1, twin: fahrenheit },
  temperatureDifference: { unit: 'K', suffix: 'k', perUnit: 1 },
  gaugePressure: { unit: 'bar g', suffix: 'bar_g', perUnit: 1e5 },
  speed: { unit: 'm/s', suffix: 'm_s', perUnit: 1 },
  percentage: { unit: '%', suffix: 'pct', perUnit: 0.01 },
  fraction: { unit: '', suffix: '', perUnit: 1 },
  conductivity: { unit: 'W/mK', suffix: 'w_mk', perUnit: 1 },
  heatLossPerLength: { unit: 'W/m', suffix: 'w_m', perUnit: 1 },
  heatFlux: { unit: 'W/m²', suffix: 'w_m2', perUnit: 1 },
  duration: { unit: 's', suffix: 's', perUnit: 1 },
  hoursPerYear: { unit: 'h/year', suffix: 'hours_per_year', perUnit: 1 },
  years: { unit: 'years', suffix: 'years', perUnit: 1 },
  hours: { unit: 'h', suffix: 'hours', perUnit: 1 },
  massFlow: { unit: 'kg/s', suffix: 'kg_s', perUnit: 1 },
  heatCapacity: { unit: 'J/kgK', suffix: 'j_kgk', perUnit: 1 },
  filmCoefficient: { unit: 'W/m²K', suffix: 'w_m2k', perUnit: 1 },
  count: { unit: '', suffix: '', perUnit: 1 },
  pricePerEnergy: { unit: 'per kWh', suffix: 'per_kwh', perUnit: 1 },
} as const satisfies Record<string, QuantityForm>
export type Quantity = keyof typeof quantities
