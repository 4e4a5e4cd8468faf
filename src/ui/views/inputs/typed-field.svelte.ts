/** A field while it is typed in: what is valid takes effect after a short rest, anything at all when it is left. */

const restMs = 200

export interface FieldLink {
  /** The text that belongs to the value held. */
  readonly standing: () => string
  /** The first character is typed: what it belongs to is settled now. */
  readonly open: () => void
  readonly isValid: (text: string) => boolean
  readonly commit: (text: string) => void
  /** The field was left: what was typed is one step. */
  readonly close: () => void
}

export class TypedField {
  readonly #link: FieldLink
  #typed: string | null = $state(null)
  /** What took effect last. Asked of the link it could be that of another run, which is shown next. */
  #taken = ''
  #timer: ReturnType<typeof setTimeout> | undefined

  constructor(link: FieldLink) {
    this.#link = link
  }

  get text(): string {
    return this.#typed ?? this.#link.standing()
  }

  type(text: string): void {
    if (this.#typed === null) {
      this.#link.open()
      this.#taken = this.#link.standing()
    }
    this.#typed = text
    clearTimeout(this.#timer)
    // Half a number is no mistake yet.
    this.#timer = setTimeout(() => this.#link.isValid(text) && this.#take(), restMs)
  }

  leave(): void {
    clearTimeout(this.#timer)
    if (this.#typed === null) return
    this.#take()
    this.#typed = null
    this.#link.close()
  }

  forget(): void {
    clearTimeout(this.#timer)
    this.#typed = null
  }

  #take(): void {
    if (this.#typed === null || this.#typed === this.#taken) return
    this.#taken = this.#typed
    this.#link.commit(this.#typed)
  }
}
