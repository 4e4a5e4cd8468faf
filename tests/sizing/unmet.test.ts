/** Limits that no rung meets: each with the thickness that would meet it, or the cause that none does. */
import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import type { UnmetLimit } from '#sizing/result.ts'
import { coldRun, sized, steamRun } from './catalogue.ts'

const unmetOf = (values: RunValues): readonly UnmetLimit[] => sized(values).unmet

/** Out of reach, and free to lose what it likes. */
const hidden: RunValues = {
  ...steamRun,
  reach: false,
  reachReason: 'in a shaft',
  maxLossWPerM: 10_000,
}

describe('touch', () => {
  test('in air that is as hot as the bound', () => {
    expect(unmetOf({ ...steamRun, maxSurfaceC: 40, touchAirC: 41 })).toEqual([
      { limit: 'touch', neededM: null, because: 'the air of the hottest day is as hot itself' },
    ])
  })

  test('under a sun that heats the jacket to it', () => {
    const sunny = { ...steamRun, mediumC: 60, maxSurfaceC: 40, touchAirC: 35, solarWPerM2: 1000 }
    expect(unmetOf(sunny)).toEqual([
      { limit: 'touch', neededM: null, because: 'the sun alone heats the surface to that' },
    ])
  })

  test('above air that is only just colder', () => {
    const hot = { ...steamRun, mediumC: 600, maxSurfaceC: 35.2, touchAirC: 35 }
    expect(unmetOf(hot)).toEqual([
      {
        limit: 'touch',
        neededM: null,
        because: expect.stringMatching(/^no thickness up to \d+ mm would$/),
      },
    ])
  })
})

describe('loss', () => {
  test('that takes more than can be bought', () => {
    const [found, ...more] = unmetOf({ ...hidden, maxLossWPerM: 14 })
    expect(more).toEqual([])
    expect(found).toMatchObject({ limit: 'loss', because: null })
    const thickestM = Math.max(...sized(hidden).ladder.map(({ thicknessM }) => thicknessM))
    expect(found?.neededM).toBeGreaterThan(thickestM)
    // Taken as a fixed thickness it does what it was named for, and a millimetre less does not.
    const lossAt = (thicknessM: number) =>
      sized({ ...hidden, thicknessM }).chosen?.heatLossWPerM ?? Number.NaN
    expect(lossAt(found?.neededM ?? 0)).toBeLessThanOrEqual(14)
    expect(lossAt((found?.neededM ?? 0) - 0.001)).toBeGreaterThan(14)
  })

  test('that no thickness brings about', () => {
    expect(unmetOf({ ...hidden, maxLossWPerM: 0.5 })).toEqual([
      {
        limit: 'loss',
        neededM: null,
        because: expect.stringMatching(/^no thickness up to \d+ mm would$/),
      },
    ])
  })
})

test('damp in air that is at its dew point within the margin', () => {
  expect(unmetOf({ ...coldRun, humidity: 0.99 })).toEqual([
    { limit: 'damp', neededM: null, because: 'the air itself is that near to its dew point' },
  ])
})

describe('service', () => {
  // The shipped row: stone wool pipe section up to 650 °C.
  test('at the medium itself', () => {
    expect(unmetOf({ ...hidden, mediumC: 700 })).toEqual([
      { limit: 'service', neededM: null, because: 'that is the medium itself, at any thickness' },
    ])
  })
})

test('space that even the thinnest fills', () => {
  expect(unmetOf({ ...hidden, maxOuterDiameterM: 0.07 })).toEqual([
    { limit: 'space', neededM: null, because: 'even the thinnest that can be bought is too large' },
  ])
})

test('two limits that no rung meets are both named', () => {
  expect(
    unmetOf({ ...hidden, maxOuterDiameterM: 0.07, maxLossWPerM: 0.5 }).map(({ limit }) => limit),
  ).toEqual(['loss', 'space'])
})

test('nothing is unmet where a rung passes, nor where limits only exclude each other', () => {
  expect(unmetOf(steamRun)).toEqual([])
  const exclusive = { ...steamRun, mediumC: 350, maxOuterDiameterM: 0.11 }
  const result = sized(exclusive)
  expect(result.chosen).toBeNull()
  expect(result.unmet).toEqual([])
  expect(result.reason).toMatch(
    /^No thickness passes every limit\. Touch needs \d+ mm or more, space allows 20 mm at most\.$/,
  )
})

test('a buried run is looked at no thicker than the ground over it lets it be', () => {
  // Axis 150 mm down, pipe of 60.3 mm: 119.85 mm of room, less a hair.
  const { unmet, reason } = sized({
    ...steamRun,
    size: 'DN 50',
    mediumC: 90,
    airC: 10,
    buryDepthM: 0.15,
    soilWPerMK: 1.5,
    maxLossWPerM: 3,
  })
  expect(unmet).toEqual([
    { limit: 'loss', neededM: null, because: 'no thickness up to 120 mm would' },
  ])
  expect(reason).toContain('no thickness up to 120 mm would')
})
