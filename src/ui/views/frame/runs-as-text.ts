/** Runs for the clipboard with the names of their columns on top, in SI units: to be pasted into another schedule. */
import { formatCell } from '#model/cell.ts'
import { fields } from '#model/fields.ts'
import type { Run } from '#model/job.ts'
import { writeTsv } from '#ui/views/schedule/tsv.ts'

export function runsAsText(runs: readonly Run[]): string {
  const used = fields.filter(
    ({ key }) =>
      key === 'tag' ||
      key === 'shape' ||
      runs.some(({ values, drafts }) => values[key] !== undefined || drafts[key] !== undefined),
  )
  const rows = runs.map(({ values, drafts }) =>
    used.map((field) => drafts[field.key] ?? formatCell(field, values[field.key])),
  )
  return writeTsv([used.map(({ column }) => column), ...rows])
}
