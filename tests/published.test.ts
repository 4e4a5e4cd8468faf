import { describe, expect, test } from 'vitest'
import { expectPublished, type PublishedRow, toleranceOf } from './published.ts'

const row = (printed: string, within?: PublishedRow<number>['within']): PublishedRow<number> => ({
  from: 'a book',
  given: 0,
  printed,
  ...(within ? { within } : {}),
})
const computed = (value: number) => () => value

describe('the tolerance of a printed figure', () => {
  test.each([
    ['17.40', 0.005],
    ['443', 0.5],
    ['-7.1', 0.05],
    ['1.36e3', 5],
    ['1.8e-5', 0.5e-6],
  ])('%s stands for itself plus or minus %d', (printed, tolerance) => {
    expect(toleranceOf(row(printed))).toBeCloseTo(tolerance, 12)
  })

  test('is the stated one where a reason is given', () => {
    const because = 'the table is rounded'
    expect(toleranceOf(row('200', { fraction: 0.01, because }))).toBe(2)
    expect(toleranceOf(row('200', { absolute: 3, because }))).toBe(3)
  })

  test('refuses what is not a number', () => {
    expect(() => toleranceOf(row('about 5'))).toThrow('about 5')
  })
})

describe('a printed figure', () => {
  test('is met up to half a unit of its last digit, both ways', () => {
    expectPublished(computed(17.4049), row('17.40'))
    expectPublished(computed(17.3951), row('17.40'))
  })

  test.each([17.4051, 17.3949, Number.NaN, -17.4])('is not met by %d', (value) => {
    expect(() => expectPublished(computed(value), row('17.40'))).toThrow('printed 17.40')
  })
})
