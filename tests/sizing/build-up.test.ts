import { describe, expect, test } from 'vitest'
import { bare, rungsOf, settle, solverLayers } from '#sizing/build-up.ts'
import { installedCostOf } from '#sizing/cost.ts'
import type { MoneyTerms, Problem } from '#sizing/problem.ts'
import { problemOf } from '../model/resolve/problem.ts'
import { once } from '../once.ts'
import { sized, steamRun } from './catalogue.ts'

const { material: _material, ...without } = steamRun
const weighed = { fuel: 'natural_gas', hoursPerYear: 8000 }

describe('same material in two layers', () => {
  const twice = once(() =>
    problemOf({
      ...without,
      ...weighed,
      layers: 'stone_wool_pipe_section:40;stone_wool_pipe_section:50',
    }),
  )
  const single = once(() => problemOf({ ...steamRun, ...weighed, thicknessM: 0.09 }))

  test('is one conduction layer', () => {
    const [rung] = rungsOf(twice())
    expect(rung && solverLayers(rung)).toEqual([
      {
        thicknessM: expect.closeTo(0.09, 12),
        conductivity: single().layers[0]?.material.conductivity,
      },
    ])
    expect(rung?.piecesM).toEqual([0.04, 0.05])
  })

  test('priced by the layer factor, like the rung of 40 + 50 mm', () => {
    const cost = (problem: Problem): number | null => {
      const [rung] = rungsOf(problem)
      return rung ? installedCostOf(problem, rung, problem.money as MoneyTerms) : null
    }
    expect(cost(twice())).toBeCloseTo(cost(single()) ?? 0, 9)
  })

  test('fixed and sized of one material too', () => {
    const { ladder } = sized({
      ...without,
      layers: 'stone_wool_pipe_section:40;stone_wool_pipe_section:?',
    })
    expect(ladder[0]).toMatchObject({ thicknessM: 0.06, piecesM: [0.04, 0.02] })
    expect(ladder[0]?.interfaceTempsC).toHaveLength(2)
  })

  test('one name with two curves is two materials', () => {
    const [layer] = single().layers
    if (!layer) throw new Error('No layer')
    const other = { ...layer.material, conductivity: { ...layer.material.conductivity } }
    expect(settle([layer, { ...layer, material: other }], null).layers).toHaveLength(2)
  })

  test('different materials stay apart', () => {
    const [rung] = rungsOf(
      problemOf({ ...without, layers: 'calcium_silicate:40;stone_wool_pipe_section:40' }),
    )
    expect(rung && solverLayers(rung)).toHaveLength(2)
  })
})

describe('rungs', () => {
  test('one for each step, with the fixed layers in the total', () => {
    const problem = problemOf({
      ...without,
      layers: 'calcium_silicate:40;stone_wool_pipe_section:?',
    })
    const rungs = rungsOf(problem)
    expect(rungs).toHaveLength(problem.steps.length)
    expect(rungs[0]?.thicknessM).toBeCloseTo(0.06, 12)
    expect(rungs[0]?.piecesM).toEqual([0.04, 0.02])
  })

  test('one alone where every thickness is fixed, none of a bare run', () => {
    expect(rungsOf(problemOf({ ...steamRun, thicknessM: 0.05 }))).toHaveLength(1)
    expect(rungsOf(problemOf({ ...steamRun, thicknessM: 0 }))).toEqual([])
    expect(bare).toMatchObject({ layers: [], thicknessM: 0 })
  })

  test('the nominal thickness is that of the step', () => {
    const layers = problemOf(steamRun).layers
    const step = { thicknessM: 0.0269, nominalThicknessM: 0.0254, piecesM: [0.0269] }
    expect(settle(layers, step).nominalThicknessM).toBe(0.0254)
    expect(settle(layers, null).nominalThicknessM).toBeNull()
  })
})
