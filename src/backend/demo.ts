import { randomUUID } from 'node:crypto'
import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import type { Job } from '#model/job.ts'
import { parseRunsCsv, sentence } from '#report/runs-csv.ts'

/** The demo job: an invented dairy and its boiler house. */
export function demoJob(dbFolder: string): Job {
  const file = join(dbFolder, 'demo', 'harrowmere-creamery.csv')
  const read = parseRunsCsv(readFileSync(file))
  if (!read.ok) throw new Error(`The demo does not read: ${read.issues.map(sentence).join(' ')}`)
  return {
    name: 'Harrowmere Creamery',
    site: 'Dairy and boiler house (invented)',
    defaults: {},
    runs: read.runs.map((values) => ({ id: randomUUID(), values, drafts: {} })),
  }
}
