/** A run with one input moved: that input and what goes with it, and nothing else. */
import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import {
  boundedEmissivity,
  boundedHours,
  boundedHumidity,
  humidityOf,
  withAir,
  withConductivity,
  withEmissivity,
  withFuelPrice,
  withHours,
  withHumidity,
  withMedium,
  withWind,
} from '#sizing/moved.ts'
import type { Problem } from '#sizing/problem.ts'
import { problemOf } from '../model/resolve/problem.ts'
import { coldRun, steamRun } from './catalogue.ts'

const weighed: RunValues = {
  ...steamRun,
  thicknessM: 0.05,
  lengthM: 10,
  windMPerS: 2,
  fuel: 'natural_gas',
  hoursPerYear: 6000,
}
/** Water that might freeze. */
const wet: RunValues = {
  ...steamRun,
  mediumC: 20,
  airC: 5,
  thicknessM: 0.05,
  medium: 'water',
  frostHours: 12,
  frostAirC: -10,
}

const conditionsOf = ({ conditions }: Problem) => [
  conditions.loss,
  conditions.touch,
  conditions.damp,
]

describe('the medium', () => {
  test('moves in every condition but that of the frost, whose water stands', () => {
    const before = problemOf(wet)
    const after = withMedium(before, 3)
    for (const [index, condition] of conditionsOf(after).entries()) {
      expect(condition.mediumC).toBe((conditionsOf(before)[index]?.mediumC ?? 0) + 3)
    }
    expect(before.conditions.frost).not.toBeNull()
    expect(after.conditions.frost).toEqual(before.conditions.frost)
    expect(after.limits).toEqual(before.limits)
  })
})

describe('the air', () => {
  test('takes its surroundings along, and that of the frost too', () => {
    const before = problemOf({ ...wet, surroundingsC: 1 })
    const after = withAir(before, -2)
    const all = (problem: Problem) => [...conditionsOf(problem), problem.conditions.frost]
    for (const [index, condition] of all(after).entries()) {
      const old = all(before)[index]
      expect(condition?.around.airC).toBe((old?.around.airC ?? 0) - 2)
      expect(condition?.around.surroundingsC).toBe((old?.around.surroundingsC ?? 0) - 2)
      expect(condition?.mediumC).toBe(old?.mediumC)
    }
  })

  test('keeps its relative humidity: warmer air has a warmer dew point', () => {
    const before = problemOf(coldRun)
    const after = withAir(before, 4)
    expect(humidityOf(after)).toBeCloseTo(humidityOf(before) ?? Number.NaN, 9)
    expect(humidityOf(before)).toBeCloseTo(0.7, 9)
    const dewPoint = ({ limits }: Problem) => limits.damp?.dewPointC ?? Number.NaN
    expect(dewPoint(after)).toBeGreaterThan(dewPoint(before) + 3)
  })
})

test('the wind moves where there may be any: neither at touch nor at damp, and never below calm', () => {
  const before = problemOf(weighed)
  const after = withWind(before, 1.5)
  expect(after.conditions.loss.around.windMPerS).toBe(3.5)
  expect(after.conditions.touch).toEqual(before.conditions.touch)
  expect(after.conditions.damp).toEqual(before.conditions.damp)
  expect(withWind(before, -5).conditions.loss.around.windMPerS).toBe(0)
})

test('the emissivity of the jacket moves; on a bare run its own', () => {
  const lagged = problemOf({ ...weighed, emissivity: 0.5 })
  const more = withEmissivity(lagged, 0.2).conditions.loss
  expect(more.emissivity).toBeCloseTo(0.7, 12)
  expect(more.bareEmissivity).toBe(lagged.conditions.loss.bareEmissivity)
  const bare = problemOf({ ...weighed, thicknessM: 0 })
  const less = withEmissivity(bare, -0.2).conditions.loss
  expect(less.bareEmissivity).toBeCloseTo(bare.conditions.loss.bareEmissivity - 0.2, 12)
  expect(less.emissivity).toBe(bare.conditions.loss.emissivity)
})

test('the conductivity moves as a whole, and layers of one material stay of one', () => {
  const { material: _, thicknessM: __, ...plain } = weighed
  const before = problemOf({
    ...plain,
    layers: 'stone_wool_pipe_section:40;stone_wool_pipe_section:40',
  })
  const after = withConductivity(before, 0.1)
  const [old] = before.layers.map(({ material }) => material.conductivity)
  const [first, ...more] = after.layers.map(({ material }) => material.conductivity)
  if (old?.kind !== 'curve' || first?.kind !== 'curve') return expect.fail('a curve is shipped')
  expect(first.pointsC).toEqual(old.pointsC)
  for (const [index, value] of first.valuesWPerMK.entries()) {
    expect(value).toBeCloseTo(1.1 * (old.valuesWPerMK[index] ?? 0), 12)
  }
  for (const other of more) expect(other).toBe(first)
})

test('price and hours move by their share, the hours no further than a year has', () => {
  const before = problemOf(weighed)
  const price = (problem: Problem) => problem.money?.energy.fuelPricePerKWh ?? Number.NaN
  expect(price(withFuelPrice(before, 0.2)) / price(before)).toBeCloseTo(1.2, 12)
  const after = withHours(before, -0.1)
  expect(after.hoursPerYear).toBeCloseTo(5400, 9)
  expect(after.money?.energy.hoursPerYear).toBeCloseTo(5400, 9)
  expect(withHours(before, 1).hoursPerYear).toBe(8784)
  expect(withHours(before, 1).money?.energy.hoursPerYear).toBe(8784)
  const { hoursPerYear: _, fuel: __, ...unweighed } = weighed
  expect(withHours(problemOf(unweighed), 0.1)).toMatchObject({ hoursPerYear: null, money: null })
  expect(withFuelPrice(problemOf(unweighed), 0.1).money).toBeNull()
})

test('the humidity moves between hardly any and all that the air holds; a dry run has none', () => {
  const before = problemOf(coldRun)
  expect(humidityOf(withHumidity(before, 0.1))).toBeCloseTo(0.8, 9)
  expect(humidityOf(withHumidity(before, 0.9))).toBeCloseTo(1, 9)
  expect(humidityOf(withHumidity(before, -0.9))).toBeCloseTo(0.01, 9)
  const dry = problemOf(weighed)
  expect(humidityOf(dry)).toBeNull()
  expect(withHumidity(dry, 0.1)).toBe(dry)
})

test('the bounds of what is moved', () => {
  expect([0, 0.5, 1.2].map(boundedEmissivity)).toEqual([0.01, 0.5, 1])
  expect([0, 0.5, 1.2].map(boundedHumidity)).toEqual([0.01, 0.5, 1])
  expect([100, 8784, 9000].map(boundedHours)).toEqual([100, 8784, 8784])
})
