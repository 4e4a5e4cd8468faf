import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import type { Figure } from '#catalogue/figure.ts'
import {
  endDiscAreaM2,
  fittingAreaM2,
  laggedLengthM,
  supportFraction,
  usualFittings,
} from '#catalogue/fittings.ts'
import { published } from '../published.ts'
import { shippedCatalogue } from './shipped-catalogue.ts'

const catalogue = shippedCatalogue()

function value(figure: Figure): number {
  if (!figure.ok) throw new Error(figure.reason)
  return figure.value
}
const assumption = (figure: Figure) => (figure.ok ? figure.assumption : figure.reason)
const item = fc.constantFrom('flange-pair' as const, 'valve' as const)

describe('the surface of a bare fitting', () => {
  const flanges =
    'computed from ASME B16.5 dimensions in the Hydraulic Institute engineering data book'
  published<{ item: 'flange-pair' | 'valve'; outerMm: number; class?: number }>(
    (given) => value(fittingAreaM2(catalogue, given.item, given.outerMm / 1000, given.class)),
    [
      { from: flanges, given: { item: 'flange-pair', outerMm: 60.3 }, printed: '0.0646' },
      { from: flanges, given: { item: 'flange-pair', outerMm: 168.3 }, printed: '0.1816' },
      { from: flanges, given: { item: 'flange-pair', outerMm: 610 }, printed: '1.0235' },
      {
        from: flanges,
        given: { item: 'flange-pair', outerMm: 114.3, class: 300 },
        printed: '0.1643',
      },
      {
        from: 'ASTM C1129 style gate valve surface areas, from memory',
        given: { item: 'valve', outerMm: 114.3 },
        printed: '0.435',
      },
      {
        from: 'ASTM C1129 style gate valve surface areas, from memory',
        given: { item: 'valve', outerMm: 323.8, class: 300 },
        printed: '2.239',
      },
    ],
  )

  test('is linear between the pipes of the table, and nothing is assumed there', () => {
    const middle = fittingAreaM2(catalogue, 'flange-pair', (0.0603 + 0.073) / 2)
    expect(value(middle)).toBeCloseTo((0.0646 + 0.0864) / 2, 12)
    expect(assumption(middle)).toBeNull()
  })

  test('goes with the square of the diameter beyond the table, and says so', () => {
    const small = fittingAreaM2(catalogue, 'valve', 0.0402)
    expect(value(small)).toBeCloseTo((0.205 * 4) / 9, 9)
    expect(assumption(small)).toBe(
      'The area of a valve is tabled for pipes of 60.3 to 323.8 mm; for 40.2 mm it is scaled with the square of the diameter.',
    )
    expect(value(fittingAreaM2(catalogue, 'valve', 0.6476))).toBeCloseTo(1.496 * 4, 9)
  })

  test('of a pressure class that is not held is not known', () => {
    expect(fittingAreaM2(catalogue, 'valve', 0.1, 600)).toEqual({
      ok: false,
      reason: 'The catalogue holds no area of a valve in class 600, only in class 150 and 300.',
    })
  })

  test('is positive and grows with the pipe, without jumps', () => {
    fc.assert(
      fc.property(item, fc.double({ min: 0.003, max: 3, noNaN: true }), (kind, outerM) => {
        const area = value(fittingAreaM2(catalogue, kind, outerM))
        const next = value(fittingAreaM2(catalogue, kind, outerM + 1e-6))
        expect(area).toBeGreaterThan(0)
        expect(next).toBeGreaterThan(area)
        expect(next - area).toBeLessThan(1e-4)
      }),
    )
  })
})

describe('the length of a lagged fitting', () => {
  const guideline = 'ISO 12241 annex A / VDI 2055, from memory'
  published<{ item: 'flange-pair' | 'valve'; outerMm: number; mediumC: number }>(
    (given) => value(laggedLengthM(catalogue, given.item, given.outerMm / 1000, given.mediumC)),
    [
      {
        from: guideline,
        given: { item: 'valve', outerMm: 60.3, mediumC: 100 },
        printed: '4.5',
      },
      {
        from: guideline,
        given: { item: 'valve', outerMm: 219.1, mediumC: 400 },
        printed: '8.5',
      },
      {
        from: guideline,
        given: { item: 'flange-pair', outerMm: 114.3, mediumC: 400 },
        printed: '1.1',
      },
      {
        from: guideline,
        given: { item: 'flange-pair', outerMm: 508, mediumC: 100 },
        printed: '1.2',
      },
    ],
  )

  test('is linear in temperature and diameter', () => {
    const middle = laggedLengthM(catalogue, 'valve', (0.0603 + 0.1143) / 2, 250)
    expect(value(middle)).toBeCloseTo((4.5 + 5.5 + 4.5 + 6.5) / 4, 12)
    expect(assumption(middle)).toBeNull()
  })

  test('keeps to the end of the table beyond it, and says so', () => {
    const cold = laggedLengthM(catalogue, 'valve', 0.0213, 6)
    expect(value(cold)).toBe(4.5)
    expect(assumption(cold)).toBe(
      'The length for a lagged valve is taken at 60.3 mm instead of 21.3 mm and at 100 °C instead of 6 °C, where its table ends.',
    )
    expect(value(laggedLengthM(catalogue, 'valve', 1, 500))).toBe(12.5)
  })

  test('stays within the table whatever is asked', () => {
    fc.assert(
      fc.property(
        item,
        fc.double({ min: 0.003, max: 3, noNaN: true }),
        fc.double({ min: -270, max: 1500, noNaN: true }),
        (kind, outerM, mediumC) => {
          const length = value(laggedLengthM(catalogue, kind, outerM, mediumC))
          expect(length).toBeGreaterThanOrEqual(kind === 'valve' ? 4.5 : 0.85)
          expect(length).toBeLessThanOrEqual(kind === 'valve' ? 12.5 : 1.35)
        },
      ),
    )
  })

  test('does not come from the bare rows', () => {
    const bare = catalogue.fittingLengths.filter(({ lagged }) => !lagged)
    expect(bare).toHaveLength(56)
    const without = { ...catalogue, fittingLengths: bare }
    expect(laggedLengthM(without, 'valve', 0.1, 100)).toEqual({
      ok: false,
      reason: 'The catalogue holds no length for a lagged valve.',
    })
  })
})

test('supports add their share by place', () => {
  expect(supportFraction(catalogue, 'indoors')).toBe(0.15)
  expect(supportFraction(catalogue, 'outdoors')).toBe(0.25)
  expect(supportFraction({ ...catalogue, supportAllowances: [] }, 'outdoors')).toBe(0)
})

test('what has no table is marked as practice without a source', () => {
  expect(usualFittings.map(({ item, countsAs }) => `${item}: ${countsAs}`)).toEqual([
    'bend: pipe',
    'tee: pipe',
    'reducer: pipe',
    'strainer: valve',
    'end: end disc',
  ])
  expect(usualFittings.every(({ source }) => source === 'common practice, no source')).toBe(true)
})

test('an end is a disc', () => {
  expect(endDiscAreaM2(2)).toBeCloseTo(Math.PI, 12)
})
