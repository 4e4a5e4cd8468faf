/** Which runs are to be computed next. Knows no worker. */
import type { RunValues } from '#model/fields.ts'
import type { RunToSize } from './protocol.ts'

/** Some milliseconds of work: small enough that an edit never waits long behind it. */
const chunkSize = 48

export class SizingQueue {
  /** What every run was last wanted as; values are immutable, so their identity is their version. */
  readonly #wanted = new Map<string, RunValues>()
  readonly #urgent = new Map<string, RunValues>()
  readonly #pending = new Map<string, RunValues>()
  /** Runs that were on the way when a worker died: computed alone. */
  readonly #suspects = new Map<string, RunValues>()
  readonly #out = new Map<string, RunValues>()
  #defaults: RunValues = {}

  get defaults(): RunValues {
    return this.#defaults
  }

  get waiting(): number {
    return this.#urgent.size + this.#pending.size + this.#suspects.size + this.#out.size
  }

  want(runs: Iterable<RunToSize>, defaults: RunValues): void {
    if (defaults !== this.#defaults) {
      this.#defaults = defaults
      this.#wanted.clear()
    }
    const changed: RunToSize[] = []
    const present = new Set<string>()
    for (const run of runs) {
      present.add(run.id)
      if (this.#wanted.get(run.id) !== run.values) changed.push(run)
    }
    for (const id of this.#wanted.keys()) if (!present.has(id)) this.#drop(id)
    const lane = changed.length <= chunkSize ? this.#urgent : this.#pending
    for (const { id, values } of changed) {
      this.#drop(id)
      this.#wanted.set(id, values)
      lane.set(id, values)
    }
  }

  /** How many chunks may be on the way: one alone while a suspect is looked for. */
  allowedOut(usual: number): number {
    return this.#suspects.size > 0 ? 1 : usual
  }

  take(): readonly RunToSize[] {
    if (this.#suspects.size > 0) return this.#takeFrom(this.#suspects, 1)
    return this.#takeFrom(this.#urgent.size > 0 ? this.#urgent : this.#pending, chunkSize)
  }

  /** The runs of an answered chunk whose answer is still wanted. */
  settle(runs: readonly RunToSize[]): ReadonlySet<string> {
    for (const { id, values } of runs) if (this.#out.get(id) === values) this.#out.delete(id)
    return new Set(runs.filter(({ id, values }) => this.#isWanted(id, values)).map(({ id }) => id))
  }

  /** Takes back the runs of a lost chunk. Returns those that were alone in it: they are to blame. */
  suspect(runs: readonly RunToSize[]): readonly string[] {
    for (const { id } of runs) this.#out.delete(id)
    const still = runs.filter(({ id, values }) => this.#isWanted(id, values))
    if (runs.length === 1) return still.map(({ id }) => id)
    for (const { id, values } of still) this.#suspects.set(id, values)
    return []
  }

  #isWanted(id: string, values: RunValues): boolean {
    const isAsked = this.#urgent.has(id) || this.#pending.has(id) || this.#suspects.has(id)
    return this.#wanted.get(id) === values && !isAsked
  }

  #drop(id: string): void {
    this.#wanted.delete(id)
    this.#urgent.delete(id)
    this.#pending.delete(id)
    this.#suspects.delete(id)
  }

  #takeFrom(lane: Map<string, RunValues>, count: number): readonly RunToSize[] {
    const runs: RunToSize[] = []
    for (const [id, values] of lane) {
      if (runs.length === count) break
      runs.push({ id, values })
      lane.delete(id)
      this.#out.set(id, values)
    }
    return runs
  }
}
