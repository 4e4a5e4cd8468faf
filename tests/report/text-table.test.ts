import { describe, expect, it } from 'vitest'
import { textTable, textWidth } from '#report/text-table.ts'

const left = (header: string, ...cells: readonly string[]) => ({
  header,
  align: 'left' as const,
  cells,
})
const right = (header: string, ...cells: readonly string[]) => ({
  header,
  align: 'right' as const,
  cells,
})

describe('a table of text', () => {
  it('lines up, numbers to the right', () => {
    expect(
      textTable([left('Tag', 'A', 'LONG'), right('mm', '5', '120'), left('Why', 'a', 'b')], null),
    ).toEqual(['Tag    mm  Why', 'A       5  a', 'LONG  120  b'])
  })

  it('cuts the last column to the width, at a word', () => {
    const lines = textTable([left('Tag', 'A'), left('Why', 'cost decides over fifteen years')], 25)
    expect(lines[1]).toBe('A    cost decides over…')
    expect(textTable([left('Why', 'x'.repeat(40))], 20)[1]).toBe(`${'x'.repeat(19)}…`)
  })

  it('keeps something of the last column on the narrowest terminal', () => {
    expect(textTable([left('Tag', 'A'), left('Why', 'cost decides')], 1)[1]).toBe(
      'A    cost decides',
    )
  })

  it('cuts long cells of a column with a limit', () => {
    expect(textTable([{ ...left('Tag', 'abcdefgh'), maxWidth: 5 }, left('x', 'y')], null)[1]).toBe(
      'abcd…  y',
    )
  })

  it('knows wide and joined letters, and lets nothing through that a terminal obeys', () => {
    expect(textWidth('e\u0301')).toBe(1)
    expect(textWidth('蒸気')).toBe(4)
    expect(textTable([left('T', '蒸気', 'ab\u001b[2Jc'), left('x', '1', '2')], null)).toEqual([
      'T        x',
      '蒸気     1',
      'ab [2Jc  2',
    ])
  })

  it('takes no rows', () => {
    expect(textTable([left('Tag'), right('mm')], 80)).toEqual(['Tag  mm'])
  })
})
