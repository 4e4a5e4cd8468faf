import { defineConfig } from 'vitest/config'
import { folderUnderTest, testsOf } from './folders.ts'

/** A folder's own tests have to notice its errors; those of the layers above would only hide what they miss. */
const { include, exclude } = testsOf(folderUnderTest())

export default defineConfig({
  test: {
    environment: 'node',
    testTimeout: 120_000,
    include: [...include],
    exclude: [...exclude],
    setupFiles: ['tests/mutation/seeded.ts'],
  },
})
