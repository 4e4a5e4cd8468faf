/** The working of any run that can be sized: it is made, it is finite, and it repeats from the page. */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import { workRun } from '#model/size-run.ts'
import { workingSchema, writeWorkingJson } from '#report/working-schema.ts'
import { writeWorkingText } from '#report/working-text.ts'
import { anyValues, usualValues } from '../model/any-values.ts'
import { index } from '../sizing/catalogue.ts'
import { inexact, repeated } from './repeated.ts'
import { readPage } from './working-page.ts'

/** A tag and a currency that could be mistaken for lines would mislead the reader of the test, not of the page. */
const readable = (values: RunValues): RunValues => ({ ...values, tag: 'T', currency: 'EUR' })

function check(values: RunValues): boolean {
  const working = workRun(readable(values), {}, index)
  if (!working) return false
  workingSchema.parse(JSON.parse(writeWorkingJson(working)))
  const sections = readPage(writeWorkingText(working))
  expect(sections.flatMap((section) => repeated(section).wrong)).toEqual([])
  // A balance is found by search, and a drop of next to nothing shows how near.
  const wrong = working.sections.flatMap(inexact).filter((line) => !line.includes(': q_L = '))
  expect(wrong).toEqual([])
  return true
}

describe('the working of any run', () => {
  test('repeats from the page', () => {
    let worked = 0
    fc.assert(
      fc.property(usualValues, (values) => {
        if (check(values)) worked += 1
      }),
      { seed: 7, numRuns: 250 },
    )
    expect(worked).toBeGreaterThan(60)
  })

  test('so does that of nonsense that happens to be a run', () => {
    fc.assert(
      fc.property(anyValues, (values) => {
        check(values)
      }),
      { seed: 8, numRuns: 500 },
    )
  })
})
