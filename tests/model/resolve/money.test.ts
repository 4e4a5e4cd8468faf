/** Whether the cost is weighed, and on what terms. */
import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import { coldRun, noteCodes, refusedColumns, steamRun } from '../../sizing/catalogue.ts'
import { problemOf } from './problem.ts'

const gas = { fuel: 'natural_gas', hoursPerYear: 8000 }

describe('money defaults to yes when fuel and hours are given', () => {
  test.each([
    [gas, true],
    [{ ...gas, money: false }, false],
    [{ fuel: 'natural_gas' }, false],
    [{ hoursPerYear: 8000 }, false],
    [{}, false],
    [{ ...gas, money: true }, true],
    [{ money: true, hoursPerYear: 8000, fuelPricePerKWh: 0.1 }, true],
    [{ hoursPerYear: 8000, fuelPricePerKWh: 0.1, efficiency: 0.9 }, true],
    [{ hoursPerYear: 8000, fuelPricePerKWh: 0.1, efficiency: 0.9, money: false }, false],
    [{ hoursPerYear: 8000, fuelPricePerKWh: 0.1 }, false],
    [{ hoursPerYear: 8000, fuelPricePerKWh: 0.1, cop: 3 }, false],
    [{ fuelPricePerKWh: 0.1, efficiency: 0.9 }, false],
  ])('%o: %s', (own, weighed) => {
    expect(problemOf({ ...steamRun, ...own }).money !== null).toBe(weighed)
  })

  test('asked for without hours or without a price: each missing one is named', () => {
    expect(refusedColumns({ ...steamRun, money: true })).toEqual(['hours_per_year', 'fuel'])
    expect(refusedColumns({ ...steamRun, ...gas, fuel: 'kerosene' })).toEqual([
      'fuel_price_per_kwh',
    ])
  })

  test('a cold run is weighed by a price and a COP', () => {
    const price = { hoursPerYear: 8000, fuelPricePerKWh: 0.1 }
    expect(problemOf({ ...coldRun, ...price, cop: 3 }).money).not.toBeNull()
    expect(problemOf({ ...coldRun, ...price, efficiency: 0.9 }).money).toBeNull()
  })

  test.each([
    [{ hoursPerYear: 8000, fuelPricePerKWh: 0.1 }, 'efficiency or fuel'],
    [{ fuelPricePerKWh: 0.1 }, 'efficiency or fuel and hours_per_year'],
    [{ fuel: 'natural_gas' }, 'hours_per_year'],
  ])('what is missing is said: %o', (own, missing) => {
    const { notes } = problemOf({ ...steamRun, ...own })
    expect(notes.find(({ code }) => code === 'money-not-weighed')?.text).toBe(
      `The cost is not weighed. For that, give ${missing}.`,
    )
  })

  test.each([{}, { hoursPerYear: 8000 }, { money: false, fuel: 'natural_gas' }, gas])(
    'and only where energy is named and money not settled: %o',
    (own) => {
      expect(noteCodes(problemOf({ ...steamRun, ...own }))).not.toContain('money-not-weighed')
    },
  )

  test('the term of the other way is said to be unused, unless both are given', () => {
    const unused = (values: RunValues): string[] =>
      problemOf(values).notes.flatMap(({ code, text }) => (code === 'unused' ? [text] : []))
    expect(unused({ ...steamRun, cop: 4 })).toEqual([
      'cop is not used: the run loses heat, which efficiency prices.',
    ])
    expect(unused({ ...coldRun, efficiency: 0.8 })).toEqual([
      'efficiency is not used: the run gains heat, which cop prices.',
    ])
    expect(unused({ ...steamRun, ...gas, cop: 4, efficiency: 0.8 })).toEqual([])
  })

  test('hours without money still give the yearly heat', () => {
    expect(problemOf({ ...steamRun, hoursPerYear: 3000 }).hoursPerYear).toBe(3000)
  })
})

test('an unknown fuel is an issue whether or not the cost is weighed', () => {
  for (const own of [{}, { hoursPerYear: 100 }, { money: false, hoursPerYear: 100 }])
    expect(refusedColumns({ ...steamRun, ...own, fuel: 'phlogiston' })).toContain('fuel')
})

describe('terms', () => {
  // The shipped row: natural gas 0.05 per kWh, efficiency 0.82, both on the gross calorific value.
  test('of the fuel, else the usual ones, said in one note', () => {
    const { money, notes } = problemOf({ ...steamRun, ...gas })
    expect(money).toMatchObject({
      energy: { fuelPricePerKWh: 0.05, efficiency: 0.82, hoursPerYear: 8000 },
      discount: 0.08,
      growth: 0.02,
      lifeYears: 15,
    })
    const text = notes.find(({ code }) => code === 'money-assumed')?.text ?? ''
    for (const figure of ['0.05 per kWh', '0.82', '8 %', '2 %', '15 years'])
      expect(text).toContain(figure)
    expect(notes.map(({ code }) => code)).toContain('prices-illustrative')
  })

  test('given: taken, and no longer an assumption', () => {
    const problem = problemOf({
      ...steamRun,
      ...gas,
      fuelPricePerKWh: 0.11,
      efficiency: 0.9,
      discount: 0.05,
      growth: 0,
      lifeYears: 20,
      currency: 'GBP',
    })
    expect(problem.money).toMatchObject({
      energy: { fuelPricePerKWh: 0.11, efficiency: 0.9 },
      discount: 0.05,
      growth: 0,
      lifeYears: 20,
      currency: 'GBP',
    })
    expect(noteCodes(problem)).not.toContain('money-assumed')
  })

  test('a cold run says its COP, not an efficiency', () => {
    const { notes } = problemOf({ ...coldRun, fuel: 'electricity', hoursPerYear: 4000 })
    const text = notes.find(({ code }) => code === 'money-assumed')?.text ?? ''
    expect(text).toContain('COP of 3')
    expect(text).not.toContain('efficiency')
  })
})
