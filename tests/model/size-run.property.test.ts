import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { fields, type RunValues } from '#model/fields.ts'
import { runValuesSchema } from '#model/job.ts'
import { detailRun, sizeRun } from '#model/size-run.ts'
import { index } from '../sizing/catalogue.ts'
import { anyValues, usualValues } from './any-values.ts'

const columns = new Set<string>(fields.map(({ column }) => column))

/** Every number of an outcome is finite; said by its path. */
function unfinished(value: unknown, path = ''): string[] {
  if (typeof value === 'number') return Number.isFinite(value) ? [] : [`${path} is ${value}`]
  if (typeof value === 'string')
    return /NaN|Infinity|undefined/.test(value) ? [`${path}: ${value}`] : []
  if (value === null || typeof value !== 'object') return value === undefined ? [path] : []
  return Object.entries(value).flatMap(([key, inner]) => unfinished(inner, `${path}.${key}`))
}

function check(values: RunValues): void {
  const outcome = sizeRun(values, {}, index)
  if (!outcome.ok) {
    expect(outcome.issues.length).toBeGreaterThan(0)
    for (const { column, found, allowed } of outcome.issues) {
      expect(columns).toContain(column)
      expect(found.length).toBeGreaterThan(0)
      expect(allowed.length).toBeGreaterThan(0)
    }
    return
  }
  expect(unfinished({ ...outcome.result, tag: '' })).toEqual([])
  // Nothing is undefined and every number is finite, so that text and text again say the whole; a zero has no sign.
  const text = JSON.stringify(outcome)
  expect(JSON.stringify(JSON.parse(text))).toBe(text)
  expect(JSON.stringify(sizeRun(values, {}, index))).toBe(text)
}

describe('sizing any run that the schema accepts', () => {
  test('the made values are values of the schema', () => {
    fc.assert(
      fc.property(fc.oneof(anyValues, usualValues), (values) => {
        expect(runValuesSchema.safeParse(values).success).toBe(true)
      }),
      { seed: 5, numRuns: 300 },
    )
  })

  test('nonsense gives issues or a finite result, the same each time, and survives JSON', () => {
    fc.assert(fc.property(anyValues, check), { seed: 1, numRuns: 1500 })
  })

  test('so do runs that can be sized, and most of them are', () => {
    let sized = 0
    fc.assert(
      fc.property(usualValues, (values) => {
        check(values)
        if (sizeRun(values, {}, index).ok) sized += 1
      }),
      { seed: 2, numRuns: 600 },
    )
    expect(sized).toBeGreaterThan(200)
  })

  test('the exact ends are finite thicknesses up to 600 mm, or null', () => {
    fc.assert(
      fc.property(usualValues, (values) => {
        for (const { fromM } of detailRun(values, {}, index)?.ends ?? []) {
          if (fromM === null) continue
          expect(fromM).toBeGreaterThanOrEqual(0)
          expect(fromM).toBeLessThanOrEqual(0.6)
        }
      }),
      { seed: 3, numRuns: 150 },
    )
  })

  test('defaults of the job fill what a run leaves out, and nothing of it', () => {
    const own: RunValues = { tag: 'A', shape: 'pipe', size: 'DN 50', mediumC: 150 }
    const rest: RunValues = { airC: 20, material: 'stone_wool_pipe_section', mediumC: 90 }
    expect(sizeRun(own, rest, index)).toEqual(sizeRun({ ...rest, ...own }, {}, index))
  })
})
