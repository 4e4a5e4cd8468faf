/** What each note says: the figures that a reader needs stand in it, and it stands only where it is true. */
import { describe, expect, test } from 'vitest'
import { solve } from '#solver/solve.ts'
import type { Shape, System } from '#solver/types.ts'
import { constant, lying, still } from './systems.ts'
import { base, textsOf } from './told.ts'

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
