import { defineConfig } from 'vitest/config'
import { FastFirst } from './fast-first.ts'
import { partUnderTest } from './folders.ts'

/** A folder's own tests have to notice its errors; those of the layers above would only hide what they miss. */
const { tests } = partUnderTest()

export default defineConfig({
  test: {
    environment: 'node',
    testTimeout: 120_000,
    include: tests.map((glob) => `tests/${glob}`),
    setupFiles: ['tests/mutation/seeded.ts'],
    // All files of one mutant in one thread, and a new thread for the next mutant: what a module holds is never older
    // than the mutant.
    isolate: false,
    sequence: { sequencer: FastFirst },
  },
})
