/** The one open job: its history, where it lives, and what is selected in it. */
import type { OpenJob } from '#contract/host.ts'
import type { Job, Run } from '#model/job.ts'
import { History } from './history.svelte.ts'

/** What changed: the job, which job it is, or only which of its runs is the active one. */
export type Changed = 'job' | 'other job' | 'active run'

type Change<A extends readonly unknown[]> = (job: Job, ...args: A) => Job

export class Session {
  #history: History<Job> = $state.raw() as History<Job>
  #activeRunId: string | null = $state(null)
  path: string | null = $state(null)
  fileName: string | null = $state(null)
  /** Counts the jobs opened, so that views can start afresh with each. */
  opened = $state(0)
  readonly #changed: (what: Changed) => void
  readonly activeRun: Run | null = $derived.by(
    () => this.job.runs.find((run) => run.id === this.#activeRunId) ?? null,
  )

  /** `changed` is told after every change. */
  constructor(open: OpenJob, changed: (what: Changed) => void) {
    this.#changed = changed
    this.#take(open)
  }

  get job(): Job {
    return this.#history.present
  }
  get canUndo(): boolean {
    return this.#history.canUndo
  }
  get canRedo(): boolean {
    return this.#history.canRedo
  }
  get activeRunId(): string | null {
    return this.#activeRunId
  }
  set activeRunId(id: string | null) {
    if (id === this.#activeRunId) return
    this.#activeRunId = id
    this.#changed('active run')
  }

  /** Applies one edit as one step that undo takes back. */
  edit<A extends readonly unknown[]>(change: Change<A>, ...args: A): void {
    this.#history.push(change(this.job, ...args))
    this.#changed('job')
  }

  /** Applies an edit that carries on the step of the same name, as while a field is typed in. */
  amend<A extends readonly unknown[]>(step: string, change: Change<A>, ...args: A): void {
    this.#history.push(change(this.job, ...args), step)
    this.#changed('job')
  }
  closeStep(): void {
    this.#history.closeStep()
  }

  undo(): void {
    this.#history.undo()
    this.#changed('job')
  }
  redo(): void {
    this.#history.redo()
    this.#changed('job')
  }

  /** Another job takes the place of this one; its history begins anew. */
  replace(open: OpenJob): void {
    this.#take(open)
    this.#changed('other job')
  }

  /** The same job, in another file. */
  movedTo({ path, fileName }: OpenJob): void {
    this.path = path
    this.fileName = fileName
  }

  #take(open: OpenJob): void {
    this.#history = new History(open.job)
    this.#activeRunId = open.job.runs[0]?.id ?? null
    this.opened++
    this.movedTo(open)
  }
}
