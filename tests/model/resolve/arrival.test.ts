/** What arrival needs to be told or limited, and what is assumed where it is not given. */
import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import { noteCodes, refused, refusedColumns, steamRun } from '../../sizing/catalogue.ts'
import { problemOf } from './problem.ts'

const line: RunValues = { ...steamRun, medium: 'water', lengthM: 100, flowKgPerS: 0.5, maxDropK: 2 }
const without = (...keys: readonly (keyof RunValues)[]): RunValues =>
  Object.fromEntries(Object.entries(line).filter(([key]) => !keys.some((gone) => gone === key)))
const duct: RunValues = {
  tag: 'D',
  shape: 'rect-duct',
  size: '600 x 400',
  mediumC: 13,
  airC: 27,
  material: 'glass_wool_slab',
  finish: 'asj',
  lengthM: 50,
  maxDropK: 1,
}

describe('a limited drop', () => {
  test('needs flow, length and medium: each is asked for', () => {
    expect(refusedColumns(without('flowKgPerS'))).toEqual(['flow_kg_s'])
    expect(refusedColumns(without('lengthM'))).toEqual(['length_m'])
    expect(refusedColumns(without('medium'))).toEqual(['medium'])
    expect(refused(without('medium'))[0]?.allowed).toContain('heat_capacity_j_kgk')
    expect(refusedColumns(without('flowKgPerS', 'medium'))).toEqual(['flow_kg_s', 'medium'])
  })

  // Water at 150 °C: 4.31 kJ/kgK (IAPWS-IF97, steam tables).
  test('takes the heat capacity of the medium where it sets out, said', () => {
    const problem = problemOf(line)
    expect(problem.limits.arrival).toMatchObject({ kind: 'drop', maxDropK: 2, flowKgPerS: 0.5 })
    const { arrival } = problem.limits
    expect(arrival?.kind === 'drop' ? arrival.heatCapacityJPerKgK / 1000 : 0).toBeCloseTo(4.31, 2)
    expect(noteCodes(problem)).toContain('heat-capacity')
  })

  test('or the one that is given, of any medium', () => {
    const given = problemOf({ ...without('medium'), heatCapacityJPerKgK: 3900 })
    expect(given.limits.arrival).toMatchObject({ kind: 'drop', heatCapacityJPerKgK: 3900 })
    expect(noteCodes(given)).not.toContain('heat-capacity')
  })

  test('of a medium whose heat capacity is not held: asked for', () => {
    const [issue] = refused({ ...line, medium: 'other' })
    expect(issue).toMatchObject({ column: 'heat_capacity_j_kgk', found: 'nothing' })
    expect(refusedColumns({ ...line, mediumC: 900 })).toEqual(['heat_capacity_j_kgk'])
  })

  test('is for lines', () => {
    const wall: RunValues = {
      ...without('size', 'lengthM'),
      shape: 'flat',
      heightM: 2,
      widthM: 2,
      material: 'stone_wool_slab',
    }
    expect(refusedColumns(wall)).toEqual(['max_drop_k'])
    const vessel: RunValues = { ...without('size'), shape: 'vessel', outerDiameterM: 1 }
    expect(refusedColumns(vessel)).toEqual(['max_drop_k'])
  })

  test('is something to size by; a flow alone is not', () => {
    const unreached = { reach: false, reachReason: 'in a shaft' }
    expect(problemOf({ ...line, ...unreached })).toBeTruthy()
    expect(refusedColumns({ ...without('maxDropK'), ...unreached })).toEqual(['reach'])
  })
})

describe('a flow alone', () => {
  test('tells the arrival', () => {
    expect(problemOf(without('maxDropK')).limits.arrival?.maxDropK).toBeNull()
  })

  test.each<[string, RunValues]>([
    ['no length', without('maxDropK', 'lengthM')],
    ['no medium', without('maxDropK', 'medium')],
    ['a medium not held', { ...without('maxDropK'), medium: 'other' }],
    ['steam beyond its table', { ...without('maxDropK'), medium: 'steam', mediumC: 450 }],
  ])('%s: not told, and a note says why', (_, values) => {
    const problem = problemOf(values)
    expect(problem.limits.arrival).toBeNull()
    expect(noteCodes(problem)).toContain('arrival-unknown')
  })

  test('is not used for what is no line', () => {
    const vessel: RunValues = { ...without('size', 'maxDropK'), shape: 'vessel', outerDiameterM: 1 }
    expect(
      problemOf(vessel).notes.some(({ text }) => text.startsWith('flow_kg_s is not used')),
    ).toBe(true)
  })
})

describe('steam', () => {
  const steam: RunValues = { ...line, medium: 'steam' }

  test('condenses at its temperature, said where no pressure is given', () => {
    const problem = problemOf(steam)
    expect(problem.limits.arrival?.kind).toBe('condensate')
    expect(noteCodes(problem)).toContain('steam-taken-saturated')
  })

  test('given by its pressure it needs no word for it', () => {
    const problem = problemOf({ ...without('medium', 'mediumC'), pressureGaugePa: 5e5 })
    expect(problem.limits.arrival?.kind).toBe('condensate')
    expect(noteCodes(problem)).not.toContain('steam-taken-saturated')
  })

  test('with a heat capacity it is superheated and cools; not beside a pressure', () => {
    const superheated = problemOf({ ...steam, heatCapacityJPerKgK: 2100 })
    expect(superheated.limits.arrival?.kind).toBe('drop')
    expect(noteCodes(superheated)).toContain('steam-superheated')
    const { mediumC: _, ...unheated } = steam
    const saturated = problemOf({ ...unheated, pressureGaugePa: 5e5, heatCapacityJPerKgK: 2100 })
    expect(saturated.limits.arrival?.kind).toBe('condensate')
    expect(noteCodes(saturated)).toContain('unused')
  })

  test('hotter than it can be saturated: refused', () => {
    expect(refusedColumns({ ...steam, mediumC: 450 })).toEqual(['medium_c'])
  })
})

describe('ducts', () => {
  // 0.6 × 0.4 m at 5 m/s; air of 13 °C at 101 325 Pa has 1.2336 kg/m³ (p/RT).
  test('carry air: the flow follows from its velocity', () => {
    const problem = problemOf({ ...duct, velocityMPerS: 5 })
    expect(problem.limits.arrival?.flowKgPerS).toBeCloseTo(0.24 * 5 * 1.2336, 3)
    expect(noteCodes(problem)).toContain('flow-by-velocity')
    const { size: _, ...unsized } = duct
    const round = problemOf({ ...unsized, shape: 'round-duct', size: 'D 250', velocityMPerS: 5 })
    expect(round.limits.arrival?.flowKgPerS).toBeCloseTo((Math.PI / 4) * 0.0625 * 5 * 1.2336, 3)
  })

  test('neither flow nor velocity: either is asked for', () => {
    const [issue] = refused(duct)
    expect(issue?.column).toBe('flow_kg_s')
    expect(issue?.allowed).toContain('velocity_m_s')
  })

  test('a velocity says nothing of a pipe, or of what is not air', () => {
    expect(refusedColumns({ ...without('flowKgPerS'), velocityMPerS: 2 })).toEqual(['flow_kg_s'])
    expect(refusedColumns({ ...duct, medium: 'water', velocityMPerS: 2 })).toEqual(['flow_kg_s'])
  })
})
