import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import type { LimitResult } from '#sizing/result.ts'
import { walkedTo } from '#ui/views/run-sheet/ladder-walk.ts'
import { needsLook } from '#ui/views/run-sheet/notes.ts'
import { thicknessOverride } from '#ui/views/run-sheet/override.ts'
import {
  boundWords,
  buildUpWords,
  extentWords,
  mediumWord,
  paybackWords,
  piecesWords,
  splitReason,
  wholeDegrees,
} from '#ui/views/run-sheet/words.ts'
import { madeRung } from './rungs.ts'

const limit = (change: Partial<LimitResult>): LimitResult => ({
  limit: 'touch',
  pass: true,
  value: 50,
  rule: 'at most',
  bound: 58,
  unit: '°C',
  condition: 'touch',
  what: 'surface',
  ...change,
})

describe('bounds', () => {
  test.each<[Partial<LimitResult>, string]>([
    [{}, 'at most 58\u00a0°C'],
    [{ rule: 'below', bound: 57.3 }, 'below 57.3\u00a0°C'],
    [{ limit: 'damp', rule: 'at least', bound: 20 }, 'at least 20\u00a0°C'],
    [{ limit: 'service', rule: 'at least', bound: -50 }, 'at least \u221250\u00a0°C'],
    [{ bound: 57.6 }, 'at most 57.6\u00a0°C'],
    [{ limit: 'loss', unit: 'W/m', bound: 22 }, 'at most 22.0\u00a0W/m'],
    [{ limit: 'frost', rule: 'at least', unit: 'h', bound: 12 }, 'at least 12\u00a0h'],
    [{ limit: 'space', unit: 'm', bound: 0.25 }, 'at most 250\u00a0mm'],
    [{ limit: 'space', unit: 'm', bound: 0.2605 }, 'at most 260.5\u00a0mm'],
    [{ limit: 'arrival', unit: 'K', bound: 1.5 }, 'at most 1.5\u00a0K'],
    [{ limit: 'arrival', unit: 'kg/s', bound: 0.01 }, 'at most 36.0\u00a0kg/h'],
    [{ limit: 'code', rule: 'at least', unit: 'm²K/W', bound: 0.6 }, 'at least 0.600\u00a0m²K/W'],
  ])('%o reads %s', (change, words) => {
    expect(boundWords(limit(change), 'si')).toBe(words)
  })
})

// 0.25 m = 9.843 in (1 in = 0.0254 m exactly); 1 m²K/W = 5.678 263 h·ft²·°F/Btu (NIST SP 811, B.8).
test.each<[Partial<LimitResult>, string]>([
  [{ limit: 'space', unit: 'm', bound: 0.25 }, 'at most 9.843\u00a0in'],
  [{ limit: 'code', rule: 'at least', unit: 'm²K/W', bound: 1 }, 'at least 5.68\u00a0h·ft²°F/Btu'],
])('%o reads %s in US units', (change, words) => {
  expect(boundWords(limit(change), 'us')).toBe(words)
})

describe('how much of a run there is', () => {
  test.each<[RunValues, string]>([
    [{ shape: 'pipe', lengthM: 24 }, '24.0\u00a0m'],
    [{ shape: 'pipe', lengthM: 60, buryDepthM: 0.8 }, '60.0\u00a0m, 0.80\u00a0m deep'],
    [{ shape: 'flat', areaM2: 12 }, '12.0\u00a0m²'],
    [{ shape: 'sphere', outerDiameterM: 2 }, 'sphere'],
    [{ shape: 'vessel', lengthM: 2.5 }, 'vessel, shell 2.5\u00a0m'],
    [{ shape: 'pipe' }, ''],
  ])('%o', (values, words) => {
    expect(extentWords(values, 'si')).toBe(words)
  })
})

describe('the reason', () => {
  test.each([
    ['Cost decides. 50 mm is cheapest.', 'Cost decides.', ' 50 mm is cheapest.'],
    ['Fixed at 40 mm. It passes.', 'Fixed at 40 mm.', ' It passes.'],
    ['Fixed at 38.8 mm. It passes.', 'Fixed at 38.8 mm.', ' It passes.'],
    ['No full stop', 'No full stop', ''],
  ])('%s', (reason, lead, rest) => {
    expect(splitReason(reason)).toEqual([lead, rest])
  })
})

test.each([
  [0.35, '4 months'],
  [0.01, '1 month'],
  [1.99, '24 months'],
  [4.21, '4.2 years'],
  [null, 'never'],
])('paying back in %s years is said as %s', (paybackYears, words) => {
  expect(paybackWords(paybackYears)).toBe(words)
})

test('the build-up is named, by its ids where no catalogue is at hand', () => {
  const values = { material: 'stone_wool_pipe_section', finish: 'al_plain' }
  expect(buildUpWords(values, null)).toBe('stone wool pipe section; al plain')
  expect(buildUpWords({ layers: 'calcium_silicate:40;stone_wool_slab:?' }, null)).toBe(
    'calcium silicate, stone wool slab',
  )
})

test('layers and the name of an inch series are said', () => {
  expect(piecesWords(madeRung(0.05), 'si')).toBe('')
  const change = { piecesM: [0.03875, 0.03875], nominalThicknessM: 0.0762 }
  expect(piecesWords(madeRung(0.0775, { change }), 'si')).toBe(
    '2 layers: 38.8\u00a0mm + 38.8\u00a0mm; sold as 3\u00a0in',
  )
})

test('the medium is named with its pressure', () => {
  expect(mediumWord({ medium: 'steam', pressureGaugePa: 7e5 }, 'si')).toBe('steam 7 bar g')
  expect(mediumWord({ medium: 'water' }, 'si')).toBe('water')
  expect(mediumWord({ medium: 'other' }, 'si')).toBe('')
})

test('a temperature somebody chose has no needless nought', () => {
  expect(wholeDegrees(170, 'si')).toBe(0)
  expect(wholeDegrees(170.5, 'si')).toBe(1)
  expect(wholeDegrees(85, 'us')).toBe(0)
})

describe('walking', () => {
  const place = { shown: 2, chosen: 2, count: 5 }
  test.each([
    ['ArrowRight', 3],
    ['ArrowUp', 3],
    ['ArrowLeft', 1],
    ['ArrowDown', 1],
    ['Home', 0],
    ['End', 4],
    ['Escape', null],
    ['a', undefined],
  ])('%s leads to %s', (key, index) => {
    expect(walkedTo(key, place)).toBe(index)
  })

  test('stops at both ends and on an empty ladder', () => {
    expect(walkedTo('ArrowRight', { ...place, shown: 4 })).toBe(4)
    expect(walkedTo('ArrowLeft', { ...place, shown: 0 })).toBe(0)
    expect(walkedTo('ArrowLeft', { shown: null, chosen: null, count: 0 })).toBeUndefined()
  })
})

test('a fixed thickness is the run’s own, or that of the sized layer', () => {
  expect(thicknessOverride({}, 0.05)).toEqual({ key: 'thicknessM', value: 0.05 })
  expect(thicknessOverride({ layers: 'calcium_silicate:40; stone_wool:?' }, 0.115)).toEqual({
    key: 'layers',
    value: 'calcium_silicate:40;stone_wool:75',
  })
})

test('ranges left need a look, assumptions do not', () => {
  expect(needsLook({ code: 'film-range', text: '' })).toBe(true)
  expect(needsLook({ code: 'touch-air', text: '' })).toBe(false)
})
