import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { radiationWPerM2K } from '#solver/radiation.ts'
import { published } from '../published.ts'
import { within } from './arbitraries.ts'

type Given = { emissivity: number; surfaceC: number; surroundingsC: number }
const coefficient = ({ emissivity, surfaceC, surroundingsC }: Given) =>
  radiationWPerM2K(emissivity, surfaceC, surroundingsC)

describe('radiationWPerM2K', () => {
  published(coefficient, [
    {
      from: 'ASHRAE Handbook Fundamentals 2021, ch. 4, example 12',
      given: { emissivity: 0.7, surfaceC: 24.1, surroundingsC: 30 },
      printed: '4.3',
    },
  ])

  // Between 0 K and 100 K a black surface sends σ·100⁴.
  published(
    (temperatureK: number) =>
      radiationWPerM2K(1, temperatureK - 273.15, -273.15) / temperatureK ** 3,
    [{ from: 'CODATA 2018, Stefan-Boltzmann constant', given: 100, printed: '5.670374419e-8' }],
  )

  test('times the difference is εσ(T⁴ − T_r⁴), and the same seen from either side', () => {
    fc.assert(
      fc.property(within(0.01, 1), within(-200, 1000), within(-100, 400), (emissivity, a, b) => {
        const exact = emissivity * 5.670374419e-8 * ((a + 273.15) ** 4 - (b + 273.15) ** 4)
        const ours = radiationWPerM2K(emissivity, a, b) * (a - b)
        expect(Math.abs(ours - exact)).toBeLessThan(1e-9 * Math.max(1, Math.abs(exact)))
        expect(radiationWPerM2K(emissivity, b, a)).toBeCloseTo(
          radiationWPerM2K(emissivity, a, b),
          12,
        )
      }),
    )
  })
})
