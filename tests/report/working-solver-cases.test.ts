/** Workings of what no row of the shipped catalogue brings about. */
import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import { resolve } from '#model/resolve/resolve.ts'
import { writeWorkingText } from '#report/working-text.ts'
import { settle } from '#sizing/build-up.ts'
import type { Problem } from '#sizing/problem.ts'
import { systemOf } from '#sizing/states.ts'
import { workingOf } from '#sizing/working/working.ts'
import { solve } from '#solver/index.ts'
import type { Conductivity } from '#solver/types.ts'
import { index } from '../sizing/catalogue.ts'
import { repeated } from './repeated.ts'
import { readPage } from './working-page.ts'

const values: RunValues = {
  tag: 'T',
  shape: 'pipe',
  size: 'DN 80',
  lengthM: 12,
  mediumC: 170,
  airC: 20,
  material: 'stone_wool_pipe_section',
  thicknessM: 0.06,
}

function resolved(own: RunValues): Problem {
  const found = resolve(own, index)
  if (!found.ok) throw new Error(JSON.stringify(found.issues))
  return found.problem
}

function problemWith(conductivity: Conductivity): Problem {
  const problem = resolved(values)
  return {
    ...problem,
    layers: problem.layers.map((layer) => ({
      ...layer,
      material: { ...layer.material, conductivity },
    })),
  }
}

const mean = (pointsC: readonly number[], valuesWPerMK: readonly number[]): Conductivity => ({
  kind: 'curve',
  basis: 'mean',
  pointsC,
  valuesWPerMK,
})

function wrongLines(problem: Problem): readonly string[] {
  return readPage(writeWorkingText(workingOf(problem))).flatMap(
    (section) => repeated(section).wrong,
  )
}

describe('a curve that is read at the mean of the layer', () => {
  test.each([
    { where: 'within', pointsC: [0, 50, 100, 200], valuesWPerMK: [0.034, 0.038, 0.045, 0.062] },
    { where: 'below its end', pointsC: [120, 200], valuesWPerMK: [0.05, 0.062] },
    { where: 'above its end', pointsC: [-20, 40], valuesWPerMK: [0.032, 0.037] },
    { where: 'above an end that falls', pointsC: [-20, 40], valuesWPerMK: [0.04, 0.037] },
    { where: 'of one point', pointsC: [24], valuesWPerMK: [0.04] },
  ])('$where', ({ pointsC, valuesWPerMK }) => {
    const problem = problemWith(mean(pointsC, valuesWPerMK))
    expect(wrongLines(problem)).toEqual([])
    const text = writeWorkingText(workingOf(problem))
    expect(text).toContain('Mean temperature of layer 1')
  })
})

describe('a curve of the conductivity itself', () => {
  test.each([
    { where: 'below its end', pointsC: [120, 200], valuesWPerMK: [0.05, 0.062] },
    { where: 'above its end', pointsC: [-20, 40], valuesWPerMK: [0.032, 0.037] },
    { where: 'that falls', pointsC: [0, 300], valuesWPerMK: [0.06, 0.03] },
    { where: 'of one point', pointsC: [24], valuesWPerMK: [0.04] },
  ])('$where', ({ pointsC, valuesWPerMK }) => {
    const curve: Conductivity = { kind: 'curve', basis: 'point', pointsC, valuesWPerMK }
    expect(wrongLines(problemWith(curve))).toEqual([])
  })
})

test('a balance that falls on the jump of a film formula says so and still repeats', () => {
  // A roof steps between 0.54 Ra^(1/4) and 0.15 Ra^(1/3): one of these lands on the step.
  const { size: _size, lengthM: _lengthM, ...noPipe } = values
  const roof: RunValues = { ...noPipe, shape: 'flat', orientation: 'up', widthM: 0.8, heightM: 0.8 }
  const found = Array.from({ length: 400 }, (_, at) =>
    resolved({ ...roof, material: 'stone_wool_slab', mediumC: 40 + at }),
  ).find((problem) => {
    const system = systemOf(problem, settle(problem.layers, null), problem.conditions.loss)
    return solve(system).faces.some(({ closure }) => closure === 'on-jump')
  })
  if (!found) throw new Error('None lands on the step')
  expect(wrongLines(found)).toEqual([])
  expect(writeWorkingText(workingOf(found)).replace(/\s+/g, ' ')).toContain(
    'between the two sides of a jump',
  )
})
