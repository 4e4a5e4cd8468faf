/** Undo is a reference to an earlier value: values are immutable and share what did not change. */

/** Steps back that are kept; more than anyone retraces, and bounded in memory. */
const longestPast = 300

export class History<T> {
  #present: T = $state.raw() as T
  #past: readonly T[] = $state.raw([])
  #future: readonly T[] = $state.raw([])
  /** The step that is still being made, e.g. a field that is typed in; null once it is closed. */
  #openStep: string | null = null

  constructor(present: T) {
    this.#present = present
  }

  get present(): T {
    return this.#present
  }
  get canUndo(): boolean {
    return this.#past.length > 0
  }
  get canRedo(): boolean {
    return this.#future.length > 0
  }

  /** One more step; or the same step carried on, if it was opened under the same name and not closed since. */
  push(next: T, step: string | null = null): void {
    if (Object.is(next, this.#present)) return
    const carriesOn = step !== null && step === this.#openStep
    if (!carriesOn) this.#past = [...this.#past.slice(1 - longestPast), this.#present]
    this.#openStep = step
    this.#present = next
    this.#future = []
  }

  closeStep(): void {
    this.#openStep = null
  }

  undo(): void {
    const previous = this.#past.at(-1)
    if (previous === undefined) return
    this.#future = [this.#present, ...this.#future]
    this.#past = this.#past.slice(0, -1)
    this.#present = previous
    this.#openStep = null
  }

  redo(): void {
    const [next, ...rest] = this.#future
    if (next === undefined) return
    this.#past = [...this.#past, this.#present]
    this.#future = rest
    this.#present = next
    this.#openStep = null
  }
}
