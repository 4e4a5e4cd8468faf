/** Shape, size and extent of a run. */
import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import { noteCodes, refused, refusedColumns, steamRun } from '../../sizing/catalogue.ts'
import { problemOf } from './problem.ts'

const unusedTexts = (values: RunValues): string[] =>
  problemOf(values).notes.flatMap(({ code, text }) => (code === 'unused' ? [text] : []))

const { size: _size, ...unsized } = steamRun

describe('pipe', () => {
  // EN 10220: DN 50 is 60.3 mm. ASME B36.10M: NPS 2 is 2.375 in, NPS 12 is 323.8 mm (12.75 in). EN 1057: CU 28 is 28 mm.
  test.each([
    ['DN 50', 0.0603],
    ['NPS 2', 0.0603],
    ['NPS 2 sch 80', 0.0603],
    ['NPS 12', 0.3238],
    ['CU 28', 0.028],
  ])('%s', (size, outerDiameterM) => {
    const { shape } = problemOf({ ...steamRun, size })
    expect(shape).toMatchObject({ kind: 'pipe', orientation: 'horizontal' })
    expect(shape.kind === 'pipe' && shape.outerDiameterM).toBeCloseTo(outerDiameterM, 4)
  })

  test('NPS above 10 is standard wall, CU with several walls the thinner: each with a note', () => {
    expect(noteCodes(problemOf({ ...steamRun, size: 'NPS 12' }))).toContain('size')
    expect(noteCodes(problemOf({ ...steamRun, size: 'CU 28' }))).toContain('size')
    expect(noteCodes(problemOf({ ...steamRun, size: 'NPS 2' }))).not.toContain('size')
  })

  test('a conflicting od_mm is an error that says both', () => {
    const [issue] = refused({ ...steamRun, outerDiameterM: 0.0889 })
    expect(issue?.column).toBe('od_mm')
    expect(issue?.found).toContain('88.9')
    expect(issue?.allowed).toContain('60.3')
  })

  test.each([0.0598, 0.061])('%d m is not DN 50 either', (outerDiameterM) => {
    expect(refusedColumns({ ...steamRun, outerDiameterM })).toEqual(['od_mm'])
  })

  test('an od_mm that agrees is none, and od_mm alone will do', () => {
    expect(problemOf({ ...steamRun, outerDiameterM: 0.0603 }).shape).toEqual(
      problemOf({ ...unsized, outerDiameterM: 0.0603 }).shape,
    )
  })

  test('neither is an error', () => {
    const [issue] = refused(unsized)
    expect(issue?.column).toBe('size')
    expect(issue?.allowed).toContain('od_mm')
  })

  test('vertical: the rise, else the length with a note', () => {
    const tall = problemOf({ ...steamRun, orientation: 'vertical', lengthM: 12 })
    expect(tall.shape).toMatchObject({ orientation: 'vertical', riseM: 12 })
    expect(noteCodes(tall)).toContain('rise-assumed')
    const given = problemOf({ ...steamRun, orientation: 'vertical', lengthM: 12, riseM: 3 })
    expect(given.shape).toMatchObject({ riseM: 3 })
    expect(given.extent).toBe(12)
    expect(noteCodes(given)).not.toContain('rise-assumed')
  })

  test('a rise beyond the length is refused; fittings alone have a length of 0 and rise', () => {
    const tall = { ...steamRun, orientation: 'vertical' as const, riseM: 3 }
    expect(refused({ ...tall, lengthM: 2 })).toEqual([
      {
        column: 'rise_m',
        found: '3 m over a length of 2 m',
        allowed: 'at most the length of the run: it cannot rise by more',
      },
    ])
    for (const lengthM of [0, 3]) expect(problemOf({ ...tall, lengthM }).extent).toBe(lengthM)
  })

  test('a rise of what lies is told as unused', () => {
    for (const lying of [
      steamRun,
      { ...steamRun, orientation: 'horizontal' as const },
      { ...steamRun, buryDepthM: 1, maxLossWPerM: 40 },
      { ...steamRun, shape: 'rect-duct' as const, size: '600 x 400' },
    ])
      expect(unusedTexts({ ...lying, riseM: 3 })).toContain(
        'rise_m is not used: the run is horizontal.',
      )
  })

  test('soil of a run that is not buried is told as unused', () => {
    const text = 'soil_w_mk is not used: the run is not buried.'
    expect(unusedTexts({ ...steamRun, soilWPerMK: 1 })).toEqual([text])
    expect(unusedTexts({ ...steamRun, soilWPerMK: 1, buryDepthM: 1, maxLossWPerM: 40 })).toEqual([])
    expect(
      unusedTexts({
        ...steamRun,
        shape: 'rect-duct',
        size: '600 x 400',
        soilWPerMK: 1,
        buryDepthM: 1,
      }),
    ).toContain(text)
  })

  test.each([undefined, 0, 1e-9, 4000])(
    'vertical without a rise, length %s: an issue',
    (lengthM) => {
      const values = { ...steamRun, orientation: 'vertical' as const }
      expect(refusedColumns(lengthM === undefined ? values : { ...values, lengthM })).toEqual([
        'rise_m',
      ])
    },
  )

  test('wall and inside film are neglected, shown as such', () => {
    const problem = problemOf(steamRun)
    expect(problem.insideFilmWPerM2K).toBeNull()
    expect(noteCodes(problem)).toContain('inside-neglected')
  })
})

describe('air in a duct', () => {
  const duct: RunValues = { ...steamRun, shape: 'round-duct', size: 'D 250', mediumC: 20, airC: 5 }
  // Of dry air at 20 °C and sea level, 1.204 kg/m³, 0.3 kg/s go through Ø 250 at 5.08 m/s.
  const disagreement = (own: RunValues): string[] =>
    problemOf({ ...duct, ...own }).notes.flatMap(({ code, text }) =>
      code === 'flow-velocity' ? [text] : [],
    )

  test('flow and velocity that contradict each other are told, with which is used', () => {
    expect(disagreement({ flowKgPerS: 0.3, velocityMPerS: 3 })).toEqual([
      'flow_kg_s and velocity_m_s do not agree: 0.3 kg/s of air would flow at 5.08 m/s, not 3 m/s. The film inside goes by the velocity, the arrival by the flow. Check both.',
    ])
    for (const velocityMPerS of [4.7, 5.08, 5.5])
      expect(disagreement({ flowKgPerS: 0.3, velocityMPerS })).toEqual([])
    expect(disagreement({ velocityMPerS: 3 })).toEqual([])
    expect(disagreement({ flowKgPerS: 0.3, velocityMPerS: 3, medium: 'oil' })).toEqual([])
  })

  test('a velocity beside a film is told as unused', () => {
    const text = 'velocity_m_s is not used for the film inside: inside_film_w_m2k is given.'
    expect(unusedTexts({ ...duct, velocityMPerS: 3, insideFilmWPerM2K: 20 })).toEqual([text])
    expect(unusedTexts({ ...duct, velocityMPerS: 3 })).toEqual([])
  })
})

describe('only flat takes up and down', () => {
  test.each(['pipe', 'round-duct', 'rect-duct'] as const)('%s refuses them', (shape) => {
    const size = { pipe: 'DN 50', 'round-duct': 'D 250', 'rect-duct': '600 x 400' }[shape]
    for (const orientation of ['up', 'down'] as const)
      expect(refusedColumns({ ...steamRun, shape, size, orientation })).toContain('orientation')
  })

  test('flat refuses to lie without a side', () => {
    expect(
      refusedColumns({
        ...unsized,
        shape: 'flat',
        widthM: 1,
        heightM: 2,
        orientation: 'horizontal',
      }),
    ).toEqual(['orientation'])
  })
})

describe('flat', () => {
  const wall = { ...unsized, shape: 'flat' as const, widthM: 3, heightM: 2 }

  test('vertical: the film length is the height', () => {
    expect(problemOf({ ...wall, orientation: 'vertical' })).toMatchObject({
      shape: { kind: 'flat', facing: 'vertical', characteristicLengthM: 2 },
      extent: 6,
    })
  })

  test('up and down: area over perimeter', () => {
    // 3 x 2 m: 6 m² over 10 m.
    for (const orientation of ['up', 'down'] as const)
      expect(problemOf({ ...wall, orientation }).shape).toEqual({
        kind: 'flat',
        facing: orientation,
        characteristicLengthM: 0.6,
      })
  })

  test('else 1 m, with a note', () => {
    const { widthM: _w, heightM: _h, ...bare } = wall
    for (const orientation of ['vertical', 'up', 'down'] as const) {
      const problem = problemOf({ ...bare, areaM2: 8, orientation })
      expect(problem.shape).toMatchObject({ characteristicLengthM: 1 })
      expect(problem.extent).toBe(8)
      expect(noteCodes(problem)).toContain('length-assumed')
    }
  })

  test('a size or a loss per metre has no meaning for it', () => {
    expect(refusedColumns({ ...wall, size: 'DN 50' })).toEqual(['size'])
    expect(refusedColumns({ ...wall, maxLossWPerM: 40 })).toEqual(['max_loss_w_m'])
  })
})

describe('ducts', () => {
  test('rectangular: outer metal width x height, as size or as two columns', () => {
    const bySize = problemOf({ ...unsized, shape: 'rect-duct', size: '600 x 400', mediumC: 50 })
    expect(bySize.shape).toEqual({ kind: 'rect-duct', widthM: 0.6, heightM: 0.4, riseM: null })
    const bySides = { ...unsized, shape: 'rect-duct' as const, widthM: 0.6, heightM: 0.4 }
    expect(problemOf({ ...bySides, mediumC: 50 }).shape).toEqual(bySize.shape)
  })

  test('round: od_mm or a size, and a conflict is an error', () => {
    const duct = { ...unsized, shape: 'round-duct' as const, mediumC: 50 }
    expect(problemOf({ ...duct, size: 'D 250' }).shape).toEqual(
      problemOf({ ...duct, outerDiameterM: 0.25 }).shape,
    )
    expect(refusedColumns({ ...duct, size: 'D 250', outerDiameterM: 0.3 })).toEqual(['od_mm'])
    expect(refusedColumns(duct)).toEqual(['size'])
  })

  test('sides that are missing are each named', () => {
    expect(refusedColumns({ ...unsized, shape: 'rect-duct' })).toEqual(['width_mm', 'height_mm'])
  })

  // CIBSE Guide C, table 3.25, as quoted publicly: 15.5 W/m²K at about 3 m/s; bare and lagged alike.
  test('the film inside is 15.5 W/m²K, shown as an assumption', () => {
    const problem = problemOf({ ...unsized, shape: 'round-duct', size: 'D 250', mediumC: 50 })
    expect(problem.insideFilmWPerM2K).toBe(15.5)
    expect(noteCodes(problem)).toContain('inside-film-assumed')
  })
})

test('a shape is required', () => {
  const { shape: _, ...shapeless } = steamRun
  expect(refusedColumns(shapeless)).toEqual(['shape'])
})
