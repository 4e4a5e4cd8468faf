/**
 * Under mutation, properties try the same few cases every time: a score must not hang on luck, and most errors show in
 * the first cases. The first counterexample is enough; to look for the smallest one would take most of the hour.
 */
import type { Arbitrary, IProperty, Parameters } from 'fast-check'
import { vi } from 'vitest'

const MOST_RUNS = 25
/** Enough for a share of 99 of 100 to mean something. */
const MOST_SAMPLES = 400

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
  function sample<Given>(arbitrary: Arbitrary<Given>, count = 10): Given[] {
    return original.sample(arbitrary, Math.min(count, MOST_SAMPLES))
  }
  const fewer = { assert, sample }
  return { ...original, ...fewer, default: { ...original.default, ...fewer } }
})
