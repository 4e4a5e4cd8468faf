/** The shipped catalogue, read once for each test file. */
import { openCatalogue, readCatalogue } from '#backend/catalogue-db.ts'
import type { RunValues } from '#model/fields.ts'
import { indexCatalogue, sizeRun } from '#model/size-run.ts'
import type { Issue, Note, RunResult } from '#sizing/result.ts'

const db = openCatalogue(':memory:', 'db')
export const catalogue = readCatalogue(db)
db.close()
export const index = indexCatalogue(catalogue)

/** A run that sizes without an assumption that a test would have to think about. */
export const steamRun: RunValues = {
  tag: 'A',
  shape: 'pipe',
  size: 'DN 50',
  mediumC: 150,
  airC: 20,
  material: 'stone_wool_pipe_section',
  finish: 'al_plain',
}
export const coldRun: RunValues = {
  tag: 'C',
  shape: 'pipe',
  size: 'DN 50',
  mediumC: 5,
  airC: 27,
  humidity: 0.7,
  material: 'elastomeric_foam_nbr',
  finish: 'elastomeric_bare',
}

export function sized(values: RunValues): RunResult {
  const outcome = sizeRun(values, {}, index)
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.issues, null, 1))
  return outcome.result
}

export function refused(values: RunValues): readonly Issue[] {
  const outcome = sizeRun(values, {}, index)
  if (outcome.ok) throw new Error(`Sized: ${outcome.result.reason}`)
  return outcome.issues
}

export const refusedColumns = (values: RunValues): string[] =>
  refused(values).map(({ column }) => column)

export const noteCodes = ({ notes }: { readonly notes: readonly Note[] }): string[] =>
  notes.map(({ code }) => code)

/** A thickness as it is bought: the tests compare millimetres. */
export const mm = (metres: number | undefined): number =>
  Number(((metres ?? Number.NaN) * 1000).toFixed(3))
