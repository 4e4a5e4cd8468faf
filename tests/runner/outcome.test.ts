import { describe, expect, test } from 'vitest'
import { judged, notRun, total } from './outcome.ts'

describe('a runner', () => {
  test('is taken at its word', () => {
    expect(judged('tests', 0, { passed: 7, failed: 0, skipped: 0 })).toMatchObject({
      passed: 7,
      failed: 0,
    })
    expect(judged('tests', 1, { passed: 5, failed: 2, skipped: 0 })).toMatchObject({
      passed: 5,
      failed: 2,
    })
  })

  test('that ends with an error although all its tests passed has failed once', () => {
    expect(judged('tests', 1, { passed: 7, failed: 0, skipped: 0 }).failed).toBe(1)
  })

  test('that left no report has failed, whatever its exit code says of it', () => {
    expect(judged('tests', 127, null)).toMatchObject({ passed: 0, failed: 1 })
    expect(judged('tests', 0, null)).toMatchObject({ passed: 0, failed: 1 })
  })

  test('shows what its tests skipped', () => {
    expect(judged('tests', 0, { passed: 1, failed: 0, skipped: 3 }).notRun).toBe(3)
  })
})

test('what was not run is neither passed nor failed', () => {
  const outcomes = [
    judged('one', 0, { passed: 2, failed: 0, skipped: 0 }),
    judged('two', 1, { passed: 3, failed: 1, skipped: 0 }),
    notRun('three', 9, 'no browser'),
  ]
  expect(total(outcomes)).toEqual({ passed: 5, failed: 1 })
})
