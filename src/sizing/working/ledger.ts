/** Builds one section: every line is put down once, and a formula may use only what stands above it. */
import { MOST_DIGITS, printNumber, readNumber, repeats, USUAL_DIGITS } from './digits.ts'
import { evaluate, symbolsOf } from './formula.ts'
import type { Figure, Section, Step, Table } from './types.ts'

interface About {
  readonly source?: string | null
  readonly validity?: string | null
}

interface Line {
  readonly words: string
  readonly symbol: string
  readonly formula: string | null
  readonly value: number
  readonly unit: string
  readonly source: string | null
  readonly validity: string | null
  digits: number
}

export class Ledger {
  readonly #title: string
  readonly #condition: string | null
  readonly #texts: string[] = []
  readonly #lines: Line[] = []
  readonly #bySymbol = new Map<string, Line>()
  #table: Table | null = null

  constructor(title: string, condition: string | null) {
    this.#title = title
    this.#condition = condition
  }

  say(text: string): void {
    this.#texts.push(text)
  }

  table(table: Table): void {
    this.#table = table
  }

  /** The value of a line above. */
  valueAt(symbol: string): number {
    return this.#line(symbol).value
  }

  /** A value that is given, comes from a section before, or was found by search. */
  given(words: string, symbol: string, value: number, unit: string, about: About = {}): number {
    return this.#add({ words, symbol, formula: null, value, unit }, about)
  }

  /** A value that follows from those above. With `value`, the program's own, which the line must come to. */
  step(
    words: string,
    symbol: string,
    formula: string,
    unit: string,
    about: About & { readonly value?: number } = {},
  ): number {
    const value = about.value ?? evaluate(formula, (name) => this.#line(name).value)
    return this.#add({ words, symbol, formula, value, unit }, about)
  }

  #add(line: Pick<Line, 'words' | 'symbol' | 'formula' | 'value' | 'unit'>, about: About): number {
    if (this.#bySymbol.has(line.symbol)) throw new Error(`${this.#title}: ${line.symbol} twice`)
    const { source = null, validity = null } = about
    // What is given stands as it was given, as far as that is short.
    const least = Math.max(USUAL_DIGITS, wholeDigits(line.value))
    const digits = line.formula === null ? Math.max(least, shortest(line.value)) : least
    const whole = { ...line, source, validity, digits }
    this.#lines.push(whole)
    this.#bySymbol.set(line.symbol, whole)
    return line.value
  }

  #line(symbol: string): Line {
    const line = this.#bySymbol.get(symbol)
    if (!line) throw new Error(`${this.#title}: ${symbol} is used before it is known`)
    return line
  }

  section(): Section {
    this.#giveDigits()
    return {
      title: this.#title,
      condition: this.#condition,
      texts: this.#texts,
      steps: this.#lines.map((line) => this.#asStep(line)),
      table: this.#table,
    }
  }

  /** Adds digits to what a line is made of until the line repeats from the page; from the end, so that all do. */
  #giveDigits(): void {
    for (let changed = true; changed; ) {
      changed = false
      for (const line of this.#lines.toReversed()) {
        while (!this.#repeats(line) && this.#addDigit(line)) changed = true
      }
    }
  }

  #repeats({ formula, value, digits }: Line): boolean {
    if (formula === null) return true
    const again = evaluate(formula, (name) => onPage(this.#line(name)))
    return repeats(again, readNumber(printNumber(value, digits)))
  }

  #addDigit({ formula }: Line): boolean {
    let added = false
    for (const symbol of symbolsOf(formula ?? '')) {
      const line = this.#line(symbol)
      if (line.digits >= MOST_DIGITS) continue
      line.digits += 1
      added = true
    }
    return added
  }

  #asStep(line: Line): Step {
    const { words, formula, source, validity } = line
    const inputs =
      formula === null ? [] : symbolsOf(formula).map((name) => figure(this.#line(name)))
    return { words, formula, inputs, source, validity, ...figure(line) }
  }
}

const figure = ({ symbol, value, digits, unit }: Line): Figure => ({
  symbol,
  value,
  printed: printNumber(value, digits),
  unit,
})

const onPage = ({ value, digits }: Line): number => readNumber(printNumber(value, digits))

/** Longer than this a given number is a result of something, not a number that somebody wrote [digits]. */
const SHORT_DIGITS = 10

function shortest(value: number): number {
  for (let digits = USUAL_DIGITS; digits <= SHORT_DIGITS; digits += 1) {
    if (Number(value.toPrecision(digits)) === value) return digits
  }
  return USUAL_DIGITS
}

/** Up to millions a whole number is printed whole: 101325, not 101330. */
const WHOLE_TO = 1e7

const wholeDigits = (value: number): number =>
  Math.abs(value) >= 1 && Math.abs(value) < WHOLE_TO
    ? Math.floor(Math.log10(Math.abs(value))) + 1
    : 0
