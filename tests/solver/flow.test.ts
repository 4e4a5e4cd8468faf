import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { arrivalTempC, condensateKgPerS, temperatureDropK } from '#solver/flow.ts'
import { published } from '../published.ts'
import { spread, within } from './arbitraries.ts'

/** Duct of 0.6 × 0.9 m, 20 m long, 15 m/s of air of 1.20 kg/m³ and 1006 J/(kg·K). */
const duct = { flowKgPerS: 1.2 * 15 * 0.6 * 0.9, heatCapacityJPerKgK: 1006 }
const surfaceM2 = 2 * (0.6 + 0.9) * 20
const ashrae = 'ASHRAE Handbook Fundamentals 2021, ch. 23'

describe('temperatureDropK', () => {
  published(
    ({ fluxWPerM2 }: { fluxWPerM2: number }) =>
      temperatureDropK({ ...duct, heatFlowW: fluxWPerM2 * surfaceM2 }),
    [
      { from: `${ashrae}, example 1, bare duct`, given: { fluxWPerM2: 444 }, printed: '2.7' },
      {
        from: `${ashrae}, example 2, insulated duct`,
        given: { fluxWPerM2: 44.7 },
        printed: '0.27',
      },
    ],
  )
})

const stream = fc.record({
  startC: within(-200, 800),
  airC: within(-60, 60),
  uaWPerK: spread(1e-6, 1e6),
  flowKgPerS: spread(1e-6, 1e4),
  heatCapacityJPerKgK: spread(500, 15000),
})

describe('arrivalTempC', () => {
  test('halves the difference for each ln 2 of UA/(ṁc)', () => {
    const line = { startC: 100, airC: 20, flowKgPerS: 0.5, heatCapacityJPerKgK: 2000 }
    expect(arrivalTempC({ ...line, uaWPerK: 1000 * Math.LN2 })).toBeCloseTo(60, 10)
    expect(arrivalTempC({ ...line, uaWPerK: 2000 * Math.LN2 })).toBeCloseTo(40, 10)
  })

  test('lies between start and air', () => {
    fc.assert(
      fc.property(stream, (given) => {
        const arrivalC = arrivalTempC(given)
        expect(arrivalC).toBeGreaterThanOrEqual(Math.min(given.startC, given.airC) - 1e-9)
        expect(arrivalC).toBeLessThanOrEqual(Math.max(given.startC, given.airC) + 1e-9)
      }),
    )
  })

  test('is the same through one line as through its two halves', () => {
    fc.assert(
      fc.property(stream, (given) => {
        const half = { ...given, uaWPerK: given.uaWPerK / 2 }
        const middleC = arrivalTempC(half)
        expect(arrivalTempC({ ...half, startC: middleC })).toBeCloseTo(arrivalTempC(given), 8)
      }),
    )
  })

  test('drops less than with the loss of the start all along, and as much in a short line', () => {
    fc.assert(
      fc.property(stream, (given) => {
        const { startC, airC, uaWPerK } = given
        const dropK = Math.abs(startC - arrivalTempC(given))
        const linearK = Math.abs(
          temperatureDropK({ ...given, heatFlowW: uaWPerK * (startC - airC) }),
        )
        expect(dropK).toBeLessThanOrEqual(linearK + 1e-9)
        const short = { ...given, uaWPerK: 1e-6 * given.flowKgPerS * given.heatCapacityJPerKgK }
        expect(startC - arrivalTempC(short)).toBeCloseTo(1e-6 * (startC - airC), 8)
      }),
    )
  })

  test('a stream that stands takes the temperature of the air; one that loses nothing keeps its own', () => {
    const line = { startC: 100, airC: 20, heatCapacityJPerKgK: 4190 }
    expect(arrivalTempC({ ...line, uaWPerK: 5, flowKgPerS: 0 })).toBe(20)
    expect(arrivalTempC({ ...line, uaWPerK: 0, flowKgPerS: 1 })).toBe(100)
    expect(arrivalTempC({ ...line, uaWPerK: 0, flowKgPerS: 0 })).toBe(100)
  })
})

describe('condensateKgPerS', () => {
  // By hand: 2.257 MW into steam of 2257 kJ/kg condense 1 kg/s.
  test('is heat flow over latent heat', () => {
    expect(condensateKgPerS({ heatFlowW: 2.257e6, latentHeatJPerKg: 2.257e6 })).toBe(1)
    expect(condensateKgPerS({ heatFlowW: 0, latentHeatJPerKg: 2e6 })).toBe(0)
  })
})
