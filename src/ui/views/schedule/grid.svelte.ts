/** Where one is in the schedule and what is marked; knows no element of the page. */
import type { FieldKey } from '#model/fields.ts'
import type { Run } from '#model/job.ts'
import type { TakeOff } from '#model/take-off.ts'
import type { Workspace } from '#ui/state/workspace.svelte.ts'
import { type Column, type ColumnSet, columnsOf } from './columns.ts'
import { type Item, itemsOf } from './items.ts'

interface Place {
  readonly runId: string
  readonly columnId: string
}
export interface Editing extends Place {
  readonly key: FieldKey
  /** What the field opens with: the value, or the character that was typed over it. */
  readonly text: string
}
/** Marked cells: first and last row among the visible runs, first and last column. */
export interface Extent {
  readonly top: number
  readonly bottom: number
  readonly left: number
  readonly right: number
}

export class Grid {
  readonly workspace: Workspace
  columnSet: ColumnSet = $state('sized')
  widthPx = $state(1000)
  filterText = $state('')
  onlyNeedy = $state(false)
  collapsed: ReadonlySet<string> = $state.raw(new Set())
  editing: Editing | null = $state.raw(null)
  /** What is shown beside the schedule. */
  panel: 'sheet' | 'inputs' = $state('sheet')
  /** The field that the form opens at. */
  wantedKey: FieldKey | null = $state(null)
  /** A pasted list whose columns are asked for; its cells as they were pasted. */
  asked: { readonly takeOff: TakeOff; readonly rows: readonly (readonly string[])[] } | null =
    $state.raw(null)
  /** What was last copied from here. */
  copied = ''
  #activeColumnId = $state('tag')
  #anchor: Place | null = $state.raw(null)

  readonly columns: readonly Column[] = $derived.by(() =>
    columnsOf(this.columnSet, this.widthPx, this.workspace.preferences.units),
  )
  readonly items: readonly Item[] = $derived.by(() => {
    const { session, sizing } = this.workspace
    const filter = { text: this.filterText, onlyNeedy: this.onlyNeedy }
    // Answers only move lines while they are filtered by them.
    return itemsOf(
      session.job.runs,
      this.collapsed,
      filter,
      filter.onlyNeedy ? sizing.briefs : noBriefs,
    )
  })
  /** The visible runs, top to bottom. */
  readonly rows: readonly Run[] = $derived(
    this.items.flatMap((item) => (item.kind === 'run' ? [item.run] : [])),
  )
  readonly #rowById = $derived(new Map(this.rows.map((run, row) => [run.id, row])))
  readonly activeColumn: number = $derived(
    Math.max(
      0,
      this.columns.findIndex(({ id }) => id === this.#activeColumnId),
    ),
  )
  readonly activeRow: number = $derived.by(() => this.rowOf(this.workspace.session.activeRunId))
  /** Index among the lines, group heads included, of the active run; -1 where it is not visible. */
  readonly activeItem: number = $derived.by(() =>
    this.items.findIndex(({ id }) => id === this.workspace.session.activeRunId),
  )
  readonly extent: Extent = $derived.by(() => {
    const anchorRow = this.#anchor ? this.rowOf(this.#anchor.runId) : -1
    const anchorColumn = this.columns.findIndex(({ id }) => id === this.#anchor?.columnId)
    const row = anchorRow < 0 ? this.activeRow : anchorRow
    const column = anchorColumn < 0 ? this.activeColumn : anchorColumn
    return {
      top: Math.min(row, this.activeRow),
      bottom: Math.max(row, this.activeRow),
      left: Math.min(column, this.activeColumn),
      right: Math.max(column, this.activeColumn),
    }
  })

  constructor(workspace: Workspace) {
    this.workspace = workspace
  }

  get isBlock(): boolean {
    const { top, bottom, left, right } = this.extent
    return top !== bottom || left !== right
  }

  markedRuns(): readonly Run[] {
    const { top, bottom } = this.extent
    return top < 0 ? [] : this.rows.slice(top, bottom + 1)
  }
  markedColumns(): readonly Column[] {
    return this.columns.slice(this.extent.left, this.extent.right + 1)
  }

  /** Makes a cell the active one; `isExtending` keeps the other corner of what is marked. */
  goTo(row: number, column: number, isExtending = false): void {
    const run = this.rows[Math.min(Math.max(row, 0), this.rows.length - 1)]
    const target = this.columns[Math.min(Math.max(column, 0), this.columns.length - 1)]
    if (!run || !target) return
    if (!isExtending) this.#anchor = null
    else this.#anchor ??= this.#here()
    this.workspace.session.activeRunId = run.id
    this.#activeColumnId = target.id
  }
  goToRun(runId: string, columnId: string): void {
    this.#anchor = null
    this.workspace.session.activeRunId = runId
    this.#activeColumnId = columnId
  }

  /** Marks whole lines, from the anchor's to the active one. */
  markLines(): void {
    const runId = this.#anchor?.runId ?? this.workspace.session.activeRunId
    const [first] = this.columns
    const last = this.columns.at(-1)
    if (runId === null || !first || !last) return
    this.#anchor = { runId, columnId: first.id }
    this.#activeColumnId = last.id
  }
  markAll(): void {
    const [first] = this.rows
    const last = this.rows.at(-1)
    if (!first || !last) return
    this.#anchor = { runId: first.id, columnId: '' }
    this.workspace.session.activeRunId = last.id
    this.markLines()
  }

  /** Shows only runs that need a look, or all again; what is active stays in sight. */
  toggleNeedy(): void {
    this.onlyNeedy = !this.onlyNeedy
    if (this.activeRow < 0) this.goTo(0, this.activeColumn)
  }

  toggleGroup(name: string): void {
    const next = new Set(this.collapsed)
    if (!next.delete(name)) next.add(name)
    this.collapsed = next
  }

  #here(): Place | null {
    const runId = this.workspace.session.activeRunId
    return runId === null ? null : { runId, columnId: this.#activeColumnId }
  }
  rowOf(runId: string | null): number {
    return runId === null ? -1 : (this.#rowById.get(runId) ?? -1)
  }
}

const noBriefs = new Map<string, never>()
