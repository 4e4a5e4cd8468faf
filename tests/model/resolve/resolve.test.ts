import { describe, expect, test } from 'vitest'
import { detailRun, sizeRun, withDefaults } from '#model/size-run.ts'
import { index, refused, refusedColumns, sized, steamRun } from '../../sizing/catalogue.ts'

describe('all that is wrong comes back at once', () => {
  test('an empty run', () => {
    expect(refusedColumns({}).sort()).toEqual(
      ['tag', 'shape', 'medium_c', 'air_c', 'material'].sort(),
    )
  })

  test('a fault of each part', () => {
    expect(
      refusedColumns({
        tag: 'A',
        shape: 'pipe',
        size: 'DN 51',
        mediumC: 150,
        mediumMaxC: 100,
        material: 'stone',
        finish: 'gold',
        pipeMaterial: 'wood',
        fuel: 'phlogiston',
        hoursPerYear: 100,
        reach: false,
      }).sort(),
    ).toEqual(
      [
        'size',
        'medium_max_c',
        'air_c',
        'material',
        'finish',
        'pipe_material',
        'fuel',
        'reach_reason',
      ].sort(),
    )
  })

  test('each says what was found and what is allowed', () => {
    for (const { found, allowed } of refused({ shape: 'pipe', size: 'DN 51' })) {
      expect(found).not.toBe('')
      expect(allowed.length).toBeGreaterThan(10)
    }
  })
})

test('a tag is required, and spaces are none', () => {
  const { tag: _, ...untagged } = steamRun
  expect(refusedColumns(untagged)).toEqual(['tag'])
  expect(refusedColumns({ ...steamRun, tag: '   ' })).toEqual(['tag'])
})

test('a blank text is as good as none', () => {
  const blank = sized({ ...steamRun, finish: '', layers: ' ', fuel: '', pipeMaterial: '' })
  const { finish: _, ...unfinished } = steamRun
  expect(blank).toEqual(sized(unfinished))
})

describe('defaults of the job', () => {
  test('fill what a run leaves out', () => {
    expect(withDefaults({ airC: 25 }, { airC: 20, mediumC: 150 })).toEqual({
      airC: 25,
      mediumC: 150,
    })
  })

  test.each([
    [{ layers: 'a:40' }, { material: 'm', thicknessM: 0.05 }, { layers: 'a:40' }],
    [{ material: 'm' }, { layers: 'a:40' }, { material: 'm' }],
    [{ material: 'm' }, { conductivityWPerMK: 0.04 }, { material: 'm' }],
    [{ material: 'm' }, { material: 'n', thicknessM: 0.05 }, { material: 'm', thicknessM: 0.05 }],
    [{ thicknessM: 0 }, { layers: 'a:40' }, { thicknessM: 0 }],
    [{ thicknessM: 0.03 }, { material: 'm' }, { material: 'm', thicknessM: 0.03 }],
    [
      { conductivityWPerMK: 0.04 },
      { material: 'm', layers: 'a:40' },
      { conductivityWPerMK: 0.04, material: 'm' },
    ],
    [{}, { layers: 'a:40' }, { layers: 'a:40' }],
  ])('%o over %o', (own, job, both) => {
    expect(withDefaults(own, job)).toEqual(both)
  })

  test('are sized with', () => {
    const { material, airC, ...own } = steamRun
    expect(sizeRun(own, { material, airC } as typeof steamRun, index)).toEqual(
      sizeRun(steamRun, {}, index),
    )
  })
})

test('the exact ends of a run that cannot be sized are null', () => {
  expect(detailRun({}, {}, index)).toBeNull()
  expect(detailRun(steamRun, {}, index)?.ends.map(({ limit }) => limit)).toEqual(['touch'])
})
