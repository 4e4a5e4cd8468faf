/** What a sensitivity says beside its numbers: units, which build-up was compared, whether the rung moves, what passes. */
import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import type { Sensitivity, SensitivityInput } from '#sizing/result.ts'
import { sensitivityOf } from '#sizing/sensitivity.ts'
import { problemOf } from '../model/resolve/problem.ts'
import { coldRun, sized, steamRun } from './catalogue.ts'

const weighed: RunValues = { ...steamRun, lengthM: 10, fuel: 'natural_gas', hoursPerYear: 6000 }
const all = (values: RunValues): readonly Sensitivity[] => sensitivityOf(problemOf(values))
const of = (values: RunValues, input: SensitivityInput): Sensitivity =>
  all(values).find((found) => found.input === input) ?? expect.fail(`no ${input}`)

test('every input has its unit', () => {
  const units = Object.fromEntries(
    [...all(weighed), ...all(coldRun)].map(({ input, unit }) => [input, unit]),
  )
  expect(units).toEqual({
    medium: 'K',
    air: 'K',
    wind: 'm/s',
    emissivity: 'fraction',
    conductivity: 'share',
    thickness: 'share',
    'fuel price': 'share',
    hours: 'share',
    humidity: 'fraction',
  })
})

test('inputs that move the rung come first, the rest by their influence', () => {
  const found = all({ ...weighed, mediumC: 300 })
  const ranks = found.map(({ movesRung, influence }) => (movesRung ? 1000 : 0) + influence)
  expect(ranks).toEqual(ranks.toSorted((a, b) => b - a))
  expect(found.every(({ influence }) => influence >= 0)).toBe(true)
})

describe('the rung moves', () => {
  // A bound that the chosen rung meets by a hundredth of a kelvin: any more heat breaks it, less keeps it.
  const touchC = sizedTouchC({ ...steamRun, mediumC: 350 })
  const tight = (): RunValues => ({ ...steamRun, mediumC: 350, maxSurfaceC: touchC() + 0.01 })

  function sizedTouchC(values: RunValues) {
    return () => sized(values).chosen?.touchSurfaceC ?? Number.NaN
  }

  test('where one end takes another one', () => {
    const { ends, movesRung } = of(tight(), 'medium')
    const chosenM = sized(tight()).chosen?.thicknessM
    const [low, high] = ends
    expect(low?.chosenThicknessM).toBeLessThanOrEqual(chosenM ?? 0)
    expect(high?.chosenThicknessM).toBeGreaterThan(chosenM ?? Number.NaN)
    expect(high?.governing).toBe('touch')
    expect(movesRung).toBe(true)
    expect([low?.passes, high?.passes]).toEqual([true, false])
  })

  test('not where the thickness was given', () => {
    for (const found of all({ ...tight(), thicknessM: 0.08 })) expect(found.movesRung).toBe(false)
  })
})

test('wind does nothing to the touch condition, which has none', () => {
  for (const end of of({ ...weighed, windMPerS: 3 }, 'wind').ends) {
    expect(end.touchSurfaceChangeK).toBe(0)
    expect(end.heatFlowChangeWPerUnit).not.toBe(0)
  }
})

test('a bare run gives off less at a lower emissivity and more at a higher one', () => {
  const [low, high] = of({ ...steamRun, thicknessM: 0, emissivity: 0.6 }, 'emissivity').ends
  expect(low?.heatFlowChangeWPerUnit).toBeLessThan(0)
  expect(high?.heatFlowChangeWPerUnit).toBeGreaterThan(0)
})

// DN 50 is 60.3 mm across: 160.3 mm under 50 mm, and that a tenth thicker no longer fits.
test('a generous thickness that leaves no room says so', () => {
  const { ends } = of({ ...steamRun, thicknessM: 0.05, maxOuterDiameterM: 0.1604 }, 'thickness')
  expect(ends.map(({ change, passes }) => [change, passes])).toEqual([
    [-0.1, true],
    [0.1, false],
  ])
  expect(ends.map(({ governing }) => governing)).toEqual([null, null])
})

test('of a run that no thickness serves the thickest is compared', () => {
  const unmet = { ...steamRun, maxLossWPerM: 0.5 }
  const thickestM = sized(unmet).ladder.at(-1)?.thicknessM ?? Number.NaN
  const [, high] = of(unmet, 'medium').ends
  const lossAt = (mediumC: number) =>
    sized({ ...unmet, mediumC }).ladder.at(-1)?.heatLossWPerM ?? Number.NaN
  expect(sized(unmet).ladder.length).toBeGreaterThan(2)
  expect(thickestM).toBeGreaterThan(0.1)
  expect(high?.heatFlowChangeWPerUnit).toBeCloseTo(lossAt(155) - lossAt(150), 9)
  expect(high?.chosenThicknessM).toBeNull()
})

test('without length or price there is no total to change', () => {
  for (const { ends } of all(steamRun)) {
    for (const end of ends) {
      expect(end.heatLossChangeW).toBeNull()
      expect(end.energyPerYearChange).toBeNull()
    }
  }
})
