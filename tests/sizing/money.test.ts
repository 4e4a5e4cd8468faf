/** Money in the answer: the bill adds up, and the choice answers to prices as it must. */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import type { Catalogue } from '#catalogue/types.ts'
import type { RunValues } from '#model/fields.ts'
import { indexCatalogue, sizeRun } from '#model/size-run.ts'
import type { RunMoney, RunResult } from '#sizing/result.ts'
import { evenly } from '../model/any-values.ts'
import { catalogue, coldRun, index, sized, steamRun } from './catalogue.ts'

const weighed: RunValues = { ...steamRun, fuel: 'natural_gas', hoursPerYear: 8000, lengthM: 20 }
const moneyOf = ({ money }: RunResult): RunMoney => {
  if (!money) throw new Error('Not weighed')
  return money
}

/** The same catalogue with every price of material and labour multiplied. */
function dearer(factor: number): Catalogue {
  return {
    ...catalogue,
    priceModels: catalogue.priceModels.map((row) => ({
      ...row,
      perM3: row.perM3 * factor,
      perM2: row.perM2 * factor,
      perM: row.perM * factor,
    })),
    finishPrices: catalogue.finishPrices.map((row) => ({ ...row, perM2: row.perM2 * factor })),
    labour: { ...catalogue.labour, ratePerHour: catalogue.labour.ratePerHour * factor },
  }
}

const run: fc.Arbitrary<RunValues> = fc.record({
  tag: fc.constant('A'),
  shape: fc.constant('pipe' as const),
  size: fc.constantFrom('DN 15', 'DN 25', 'DN 50', 'DN 100', 'DN 200', 'DN 400'),
  mediumC: evenly(40, 380),
  airC: evenly(-5, 35),
  windMPerS: evenly(0, 5),
  lengthM: evenly(1, 200),
  material: fc.constantFrom('stone_wool_pipe_section', 'glass_wool_pipe_section', 'cellular_glass'),
  finish: fc.constantFrom('al_plain', 'galv_steel', 'asj'),
  fuel: fc.constant('natural_gas'),
  fuelPricePerKWh: evenly(0.01, 0.25),
  hoursPerYear: evenly(500, 8700),
  lifeYears: fc.integer({ min: 3, max: 25 }),
})

describe('the bill adds up', () => {
  test('life-cycle cost is installed cost and the present value of the energy', () => {
    fc.assert(
      fc.property(run, (values) => {
        const result = sized(values)
        const { presentValueFactor } = moneyOf(result)
        for (const { money } of result.ladder) {
          if (!money) throw new Error('No price')
          expect(money.lifeCycle).toBeCloseTo(
            money.installed + money.energyPerYear * presentValueFactor,
            8,
          )
        }
      }),
      { seed: 31, numRuns: 60 },
    )
  })

  test('the whole run is its length times the metre', () => {
    const result = sized(weighed)
    const money = moneyOf(result)
    const { installed = 0, energyPerYear = 0 } = result.chosen?.money ?? {}
    expect(money.per).toBe('m')
    expect(money.installedTotal).toBeCloseTo(20 * installed, 8)
    expect(money.savingPerYearTotal).toBeCloseTo(20 * (money.bareEnergyPerYear - energyPerYear), 8)
    expect(money.paybackYears).toBeCloseTo(installed / (money.bareEnergyPerYear - energyPerYear), 9)
    expect(money.bareEnergyPerYear).toBeCloseTo(result.bare.money?.energyPerYear ?? 0, 9)
  })

  // 8000 h of the bare loss of 20 m, over 0.82, at 0.05 per kWh and 0.18105 kg per kWh: the shipped row of natural gas.
  test('energy, money and CO2 of the bare run from its loss by hand', () => {
    const result = sized(weighed)
    const fuelKWh = (((result.bare.heatLossWPerM ?? 0) * 8000) / 1000 / 0.82) * 20
    const chosenKWh = (((result.chosen?.heatLossWPerM ?? 0) * 8000) / 1000 / 0.82) * 20
    const money = moneyOf(result)
    expect(money.bareEnergyPerYear * 20).toBeCloseTo(fuelKWh * 0.05, 6)
    expect(money.co2KgPerYear).toBeCloseTo(chosenKWh * 0.18105, 6)
    expect(money.co2SavedKgPerYear).toBeCloseTo((fuelKWh - chosenKWh) * 0.18105, 5)
  })

  test('a cold run is paid by its COP', () => {
    const values: RunValues = { ...coldRun, fuel: 'electricity', hoursPerYear: 4000, cop: 4 }
    const result = sized(values)
    expect(moneyOf(result).efficiency).toBe(4)
    const kWh = (Math.abs(result.bare.heatLossWPerM ?? 0) * 4) / 4
    expect(moneyOf(result).bareEnergyPerYear).toBeCloseTo(kWh * 0.18, 9)
  })

  test('a flat surface is counted per m²', () => {
    const { size: _, ...flat } = weighed
    const result = sized({
      ...flat,
      shape: 'flat',
      widthM: 3,
      heightM: 2,
      material: 'stone_wool_slab',
    })
    const money = moneyOf(result)
    expect(money.per).toBe('m2')
    expect(money.installedTotal).toBeCloseTo(6 * (result.chosen?.money?.installed ?? 0), 8)
  })

  test('without a length no totals; a bare run costs nothing and saves nothing', () => {
    const { lengthM: _, ...unmeasured } = weighed
    expect(sized(unmeasured).money).toMatchObject({
      installedTotal: null,
      savingPerYearTotal: null,
      co2KgPerYear: null,
    })
    expect(sized({ ...weighed, thicknessM: 0 }).money).toMatchObject({
      installedTotal: 0,
      savingPerYearTotal: 0,
      paybackYears: null,
    })
  })
})

describe('the flat part of the curve', () => {
  test('from the thinnest to the thickest passing rung within 2 % of the chosen one', () => {
    const result = sized(weighed)
    const most = 1.02 * (result.chosen?.money?.lifeCycle ?? 0)
    const near = result.ladder
      .filter(({ pass, money }) => pass && (money?.lifeCycle ?? Number.NaN) <= most)
      .map(({ thicknessM }) => thicknessM)
    expect(moneyOf(result).withinTwoPercentM).toEqual([Math.min(...near), Math.max(...near)])
  })

  test('the cheapest without limits is named beside one that limits forced', () => {
    const result = sized({ ...weighed, mediumC: 350, hoursPerYear: 10 })
    const costs = result.ladder.map(({ money }) => money?.lifeCycle ?? Number.NaN)
    const cheapest = result.ladder[costs.indexOf(Math.min(...costs))]
    expect(moneyOf(result).cheapestThicknessM).toBe(cheapest?.thicknessM)
    expect(result.reason).toContain('Cost alone would take 20 mm')
  })
})

describe('properties of the choice', () => {
  test('price of energy and every other price times one factor leave it unchanged', () => {
    fc.assert(
      fc.property(run, fc.constantFrom(0.25, 0.5, 2, 16), (values, factor) => {
        const here = sized(values)
        const there = sizeRun(
          { ...values, fuelPricePerKWh: (values.fuelPricePerKWh ?? 0) * factor },
          {},
          indexCatalogue(dearer(factor)),
        )
        if (!there.ok) throw new Error('Refused')
        expect(there.result.chosen?.thicknessM).toBe(here.chosen?.thicknessM)
        expect(there.result.governing).toBe(here.governing)
      }),
      { seed: 32, numRuns: 60 },
    )
  })

  test('a dearer fuel never thins it where the loss falls with thickness', () => {
    fc.assert(
      fc.property(run, evenly(1, 6), (values, times) => {
        const price = values.fuelPricePerKWh ?? 0
        const cheap = sized(values)
        const dear = sized({ ...values, fuelPricePerKWh: price * times })
        const losses = cheap.ladder.map(({ heatLossWPerM }) => heatLossWPerM ?? 0)
        fc.pre(losses.every((loss, at) => at === 0 || loss < (losses[at - 1] ?? 0)))
        expect(dear.chosen?.thicknessM ?? 0).toBeGreaterThanOrEqual(cheap.chosen?.thicknessM ?? 0)
      }),
      { seed: 33, numRuns: 100 },
    )
  })

  test('more hours or a longer life neither', () => {
    fc.assert(
      fc.property(run, (values) => {
        const here = sized(values).chosen?.thicknessM ?? 0
        const longer = { ...values, lifeYears: (values.lifeYears ?? 0) + 10 }
        const busier = { ...values, hoursPerYear: Math.min(8784, (values.hoursPerYear ?? 0) * 1.5) }
        for (const other of [longer, busier])
          expect(sized(other).chosen?.thicknessM).toBeGreaterThanOrEqual(here)
      }),
      { seed: 34, numRuns: 60 },
    )
  })
})

test('the index remembers ladders without changing an answer', () => {
  const fresh = indexCatalogue(catalogue)
  const values: RunValues = { ...weighed, steps: 'both' }
  const first = sizeRun(values, {}, fresh)
  expect(sizeRun(values, {}, fresh)).toEqual(first)
  expect(sizeRun(values, {}, index)).toEqual(first)
})
