/** The slope of radiation and the way back from a flux, against the law itself. */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { radiationSlopeWPerM2K, radiationWPerM2K, radiativeC } from '#solver/radiation.ts'
import { published } from '../published.ts'
import { within } from './arbitraries.ts'

const emissivity = within(0.01, 1)

describe('radiationSlopeWPerM2K', () => {
  // 4 · 5.670374419e-8 · 300³ = 6.124004.
  test('of a black surface at 300 K', () => {
    expect(radiationSlopeWPerM2K(1, 300 - 273.15)).toBeCloseTo(6.124004, 6)
  })

  test('is the coefficient itself where surface and surroundings are one', () => {
    fc.assert(
      fc.property(emissivity, within(-200, 1000), (ε, tempC) => {
        expect(radiationSlopeWPerM2K(ε, tempC) / radiationWPerM2K(ε, tempC, tempC)).toBeCloseTo(
          1,
          12,
        )
      }),
    )
  })
})

describe('radiativeC', () => {
  published(
    (fluxWPerM2: number) => radiativeC(0.8, -273.15, fluxWPerM2) + 273.15,
    [
      {
        from: 'Incropera 1.2, emissive power of a steam pipe, read backwards',
        given: 2270,
        printed: '473',
      },
    ],
  )

  test('is where the surface gives off the flux', () => {
    fc.assert(
      fc.property(emissivity, within(-100, 400), within(0, 1e5), (ε, surroundingsC, flux) => {
        const surfaceC = radiativeC(ε, surroundingsC, flux)
        const again = radiationWPerM2K(ε, surfaceC, surroundingsC) * (surfaceC - surroundingsC)
        expect(Math.abs(again - flux)).toBeLessThan(1e-9 * Math.max(flux, 1e3))
      }),
    )
  })
})
