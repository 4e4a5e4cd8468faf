/** The committed table of printed figures: kept current by the full run, renewed by `npm run published`. */
import { readFile, writeFile } from 'node:fs/promises'
import { join } from 'node:path'
import { render } from './render.ts'
import { rowsOf } from './rows.ts'

const NAME = 'tests/published/REPORT.md'
const file = join(import.meta.dirname, 'REPORT.md')

/** What is wrong with the committed table beside what the tests just found, or null. */
export async function faultOf(testReport: unknown): Promise<string | null> {
  const made = pageOf(testReport)
  if ('fault' in made) return made.fault
  const committed = await readFile(file, 'utf8').catch(() => null)
  if (committed === made.page) return null
  return `${NAME} is not what the tests find now${firstDifference(committed ?? '', made.page)}. Renew it: npm run published`
}

/** Writes what the tests just found; what went wrong, or null. */
export async function renew(testReport: unknown): Promise<string | null> {
  const made = pageOf(testReport)
  if ('fault' in made) return made.fault
  await writeFile(file, made.page)
  return null
}

function pageOf(testReport: unknown): { page: string } | { fault: string } {
  const rows = rowsOf(testReport)
  if (!rows) return { fault: 'The tests left no report to make the table of printed figures from.' }
  const made = render(rows)
  if ('page' in made) return made
  return {
    fault:
      `No work in tests/published/works.ts begins like: ${made.unknown.join('; ')}. ` +
      'Begin the row as its work is written there, or add the work.',
  }
}

function firstDifference(committed: string, made: string): string {
  const [before, now] = [committed.split('\n'), made.split('\n')]
  const at = now.findIndex((line, index) => line !== before[index])
  return at < 0 ? '' : `: line ${at + 1} would be "${now[at]}"`
}
