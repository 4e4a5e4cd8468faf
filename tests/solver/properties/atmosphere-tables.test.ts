/** Vapour pressure, dew point and the standard atmosphere beside tables and check values of other hands. */
import { describe } from 'vitest'
import { airDensityKgPerM3, standardPressurePa } from '#solver/properties/air.ts'
import { dewPointC, saturationPressurePa } from '#solver/properties/moist-air.ts'
import { type PublishedRow, published, type Within } from '../../published.ts'

const rows = <Given>(
  from: string,
  within: Within,
  cells: readonly (readonly [given: Given, printed: string])[],
): PublishedRow<Given>[] => cells.map(([given, printed]) => ({ from, given, printed, within }))

describe('saturation pressure at the check values of the formulations for water', () => {
  const within = { fraction: 3e-4, because: 'the handbook vouches for its equation to 300 ppm' }
  const ofKelvin = (temperatureK: number): number => saturationPressurePa(temperatureK - 273.15)
  published(
    (temperatureK: number) => ofKelvin(temperatureK) / 1e6,
    rows('IAPWS-IF97, table 35, saturation pressure', within, [[300, '0.353658941e-2']]),
  )
  published(
    ofKelvin,
    rows(
      'IAPWS R14-08, check value of the pressure of sublimation',
      { fraction: 4e-4, because: 'so cold, the equation of the handbook lies 320 ppm above it' },
      [[230, '8.94735']],
    ),
  )
})

describe('the temperature of saturation', () => {
  // Steam that fills the air of 200 °C to a share of saturation dews at its own temperature of saturation.
  published(
    (pressureMPa: number) =>
      dewPointC({ airC: 200, humidity: (pressureMPa * 1e6) / saturationPressurePa(200) }) + 273.15,
    rows(
      'IAPWS-IF97, table 36, saturation temperature',
      { absolute: 0.015, because: 'the handbook vouches for its equation to 300 ppm of pressure' },
      [
        [0.1, '372.755919'],
        [1, '453.035632'],
      ],
    ),
  )
})

describe('vapour pressure of water [kPa]', () => {
  published(
    (tempC: number) => saturationPressurePa(tempC) / 1000,
    rows(
      'public table of the vapour pressure of water',
      { fraction: 1.2e-3, because: 'the table is of an older scale of temperature' },
      [
        [5, '0.8726'],
        [10, '1.2281'],
        [15, '1.7056'],
        [20, '2.3388'],
        [25, '3.1690'],
        [30, '4.2455'],
        [40, '7.3814'],
        [60, '19.9320'],
        [80, '47.3730'],
        [100, '101.3200'],
      ],
    ),
  )
})

describe('vapour pressure of ice [mm of mercury]', () => {
  const MERCURY_PA = 133.322
  published(
    (tempC: number) => saturationPressurePa(tempC) / MERCURY_PA,
    rows(
      "hygrometer's manual, table A-1, vapour pressure over ice",
      { fraction: 2.5e-3, because: 'the table is of an older equation and scale' },
      [
        [-20, '0.776'],
        [-15, '1.241'],
        [-10, '1.950'],
        [-5, '3.013'],
        [-1, '4.217'],
      ],
    ),
  )
})

describe('dew point of humid air', () => {
  type Dew = Parameters<typeof dewPointC>[0]
  const cells = (airC: number, ...printed: readonly [at70: string, at80: string, at90: string]) =>
    printed.map((dewC, j): [Dew, string] => [{ airC, humidity: (7 + j) / 10 }, dewC])
  // In drier air the same table lies up to 2 K lower, and is not what this one is for.
  published(
    dewPointC,
    rows(
      'climate table, absolute humidity and dew point',
      { absolute: 1, because: 'the table has whole degrees, cut off rather than rounded' },
      [
        ...cells(0, '-4', '-3', '-2'),
        ...cells(10, '4', '6', '8'),
        ...cells(20, '14', '16', '18'),
        ...cells(30, '24', '26', '28'),
        ...cells(40, '33', '36', '38'),
        ...cells(50, '43', '45', '48'),
      ],
    ),
  )
})

describe('the standard atmosphere', () => {
  const from = "Mechanical Engineers' Handbook, volume 4, table 6, US Standard Atmosphere"
  /** Geopotential altitude [m], temperature [K], pressure [bar], density [kg/m³]. */
  const table = [
    [0, 288.15, '1.0133', '1.2250'],
    [1000, 281.65, '0.8988', '1.1117'],
    [1999, 275.15, '0.7950', '1.0066'],
    [2999, 268.66, '0.7012', '0.9093'],
    [3997, 262.17, '0.6166', '0.8194'],
    [4996, 255.68, '0.5405', '0.7364'],
    [7990, 236.22, '0.3565', '0.5258'],
    [9984, 223.25, '0.2650', '0.4135'],
    [10981, 216.77, '0.2270', '0.3648'],
  ] as const
  published(
    (altitudeM: number) => standardPressurePa(altitudeM) / 1e5,
    rows(
      from,
      { absolute: 1.2e-4, because: 'altitude in whole metres, each up to 1.2e-4 bar' },
      table.map(([altitudeM, , bar]) => [altitudeM, bar] as const),
    ),
  )
  published(
    ({ temperatureK, pressureBar }: { temperatureK: number; pressureBar: number }) =>
      airDensityKgPerM3(temperatureK - 273.15, pressureBar * 1e5),
    rows(
      from,
      { fraction: 3e-4, because: 'the pressure is printed with four digits' },
      table.map(
        ([, temperatureK, bar, density]) =>
          [{ temperatureK, pressureBar: Number(bar) }, density] as const,
      ),
    ),
  )
})
