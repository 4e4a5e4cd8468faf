import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { nusseltCylinderInWind, nusseltPlateInWind } from '#solver/convection/forced.ts'
import { published } from '../../published.ts'
import { spread } from '../arbitraries.ts'

const library = 'reference text of a public heat-transfer library'

describe('nusseltCylinderInWind', () => {
  published(nusseltCylinderInWind, [
    {
      from: `${library}, Churchill-Bernstein`,
      given: { reynolds: 6071, prandtl: 0.7 },
      printed: '40.637',
    },
  ])

  test('has the limit 0.3 without wind', () => {
    expect(nusseltCylinderInWind({ reynolds: 0, prandtl: 0.7 })).toBeCloseTo(0.3, 12)
  })

  // At Re = 282 000 the last bracket is 1 + 1, so its power 4/5 is 2^0.8 = 1.741101.
  test('doubles its bracket at Re 282 000', () => {
    const base = (0.62 * Math.sqrt(282000)) / (1 + 0.4 ** (2 / 3)) ** 0.25
    expect(nusseltCylinderInWind({ reynolds: 282000, prandtl: 1 })).toBeCloseTo(
      0.3 + base * 1.7411011265922482,
      6,
    )
  })
})

describe('nusseltPlateInWind', () => {
  // 0.664 · 100 · 1 and 0.037 · (1e6)^0.8 = 0.037 · 63095.734.
  test.each([
    ['laminar form at low Re', 1e4, 66.4],
    ['rough form at high Re', 1e6, 2334.5422],
  ])('%s', (_, reynolds, expected) => {
    expect(nusseltPlateInWind({ reynolds, prandtl: 1 })).toBeCloseTo(expected, 3)
  })

  test('is the larger of both forms below Re 5e5, and never below the rough form', () => {
    fc.assert(
      fc.property(spread(1, 1e8), spread(0.6, 50), (reynolds, prandtl) => {
        const rough = 0.037 * reynolds ** 0.8 * prandtl ** (1 / 3)
        const laminar = 0.664 * reynolds ** 0.5 * prandtl ** (1 / 3)
        const expected = reynolds < 5e5 ? Math.max(rough, laminar) : rough
        expect(nusseltPlateInWind({ reynolds, prandtl }) / expected).toBeCloseTo(1, 12)
      }),
    )
  })

  test('both forms meet at Re 15 086, without a step', () => {
    const at = (reynolds: number) => nusseltPlateInWind({ reynolds, prandtl: 0.7 })
    const meeting = (0.664 / 0.037) ** (1 / 0.3)
    expect(at(meeting * (1 + 1e-9)) / at(meeting * (1 - 1e-9))).toBeCloseTo(1, 8)
  })
})

test('more wind never carries less heat', () => {
  fc.assert(
    fc.property(spread(1e-3, 1e8), spread(1, 10), spread(0.6, 10), (reynolds, factor, prandtl) => {
      for (const nusselt of [nusseltCylinderInWind, nusseltPlateInWind]) {
        expect(nusselt({ reynolds: reynolds * factor, prandtl })).toBeGreaterThanOrEqual(
          nusselt({ reynolds, prandtl }) * (1 - 1e-12),
        )
      }
    }),
  )
})
