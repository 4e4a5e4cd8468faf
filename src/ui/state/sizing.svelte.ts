/** The answers as they arrive from the worker: a brief for every run, all about the active one. */
import type { Catalogue } from '#catalogue/types.ts'
import type { RunValues } from '#model/fields.ts'
import type { Job, Run } from '#model/job.ts'
import { doubledTags, localIssues } from '#model/local-issues.ts'
import type { RunBrief } from '#model/run-brief.ts'
import { SizingClient, type WorkerLike } from '#worker/client.ts'
import type { RunToSize, Sheet } from '#worker/protocol.ts'

export class Sizing {
  readonly #briefs = new Map<string, RunBrief>()
  /** Runs that cannot be computed, as their briefs were made for. */
  readonly #unsound = new Map<string, { readonly run: Run; readonly isDoubled: boolean }>()
  #doubled: ReadonlySet<string> = new Set()
  readonly #client: SizingClient
  #version = $state(0)
  #sheet: (Sheet & { readonly values: RunValues }) | null = $state.raw(null)
  #asked: { readonly values: RunValues; readonly defaults: RunValues } | null = null
  /** Runs without an answer to their present values. */
  waiting = $state(0)
  /** Said once the worker had to be started again; null when put away. */
  trouble: string | null = $state(null)

  constructor(start: () => WorkerLike, catalogue: Catalogue) {
    this.#client = new SizingClient(start, catalogue, {
      briefs: (briefs) => this.#take(briefs),
      sheet: (values, sheet) => {
        // What was asked for meanwhile follows.
        if (values === this.#asked?.values) this.#sheet = { values, ...sheet }
      },
      restarted: () => {
        this.trouble =
          'A calculation stopped and was started again. Nothing you typed is lost; a run that cannot be calculated says so.'
      },
    })
  }

  /** Read again whenever an answer arrives. */
  get briefs(): ReadonlyMap<string, RunBrief> {
    void this.#version
    return this.#briefs
  }

  /** All about the active run, with the values it belongs to: for a moment after an edit still those before. */
  get sheet(): (Sheet & { readonly values: RunValues }) | null {
    return this.#sheet
  }

  /** Another job follows. Its runs may go by the same names, as in a copy of this one. */
  forget(): void {
    this.#briefs.clear()
    this.#unsound.clear()
    this.#sheet = null
    this.#asked = null
    this.#client.size([], {})
  }

  /** Tells what the job and the active run are now. */
  update(job: Job, active: Run | null): void {
    this.#doubled = doubledTags(job.runs)
    const present = new Set(job.runs.map((run) => run.id))
    for (const id of this.#briefs.keys()) {
      if (present.has(id)) continue
      this.#briefs.delete(id)
      this.#unsound.delete(id)
    }
    this.#client.size(this.#soundRuns(job.runs), job.defaults)
    this.look(job, active)
    this.waiting = this.#client.waiting
    this.#version++
  }

  /** Tells which run is the active one. */
  look(job: Job, active: Run | null): void {
    if (!active) {
      this.#sheet = null
      this.#asked = null
      return
    }
    const { values } = active
    const issues = localIssues(active, this.#doubled)
    if (issues.length > 0) {
      this.#sheet = { values, outcome: { ok: false, issues }, detail: null }
      this.#asked = null
      return
    }
    if (this.#asked?.values === values && this.#asked.defaults === job.defaults) return
    this.#asked = { values, defaults: job.defaults }
    this.#client.askSheet(values, job.defaults)
  }

  stop(): void {
    this.#client.stop()
  }

  /** Runs with something wrong are not computed: leaving a cell out would give a wrong answer. */
  *#soundRuns(runs: readonly Run[]): Generator<RunToSize> {
    for (const run of runs) {
      const issues = localIssues(run, this.#doubled)
      if (issues.length === 0) {
        yield run
        continue
      }
      const isDoubled = this.#doubled.has(run.values.tag ?? '')
      const known = this.#unsound.get(run.id)
      if (known?.run === run && known.isDoubled === isDoubled) continue
      this.#unsound.set(run.id, { run, isDoubled })
      this.#briefs.set(run.id, { ok: false, state: 'fails', issues })
    }
  }

  #take(briefs: readonly (readonly [string, RunBrief])[]): void {
    for (const [id, brief] of briefs) {
      this.#unsound.delete(id)
      this.#briefs.set(id, brief)
    }
    this.waiting = this.#client.waiting
    this.#version++
  }
}
