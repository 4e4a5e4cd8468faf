/** Whatever can be sized has details, all of their figures finite, the same each time. */
import fc from 'fast-check'
import { expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import { detailRun, sizeRun } from '#model/size-run.ts'
import { index } from '../sizing/catalogue.ts'
import { usualValues } from './any-values.ts'

/** What has to name a row or fit other values: left out, so that most runs are sized. */
const named = [
  'monthlyAirC',
  'codeTable',
  'buryDepthM',
  'flowKgPerS',
  'maxDropK',
  'heads',
  'frostHours',
] as const

const withoutNamed = (values: RunValues): RunValues => {
  const kept = { ...values }
  for (const key of named) delete kept[key]
  return kept
}

test('sensitivity and survey of any run', () => {
  let sized = 0
  fc.assert(
    fc.property(usualValues.map(withoutNamed), (values) => {
      const detail = detailRun(values, {}, index)
      const outcome = sizeRun(values, {}, index)
      expect(detail !== null).toBe(outcome.ok)
      if (!detail || !outcome.ok) return
      sized += 1
      // Nothing is undefined and every number is finite.
      for (const made of [detail, outcome.result.survey]) {
        const text = JSON.stringify(made, (_, value: unknown) =>
          typeof value === 'number' && !Number.isFinite(value) ? `not finite: ${value}` : value,
        )
        expect(text).not.toContain('not finite')
      }
      expect(detailRun(values, {}, index)).toEqual(detail)
    }),
    { seed: 4, numRuns: 250 },
  )
  expect(sized).toBeGreaterThan(60)
})
