/** Cells as spreadsheets put them on the clipboard: tabs between, quotes where a cell holds a break or a quote. */

export function writeTsv(rows: readonly (readonly string[])[]): string {
  const cell = (text: string) => (/[\t\n\r"]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text)
  return rows.map((row) => row.map(cell).join('\t')).join('\n')
}

/** A cell that opens with a quote ends at the matching one; a quote anywhere else is text, as in `1/2" valve`. */
const cellPattern = /"((?:[^"]|"")*)"(?=[\t\r\n]|$)|([^\t\r\n]*)/y

export function readTsv(text: string): string[][] {
  const rows: string[][] = []
  let row: string[] = []
  for (let at = 0; ; ) {
    cellPattern.lastIndex = at
    const [whole = '', quoted, plain = ''] = cellPattern.exec(text) ?? []
    row.push(quoted === undefined ? plain : quoted.replaceAll('""', '"'))
    at += whole.length
    if (text[at] === '\t') {
      at++
      continue
    }
    rows.push(row)
    row = []
    if (text.startsWith('\r\n', at)) at++
    at++
    // The last line of a block ends with a break too.
    if (at >= text.length) return rows
  }
}
