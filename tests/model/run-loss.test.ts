import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import { totalLoss } from '#model/loss-total.ts'
import { lossOfRun, type RunLoss } from '#model/run-loss.ts'
import { sizeRun } from '#model/size-run.ts'
import { index } from '../sizing/catalogue.ts'

const hot: RunValues = {
  tag: 'H',
  shape: 'pipe',
  size: 'DN 80',
  lengthM: 10,
  mediumC: 170,
  airC: 20,
  material: 'stone_wool_pipe_section',
  finish: 'al_plain',
  thicknessM: 0.05,
}
const cold: RunValues = { ...hot, tag: 'C', mediumC: 4, material: 'elastomeric_foam_nbr' }

function lossOf(values: RunValues): RunLoss {
  const outcome = sizeRun(values, {}, index)
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.issues))
  return lossOfRun(values, outcome.result, index)
}

function fuelOfCatalogue(id: string) {
  const found = index.fuel(id)
  if (!found.ok) throw new Error(found.message)
  const { pricePerKWh: price, efficiency, co2KgPerKWh: co2 } = found.item
  return { price, efficiency, co2: Number(co2?.toFixed(3)) }
}

describe('the loss of a run', () => {
  test('is that of a whole year where no hours are given, and says so', () => {
    const { bare, hoursPerYear, notes } = lossOf(hot)
    expect(hoursPerYear).toBe(8760)
    expect(bare.heatKWh).toBeCloseTo(((bare.heatLossW ?? 0) * 8760) / 1000, 9)
    expect(notes.map(({ code }) => code)).toContain('hours-assumed')
  })

  test('costs what the fuel does, by efficiency and price, whether or not the cost is weighed', () => {
    const fuel = { fuelPricePerKWh: 0.1, efficiency: 0.8, hoursPerYear: 1000, currency: 'EUR' }
    const { asBuilt, currency } = lossOf({ ...hot, ...fuel, fuel: 'natural_gas', money: false })
    expect(currency).toBe('EUR')
    expect(asBuilt.cost).toBeCloseTo(((asBuilt.heatKWh ?? 0) / 0.8) * 0.1, 9)
  })

  test('says everything in its cost that was not given', () => {
    const priced = (values: Partial<RunValues>): string | undefined =>
      lossOf({ ...hot, hoursPerYear: 1000, ...values }).notes.find(
        ({ code }) => code === 'energy-assumed',
      )?.text
    const { price, efficiency, co2 } = fuelOfCatalogue('natural_gas')
    expect(priced({})).toBeUndefined()
    expect(priced({ fuel: 'natural_gas', money: false })).toContain(
      `at ${price} units/kWh (illustrative), an efficiency of ${efficiency} and ${co2} kg of CO2`,
    )
    expect(priced({ fuelPricePerKWh: 0.1, currency: 'EUR' })).toBe(
      'The energy is priced with an efficiency of 1 (none is given: fuel as useful heat).',
    )
    expect(priced({ fuelPricePerKWh: 0.1, efficiency: 0.8, currency: 'EUR' })).toBeUndefined()
    const cooled = { mediumC: 4, material: 'elastomeric_foam_nbr', fuelPricePerKWh: 0.3 }
    expect(priced(cooled)).toMatch(/a cooling COP of 3\.$/)
    expect(priced({ ...cooled, cop: 4, currency: 'EUR' })).toBeUndefined()
  })

  test('says nothing of touch, thresholds, prices and lives: it judges nothing', () => {
    const { notes } = lossOf({
      ...hot,
      fuel: 'natural_gas',
      hoursPerYear: 4000,
      finish: 'al_painted',
    })
    const codes = notes.map(({ code }) => code)
    expect(
      codes.filter((code) => /^(touch|reach|contact|threshold|price|money)/.test(code)),
    ).toEqual([])
    expect(codes).toContain('energy-assumed')
    expect(codes).toContain('inside-neglected')
  })

  test('of a hot run into which the sun brings more than goes out is nothing to be made up', () => {
    const sunny = lossOf({ ...hot, mediumC: 25, solarWPerM2: 900, fuel: 'natural_gas' })
    expect(sunny.bare.heatLossW).toBeLessThan(0)
    expect(sunny.bare.yearlyMeanLossW).toBe(0)
    expect(sunny.bare.cost).toBe(0)
    expect(sunny.notes.map(({ code }) => code)).toContain('sun-brings-more')
    const { lost, gained } = totalLoss([sunny])
    expect([lost.runs, gained.runs]).toEqual([1, 0])
  })

  test('saves bare less as built', () => {
    const { bare, asBuilt, saved, built } = lossOf({ ...hot, fuel: 'natural_gas' })
    expect(built).toBe('fixed')
    expect(saved.heatKWh).toBe((bare.heatKWh ?? 0) - (asBuilt.heatKWh ?? 0))
    expect(saved.cost).toBeGreaterThan(0)
    expect(saved.co2Kg).toBeGreaterThan(0)
  })

  test('is the mean of the months where those are given', () => {
    const months = '0;0;0;0;0;0;40;40;40;40;40;40'
    const { bare } = lossOf({ ...hot, monthlyAirC: months })
    const flow = (airC: number): number => lossOf({ ...hot, airC }).bare.heatLossW ?? 0
    // 181 days to the end of June, 184 after it.
    const meanW = (181 * flow(0) + 184 * flow(40)) / 365
    expect(bare.yearlyMeanLossW).toBeCloseTo(meanW, 6)
    expect(bare.heatKWh).toBeCloseTo(meanW * 8.76, 6)
    // Beside the loss per metre stands that of the run at the same condition.
    expect(bare.heatLossW).toBeCloseTo((bare.heatLossWPerM ?? 0) * 10, 9)
    expect(bare.heatLossW).toBe(flow(20))
  })

  test('is that of the thickest where nothing meets the limits', () => {
    const { thicknessM: _fixed, ...sized } = hot
    const { built, thicknessM, notes } = lossOf({ ...sized, maxLossWPerM: 1 })
    expect(built).toBe('thickest')
    expect(thicknessM).toBeGreaterThan(0.1)
    expect(notes.map(({ code }) => code)).toContain('built-thickest')
  })

  test('of a bare run saves nothing', () => {
    const { material: _material, finish: _finish, ...bareRun } = hot
    const { built, saved } = lossOf({ ...bareRun, thicknessM: 0 })
    expect(built).toBe('bare')
    expect(saved.heatKWh).toBe(0)
  })

  test('has no whole without a length', () => {
    const { lengthM: _length, ...endless } = hot
    const { bare, saved, notes } = lossOf(endless)
    expect(bare.heatLossWPerM).toBeGreaterThan(0)
    expect(bare.heatLossW).toBeNull()
    expect(saved.heatKWh).toBeNull()
    expect(notes.map(({ code }) => code)).toContain('not-in-total')
  })
})

describe('the loss of a list', () => {
  test('adds up, heat lost and heat gained apart, each currency by itself', () => {
    const fuelled = { fuel: 'natural_gas', hoursPerYear: 2000 }
    const { lengthM: _length, ...endless } = hot
    const losses = [
      lossOf({ ...hot, ...fuelled, tag: 'A', currency: 'EUR' }),
      lossOf({ ...hot, ...fuelled, tag: 'B', currency: 'CHF', lengthM: 3 }),
      lossOf({ ...hot, tag: 'D' }),
      lossOf({ ...cold, ...fuelled, currency: 'EUR' }),
      lossOf({ ...endless, tag: 'E' }),
    ]
    const { lost, gained, withoutFuel, withoutLength } = totalLoss(losses)
    const watts = losses.map(({ bare }) => bare.heatLossW ?? 0)
    expect(lost.runs).toBe(3)
    expect(gained.runs).toBe(1)
    expect(lost.bareHeatLossW).toBeCloseTo((watts[0] ?? 0) + (watts[1] ?? 0) + (watts[2] ?? 0), 9)
    expect(gained.bareHeatLossW).toBe(watts[3])
    expect(gained.bareHeatLossW).toBeLessThan(0)
    expect(gained.bareHeatKWh).toBeGreaterThan(0)
    expect(lost.savedHeatKWh).toBeCloseTo(lost.bareHeatKWh - lost.asBuiltHeatKWh, 6)
    expect(lost.costs.map(({ currency }) => currency)).toEqual(['EUR', 'CHF'])
    expect(lost.costs[0]?.saved).toBe(losses[0]?.saved.cost)
    expect(withoutFuel).toEqual(['D'])
    expect(withoutLength).toEqual(['E'])
  })
})
