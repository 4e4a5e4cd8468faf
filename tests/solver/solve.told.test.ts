/** What each note says: the figures that a reader needs stand in it, and it stands only where it is true. */
import { describe, expect, test } from 'vitest'
import { nusseltSlenderCylinder, nusseltVerticalPlate } from '#solver/convection/natural.ts'
import { notesOf } from '#solver/notes.ts'
import { solve } from '#solver/solve.ts'
import type { Shape, System } from '#solver/types.ts'
import { filmNumbers } from './oracle.ts'
import { constant, lying, plainFilm, still } from './systems.ts'

const base: Omit<System, 'shape' | 'layers'> = { ...plainFilm, mediumC: 60, around: still(20) }

const textsOf = (system: System, code: string): string[] =>
  notesOf(system, solve(system))
    .filter((note) => note.code === code)
    .map(({ text }) => text)

describe('corners of a duct', () => {
  const duct = (thicknessM: number, layers = [constant(thicknessM, 0.04)]): System => ({
    ...base,
    shape: { kind: 'rect-duct', widthM: 0.8, heightM: 0.4, riseM: null },
    layers,
  })

  // Shape factors over λ for P_i 2.4 m: mean perimeter (2P_i + 8d)/2d, corners P_i/d + 4 · 0.54 (Incropera, table 4.1).
  // At 0.1 m 28 and 26.16: 6.6 % less; at 0.05 m 52 and 50.16: 3.7 % more, not worth a word.
  test('are said from 5 % on, with the share that they would let through less', () => {
    const [text = '', ...more] = textsOf(duct(0.1), 'duct-corners')
    expect(more).toEqual([])
    expect(text).toContain('mean perimeter')
    expect(text).toContain('shape factor 0.54')
    expect(text).toMatch(/would let through 7 % less\.$/)
    expect(textsOf(duct(0.05), 'duct-corners')).toEqual([])
  })

  test('go by all layers together', () => {
    const two = duct(0.1, [constant(0.05, 0.04), constant(0.05, 0.03)])
    expect(textsOf(two, 'duct-corners')).toEqual(textsOf(duct(0.1), 'duct-corners'))
  })

  test('are not there on a bare duct, nor on anything round or flat', () => {
    expect(textsOf(duct(0, []), 'duct-corners')).toEqual([])
    const pipe = { ...base, shape: lying(0.6), layers: [constant(0.3, 0.04)] }
    expect(textsOf(pipe, 'duct-corners')).toEqual([])
  })
})

describe('heads of a vessel', () => {
  const vessel = (heads: 'flat' | 'domed'): System => ({
    ...base,
    shape: { kind: 'vessel', outerDiameterM: 1, shellLengthM: 2, orientation: 'vertical', heads },
    layers: [constant(0.1, 0.04)],
  })

  test('are said as they were reckoned', () => {
    expect(textsOf(vessel('domed'), 'vessel-heads')).toEqual([
      expect.stringMatching(/^The domed heads .* half ellipsoids .* sphere\.$/),
    ])
    expect(textsOf(vessel('flat'), 'vessel-heads')).toEqual([
      expect.stringMatching(/^The flat heads .* discs .* apart\.$/),
    ])
    expect(textsOf({ ...base, shape: lying(1), layers: [] }, 'vessel-heads')).toEqual([])
  })
})

describe('a pipe that reaches up out of the soil', () => {
  const buried = (depthM: number): System => ({
    ...base,
    shape: { kind: 'buried-pipe', outerDiameterM: 0.2, depthM, soilWPerMK: 1.5 },
    layers: [constant(0.1, 0.04)],
  })

  // Lagged to 0.4 m: with its axis 0.2 m deep it just touches the surface.
  test('is said where its axis is less than half of its lagged diameter deep', () => {
    expect(textsOf(buried(0.19), 'soil-shallow')).toEqual([
      expect.stringMatching(/reach up out of the soil.*loss is overstated/),
    ])
    expect(textsOf(buried(0.21), 'soil-shallow')).toEqual([])
    expect(textsOf({ ...base, shape: lying(0.2), layers: [] }, 'soil-shallow')).toEqual([])
  })
})

describe('the simplified set', () => {
  const simplified = (shape: Shape, film: System['film'] = 'simplified'): System => ({
    ...base,
    shape,
    film,
    layers: [constant(0.05, 0.04)],
  })
  const duct = (riseM: number | null): Shape => ({
    kind: 'rect-duct',
    widthM: 0.6,
    heightM: 0.4,
    riseM,
  })

  test.each<[string, Shape, boolean]>([
    ['a pipe', lying(0.1), false],
    ['a riser', duct(3), false],
    ['a lying duct, which has faces up and down', duct(null), true],
    ['a sphere', { kind: 'sphere', outerDiameterM: 1 }, true],
  ])('says that it is recalled, and on %s what it has no equation for', (_, shape, lacks) => {
    const [text = '', ...more] = textsOf(simplified(shape), 'film-method')
    expect(more).toEqual([])
    expect(text).toContain('recalled and not read')
    expect(text).toContain('ISO 12241')
    expect(text.includes('there the detailed film stands')).toBe(lacks)
  })

  test('is not spoken of where another film was chosen, nor of a pipe in the soil, which has none', () => {
    const shape = { kind: 'buried-pipe', outerDiameterM: 0.2, depthM: 1, soilWPerMK: 1.5 } as const
    expect(textsOf(simplified(shape), 'film-method')).toEqual([])
    expect(textsOf(simplified(lying(0.1), 'detailed'), 'film-method')).toEqual([])
    expect(textsOf(simplified(lying(0.1), { fixedWPerM2K: 9 }), 'film-method')).toEqual([])
  })

  // D³Δθ = 10 m³K at D 0.5 m: 80 K. vD = 0.0757 m²/s at 0.5 m: 0.151 m/s, where nothing steps. vH = 8 m²/s on a wall
  // of 2 m: 4 m/s, where it rises by 171 %.
  const bare = (shape: Shape, excessK: number, windMPerS: number): System => ({
    ...base,
    shape,
    film: 'simplified',
    layers: [],
    mediumC: 20 + excessK,
    around: { ...still(20), windMPerS },
  })
  const wall = (characteristicLengthM: number): Shape => ({
    kind: 'flat',
    facing: 'vertical',
    characteristicLengthM,
  })

  test('says beside a step of a pipe in still air which branch was taken', () => {
    const pipe = 'ISO 12241 form, horizontal pipe in still air: D³Δθ in m³K is'
    const tail = 'near 10, where the formula rises by 17 %; the'
    expect(textsOf(bare(lying(0.5), 76, 0), 'film-jump')).toEqual([
      `${pipe} 9.5, ${tail} laminar branch was taken.`,
    ])
    expect(textsOf(bare(lying(0.5), 88, 0), 'film-jump')).toEqual([
      `${pipe} 11, ${tail} turbulent branch was taken.`,
    ])
    expect(textsOf(bare(lying(0.5), 40, 0), 'film-jump')).toEqual([])
    expect(textsOf(bare(lying(0.5), 40, 0.151), 'film-jump')).toEqual([])
  })

  test('and so of a wall, in still air and in wind', () => {
    expect(textsOf(bare(wall(1), 10.5, 0), 'film-jump')).toEqual([
      'ISO 12241 form, vertical wall or pipe in still air: H³Δθ in m³K is 10.5, near 10, where the formula rises by 60 %; the turbulent branch was taken.',
    ])
    expect(textsOf(bare(wall(2), 40, 3.8), 'film-jump')).toEqual([
      'ISO 12241 form, plane wall in wind: vH in m²/s is 7.6, near 8, where the formula rises by 171 %; the laminar branch was taken.',
    ])
  })

  test('of an inclined pipe looks at both of its formulas', () => {
    const pipe = (orientation: 'inclined' | 'vertical', riseM: number): Shape => ({
      kind: 'pipe',
      outerDiameterM: 0.5,
      orientation,
      riseM,
    })
    expect(textsOf(bare(pipe('inclined', 5), 80, 0), 'film-jump')).toEqual([
      expect.stringContaining('horizontal pipe in still air'),
    ])
    expect(textsOf(bare(pipe('inclined', 1), 10, 0), 'film-jump')).toEqual([
      expect.stringContaining('vertical wall or pipe in still air'),
    ])
    expect(textsOf(bare(pipe('vertical', 1), 10, 0), 'film-jump')).toEqual([
      expect.stringContaining('vertical wall or pipe in still air'),
    ])
    expect(textsOf(bare(pipe('vertical', 5), 80, 0), 'film-jump')).toEqual([])
  })
})

// Both heads of a tank of 20 m in a storm at −40 °C, of Re 1.2e8, leave the range of the plate.
test('one sentence stands once, though several faces would say it', () => {
  const tank: System = {
    ...base,
    shape: {
      kind: 'vessel',
      outerDiameterM: 20,
      shellLengthM: 2,
      orientation: 'vertical',
      heads: 'flat',
    },
    layers: [],
    mediumC: -30,
    around: { ...still(-40), windMPerS: 60 },
  }
  const plate = textsOf(tank, 'film-range').filter((text) => text.startsWith('Plate in parallel'))
  expect(plate).toEqual([expect.stringMatching(/Reynolds number 1(\.\d+)? × 10⁸ is outside/)])
})

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

test('a conductivity that falls too steeply is told', () => {
  const system: System = {
    ...base,
    shape: { kind: 'flat', facing: 'vertical', characteristicLengthM: 1 },
    layers: [
      {
        thicknessM: 0.01,
        conductivity: {
          kind: 'curve',
          basis: 'mean',
          pointsC: [20, 60],
          valuesWPerMK: [0.02, 0.0001],
        },
      },
    ],
    mediumC: 50,
  }
  expect(textsOf(system, 'conductivity-steep')).toEqual([
    'The conductivity falls so steeply with temperature that more than one state would fit: do not rely on this result.',
  ])
  expect(textsOf({ ...system, layers: [constant(0.01, 0.02)] }, 'conductivity-steep')).toEqual([])
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

// A wall of even conductivity at −150 °C: its mean temperature lies that far below the 50 °C where its curve begins.
test('a layer below its curve is told by how much, wherever the curve begins', () => {
  const wall: System = {
    ...base,
    shape: { kind: 'flat', facing: 'vertical', characteristicLengthM: 1 },
    layers: [
      {
        thicknessM: 0.1,
        conductivity: {
          kind: 'curve',
          basis: 'point',
          pointsC: [50, 200],
          valuesWPerMK: [0.04, 0.04],
        },
      },
    ],
    mediumC: -150,
  }
  const meanC = (-150 + solve(wall).surfaceTempC) / 2
  expect(textsOf(wall, 'conductivity-extrapolated')).toEqual([
    `Layer 1: its mean temperature is ${(50 - meanC).toFixed(0)} K below the conductivity curve, which holds from 50 to 200 °C.`,
  ])
})
