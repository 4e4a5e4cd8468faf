/** A vector of our own that no print confirms. */
import { describe, expect, test } from 'vitest'
import {
  coolingTimeS,
  FREEZING_C,
  freezingTimeOfThinIceS,
  freezingTimeS,
  USUAL_ICE_FRACTION,
  wallCapacityJPerMK,
  waterCapacityJPerMK,
} from '#solver/frost.ts'

describe('steel pipe 52.5/60.3 mm with 30 mm of 0.035 W/(m·K), 10 W/(m²·K) outside, 10 °C in air of −15 °C', () => {
  const resistanceMKPerW =
    Math.log(120.3 / 60.3) / (2 * Math.PI * 0.035) + 1 / (10 * Math.PI * 0.1203)
  const capacityJPerMK =
    waterCapacityJPerMK(0.0525) +
    wallCapacityJPerMK({
      outerDiameterM: 0.0603,
      boreM: 0.0525,
      densityKgPerM3: 7850,
      heatCapacityJPerKgK: 460,
    })

  test('resistance and capacity', () => {
    expect(resistanceMKPerW).toBeCloseTo(3.40521, 5)
    expect(capacityJPerMK).toBeCloseTo(11565.6, 1)
  })

  test('hours to the freezing point, and from there to a quarter of ice', () => {
    const cooling = { capacityJPerMK, resistanceMKPerW, startC: 10, endC: FREEZING_C, airC: -15 }
    expect((coolingTimeS(cooling) ?? 0) / 3600).toBeCloseTo(5.588, 3)
    const freezing = {
      iceFraction: USUAL_ICE_FRACTION,
      boreM: 0.0525,
      resistanceMKPerW,
      airC: -15,
    }
    expect((freezingTimeOfThinIceS(freezing) ?? 0) / 3600).toBeCloseTo(10.487, 3)
    // The ice's own resistance adds (0.25 + 0.75 ln 0.75)/(4π · 2.2) to 0.25 · 3.40521: 0.14 %.
    const ratio = (freezingTimeS(freezing) ?? 0) / (freezingTimeOfThinIceS(freezing) ?? 0)
    expect(ratio).toBeCloseTo(1.00145, 5)
  })
})
