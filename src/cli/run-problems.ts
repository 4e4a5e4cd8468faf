/** Everything that keeps runs from being sized, found without sizing any. */
import { type FieldKey, fieldOf, type RunValues } from '#model/fields.ts'
import { resolve } from '#model/resolve/resolve.ts'
import { isMissing } from '#model/run-brief.ts'
import { type CatalogueIndex, withDefaults } from '#model/size-run.ts'
import { type ReadList, sentence } from '#report/runs-csv.ts'
import type { Issue } from '#sizing/result.ts'
import type { InputRun, Problem, ReadInput } from './input.ts'

type Header = ReadList['header']
interface RunIssue {
  readonly run: InputRun
  readonly issue: Issue
}

/** Those of reading the input and those of putting its runs together, in the order of the input. */
export function allProblems(
  { runs, header, problems }: ReadInput,
  defaults: RunValues,
  index: CatalogueIndex,
): readonly string[] {
  const found = runs.flatMap((run) =>
    issuesOf(run, defaults, index)
      .filter((issue) => header?.isWhole !== false || !isMissed(issue))
      .map((issue) => ({ run, issue })),
  )
  const shared = header ? sharedIssues(found, runs, header) : new Map<string, Problem>()
  const single = found
    .filter(({ issue }) => !shared.has(keyOf(issue)))
    .map(({ run, issue }): Problem => ({ at: run.at, text: run.problem(issue) }))
  return [...problems, ...shared.values(), ...single]
    .sort((a, b) => a.at - b.at)
    .map(({ text }) => text)
}

/** What is wrong with a run besides the fields that have their problem already, and what may only follow from those. */
function issuesOf(run: InputRun, defaults: RunValues, index: CatalogueIndex): readonly Issue[] {
  const { faulty } = run
  const given = Object.entries(defaults).filter(([key]) => !faulty.has(key as FieldKey))
  const resolved = resolve(withDefaults(run.values, Object.fromEntries(given)), index)
  if (resolved.ok) return []
  const known = new Set([...faulty].map((key) => fieldOf(key).column))
  return resolved.issues.filter(
    (issue) => !known.has(issue.column) && !(isMissed(issue) && mayFollow(issue, faulty)),
  )
}

/** A value that is not there, or nothing to size by. */
function isMissed(issue: Issue): boolean {
  return isMissing(issue) || issue.column === 'reach'
}

/** What else, given but not readable, may have been meant to make a value needless; anything where none is named. */
const instead: Readonly<Record<string, readonly FieldKey[]>> = {
  shape: [],
  air_c: [],
  medium_c: ['pressureGaugePa'],
  size: ['outerDiameterM'],
  width_mm: ['size'],
  height_mm: ['size'],
  material: ['conductivityWPerMK', 'layers', 'thicknessM'],
  rise_m: ['lengthM'],
  reach_reason: [],
}

function mayFollow({ column }: Issue, faulty: ReadonlySet<FieldKey>): boolean {
  const others = instead[column]
  return others ? others.some((key) => faulty.has(key)) : [...faulty].some((key) => key !== 'tag')
}

/** What all runs lack for want of a column is said of the header, once. */
function sharedIssues(
  found: readonly RunIssue[],
  runs: readonly InputRun[],
  header: Header,
): ReadonlyMap<string, Problem> {
  const having = Map.groupBy(found, ({ issue }) => keyOf(issue))
  const columns = new Set([...header.keys].map((key) => fieldOf(key).column))
  const shared = new Map<string, Problem>()
  for (const [key, rows] of having) {
    const [first] = rows
    if (!first || columns.has(first.issue.column)) continue
    const whole = new Set(rows.map(({ run }) => run))
    if (!runs.every((run) => whole.has(run) || run.faulty.size > 0)) continue
    const text = sentence({
      row: header.row,
      ...first.issue,
      ...(first.issue.found === 'nothing' && { found: 'no such column' }),
    })
    shared.set(key, { at: header.row, text })
  }
  return shared
}

const keyOf = ({ column, found, allowed }: Issue): string =>
  JSON.stringify([column, found, allowed])
