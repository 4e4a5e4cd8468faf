/** Columns of text that line up in a terminal. */

export interface TextColumn {
  readonly header: string
  readonly align: 'left' | 'right'
  readonly cells: readonly string[]
  /** Cells longer than this are cut. */
  readonly maxWidth?: number
}

const gap = '  '
/** Less than this of the last column is not worth showing. */
const leastLastColumn = 12

/** The table as lines. With a `width`, the last column is cut to fit; the others keep their own. */
export function textTable(columns: readonly TextColumn[], width: number | null): readonly string[] {
  const cut = columns.map((column) => ({
    ...column,
    cells: [column.header, ...column.cells].map((cell) =>
      cutText(printable(cell), column.maxWidth ?? Number.POSITIVE_INFINITY),
    ),
  }))
  const widths = cut.map(({ cells }) =>
    cells.reduce((most, cell) => Math.max(most, textWidth(cell)), 0),
  )
  const before = widths.slice(0, -1).reduce((sum, own) => sum + own + gap.length, 0)
  const room = width === null ? Number.POSITIVE_INFINITY : Math.max(leastLastColumn, width - before)
  const count = Math.max(0, ...cut.map(({ cells }) => cells.length))
  return Array.from({ length: count }, (_, row) =>
    cut
      .map(({ cells, align }, index) => {
        const cell = cells[row] ?? ''
        const isLast = index === cut.length - 1
        return pad(
          isLast ? cutText(cell, room) : cell,
          isLast && align === 'left' ? 0 : (widths[index] ?? 0),
          align,
        )
      })
      .join(gap)
      .trimEnd(),
  )
}

/** Nothing that a terminal would obey, and no line ends. */
export function printable(text: string): string {
  return text.replace(/[\p{Cc}\p{Cs}\p{Zl}\p{Zp}]+/gu, ' ')
}

function pad(text: string, width: number, align: 'left' | 'right'): string {
  const space = ' '.repeat(Math.max(0, width - textWidth(text)))
  return align === 'left' ? text + space : space + text
}

/** Cut to a width, at a word where one ends near it. */
function cutText(text: string, width: number): string {
  if (textWidth(text) <= width) return text
  let kept = ''
  let used = 1
  for (const character of text) {
    used += textWidth(character)
    if (used > width) break
    kept += character
  }
  const word = kept.lastIndexOf(' ')
  return `${(word > kept.length * 0.7 ? kept.slice(0, word) : kept).trimEnd()}…`
}

/** Cells of a terminal: none for marks that stand on a letter, two for East Asian letters and pictures. */
export function textWidth(text: string): number {
  let width = 0
  for (const character of text) width += characterWidth(character)
  return width
}

function characterWidth(character: string): number {
  if (character < '\u0300') return 1
  if (/[\p{Mn}\p{Me}\p{Cf}]/u.test(character)) return 0
  return /[\p{Script=Han}\p{Script=Hiragana}\p{Script=Katakana}\p{Script=Hangul}\p{Emoji_Presentation}\uff01-\uff60]/u.test(
    character,
  )
    ? 2
    : 1
}
