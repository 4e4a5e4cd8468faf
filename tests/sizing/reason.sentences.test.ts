/** The sentences of a reason from facts made up by hand: every number in them is one that was put in. */
import { describe, expect, test } from 'vitest'
import type { LimitResult, Rating } from '#sizing/result.ts'
import { against, siWords } from '#sizing/words.ts'
import { limit, moneyOf, reason, rung } from './made-up.ts'

describe('a limit decides', () => {
  const burn = { rule: 'below', what: 'surface, smooth metal touched for 5 s' } as const

  test('what the chosen rung gives, against what, and what the thinner one would', () => {
    const ladder = [
      rung(40, [limit('touch', 60.23, 57.27, burn)]),
      rung(50, [limit('touch', 55.06, 57.27, burn)]),
    ]
    expect(reason('touch', ladder, 50)).toBe(
      'Touch decides. 50 mm gives 55.1 °C against 57.3 °C (surface, smooth metal touched for 5 s); 40 mm would give 60.2 °C.',
    )
  })

  test('a stated temperature needs no surface to be named', () => {
    const ladder = [rung(40, [limit('touch', 60.2, 50)]), rung(50, [limit('touch', 48.1, 50)])]
    expect(reason('touch', ladder, 50)).toBe(
      'Touch decides. 50 mm gives 48.1 °C against 50 °C; 40 mm would give 60.2 °C.',
    )
  })

  test('a thinner one that reads like its bound just misses it', () => {
    const ladder = [rung(40, [limit('loss', 30.02, 30)]), rung(50, [limit('loss', 25, 30)])]
    expect(reason('loss', ladder, 50)).toBe(
      'Loss decides. 50 mm gives 25.0 W/m against 30 W/m; 40 mm would just miss it.',
    )
  })

  test('of two bounds it is the one that the thinner rung failed', () => {
    const ladder = [
      rung(40, [limit('touch', 52, 60), limit('touch', 52, 50)]),
      rung(50, [limit('touch', 48, 60), limit('touch', 48, 50)]),
    ]
    expect(reason('touch', ladder, 50)).toBe(
      'Touch decides. 50 mm gives 48.0 °C against 50 °C; 40 mm would give 52.0 °C.',
    )
  })

  test('without a thinner one it is the chosen rung alone', () => {
    expect(reason('loss', [rung(40, [limit('loss', 20, 30)])], 40)).toBe(
      'Loss decides. 40 mm gives 20.0 W/m against 30 W/m.',
    )
  })

  test('service names the place that failed', () => {
    const ladder = [
      rung(40, [limit('service', 664.4, 650, { what: 'stone wool, hottest side' })]),
      rung(50, [limit('service', 58, 60, { what: 'sheet, jacket' })]),
    ]
    expect(reason('service', ladder, 50)).toBe(
      'Service decides. 50 mm serves; at 40 mm stone wool, hottest side would stand at 664.4 °C against 650 °C.',
    )
  })

  test('a code that asks for a thickness is met by it', () => {
    const asked = { rule: 'at least', unit: 'm', what: 'thickness, Table 1' } as const
    const ladder = [
      rung(50, [limit('code', 0.05, 0.0512, { ...asked, pass: false })]),
      rung(60, [limit('code', 0.06, 0.0512, { ...asked, pass: true })]),
    ]
    expect(reason('code', ladder, 60)).toBe(
      'Code decides. 60 mm meets the 51.2 mm asked for; 50 mm does not.',
    )
  })

  const damp = (thicknessMm: number, value: number): Rating =>
    rung(thicknessMm, [limit('damp', value, 14, { rule: 'at least', pass: value >= 14 })])
  const both = [damp(40, 12), damp(50, 15)]

  test('what a matt finish would do is said where that is thinner', () => {
    const first = 'Damp decides. 50 mm gives 15.0 °C against 14 °C; 40 mm would give 12.0 °C.'
    expect(reason('damp', both, 50, { mattThicknessM: 0.04 })).toBe(
      `${first} Under a matt finish 40 mm would do.`,
    )
    expect(reason('damp', both, 50, { mattThicknessM: 0.05 })).toBe(first)
  })

  test('what cost alone would take is said where that is another thickness', () => {
    const cheap = (cheapestThicknessM: number | null) =>
      reason('damp', both, 50, { money: moneyOf({ cheapestThicknessM }) })
    expect(cheap(0.04)).toMatch(/12\.0 °C\. Cost alone would take 40 mm\.$/)
    expect(cheap(0.05)).toMatch(/12\.0 °C\.$/)
    expect(cheap(null)).toMatch(/12\.0 °C\.$/)
  })

  test('a rung of an inch series is said by its name, wherever it is spoken of', () => {
    const inch = [
      rung(38.9, [limit('loss', 31, 30)], null, 1.5),
      rung(51.2, [limit('loss', 29, 30)], null, 2),
    ]
    expect(reason('loss', inch, 51.2, { mattThicknessM: 0.0389 })).toBe(
      'Loss decides. 2 in (51.2 mm) gives 29.0 W/m against 30 W/m; 1.5 in (38.9 mm) would give 31.0 W/m. Under a matt finish 1.5 in (38.9 mm) would do.',
    )
  })
})

describe('other answers', () => {
  test('the thinnest that can be bought', () => {
    const ladder = [rung(20, [limit('loss', 25, 30), limit('touch', 30, 60)])]
    expect(reason('smallest', ladder, 20)).toBe(
      'The thinnest that can be bought passes. 20 mm gives 25.0 W/m against 30 W/m (loss).',
    )
    expect(reason('smallest', [rung(20, [])], 20)).toBe('The thinnest that can be bought passes.')
  })

  test('fixed: passing, rated without a limit, failing', () => {
    const at = (...limits: LimitResult[]) => reason('fixed', [rung(50, limits)], 50)
    expect(at(limit('loss', 25, 30), limit('touch', 30, 60))).toBe(
      'Fixed at 50 mm. It passes every limit; the narrowest is loss, 25.0 W/m against 30 W/m.',
    )
    expect(at()).toBe('Fixed at 50 mm. It is rated as given.')
    expect(at(limit('loss', 35, 30), limit('touch', 70, 60), limit('damp', 1, 2))).toBe(
      'Fixed at 50 mm. It fails loss: 35.0 W/m against 30 W/m (heat flow per metre). It fails touch: 70.0 °C against 60 °C (surface).',
    )
  })

  test('a limit that is failed more than once is named once, a value they share too', () => {
    const at = (...limits: LimitResult[]) => reason('fixed', [rung(50, limits)], 50)
    const burn = { rule: 'below', what: 'surface, smooth metal touched for 8 h' } as const
    expect(at(limit('touch', 84.8, 41.9), limit('touch', 84.8, 43, burn))).toBe(
      'Fixed at 50 mm. It fails touch twice: 84.8 °C against 41.9 °C (as given) and 43 °C (burn, smooth metal touched for 8 h).',
    )
    const top = { ...burn, what: 'surface, top, smooth metal touched for 8 h' }
    expect(
      at(limit('touch', 84.8, 41.9, { what: 'surface, top' }), limit('touch', 84.8, 43, top)),
    ).toBe(
      'Fixed at 50 mm. It fails touch twice: 84.8 °C against 41.9 °C (as given, top) and 43 °C (burn, top, smooth metal touched for 8 h).',
    )
    const flux = { unit: 'W/m²', what: 'heat flux' } as const
    const code = limit('loss', 40, 20, { what: 'by the code' })
    expect(at(limit('loss', 35, 30), limit('loss', 90, 80, flux), code)).toBe(
      'Fixed at 50 mm. It fails loss 3 times: 35.0 W/m against 30 W/m (heat flow per metre), 90.0 W/m² against 80 W/m² (heat flux) and 40.0 W/m against 20 W/m (by the code).',
    )
  })

  describe('the burn threshold of what burns nobody even bare', () => {
    const burn = { rule: 'below', what: 'surface, smooth metal touched for 5 s' } as const
    const cold = limit('touch', 9.1, 57.3, burn)
    const hot: Rating = { ...rung(0, []), touchSurfaceC: 43 }

    test('is not what stands narrowest', () => {
      const near = limit('loss', 1, 30)
      expect(reason('fixed', [rung(50, [cold, near])], 50)).toContain('the narrowest is loss')
      expect(reason('fixed', [rung(50, [cold])], 50)).toBe('Fixed at 50 mm. It is rated as given.')
      expect(reason('smallest', [rung(50, [cold])], 50)).toBe(
        'The thinnest that can be bought passes.',
      )
    })

    test('but is where the bare run would burn, or a limit is stated', () => {
      expect(reason('fixed', [rung(50, [cold])], 50, { bare: hot })).toContain('narrowest is touch')
      expect(reason('fixed', [rung(50, [limit('touch', 9.1, 57.3)])], 50)).toContain(
        'narrowest is touch',
      )
      const warm = limit('touch', 43, 57.3, burn)
      expect(reason('fixed', [rung(50, [warm])], 50)).toContain('narrowest is touch')
    })
  })

  test('bare: within its limits, without any, failing', () => {
    expect(reason('bare', [], 0, { limits: [limit('loss', 25, 30)] })).toBe(
      'Bare. The surface is at 41.3 °C; every limit is met.',
    )
    expect(reason('bare', [], 0)).toBe('Bare. The surface is at 41.3 °C; no limit is set for it.')
    const failing = rung(0, [limit('loss', 35, 30)])
    expect(reason('bare', [], 0, { chosen: failing })).toBe(
      'Bare. It fails loss: 35.0 W/m against 30 W/m (heat flow per metre).',
    )
  })
})

describe('numbers', () => {
  test('metres are said in millimetres, kilograms a second in kilograms an hour', () => {
    expect(siWords.quantity(0.0512, 'm', 1)).toBe('51.2 mm')
    expect(siWords.quantity(0.01, 'kg/s', 1)).toBe('36.0 kg/h')
    expect(siWords.quantity(12, 'h', 0)).toBe('12 h')
    expect(siWords.quantity(-7, '°C', 0)).toBe('−7 °C')
    expect(siWords.quantity(-0, '°C', 0)).toBe('0 °C')
  })

  test('a thickness has a tenth where it needs one, and its name in an inch series', () => {
    expect(siWords.thickness(0.05, null)).toBe('50 mm')
    expect(siWords.thickness(0.0389, 0.0381)).toBe('1.5 in (38.9 mm)')
  })

  test('a value has as many digits as tell it from its bound, six at most; a whole bound none', () => {
    const words = (value: number, bound: number) => against(limit('loss', value, bound), siWords)
    expect(words(29.5, 30)).toBe('29.5 W/m against 30 W/m')
    expect(words(29.96, 30)).toBe('29.96 W/m against 30 W/m')
    expect(words(29.9999, 30)).toBe('29.9999 W/m against 30 W/m')
    expect(words(30, 30)).toBe('30.000000 W/m against 30 W/m')
    expect(words(29.5, 30.25)).toBe('29.5 W/m against 30.3 W/m')
    // Three figures of what is small, but for temperatures and millimetres.
    expect(words(2.9512, 3)).toBe('2.95 W/m against 3 W/m')
    expect(words(0.04512, 0.3)).toBe('0.0451 W/m against 0.300 W/m')
    expect(words(0, 3)).toBe('0.0 W/m against 3 W/m')
    expect(words(0.000000123, 3)).toBe('0.000000 W/m against 3 W/m')
    const code = { unit: 'm²K/W', rule: 'at least' } as const
    expect(against(limit('code', 1.312, 1.0567, code), siWords)).toBe(
      '1.31 m²K/W against 1.06 m²K/W',
    )
    const condensed = limit('arrival', 0.000002, 0.01, { unit: 'kg/s' })
    expect(against(condensed, siWords)).toBe('0.00720 kg/h against 36 kg/h')
    expect(against(limit('touch', 4.04, 57.27), siWords)).toBe('4.0 °C against 57.3 °C')
    expect(words(30.23, 30.24)).toBe('30.23 W/m against 30.24 W/m')
    expect(against(limit('space', 0.139, 0.14, { unit: 'm' }), siWords)).toBe(
      '139.0 mm against 140 mm',
    )
  })
})
