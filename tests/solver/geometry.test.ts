import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { type FaceShape, wallOf } from '#solver/geometry.ts'
import { grown } from '#solver/grown.ts'
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

const noFace: FaceShape = {
  side: 'all round',
  flow: 'vertical-plate',
  freeLengthM: Number.NaN,
  windLengthM: Number.NaN,
  share: Number.NaN,
  groundWPerM2K: Number.NaN,
  formsM: [],
  outerOverInner: Number.NaN,
}
const firstFace = (...wall: Parameters<typeof wallOf>): FaceShape =>
  wallOf(...wall).faces[0] ?? noFace

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
    case 'sphere':
      return { ...given, outerDiameterM: given.outerDiameterM * factor }
    case 'buried-pipe':
      return {
        ...given,
        outerDiameterM: given.outerDiameterM * factor,
        depthM: given.depthM * factor,
      }
    case 'vessel':
      return {
        ...given,
        outerDiameterM: given.outerDiameterM * factor,
        shellLengthM: given.shellLengthM * factor,
      }
  }
}

describe('wallOf', () => {
  // AH23: the equivalent thickness of a pipe layer is r_e·ln(r_e/r_i); for r_i = 1/e of r_e it is r_e itself.
  test('a pipe layer out to e times the radius is as thick as the outer radius', () => {
    const wall = wallOf(pipe(0.2), [layer(0.1 * (Math.E - 1))])
    expect(wall.faces[0]?.formsM[0]).toBeCloseTo(0.1 * Math.E, 12)
    expect(wall.outerDiameterM).toBeCloseTo(0.2 * Math.E, 12)
    expect(wall.faces[0]?.outerOverInner).toBeCloseTo(Math.E, 12)
    expect(wall.unit).toBe('m')
    expect(wall.outerAreaM2PerUnit).toBeCloseTo(0.2 * Math.E * Math.PI, 12)
  })

  test('a thin layer on a large pipe is a flat one', () => {
    expect((firstFace(pipe(20), [layer(1e-4)]).formsM[0] ?? 0) / 1e-4).toBeCloseTo(1, 4)
  })

  // ISO 12241:2022 form by hand: P_i 2 m, d 50 mm, P_e 2.4 m: R = 0.1/(λ·4.4), so the form on P_e is 0.24/4.4.
  test('a rectangular duct has the mean-perimeter form, shared by its faces by area', () => {
    const wall = wallOf({ kind: 'rect-duct', widthM: 0.6, heightM: 0.4, riseM: null }, [
      layer(0.05),
    ])
    for (const { formsM, outerOverInner } of wall.faces) {
      expect(formsM[0]).toBeCloseTo(0.24 / 4.4, 12)
      expect(outerOverInner).toBeCloseTo(1.2, 12)
    }
    expect(wall.unit).toBe('m')
    expect(wall.outerAreaM2PerUnit).toBeCloseTo(2.4, 12)
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
      {
        side: 'all round',
        flow: 'vertical-plate',
        freeLengthM: 7,
        windLengthM: 0.5,
        share: 1,
        groundWPerM2K: 0,
        formsM: [],
        outerOverInner: 1,
      },
    ])
  })

  test('a pipe is wind-wise as wide as its lagging, upright or not', () => {
    expect(wallOf(pipe(0.1), [layer(0.05)]).faces[0]).toMatchObject({
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
    expect(upright.faces[0]).toMatchObject({
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
      expect(wall.faces[0]?.formsM).toEqual([0.03, 0.05])
      expect(wall.faces[0]?.outerOverInner).toBe(1)
      expect(wall.unit).toBe('m2')
      expect(wall.outerAreaM2PerUnit).toBe(1)
      expect(wall.faces[0]?.flow).toBe(facing === 'vertical' ? 'vertical-plate' : facing)
      expect(wall.faces[0]?.freeLengthM).toBe(2)
    },
  )

  // By hand: 1 m ball under 0.5 m, outer radius 1 m: 1²·(1/0.5 − 1/1) = 1 m; the whole outer area 4π·1².
  test('a sphere has the form r_e²(1/r_i − 1/r_e) and is one piece', () => {
    const wall = wallOf({ kind: 'sphere', outerDiameterM: 1 }, [layer(0.5)])
    expect(wall.faces[0]).toMatchObject({
      flow: 'sphere',
      freeLengthM: 2,
      windLengthM: 2,
      share: 1,
    })
    expect(wall.faces[0]?.formsM[0]).toBeCloseTo(1, 12)
    expect(wall.faces[0]?.outerOverInner).toBeCloseTo(4, 12)
    expect(wall.unit).toBe('piece')
    expect(wall.outerAreaM2PerUnit).toBeCloseTo(4 * Math.PI, 12)
    expect(wall.outerDiameterM).toBe(2)
  })

  const vessel = (orientation: 'horizontal' | 'vertical', heads: 'flat' | 'domed') =>
    wallOf({ kind: 'vessel', outerDiameterM: 1.8, shellLengthM: 3, orientation, heads }, [
      layer(0.1),
    ])

  // Lagged to 2 m: shell π·2·3, each disc π/4·2²; in all 6π + 2π. Area over perimeter of a disc is D/4.
  test('a vessel with flat heads is a cylinder and two discs', () => {
    const lyingVessel = vessel('horizontal', 'flat')
    expect(lyingVessel.outerAreaM2PerUnit).toBeCloseTo(8 * Math.PI, 12)
    expect(
      lyingVessel.faces.map(({ side, flow, freeLengthM, share }) => ({
        side,
        flow,
        freeLengthM,
        share,
      })),
    ).toEqual([
      { side: 'shell', flow: 'horizontal-cylinder', freeLengthM: 2, share: 0.75 },
      { side: 'heads', flow: 'vertical-plate', freeLengthM: 2, share: 0.25 },
    ])
    const upright = vessel('vertical', 'flat')
    expect(
      upright.faces.map(({ side, flow, freeLengthM, share }) => ({
        side,
        flow,
        freeLengthM,
        share,
      })),
    ).toEqual([
      { side: 'shell', flow: 'vertical-cylinder', freeLengthM: 3, share: 0.75 },
      { side: 'top head', flow: 'up', freeLengthM: 0.5, share: 0.125 },
      { side: 'bottom head', flow: 'down', freeLengthM: 0.5, share: 0.125 },
    ])
    expect(upright.faces[1]?.formsM).toEqual([0.1])
    expect(upright.faces[0]?.formsM[0]).toBeCloseTo(Math.log(2 / 1.8), 12)
  })

  // Perry's handbook: a 2:1 elliptical head of diameter D has the area 1.084 D².
  test('a domed head is as large as the handbooks say', () => {
    const shape = {
      kind: 'vessel',
      outerDiameterM: 2,
      shellLengthM: 3,
      orientation: 'vertical',
      heads: 'domed',
    } as const
    const headsM2 = wallOf(shape, []).outerAreaM2PerUnit - Math.PI * 2 * 3
    expect(headsM2 / 2 / 2 ** 2).toBeCloseTo(1.084, 3)
    expect(wallOf(shape, []).faces.map(({ flow }) => flow)).toEqual(['vertical-cylinder', 'sphere'])
  })

  // By hand: axis 0.5 m deep, 0.2 m across, soil 1.5: arcosh(5)/(2π·1.5) = 0.24323 m·K/W on 0.2π m².
  test('the soil around a buried pipe is its film', () => {
    const face = firstFace(
      { kind: 'buried-pipe', outerDiameterM: 0.2, depthM: 0.5, soilWPerMK: 1.5 },
      [],
    )
    expect(face.flow).toBe('ground')
    expect(1 / (face.groundWPerM2K * 0.2 * Math.PI)).toBeCloseTo(0.24323, 5)
  })

  test.each([0.1, 0.05])(
    'a pipe whose axis is %d m deep at 0.2 m across has as good as no soil',
    (depthM) => {
      const face = firstFace(
        { kind: 'buried-pipe', outerDiameterM: 0.2, depthM, soilWPerMK: 1.5 },
        [],
      )
      expect(face.groundWPerM2K).toBe(1e4)
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
        large.faces.forEach(({ formsM, outerOverInner }, face) => {
          const other = small.faces[face] ?? noFace
          formsM.forEach((formM, index) => {
            expect(formM / factor / (other.formsM[index] ?? 0)).toBeCloseTo(1, 9)
          })
          expect(outerOverInner / other.outerOverInner).toBeCloseTo(1, 9)
        })
      }),
    )
  })

  test('one layer cut in two conducts as before, save on ducts, whose form is a mean', () => {
    fc.assert(
      fc.property(
        shape.filter(({ kind }) => kind !== 'rect-duct'),
        spread(1e-3, 1),
        fc.double({ min: 0.01, max: 0.99, noNaN: true }),
        (given, thicknessM, cut) => {
          const pieces = [layer(thicknessM * cut), layer(thicknessM * (1 - cut))]
          const inTwo = wallOf(given, pieces).faces
          wallOf(given, [layer(thicknessM)]).faces.forEach(({ formsM }, face) => {
            const [whole = 0] = formsM
            const [inner = 0, outer = 0] = inTwo[face]?.formsM ?? []
            expect((inner + outer) / whole).toBeCloseTo(1, 9)
          })
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

describe('grown', () => {
  // Volume between two sizes is the mean area times the thickness, ever more so the thinner it is.
  test('its volume grows by its area', () => {
    fc.assert(
      fc.property(shape, spread(1e-3, 1), (given, thicknessM) => {
        const step = 1e-5
        const thin = grown(given, thicknessM)
        const thick = grown(given, thicknessM + step)
        const volumeM3 = thick.volumeM3 - thin.volumeM3
        const slices = given.kind === 'rect-duct' || given.kind === 'vessel' ? 1 : 6
        // The discs of a flat-headed vessel stand out over the shell's rim, and a duct has corners.
        if (slices === 6)
          expect(volumeM3 / (((thin.areaM2 + thick.areaM2) / 2) * step)).toBeCloseTo(1, 5)
        expect(thick.areaM2).toBeGreaterThanOrEqual(thin.areaM2)
        expect(volumeM3).toBeGreaterThan(0)
      }),
    )
  })

  test('its area is that of the wall', () => {
    fc.assert(
      fc.property(shape, spread(1e-3, 1), (given, thicknessM) => {
        const { outerAreaM2PerUnit } = wallOf(given, [layer(thicknessM)])
        expect(grown(given, thicknessM).areaM2 / outerAreaM2PerUnit).toBeCloseTo(1, 12)
      }),
    )
  })
})
