/** A working as plain text that fits a page and can be read aloud: words first, then the line to repeat. */
import { MINUS, withNumbers } from '#sizing/working/formula.ts'
import type { Section, Step, Working } from '#sizing/working/types.ts'
import { cautions } from './cautions.ts'
import { printable, textTable, textWidth } from './text-table.ts'

const WIDTH = 100
const INDENT = '    '

export function writeWorkingText(working: Working): string {
  const sections = [...working.sections, sourcesOf(working), cautionsOf()].filter(
    ({ texts, steps, table }) => texts.length + steps.length > 0 || table,
  )
  const contents = sections.map(({ title }, index) => `${number(index)} ${title}`)
  const parts = [
    heading(`Working of ${working.title}`, '='),
    [
      ...wrapped(
        'SI units; temperatures in °C. Each line says in words what it is, then symbol = formula = numbers = value. Every number in a line stands in a line above it in the same section, so that each can be repeated with a pocket calculator: ln is the natural logarithm, exp its inverse, ^ a power, 1e-6 a millionth. Heat flow is positive outwards.',
        '',
      ),
    ],
    ['Contents', ...contents.map((line) => `  ${line}`)],
    ...sections.map((section, index) => sectionLines(section, index)),
  ]
  return `${parts.map((lines) => lines.join('\n')).join('\n\n')}\n`
}

const number = (index: number): string => String(index + 1).padStart(2)

function heading(title: string, rule: string): string[] {
  const lines = wrapped(title, '')
  return [...lines, rule.repeat(Math.max(...lines.map(textWidth)))]
}

function sectionLines(section: Section, index: number): string[] {
  const lines = heading(`${index + 1}  ${section.title}`, '-')
  if (section.condition !== null) lines.push(...wrapped(`At ${section.condition}.`, ''))
  const isList = section.steps.length === 0
  for (const text of section.texts)
    lines.push(...wrapped(text, isList ? '  ' : '', isList ? '- ' : ''))
  let sourceBefore: string | null = null
  for (const step of section.steps) {
    lines.push(...stepLines(step, sourceBefore))
    sourceBefore = step.source
  }
  if (section.table) {
    const { headers, rows } = section.table
    const columns = headers.map((header, column) => ({
      header,
      align: 'right' as const,
      cells: rows.map((row) => row[column] ?? ''),
    }))
    lines.push('', ...textTable(columns, WIDTH).map((line) => `  ${line}`))
  }
  return lines
}

/** Words, then the line; a source that stands under the line before is not said again. */
function stepLines(step: Step, sourceBefore: string | null): string[] {
  const lines = step.formula === null ? givenLines(step) : formulaLines(step, step.formula)
  const about = [step.source === sourceBefore ? null : step.source, step.validity].filter(
    (text) => text !== null,
  )
  if (about.length > 0) lines.push(...wrapped(`[${about.join('; ')}]`, `${INDENT}  `))
  return lines
}

const valueWords = ({ printed, unit }: Step): string =>
  unit === '' ? printed : `${printed} ${unit}`

/** What is only given stands on one line with its words where that fits. */
function givenLines(step: Step): string[] {
  const line = `${step.symbol} = ${valueWords(step)}`
  const whole = `  ${step.words}: ${line}`
  return textWidth(whole) <= WIDTH ? [whole] : [...wrapped(step.words, '  '), INDENT + line]
}

function formulaLines(step: Step, formula: string): string[] {
  const printed = new Map(step.inputs.map((input) => [input.symbol, input.printed]))
  const numbers = withNumbers(formula, (symbol) => printed.get(symbol) ?? symbol)
  const isPlain = numbers === formula || numbers === step.printed
  const parts = [formula, ...(isPlain ? [] : [numbers]), valueWords(step)]
  return [...wrapped(step.words, '  '), ...equation(step.symbol, parts)]
}

/** On one line where that fits, else each equals sign on a line of its own under the first. */
function equation(symbol: string, parts: readonly string[]): string[] {
  const whole = `${INDENT}${symbol} = ${parts.join(' = ')}`
  if (textWidth(whole) <= WIDTH) return [whole]
  const margin = ' '.repeat(INDENT.length + symbol.length)
  return parts.flatMap((part, index) => {
    const before = index === 0 ? `${INDENT}${symbol} = ` : `${margin} = `
    return brokenFormula(part, before, `${margin}     `)
  })
}

/** Breaks a long formula before an operator. */
function brokenFormula(formula: string, first: string, rest: string): string[] {
  const lines: string[] = []
  let line = first
  for (const [index, word] of formula.split(new RegExp(` (?=[+${MINUS}×/] )`)).entries()) {
    const joined = index === 0 ? line + word : `${line} ${word}`
    if (index === 0 || textWidth(joined) <= WIDTH) line = joined
    else {
      lines.push(line)
      line = rest + word
    }
  }
  return [...lines, line]
}

function wrapped(text: string, indent: string, mark = ''): string[] {
  const lines: string[] = []
  let line = indent + mark
  const rest = indent + ' '.repeat(mark.length)
  let isEmpty = true
  for (const word of printable(text).split(' ')) {
    if (!isEmpty && textWidth(`${line} ${word}`) > WIDTH) {
      lines.push(line)
      line = rest
      isEmpty = true
    }
    line += isEmpty ? word : ` ${word}`
    isEmpty = false
  }
  return [...lines, line]
}

const listed = (title: string, texts: readonly string[]): Section => ({
  title,
  condition: null,
  texts,
  steps: [],
  table: null,
})

function sourcesOf({ sections }: Working): Section {
  const found = sections.flatMap(({ steps }) => steps.map(({ source }) => source))
  const texts = [...new Set(found.filter((source) => source !== null))].sort()
  return listed('Sources', texts)
}

function cautionsOf(): Section {
  return listed(
    'Cautions',
    cautions.map(({ text, deferTo }) => `${text} In doubt: ${deferTo}.`),
  )
}
