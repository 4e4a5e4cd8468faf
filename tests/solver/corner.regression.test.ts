/** Worked examples from memory, and vectors of our own that no print confirms. */
import { describe, expect, test } from 'vitest'
import { edgeFactorResistanceMKPerW, meanPerimeterResistanceMKPerW } from '#solver/corner.ts'
import { published } from '../published.ts'

describe('edge shape factor', () => {
  // Holman 3-2, from memory: a furnace of 0.5 m a side inside, walls of 0.1 m, k 1.04, 500 to 50 °C; six walls of the
  // shape factor 2.5 m, twelve edges of 0.27 m, eight corners of 0.15 · 0.1 m.
  published(
    (_: { sideM: number; wallM: number }) => {
      const round = edgeFactorResistanceMKPerW({
        innerPerimeterM: 4 * 0.5,
        thicknessM: 0.1,
        conductivityWPerMK: 1.04,
      })
      // Four walls and four edges along half a metre; the two other walls, the eight other edges and the corners are plain.
      const restM = 2 * 2.5 + 8 * 0.54 * 0.5 + 8 * 0.15 * 0.1
      return (0.5 / round + 1.04 * restM) * (500 - 50)
    },
    [
      {
        from: 'Holman 3-2, cubical furnace (from memory)',
        given: { sideM: 0.5, wallM: 0.1 },
        printed: '8592',
      },
    ],
  )
})

describe('our own vectors', () => {
  test('duct 0.6 × 0.4 m, 50 mm of 0.04 W/(m·K)', () => {
    const duct = { innerPerimeterM: 2, thicknessM: 0.05, conductivityWPerMK: 0.04 }
    expect(meanPerimeterResistanceMKPerW(duct)).toBeCloseTo(0.568182, 6)
    expect(edgeFactorResistanceMKPerW(duct)).toBeCloseTo(0.593, 4)
  })
})
