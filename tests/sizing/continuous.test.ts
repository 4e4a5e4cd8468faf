import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import { detailRun } from '#model/size-run.ts'
import { limitEnds } from '#sizing/continuous.ts'
import type { LimitName } from '#sizing/result.ts'
import { problemOf } from '../model/resolve/problem.ts'
import { coldRun, index, sized, steamRun } from './catalogue.ts'

const { material: _material, ...without } = steamRun
const endM = (values: RunValues, limit: LimitName): number | null | undefined =>
  limitEnds(problemOf(values)).find((end) => end.limit === limit)?.fromM

describe('the exact end of a limit', () => {
  test.each<[LimitName, RunValues]>([
    ['touch', { ...steamRun, mediumC: 400 }],
    ['loss', { ...steamRun, maxLossWPerM: 30 }],
    ['loss', { ...steamRun, maxLossWPerM2: 80 }],
    ['damp', coldRun],
  ])('%s: passes there, fails a hair below', (limit, values) => {
    const fromM = endM(values, limit) ?? Number.NaN
    const passes = (thicknessM: number): boolean | undefined =>
      sized({ ...values, thicknessM }).chosen?.limits.find((found) => found.limit === limit)?.pass
    expect(passes(fromM + 1e-6)).toBe(true)
    expect(passes(fromM - 1e-6)).toBe(false)
  })

  test('lies between the last rung that fails and the first that passes', () => {
    const { ladder, chosen } = sized({ ...steamRun, mediumC: 400 })
    const at = ladder.findIndex(({ thicknessM }) => thicknessM === chosen?.thicknessM)
    const fromM = endM({ ...steamRun, mediumC: 400 }, 'touch') ?? Number.NaN
    expect(fromM).toBeGreaterThan(ladder[at - 1]?.thicknessM ?? 0)
    expect(fromM).toBeLessThanOrEqual(chosen?.thicknessM ?? 0)
  })

  test('is a thickness of the whole build-up, like the rungs it stands beside', () => {
    const values: RunValues = {
      ...without,
      mediumC: 400,
      layers: 'calcium_silicate:40;stone_wool_pipe_section:?',
    }
    const { ladder, chosen } = sized(values)
    const at = ladder.findIndex(({ thicknessM }) => thicknessM === chosen?.thicknessM)
    const fromM = endM(values, 'touch') ?? Number.NaN
    expect(fromM).toBeGreaterThan(ladder[at - 1]?.thicknessM ?? 0)
    expect(fromM).toBeLessThanOrEqual(chosen?.thicknessM ?? 0)
  })

  test('is where the limit passes for good, where it passes, fails and passes again', () => {
    // Below the critical radius λ/h a thicker layer loses more: 8 mm pipe, λ 0.4.
    const thin: RunValues = {
      tag: 'A',
      shape: 'pipe',
      outerDiameterM: 0.008,
      mediumC: 80,
      airC: 20,
      conductivityWPerMK: 0.4,
      finish: 'asj',
    }
    const [first, second] = sized({ ...thin, maxLossWPerM: 1000 }).ladder
    const maxLossWPerM = ((first?.heatLossWPerM ?? 0) + (second?.heatLossWPerM ?? 0)) / 2
    const { ladder } = sized({ ...thin, maxLossWPerM })
    expect(ladder[0]?.pass).toBe(true)
    const lastFailing = ladder.findLastIndex(({ pass }) => !pass)
    expect(lastFailing).toBeGreaterThan(0)
    const fromM = endM({ ...thin, maxLossWPerM }, 'loss') ?? Number.NaN
    expect(fromM).toBeGreaterThan(ladder[lastFailing]?.thicknessM ?? 0)
    expect(fromM).toBeLessThanOrEqual(ladder[lastFailing + 1]?.thicknessM ?? 0)
  })

  test('0 where the thinnest passes, null where 600 mm does not', () => {
    expect(endM({ ...steamRun, mediumC: 50 }, 'touch')).toBe(0)
    expect(endM({ ...steamRun, maxLossWPerM: 0.5 }, 'loss')).toBeNull()
  })

  test('none of a fixed or bare run, and none for what is not limited', () => {
    for (const thicknessM of [0, 0.05])
      expect(limitEnds(problemOf({ ...steamRun, thicknessM }))).toEqual([])
    expect(limitEnds(problemOf(steamRun)).map(({ limit }) => limit)).toEqual(['touch'])
    expect(
      detailRun({ ...coldRun, maxLossWPerM: 9 }, {}, index)?.ends.map(({ limit }) => limit),
    ).toEqual(['touch', 'loss', 'damp'])
  })
})

describe('several limits fail on the next thinner rung', () => {
  test('service at the cold end counts from its own side of the bound', () => {
    // Stone wool over PIR: cold, the wool stands −18 °C. Both damp and the wool's cold side ask for more PIR.
    const values: RunValues = {
      ...without,
      mediumC: -150,
      airC: 25,
      humidity: 0.35,
      layers: 'pir_pipe_section:?;stone_wool_pipe_section:25',
      emissivity: 0.9,
    }
    const { chosen, ladder, governing } = sized(values)
    const at = ladder.findIndex(({ thicknessM }) => thicknessM === chosen?.thicknessM)
    const failed = ladder[at - 1]?.limits.filter(({ pass }) => !pass).map(({ limit }) => limit)
    expect(failed).toContain('service')
    expect(governing).toBe('service')
  })
})
