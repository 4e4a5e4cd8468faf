import { describe, expect, test } from 'vitest'
import type { LimitEnd } from '#sizing/result.ts'
import { limitBars } from '#ui/views/run-sheet/limit-bars.ts'
import { madeRung } from './rungs.ts'

/** Rungs of 20, 30, 40 … mm that pass or fail touch in this order. */
const ladder = (passes: readonly boolean[]) =>
  passes.map((pass, at) => madeRung((20 + 10 * at) / 1000, { passes: { touch: pass } }))

const touchEnd = (fromM: number | null): LimitEnd => ({ limit: 'touch', fromM, upToM: null })

test('a limit starts at its exact end between the rung that fails and the one that passes', () => {
  const bars = limitBars(ladder([false, true, true]), [touchEnd(0.0264)])
  expect(bars).toEqual([{ limit: 'touch', stretches: [{ fromM: 0.0264, toM: null }] }])
})

test('without an exact end it starts at the first rung that passes', () => {
  expect(limitBars(ladder([false, false, true]), [])[0]?.stretches).toEqual([
    { fromM: 0.04, toM: null },
  ])
})

test('an exact end that lies elsewhere is not believed', () => {
  const bars = limitBars(ladder([false, true, true]), [touchEnd(0.035)])
  expect(bars[0]?.stretches).toEqual([{ fromM: 0.03, toM: null }])
})

test('below the thinnest rung the exact end still shows', () => {
  const bars = limitBars(ladder([true, true]), [touchEnd(0.012)])
  expect(bars[0]?.stretches).toEqual([{ fromM: 0.012, toM: null }])
})

test('what passes on every rung has no start', () => {
  expect(limitBars(ladder([true, true]), [])[0]?.stretches).toEqual([{ fromM: null, toM: null }])
})

test('what passes on no rung has no stretch', () => {
  expect(limitBars(ladder([false, false]), [touchEnd(null)])[0]?.stretches).toEqual([])
})

test('passing thicknesses need not hang together', () => {
  expect(limitBars(ladder([true, false, true]), [])[0]?.stretches).toEqual([
    { fromM: null, toM: 0.02 },
    { fromM: 0.04, toM: null },
  ])
})

test('a limit judged twice passes only where both pass, and starts at the stricter end', () => {
  const twice = ladder([false, false, true]).map((rung, at) => ({
    ...rung,
    limits: [...rung.limits, ...madeRung(0, { passes: { touch: at > 0 } }).limits],
  }))
  const ends = [touchEnd(0.025), touchEnd(0.034)]
  expect(limitBars(twice, ends)).toEqual([
    { limit: 'touch', stretches: [{ fromM: 0.034, toM: null }] },
  ])
})

describe('the space ends what passes', () => {
  const inSpace = (passes: readonly boolean[]) =>
    passes.map((pass, at) => madeRung((20 + 10 * at) / 1000, { passes: { space: pass } }))
  const upTo = (upToM: number): LimitEnd => ({ limit: 'space', fromM: 0, upToM })

  test('at its exact end, between the rung that fits and the one that does not', () => {
    expect(limitBars(inSpace([true, true, false]), [upTo(0.0345)])).toEqual([
      { limit: 'space', stretches: [{ fromM: null, toM: 0.0345 }] },
    ])
  })

  test('at a rung that fits to the millimetre', () => {
    expect(limitBars(inSpace([true, true, false]), [upTo(0.03)])[0]?.stretches).toEqual([
      { fromM: null, toM: 0.03 },
    ])
  })

  test('beyond the thickest rung', () => {
    expect(limitBars(inSpace([true, true]), [upTo(0.08)])[0]?.stretches).toEqual([
      { fromM: null, toM: 0.08 },
    ])
  })

  test('nowhere where nothing fits', () => {
    expect(limitBars(inSpace([false, false]), [upTo(0)])[0]?.stretches).toEqual([])
  })
})
