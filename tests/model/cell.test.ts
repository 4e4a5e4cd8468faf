import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { allowedIn, formatCell, parseCell, quote } from '#model/cell.ts'
import { readDecimal, writeDecimal } from '#model/decimal.ts'
import { type Field, type FieldKey, fieldOf, fields } from '#model/fields.ts'
import { quantities } from '#model/quantities.ts'

const point = { decimalComma: false }
const comma = { decimalComma: true }

function value(key: FieldKey, text: string, options: Parameters<typeof parseCell>[2] = point) {
  const cell = parseCell(fieldOf(key), text, options)
  return cell.ok ? cell.value : cell
}
function allowed(key: FieldKey, text: string, options: Parameters<typeof parseCell>[2] = point) {
  const cell = parseCell(fieldOf(key), text, options)
  return cell.ok ? `accepted as ${cell.value}` : cell.allowed
}

describe('a number cell', () => {
  it.each([
    ['60.3', 0.0603],
    [' 60.3 ', 0.0603],
    ['+60.3', 0.0603],
    ['6.03e1', 0.0603],
    ['1e3', 1],
    ['1E+3', 1],
    ['.5e2', 0.05],
    ['60.', 0.06],
    ['1 000', 1],
    ['1\u2009000', 1],
    ['1\u00a0000', 1],
    ['1\u202f000.5', 1.0005],
    ['10 000', 10],
  ])('reads %j mm as %d m', (text, metres) => {
    expect(value('outerDiameterM', text)).toBe(metres)
  })

  it.each([
    ['\u221220', -20],
    ['\u201320', -20],
    ['-20', -20],
    ['1e\u22121', 0.1],
    ['-0', 0],
  ])('reads %j as %d °C', (text, celsius) => {
    expect(value('airC', text)).toBeCloseTo(celsius, 15)
  })

  it.each([
    'NaN',
    'nan',
    'Infinity',
    '-Infinity',
    '∞',
    '1e999',
    '0x10',
    '0b1',
    '1_000',
    '1,5',
    '1.2.3',
    '1 00',
    '10 00',
    '5 000 00',
    'twelve',
    '12 mm',
    '12mm',
    '--5',
    '5-10',
    '1e',
    'e5',
    '1e1.5',
    '٣',
    '=1+1',
    '1e99999999999999999999999',
  ])('refuses %j', (text) => {
    expect(parseCell(fieldOf('outerDiameterM'), text, point)).toEqual({
      ok: false,
      found: quote(text),
      allowed: 'a number from 1 to 20000 mm',
    })
  })

  it('takes an empty cell as absent', () => {
    expect(value('airC', '')).toBeUndefined()
    expect(value('airC', ' \u00a0\t')).toBeUndefined()
  })

  it('takes a decimal comma only where it may, and never both marks at once', () => {
    expect(value('outerDiameterM', '60,3', comma)).toBe(0.0603)
    expect(value('outerDiameterM', '60.3', comma)).toBe(0.0603)
    expect(value('outerDiameterM', '1.000,5', comma)).toMatchObject({ ok: false })
    expect(value('outerDiameterM', '1,000.5', comma)).toMatchObject({ ok: false })
    expect(value('outerDiameterM', '60,3', point)).toMatchObject({ ok: false })
  })

  it('does not guess where a mark could part thousands', () => {
    const doubtful = { decimalComma: true, doubtfulMarks: ['.'] as const }
    expect(value('hoursPerYear', '8.760', doubtful)).toEqual({
      ok: false,
      found: '"8.760"',
      allowed: 'a number from 0 to 8784 h/year, without a mark between the thousands',
    })
    expect(value('hoursPerYear', '8.76', doubtful)).toBe(8.76)
    expect(value('conductivityWPerMK', '0.035', doubtful)).toBe(0.035)
    expect(value('hoursPerYear', '8,760', doubtful)).toBe(8.76)
  })

  it('names the range in the unit that was typed', () => {
    expect(allowed('airC', '400')).toBe('a number from −70 to 200 °C')
    expect(allowed('airC', '400', { ...point, twin: true })).toBe('a number from −94 to 392 °F')
    expect(allowed('humidity', '120')).toBe('a number from 1 to 100 %')
    expect(allowed('pressureGaugePa', '300')).toBe('a number from −0.95 to 217 bar g')
    expect(allowed('emissivity', '2')).toBe('a number from 0.01 to 1')
    expect(allowed('outerDiameterM', '9999', { ...point, twin: true })).toBe(
      'a number from 0.0393701 to 787.401 in',
    )
  })

  it('reads the US twins', () => {
    const twin = { ...point, twin: true }
    expect(value('outerDiameterM', '2', twin)).toBe(0.0508)
    expect(value('lengthM', '10', twin)).toBeCloseTo(3.048, 15)
    expect(value('mediumC', '212', twin)).toBe(100)
    expect(value('airC', '-94', twin)).toBe(-70)
  })

  it('holds whole numbers to whole', () => {
    expect(value('lifeYears', '15')).toBe(15)
    expect(allowed('lifeYears', '15.5')).toBe('a whole number from 1 to 100 years')
  })
})

describe('other cells', () => {
  it.each([
    ['shape', 'Round Duct', 'round-duct'],
    ['shape', 'rect_duct', 'rect-duct'],
    ['shape', ' PIPE ', 'pipe'],
    ['touchClass', 'smooth metal', 'smooth-metal'],
  ] as const)('reads %s %j as %s', (key, text, choice) => {
    expect(value(key, text)).toBe(choice)
  })

  it('names the choices', () => {
    expect(allowed('shape', 'tube')).toBe(
      'one of pipe, round-duct, rect-duct, flat, sphere, vessel',
    )
    expect(allowed('orientation', 'sideways')).toBe(
      'one of horizontal, vertical, inclined, up, down',
    )
    expect(value('shape', 'constructor')).toMatchObject({ ok: false })
  })

  it('reads flags', () => {
    for (const yes of ['yes', 'YES', 'true', '1']) expect(value('money', yes)).toBe(true)
    for (const no of ['no', 'No', 'FALSE', '0']) expect(value('money', no)).toBe(false)
    expect(allowed('money', 'maybe')).toBe('yes or no')
  })

  it('keeps text on one line and within its length', () => {
    expect(value('description', 'Header\r\n to\tcalorifier')).toBe('Header to calorifier')
    expect(value('tag', 'x'.repeat(60))).toBe('x'.repeat(60))
    expect(value('tag', 'x'.repeat(61))).toMatchObject({
      ok: false,
      allowed: 'at most 60 characters, without control characters',
    })
    expect(value('tag', 'a\u001b[31mb')).toMatchObject({ ok: false, found: '"a\\u001b[31mb"' })
    expect(value('tag', 'a\ud800')).toMatchObject({ ok: false })
  })

  it('refuses a cell of 10 MB at once, with a shortened quote', () => {
    const started = performance.now()
    for (const huge of ['9'.repeat(1e7), ' x'.repeat(5e6), '😀'.repeat(5e6)]) {
      for (const key of ['tag', 'airC', 'shape', 'money'] as const) {
        const cell = parseCell(fieldOf(key), huge, comma)
        expect(cell.ok).toBe(false)
        if (!cell.ok) expect(cell.found.length).toBeLessThan(100)
      }
    }
    expect(performance.now() - started).toBeLessThan(3000)
  })
})

describe('there and back', () => {
  const numberFields = fields.filter((field) => field.kind === 'number')

  it('has only powers of ten between columns and SI', () => {
    for (const { perUnit } of Object.values(quantities)) {
      expect(Number(`1e${Math.round(Math.log10(perUnit))}`)).toBe(perUnit)
    }
  })

  it('writes the shortest decimal', () => {
    expect(formatCell(fieldOf('outerDiameterM'), 0.0603)).toBe('60.3')
    expect(formatCell(fieldOf('outerDiameterM'), 0.1143)).toBe('114.3')
    expect(formatCell(fieldOf('humidity'), 0.57)).toBe('57')
    expect(formatCell(fieldOf('pressureGaugePa'), 7e5)).toBe('7')
    expect(formatCell(fieldOf('mediumC'), -12.5)).toBe('-12.5')
    expect(formatCell(fieldOf('thicknessM'), 0)).toBe('0')
    expect(formatCell(fieldOf('money'), false)).toBe('no')
    expect(formatCell(fieldOf('airC'), undefined)).toBe('')
  })

  it('gives every number of every field back', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...numberFields),
        fc.double({ noNaN: true, min: 0, max: 1 }),
        (field: Field, part) => {
          if (field.kind !== 'number') return
          const between = Math.min(field.max, field.min + part * (field.max - field.min))
          const si = field.whole ? Math.round(between) : between
          expect(parseCell(field, formatCell(field, si), point)).toEqual({
            ok: true,
            value: si === 0 ? 0 : si,
          })
        },
      ),
      { numRuns: 5000 },
    )
  })

  it('gives every finite double back, whatever the shift', () => {
    const double = fc.double({ noNaN: true, noDefaultInfinity: true })
    fc.assert(
      fc.property(
        double,
        fc.constantFrom(-5, -2, 0, 2, 3, 5),
        fc.boolean(),
        (x, shift, decimalComma) => {
          const text = writeDecimal(x, shift)
          expect(readDecimal(text, { shift: -shift, decimalComma })).toBe(x === 0 ? 0 : x)
        },
      ),
      { numRuns: 20_000 },
    )
  })

  it('gives choices, flags and texts back', () => {
    for (const field of fields) {
      if (field.kind === 'choice') {
        for (const choice of field.choices) {
          expect(parseCell(field, formatCell(field, choice), point)).toEqual({
            ok: true,
            value: choice,
          })
        }
      }
      if (field.kind === 'flag') {
        expect(parseCell(field, formatCell(field, true), point)).toEqual({ ok: true, value: true })
        expect(parseCell(field, formatCell(field, false), point)).toEqual({
          ok: true,
          value: false,
        })
      }
    }
  })

  it('never throws, and says what is allowed in one line', () => {
    const text = fc.oneof(
      fc.string({ unit: 'binary' }),
      fc.string({ unit: 'grapheme' }),
      fc.double().map(String),
    )
    fc.assert(
      fc.property(
        fc.constantFrom(...fields),
        text,
        fc.boolean(),
        fc.boolean(),
        (field: Field, typed, decimalComma, twin) => {
          const cell = parseCell(field, typed, { decimalComma, twin })
          if (cell.ok) return
          expect(cell.allowed).toBe(allowedIn(field, twin))
          expect(cell.found).not.toMatch(/\p{Cc}/u)
        },
      ),
      { numRuns: 5000 },
    )
  })
})
