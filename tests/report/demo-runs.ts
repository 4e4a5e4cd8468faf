/** The demo list, sized with the real engine on the shipped catalogue. */
import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import { openCatalogue, readCatalogue } from '#backend/catalogue-db.ts'
import { indexCatalogue, sizeRun } from '#model/size-run.ts'
import type { SizedRun } from '#report/run-words.ts'
import { parseRunsCsv } from '#report/runs-csv.ts'

const db = join(import.meta.dirname, '../../db')
export const demoFile = join(db, 'demo/harrowmere-creamery.csv')

export function sizedDemo(): readonly SizedRun[] {
  const read = parseRunsCsv(readFileSync(demoFile))
  if (!read.ok) throw new Error('The demo list has problems')
  const catalogue = openCatalogue(':memory:', db)
  const index = indexCatalogue(readCatalogue(catalogue))
  catalogue.close()
  return read.runs.map((values) => {
    const outcome = sizeRun(values, {}, index)
    if (!outcome.ok) throw new Error(`${values.tag}: ${JSON.stringify(outcome.issues)}`)
    return { values, result: outcome.result }
  })
}
