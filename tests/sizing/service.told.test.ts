/** Where service looks, and what it says: rule, bound, condition, and the place. */
import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import type { LayerMaterial, Problem } from '#sizing/problem.ts'
import type { LimitResult } from '#sizing/result.ts'
import { size } from '#sizing/size.ts'
import { problemOf } from '../model/resolve/problem.ts'
import { coldRun, sized, steamRun } from './catalogue.ts'

const serviceOf = (problem: Problem): LimitResult | undefined =>
  size(problem).chosen?.limits.find(({ limit }) => limit === 'service')

/** The same run of a material that stands something else. */
const ofMaterial = (values: RunValues, own: Partial<LayerMaterial>): Problem => {
  const problem = problemOf(values)
  return {
    ...problem,
    layers: problem.layers.map((layer) => ({ ...layer, material: { ...layer.material, ...own } })),
  }
}
const curveTo = (fromC: number, toC: number): Partial<LayerMaterial> => ({
  serviceMinC: null,
  serviceMaxC: null,
  conductivity: {
    kind: 'curve',
    basis: 'point',
    pointsC: [fromC, toC],
    valuesWPerMK: [0.035, 0.035],
  },
})

describe('a curve alone', () => {
  // Its bound lies 20 K beyond its end, where it is not to be read any more.
  test('that is left above its end is at most that end and 20 K', () => {
    const problem = ofMaterial({ ...steamRun, mediumC: 300, thicknessM: 0.05 }, curveTo(0, 100))
    const found = serviceOf(problem)
    expect(found).toMatchObject({ pass: false, rule: 'at most', condition: 'touch' })
    expect(found?.bound).toBeCloseTo(120, 9)
    expect(found?.value).toBeGreaterThan(120)
    expect(found?.what).toMatch(/, mean temperature against its conductivity curve$/)
  })

  test('that is left below its end is at least that end less 20 K', () => {
    const problem = ofMaterial({ ...coldRun, mediumC: -50, thicknessM: 0.025 }, curveTo(40, 100))
    const found = serviceOf(problem)
    expect(found).toMatchObject({ pass: false, rule: 'at least' })
    expect(found?.bound).toBeCloseTo(20, 9)
    expect(found?.value).toBeLessThan(20)
  })

  test('that is read within 20 K of its end has no service to fail', () => {
    const problem = ofMaterial({ ...steamRun, mediumC: 150, thicknessM: 0.05 }, curveTo(0, 90))
    expect(serviceOf(problem)).toBeUndefined()
  })
})

describe('the jacket', () => {
  // The shipped row: PVC jacket 60 °C.
  const jacketed: RunValues = {
    ...steamRun,
    mediumC: 350,
    finish: 'pvc_jacket',
    touchClass: 'wood',
  }

  test('is at most what it stands, at the touch condition', () => {
    const { chosen } = sized({ ...jacketed, thicknessM: 0.02 })
    const found = chosen?.limits.find(({ limit }) => limit === 'service')
    expect(found).toMatchObject({ rule: 'at most', unit: '°C', condition: 'touch', bound: 60 })
    expect(found?.value).toBe(chosen?.touchSurfaceC)
    expect(found?.what).toMatch(/, jacket$/)
  })

  test('is not there on the bare run', () => {
    const { limits } = sized({ ...jacketed, thicknessM: 0.02 }).bare
    expect(limits.filter(({ limit }) => limit === 'service')).toEqual([])
  })
})

describe('the cold end', () => {
  // Calcium silicate is rated from 27 °C up. Outside in the frost its jacket is colder, but the medium is hot.
  test('is no matter of a hot run', () => {
    const frosty = { ...steamRun, material: 'calcium_silicate', mediumC: 120, airC: -10 }
    const found = serviceOf(problemOf({ ...frosty, touchAirC: -10, thicknessM: 0.15 }))
    expect(found).toMatchObject({ pass: true, rule: 'at most' })
  })

  test('is not heeded as if it were a maximum', () => {
    const cool: RunValues = {
      ...coldRun,
      material: 'calcium_silicate',
      mediumC: 29,
      airC: 36,
      thicknessM: 0.05,
    }
    const problem = ofMaterial(cool, { serviceMinC: 27 })
    expect(size(problem).notes.map(({ code }) => code)).not.toContain('service-heed')
  })
})

// The nearest to its end decides, whichever side it is on.
test('of two materials the one with the smaller margin is told', () => {
  const { material: _, ...plain } = steamRun
  const { chosen } = sized({
    ...plain,
    mediumC: 350,
    layers: 'calcium_silicate:100;stone_wool_pipe_section:100',
  })
  const found = chosen?.limits.find(({ limit }) => limit === 'service')
  // Calcium silicate stands 649 °C, 299 K more than it gets; stone wool 650 °C, behind 100 mm far more than it gets.
  expect(found?.what).toContain('alcium silicate')
  expect(found?.value).toBeCloseTo(350, 6)
})
