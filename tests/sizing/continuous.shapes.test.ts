/** From a wanted surface temperature to the thickness, for every shape; and what cannot be reached. */
import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import { limitEnds } from '#sizing/continuous.ts'
import { problemOf } from '../model/resolve/problem.ts'
import { sized } from './catalogue.ts'

const hot: RunValues = {
  tag: 'A',
  mediumC: 300,
  airC: 25,
  conductivityWPerMK: 0.06,
  emissivity: 0.8,
  maxSurfaceC: 48,
  reach: false,
  reachReason: 'judged by the stated surface only',
}

const shapes: readonly (readonly [string, RunValues])[] = [
  ['a lying pipe', { shape: 'pipe', size: 'DN 100' }],
  ['a standing pipe', { shape: 'pipe', size: 'DN 100', orientation: 'vertical', riseM: 4 }],
  ['a sloping pipe', { shape: 'pipe', size: 'DN 100', orientation: 'inclined', riseM: 4 }],
  ['a round duct', { shape: 'round-duct', size: 'D 250' }],
  ['a rectangular duct', { shape: 'rect-duct', size: '600 x 400' }],
  [
    'a standing rectangular duct',
    { shape: 'rect-duct', size: '600 x 400', orientation: 'vertical', riseM: 5 },
  ],
  ['a wall', { shape: 'flat', heightM: 2 }],
  ['a floor seen from below', { shape: 'flat', orientation: 'down', widthM: 1, heightM: 2 }],
  ['a lid', { shape: 'flat', orientation: 'up', widthM: 1, heightM: 2 }],
  ['a sphere', { shape: 'sphere', outerDiameterM: 1.5 }],
  ['a vessel', { shape: 'vessel', outerDiameterM: 1.2, lengthM: 3 }],
  [
    'a standing vessel with flat heads',
    { shape: 'vessel', outerDiameterM: 1.2, lengthM: 3, orientation: 'vertical', heads: 'flat' },
  ],
]

const touchEndM = (values: RunValues): number | null | undefined =>
  limitEnds(problemOf(values)).find(({ limit }) => limit === 'touch')?.fromM

describe('the thickness for a wanted surface', () => {
  test.each(shapes)('of %s: its hottest face is just there', (_, shape) => {
    const values = { ...hot, ...shape }
    const fromM = touchEndM(values) ?? Number.NaN
    expect(fromM).toBeGreaterThan(0)
    const { chosen } = sized({ ...values, thicknessM: fromM })
    expect(Math.abs((chosen?.touchSurfaceC ?? Number.NaN) - 48)).toBeLessThan(1e-3)
  })

  test.each(shapes)('of %s: more for a cooler one', (_, shape) => {
    const at = (maxSurfaceC: number) => touchEndM({ ...hot, ...shape, maxSurfaceC }) ?? Number.NaN
    expect(at(40)).toBeGreaterThan(at(48))
    expect(at(48)).toBeGreaterThan(at(60))
  })

  test('of a flat wall: d = λ(θ_i − θ_s)/q, with q of the surface', () => {
    const values = { ...hot, shape: 'flat', heightM: 2 } as const
    const fromM = touchEndM(values) ?? Number.NaN
    const flux = sized({ ...values, thicknessM: fromM }).chosen?.heatFluxWPerM2 ?? Number.NaN
    expect(fromM).toBeCloseTo((0.06 * (300 - 48)) / flux, 5)
  })
})

describe('a surface that cannot be reached', () => {
  test.each(shapes)('of %s: no thickness, said as such', (_, shape) => {
    const values = { ...hot, ...shape, maxSurfaceC: 25 }
    expect(touchEndM(values)).toBeNull()
    const result = sized(values)
    expect(result).toMatchObject({ chosen: null, governing: 'unmet' })
    expect(result.reason).toMatch(/No thickness passes every limit.*touch.* against 25 °C/i)
  })
})
