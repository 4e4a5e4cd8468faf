import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { dewPointC, saturationPressurePa } from '#solver/properties/moist-air.ts'
import { type PublishedRow, published } from '../../published.ts'
import { within } from '../arbitraries.ts'

const ppm = {
  fraction: 3e-4,
  because: 'the handbook vouches for its equation to 300 ppm of its table',
}

describe('saturationPressurePa', () => {
  const table2021 = 'ASHRAE Handbook Fundamentals 2021, ch. 1, table 3'
  const table2017 = 'ASHRAE Handbook Fundamentals 2017, ch. 1, table 3'
  published(saturationPressurePa, [
    { from: table2017, given: -60, printed: '1.08' },
    {
      from: table2021,
      given: -40,
      printed: '12.84',
      within: { absolute: 0.015, because: ppm.because },
    },
    { from: table2021, given: -20, printed: '103.24', within: ppm },
    { from: table2021, given: -10, printed: '259.87', within: ppm },
    { from: table2017, given: -5, printed: '401.74', within: ppm },
    { from: table2021, given: 0, printed: '611.2' },
    { from: table2017, given: 5, printed: '872.6', within: ppm },
    { from: table2021, given: 10, printed: '1228.2', within: ppm },
    { from: table2021, given: 20, printed: '2339.2', within: ppm },
    { from: table2017, given: 25, printed: '3169.7', within: ppm },
    { from: table2021, given: 30, printed: '4246.7', within: ppm },
    { from: table2021, given: 40, printed: '7384.4', within: ppm },
    { from: table2017, given: 50, printed: '12351.3', within: ppm },
    { from: table2017, given: 100, printed: '101418.0', within: ppm },
    { from: table2017, given: 150, printed: '476101.4', within: ppm },
  ])

  // Both equations describe the same ice and water in equilibrium at 0 °C, each to its own 100 ppm or so.
  test('has the same value over ice and over water at 0 °C', () => {
    expect(saturationPressurePa(-1e-9) / saturationPressurePa(0)).toBeGreaterThan(1 - 1.2e-4)
    expect(saturationPressurePa(-1e-9) / saturationPressurePa(0)).toBeLessThan(1 + 1.2e-4)
  })

  test('rises with temperature, ice and water alike', () => {
    fc.assert(
      fc.property(within(-100, 199), (tempC) => {
        expect(saturationPressurePa(tempC + 0.5)).toBeGreaterThan(saturationPressurePa(tempC))
      }),
    )
  })
})

type Dew = Parameters<typeof dewPointC>[0]

/** Rows of the dew-point table: humidity in per cent, dew point as printed. */
const table = (airC: number, rows: Readonly<Record<number, string>>): PublishedRow<Dew>[] =>
  Object.entries(rows).map(([percent, printed]) => ({
    from: 'BS 5422:1990, dew-point table, in a public handbook of insulation (2001)',
    given: { airC, humidity: Number(percent) / 100 },
    printed,
    within: { absolute: 0.1, because: 'the table was made with an older saturation equation' },
  }))

/** A table made in whole degrees Fahrenheit and converted afterwards. */
const wholeFahrenheit = {
  absolute: 0.28,
  because: 'the table is in whole degrees Fahrenheit, half of one being 0.28 K',
}

describe('dewPointC', () => {
  published(dewPointC, [
    ...table(10, { 55: '1.4', 60: '2.6', 70: '4.8', 75: '5.8', 80: '6.7', 85: '7.6', 90: '8.4' }),
    ...table(20, { 50: '9.2', 55: '10.7', 60: '12.0', 70: '14.4', 75: '15.4' }),
    ...table(20, { 80: '16.4', 85: '17.4', 90: '18.3' }),
    ...table(24, { 50: '12.9', 55: '14.4', 65: '17.0', 70: '18.2' }),
    ...table(24, { 80: '20.3', 85: '21.3', 95: '23.1' }),
    ...table(26, { 80: '22.3' }),
    ...table(30, { 50: '18.4', 60: '21.4', 65: '22.7', 75: '25.1' }),
    ...table(30, { 80: '26.2', 90: '28.1', 95: '29.1' }),
    ...table(40, { 50: '27.6', 55: '29.3', 65: '32.2', 70: '33.5' }),
    ...table(40, { 80: '35.9', 85: '37.0', 95: '39.0' }),
    {
      from: 'ASHRAE Handbook Fundamentals 2021, ch. 4, example 12',
      given: { airC: 30, humidity: 0.7 },
      printed: '23.93',
    },
    ...[
      [25, '23.3'],
      [(82 - 32) / 1.8, '26.1'],
      [(81 - 32) / 1.8, '25.6'],
      [(80 - 32) / 1.8, '25.0'],
      [(79 - 32) / 1.8, '24.4'],
      [(76 - 32) / 1.8, '22.8'],
      [(63 - 32) / 1.8, '15.6'],
    ].map(([airC, printed]) => ({
      from: 'ASHRAE Handbook Fundamentals 2021, ch. 23, table 5',
      given: { airC: Number(airC), humidity: 0.9 },
      printed: String(printed),
      within: wholeFahrenheit,
    })),
  ])

  const air = [within(-40, 80), within(0.01, 1)] as const

  test('is where the vapour is saturated: p_ws(dew point) = humidity · p_ws(air)', () => {
    fc.assert(
      fc.property(...air, (airC, humidity) => {
        const dewC = dewPointC({ airC, humidity })
        const vapourPa = humidity * saturationPressurePa(airC)
        // At 0 °C the pressures over ice and over water differ by 0.06 Pa: a vapour between them dews at 0 °C.
        const slackPa = Math.abs(dewC) < 1e-6 ? 0.1 : 1e-8 * vapourPa
        expect(Math.abs(saturationPressurePa(dewC) - vapourPa)).toBeLessThanOrEqual(slackPa)
      }),
    )
  })

  test('is the air itself when the air is saturated, and below it otherwise', () => {
    expect(dewPointC({ airC: 21.5, humidity: 1 })).toBe(21.5)
    fc.assert(
      fc.property(within(-40, 80), within(0.01, 0.999), (airC, humidity) => {
        expect(dewPointC({ airC, humidity })).toBeLessThan(airC)
      }),
    )
  })

  test('rises with humidity', () => {
    fc.assert(
      fc.property(within(-40, 80), within(0.01, 0.98), (airC, humidity) => {
        expect(dewPointC({ airC, humidity: humidity + 0.01 })).toBeGreaterThan(
          dewPointC({ airC, humidity }),
        )
      }),
    )
  })
})

/**
 * Thickness that keeps a flat cold surface dry [in], rounded up to the next tenth of an inch as the handbook's table
 * does: d = λ/h · (dew point − cold side)/(air − dew point), its eq. (14); λ = 0.043, h = 6.8, air 80 °F, cold side 40 °F.
 */
function dryThicknessMm(humidity: number): number {
  const [airC, coldC] = [48 / 1.8, 8 / 1.8]
  const dewC = dewPointC({ airC, humidity })
  const thicknessIn = ((0.043 / 6.8) * (dewC - coldC)) / (airC - dewC) / 0.0254
  return (Math.ceil(thicknessIn * 10) / 10) * 25.4
}

describe('thickness against condensation', () => {
  const from = 'ASHRAE Handbook Fundamentals 2021, ch. 23, table 4'
  published(dryThicknessMm, [
    { from, given: 0.3, printed: '2.5' },
    {
      from,
      given: 0.4,
      printed: '5.0',
      within: { absolute: 0.2, because: 'printed to half a millimetre' },
    },
    {
      from,
      given: 0.5,
      printed: '7.5',
      within: { absolute: 0.2, because: 'printed to half a millimetre' },
    },
    { from, given: 0.6, printed: '13' },
    { from, given: 0.7, printed: '18' },
    { from, given: 0.8, printed: '33' },
    { from, given: 0.9, printed: '74' },
    {
      from,
      given: 0.95,
      printed: '150',
      within: {
        fraction: 0.06,
        because: 'so near saturation 0.05 K of dew point are 6 % of the thickness',
      },
    },
  ])
})
