/** Writes every committed edit at once: one commit on the way, what changes meanwhile merged into the next. */
import { AppError, type Failure } from '#contract/failures.ts'
import type { Host, OpenJob } from '#contract/host.ts'
import { diffJob } from '#model/difference.ts'
import type { Job, Run } from '#model/job.ts'

export type SaveState =
  | { readonly kind: 'saved'; readonly at: Date | null }
  | { readonly kind: 'saving' }
  | {
      readonly kind: 'failed'
      readonly sentence: string
      /** Null where it is no failure that was foreseen. */
      readonly code: Failure['code'] | null
    }

export class Saving {
  state: SaveState = $state.raw({ kind: 'saved', at: null })
  readonly #commit: Host['job.commit']
  readonly #current: () => Job
  #written: Job
  #revision: number
  #opening: string
  /** The last of the work under way; new work waits for it. */
  #work: Promise<void> = Promise.resolve()
  #isQueued = false

  constructor(commit: Host['job.commit'], open: OpenJob, current: () => Job) {
    this.#commit = commit
    this.#current = current
    this.#written = open.job
    this.#revision = open.revision
    this.#opening = open.opening
  }

  /** Which opening of a job this writes to. */
  get opening(): string {
    return this.#opening
  }

  /** Whether anything is not in the file yet. */
  get isBehind(): boolean {
    return this.#written !== this.#current()
  }

  /** The runs that are new or changed since the last write. */
  unsavedRuns(): readonly Run[] {
    return diffJob(this.#written, this.#current())?.putRuns ?? []
  }

  /** The job may have changed: write what is new. After a failure this is also the next try. */
  kick(): void {
    if (this.#isQueued) return
    if (!this.isBehind) {
      this.#forgetFailure()
      return
    }
    this.#isQueued = true
    this.#enqueue(() => this.#write()).catch(() => {})
  }

  /** Waits until all is written; false if it could not be. */
  async settle(): Promise<boolean> {
    this.kick()
    await this.#work
    return !this.isBehind
  }

  /** Does something to the file while nothing else is written. */
  exclusively<T>(act: () => Promise<T>): Promise<T> {
    return this.#enqueue(act)
  }

  /** From now on this is what the file holds; `job` is the window's own copy of it. */
  startFrom(open: OpenJob, job: Job): void {
    this.#written = job
    this.#revision = open.revision
    this.#opening = open.opening
    this.state = { kind: 'saved', at: null }
  }

  async #write(): Promise<void> {
    this.#isQueued = false
    const job = this.#current()
    const difference = diffJob(this.#written, job)
    if (!difference) {
      this.#written = job
      this.#forgetFailure()
      return
    }
    this.state = { kind: 'saving' }
    try {
      const { revision, savedAt } = await this.#commit({
        opening: this.#opening,
        revision: this.#revision,
        ...difference,
      })
      this.#revision = revision
      this.#written = job
      this.state = { kind: 'saved', at: new Date(savedAt) }
      this.kick()
    } catch (error) {
      this.state = {
        kind: 'failed',
        sentence: error instanceof Error ? error.message : String(error),
        code: error instanceof AppError ? error.failure.code : null,
      }
    }
  }

  /** Undo may take back what could not be written: then the file holds all there is. */
  #forgetFailure(): void {
    if (this.state.kind === 'failed') this.state = { kind: 'saved', at: null }
  }

  #enqueue<T>(act: () => Promise<T>): Promise<T> {
    const done = this.#work.then(act)
    this.#work = done.then(
      () => {},
      () => {},
    )
    return done
  }
}
