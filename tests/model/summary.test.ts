import { expect, test } from 'vitest'
import { summarise } from '#model/summary.ts'

test('a job in which nothing is sized has no loss, rather than a loss of nought', () => {
  const runs = [{ id: 'A', values: { lengthM: 12 }, drafts: {} }]
  expect(summarise(runs, new Map())).toMatchObject({
    runs: 1,
    sized: 0,
    lengthM: 12,
    bareLossW: null,
    laggedLossW: null,
  })
})

test('the shell of a vessel is no length of pipe', () => {
  const runs = [
    { id: 'A', values: { shape: 'pipe' as const, lengthM: 12 }, drafts: {} },
    { id: 'B', values: { shape: 'vessel' as const, lengthM: 3 }, drafts: {} },
  ]
  expect(summarise(runs, new Map()).lengthM).toBe(12)
})
