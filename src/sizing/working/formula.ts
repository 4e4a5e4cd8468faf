/**
 * The one grammar of formulas in a working: numbers, symbols, + − × / ^ ( ), the functions below and π. The power binds
 * first and from the right, then a sign, then × and /, then + and −.
 */

const functions: Readonly<Record<string, (...values: number[]) => number>> = {
  ln: (value) => Math.log(value ?? Number.NaN),
  exp: (value) => Math.exp(value ?? Number.NaN),
  sqrt: (value) => Math.sqrt(value ?? Number.NaN),
  cbrt: (value) => Math.cbrt(value ?? Number.NaN),
  abs: (value) => Math.abs(value ?? Number.NaN),
  min: Math.min,
  max: Math.max,
}

const PI_SIGN = 'π'
export const MINUS = '\u2212'

const token = /\s*(\d+(?:\.\d+)?(?:e-?\d+)?|[\p{L}][\p{L}\p{N}_]*|[+\u2212×/^(),])/uy

export function tokensOf(formula: string): string[] {
  const found: string[] = []
  token.lastIndex = 0
  while (token.lastIndex < formula.length) {
    const [, text] = token.exec(formula) ?? []
    if (text === undefined) throw new Error(`Not a formula: ${formula}`)
    found.push(text)
  }
  return found
}

const isName = (text: string): boolean => /^\p{L}/u.test(text)

export const isSymbol = (text: string): boolean =>
  isName(text) && text !== PI_SIGN && !(text in functions)

/** Symbols of a formula, each once, in the order in which they appear. */
export function symbolsOf(formula: string): string[] {
  return [...new Set(tokensOf(formula).filter(isSymbol))]
}

/** The value of a formula whose symbols stand for these numbers. */
export function evaluate(formula: string, numberFor: (symbol: string) => number): number {
  const rest = tokensOf(formula)
  const take = (text: string): boolean => {
    if (rest[0] !== text) return false
    rest.shift()
    return true
  }
  const sum = (): number => {
    let value = product()
    for (;;) {
      if (take('+')) value += product()
      else if (take(MINUS)) value -= product()
      else return value
    }
  }
  const product = (): number => {
    let value = signed()
    for (;;) {
      if (take('×')) value *= signed()
      else if (take('/')) value /= signed()
      else return value
    }
  }
  const signed = (): number => (take(MINUS) ? -signed() : power())
  const power = (): number => {
    const base = single()
    return take('^') ? base ** signed() : base
  }
  const single = (): number => {
    const text = rest.shift() ?? ''
    if (text === '(') {
      const value = sum()
      rest.shift()
      return value
    }
    const apply = functions[text]
    if (apply) {
      rest.shift()
      const values = [sum()]
      while (take(',')) values.push(sum())
      rest.shift()
      return apply(...values)
    }
    if (text === PI_SIGN) return Math.PI
    return isName(text) ? numberFor(text) : Number(text)
  }
  return sum()
}

/** The formula with numbers in place of its symbols; a sign and a power of ten go in brackets where they could be misread. */
export function withNumbers(formula: string, printedOf: (symbol: string) => string): string {
  let text = ''
  let at = 0
  const names = /[\p{L}][\p{L}\p{N}_]*/gu
  for (const { 0: name, index } of formula.matchAll(names)) {
    // The e of a power of ten is no symbol.
    const isExponent = /^e\d*$/.test(name) && /[\d.]/.test(formula[index - 1] ?? '')
    if (isExponent || !isSymbol(name)) continue
    const printed = printedOf(name)
    const isRaised = formula[index + name.length] === '^'
    const inBrackets = printed.startsWith(MINUS) || (isRaised && printed.includes('e'))
    text += formula.slice(at, index) + (inBrackets ? `(${printed})` : printed)
    at = index + name.length
  }
  return text + formula.slice(at)
}
