/** What a sized run says beside its rungs: notes once each, a matt finish where damp cannot be met, months by their days. */
import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import { rungsOf } from '#sizing/build-up.ts'
import { MONTH_DAYS } from '#sizing/run-loss.ts'
import { solveStates, systemOf } from '#sizing/states.ts'
import { solve } from '#solver/index.ts'
import { problemOf } from '../model/resolve/problem.ts'
import { coldRun, noteCodes, sized, steamRun } from './catalogue.ts'

const weighed: RunValues = { ...steamRun, fuel: 'natural_gas', hoursPerYear: 6000, lengthM: 10 }

describe('a price that is missing', () => {
  const text = (values: RunValues): string =>
    sized(values).notes.find(({ code }) => code === 'price-missing')?.text ?? ''
  const unpriced = { ...weighed, finish: 'timber_board' }

  test('is told, and that the thinnest was taken only where one was', () => {
    expect(text(unpriced)).toMatch(
      /^No price is held .* The thinnest passing thickness was taken\.$/,
    )
    expect(text({ ...unpriced, maxLossWPerM: 0.5 })).toMatch(/its cost is not weighed\.$/)
    expect(text({ ...unpriced, thicknessM: 0.05 })).toMatch(/its cost is not weighed\.$/)
  })

  test('is not spoken of on a bare run, nor where cost is not weighed, nor where it is held', () => {
    expect(text({ ...unpriced, thicknessM: 0 })).toBe('')
    expect(text({ ...steamRun, finish: 'timber_board' })).toBe('')
    expect(text(weighed)).toBe('')
  })
})

test('no note stands twice', () => {
  const { size: _, material: __, ...plain } = weighed
  const duct = { ...plain, shape: 'rect-duct', widthM: 20, heightM: 20, windMPerS: 60 } as const
  for (const values of [weighed, coldRun, { ...duct, material: 'stone_wool_slab' }]) {
    const texts = sized(values as RunValues).notes.map((note) => note.text)
    expect(new Set(texts).size).toBe(texts.length)
  }
})

// Under a bright jacket and very humid air no rung keeps off the damp; under a matt one some may.
test('where damp cannot be met under a bright jacket, what a matt one would take is told', () => {
  const humid = Array.from({ length: 40 }, (_, index) => 0.7 + index / 200)
  const unmet = humid
    .map((humidity): RunValues => ({ ...coldRun, finish: 'al_plain', humidity }))
    .filter((values) => sized(values).governing === 'unmet')
  const told = unmet.filter((values) => sized(values).mattThicknessM !== null)
  expect(told.length).toBeGreaterThan(0)
  for (const values of told) {
    const matt = sized({ ...values, finish: 'elastomeric_bare', emissivity: 0.9 })
    expect(sized(values).mattThicknessM).toBe(matt.chosen?.thicknessM)
    expect(noteCodes(sized(values))).toEqual([...new Set(noteCodes(sized(values)))])
  }
  // Where damp is met and another limit is not, it is no matter of the finish.
  const loss = sized({ ...coldRun, finish: 'al_plain', humidity: 0.4, maxLossWPerM: 0.05 })
  expect([loss.governing, loss.mattThicknessM]).toEqual(['unmet', null])
})

describe('a year of twelve months', () => {
  const airs = [-2, 0, 4, 9, 14, 17, 19, 19, 15, 10, 4, 0]
  const months: RunValues = {
    ...steamRun,
    lengthM: 10,
    hoursPerYear: 8760,
    thicknessM: 0.05,
    monthlyAirC: airs.join(';'),
  }

  test('has 365 days, and its mean is that of its months by their days', () => {
    expect(MONTH_DAYS.reduce((sum, days) => sum + days, 0)).toBe(365)
    const { chosen } = sized(months)
    const lossOf = (airC: number) => {
      const { monthlyAirC: _, ...one } = months
      return sized({ ...one, airC }).chosen?.heatLossW ?? Number.NaN
    }
    const mean =
      airs.reduce((sum, airC, month) => sum + lossOf(airC) * (MONTH_DAYS[month] ?? 0), 0) / 365
    expect((chosen?.yearlyMeanLossW ?? Number.NaN) / mean).toBeCloseTo(1, 9)
    expect((chosen?.yearlyKWh ?? Number.NaN) / (mean * 8.76)).toBeCloseTo(1, 9)
  })

  // A pipe of 10 °C is heated while the air is colder; in the warmer months it gains, and nothing is made up.
  test('counts no month in which heat flows the other way', () => {
    const cool: RunValues = {
      ...months,
      airC: 9,
      mediumC: 10,
      maxLossWPerM: 100,
      reach: false,
      reachReason: 'high up',
    }
    const problem = problemOf(cool)
    const [rung] = rungsOf(problem)
    if (!rung) return expect.fail('no rung')
    const flows = solveStates(problem, rung).months.map(({ heatFlowWPerUnit }) => heatFlowWPerUnit)
    expect(flows.some((flow) => flow > 0) && flows.some((flow) => flow < 0)).toBe(true)
    const mean =
      flows.reduce((sum, flow, month) => sum + Math.max(0, flow) * (MONTH_DAYS[month] ?? 0), 0) /
      365
    expect(sized(cool).chosen?.yearlyMeanLossW).toBeCloseTo(10 * mean, 9)
  })
})

describe('states', () => {
  test('of an inclined pipe show the surface of its lower film, and the loss of its higher one', () => {
    const inclined: RunValues = { ...steamRun, orientation: 'inclined', riseM: 3, thicknessM: 0.05 }
    const problem = problemOf(inclined)
    const [rung] = rungsOf(problem)
    if (!rung) return expect.fail('no rung')
    const at = (inclinedFilm: 'lower' | 'higher') =>
      solve({ ...systemOf(problem, rung, problem.conditions.loss), inclinedFilm })
    const [lower, higher] = [at('lower'), at('higher')]
    expect(lower.surfaceTempC).toBeGreaterThan(higher.surfaceTempC)
    const chosen = sized(inclined).chosen
    expect(chosen?.surfaceTempC).toBeCloseTo(lower.surfaceTempC, 9)
    expect(chosen?.heatLossWPerM).toBeCloseTo(higher.heatLossWPerM ?? Number.NaN, 9)
  })

  test('of a run that lies are one and the same for loss and surface', () => {
    const problem = problemOf({ ...steamRun, thicknessM: 0.05 })
    const [rung] = rungsOf(problem)
    if (!rung) return expect.fail('no rung')
    const states = solveStates(problem, rung)
    expect(states.surface).toBe(states.loss)
    expect(states.months).toEqual([])
    expect(states.damp).toBeNull()
  })

  test('take up of the sun what their surface absorbs', () => {
    const problem = problemOf({ ...steamRun, solarWPerM2: 800, thicknessM: 0.05 })
    const [rung] = rungsOf(problem)
    if (!rung) return expect.fail('no rung')
    const { loss } = problem.conditions
    expect(loss.sunWPerM2).toBeGreaterThan(0)
    expect(systemOf(problem, rung, loss).sunAbsorbedWPerM2).toBeCloseTo(
      loss.sunWPerM2 * loss.solarAbsorptance,
      9,
    )
    const bare = { layers: [], thicknessM: 0, nominalThicknessM: null, piecesM: [] }
    expect(systemOf(problem, bare, loss).sunAbsorbedWPerM2).toBeCloseTo(
      loss.sunWPerM2 * loss.bareSolarAbsorptance,
      9,
    )
  })

  test('ask about damp where the medium is colder than the damp air, or damp is judged', () => {
    const dampOf = (values: RunValues) => {
      const problem = problemOf(values)
      const [rung] = rungsOf(problem)
      return rung ? solveStates(problem, rung).damp : null
    }
    expect(dampOf({ ...coldRun, thicknessM: 0.025 })).not.toBeNull()
    expect(dampOf({ ...steamRun, thicknessM: 0.05 })).toBeNull()
    expect(
      dampOf({ ...steamRun, thicknessM: 0.05, humidity: 0.6, surroundingsC: 0 }),
    ).not.toBeNull()
  })
})
