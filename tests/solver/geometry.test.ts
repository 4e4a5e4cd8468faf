import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { wallOf } from '#solver/geometry.ts'
import type { Layer, Shape } from '#solver/types.ts'
import { constantConductivity, layersOf, shape, spread } from './arbitraries.ts'

const λ = { kind: 'constant', conductivityWPerMK: 0.04 } as const
const layer = (thicknessM: number): Layer => ({ thicknessM, conductivity: λ })
const pipe = (outerDiameterM: number): Shape => ({
  kind: 'pipe',
  outerDiameterM,
  orientation: 'horizontal',
})
const layers = layersOf(constantConductivity)

/** The same thing `factor` times as large. */
function scaled(given: Shape, factor: number): Shape {
  switch (given.kind) {
    case 'pipe':
      return given.orientation === 'horizontal'
        ? { ...given, outerDiameterM: given.outerDiameterM * factor }
        : { ...given, outerDiameterM: given.outerDiameterM * factor, riseM: given.riseM * factor }
    case 'rect-duct':
      return {
        ...given,
        widthM: given.widthM * factor,
        heightM: given.heightM * factor,
        riseM: given.riseM === null ? null : given.riseM * factor,
      }
    case 'flat':
      return { ...given, characteristicLengthM: given.characteristicLengthM * factor }
  }
}

describe('wallOf', () => {
  // AH23: the equivalent thickness of a pipe layer is r_e·ln(r_e/r_i); for r_i = 1/e of r_e it is r_e itself.
  test('a pipe layer out to e times the radius is as thick as the outer radius', () => {
    const wall = wallOf(pipe(0.2), [layer(0.1 * (Math.E - 1))])
    expect(wall.formsM[0]).toBeCloseTo(0.1 * Math.E, 12)
    expect(wall.outerDiameterM).toBeCloseTo(0.2 * Math.E, 12)
    expect(wall.outerOverInner).toBeCloseTo(Math.E, 12)
    expect(wall.outerAreaM2PerM).toBeCloseTo(0.2 * Math.E * Math.PI, 12)
  })

  test('a thin layer on a large pipe is a flat one', () => {
    expect((wallOf(pipe(20), [layer(1e-4)]).formsM[0] ?? 0) / 1e-4).toBeCloseTo(1, 4)
  })

  // ISO 12241:2022 form by hand: P_i 2 m, d 50 mm, P_e 2.4 m: R = 0.1/(λ·4.4), so the form on P_e is 0.24/4.4.
  test('a rectangular duct has the mean-perimeter form, shared by its faces by area', () => {
    const wall = wallOf({ kind: 'rect-duct', widthM: 0.6, heightM: 0.4, riseM: null }, [
      layer(0.05),
    ])
    expect(wall.formsM[0]).toBeCloseTo(0.24 / 4.4, 12)
    expect(wall.outerAreaM2PerM).toBeCloseTo(2.4, 12)
    expect(wall.outerOverInner).toBeCloseTo(1.2, 12)
    expect(wall.faces.map(({ side }) => side)).toEqual(['side', 'top', 'bottom'])
    expect(wall.faces.map(({ flow }) => flow)).toEqual(['vertical-plate', 'up', 'down'])
    // Sides 2 × 0.5 m of 2.4 m; top and bottom 0.7 m each. Free lengths: outer height, half the outer width. The
    // wind runs across: over height and whole width.
    const expected = [
      [1 / 2.4, 0.5, 0.5],
      [0.7 / 2.4, 0.35, 0.7],
      [0.7 / 2.4, 0.35, 0.7],
    ]
    wall.faces.forEach(({ share, freeLengthM, windLengthM }, index) => {
      expect(share).toBeCloseTo(expected[index]?.[0] ?? Number.NaN, 12)
      expect(freeLengthM).toBeCloseTo(expected[index]?.[1] ?? Number.NaN, 12)
      expect(windLengthM).toBeCloseTo(expected[index]?.[2] ?? Number.NaN, 12)
    })
  })

  test('a rising duct is one vertical face as high as it rises', () => {
    const wall = wallOf({ kind: 'rect-duct', widthM: 0.6, heightM: 0.4, riseM: 7 }, [])
    expect(wall.faces).toEqual([
      { side: 'all round', flow: 'vertical-plate', freeLengthM: 7, windLengthM: 0.5, share: 1 },
    ])
  })

  test('a pipe is wind-wise as wide as its lagging, upright or not', () => {
    expect(wallOf(pipe(0.1), [layer(0.05)]).faces[0]).toEqual({
      side: 'all round',
      flow: 'horizontal-cylinder',
      freeLengthM: 0.2,
      windLengthM: 0.2,
      share: 1,
    })
    const upright = wallOf(
      { kind: 'pipe', outerDiameterM: 0.1, orientation: 'vertical', riseM: 4 },
      [layer(0.05)],
    )
    expect(upright.faces[0]).toEqual({
      side: 'all round',
      flow: 'vertical-cylinder',
      freeLengthM: 4,
      windLengthM: 0.2,
      share: 1,
    })
  })

  test.each(['vertical', 'up', 'down'] as const)(
    'a flat surface facing %s is its thickness',
    (facing) => {
      const wall = wallOf({ kind: 'flat', facing, characteristicLengthM: 2 }, [
        layer(0.03),
        layer(0.05),
      ])
      expect(wall.formsM).toEqual([0.03, 0.05])
      expect(wall.outerOverInner).toBe(1)
      expect(wall.outerAreaM2PerM).toBeNull()
      expect(wall.faces[0]?.flow).toBe(facing === 'vertical' ? 'vertical-plate' : facing)
      expect(wall.faces[0]?.freeLengthM).toBe(2)
    },
  )

  test('the same thing twice as large has forms twice as large', () => {
    fc.assert(
      fc.property(shape, layers, spread(0.01, 100), (given, build, factor) => {
        const small = wallOf(given, build)
        const large = wallOf(
          scaled(given, factor),
          build.map((one) => ({ ...one, thicknessM: one.thicknessM * factor })),
        )
        large.formsM.forEach((formM, index) => {
          expect(formM / factor / (small.formsM[index] ?? 0)).toBeCloseTo(1, 9)
        })
        expect(large.outerOverInner / small.outerOverInner).toBeCloseTo(1, 9)
      }),
    )
  })

  test('one layer cut in two conducts as before, on pipes and flat surfaces', () => {
    fc.assert(
      fc.property(
        shape.filter(({ kind }) => kind !== 'rect-duct'),
        spread(1e-3, 1),
        fc.double({ min: 0.01, max: 0.99, noNaN: true }),
        (given, thicknessM, cut) => {
          const [whole = 0] = wallOf(given, [layer(thicknessM)]).formsM
          const [inner = 0, outer = 0] = wallOf(given, [
            layer(thicknessM * cut),
            layer(thicknessM * (1 - cut)),
          ]).formsM
          expect((inner + outer) / whole).toBeCloseTo(1, 9)
        },
      ),
    )
  })

  test('the faces share the whole outer area', () => {
    fc.assert(
      fc.property(shape, layers, (given, build) => {
        expect(wallOf(given, build).faces.reduce((sum, { share }) => sum + share, 0)).toBeCloseTo(
          1,
          12,
        )
      }),
    )
  })
})
