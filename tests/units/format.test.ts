import { describe, expect, test } from 'vitest'
import {
  ABSENT,
  formatNumber,
  formatQuantity,
  formatWithUnit,
  shownValue,
  storedValue,
  thicknessDecimals,
  unitLabel,
} from '#units/format.ts'
import type { QuantityName } from '#units/quantities.ts'
import { published } from '../published.ts'

describe('exact definitions', () => {
  // NIST SP 811 (2008), appendix B: 1 in = 0.0254 m, 1 ft = 0.3048 m, 1 ft² = 0.092 903 04 m², 1 lb = 0.453 592 37 kg.
  test.each<[QuantityName, number, number]>([
    ['thickness', 0.0254, 1],
    ['length', 0.3048, 1],
    ['area', 0.09290304, 1],
    ['mass', 0.45359237, 1],
  ])('%s of %d SI is one US unit', (quantity, stored, shown) => {
    expect(shownValue(stored, quantity, 'us')).toBeCloseTo(shown, 13)
  })

  // A unit of energy is told by a unit of power over an hour.
  published(
    (hours: number) => storedValue(3600 * hours, 'power', 'us'),
    [{ from: 'ISO 80000-5:2007, annex C, Btu in J', given: 1, printed: '1055.05585262' }],
  )

  const factors = 'NIST SP 811 (2008), appendix B.8, one US unit in SI'
  published(
    (quantity: QuantityName) => storedValue(1, quantity, 'us'),
    [
      { from: factors, given: 'power', printed: '2.930711e-1' },
      { from: factors, given: 'filmCoefficient', printed: '5.678263' },
      { from: factors, given: 'heatFlux', printed: '3.154591' },
      { from: factors, given: 'conductivity', printed: '1.442279e-1' },
      { from: factors, given: 'gaugePressure', printed: '6.894757e3' },
      { from: factors, given: 'speed', printed: '4.4704e-1' },
    ],
  )

  test('Btu/h·ft is Btu/h over a foot', () => {
    expect(storedValue(1, 'heatLossPerLength', 'us')).toBeCloseTo(1055.05585262 / 3600 / 0.3048, 12)
  })

  // Fixed points of the Fahrenheit scale: ice 32 °F, steam 212 °F; the scales meet at -40.
  test.each([
    [0, 32],
    [100, 212],
    [-40, -40],
  ])('%d °C is %d °F', (celsius, fahrenheit) => {
    expect(shownValue(celsius, 'temperature', 'us')).toBeCloseTo(fahrenheit, 12)
  })

  test('a difference of temperature has no 32 in it', () => {
    expect(shownValue(10, 'temperatureDifference', 'us')).toBeCloseTo(18, 12)
    expect(shownValue(0, 'temperatureDifference', 'us')).toBe(0)
  })

  test('a price per metre becomes a price per foot', () => {
    expect(shownValue(100, 'moneyPerLength', 'us')).toBeCloseTo(30.48, 12)
    expect(shownValue(100, 'moneyPerArea', 'us')).toBeCloseTo(9.290304, 12)
  })
})

describe('the way back', () => {
  test.each<QuantityName>(['temperature', 'thickness', 'heatFlux', 'pricePerEnergy'])(
    '%s',
    (quantity) => {
      for (const system of ['si', 'us'] as const) {
        expect(
          storedValue(shownValue(-12.34, quantity, system) ?? 0, quantity, system),
        ).toBeCloseTo(-12.34, 10)
      }
    },
  )
})

describe('numbers as read', () => {
  test.each([
    [0, 1, '0.0'],
    [-0.04, 1, '0.0'],
    [-9.4, 1, '\u22129.4'],
    [999, 0, '999'],
    [41380, 0, '41\u202f380'],
    [-1234567.891, 2, '\u22121\u202f234\u202f567.89'],
    [1234.5678, 4, '1\u202f234.5678'],
  ])('%d with %d decimals', (value, decimals, text) => {
    expect(formatNumber(value, decimals)).toBe(text)
  })

  test.each([null, undefined, Number.NaN, Number.POSITIVE_INFINITY])('%s is a dash', (value) => {
    expect(formatNumber(value, 1)).toBe(ABSENT)
    expect(formatWithUnit(value, 'temperature', 'si')).toBe(ABSENT)
  })

  test('quantities', () => {
    expect(formatWithUnit(0.05, 'thickness', 'si')).toBe('50\u00a0mm')
    expect(formatWithUnit(0.0508, 'thickness', 'us')).toBe('2.00\u00a0in')
    expect(formatWithUnit(-7.06, 'heatLossPerLength', 'si')).toBe('\u22127.1\u00a0W/m')
    expect(formatQuantity(0.655, 'percentage', 'si')).toBe('66')
    expect(formatWithUnit(184_000, 'plantPower', 'si')).toBe('184.0\u00a0kW')
    expect(formatWithUnit(41380, 'money', 'us')).toBe('41\u202f380')
    expect(unitLabel('temperatureDifference', 'us')).toBe('°F diff.')
  })

  test('a column of thicknesses shows tenths only where an inch series needs them', () => {
    expect(thicknessDecimals([0.02, 0.025, 0.03], 'si')).toBe(0)
    expect(thicknessDecimals([0.0254, null, 0.0381], 'si')).toBe(1)
    expect(thicknessDecimals([0.0254, 0.05], 'us')).toBe(2)
  })
})
