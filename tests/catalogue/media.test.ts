import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import type { Figure } from '#catalogue/figure.ts'
import { saturationTemperatureC } from '#catalogue/lookup.ts'
import {
  densityOf,
  heatCapacityOf,
  latentHeatJPerKg,
  type MediumAt,
  type MediumWord,
} from '#catalogue/media.ts'
import { published } from '../published.ts'
import { shippedCatalogue } from './shipped-catalogue.ts'

const catalogue = shippedCatalogue()

function value(figure: Figure): number {
  if (!figure.ok) throw new Error(figure.reason)
  return figure.value
}
const at = (medium: MediumWord, temperatureC: number): MediumAt => ({ medium, temperatureC })

describe('heat capacity', () => {
  const if97 = 'IAPWS-IF97, computed with an open implementation'
  const between = { fraction: 5e-4, because: 'linear between states 10 K apart' }
  published<MediumAt>(
    (given) => value(heatCapacityOf(catalogue, given)),
    [
      { from: if97, given: at('water', 0), printed: '4219.4' },
      { from: if97, given: at('water', 80), printed: '4195.5' },
      { from: if97, given: at('water', 250), printed: '4865' },
      {
        from: 'water at 25 °C and 1 atm, property tables, from memory',
        given: at('water', 25),
        printed: '4181.6',
        within: between,
      },
      {
        from: 'Melinder 2010, ethylene glycol 30 %, through an open property library',
        given: at('glycol', 20),
        printed: '3718',
      },
      {
        from: 'Melinder 2010, ethylene glycol 30 %, through an open property library',
        given: at('glycol', -10),
        printed: '3627',
      },
      {
        from: 'generic mineral heat-transfer oil, estimate',
        given: at('oil', 200),
        printed: '2530',
      },
      {
        from: 'dry air at 300 K, property tables, from memory',
        given: at('air', 26.85),
        printed: '1007',
      },
    ],
  )

  test('says what it takes a medium for', () => {
    const words = (medium: MediumWord, temperatureC = 120) => {
      const figure = heatCapacityOf(catalogue, at(medium, temperatureC))
      return figure.ok ? figure.assumption : figure.reason
    }
    expect(words('water')).toBeNull()
    expect(words('glycol', 50)).toBe('Glycol is taken as ethylene glycol in water, 30 % by mass.')
    expect(words('steam')).toBe('Steam is taken as dry and saturated at its temperature.')
    expect(words('air')).toBe('Air is taken as dry.')
    expect(words('oil')).toContain('data sheet of the oil')
  })

  test.each([
    ['water', -5, 'The heat capacity of water is tabled from 0 to 250 °C, not at −5 °C.'],
    ['glycol', -30, 'The heat capacity of glycol is tabled from −10 to 100 °C, not at −30 °C.'],
    ['steam', 20, 'The heat capacity of steam is tabled from 32.9 to 373.7 °C, not at 20 °C.'],
    [
      'other',
      20,
      'The heat capacity of a medium given as "other" is not known: name water, steam, air, glycol or oil if it is one of them.',
    ],
  ] as const)('of %s at %d °C is not known, and why', (medium, temperatureC, reason) => {
    expect(heatCapacityOf(catalogue, at(medium, temperatureC))).toEqual({ ok: false, reason })
  })

  test('without rows says that there are none', () => {
    expect(heatCapacityOf({ ...catalogue, media: [] }, at('water', 20))).toEqual({
      ok: false,
      reason: 'The catalogue holds no heat capacity of water.',
    })
  })
})

describe('density', () => {
  published<MediumAt>(
    (given) => value(densityOf(catalogue, given)),
    [
      {
        from: 'IAPWS-IF97, computed with an open implementation',
        given: at('water', 60),
        printed: '983.21',
      },
      {
        from: 'water at 25 °C and 1 atm, property tables, from memory',
        given: at('water', 25),
        printed: '997.05',
        within: { fraction: 2e-4, because: 'linear between states 10 K apart' },
      },
      {
        from: 'Melinder 2010, ethylene glycol 30 %, through an open property library',
        given: at('glycol', 20),
        printed: '1038',
      },
    ],
  )

  test('of air is that of an ideal gas at 1.01325 bar', () => {
    for (const temperatureC of [-20, 0, 20, 60, 120, 200]) {
      const figure = densityOf(catalogue, at('air', temperatureC))
      const idealKgPerM3 = 101_325 / (287.05 * (temperatureC + 273.15))
      // Linear between states 50 K apart.
      expect(Math.abs(value(figure) / idealKgPerM3 - 1)).toBeLessThan(0.012)
      expect(figure).toMatchObject({ assumption: 'Air is taken as dry and at 1.01325 bar.' })
    }
  })

  test('of everything but steam falls as it gets hotter', () => {
    for (const medium of ['water', 'air', 'glycol', 'oil'] as const) {
      const temperatures = [20, 25, 30, 45, 60, 75, 99]
      const densities = temperatures.map((t) => value(densityOf(catalogue, at(medium, t))))
      expect(densities).toEqual([...densities].sort((a, b) => b - a))
    }
    const steam = [100, 150, 200, 250].map((t) => value(densityOf(catalogue, at('steam', t))))
    expect(steam).toEqual([...steam].sort((a, b) => a - b))
  })
})

describe('latent heat of steam', () => {
  published<{ temperatureC: number }>(
    ({ temperatureC }) => value(latentHeatJPerKg(catalogue.steam, temperatureC)) / 1000,
    [
      {
        from: 'steam tables, saturation at 100 °C, from memory',
        given: { temperatureC: 100 },
        printed: '2256.5',
        within: { fraction: 1e-3, because: 'linear between tabled pressures' },
      },
      {
        from: 'steam tables, saturation at 180 °C, from memory',
        given: { temperatureC: 180 },
        printed: '2014',
        within: { fraction: 1e-3, because: 'linear between tabled pressures' },
      },
      {
        from: 'Moran and Shapiro, Fundamentals of Engineering Thermodynamics, table A-2 quoted in example 11.4',
        given: { temperatureC: 100 },
        printed: '2257.0',
        within: { fraction: 1e-3, because: 'linear between tabled pressures' },
      },
    ],
  )

  // Figures in Btu per pound at pounds per square inch; the state is found by its pressure, as for a run of steam.
  published<{ psia: number }>(
    ({ psia }) => {
      const saturation = saturationTemperatureC(catalogue.steam, psia * 6894.757 - 101_325)
      if (!saturation.ok) throw new Error(saturation.message)
      return value(latentHeatJPerKg(catalogue.steam, saturation.temperatureC)) / 2326
    },
    [
      {
        from: 'Granet and Bluestein, Thermodynamics and Heat Power, problem 5.4',
        given: { psia: 115 },
        printed: '881.1',
        within: { fraction: 1e-3, because: 'linear between tabled pressures' },
      },
    ],
  )

  test('falls with temperature', () => {
    fc.assert(
      fc.property(fc.double({ min: 33, max: 372, noNaN: true }), (temperatureC) => {
        const [here, hotter] = [temperatureC, temperatureC + 1].map((t) =>
          value(latentHeatJPerKg(catalogue.steam, t)),
        )
        expect(here).toBeGreaterThan(hotter ?? 0)
      }),
    )
  })

  test('ends with its table', () => {
    expect(latentHeatJPerKg(catalogue.steam, 400)).toEqual({
      ok: false,
      reason: 'The latent heat of steam is tabled from 32.9 to 373.7 °C, not at 400 °C.',
    })
  })
})

test('no figure is anything but a positive number or a sentence', () => {
  const media = ['water', 'steam', 'air', 'glycol', 'oil', 'other'] as const
  fc.assert(
    fc.property(
      fc.constantFrom(...media),
      fc.double({ min: -273, max: 2000, noNaN: true }),
      (medium, temperatureC) => {
        for (const figureOf of [heatCapacityOf, densityOf]) {
          const figure = figureOf(catalogue, at(medium, temperatureC))
          if (figure.ok) expect(Number.isFinite(figure.value) && figure.value > 0).toBe(true)
          else expect(figure.reason).toMatch(/^The .*\.$/)
        }
      },
    ),
  )
})
