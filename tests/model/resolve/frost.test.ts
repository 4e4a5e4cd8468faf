/** What frost needs to be judged, and what is assumed where it is not given. */
import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import { noteCodes, refused, refusedColumns, steamRun } from '../../sizing/catalogue.ts'
import { problemOf } from './problem.ts'

const coldPipe: RunValues = { ...steamRun, mediumC: 10, frostHours: 8, frostAirC: -15 }
const { size: _size, ...unsized } = coldPipe

describe('frost', () => {
  test('is not judged where it is not asked about', () => {
    const { frostHours: _, ...unasked } = coldPipe
    expect(problemOf(unasked).limits.frost).toBeNull()
  })

  // DN 50: 60.3 × 2.9 mm, EN 10220.
  test('takes bore and heat capacities from the size', () => {
    const { frost } = problemOf(coldPipe).limits
    expect(frost).toMatchObject({ hours: 8, iceFraction: 0 })
    expect(frost?.boreM).toBeCloseTo(0.0545, 9)
  })

  test('or from a diameter and a wall, of the material of the pipe', () => {
    const given = { ...unsized, outerDiameterM: 0.0603, wallM: 0.0029 }
    expect(problemOf(given).limits.frost).toEqual(problemOf(coldPipe).limits.frost)
    const copper = problemOf({ ...given, pipeMaterial: 'copper' }).limits.frost
    expect(copper?.wallJPerMK).not.toBe(problemOf(given).limits.frost?.wallJPerMK)
  })

  test('a diameter without a wall does not do', () => {
    const [issue] = refused({ ...unsized, outerDiameterM: 0.0603 })
    expect(issue).toMatchObject({ column: 'wall_mm', found: 'nothing' })
    expect(issue?.allowed).toContain('DN 50')
  })

  test('is for water: none given is taken as water, another medium is refused', () => {
    expect(noteCodes(problemOf(coldPipe))).toContain('frost-water-assumed')
    expect(noteCodes(problemOf({ ...coldPipe, medium: 'water' }))).not.toContain(
      'frost-water-assumed',
    )
    for (const medium of ['glycol', 'steam', 'oil', 'air', 'other'] as const)
      expect(refusedColumns({ ...coldPipe, medium })).toEqual(['medium'])
    const { mediumC: _, ...steam } = coldPipe
    expect(refusedColumns({ ...steam, pressureGaugePa: 1e5 })).toEqual(['frost_hours'])
  })

  test('is for pipes', () => {
    const duct: RunValues = { ...unsized, shape: 'round-duct', size: 'D 250' }
    expect(refusedColumns(duct)).toEqual(['frost_hours'])
    const flat: RunValues = {
      ...unsized,
      shape: 'flat',
      heightM: 2,
      widthM: 2,
      material: 'stone_wool_slab',
    }
    expect(refusedColumns(flat)).toEqual(['frost_hours'])
    for (const orientation of ['horizontal', 'vertical', 'inclined'] as const)
      expect(problemOf({ ...coldPipe, orientation, riseM: 3 }).limits.frost).not.toBeNull()
    expect(problemOf({ ...coldPipe, buryDepthM: 1 }).limits.frost).not.toBeNull()
  })

  test('starts from the coldest medium, or as given', () => {
    const assumed = problemOf({ ...coldPipe, mediumMinC: 4 })
    expect(assumed.conditions.frost?.mediumC).toBe(4)
    expect(noteCodes(assumed)).toContain('frost-start-assumed')
    const given = problemOf({ ...coldPipe, frostStartC: 7 })
    expect(given.conditions.frost?.mediumC).toBe(7)
    expect(noteCodes(given)).not.toContain('frost-start-assumed')
  })

  test('water that starts frozen is refused; at 0 °C it may still turn to ice', () => {
    expect(refusedColumns({ ...coldPipe, mediumMinC: -5 })).toEqual(['frost_start_c'])
    expect(refused({ ...coldPipe, mediumMinC: -5 })[0]?.found).toContain('−5 °C')
    expect(refusedColumns({ ...coldPipe, frostStartC: 0 })).toEqual(['frost_start_c'])
    expect(
      problemOf({ ...coldPipe, frostStartC: 0, frostFraction: 0.1 }).limits.frost,
    ).not.toBeNull()
  })

  test('no share of ice given: it may only reach 0 °C, said', () => {
    expect(noteCodes(problemOf(coldPipe))).toContain('frost-fraction-assumed')
    const given = problemOf({ ...coldPipe, frostFraction: 0.25 })
    expect(given.limits.frost?.iceFraction).toBe(0.25)
    expect(noteCodes(given)).not.toContain('frost-fraction-assumed')
  })

  test('in air that does not freeze it is not judged, said; under a sky that does it is', () => {
    const mild = problemOf({ ...coldPipe, frostAirC: 0 })
    expect(mild.limits.frost).toBeNull()
    expect(noteCodes(mild)).toContain('frost-never')
    expect(problemOf({ ...coldPipe, frostAirC: 1, skyView: 1 }).limits.frost).not.toBeNull()
    // A fixed film and the ground do not see the sky.
    for (const blind of [{ filmWPerM2K: 10 }, { buryDepthM: 1 }])
      expect(
        problemOf({ ...coldPipe, ...blind, maxSurfaceC: 60, frostAirC: 1, skyView: 1 }).limits
          .frost,
      ).toBeNull()
  })

  test('is something to size by', () => {
    expect(problemOf({ ...coldPipe, reach: false, reachReason: 'in a shaft' })).toBeTruthy()
  })

  test('all that is wrong is said at once', () => {
    const { airC: _, ...airless } = unsized
    expect(
      refusedColumns({ ...airless, outerDiameterM: 0.06, mediumMinC: -5, medium: 'water' }),
    ).toEqual(expect.arrayContaining(['wall_mm', 'air_c']))
  })
})
