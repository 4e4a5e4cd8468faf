/** Heads of vessels, by hand and by the area that a thin layer needs. */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { grown } from '#solver/grown.ts'
import { headOuterAreaM2, headVolumeM3 } from '#solver/heads.ts'
import { spread } from './arbitraries.ts'

// Lagged by 0.5 m, a disc of 1 m is 2 m across: π m², and π/2 m³ of lagging.
test('a flat head is a disc as wide as the lagged shell', () => {
  expect(headOuterAreaM2('flat', 1, 0.5)).toBeCloseTo(Math.PI, 12)
  expect(headVolumeM3('flat', 1, 0.5)).toBeCloseTo(Math.PI / 2, 12)
  expect(headVolumeM3('flat', 1, 0)).toBe(0)
})

describe('a domed head', () => {
  // Perry's handbook: 1.084 D² bare. The half sphere of that area has the radius √(1.084/2π) = 0.4154 D.
  test('is the half sphere of its area, a thickness larger all round', () => {
    expect(headOuterAreaM2('domed', 1, 0)).toBeCloseTo(1.084, 3)
    const radiusM = Math.sqrt(headOuterAreaM2('domed', 1, 0) / (2 * Math.PI))
    expect(radiusM).toBeCloseTo(0.4154, 4)
    expect(headOuterAreaM2('domed', 1, 0.1)).toBeCloseTo(2 * Math.PI * (radiusM + 0.1) ** 2, 12)
  })

  // Half a sphere of radius 1 m holds 2.0944 m³.
  test('holds two thirds of its base times its radius', () => {
    const bareM = 1 / Math.sqrt(headOuterAreaM2('domed', 1, 0) / (2 * Math.PI))
    expect(headVolumeM3('domed', bareM, 0)).toBeCloseTo(2.0944, 4)
  })

  test('a thin layer takes its area times its thickness', () => {
    fc.assert(
      fc.property(spread(0.05, 20), spread(1e-3, 1), (diameterM, thicknessM) => {
        const thinM = 1e-6 * diameterM
        const layerM3 =
          headVolumeM3('domed', diameterM, thicknessM + thinM) -
          headVolumeM3('domed', diameterM, thicknessM)
        expect(layerM3 / thinM / headOuterAreaM2('domed', diameterM, thicknessM)).toBeCloseTo(1, 4)
      }),
    )
  })
})

// Shell 1 m across and 3 m long under 0.5 m: area 2π · 3 and two discs of π; volume π · 3 and two discs of π/2.
test('a vessel is its shell and its two heads', () => {
  const vessel = { kind: 'vessel', outerDiameterM: 1, shellLengthM: 3, heads: 'flat' } as const
  for (const orientation of ['horizontal', 'vertical'] as const) {
    const { areaM2, volumeM3 } = grown({ ...vessel, orientation }, 0.5)
    expect(areaM2).toBeCloseTo(8 * Math.PI, 12)
    expect(volumeM3).toBeCloseTo(4 * Math.PI, 12)
  }
})
