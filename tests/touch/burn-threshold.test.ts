/**
 * Burn thresholds: lower curve of ISO 13732-1. Values at 0.5 s, 1 s, 1 min, 10 min and 8 h are public quotations of
 * EN 563 / EN ISO 13732-1; 4 s and 10 s are readings of its figures, from memory.
 */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import type { BurnThreshold } from '#catalogue/types.ts'
import { burnThreshold, type TouchedSurface } from '#touch/burn-threshold.ts'
import { catalogue } from '../sizing/catalogue.ts'

const table = catalogue.burnThresholds
const metal: TouchedSurface = { touchClass: 'smooth-metal', coating: null, coatingThicknessM: null }
const plastic: TouchedSurface = { ...metal, touchClass: 'plastic' }
const ceramic: TouchedSurface = { ...metal, touchClass: 'ceramic-glass-stone' }
const wood: TouchedSurface = { ...metal, touchClass: 'wood' }
const coated = (coating: string | null, coatingUm: number | null): TouchedSurface => ({
  touchClass: 'coated-metal',
  coating,
  coatingThicknessM: coatingUm === null ? null : coatingUm / 1e6,
})

describe('the lower curve', () => {
  test.each<[string, TouchedSurface, number, number]>([
    ['metal, quickest', metal, 0.5, 67],
    ['metal', metal, 1, 65],
    ['metal', metal, 4, 58],
    ['metal', metal, 10, 55],
    ['metal', metal, 60, 51],
    ['metal', metal, 600, 48],
    ['metal', metal, 28800, 43],
    ['plastic', plastic, 0.5, 91],
    ['plastic', plastic, 1, 85],
    ['plastic', plastic, 60, 60],
    ['plastic', plastic, 600, 48],
    ['ceramic', ceramic, 1, 80],
    ['ceramic', ceramic, 60, 56],
    ['wood', wood, 1, 110],
    ['wood', wood, 60, 60],
    ['wood', wood, 28800, 43],
  ])('%s', (_name, surface, contactS, thresholdC) => {
    expect(burnThreshold(table, surface, contactS)).toMatchObject({ thresholdC, because: null })
  })

  test('straight in the logarithm of time between the columns', () => {
    // Half way from 1 min to 10 min on the logarithm: √10 min; 51 and 48 °C.
    expect(burnThreshold(table, metal, 60 * Math.sqrt(10))?.thresholdC).toBeCloseTo(49.5, 9)
    // 5 s between 58 °C at 4 s and 55 °C at 10 s: 58 − 3·lg(5/4)/lg(10/4).
    expect(burnThreshold(table, metal, 5)?.thresholdC).toBeCloseTo(
      58 - (3 * Math.log10(1.25)) / Math.log10(2.5),
      9,
    )
  })

  test('above eight hours the eight-hour value', () => {
    for (const surface of [metal, plastic, ceramic, wood])
      expect(burnThreshold(table, surface, 30 * 86400)?.thresholdC).toBe(43)
  })

  test('never rises with contact time', () => {
    const surfaces = [metal, plastic, ceramic, coated('lacquer', 50), coated('powder', 90)]
    fc.assert(
      fc.property(
        fc.constantFrom(...surfaces),
        fc.double({ min: 0.5, max: 40000, noNaN: true }),
        fc.double({ min: 1, max: 10, noNaN: true }),
        (surface, contactS, times) => {
          const sooner = burnThreshold(table, surface, contactS)?.thresholdC ?? 0
          const later = burnThreshold(table, surface, contactS * times)?.thresholdC ?? 0
          expect(later).toBeLessThanOrEqual(sooner + 1e-9)
        },
      ),
      { seed: 7, numRuns: 400 },
    )
  })

  test('metal is the strictest of all, at any time', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(plastic, ceramic, wood, coated('lacquer', 100), coated('enamel', 160)),
        fc.double({ min: 0.5, max: 40000, noNaN: true }),
        (surface, contactS) => {
          expect(burnThreshold(table, surface, contactS)?.thresholdC).toBeGreaterThanOrEqual(
            (burnThreshold(table, metal, contactS)?.thresholdC ?? 0) - 1e-9,
          )
        },
      ),
      { seed: 8, numRuns: 400 },
    )
  })
})

describe('a cell of low confidence never passes a surface', () => {
  test.each([2, 4, 5, 10, 30])('wood at %d s is judged as plastic, and says why', (contactS) => {
    const found = burnThreshold(table, wood, contactS)
    expect(found).toMatchObject({
      surface: 'plastic',
      thresholdC: burnThreshold(table, plastic, contactS)?.thresholdC,
    })
    expect(found?.because).toContain('wood')
  })

  test.each([2, 4, 5, 10, 30])('lacquered metal at %d s is judged as bare metal', (contactS) => {
    expect(burnThreshold(table, coated('lacquer', 50), contactS)).toMatchObject({
      surface: 'smooth-metal',
      thresholdC: burnThreshold(table, metal, contactS)?.thresholdC,
    })
  })

  test('the confirmed cells of the same rows do', () => {
    expect(burnThreshold(table, coated('lacquer', 50), 0.5)?.thresholdC).toBe(80)
    expect(burnThreshold(table, coated('lacquer', 50), 1)?.thresholdC).toBe(73)
    expect(burnThreshold(table, wood, 0.7)?.surface).toBe('wood')
  })

  test('through two unconfirmed rows to the first confirmed one', () => {
    const doubtful = table.map((cell) =>
      cell.surface === 'plastic' ? { ...cell, grade: 'L' as const } : cell,
    )
    expect(burnThreshold(doubtful, wood, 5)?.surface).toBe('ceramic-glass-stone')
  })

  test('where nothing is confirmed, the strictest row all the same', () => {
    const none: BurnThreshold[] = table.map((cell) => ({ ...cell, grade: 'L' }))
    expect(burnThreshold(none, wood, 5)?.surface).toBe('smooth-metal')
  })
})

describe('a coating', () => {
  test('the thickest row that is not thicker than itself', () => {
    expect(burnThreshold(table, coated('lacquer', 120), 0.5)?.surface).toBe('lacquer-100')
    expect(burnThreshold(table, coated('lacquer', 100), 0.5)?.surface).toBe('lacquer-100')
    expect(burnThreshold(table, coated('powder', 80), 0.5)?.surface).toBe('powder-60')
  })

  test.each([
    ['unknown', null, null],
    ['of unknown thickness', 'lacquer', null],
    ['too thin', 'lacquer', 25],
    ['of a kind without a row', 'tar', 500],
    ['with marks of a pattern in its name', 'lacquer (2', 100],
  ])('%s gives no relief', (_name, coating, coatingUm) => {
    const found = burnThreshold(table, coated(coating, coatingUm), 0.5)
    expect(found).toMatchObject({ surface: 'smooth-metal', thresholdC: 67 })
    expect(found?.because).not.toBeNull()
  })

  // ISO 13732-1: from one minute on, a coat makes no difference.
  test('makes no difference from one minute on', () => {
    for (const contactS of [60, 600, 28800])
      expect(burnThreshold(table, coated('powder', 90), contactS)?.thresholdC).toBe(
        burnThreshold(table, metal, contactS)?.thresholdC,
      )
  })
})

test('without a table, null', () => {
  expect(burnThreshold([], metal, 5)).toBeNull()
})
