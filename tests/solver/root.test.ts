import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { bracketedRoot } from '#solver/root.ts'
import { spread, within } from './arbitraries.ts'

const exact = { width: 0, value: 0 }
const unit = { low: 0, high: 1 }

describe('bracketedRoot', () => {
  test.each<[string, (x: number) => number, number]>([
    ['a straight line', (x) => 3 * x - 1, 1 / 3],
    ['a root at the low end', (x) => x, 0],
    ['a root at the high end', (x) => x - 1, 1],
    ['a steep wall', (x) => Math.expm1(500 * (x - 0.7)), 0.7],
    ['a wall of the other kind', (x) => -Math.expm1(-500 * (x - 0.2)), 0.2],
    ['a flat root of the ninth order', (x) => (x - 0.6) ** 9, 0.6],
    ['a falling function', (x) => Math.cos(2 * x), Math.PI / 4],
    ['an infinite slope', (x) => Math.cbrt(x - 0.4), 0.4],
    ['very small values', (x) => 1e-200 * (x - 0.3), 0.3],
    ['very large values', (x) => 1e200 * (x - 0.3), 0.3],
    ['a pole outside', (x) => 1 / (x + 1e-9) - 5, 0.2],
  ])('finds the root of %s', (_, f, expected) => {
    const root = bracketedRoot(f, unit, exact)
    expect(Math.abs(root.at - expected)).toBeLessThan(1e-3)
    expect(Math.abs(root.value)).toBeLessThanOrEqual(Math.abs(f(expected + 1e-3)))
    expect(root.evaluations).toBeLessThanOrEqual(300)
  })

  test('needs few evaluations where the function is smooth', () => {
    expect(
      bracketedRoot((x) => Math.exp(x) - 2, unit, { width: 1e-12, value: 0 }).evaluations,
    ).toBeLessThan(12)
    expect(bracketedRoot((x) => 7 * x - 2, unit, { width: 1e-12, value: 1e-15 }).evaluations).toBe(
      3,
    )
  })

  test('closes in on a step and shows both sides of it', () => {
    const root = bracketedRoot((x) => (x < 0.3 ? -5 : 9), unit, exact)
    expect(root.at).toBeCloseTo(0.3, 12)
    expect(root.otherEnd).toBeCloseTo(0.3, 12)
    expect(root.at < 0.3).not.toBe(root.otherEnd < 0.3)
    expect(Math.abs(root.value)).toBeGreaterThanOrEqual(5)
  })

  test('stops on the width asked for', () => {
    const root = bracketedRoot((x) => (x < 0.3 ? -1 : 1), unit, { width: 0.1, value: 0 })
    expect(Math.abs(root.at - root.otherEnd)).toBeLessThanOrEqual(0.1)
    expect(Math.abs(root.at - 0.3)).toBeLessThanOrEqual(0.1)
    expect(root.evaluations).toBeLessThan(10)
  })

  test('stops on the value asked for', () => {
    const root = bracketedRoot((x) => x ** 3 - 0.5, unit, { width: 0, value: 1e-3 })
    expect(Math.abs(root.value)).toBeLessThanOrEqual(1e-3)
  })

  test.each<[string, (x: number) => number, number]>([
    ['positive throughout', (x) => x + 1, 0],
    ['negative throughout', (x) => x - 2, 1],
  ])('gives the nearer end for a function %s', (_, f, at) => {
    const root = bracketedRoot(f, unit, exact)
    expect(root.at).toBe(at)
    expect(root.value).toBe(f(at))
  })

  test('takes a bracket of one point', () => {
    expect(bracketedRoot((x) => x - 5, { low: 2, high: 2 }, exact)).toMatchObject({
      at: 2,
      value: -3,
    })
  })

  test('never leaves the bracket and ends on a change of sign, for any monotonic function', () => {
    fc.assert(
      fc.property(
        within(-1000, 1000),
        spread(1e-6, 1000),
        spread(0.05, 20),
        fc.double({ min: 0, max: 1, noNaN: true }),
        (low, span, power, where) => {
          const high = low + span
          const rootAt = low + where * span
          const seen: number[] = []
          const f = (x: number) => {
            seen.push(x)
            return Math.sign(x - rootAt) * (Math.abs(x - rootAt) / span) ** power
          }
          const root = bracketedRoot(f, { low, high }, exact)
          expect(Math.min(...seen)).toBeGreaterThanOrEqual(low)
          expect(Math.max(...seen)).toBeLessThanOrEqual(high)
          const sides = [f(root.at), f(root.otherEnd)]
          expect(root.value === 0 || (sides[0] ?? 0) * (sides[1] ?? 0) <= 0).toBe(true)
          // A flat root of a high power has no nearer neighbour whose value differs from zero by much.
          if (power <= 3) expect(Math.abs(root.at - rootAt)).toBeLessThan(1e-6 * span + 1e-9)
        },
      ),
      { numRuns: 500 },
    )
  })
})
