/** The reason: plain sentences with the numbers that decided. */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import { sizeRun } from '#model/size-run.ts'
import { writeReason } from '#sizing/reason.ts'
import type { LimitName, LimitResult, Rating, RunResult } from '#sizing/result.ts'
import { siWords } from '#sizing/words.ts'
import { usualValues } from '../model/any-values.ts'
import { once } from '../once.ts'
import { coldRun, index, sized, steamRun } from './catalogue.ts'

const weighed: RunValues = { fuel: 'natural_gas', hoursPerYear: 8000 }
const thinnerOf = ({ ladder, chosen }: RunResult): Rating | undefined =>
  ladder[ladder.findIndex(({ thicknessM }) => thicknessM === chosen?.thicknessM) - 1]
const one = (value: number | undefined): string => (value ?? Number.NaN).toFixed(1)
const mmText = (rating: Rating | null | undefined): string =>
  `${Number(((rating?.thicknessM ?? Number.NaN) * 1000).toFixed(1))} mm`

describe('a limit decides', () => {
  test.each<[LimitName, RunValues]>([
    ['touch', { ...steamRun, mediumC: 350 }],
    ['loss', { ...steamRun, maxLossWPerM: 41 }],
    ['loss', { ...steamRun, maxLossWPerM2: 91 }],
    ['damp', coldRun],
  ])('%s: both rungs, both values, the bound', (name, values) => {
    const result = sized(values)
    const thinner = thinnerOf(result)
    const limit = (rating: Rating | null | undefined): LimitResult | undefined =>
      rating?.limits.find((found) => found.limit === name)
    expect(result.reason).toMatch(new RegExp(`^${name} decides`, 'i'))
    for (const text of [
      mmText(result.chosen),
      mmText(thinner),
      one(limit(result.chosen)?.value),
      one(limit(thinner)?.value),
      one(limit(result.chosen)?.bound).replace(/\.0$/, ''),
    ])
      expect(result.reason).toContain(text)
  })

  test('says what cost alone would take', () => {
    const { reason, money } = sized({ ...steamRun, ...weighed, mediumC: 350, hoursPerYear: 10 })
    expect(reason).toContain(`${(money?.cheapestThicknessM ?? 0) * 1000} mm`)
  })
})

describe('cost decides', () => {
  test('the thickness, the life, and what the limits would have allowed', () => {
    const result = sized({ ...steamRun, ...weighed, mediumC: 250, lifeYears: 12 })
    const first = result.ladder.find(({ pass }) => pass)
    expect(result.reason).toMatch(/^Cost decides\./)
    for (const text of [
      mmText(result.chosen),
      '12 years',
      mmText(first),
      one(first?.touchSurfaceC),
    ])
      expect(result.reason).toContain(text)
  })
})

describe('other answers', () => {
  test('bare and failing', () => {
    const { reason, bare } = sized({ ...steamRun, thicknessM: 0 })
    expect(reason).toMatch(/^Bare\./)
    expect(reason).toContain('touch')
    expect(reason).toContain(one(bare.touchSurfaceC))
  })

  test('fixed and failing: which limit and by how much', () => {
    const { reason, chosen } = sized({ ...steamRun, mediumC: 350, thicknessM: 0.02 })
    expect(reason).toContain('20 mm')
    expect(reason).toContain(one(chosen?.touchSurfaceC))
    expect(reason).toContain('57.3 °C')
  })

  test('unmet: how far the thickest is off', () => {
    const { reason, ladder } = sized({ ...steamRun, maxLossWPerM: 5 })
    const thickest = ladder.at(-1)
    expect(reason).toContain(mmText(thickest))
    expect(reason).toContain(one(thickest?.heatLossWPerM ?? Number.NaN))
    expect(reason).toContain('5 W/m')
  })

  test('inch series: the name and the millimetres', () => {
    const { reason } = sized({ ...steamRun, mediumC: 350, steps: 'inch' })
    expect(reason).toMatch(/\d in \(\d+(\.\d)? mm\)/)
  })
})

describe('numbers that tie at one decimal are told apart', () => {
  const base = once(() => sized({ ...steamRun, mediumC: 350 }))
  const chosenC = (): number => base().chosen?.touchSurfaceC ?? Number.NaN
  const thinnerC = (): number => thinnerOf(base())?.touchSurfaceC ?? Number.NaN

  test.each([0.04, 0.004])('%d K below the bound', (gapK) => {
    const { reason } = sized({ ...steamRun, mediumC: 350, maxSurfaceC: chosenC() + gapK })
    const [, value, bound] = /gives (\S+) °C against (\S+) °C/.exec(reason) ?? []
    expect(Number(value)).toBeLessThan(Number(bound))
    // No more digits than it takes.
    expect(value).toMatch(gapK > 0.01 ? /\.\d\d$/ : /\.\d\d\d$/)
  })

  test('a thinner rung that fails by as little just misses it', () => {
    const at = (belowK: number): string =>
      sized({ ...steamRun, mediumC: 350, maxSurfaceC: thinnerC() - belowK }).reason
    expect(at(0.004)).toContain('50 mm would just miss it')
    const [, bound] = /against (\S+) °C/.exec(at(0.1)) ?? []
    const [, failed] = /would give (\S+) °C/.exec(at(0.1)) ?? []
    expect(Number(failed)).toBeGreaterThan(Number(bound))
  })
})

test('units are those of the words', () => {
  const result = sized({ ...steamRun, mediumC: 350 })
  const reason = writeReason(result, {
    thickness: (thicknessM) => `${(thicknessM / 0.0254).toFixed(2)}″`,
    quantity: (value, unit, digits) => `<${value.toFixed(digits)} ${unit}>`,
  })
  expect(reason).not.toContain(' mm')
  expect(reason).toContain('″')
  expect(reason).toMatch(/<[\d.]+ °C> against </)
})

test('a true minus, and none on a zero', () => {
  expect(siWords.quantity(-12.34, '°C', 1)).toBe('−12.3 °C')
  expect(siWords.quantity(-0.04, '°C', 1)).toBe('0.0 °C')
  expect(siWords.quantity(-0.04, '°C', 2)).toBe('−0.04 °C')
})

test('a result that came through JSON has the same reason', () => {
  for (const values of [{ ...steamRun, ...weighed }, { ...steamRun, mediumC: 350 }, coldRun]) {
    const result = sized(values)
    expect(writeReason(JSON.parse(JSON.stringify(result)))).toBe(result.reason)
  }
})

test('any run: whole sentences, and a value never reads like the bound it is judged by', () => {
  fc.assert(
    fc.property(usualValues, (values) => {
      const outcome = sizeRun(values, {}, index)
      if (!outcome.ok) return
      const { reason, chosen, governing } = outcome.result
      expect(reason).toMatch(/^[A-Z].*\.$/)
      expect(reason).not.toMatch(/NaN|undefined|null|Infinity| {2}|\.\.|, \.|: \.| ;/)
      if (chosen) expect(reason.length).toBeLessThan(700)
      for (const [, value, bound] of reason.matchAll(/(\S+) \S+ against (\S+) \S+/g)) {
        const judged = outcome.result.limits.some(
          (limit) => Math.abs(limit.value - limit.bound) < 0.0006,
        )
        if (!judged && governing !== 'money') expect(value).not.toBe(bound)
      }
    }),
    { seed: 41, numRuns: 500 },
  )
})
