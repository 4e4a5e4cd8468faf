import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { type Field, fields, type RunValues } from '#model/fields.ts'
import { laterColumns } from '#model/later.ts'
import { parseRunsCsv, sentence, writeRunsCsv } from '#report/runs-csv.ts'

function runs(source: string | Uint8Array): readonly RunValues[] {
  const read = parseRunsCsv(source)
  if (!read.ok) throw new Error(read.issues.map(sentence).join('\n'))
  return read.runs
}
function problems(source: string | Uint8Array): readonly string[] {
  const read = parseRunsCsv(source)
  return read.ok ? [] : read.issues.map(sentence)
}
const bytes = (text: string) => new TextEncoder().encode(text)
const lines = (...rows: readonly string[]) => `${rows.join('\n')}\n`

describe('reading a list of runs', () => {
  const plain = [{ tag: 'A', shape: 'pipe', outerDiameterM: 0.0603, airC: 20.5 }]

  it.each([
    ['comma', lines('tag,shape,od_mm,air_c', 'A,pipe,60.3,20.5')],
    ['semicolon and decimal point', lines('tag;shape;od_mm;air_c', 'A;pipe;60.3;20.5')],
    ['semicolon and decimal comma', lines('tag;shape;od_mm;air_c', 'A;pipe;60,3;20,5')],
    ['tab', lines('tag\tshape\tod_mm\tair_c', 'A\tpipe\t60.3\t20.5')],
    ['tab and decimal comma', lines('tag\tshape\tod_mm\tair_c', 'A\tpipe\t60,3\t20,5')],
    ['any order and case', lines('AIR_C, Od_mm,Shape ,TAG', '20.5,60.3,Pipe,A')],
    ['quotes', lines('"tag","shape","od_mm","air_c"', '"A","pipe","60.3","20.5"')],
    ['carriage returns', 'tag,shape,od_mm,air_c\r\nA,pipe,60.3,20.5\r\n'],
    ['old carriage returns', 'tag,shape,od_mm,air_c\rA,pipe,60.3,20.5'],
    ['mixed line ends', 'tag,shape,od_mm,air_c\r\nA,pipe,60.3,20.5\n'],
    ['no line end at the end', 'tag,shape,od_mm,air_c\nA,pipe,60.3,20.5'],
    ['blank lines', lines('', 'tag,shape,od_mm,air_c', '', ' , ,,', 'A,pipe,60.3,20.5', '', '')],
    ['empty cells at the end', lines('tag,shape,od_mm,air_c,,', 'A,pipe,60.3,20.5,,,,')],
    ['byte order mark', `\ufeff${lines('tag,shape,od_mm,air_c', 'A,pipe,60.3,20.5')}`],
  ])('takes %s, as text and as bytes', (_name, text) => {
    expect(runs(text)).toEqual(plain)
    expect(runs(bytes(text))).toEqual(plain)
  })

  it('takes inches, feet and degrees Fahrenheit', () => {
    const [run] = runs(lines('tag,od_in,length_ft,medium_f,rise_ft', 'A,2,10,212,5'))
    expect(run).toEqual({
      tag: 'A',
      outerDiameterM: 0.0508,
      lengthM: 10 * 0.3048,
      mediumC: 100,
      riseM: 5 * 0.3048,
    })
  })

  it('says in which row each run stands', () => {
    const read = parseRunsCsv(
      lines('tag,note', '').replace(',note', ',place') + lines('A,x', '', '', 'B,y'),
    )
    expect(read.list.rows.map(({ row }) => row)).toEqual([3, 6])
  })

  it('keeps what could be read of a list with faults, and which fields have theirs said', () => {
    const read = parseRunsCsv('tag,air_f,size\nA,cold,DN 50\nA,68,\ntorn\n')
    expect(read.ok).toBe(false)
    expect(read.list).toEqual({
      header: { row: 1, keys: new Set(['tag', 'airC', 'size']), isWhole: true },
      rows: [
        { row: 2, values: { tag: 'A', size: 'DN 50' }, faulty: new Set(['airC']) },
        { row: 3, values: { tag: 'A', airC: 20 }, faulty: new Set() },
      ],
    })
    expect(parseRunsCsv('tag,meduim_c\nA,1\n').list.header.isWhole).toBe(false)
    expect(parseRunsCsv('tag,place\nA,"hall\nB,roof\n').list.rows).toEqual([])
  })

  it('takes separators and line ends inside quotes', () => {
    expect(runs(lines('tag,description', '"A,1","to the ""old""\nhouse"'))).toEqual([
      { tag: 'A,1', description: 'to the "old" house' },
    ])
  })

  it('takes 10 000 runs quickly', () => {
    const rows = Array.from({ length: 10_000 }, (_, index) => `T-${index},pipe,DN 50,80,20,12.5`)
    const started = performance.now()
    expect(runs(lines('tag,shape,size,medium_c,air_c,length_m', ...rows))).toHaveLength(10_000)
    expect(performance.now() - started).toBeLessThan(2000)
  })

  it('reads the demo list', () => {
    const file = join(import.meta.dirname, '../../db/demo/harrowmere-creamery.csv')
    expect(runs(readFileSync(file)).length).toBeGreaterThanOrEqual(40)
  })
})

describe('what is wrong with a list', () => {
  it('is said for all cells at once, with row, column, found and allowed', () => {
    expect(
      problems(
        lines(
          'tag,shape,air_c,humidity_pct,money,life_years',
          'A,tube,warm,120,maybe,1.5',
          'B,sphere,NaN,57,no,20',
          'A,pipe,20,57,yes,20',
          ',pipe,1e999,0x10,1,20',
        ),
      ),
    ).toEqual([
      'row 2, column shape: found "tube"; allowed: one of pipe, round-duct, rect-duct, flat, sphere, vessel',
      'row 2, column air_c: found "warm"; allowed: a number from −70 to 200 °C',
      'row 2, column humidity_pct: found "120"; allowed: a number from 1 to 100 %',
      'row 2, column money: found "maybe"; allowed: yes or no',
      'row 2, column life_years: found "1.5"; allowed: a whole number from 1 to 100 years',
      'row 3, column air_c: found "NaN"; allowed: a number from −70 to 200 °C',
      'row 4, column tag: found "A", as in row 2; allowed: a tag of its own for every run',
      'row 5, column air_c: found "1e999"; allowed: a number from −70 to 200 °C',
      'row 5, column humidity_pct: found "0x10"; allowed: a number from 1 to 100 %',
      'row 5, column tag: found nothing; allowed: a tag of its own for every run',
    ])
  })

  it.each([
    [
      'nothing at all',
      '',
      'the file: found nothing in it; allowed: a header row and a row for every run',
    ],
    [
      'blank lines',
      '\n \n,,\n',
      'the file: found nothing in it; allowed: a header row and a row for every run',
    ],
    [
      'a header alone',
      'tag,shape\n',
      'the file: found no runs; allowed: a row for every run below the header',
    ],
    [
      'no tags',
      'shape\npipe\n',
      'row 1, column tag: found no such column; allowed: a tag for every run',
    ],
    [
      'a repeated column',
      'tag,air_c,AIR_C\nA,1,2\n',
      'row 1, column air_c: found the column twice; allowed: each column once, in one unit',
    ],
    [
      'a column and its twin',
      'tag,od_mm,od_in\nA,1,2\n',
      'row 1, column od_in: found the same as column od_mm again; allowed: each column once, in one unit',
    ],
    [
      'a column without a name',
      'tag,,air_c\nA,7,2\n',
      'row 1: found a column without a name; allowed: a name above every column',
    ],
    ['a short row', 'tag,air_c,shape\nA,1\n', 'row 2: found 2 cells; allowed: 3, as in the header'],
    ['a torn last row', 'tag,air_c\nA,1\nB', 'row 3: found 1 cell; allowed: 2, as in the header'],
    ['a long row', 'tag,air_c\nA,1,5\n', 'row 2: found 3 cells; allowed: 2, as in the header'],
    [
      'an empty tag',
      'tag,air_c\n ,1\n',
      'row 2, column tag: found nothing; allowed: a tag of its own for every run',
    ],
    [
      'a decimal comma between commas',
      'tag,air_c\nA,"20,5"\n',
      'row 2, column air_c: found "20,5"; allowed: a number from −70 to 200 °C',
    ],
  ])('names %s', (_name, text, problem) => {
    expect(problems(text)).toEqual([problem])
    expect(problems(bytes(text))).toEqual([problem])
  })

  it('names unknown columns and the nearest known ones', () => {
    expect(problems('tag,meduim_c,Tickness_mm,=tag\nA,80,40,1\n')).toEqual([
      'row 1, column meduim_c: found an unknown column; allowed: known columns, of which medium_c is the nearest',
      'row 1, column tickness_mm: found an unknown column; allowed: known columns, of which thickness_mm is the nearest',
      'row 1, column "=tag": found an unknown column; allowed: known columns, of which tag is the nearest',
    ])
  })

  it('refuses the columns to come by name, in both units, even where they are empty', () => {
    const later = [...laterColumns, 'floor_height_ft']
    const found = problems(lines(['tag', ...later].join(), ['A', ...later.map(() => '')].join()))
    expect(found).toEqual(
      later.map(
        (column) =>
          `row 1, column ${column}: found a column that is not yet supported; allowed: the list without it`,
      ),
    )
  })

  it('names a quote that never closes', () => {
    const found = problems('tag,place\nA,"hall\nB,roof\n')
    expect(found[0]).toContain('row 2: found a quoted cell that does not end where it should')
  })

  it('says where bytes are not UTF-8, and what a UTF-16 file is', () => {
    expect(problems(new Uint8Array([...bytes('tag,place\nA,caf'), 0xe9, 0x0a]))).toEqual([
      'row 2: found a byte (hexadecimal e9) that is not UTF-8 text; allowed: UTF-8 text; save the file as "CSV UTF-8"',
    ])
    expect(problems(new Uint8Array([...bytes('SQLite format 3'), 0, 0x10, 0, 0x82, 0xff]))).toEqual(
      [
        'the file: found a database, as a job is; allowed: a list of runs as text; if it is a job, a name that ends in .lagjob',
      ],
    )
    expect(problems(new Uint8Array([0xff, 0xfe, 0x74, 0x00]))[0]).toContain('found UTF-16 text')
  })

  it('does not guess a mark that could part thousands', () => {
    expect(problems(lines('tag;hours_per_year;air_c', 'A;8.760;20,5'))).toEqual([
      'row 2, column hours_per_year: found "8.760"; allowed: a number from 0 to 8784 h/year, without a mark between the thousands',
    ])
    expect(problems(lines('tag\thours_per_year\tair_c', 'A\t8,760\t20.5'))).toHaveLength(1)
    expect(runs(lines('tag;hours_per_year;air_c', 'A;8 760;20,5'))[0]?.hoursPerYear).toBe(8760)
    expect(runs(lines('tag;conductivity_w_mk;air_c', 'A;0,035;20,5'))[0]?.conductivityWPerMK).toBe(
      0.035,
    )
  })

  it('shortens a cell of 10 MB', () => {
    const [problem = ''] = problems(`tag,air_c\nA,${'9'.repeat(1e7)}\n`)
    expect(problem).toContain('(10000000 characters)')
    expect(problem.length).toBeLessThan(200)
  })

  it('keeps each problem on one line, whatever the cell holds', () => {
    expect(problems('tag,air_c\nA,"\u001b[31m\n2"\n')).toEqual([
      'row 2, column air_c: found "\\u001b[31m\\u000a2"; allowed: a number from −70 to 200 °C',
    ])
  })
})

describe('writing', () => {
  it('keeps formulas from being run by a spreadsheet, and takes them back', () => {
    const formula = [
      { tag: '=1+1', place: '@hall', description: "'-x" },
      { tag: '-A', airC: -5 },
    ]
    expect(writeRunsCsv(formula)).toBe(
      "tag,description,place,air_c\n'=1+1,''-x,'@hall,\n'-A,,,-5\n",
    )
    expect(runs(writeRunsCsv(formula))).toEqual(formula)
  })

  const word = fc
    .string({ unit: 'grapheme', minLength: 1, maxLength: 8 })
    .map((text) => text.replace(/[\s\p{C}]+/gu, ' ').trim())
    .filter((text) => text !== '' && text.length <= 8)
  const anyValue = (field: Field): fc.Arbitrary<unknown> => {
    switch (field.kind) {
      case 'number':
        return field.whole
          ? fc.integer({ min: field.min, max: field.max })
          : fc.double({ min: field.min, max: field.max, noNaN: true }).map((x) => (x === 0 ? 0 : x))
      case 'choice':
        return fc.constantFrom(...field.choices)
      case 'flag':
        return fc.boolean()
      case 'text':
        return word
    }
  }
  const someRuns = fc
    .uniqueArray(
      fc.record(Object.fromEntries(fields.map((field) => [field.key, anyValue(field)])), {
        requiredKeys: ['tag'],
      }),
      {
        selector: (values) => values.tag,
        minLength: 1,
        maxLength: 6,
      },
    )
    .map((list) => list as RunValues[])

  it('gives any runs back', () => {
    fc.assert(
      fc.property(someRuns, (list) => {
        expect(runs(writeRunsCsv(list))).toEqual(list.map((values) => ({ ...values })))
        expect(runs(bytes(`\ufeff${writeRunsCsv(list)}`))).toEqual(
          list.map((values) => ({ ...values })),
        )
      }),
      { numRuns: 300 },
    )
  })
})

describe('any bytes', () => {
  it('never throw, and give runs or problems', () => {
    const fragment = fc.constantFrom(
      'tag',
      'shape',
      'air_c',
      'od_in',
      'pipe',
      ',',
      ';',
      '\t',
      '\n',
      '\r\n',
      '"',
      '""',
      '60,3',
      '1e999',
      '-',
      '\ufeff',
      '\0',
      '=',
    )
    const soup = fc
      .array(fc.oneof(fragment, fc.string({ unit: 'binary' })), { maxLength: 60 })
      .map((parts) => parts.join(''))
    fc.assert(
      fc.property(fc.oneof(soup, soup.map(bytes), fc.uint8Array({ maxLength: 300 })), (source) => {
        const read = parseRunsCsv(source)
        if (read.ok) expect(read.runs.length).toBe(read.list.rows.length)
        else expect(read.issues.length).toBeGreaterThan(0)
      }),
      { numRuns: 5000 },
    )
  })
})
