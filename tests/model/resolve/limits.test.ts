/** Touch, loss and damp as they are asked for, with the assumptions behind them. */
import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import { runValuesSchema } from '#model/job.ts'
import { coldRun, noteCodes, refused, refusedColumns, steamRun } from '../../sizing/catalogue.ts'
import { problemOf } from './problem.ts'

const { finish: _finish, ...unfinished } = steamRun

describe('touch', () => {
  test('a threshold that rests on recalled cells says so; one that was read does not', () => {
    // Metal at 1 min is read in several texts; between 4 s and 10 s the cells are from memory (catalogue rows).
    expect(noteCodes(problemOf({ ...steamRun, contactS: 5 }))).toContain('threshold-recalled')
    expect(noteCodes(problemOf({ ...steamRun, contactS: 60 }))).not.toContain('threshold-recalled')
  })

  test('reach defaults to yes: the class of the finish at 5 s, shown as an assumption', () => {
    const problem = problemOf(steamRun)
    expect(problem.limits.burn).toMatchObject({ contact: '5 s', surface: 'smooth metal' })
    expect(noteCodes(problem)).toContain('reach-assumed')
  })

  test('a contact time that is given is no assumption', () => {
    const problem = problemOf({ ...steamRun, contactS: 60 })
    expect(problem.limits.burn?.contact).toBe('1 min')
    expect(problem.limits.burn?.thresholdC).toBe(51)
    expect(noteCodes(problem)).not.toContain('reach-assumed')
    expect(noteCodes(problem)).not.toContain('contact-assumed')
  })

  test('reach yes without a contact time: 5 s, said', () => {
    const problem = problemOf({ ...steamRun, reach: true })
    expect(problem.limits.burn?.contact).toBe('5 s')
    expect(noteCodes(problem)).toContain('contact-assumed')
    expect(noteCodes(problem)).not.toContain('reach-assumed')
  })

  test('reach no needs a reason; a blank one is none', () => {
    expect(refusedColumns({ ...steamRun, maxLossWPerM: 40, reach: false })).toEqual([
      'reach_reason',
    ])
    expect(
      refusedColumns({ ...steamRun, maxLossWPerM: 40, reach: false, reachReason: '  ' }),
    ).toEqual(['reach_reason'])
  })

  test('reach no with a reason: the burn curve is not judged, and the reason is in the notes', () => {
    const { limits, notes } = problemOf({
      ...steamRun,
      maxLossWPerM: 40,
      reach: false,
      reachReason: '6 m above the floor',
    })
    expect([limits.burn, limits.bareBurn]).toEqual([null, null])
    expect(notes.find(({ code }) => code === 'out-of-reach')?.text).toContain('6 m above the floor')
  })

  test('a stated temperature stays a limit out of reach, and is judged beside the curve within it', () => {
    const given = { ...steamRun, maxSurfaceC: 45 }
    expect(problemOf(given).limits).toMatchObject({
      maxSurfaceC: 45,
      burn: { surface: 'smooth metal' },
    })
    expect(problemOf({ ...given, reach: false, reachReason: 'x' }).limits).toMatchObject({
      maxSurfaceC: 45,
      burn: null,
    })
  })

  test('below 0.5 s is no value of a run', () => {
    expect(runValuesSchema.safeParse({ contactS: 0.5 }).success).toBe(true)
    expect(runValuesSchema.safeParse({ contactS: 0.49 }).success).toBe(false)
  })

  test('above 8 h the 8 h value', () => {
    expect(problemOf({ ...steamRun, contactS: 2_592_000 }).limits.burn?.thresholdC).toBe(43)
  })

  test('a class that is given overrides the finish', () => {
    expect(problemOf({ ...steamRun, touchClass: 'plastic' }).limits.burn?.surface).toBe('plastic')
  })

  test('no finish: judged as smooth metal, the strictest, said', () => {
    const problem = problemOf(unfinished)
    expect(problem.limits.burn?.surface).toBe('smooth metal')
    expect(noteCodes(problem)).toContain('touch-class-assumed')
  })

  test('coated metal of unknown or thin coating is judged as metal, said', () => {
    for (const finish of ['al_painted', 'prepainted_steel']) {
      const problem = problemOf({ ...steamRun, finish })
      expect(problem.limits.burn?.surface).toBe('smooth metal')
      expect(noteCodes(problem)).toContain('threshold-stricter')
    }
  })

  test('the bare run is judged as its own wall, whatever the jacket is', () => {
    const { burn, bareBurn } = problemOf({ ...steamRun, finish: 'pvc_jacket' }).limits
    expect(burn?.surface).toBe('plastic')
    expect(bareBurn?.surface).toBe('smooth metal')
    expect(
      problemOf({ ...steamRun, pipeMaterial: 'pvc_u', mediumC: 50 }).limits.bareBurn?.surface,
    ).toBe('plastic')
  })

  test('with a thickness of 0 the touched surface is the wall', () => {
    const { burn } = problemOf({ ...steamRun, finish: 'pvc_jacket', thicknessM: 0 }).limits
    expect(burn?.surface).toBe('smooth metal')
  })
})

describe('touch of a run that nothing heats to 43 °C', () => {
  // The lowest burn threshold, of eight hours' contact: ISO 13732-1, as the catalogue holds it.
  const { finish: _, ...unfinished } = coldRun
  const loud = ['reach-assumed', 'touch-air-assumed', 'touch-class-assumed', 'threshold-recalled']
  const heard = (values: RunValues): string[] =>
    noteCodes(problemOf(values)).filter((code) => loud.includes(code))

  test('is judged without a word', () => {
    const problem = problemOf(unfinished)
    expect(problem.limits.burn?.thresholdC).toBeGreaterThan(43)
    expect(problem.limits.bareBurn).not.toBeNull()
    expect(heard(unfinished)).toEqual([])
  })

  test.each([{ mediumMaxC: 43 }, { touchAirC: 43 }, { surroundingsC: 43 }, { solarWPerM2: 1 }])(
    'with %o it is told as ever',
    (own) => {
      const isGiven = 'touchAirC' in own
      expect(heard({ ...unfinished, ...own }).toSorted()).toEqual(
        loud.filter((code) => !isGiven || code !== 'touch-air-assumed').toSorted(),
      )
    },
  )

  test.each([{ mediumMaxC: 42.9 }, { touchAirC: 42.9 }, { solarWPerM2: 0 }])(
    'with %o it is not',
    (own) => {
      expect(heard({ ...unfinished, ...own })).toEqual([])
    },
  )

  test('a stated limit has its air told', () => {
    expect(heard({ ...unfinished, maxSurfaceC: 30 })).toEqual(['touch-air-assumed'])
  })

  test('out of reach asks for its reason all the same', () => {
    expect(refusedColumns({ ...coldRun, reach: false })).toEqual(['reach_reason'])
  })
})

describe('an overall size', () => {
  // DN 50 measures 60.3 mm: EN 10220.
  test('smaller than the pipe is refused with what that measures', () => {
    expect(refused({ ...steamRun, maxOuterDiameterM: 0.05 })).toEqual([
      {
        column: 'max_od_mm',
        found: '50 mm',
        allowed: 'more than 60.3 mm: the pipe alone measures 60.3 mm',
      },
    ])
    expect(problemOf({ ...steamRun, maxOuterDiameterM: 0.0603 }).limits.maxOuterDiameterM).toBe(
      0.0603,
    )
  })

  test('of a rectangular duct is that of its larger side', () => {
    const { size: _, ...plain } = steamRun
    const duct: RunValues = { ...plain, shape: 'rect-duct', widthM: 0.4, heightM: 0.6 }
    expect(refused({ ...duct, maxOuterDiameterM: 0.5 })[0]?.allowed).toContain(
      'the duct alone measures 600 mm',
    )
  })
})

describe('damp', () => {
  test('judged if humidity is given, margin 1 K with a note', () => {
    const problem = problemOf(coldRun)
    expect(problem.limits.damp?.marginK).toBe(1)
    expect(noteCodes(problem)).toContain('dew-margin-assumed')
  })

  test('not judged without', () => {
    const { humidity: _, ...dry } = coldRun
    const problem = problemOf({ ...dry, dewMarginK: 2 })
    expect(problem.limits.damp).toBeNull()
    const texts = problem.notes.map(({ text }) => text)
    expect(texts).toContain('Damp is not judged: no humidity_pct is given. The surface may drip.')
    expect(texts).toContain('dew_margin_k is not used: no humidity_pct is given.')
  })

  test('that it is not, is no news of a hot run, nor of one in the ground', () => {
    const { humidity: _, ...dry } = coldRun
    expect(noteCodes(problemOf(dry))).toContain('damp-not-judged')
    for (const other of [
      { ...dry, mediumC: 27 },
      { ...dry, buryDepthM: 1, maxLossWPerM: 20 },
      coldRun,
    ])
      expect(noteCodes(problemOf(other))).not.toContain('damp-not-judged')
    expect(noteCodes(problemOf({ ...dry, mediumC: 30, mediumMinC: 10 }))).toContain(
      'damp-not-judged',
    )
  })

  test('below 0 °C the convention of its humidity is said', () => {
    const frozen = { ...coldRun, mediumC: -40 }
    for (const [dampAirC, isSaid] of [
      [-1, true],
      [0, false],
    ] as const)
      expect(noteCodes(problemOf({ ...frozen, dampAirC })).includes('humidity-over-ice')).toBe(
        isSaid,
      )
  })

  test('a margin that is given, 0 too', () => {
    for (const dewMarginK of [0, 2.5]) {
      const problem = problemOf({ ...coldRun, dewMarginK })
      expect(problem.limits.damp?.marginK).toBe(dewMarginK)
      expect(noteCodes(problem)).not.toContain('dew-margin-assumed')
    }
  })

  // ASHRAE Fundamentals 2021, ch. 4, example 12: 30 °C and 70 % has its dew point at 23.93 °C.
  test('the dew point is that of the damp air', () => {
    const { damp } = problemOf({ ...coldRun, dampAirC: 30 }).limits
    expect(damp?.dewPointC).toBeCloseTo(23.93, 2)
  })

  test('a surface that nothing cools below the air is no question of damp', () => {
    expect(problemOf({ ...steamRun, humidity: 0.8 }).limits.damp).toBeNull()
  })

  test('one that faces colder surroundings is, however warm the medium', () => {
    expect(problemOf({ ...steamRun, humidity: 0.8, surroundingsC: 0 }).limits.damp).not.toBeNull()
  })
})

test('loss limits are taken as given', () => {
  expect(problemOf({ ...steamRun, maxLossWPerM: 40, maxLossWPerM2: 90 }).limits).toMatchObject({
    maxLossWPerM: 40,
    maxLossWPerM2: 90,
  })
})

describe('neither limit nor money', () => {
  const unreached = { ...steamRun, reach: false, reachReason: 'in a shaft' }

  test('is an input error of a run to be sized, that says what would do', () => {
    const [issue] = refused(unreached)
    expect(issue?.column).toBe('reach')
    for (const way of ['max_loss_w_m', 'fuel', 'hours_per_year', 'thickness_mm'])
      expect(issue?.allowed).toContain(way)
  })

  test('is none of a fixed or bare run', () => {
    for (const thicknessM of [0, 0.05]) expect(problemOf({ ...unreached, thicknessM })).toBeTruthy()
  })

  test.each([{ maxSurfaceC: 50 }, { maxLossWPerM: 40 }, { maxLossWPerM2: 90 }])(
    '%o is something to size by',
    (limit) => {
      expect(problemOf({ ...unreached, ...limit })).toBeTruthy()
    },
  )

  test('so is money, but not money without a price to weigh', () => {
    const weighed = { ...unreached, fuel: 'natural_gas', hoursPerYear: 8000 }
    expect(problemOf(weighed).money).not.toBeNull()
    const { material: _, ...byConductivity } = weighed
    expect(refusedColumns({ ...byConductivity, conductivityWPerMK: 0.04 })).toEqual(['reach'])
    expect(refusedColumns({ ...weighed, finish: 'timber_board' })).toEqual(['reach'])
  })
})
