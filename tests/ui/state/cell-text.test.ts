import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { type FieldKey, fields } from '#model/fields.ts'
import { decimalsOf, editText, readerFor, readText, unitOf } from '#ui/state/cell-text.ts'

const numbers = fields.filter((field) => field.kind === 'number')

describe('the text of a number', () => {
  test.each(['si', 'us'] as const)(
    'that one edits in %s is read back as the same value',
    (system) => {
      const anyNumber = fc
        .constantFrom(...numbers)
        .chain((field) =>
          fc.tuple(fc.constant(field), fc.double({ min: field.min, max: field.max, noNaN: true })),
        )
      fc.assert(
        fc.property(anyNumber, ([field, exact]) => {
          const value = 'whole' in field ? Math.round(exact) : Number(exact.toPrecision(6))
          fc.pre(value >= field.min && value <= field.max)
          const text = editText(field.key, value, system)
          const read = readerFor(system).read(field.key, text)
          // At the very ends a converted number may fall just outside; never far from itself.
          if (!read.ok)
            expect(Math.min(value - field.min, field.max - value)).toBeLessThan(1e-6 * field.max)
          else if (system === 'si') expect(read.value).toBe(value)
          else
            expect(Math.abs(Number(read.value) - value)).toBeLessThanOrEqual(
              2e-9 * Math.max(1e-3, Math.abs(value), 460),
            )
        }),
      )
    },
  )

  // Exact by definition: 1 ft = 0.3048 m, 1 in = 25.4 mm, °F = °C · 9/5 + 32 (NIST SP 811, appendix B).
  test.each([
    { key: 'lengthM', text: '100', value: 30.48 },
    { key: 'outerDiameterM', text: '2', value: 0.0508 },
    { key: 'mediumC', text: '212', value: 100 },
    { key: 'airC', text: '-40', value: -40 },
  ] satisfies { key: FieldKey; text: string; value: number }[])(
    '$text in US is $value for $key',
    ({ key, text, value }) => {
      expect(readerFor('us').read(key, text)).toEqual({ ok: true, value })
    },
  )

  test('names the range in the unit it is typed in', () => {
    expect(readerFor('us').read('lengthM', 'long')).toMatchObject({ ok: false, found: '"long"' })
    expect(unitOf(numbers[0] ?? { kind: 'flag', key: '', column: '', label: '' }, 'us')).toBe('in')
  })
})

describe('decimals of a column', () => {
  test.each([
    { values: [170, 95], least: 0, decimals: 0 },
    { values: [170, 95.5], least: 0, decimals: 1 },
    { values: [24, 18], least: 1, decimals: 1 },
    { values: [0.1 + 0.2], least: 0, decimals: 1 },
    { values: [1 / 3], least: 0, decimals: 3 },
  ])('of $values are $decimals', ({ values, least, decimals }) => {
    expect(decimalsOf(values, 'lengthM', 'si', least)).toBe(decimals)
  })

  test('words stand for choices only', () => {
    expect(readText('shape', 'rect-duct', 'si')).toBe('rectangular duct')
    expect(readText('tag', 'up', 'si')).toBe('up')
  })
})
