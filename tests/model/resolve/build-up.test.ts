/** Materials, layers and rungs, sentence by sentence of the contract. */
import { describe, expect, test } from 'vitest'
import { mm, noteCodes, refused, refusedColumns, steamRun } from '../../sizing/catalogue.ts'
import { problemOf } from './problem.ts'

const { material: _material, ...without } = steamRun
const rungsMm = (values: Parameters<typeof problemOf>[0]): number[] =>
  problemOf(values).steps.map(({ thicknessM }) => mm(thicknessM))

describe('one of material, conductivity_w_mk, layers and thickness_mm 0 is required', () => {
  test('none of them: an issue that names all four', () => {
    const [issue] = refused(without)
    expect(issue?.column).toBe('material')
    for (const way of ['material', 'conductivity_w_mk', 'layers', 'thickness_mm 0'])
      expect(issue?.allowed).toContain(way)
  })

  test('a thickness of 0 alone is a bare run', () => {
    expect(problemOf({ ...without, thicknessM: 0 })).toMatchObject({ layers: [], steps: [] })
  })

  test('a fixed thickness of nothing known is an issue', () => {
    expect(refusedColumns({ ...without, thicknessM: 0.05 })).toEqual(['material'])
  })
})

describe('conductivity', () => {
  test('alone: rungs of 20 to 100 mm, no service range, a note', () => {
    const problem = problemOf({ ...without, conductivityWPerMK: 0.04 })
    expect(rungsMm({ ...without, conductivityWPerMK: 0.04 })).toEqual([
      20, 25, 30, 40, 50, 60, 65, 70, 75, 80, 90, 100,
    ])
    expect(problem.layers[0]?.material).toMatchObject({ serviceMinC: null, serviceMaxC: null })
    expect(noteCodes(problem)).toContain('service-unknown')
  })

  test('beside a material: overrides its curve, keeps its rungs and service range', () => {
    const problem = problemOf({ ...steamRun, conductivityWPerMK: 0.05 })
    expect(problem.layers[0]?.material).toMatchObject({
      conductivity: { kind: 'constant', conductivityWPerMK: 0.05 },
      serviceMaxC: 650,
    })
    expect(problem.steps).toEqual(problemOf(steamRun).steps)
    expect(noteCodes(problem)).toContain('conductivity-given')
  })
})

describe('layers', () => {
  test('inside to outside, ? marks the sized one', () => {
    const { layers, steps } = problemOf({
      ...without,
      layers: 'calcium_silicate:40;stone_wool_pipe_section:?',
    })
    expect(layers.map(({ thicknessM }) => thicknessM)).toEqual([0.04, null])
    expect(layers[0]?.material.name).toContain('Calcium silicate')
    expect(steps).toEqual(problemOf(steamRun).steps)
  })

  test('none marked: all fixed', () => {
    const { layers, steps } = problemOf({
      ...without,
      layers: ' calcium_silicate : 40 mm ; stone_wool_pipe_section:50',
    })
    expect(layers.map(({ thicknessM }) => thicknessM)).toEqual([0.04, 0.05])
    expect(steps).toEqual([])
  })

  test('exclude material, thickness_mm and conductivity_w_mk: each is named', () => {
    const layers = 'calcium_silicate:40'
    expect(refusedColumns({ ...steamRun, layers })).toEqual(['material'])
    expect(refusedColumns({ ...without, layers, thicknessM: 0 })).toEqual(['thickness_mm'])
    expect(
      refusedColumns({ ...steamRun, layers, thicknessM: 0.05, conductivityWPerMK: 0.04 }),
    ).toEqual(['material', 'thickness_mm', 'conductivity_w_mk'])
  })

  test.each([
    'calcium_silicate',
    'calcium_silicate:forty',
    'calcium_silicate:-4',
    'calcium_silicate:0',
    'calcium_silicate:1001',
    'stone_wool_slab:?;stone_wool_slab:?',
    ';',
    Array.from({ length: 9 }, () => 'stone_wool_slab:10').join(';'),
  ])('%s is refused with the form that is allowed', (layers) => {
    const [issue] = refused({ ...without, layers })
    expect(issue?.column).toBe('layers')
    expect(issue?.allowed.length).toBeGreaterThan(8)
  })

  test('every unknown material among the layers is named at once', () => {
    const issues = refused({
      ...without,
      layers: 'stone:40;stone_wool_pipe_section:?;woolstone:30',
    })
    expect(issues.map(({ found }) => found)).toEqual(['stone', 'woolstone'])
  })
})

describe('rungs', () => {
  test('metric unless asked otherwise; inch with nominal and true thickness; both together', () => {
    const metric = problemOf(steamRun).steps
    const inch = problemOf({ ...steamRun, steps: 'inch' }).steps
    expect(metric.every(({ nominalThicknessM }) => nominalThicknessM === null)).toBe(true)
    // ASHRAE Fundamentals 2021 (SI), ch. 23, table 13: 2 in on NPS 2 is 53.9 mm (168 mm over 60.3 mm).
    expect(
      mm(inch.find(({ nominalThicknessM }) => mm(nominalThicknessM ?? 0) === 50.8)?.thicknessM),
    ).toBeCloseTo(53.9, 1)
    expect(rungsMm({ ...steamRun, steps: 'both' })).toEqual(
      [...metric, ...inch].map(({ thicknessM }) => mm(thicknessM)).sort((a, b) => a - b),
    )
  })

  test('a material without steps cannot be sized, but can be rated', () => {
    const values = { ...without, material: 'perlite_loose' }
    expect(refusedColumns(values)).toEqual(['thickness_mm'])
    expect(problemOf({ ...values, thicknessM: 0.08 }).layers[0]?.thicknessM).toBe(0.08)
  })

  test.each([
    ['metric', 'no metric steps'],
    ['inch', 'no inch steps'],
    ['both', 'no steps, metric or inch,'],
  ] as const)('which steps there are none of is said: %s', (steps, none) => {
    const [alone] = refused({ ...without, steps, material: 'perlite_loose' })
    expect(alone?.allowed).toMatch(
      new RegExp(`^a thickness in mm: the catalogue holds ${none} for \\S.*`),
    )
    const [layered] = refused({ ...without, steps, layers: 'perlite_loose:?' })
    expect(layered?.allowed).toMatch(
      new RegExp(`^a thickness in mm in place of \\?: the catalogue holds ${none} for \\S.*`),
    )
  })

  test('a fixed thickness of a rung has the pieces of that rung, for the price', () => {
    expect(problemOf({ ...steamRun, thicknessM: 0.09 }).layers[0]?.piecesM).toEqual([0.04, 0.05])
    expect(problemOf({ ...steamRun, thicknessM: 0.045 }).layers[0]?.piecesM).toEqual([0.045])
  })
})

test('names are looked up with a suggestion', () => {
  const [issue] = refused({ ...steamRun, material: 'stone_wool_pipe_secton' })
  expect(issue).toMatchObject({ column: 'material', found: 'stone_wool_pipe_secton' })
  expect(issue?.allowed).toContain('stone_wool_pipe_section')
  expect(refusedColumns({ ...steamRun, finish: 'gold' })).toEqual(['finish'])
})

test('a form that is unusual on the shape is noted, not refused', () => {
  expect(noteCodes(problemOf({ ...steamRun, material: 'stone_wool_mat_wired' }))).toContain(
    'form-unusual',
  )
  expect(noteCodes(problemOf(steamRun))).not.toContain('form-unusual')
})
