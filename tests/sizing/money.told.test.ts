/** Totals of the money of a run, from its rungs: what is known of them, and what is not. */
import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import type { Rating, RunMoney, RunResult } from '#sizing/result.ts'
import { noteCodes, sized, steamRun } from './catalogue.ts'

const weighed: RunValues = { ...steamRun, fuel: 'natural_gas', hoursPerYear: 6000, lengthM: 10 }
const moneyOf = ({ money }: RunResult): RunMoney => money ?? expect.fail('no money')
const chosenOf = ({ chosen }: RunResult): Rating => chosen ?? expect.fail('none chosen')
const { lengthM: _, ...endless } = weighed

describe('totals', () => {
  test('are those of a unit times the length', () => {
    const result = sized(weighed)
    const money = moneyOf(result)
    const chosen = chosenOf(result)
    expect(money.installedTotal).toBeCloseTo(10 * (chosen.money?.installed ?? Number.NaN), 9)
    const saved = money.bareEnergyPerYear - (chosen.money?.energyPerYear ?? Number.NaN)
    expect(money.savingPerYearTotal).toBeCloseTo(10 * saved, 6)
    expect(money.paybackYears).toBeCloseTo(
      (money.installedTotal ?? Number.NaN) / (money.savingPerYearTotal ?? Number.NaN),
      9,
    )
  })

  test('are not known of a run without a length, whose payback is that of a metre', () => {
    const result = sized(endless)
    const money = moneyOf(result)
    expect(money).toMatchObject({
      installedTotal: null,
      savingPerYearTotal: null,
      co2KgPerYear: null,
      co2SavedKgPerYear: null,
    })
    expect(money.paybackYears).toBeCloseTo(moneyOf(sized(weighed)).paybackYears ?? Number.NaN, 9)
  })

  test('of carbon dioxide go with the heat', () => {
    const result = sized(weighed)
    const money = moneyOf(result)
    const [bare, chosen] = [result.bare, chosenOf(result)].map(
      ({ yearlyMeanLossW }) => yearlyMeanLossW ?? Number.NaN,
    )
    const emitted = money.co2KgPerYear ?? Number.NaN
    expect(emitted).toBeGreaterThan(0)
    const ratio = (bare ?? Number.NaN) / (chosen ?? Number.NaN)
    expect(money.co2SavedKgPerYear).toBeCloseTo(emitted * (ratio - 1), 6)
  })

  test('of a run that no thickness serves are those of nothing chosen', () => {
    const money = moneyOf(sized({ ...weighed, maxLossWPerM: 0.5 }))
    expect(money).toMatchObject({
      installedTotal: null,
      savingPerYearTotal: null,
      paybackYears: null,
      co2KgPerYear: null,
      co2SavedKgPerYear: null,
      withinTwoPercentM: null,
    })
    expect(money.cheapestThicknessM).not.toBeNull()
  })
})

describe('thicknesses', () => {
  const costs = ({ ladder }: RunResult): readonly [number, number][] =>
    ladder.map(({ thicknessM, money }) => [thicknessM, money?.lifeCycle ?? Number.NaN])

  test('the cheapest is so whether or not it passes', () => {
    for (const values of [
      weighed,
      { ...weighed, maxLossWPerM: 20 },
      { ...weighed, hoursPerYear: 50 },
    ]) {
      const result = sized(values)
      const cheapest = costs(result).reduce((a, b) => (b[1] < a[1] ? b : a))
      expect(moneyOf(result).cheapestThicknessM).toBe(cheapest[0])
    }
  })

  test('those within 2 % pass, and the range is from the first to the last of them', () => {
    for (const values of [weighed, { ...weighed, maxLossWPerM: 20 }]) {
      const result = sized(values)
      const most = 1.02 * (chosenOf(result).money?.lifeCycle ?? Number.NaN)
      const near = result.ladder.filter(
        ({ pass, money }) => pass && money && money.lifeCycle <= most,
      )
      expect(near.length).toBeGreaterThan(0)
      expect(moneyOf(result).withinTwoPercentM).toEqual([
        near.at(0)?.thicknessM,
        near.at(-1)?.thicknessM,
      ])
    }
  })

  test('of a finish without a price there is no cheapest', () => {
    const money = moneyOf(sized({ ...weighed, finish: 'timber_board' }))
    expect(money).toMatchObject({
      cheapestThicknessM: null,
      withinTwoPercentM: null,
      installedTotal: null,
      paybackYears: null,
    })
    expect(money.savingPerYearTotal).toBeGreaterThan(0)
  })
})

describe('notes', () => {
  const code = 'fittings-unpriced'

  test('say that lagged fittings have no price, where there are such and a price is asked', () => {
    const fitted = { ...weighed, valves: 2, fittings: 'lagged' } as const
    expect(noteCodes(sized(fitted))).toContain(code)
    expect(sized(fitted).notes.find((note) => note.code === code)?.text).toContain('no price')
    expect(noteCodes(sized(weighed))).not.toContain(code)
    const { fuel: __, hoursPerYear: ___, ...unweighed } = fitted
    expect(noteCodes(sized(unweighed))).not.toContain(code)
  })

  test('leave lagged fittings out of what is saved', () => {
    const plain = moneyOf(sized(weighed))
    const fitted = moneyOf(sized({ ...weighed, valves: 2, fittings: 'lagged' }))
    expect(fitted.savingPerYearTotal).toBeCloseTo(plain.savingPerYearTotal ?? Number.NaN, 6)
    expect(fitted.co2KgPerYear).toBeGreaterThan(plain.co2KgPerYear ?? Number.NaN)
  })
})
