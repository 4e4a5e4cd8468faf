/** Worked examples as a published companion calculation gives them, or whose result is from memory. */
import { soilResistanceMKPerW } from '#solver/ground.ts'
import { published } from '../published.ts'

// Holman 3-1: a pipe of 75 °C, 4 m long, in earth whose surface has 5 °C.
published(
  (given: { depthM: number; outerDiameterM: number; soilWPerMK: number }) =>
    (4 * (75 - 5)) / (soilResistanceMKPerW(given) ?? Number.NaN),
  [
    {
      from: 'Holman 3-1, buried pipe (result from memory)',
      given: { depthM: 0.2, outerDiameterM: 0.15, soilWPerMK: 0.8 },
      printed: '859.6',
      within: { absolute: 0.3, because: 'the book rounds its shape factor to 15.35 m' },
    },
  ],
)

// Çengel 3-13: a hot-water pipe of 80 °C, 30 m long, in earth whose surface has 10 °C.
published(
  (given: { depthM: number; outerDiameterM: number; soilWPerMK: number }) =>
    (30 * (80 - 10)) / (soilResistanceMKPerW(given) ?? Number.NaN),
  [
    {
      from: 'Çengel 3-13, buried steam pipe',
      given: { depthM: 0.5, outerDiameterM: 0.1, soilWPerMK: 0.9 },
      printed: '3963',
      within: {
        fraction: 0.0015,
        because: 'the book takes ln(4H/D), its form for depth over 1.5 D',
      },
    },
  ],
)
