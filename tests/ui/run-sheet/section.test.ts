import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import { sectionView, shells, temperatureAtC } from '#ui/views/run-sheet/section.ts'
import { drawSection } from '#ui/views/run-sheet/section-drawing.ts'
import { madeRung } from './rungs.ts'

const bare = madeRung(0, { change: { outerDiameterM: 0.1, piecesM: [] } })
const pipe: RunValues = { shape: 'pipe', mediumC: 170 }

function viewOf(values: RunValues, shown = madeRung(0.05), core = bare) {
  const view = sectionView(values, core, shown)
  if (!view) throw new Error('Nothing to draw')
  return view
}

describe('temperatures', () => {
  test('meet the interfaces at both ends', () => {
    const view = viewOf(pipe)
    expect(temperatureAtC(view, 0)).toBeCloseTo(170, 12)
    expect(temperatureAtC(view, 0.05)).toBeCloseTo(35, 12)
  })

  // Steady radial conduction at constant conductivity: T falls with ln r (Incropera 6e, eq. 3.26), so half the fall
  // is reached at the geometric mean of the radii: sqrt(0.05 x 0.10) = 0.070711 m.
  test('fall with the logarithm of the radius around a pipe', () => {
    expect(temperatureAtC(viewOf(pipe), Math.sqrt(0.05 * 0.1) - 0.05)).toBeCloseTo(
      (170 + 35) / 2,
      12,
    )
  })

  // Steady conduction through a sphere: T falls with 1/r (Incropera 6e, section 3.3.2, from memory), so half the fall is reached at the
  // harmonic mean of the radii: 2 x 0.05 x 0.10 / 0.15 = 0.066667 m.
  test('fall with the inverse of the radius around a sphere', () => {
    const view = viewOf({ shape: 'sphere', mediumC: 170 })
    expect(temperatureAtC(view, (2 * 0.05 * 0.1) / 0.15 - 0.05)).toBeCloseTo((170 + 35) / 2, 12)
    expect(temperatureAtC(view, 0.05)).toBeCloseTo(35, 12)
  })

  test('fall in a straight line through a flat layer', () => {
    const flat = { ...bare, outerDiameterM: null }
    const view = viewOf({ shape: 'flat', mediumC: 85 }, madeRung(0.05), flat)
    expect(temperatureAtC(view, 0.025)).toBeCloseTo((170 + 35) / 2, 12)
  })

  test('change slope between layers of two materials, not between pieces of one', () => {
    const shown = madeRung(0.115, {
      change: { piecesM: [0.04, 0.05, 0.025], interfaceTempsC: [270, 220, 43] },
    })
    const view = viewOf({ ...pipe, layers: 'calcium_silicate:40;stone_wool_pipe_section:?' }, shown)
    expect(temperatureAtC(view, 0.04)).toBeCloseTo(220, 9)
    expect(view.jointsM.map((jointM) => Math.round(jointM * 1000))).toEqual([40, 90])
    expect(view.stretches).toHaveLength(2)
  })

  test('steam given by its pressure is as hot as the inside of its lagging', () => {
    expect(viewOf({ shape: 'pipe', pressureGaugePa: 7e5 }).mediumC).toBe(170)
  })

  test('shells go from outside to inside and get hotter', () => {
    const tempsC = shells(viewOf(pipe), 12).map(({ tempC }) => tempC)
    expect(tempsC.toSorted((a, b) => a - b)).toEqual(tempsC)
    expect(shells(viewOf(pipe, bare), 12)).toEqual([])
  })
})

describe('drawing', () => {
  const frame = { field: 160, fitM: 0 }

  test('is to scale: lagging over diameter on paper as in life', () => {
    const { core, jacket } = drawSection(viewOf(pipe), frame)
    expect(((jacket?.width ?? 0) - core.width) / 2 / core.width).toBeCloseTo(0.05 / 0.1, 9)
  })

  test('keeps the pipe while thinner rungs are walked', () => {
    const [thick, thin] = [0.05, 0.02].map((thicknessM) =>
      drawSection(viewOf(pipe, madeRung(thicknessM)), { field: 160, fitM: 0.05 }),
    )
    expect(thin?.core.width).toBeCloseTo(thick?.core.width ?? 0, 9)
  })

  test('gives the dimension line the length of the lagging', () => {
    const { dimension, core } = drawSection(viewOf(pipe), frame)
    expect((dimension?.to.x ?? 0) - (dimension?.from.x ?? 0)).toBeCloseTo(core.width / 2, 9)
  })

  test('a bare run has neither jacket nor dimension', () => {
    expect(drawSection(viewOf(pipe, bare), frame)).toMatchObject({ jacket: null, dimension: null })
  })

  test.each<[string, RunValues]>([
    ['columns', { shape: 'rect-duct', widthM: 0.6, heightM: 0.4 }],
    ['a named size', { shape: 'rect-duct', size: '600 x 400' }],
  ])('takes the sides of a duct from %s', (_from, values) => {
    const view = viewOf(values, madeRung(0.05), { ...bare, outerDiameterM: null })
    const { core } = drawSection(view, frame)
    expect(core.width / core.height).toBeCloseTo(1.5, 9)
  })

  test.each(['up', 'down', 'vertical'] as const)(
    'a slab facing %s grows away from its wall',
    (orientation) => {
      const view = viewOf({ shape: 'flat', orientation, mediumC: 85 }, madeRung(0.05), {
        ...bare,
        outerDiameterM: null,
      })
      const { core, jacket } = drawSection(view, frame)
      const isAbove = (jacket?.y ?? 0) < core.y
      const isBelow = (jacket?.y ?? 0) + (jacket?.height ?? 0) > core.y + core.height
      const isBeside = (jacket?.width ?? 0) > core.width
      expect({ isAbove, isBelow, isBeside }).toEqual({
        isAbove: orientation === 'up',
        isBelow: orientation === 'down',
        isBeside: orientation === 'vertical',
      })
    },
  )

  test('shows the ground over a buried pipe, to scale where it fits and broken where it does not', () => {
    // 50 mm of lagging on a pipe of 100 mm: its edge is 100 mm from the axis, 0.8 px for a millimetre.
    const near = drawSection(viewOf({ ...pipe, buryDepthM: 0.11 }), frame)
    expect(near.ground).toMatchObject({ isCut: false })
    expect((near.ground?.axisY ?? 0) - (near.ground?.y ?? 0)).toBeCloseTo(110 * 0.8, 9)
    const deep = drawSection(viewOf({ ...pipe, buryDepthM: 1.2 }), frame)
    expect(deep.ground).toMatchObject({ isCut: true })
    expect(deep.jacket?.y ?? 0).toBeGreaterThan(deep.ground?.y ?? 0)
  })

  test('draws no ground where none is over it', () => {
    expect(drawSection(viewOf(pipe), frame).ground).toBeNull()
    expect(drawSection(viewOf({ shape: 'vessel', buryDepthM: 1 }), frame).ground).toBeNull()
  })

  test('is not there where the size is not known', () => {
    expect(
      sectionView({ shape: 'rect-duct' }, { ...bare, outerDiameterM: null }, madeRung(0.05)),
    ).toBeNull()
  })

  test('puts the label in the corner, clear of the circle, where the pipe is too thin for it', () => {
    const thin = madeRung(0, { change: { outerDiameterM: 0.0213, piecesM: [] } })
    const { label, jacket } = drawSection(viewOf(pipe, madeRung(0.05), thin), frame)
    expect(label.place).toBe('corner')
    expect(label.y).toBeLessThan(jacket?.y ?? 0)
  })
})
