/** A worked example as its published companion calculation gives it, and a vector of our own that no print confirms. */
import { describe, expect, test } from 'vitest'
import { arrivalTempC, condensateKgPerS, temperatureDropK } from '#solver/flow.ts'
import { published } from '../published.ts'

describe('arrival temperature', () => {
  // Dutta 4.8: water of 110 °C at 1.8 m/s in a pipe of 35/42.2 mm with 20 mm of 0.12 W/(m·K), outside 10 W/(m²·K) to
  // 20 °C, 15 m long. Inside film and wall are neglected here; density and heat capacity of water at 110 °C from tables.
  const boreM = 0.035
  const outerM = 0.0422
  const overM = outerM + 2 * 0.02
  const resistanceMKPerW =
    Math.log(overM / outerM) / (2 * Math.PI * 0.12) + 1 / (10 * Math.PI * overM)
  published(
    ({ lengthM }: { lengthM: number }) =>
      arrivalTempC({
        startC: 110,
        airC: 20,
        uaWPerK: lengthM / resistanceMKPerW,
        flowKgPerS: 1.8 * (Math.PI / 4) * boreM * boreM * 951,
        heatCapacityJPerKgK: 4230,
      }),
    [
      {
        from: 'Dutta 4.8, hot water line',
        given: { lengthM: 15 },
        printed: '109.8',
        within: { absolute: 0.1, because: 'the companion rounds its coefficients' },
      },
    ],
  )
})

describe('arrival temperature of air', () => {
  // Çengel 8-6: air of 80 °C through 8 m of duct 0.2 × 0.2 m whose walls have 60 °C, 0.15 m³/s, 13.5 W/(m²·K) inside.
  published(
    ({ filmWPerM2K }: { filmWPerM2K: number }) =>
      arrivalTempC({
        startC: 80,
        airC: 60,
        uaWPerK: filmWPerM2K * 4 * 0.2 * 8,
        flowKgPerS: 0.9994 * 0.15,
        heatCapacityJPerKgK: 1008,
      }),
    [{ from: 'Çengel 8-6, duct of a heating', given: { filmWPerM2K: 13.5 }, printed: '71.3' }],
  )
})

describe('condensate', () => {
  // Kreith 2.4 (Incropera 3.6): 13.06 W boil liquid nitrogen of 200 kJ/kg; the same balance as for steam that condenses.
  published(
    ({ heatFlowW }: { heatFlowW: number }) =>
      3600 * condensateKgPerS({ heatFlowW, latentHeatJPerKg: 2e5 }),
    [{ from: 'Kreith 2.4, nitrogen per hour', given: { heatFlowW: 13.06 }, printed: '0.235' }],
  )
})

describe('our own vectors', () => {
  test('500 m of 0.45758 W/(m·K), 2 kg/s of 2100 J/(kg·K), 250 °C in 20 °C', () => {
    const stream = { flowKgPerS: 2, heatCapacityJPerKgK: 2100 }
    const uaWPerK =
      500 / (Math.log(0.3683 / 0.1683) / (2 * Math.PI * 0.06) + 1 / (8 * Math.PI * 0.3683))
    expect(uaWPerK / 500).toBeCloseTo(0.45758, 5)
    expect(arrivalTempC({ ...stream, startC: 250, airC: 20, uaWPerK })).toBeCloseTo(237.806, 3)
    expect(temperatureDropK({ ...stream, heatFlowW: uaWPerK * 230 })).toBeCloseTo(12.529, 3)
  })
})
