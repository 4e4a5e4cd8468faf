import { describe, expect, test } from 'vitest'
import { Ledger } from '#sizing/working/ledger.ts'

describe('a section', () => {
  test('holds its lines in order, with what they are made of', () => {
    const ledger = new Ledger('Areas', 'at noon')
    ledger.say('Said first.')
    expect(ledger.given('Width', 'b', 0.5, 'm', { source: 'measured' })).toBe(0.5)
    ledger.given('Height', 'h', 4, 'm')
    expect(ledger.step('Area', 'A', 'b × h', 'm²', { validity: 'always' })).toBe(2)
    ledger.table({ headers: ['x'], rows: [['1']] })
    const b = { symbol: 'b', value: 0.5, printed: '0.5', unit: 'm' }
    const h = { symbol: 'h', value: 4, printed: '4', unit: 'm' }
    expect(ledger.section()).toEqual({
      title: 'Areas',
      condition: 'at noon',
      texts: ['Said first.'],
      steps: [
        { words: 'Width', formula: null, inputs: [], source: 'measured', validity: null, ...b },
        { words: 'Height', formula: null, inputs: [], source: null, validity: null, ...h },
        {
          words: 'Area',
          formula: 'b × h',
          inputs: [b, h],
          source: null,
          validity: 'always',
          symbol: 'A',
          value: 2,
          printed: '2',
          unit: 'm²',
        },
      ],
      table: { headers: ['x'], rows: [['1']] },
    })
  })

  test('takes the program’s own value where one is given', () => {
    const ledger = new Ledger('T', null)
    ledger.given('One third', 'a', 1 / 3, '')
    expect(ledger.step('Twice', 'b', '2 × a', '', { value: 0.6667 })).toBe(0.6667)
    expect(ledger.valueAt('b')).toBe(0.6667)
  })

  test('gives a difference of near numbers the digits that it needs', () => {
    const ledger = new Ledger('T', null)
    ledger.given('Hot', 'a', 20.001234567891, '°C')
    ledger.given('Cold', 'b', 20, '°C')
    ledger.step('Difference', 'd', 'a − b', 'K')
    const [hot, , difference] = ledger.section().steps
    expect(difference?.printed).toBe('0.0012346')
    // Within 1e-4 of the difference: 1.2e-7 K, so seven decimals, nine digits.
    expect(hot?.printed).toBe('20.0012346')
  })

  test('prints what is given as it was given, and whole numbers whole', () => {
    const ledger = new Ledger('T', null)
    ledger.given('Constant', 'σ', 5.670374419e-8, '')
    ledger.given('Found', 'f', Math.PI, '')
    ledger.given('Pressure', 'p', 101325, 'Pa')
    ledger.step('Twice', 'd', '2 × p', 'Pa')
    expect(ledger.section().steps.map(({ printed }) => printed)).toEqual([
      '5.670374419e-8',
      '3.1416',
      '101325',
      '202650',
    ])
  })

  test('refuses a symbol of two meanings, and one that is not known yet', () => {
    const ledger = new Ledger('T', null)
    ledger.given('One', 'a', 1, '')
    expect(() => ledger.given('Other', 'a', 2, '')).toThrow('T: a twice')
    expect(() => ledger.step('Sum', 's', 'a + b', '')).toThrow('T: b is used before it is known')
  })

  test('ends where no digits help', () => {
    const ledger = new Ledger('T', null)
    ledger.given('One', 'a', 1 / 3, '')
    ledger.step('Wrong', 'w', 'a', '', { value: 5 })
    expect(ledger.section().steps[1]?.printed).toBe('5')
  })
})
