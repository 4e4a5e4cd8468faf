/** Rules of site practice: said where a build-up calls for them, and nowhere else. */
import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import { coldRun, noteCodes, steamRun } from '../../sizing/catalogue.ts'
import { problemOf } from './problem.ts'

const codes = (values: RunValues): string[] => noteCodes(problemOf(values))

const { material: _, ...unlagged } = steamRun

describe('cold work', () => {
  test('supports are lagged outwards, stops are set on long cold pipes', () => {
    expect(codes({ ...coldRun, supports: 2 })).toContain('cold-projections')
    expect(codes(coldRun)).not.toContain('cold-projections')
    expect(codes({ ...steamRun, supports: 2 })).not.toContain('cold-projections')
    expect(codes({ ...coldRun, mediumC: -10, lengthM: 20 })).toContain('vapour-stops')
    expect(codes({ ...coldRun, mediumC: -10, lengthM: 5 })).not.toContain('vapour-stops')
  })
})

test('sections over sections have to nest', () => {
  const nested = { ...unlagged, layers: 'calcium_silicate:40;stone_wool_pipe_section:?' }
  expect(codes(nested)).toContain('nesting')
  expect(codes(steamRun)).not.toContain('nesting')
})

test('sheet over a soft mat on a lying pipe needs supports', () => {
  const soft = { ...steamRun, size: 'DN 250', material: 'stone_wool_mat_wired' }
  expect(codes(soft)).toContain('cladding-spacers')
  expect(codes({ ...soft, finish: 'canvas_glasscloth' })).not.toContain('cladding-spacers')
  expect(codes({ ...soft, orientation: 'vertical', riseM: 3 })).not.toContain('cladding-spacers')
  expect(codes(steamRun)).not.toContain('cladding-spacers')
})

test('a bare run calls for none', () => {
  const bare = { ...coldRun, thicknessM: 0, lengthM: 100, supports: 3, mediumC: -40 }
  const rules = ['cold-projections', 'vapour-stops', 'movement', 'nesting', 'cladding-spacers']
  expect(codes(bare).filter((code) => rules.includes(code))).toEqual([])
})
