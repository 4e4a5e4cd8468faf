/** What each input does to the answer: against runs sized apart, and where the answer is known beforehand. */
import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import { detailRun } from '#model/size-run.ts'
import type { Sensitivity, SensitivityEnd, SensitivityInput } from '#sizing/result.ts'
import { sensitivityOf } from '#sizing/sensitivity.ts'
import { usualRanges } from '#sizing/sensitivity-moves.ts'
import { problemOf } from '../model/resolve/problem.ts'
import { once } from '../once.ts'
import { coldRun, index, sized, steamRun } from './catalogue.ts'

const weighed: RunValues = {
  ...steamRun,
  lengthM: 10,
  fuel: 'natural_gas',
  hoursPerYear: 6000,
}

const sensitivities = (values: RunValues): readonly Sensitivity[] =>
  sensitivityOf(problemOf(values))

function of(values: RunValues, input: SensitivityInput): Sensitivity {
  const found = sensitivities(values).find((sensitivity) => sensitivity.input === input)
  if (!found) throw new Error(`No ${input}`)
  return found
}

/** The two ends of an input that can go both ways. */
function endsOf(
  values: RunValues,
  input: SensitivityInput,
): readonly [SensitivityEnd, SensitivityEnd] {
  const [low, high] = of(values, input).ends
  if (!low || !high) throw new Error(`${input} has one end`)
  return [low, high]
}

describe('the inputs that are moved', () => {
  const inputs = (values: RunValues) =>
    sensitivities(values)
      .map(({ input }) => input)
      .sort()

  test('of a hot run with its cost weighed', () => {
    expect(inputs(weighed)).toEqual([
      'air',
      'conductivity',
      'emissivity',
      'fuel price',
      'hours',
      'medium',
      'thickness',
      'wind',
    ])
  })

  test('of a cold run in humid air', () => {
    expect(inputs(coldRun)).toEqual([
      'air',
      'conductivity',
      'emissivity',
      'humidity',
      'medium',
      'thickness',
      'wind',
    ])
  })

  test('of a bare run, without what lies on it', () => {
    expect(inputs({ ...steamRun, thicknessM: 0 })).toEqual(['air', 'emissivity', 'medium', 'wind'])
  })
})

describe('a fixed run moved is the run given so', () => {
  const fixed: RunValues = { ...weighed, thicknessM: 0.05, windMPerS: 2, emissivity: 0.5 }
  const base = once(() => sized(fixed).chosen)
  const moved = (values: RunValues) => {
    const { chosen } = sized({ ...fixed, ...values })
    return {
      loss: (chosen?.heatLossWPerM ?? 0) - (base()?.heatLossWPerM ?? 0),
      total: (chosen?.heatLossW ?? 0) - (base()?.heatLossW ?? 0),
      surface: (chosen?.surfaceTempC ?? 0) - (base()?.surfaceTempC ?? 0),
      touch: (chosen?.touchSurfaceC ?? 0) - (base()?.touchSurfaceC ?? 0),
    }
  }

  test.each<[SensitivityInput, RunValues, RunValues]>([
    ['medium', { mediumC: 145 }, { mediumC: 155 }],
    ['air', { airC: 15 }, { airC: 25 }],
    ['wind', { windMPerS: 1 }, { windMPerS: 3 }],
    ['emissivity', { emissivity: 0.4 }, { emissivity: 0.6 }],
    ['thickness', { thicknessM: 0.045 }, { thicknessM: 0.055 }],
    ['fuel price', { fuelPricePerKWh: 1 }, { fuelPricePerKWh: 2 }],
    ['hours', { hoursPerYear: 4800 }, { hoursPerYear: 7200 }],
  ])('%s', (input, lower, higher) => {
    const ends = endsOf(fixed, input)
    for (const [at, values] of [lower, higher].entries()) {
      const expected = moved(values)
      const end = ends[at]
      expect(end?.heatFlowChangeWPerUnit).toBeCloseTo(expected.loss, 9)
      expect(end?.heatLossChangeW).toBeCloseTo(expected.total, 8)
      expect(end?.surfaceChangeK).toBeCloseTo(expected.surface, 9)
      expect(end?.touchSurfaceChangeK).toBeCloseTo(expected.touch, 9)
    }
  })

  test('conductivity, of a constant one', () => {
    const { material: _, ...plain } = fixed
    const at = (conductivityWPerMK: number) =>
      sized({ ...plain, conductivityWPerMK }).chosen?.heatLossWPerM ?? Number.NaN
    const [low, high] = endsOf({ ...plain, conductivityWPerMK: 0.05 }, 'conductivity')
    expect(low.heatFlowChangeWPerUnit).toBeCloseTo(at(0.045) - at(0.05), 9)
    expect(high.heatFlowChangeWPerUnit).toBeCloseTo(at(0.055) - at(0.05), 9)
  })
})

describe('known beforehand', () => {
  test('the cost goes with price and hours in a straight line, the loss not at all', () => {
    for (const input of ['fuel price', 'hours'] as const) {
      const [low, high] = endsOf(weighed, input)
      expect(low.energyPerYearChange).toBeCloseTo(-(high.energyPerYearChange ?? Number.NaN), 9)
      expect(low.heatFlowChangeWPerUnit).toBe(0)
      expect(high.surfaceChangeK).toBe(0)
      expect(of(weighed, input).influence).toBeCloseTo(0.2, 9)
    }
  })

  test('with a fixed film and a constant conductivity the loss is straight in the medium: both ends alike', () => {
    const { material: _, ...plain } = steamRun
    const linear = { ...plain, conductivityWPerMK: 0.05, thicknessM: 0.05, filmWPerM2K: 10 }
    const [low, high] = endsOf(linear, 'medium')
    expect(low.heatFlowChangeWPerUnit).toBeCloseTo(-high.heatFlowChangeWPerUnit, 9)
    // 5 K of 130 K.
    expect(of(linear, 'medium').influence).toBeCloseTo(5 / 130, 9)
    const [cooler, warmer] = endsOf(linear, 'air')
    expect(cooler.heatFlowChangeWPerUnit).toBeCloseTo(high.heatFlowChangeWPerUnit, 9)
    expect(warmer.heatFlowChangeWPerUnit).toBeCloseTo(low.heatFlowChangeWPerUnit, 9)
  })

  test('from calm the wind can only rise', () => {
    const { ends } = of(steamRun, 'wind')
    expect(ends.map(({ change }) => change)).toEqual([1])
    expect(ends[0]?.heatFlowChangeWPerUnit).toBeGreaterThan(0)
    expect(ends[0]?.touchSurfaceChangeK).toBe(0)
  })

  test('emissivity, hours and humidity stop where they end', () => {
    const changes = (values: RunValues, input: SensitivityInput) =>
      of(values, input).ends.map(({ change }) => Number(change.toFixed(9)))
    expect(changes({ ...steamRun, emissivity: 1 }, 'emissivity')).toEqual([-0.1])
    expect(changes({ ...steamRun, emissivity: 0.05 }, 'emissivity')).toEqual([-0.04, 0.1])
    expect(changes({ ...weighed, hoursPerYear: 8784 }, 'hours')).toEqual([-0.2])
    expect(changes({ ...coldRun, humidity: 0.97 }, 'humidity')).toEqual([-0.05, 0.03])
  })

  test('humid air moves the rung of cold work and nothing else', () => {
    const humidity = of(coldRun, 'humidity')
    const [drier, damper] = humidity.ends
    expect(humidity).toMatchObject({ movesRung: true, influence: 0 })
    const at = (humidityThen: number) => sized({ ...coldRun, humidity: humidityThen }).chosen
    expect(drier?.chosenThicknessM).toBe(at(0.65)?.thicknessM)
    expect(damper?.chosenThicknessM).toBe(at(0.75)?.thicknessM)
    expect(damper?.passes).toBe(false)
    expect(drier?.passes).toBe(true)
  })

  test('warmer air is as humid as before', () => {
    const { airC = 0 } = coldRun
    const [, warmer] = endsOf(coldRun, 'air')
    expect(warmer.chosenThicknessM).toBe(sized({ ...coldRun, airC: airC + 5 }).chosen?.thicknessM)
  })

  test('the rung at an end is the one that would be chosen there', () => {
    const tight = { ...steamRun, maxLossWPerM: 35 }
    const [cooler, hotter] = endsOf(tight, 'medium')
    for (const [end, mediumC] of [
      [cooler, 145],
      [hotter, 155],
    ] as const) {
      const there = sized({ ...tight, mediumC })
      expect(end.chosenThicknessM).toBe(there.chosen?.thicknessM)
      expect(end.governing).toBe(there.governing)
    }
  })

  test('where nothing passes the thickest rung is compared', () => {
    const unmet = { ...steamRun, maxLossWPerM: 0.5 }
    const [, hotter] = endsOf(unmet, 'medium')
    expect(hotter.chosenThicknessM).toBeNull()
    expect(hotter.heatFlowChangeWPerUnit).toBeGreaterThan(0)
    expect(hotter.passes).toBe(false)
  })
})

test('what moves the rung comes first, then the larger influence', () => {
  for (const values of [weighed, coldRun, { ...weighed, thicknessM: 0.05 }]) {
    const found = sensitivities(values)
    found.forEach((sensitivity, at) => {
      const next = found[at + 1]
      if (!next) return
      expect(Number(sensitivity.movesRung)).toBeGreaterThanOrEqual(Number(next.movesRung))
      if (sensitivity.movesRung === next.movesRung) {
        expect(sensitivity.influence).toBeGreaterThanOrEqual(next.influence)
      }
    })
  }
})

test('a narrower range does less, none does nothing', () => {
  const problem = problemOf({ ...steamRun, thicknessM: 0.05 })
  const medium = (mediumK: number) =>
    sensitivityOf(problem, { ...usualRanges, mediumK }).find(({ input }) => input === 'medium')
  expect(medium(2)?.influence).toBeLessThan(medium(5)?.influence ?? 0)
  expect(medium(0)?.influence).toBe(0)
})

test('a run at the temperature of its air has no share to speak of, and no figure is lost', () => {
  const level = sensitivities({ ...steamRun, mediumC: 20, thicknessM: 0.05 })
  expect(level.every(({ influence }) => Number.isFinite(influence))).toBe(true)
  expect(level.find(({ input }) => input === 'medium')?.influence).toBe(1)
})

test('two layers of one material stay one where their conductivity is moved', () => {
  const { material: _, ...plain } = steamRun
  const layered = {
    ...plain,
    layers: 'stone_wool_pipe_section:40;stone_wool_pipe_section:?',
    maxLossWPerM: 30,
  }
  const single = { ...steamRun, thicknessM: sized(layered).chosen?.thicknessM ?? Number.NaN }
  expect(endsOf(layered, 'conductivity')[1].heatFlowChangeWPerUnit).toBeCloseTo(
    endsOf(single, 'conductivity')[1].heatFlowChangeWPerUnit,
    9,
  )
})

test('the run sheet shows it, and it survives the way to the window', () => {
  const detail = detailRun(weighed, {}, index)
  expect(detail?.sensitivity).toEqual(sensitivities(weighed))
  expect(structuredClone(detail)).toEqual(detail)
  expect(JSON.parse(JSON.stringify(detail))).toEqual(detail)
})
