/** Sizes the demo list in Node before the browser tests, for the test that compares the two engines. */
import { readFileSync } from 'node:fs'
import type { TestProject } from 'vitest/node'
import { openCatalogue, readCatalogue } from '#backend/catalogue-db.ts'
import type { Catalogue } from '#catalogue/types.ts'
import type { RunValues } from '#model/fields.ts'
import { indexCatalogue, sizeRun } from '#model/size-run.ts'
import { parseRunsCsv } from '#report/runs-csv.ts'
import type { RunOutcome } from '#sizing/result.ts'

declare module 'vitest' {
  interface ProvidedContext {
    demoCatalogue: Catalogue
    demoRuns: readonly RunValues[]
    demoOutcomes: RunOutcome[]
  }
}

export function setup(project: TestProject): void {
  const db = openCatalogue(':memory:', 'db')
  const catalogue = readCatalogue(db)
  db.close()
  const parsed = parseRunsCsv(readFileSync('db/demo/harrowmere-creamery.csv'))
  if (!parsed.ok) throw new Error('The demo list cannot be read')
  const index = indexCatalogue(catalogue)
  project.provide('demoCatalogue', catalogue)
  project.provide('demoRuns', parsed.runs)
  project.provide(
    'demoOutcomes',
    parsed.runs.map((run) => sizeRun(run, {}, index)),
  )
}
