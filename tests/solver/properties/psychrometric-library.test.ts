/**
 * Moist air and standard atmosphere beside a psychrometric library of the npm registry, which follows the same chapter
 * of the handbook by its own program.
 */
import psychrolib from 'psychrolib'
import { beforeAll, describe, expect, test } from 'vitest'
import { airDensityKgPerM3, standardPressurePa } from '#solver/properties/air.ts'
import { dewPointC, saturationPressurePa } from '#solver/properties/moist-air.ts'
import { type PublishedRow, published, type Within } from '../../published.ts'

const library = 'psychrolib 1.1.1'
const inUnits = <Value>(compute: () => Value): Value => {
  psychrolib.SetUnitSystem(psychrolib.SI)
  return compute()
}
beforeAll(() => psychrolib.SetUnitSystem(psychrolib.SI))

/** What the library computes, to as many digits as make sense to compare. */
const rows = <Given>(
  of: string,
  givens: readonly Given[],
  compute: (given: Given) => string,
  within?: Within,
): PublishedRow<Given>[] =>
  inUnits(() =>
    givens.map((given) => ({
      from: `${library}, ${of}`,
      given,
      printed: compute(given),
      ...(within ? { within } : {}),
    })),
  )

const steps = (from: number, to: number, step: number): number[] =>
  Array.from({ length: Math.floor((to - from) / step) + 1 }, (_, j) => from + j * step)

/** Both use the equations of Hyland and Wexler; ten digits of their coefficients leave no more than this. */
const SAME_EQUATION = 1e-9

describe('saturation pressure', () => {
  published(
    saturationPressurePa,
    rows('GetSatVapPres', [-100, -60, -40, -20, -5, 5, 25, 60, 100, 150, 200], (tempC) =>
      psychrolib.GetSatVapPres(tempC).toPrecision(7),
    ),
  )

  test('is the same over ice and over water, every quarter of a kelvin', () => {
    // From 0 °C to 0.01 °C the library is still over ice, which the handbook prints from 0 °C down.
    for (const tempC of steps(-100, 200, 0.25).filter((t) => t !== 0)) {
      const ratio = saturationPressurePa(tempC) / psychrolib.GetSatVapPres(tempC)
      expect(Math.abs(ratio - 1), `${tempC} °C`).toBeLessThan(SAME_EQUATION)
    }
  })

  test('at 0 °C itself, ice there and water here, differs by the 110 ppm between both equations', () => {
    const ratio = saturationPressurePa(0) / psychrolib.GetSatVapPres(0)
    expect(Math.abs(ratio - 1)).toBeLessThan(1.2e-4)
  })
})

/** The library ends its own search when two steps lie this near. */
const ITS_SEARCH_K = 1e-3

describe('dew point', () => {
  const grid = [-30, -10, 5, 15, 25, 35, 50, 75].flatMap((airC) =>
    [0.05, 0.3, 0.6, 0.95].map((humidity) => ({ airC, humidity })),
  )
  published(
    dewPointC,
    rows(
      'GetTDewPointFromRelHum',
      grid,
      ({ airC, humidity }) => psychrolib.GetTDewPointFromRelHum(airC, humidity).toFixed(3),
      { absolute: ITS_SEARCH_K, because: 'the library ends its own search 0.001 K apart' },
    ),
  )
  published(dewPointC, [
    { from: `${library}, its own example`, given: { airC: 25, humidity: 0.8 }, printed: '21.3094' },
  ])

  test('is the same all over the range of humidity and air, at 1 K and 1 %', () => {
    for (const airC of steps(-40, 80, 1)) {
      for (const percent of steps(1, 100, 1)) {
        const given = { airC, humidity: percent / 100 }
        const theirs = psychrolib.GetTDewPointFromRelHum(airC, given.humidity)
        // The library is over ice up to 0.01 °C: humid air of 0 °C, and a dew point there, is ice to it and water here.
        const slackK = Math.abs(theirs) < 0.02 ? 0.012 : (airC === 0 ? 2 : 1) * ITS_SEARCH_K
        expect(Math.abs(dewPointC(given) - theirs), JSON.stringify(given)).toBeLessThan(slackK)
      }
    }
  })

  test('has the vapour pressure of the library', () => {
    for (const airC of [-25, 1, 22, 48]) {
      const vapourPa = psychrolib.GetVapPresFromRelHum(airC, 0.4)
      const ours = saturationPressurePa(dewPointC({ airC, humidity: 0.4 }))
      expect(Math.abs(ours / vapourPa - 1), `${airC} °C`).toBeLessThan(1e-7)
    }
  })
})

describe('pressure at an altitude', () => {
  const altitudesM = [-500, 0, 250, 1500, 3000, 6000, 10000]
  published(
    standardPressurePa,
    rows('GetStandardAtmPressure', altitudesM, (altitudeM) =>
      psychrolib.GetStandardAtmPressure(altitudeM).toFixed(1),
    ),
  )

  test('is the same every 50 m', () => {
    for (const altitudeM of steps(-5000, 11000, 50)) {
      const ratio = standardPressurePa(altitudeM) / psychrolib.GetStandardAtmPressure(altitudeM)
      expect(Math.abs(ratio - 1), `${altitudeM} m`).toBeLessThan(SAME_EQUATION)
    }
  })
})

describe('density of dry air', () => {
  const gasConstant = {
    fraction: 5e-5,
    because: 'the library takes 287.042 J/(kg·K) for dry air, the handbook here 287.05',
  }
  published(
    ({ tempC, pressurePa }) => airDensityKgPerM3(tempC, pressurePa),
    rows(
      'GetDryAirDensity',
      [-40, 0, 25, 120].flatMap((tempC) => [70000, 101325].map((p) => ({ tempC, pressurePa: p }))),
      ({ tempC, pressurePa }) => psychrolib.GetDryAirDensity(tempC, pressurePa).toPrecision(6),
      gasConstant,
    ),
  )
})
