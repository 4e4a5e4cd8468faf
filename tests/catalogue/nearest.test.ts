import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { bareName, closeNames, neighbours } from '#catalogue/nearest.ts'

describe('bareName', () => {
  test('case, spaces and joining marks do not count', () => {
    expect(bareName(' Stone_wool - Slab (HD) ')).toBe('stonewoolslabhd')
  })
})

describe('closeNames', () => {
  test('the closest stands first', () => {
    expect(closeNames('corkk', ['cotton', 'cork', 'fork'])).toEqual(['cork', 'fork'])
  })
  test('nothing is close to nothing', () => {
    expect(closeNames('', ['cork'])).toEqual([])
    expect(closeNames('zzzzz', ['cork'])).toEqual([])
  })
  test('a name is always close to itself', () => {
    fc.assert(
      fc.property(fc.stringMatching(/^[a-z]{1,20}$/), (name) => {
        expect(closeNames(name, ['other', name])[0]).toBe(name)
      }),
    )
  })
})

describe('neighbours', () => {
  test.each([
    { value: 55, near: [50, 65] },
    { value: 5, near: [6] },
    { value: 700, near: [65] },
    { value: 50, near: [50, 65] },
  ])('of $value', ({ value, near }) => {
    expect(neighbours(value, [6, 50, 65])).toEqual(near)
  })
})
