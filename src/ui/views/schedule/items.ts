/** The lines of the schedule as they stand under each other: runs under the head of their service. */
import type { Run } from '#model/job.ts'
import type { RunBrief } from '#model/run-brief.ts'

export interface GroupItem {
  readonly kind: 'group'
  readonly id: string
  readonly name: string
  readonly runs: readonly Run[]
  readonly isOpen: boolean
}
export interface RunItem {
  readonly kind: 'run'
  readonly id: string
  readonly run: Run
}
export type Item = GroupItem | RunItem

export interface Filter {
  readonly text: string
  /** Only runs that need a look. */
  readonly onlyNeedy: boolean
}

export function itemsOf(
  runs: readonly Run[],
  collapsed: ReadonlySet<string>,
  filter: Filter,
  briefs: ReadonlyMap<string, RunBrief>,
): readonly Item[] {
  const shown = filtered(runs, filter, briefs)
  const groups = Map.groupBy(shown, (run) => run.values.service ?? '')
  // A job without services needs no heads.
  if (groups.size === 1 && groups.has('')) return shown.map(runItem)
  return [...groups].flatMap(([name, members]): Item[] => {
    const isOpen = !collapsed.has(name)
    const head: GroupItem = { kind: 'group', id: `group ${name}`, name, runs: members, isOpen }
    return isOpen ? [head, ...members.map(runItem)] : [head]
  })
}

const runItem = (run: Run): RunItem => ({ kind: 'run', id: run.id, run })

function filtered(
  runs: readonly Run[],
  { text, onlyNeedy }: Filter,
  briefs: ReadonlyMap<string, RunBrief>,
): readonly Run[] {
  const words = text.toLowerCase().split(/\s+/).filter(Boolean)
  if (words.length === 0 && !onlyNeedy) return runs
  return runs.filter((run) => {
    if (onlyNeedy && briefs.get(run.id)?.state === 'passes') return false
    const { tag, description, size, place, service } = run.values
    const line = [tag, description, size, place, service].join(' ').toLowerCase()
    return words.every((word) => line.includes(word))
  })
}

/** Hours a year that all runs of a group share; null where they differ or none has any. */
export function sharedHours(runs: readonly Run[]): number | null {
  const [first] = runs
  const hours = first?.values.hoursPerYear
  return hours !== undefined && runs.every((run) => run.values.hoursPerYear === hours)
    ? hours
    : null
}
