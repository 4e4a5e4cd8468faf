/** Lagging in the ground: rungs that would reach out of it are left out, a thickness that would is refused. */
import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import { mm, noteCodes, refused, sized, steamRun } from '../../sizing/catalogue.ts'
import { problemOf } from './problem.ts'

// DN 50 measures 60.3 mm: 30.15 mm and 50 mm of lagging reach 80.15 mm from the axis.
const buried: RunValues = { ...steamRun, maxLossWPerM: 200, buryDepthM: 0.0802 }

describe('a ladder', () => {
  test('ends below the surface of the soil, said in a note', () => {
    const problem = problemOf(buried)
    expect(mm(problem.steps.at(-1)?.thicknessM)).toBe(50)
    expect(problem.notes.find(({ code }) => code === 'steps-above-ground')?.text).toBe(
      'Thicknesses above 50 mm are left out: with them the lagging would reach out of the ground, 0.08 m above the axis of the run.',
    )
    expect(noteCodes(sized(buried))).not.toContain('soil-shallow')
  })

  test('is whole where it fits, in the ground and in the air', () => {
    for (const values of [{ ...buried, buryDepthM: 2 }, steamRun]) {
      const problem = problemOf(values)
      expect(problem.steps.length).toBeGreaterThan(20)
      expect(noteCodes(problem)).not.toContain('steps-above-ground')
    }
  })

  test('of which nothing fits is refused', () => {
    expect(refused({ ...buried, buryDepthM: 0.05 })).toEqual([
      {
        column: 'bury_depth_m',
        found: '0.05 m',
        allowed:
          'more than 0.05 m: so far does the thinnest lagging reach from the axis of the run',
      },
    ])
  })
})

test('a fixed thickness that reaches out of the ground is refused', () => {
  expect(refused({ ...buried, thicknessM: 0.06 })).toEqual([
    {
      column: 'bury_depth_m',
      found: '0.08 m',
      allowed: 'more than 0.09 m: so far does the lagging reach from the axis of the run',
    },
  ])
  expect(problemOf({ ...buried, thicknessM: 0.05 }).layers).toHaveLength(1)
  expect(problemOf({ ...buried, thicknessM: 0 }).layers).toEqual([])
})

test('a finish over a bare run in the ground has no emissivity to be given', () => {
  const { notes } = problemOf({ ...buried, thicknessM: 0 })
  expect(notes.map(({ text }) => text)).toContain('The finish is not used for a bare run.')
})

test('fixed layers beside the sized one count', () => {
  const { material: _, ...plain } = buried
  const layers = 'stone_wool_pipe_section:20;stone_wool_pipe_section:?'
  expect(
    problemOf({ ...plain, layers }).steps.every(({ thicknessM }) => mm(thicknessM) <= 30),
  ).toBe(true)
})

test('with neither limit nor money it is not advised to be in reach', () => {
  const { maxLossWPerM: _, ...idle } = buried
  const [issue] = refused(idle)
  expect(issue?.column).toBe('max_loss_w_m')
  expect(issue?.allowed).toContain('max_loss_w_m, or fuel and hours_per_year')
  expect(issue?.allowed).not.toContain('reach')
})
