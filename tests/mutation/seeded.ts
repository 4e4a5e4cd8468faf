/**
 * Under mutation, properties try the same few cases every time: a score must not hang on luck, and most errors show in
 * the first cases. The first counterexample is enough; to look for the smallest one would take most of the hour.
 */
import type { IProperty, Parameters } from 'fast-check'
import { vi } from 'vitest'

const MOST_RUNS = 25

vi.mock('fast-check', async (importOriginal) => {
  const original = await importOriginal<typeof import('fast-check')>()
  function assert<Given>(property: IProperty<Given>, given?: Parameters<Given>): void {
    original.assert(property, {
      ...given,
      seed: given?.seed ?? original.readConfigureGlobal().seed ?? 20_260_101,
      numRuns: Math.min(given?.numRuns ?? MOST_RUNS, MOST_RUNS),
      endOnFailure: true,
    })
  }
  return { ...original, assert, default: { ...original.default, assert } }
})
