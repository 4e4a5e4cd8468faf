/** Where the detailed formulas leave their ranges or step, and how that is told. */
import { describe, expect, test } from 'vitest'
import { nusseltSlenderCylinder, nusseltVerticalPlate } from '#solver/convection/natural.ts'
import type { Shape, System } from '#solver/types.ts'
import { filmNumbers } from './oracle.ts'
import { constant, lying, still } from './systems.ts'
import { base, textsOf } from './told.ts'

// The fits of the air hold from 200 to 1000 K.
test.each([
  [
    -150,
    -50,
    [
      'Air at a film temperature of -100 °C is outside the fitted range of its heat capacity, −73 to 727 °C.',
    ],
  ],
  [-96, -50, []],
  [
    -97,
    -50,
    [
      'Air at a film temperature of -74 °C is outside the fitted range of its heat capacity, −73 to 727 °C.',
    ],
  ],
  [1000, 400, []],
  [
    1000,
    460,
    [
      'Air at a film temperature of 730 °C is outside the fitted range of its heat capacity, −73 to 727 °C.',
    ],
  ],
])('bare at %d °C in air of %d °C the film says %j', (mediumC, airC, expected) => {
  const system: System = { ...base, shape: lying(0.1), layers: [], mediumC, around: still(airC) }
  expect(textsOf(system, 'film-range')).toEqual(expected)
})

describe('a step of the detailed set', () => {
  const bare = (shape: Shape, excessK: number, film: System['film'] = 'detailed'): System => ({
    ...base,
    shape,
    film,
    layers: [],
    mediumC: 20 + excessK,
  })
  /** As long as brings the Rayleigh number there: it goes with the third power of the length. */
  const longAs = (make: (lengthM: number) => Shape, rayleigh: number): number =>
    Math.cbrt(rayleigh / filmNumbers(bare(make(1), 10), 0, 30).rayleigh)

  const plate = (characteristicLengthM: number): Shape => ({
    kind: 'flat',
    facing: 'up',
    characteristicLengthM,
  })

  // 0.54 Ra^(1/4) becomes 0.15 Ra^(1/3) at Ra 8e6: 28.72 and 30.00.
  test.each([
    [0.94, 0],
    [0.96, 1],
    [1.04, 1],
    [1.06, 0],
  ])('of a plate is told at %d of its Rayleigh number: %d notes', (share, count) => {
    const texts = textsOf(bare(plate(longAs(plate, share * 8e6)), 10), 'film-jump')
    expect(texts).toHaveLength(count)
    for (const text of texts) {
      expect(text).toContain(
        `All round: the Rayleigh number of free convection, ${share * 8} × 10⁶,`,
      )
      expect(text).toMatch(/is near 8 × 10⁶, where the formula rises by 4 %\.$/)
    }
  })

  test('is told of a plate under the simplified set too, which has no formula of its own for it', () => {
    const shape = plate(longAs(plate, 8e6))
    expect(textsOf(bare(shape, 10, 'simplified'), 'film-jump')).toHaveLength(1)
    expect(textsOf(bare(shape, 10, { fixedWPerM2K: 9 }), 'film-jump')).toEqual([])
  })

  const upright =
    (orientation: 'vertical' | 'inclined', slenderness: number) =>
    (riseM: number): Shape => ({
      kind: 'pipe',
      outerDiameterM: riseM / slenderness,
      orientation,
      riseM,
    })

  // At Ra 1e9 a plate has Nu 121 (Pr 0.71); a cylinder 100 times as high as wide 4/3 (7 · 7.1e8/(5 · 34.9))^(1/4) +
  // 4 · 495.7 · 100/(35 · 108.7) = 150.
  test.each(['vertical', 'inclined'] as const)('of a thin %s pipe is told', (orientation) => {
    const make = upright(orientation, 100)
    const shape = make(longAs(make, 1e9))
    const [text = '', ...more] = textsOf(bare(shape, 10), 'film-jump')
    expect(more).toEqual([])
    const { prandtl } = filmNumbers(bare(shape, 10), 0, 30)
    const atStep = { rayleigh: 1e9, prandtl, slenderness: 100 }
    const share = nusseltVerticalPlate(atStep) / nusseltSlenderCylinder(atStep) - 1
    expect(text).toContain(
      `is near 1 × 10⁹, where the formula drops by ${(-100 * share).toFixed(0)} %.`,
    )
    // The simplified set changes over near there too, and speaks for itself.
    for (const other of textsOf(bare(shape, 10, 'simplified'), 'film-jump')) {
      expect(other).not.toContain('Rayleigh')
    }
  })

  test('of a thick pipe, which is a plate on both sides of it, is not', () => {
    const make = upright('vertical', 2)
    expect(textsOf(bare(make(longAs(make, 1e9)), 10), 'film-jump')).toEqual([])
  })
})

const mantissa = (value: number): number => Number(value.toExponential(2).split('e')[0])

describe('the range of a film formula', () => {
  const storm = { ...still(20), windMPerS: 60 }

  // 4 m/s over 1.2 m of air of 20 °C, ν 1.51e-5 m²/s.
  test('of a sphere in wind is read at the temperature of the air', () => {
    const sphere: System = {
      ...base,
      shape: { kind: 'sphere', outerDiameterM: 1.2 },
      layers: [],
      mediumC: 400,
      around: { ...still(20), windMPerS: 4 },
    }
    expect(textsOf(sphere, 'film-range')).toEqual([
      expect.stringMatching(/^Whitaker, sphere in wind: Reynolds number 31[5-9]000 is outside/),
    ])
  })

  test('of a pipe in wind, and of a wall in still air, at that of the film', () => {
    const pipe: System = { ...base, shape: lying(20), layers: [], mediumC: 600, around: storm }
    const { reynolds } = filmNumbers(pipe, 0, 600)
    expect(textsOf(pipe, 'film-range')[0]).toContain(
      `Reynolds number ${mantissa(reynolds)} × 10⁷ is`,
    )
    const wall: System = {
      ...base,
      shape: { kind: 'flat', facing: 'vertical', characteristicLengthM: 40 },
      layers: [],
      mediumC: 300,
    }
    const { rayleigh } = filmNumbers(wall, 0, 300)
    expect(textsOf(wall, 'film-range')).toEqual([
      expect.stringContaining(`Rayleigh number ${mantissa(rayleigh)} × 10¹⁴ is`),
    ])
  })

  test('is no matter of soil, nor of a coefficient that was given', () => {
    const shape = { kind: 'buried-pipe', outerDiameterM: 20, depthM: 20, soilWPerMK: 1.5 } as const
    expect(textsOf({ ...base, shape, layers: [], around: storm }, 'film-range')).toEqual([])
    const pipe: System = { ...base, shape: lying(20), layers: [], around: storm }
    expect(textsOf(pipe, 'film-range')).not.toEqual([])
    expect(textsOf({ ...pipe, film: { fixedWPerM2K: 9 } }, 'film-range')).toEqual([])
  })

  // 3 mm high and 0.01 K warmer than the air, Ra is some 0.03: below the plate's 0.1, but not below the thin cylinder's 0.
  test('of a short upright wire is that of the thin cylinder, of a short stub that of the plate', () => {
    const upright = (outerDiameterM: number): System => ({
      ...base,
      shape: { kind: 'pipe', outerDiameterM, orientation: 'vertical', riseM: 0.003 },
      layers: [],
      mediumC: 20.011,
    })
    expect(textsOf(upright(0.0001), 'film-range')).toEqual([])
    expect(textsOf(upright(0.02), 'film-range')).toEqual([
      expect.stringContaining('Churchill-Chu, vertical plate: Rayleigh number 0.0'),
    ])
  })

  // 4 m/s across 2 m is where the wall's formula steps, not the pipe's.
  test('of a pipe in wind under the simplified set is not that of a wall', () => {
    const shape = lying(2)
    const system: System = {
      ...base,
      film: 'simplified',
      shape,
      layers: [],
      around: { ...still(20), windMPerS: 4 },
    }
    expect(textsOf(system, 'film-jump')).toEqual([])
  })
})

test('of a plate that faces down it is the cold one that drives the air', () => {
  const plate = (facing: 'up' | 'down', mediumC: number): System => ({
    ...base,
    shape: { kind: 'flat', facing, characteristicLengthM: 0.2 },
    layers: [],
    mediumC,
  })
  // Length over which the driving formula steps at Ra 8e6, at 10 K either way.
  const at = (system: System): System => {
    const { rayleigh } = filmNumbers(system, 0, system.mediumC)
    const characteristicLengthM = 0.2 * Math.cbrt(8e6 / rayleigh)
    return system.shape.kind === 'flat'
      ? { ...system, shape: { ...system.shape, characteristicLengthM } }
      : system
  }
  expect(textsOf(at(plate('down', 10)), 'film-jump')).toHaveLength(1)
  expect(textsOf(at(plate('down', 30)), 'film-jump')).toEqual([])
  expect(textsOf(at(plate('up', 30)), 'film-jump')).toHaveLength(1)
  expect(textsOf(at(plate('up', 10)), 'film-jump')).toEqual([])
})

test('a balance on a step is told with its side', () => {
  const plate: System = {
    ...base,
    shape: { kind: 'flat', facing: 'up', characteristicLengthM: 0.14 },
    layers: [constant(0.05, 0.04)],
    emissivity: 0.05,
    mediumC: 340,
  }
  expect(textsOf(plate, 'film-jump')).toEqual([
    expect.stringMatching(/^All round: the balance falls on the jump between two ranges/),
  ])
})
