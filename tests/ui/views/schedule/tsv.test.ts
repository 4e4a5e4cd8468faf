import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { readTsv, writeTsv } from '#ui/views/schedule/tsv.ts'

describe('cells on the clipboard', () => {
  test.each([
    { what: 'one cell', text: 'DN 50', rows: [['DN 50']] },
    {
      what: 'a last line break',
      text: 'a\tb\r\nc\td\r\n',
      rows: [
        ['a', 'b'],
        ['c', 'd'],
      ],
    },
    { what: 'a break inside quotes', text: '"by the\ndoor"\tx', rows: [['by the\ndoor', 'x']] },
    { what: 'doubled quotes', text: '"say ""when"""', rows: [['say "when"']] },
    { what: 'inches', text: '1/2" valve\t2"', rows: [['1/2" valve', '2"']] },
    { what: 'a quote that never ends', text: '"open\tb', rows: [['"open', 'b']] },
    { what: 'empty cells', text: '\t\t\na', rows: [['', '', ''], ['a']] },
  ])('reads $what', ({ text, rows }) => {
    expect(readTsv(text)).toEqual(rows)
  })

  test('what is copied is pasted back as it was', () => {
    const cell = fc.string().map((text) => text.replaceAll('\r', ''))
    const rows = fc.integer({ min: 1, max: 4 }).chain((width) =>
      fc.array(fc.array(cell, { minLength: width, maxLength: width }), {
        minLength: 1,
        maxLength: 5,
      }),
    )
    // A block of nothing but one empty column is a block of line breaks, of which the last ends it.
    const isTold = (block: string[][]) => block.some((row) => row.length > 1 || row[0] !== '')
    fc.assert(
      fc.property(rows.filter(isTold), (block) => {
        const text = writeTsv(block)
        fc.pre(!text.endsWith('\n'))
        expect(readTsv(text)).toEqual(block)
      }),
    )
  })

  test('anything at all can be read', () => {
    fc.assert(
      fc.property(fc.string({ unit: fc.constantFrom('"', '\t', '\n', '\r', 'a', ' ') }), (text) => {
        expect(readTsv(text).length).toBeGreaterThan(0)
      }),
    )
  })
})
