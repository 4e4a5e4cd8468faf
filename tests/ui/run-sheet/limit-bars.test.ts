import { expect, test } from 'vitest'
import { limitBars } from '#ui/views/run-sheet/limit-bars.ts'
import { madeRung } from './rungs.ts'

/** Rungs of 20, 30, 40 … mm that pass or fail touch in this order. */
const ladder = (passes: readonly boolean[]) =>
  passes.map((pass, at) => madeRung((20 + 10 * at) / 1000, { passes: { touch: pass } }))

test('a limit starts at its exact end between the rung that fails and the one that passes', () => {
  const bars = limitBars(ladder([false, true, true]), [{ limit: 'touch', fromM: 0.0264 }])
  expect(bars).toEqual([{ limit: 'touch', stretches: [{ fromM: 0.0264, toM: null }] }])
})

test('without an exact end it starts at the first rung that passes', () => {
  expect(limitBars(ladder([false, false, true]), [])[0]?.stretches).toEqual([
    { fromM: 0.04, toM: null },
  ])
})

test('an exact end that lies elsewhere is not believed', () => {
  const bars = limitBars(ladder([false, true, true]), [{ limit: 'touch', fromM: 0.035 }])
  expect(bars[0]?.stretches).toEqual([{ fromM: 0.03, toM: null }])
})

test('below the thinnest rung the exact end still shows', () => {
  const bars = limitBars(ladder([true, true]), [{ limit: 'touch', fromM: 0.012 }])
  expect(bars[0]?.stretches).toEqual([{ fromM: 0.012, toM: null }])
})

test('what passes on every rung has no start', () => {
  expect(limitBars(ladder([true, true]), [])[0]?.stretches).toEqual([{ fromM: null, toM: null }])
})

test('what passes on no rung has no stretch', () => {
  expect(
    limitBars(ladder([false, false]), [{ limit: 'touch', fromM: null }])[0]?.stretches,
  ).toEqual([])
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
  const ends = [
    { limit: 'touch', fromM: 0.025 },
    { limit: 'touch', fromM: 0.034 },
  ] as const
  expect(limitBars(twice, ends)).toEqual([
    { limit: 'touch', stretches: [{ fromM: 0.034, toM: null }] },
  ])
})
