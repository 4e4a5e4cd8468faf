/** The sentences of a reason where cost decides, and where no thickness passes, from facts made up by hand. */
import { describe, expect, test } from 'vitest'
import type { Rating } from '#sizing/result.ts'
import { limit, moneyOf, reason, rung } from './made-up.ts'

describe('cost decides', () => {
  const passing = (thicknessMm: number, lifeCycle: number): Rating =>
    rung(thicknessMm, [limit('loss', 30 - thicknessMm / 10, 40)], lifeCycle)
  const money = moneyOf({ lifeYears: 20 })
  const costs = (ladder: readonly Rating[], chosenMm: number, own = money): string =>
    reason('money', ladder, chosenMm, { money: own })

  test('the limits would have allowed a thinner one, by the narrowest of them, service apart', () => {
    const limits = [
      limit('service', 649, 650),
      limit('touch', 40, 57.3),
      limit('loss', 38, 40),
      limit('space', 0.1, 0.2, { unit: 'm' }),
    ]
    const ladder = [rung(30, limits, 200), rung(50, limits, 100)]
    expect(costs(ladder, 50)).toBe(
      'Cost decides. The limits would allow 30 mm (loss: 38.0 W/m against 40 W/m). 50 mm is the cheapest to own over 20 years; every other thickness that passes costs over 2 % more.',
    )
  })

  test('nothing is said of limits where the first that passes is chosen, or none is set', () => {
    expect(costs([passing(30, 100), passing(50, 200)], 30)).toBe(
      'Cost decides. 30 mm is the cheapest to own over 20 years; every other thickness that passes costs over 2 % more.',
    )
    expect(costs([rung(30, [], 200), rung(50, [], 100)], 50)).toBe(
      'Cost decides. 50 mm is the cheapest to own over 20 years; every other thickness that passes costs over 2 % more.',
    )
  })

  const nearTo = (others: readonly [number, number][]): string =>
    costs(
      [passing(20, 100), ...others.map(([thicknessMm, cost]) => passing(thicknessMm, cost))],
      20,
    ).replace('Cost decides. 20 mm is the cheapest to own over 20 years; ', '')

  test('up to 2 % dearer is near: one, two, or a range of them', () => {
    expect(nearTo([[30, 102]])).toBe('30 mm costs within 2 % of it.')
    expect(nearTo([[30, 102.1]])).toBe('every other thickness that passes costs over 2 % more.')
    expect(
      nearTo([
        [30, 101],
        [40, 102],
      ]),
    ).toBe('30 mm and 40 mm cost within 2 % of it.')
    expect(
      nearTo([
        [30, 101],
        [40, 101.5],
        [50, 102],
        [60, 103],
      ]),
    ).toBe('30 mm to 50 mm cost within 2 % of it.')
  })

  test('a range with a gap is counted', () => {
    expect(
      nearTo([
        [30, 101],
        [40, 110],
        [50, 101],
        [60, 102],
      ]),
    ).toBe('3 others from 30 mm to 60 mm cost within 2 % of it.')
  })

  test('neither what fails nor what has no price is near', () => {
    const ladder = [
      passing(20, 100),
      rung(30, [limit('loss', 50, 40)], 100),
      rung(40, [limit('loss', 30, 40)], null),
    ]
    expect(costs(ladder, 20)).toMatch(/; every other thickness that passes costs over 2 % more\.$/)
  })

  test('a life of a year is one year', () => {
    expect(costs([passing(20, 100)], 20, moneyOf({ lifeYears: 1 }))).toContain('over 1 year;')
  })
})

describe('no thickness passes', () => {
  test('none can be bought', () => {
    expect(reason('unmet', [], null)).toBe(
      'No thickness of this material can be bought for this size.',
    )
  })

  const ladder = [
    rung(50, [limit('loss', 14, 10), limit('touch', 40, 60)]),
    rung(100, [limit('loss', 12, 10), limit('touch', 35, 60)]),
  ]

  test('what the best comes to, and what it would take', () => {
    expect(
      reason('unmet', ladder, null, { unmet: [{ limit: 'loss', neededM: 0.4, because: null }] }),
    ).toBe(
      'No thickness passes every limit. Loss cannot be met: at best, 100 mm, it stands at 12.0 W/m against 10 W/m (heat flow per metre); it would take 400 mm, which is more than can be bought.',
    )
  })

  test('or why none would do', () => {
    const unmet = (because: string | null) =>
      reason('unmet', ladder, null, { unmet: [{ limit: 'loss', neededM: null, because }] })
    expect(unmet('the air is as hot itself')).toMatch(
      /\(heat flow per metre\), because the air is as hot itself\.$/,
    )
    expect(unmet(null)).toMatch(/, because no thickness would do\.$/)
  })

  test('service stands where it stands, whatever the thickness', () => {
    const hot = [rung(50, [limit('service', 700, 650, { what: 'wool' })])]
    expect(
      reason('unmet', hot, null, { unmet: [{ limit: 'service', neededM: null, because: 'so' }] }),
    ).toBe(
      'No thickness passes every limit. Service cannot be met: it stands at 700.0 °C against 650 °C (wool), because so.',
    )
  })

  test('limits that exclude each other: which needs most, and which allows least', () => {
    const exclusive = [
      rung(20, [limit('touch', 70, 60), limit('space', 0.1, 0.14, { unit: 'm' })]),
      rung(40, [limit('touch', 65, 60), limit('space', 0.14, 0.14, { unit: 'm' })]),
      rung(60, [limit('touch', 58, 60), limit('space', 0.18, 0.14, { unit: 'm' })]),
      rung(80, [limit('touch', 52, 60), limit('space', 0.22, 0.14, { unit: 'm' })]),
    ]
    expect(reason('unmet', exclusive, null)).toBe(
      'No thickness passes every limit. Touch needs 60 mm or more, space allows 40 mm at most.',
    )
  })
})
