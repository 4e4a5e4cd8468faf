/**
 * A pocket calculator for printed formulas: knows nothing of the program, only the signs on the page. Shunting-yard
 * (Dijkstra 1961) to reverse Polish, then a stack.
 */

const binary: Readonly<Record<string, { rank: number; apply: (a: number, b: number) => number }>> =
  {
    '+': { rank: 1, apply: (a, b) => a + b },
    '−': { rank: 1, apply: (a, b) => a - b },
    '×': { rank: 2, apply: (a, b) => a * b },
    '/': { rank: 2, apply: (a, b) => a / b },
    '^': { rank: 4, apply: (a, b) => a ** b },
  }
/** A sign binds closer than a product and looser than a power. */
const SIGN = 'sign'
const SIGN_RANK = 3

const keys: Readonly<Record<string, (values: readonly number[]) => number>> = {
  ln: ([a = Number.NaN]) => Math.log(a),
  exp: ([a = Number.NaN]) => Math.exp(a),
  sqrt: ([a = Number.NaN]) => Math.sqrt(a),
  cbrt: ([a = Number.NaN]) => Math.cbrt(a),
  abs: ([a = Number.NaN]) => Math.abs(a),
  min: (values) => Math.min(...values),
  max: (values) => Math.max(...values),
}

interface Waiting {
  readonly text: string
  /** Of a function: how many values it has by now. */
  count: number
}

/** The value of a formula; `known` gives the numbers of its symbols. Throws on anything that it cannot read. */
export function calculate(formula: string, known: ReadonlyMap<string, number> = new Map()): number {
  const stack: number[] = []
  const waiting: Waiting[] = []
  const pop = (): number => {
    const value = stack.pop()
    if (value === undefined) throw new Error(`Something is missing in ${formula}`)
    return value
  }
  const applyTop = (): void => {
    const { text = '' } = waiting.pop() ?? {}
    if (text === SIGN) {
      stack.push(-pop())
      return
    }
    const b = pop()
    const a = pop()
    const operator = binary[text]
    if (!operator) throw new Error(`A bracket stays open in ${formula}`)
    stack.push(operator.apply(a, b))
  }
  const rankOfTop = (): number => {
    const { text = '(' } = waiting.at(-1) ?? {}
    return text === SIGN ? SIGN_RANK : (binary[text]?.rank ?? 0)
  }
  const toBracket = (): void => {
    while (waiting.length > 0 && waiting.at(-1)?.text !== '(') applyTop()
    if (waiting.length === 0) throw new Error(`A bracket too many in ${formula}`)
  }
  let valueMayFollow = true
  for (const text of formula.match(/\d+(\.\d+)?(e-?\d+)?|[\p{L}_][\p{L}\p{N}_]*|\S/gu) ?? []) {
    if (text === '(') {
      waiting.push({ text, count: 1 })
      valueMayFollow = true
    } else if (text === ',') {
      toBracket()
      const bracket = waiting.at(-1)
      if (bracket) bracket.count += 1
      valueMayFollow = true
    } else if (text === ')') {
      toBracket()
      const { count = 1 } = waiting.pop() ?? {}
      const key = keys[waiting.at(-1)?.text ?? '']
      if (key) {
        waiting.pop()
        const values = Array.from({ length: count }, pop).reverse()
        stack.push(key(values))
      }
      valueMayFollow = false
    } else if (text === '−' && valueMayFollow) {
      waiting.push({ text: SIGN, count: 1 })
    } else if (binary[text]) {
      const { rank } = binary[text]
      // A power works from the right.
      while (rankOfTop() > rank || (rankOfTop() === rank && text !== '^')) applyTop()
      waiting.push({ text, count: 1 })
      valueMayFollow = true
    } else if (keys[text]) {
      waiting.push({ text, count: 1 })
    } else {
      const value = text === 'π' ? Math.PI : /^\d/.test(text) ? Number(text) : known.get(text)
      if (value === undefined || !valueMayFollow)
        throw new Error(`Cannot read ${text} in ${formula}`)
      stack.push(value)
      valueMayFollow = false
    }
  }
  while (waiting.length > 0) applyTop()
  const value = pop()
  if (stack.length > 0) throw new Error(`Too much in ${formula}`)
  return value
}
