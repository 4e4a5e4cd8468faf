/** Reads a printed working as a reader does: sections, and in each the lines with their signs of equality. */

export interface PageLine {
  readonly symbol: string
  /** Between the equals signs: formula, numbers, value with unit; only the last where a value is given. */
  readonly parts: readonly string[]
  readonly text: string
}

export interface PageSection {
  readonly title: string
  readonly lines: readonly PageLine[]
}

export function readPage(text: string): PageSection[] {
  const rows = text.split('\n')
  const sections: { title: string; lines: PageLine[] }[] = []
  let inBrackets = false
  let open: string | null = null
  const close = (): void => {
    if (open !== null) sections.at(-1)?.lines.push(lineOf(open))
    open = null
  }
  rows.forEach((row, index) => {
    if (/^-+$/.test(rows[index + 1] ?? '') && /^\d+ {2}\S/.test(row)) {
      close()
      sections.push({ title: row.replace(/^\d+ +/, ''), lines: [] })
    } else if (inBrackets || /^ {6}\[/.test(row)) {
      close()
      inBrackets = !row.endsWith(']')
    } else if (/^ {4}\S+ = /.test(row) || /^ {2}\S.*: \S+ = \S+( \S+)?$/.test(row)) {
      close()
      open = row
    } else if (open !== null && /^ {5,}\S/.test(row)) open += ` ${row.trim()}`
    else close()
  })
  close()
  return sections
}

function lineOf(text: string): PageLine {
  const [, line = ''] = /^ {2}\S.*: (\S+ = \S+(?: \S+)?)$/.exec(text) ?? [null, text.trim()]
  const [symbol = '', ...parts] = line.split(' = ')
  return { symbol, parts, text: line }
}

/** A number as printed, with the minus of print; NaN where nothing is. */
export function numberOf(printed: string): number {
  const [text = ''] = printed.split(' ')
  return text === '' ? Number.NaN : Number(text.replace('−', '-'))
}
