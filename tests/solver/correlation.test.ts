import { describe, expect, test } from 'vitest'
import { correlation, outOfRange } from '#solver/correlation.ts'
import * as solver from '#solver/index.ts'
import { sources } from '#solver/sources.ts'

const double = correlation<{ rayleigh: number; prandtl: number }>(
  {
    name: 'A formula',
    source: 'incropera',
    equation: 'Nu = 2 Ra',
    valid: { rayleigh: [1, 1e4] },
  },
  ({ rayleigh }) => 2 * rayleigh,
)

describe('a correlation', () => {
  test('computes beyond its range as within: it never clamps', () => {
    expect(double({ rayleigh: 1e6, prandtl: 0.7 })).toBe(2e6)
  })

  test('names the input that left its range, with the value and both ends', () => {
    const [sentence, ...rest] = outOfRange(double, { rayleigh: 123456, prandtl: 0.7 })
    expect(rest).toEqual([])
    expect(sentence).toContain('A formula')
    expect(sentence).toContain('Rayleigh number')
    expect(sentence).toContain('123000')
    expect(sentence).toContain('1 to 10000')
  })

  test.each([
    [1, 0],
    [0.999, 1],
    [1e4, 0],
    [10001, 1],
  ])('with both ends belonging to the range: Ra %d has %i sentences', (rayleigh, count) => {
    expect(outOfRange(double, { rayleigh, prandtl: 0.7 })).toHaveLength(count)
  })
})

describe('every correlation of the solver', () => {
  const all = Object.values(solver).filter(
    (value) => typeof value === 'function' && 'pedigree' in value,
  )

  test('is there to be examined', () => {
    expect(all.length).toBeGreaterThanOrEqual(7)
  })

  test.each(all)('$pedigree.name cites a known source and a range that rises', ({ pedigree }) => {
    expect(Object.keys(sources)).toContain(pedigree.source)
    expect(pedigree.equation).toMatch(/^(Nu|h|T) = /)
    const ranges = Object.values(pedigree.valid)
    expect(ranges.length).toBeGreaterThan(0)
    for (const [from, to] of ranges) expect(from).toBeLessThan(to)
  })
})
