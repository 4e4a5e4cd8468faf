import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { yearlyEnergyCost, yearlyFuelKWh, yearlyKWh } from '#money/energy-cost.ts'
import { installedCost, layerFactor, type PricedLayer } from '#money/installed-cost.ts'

const from = { source: 'test', confidence: 'estimate' } as const
const labour = { ...from, ratePerHour: 50, layerFactors: [1, 1.65, 2.25], currency: 'units' }
const price = {
  ...from,
  materialId: 'm',
  perM3: 300,
  perM2: 2,
  perM: 1,
  labourHoursPerM: 0.1,
  labourHoursPerM2: 0.4,
  wasteFraction: 0.05,
}
const finishPrice = {
  ...from,
  finishId: 'f',
  perM2: 22,
  labourHoursPerM: 0.12,
  labourHoursPerM2: 0.75,
  wasteFraction: 0.12,
}

describe('energy of a year', () => {
  const terms = { fuelPricePerKWh: 0.05, efficiency: 0.8, cop: 4, hoursPerYear: 8000 }

  // 100 W over 8000 h are 800 kWh of heat: 1000 kWh of fuel at 0.8, 200 kWh of electricity at a COP of 4.
  test('by hand, hot and cold', () => {
    expect(yearlyKWh(100, 8000)).toBe(800)
    expect(yearlyFuelKWh(100, terms)).toBe(1000)
    expect(yearlyFuelKWh(-100, terms)).toBe(200)
    expect(yearlyEnergyCost(100, terms)).toBe(50)
    expect(yearlyEnergyCost(-100, terms)).toBe(10)
  })

  test('nothing flows, nothing is paid', () => {
    expect(yearlyEnergyCost(0, terms)).toBe(0)
  })
})

describe('installed cost by hand', () => {
  const layer: PricedLayer = { price, volumeM3: 0.02, outerAreaM2: 0.5, pieces: 1 }

  // Material 300·0.02 + 2·0.5 + 1 = 8, with 5 % waste 8.4; labour (0.1 + 0.4·0.5) h at 50 = 15.
  test('one layer', () => {
    expect(installedCost([layer], null, labour)).toBeCloseTo(8.4 + 15, 10)
  })

  // Two pieces: material 6 + (1 + 1)·2 = 10, with waste 10.5; labour 15·1.65 = 24.75.
  test('one material in two layers is priced by the layer factor', () => {
    expect(installedCost([{ ...layer, pieces: 2 }], null, labour)).toBeCloseTo(10.5 + 24.75, 10)
  })

  // Finish 22·0.5 = 11, with 12 % waste 12.32; labour (0.12 + 0.75·0.5) h at 50 = 24.75.
  test('with a finish', () => {
    expect(installedCost([layer], { price: finishPrice, outerAreaM2: 0.5 }, labour)).toBeCloseTo(
      23.4 + 12.32 + 24.75,
      10,
    )
  })

  test('the bill adds up: two layers and a finish cost the sum of each alone', () => {
    const amount = fc.double({ min: 0, max: 100, noNaN: true })
    fc.assert(
      fc.property(amount, amount, fc.integer({ min: 1, max: 4 }), (volumeM3, areaM2, pieces) => {
        const one = { price, volumeM3, outerAreaM2: areaM2, pieces }
        const two = { ...one, volumeM3: volumeM3 + 1 }
        const finish = { price: finishPrice, outerAreaM2: areaM2 }
        const apart =
          installedCost([one], null, labour) +
          installedCost([two], null, labour) +
          installedCost([], finish, labour)
        expect(installedCost([one, two], finish, labour)).toBeCloseTo(apart, 6)
      }),
      { seed: 10, numRuns: 200 },
    )
  })

  test('more layers than factors take the last; no factors count once', () => {
    expect([1, 2, 3, 9].map((pieces) => layerFactor(labour, pieces))).toEqual([1, 1.65, 2.25, 2.25])
    expect(layerFactor({ ...labour, layerFactors: [] }, 2)).toBe(1)
  })
})
