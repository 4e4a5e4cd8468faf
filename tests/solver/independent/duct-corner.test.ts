/** The corner of a rectangular duct in two dimensions: what its shape factor is, and how far the usual forms are from it. */
import { describe, expect, test } from 'vitest'
import { notesOf } from '#solver/notes.ts'
import { solve } from '#solver/solve.ts'
import type { System } from '#solver/types.ts'
import { constant, plainFilm, still } from '../systems.ts'
import {
  cornerShapeFactor,
  type DuctSection,
  ductConductance,
  quarterConductance,
} from './duct-corner.ts'

const section = (
  widthM: number,
  heightM: number,
  thicknessM: number,
  outerFilmWPerM2K: number | null = null,
): DuctSection => ({ widthM, heightM, thicknessM, conductivityWPerMK: 0.04, outerFilmWPerM2K })

const long = section(2, 1.5, 0.05)

describe('the two-dimensional solve', () => {
  /**
   * Mapped conformally to a straight strip, a corner between long arms is 1 − (2/π)·ln 2 squares long. From memory, as
   * the corner of a thin-film resistor; the quarter between inside and outside is the same four-sided figure.
   */
  const CONFORMAL = 1 - (2 * Math.LN2) / Math.PI

  test('finds the corner of the conformal map, 0.5587, to 1e-5 of it', () => {
    expect(Math.abs(cornerShapeFactor(long, 12) - CONFORMAL)).toBeLessThan(1e-5)
  })

  test('finds it the same whatever λ, size and grid', () => {
    for (const other of [
      { ...long, conductivityWPerMK: 3 },
      section(20, 15, 0.5),
      section(0.7, 0.9, 0.05),
    ]) {
      expect(Math.abs(cornerShapeFactor(other) - CONFORMAL)).toBeLessThan(5e-5)
    }
    expect(Math.abs(cornerShapeFactor(long, 5) - cornerShapeFactor(long, 10))).toBeLessThan(5e-5)
  })

  test('falls towards the answer with the step to the power 4/3 of a re-entrant corner', () => {
    const [coarse, middle, fine] = [8, 16, 32].map((cells) => quarterConductance(long, cells)) as [
      number,
      number,
      number,
    ]
    const order = Math.log2((coarse - middle) / (middle - fine))
    expect(order).toBeGreaterThan(1.3)
    expect(order).toBeLessThan(1.4)
  })

  test('a film that grips is an isothermal surface; a weak one lets the lagging count for nothing', () => {
    expect(ductConductance({ ...long, outerFilmWPerM2K: 1e7 }) / ductConductance(long)).toBeCloseTo(
      1,
      5,
    )
    const weak = { ...long, outerFilmWPerM2K: 1e-6 }
    expect(ductConductance(weak) / (1e-6 * (7 + 8 * 0.05))).toBeCloseTo(1, 5)
  })

  test('is the same for a duct on its side', () => {
    expect(
      ductConductance(section(0.3, 0.1, 0.1)) / ductConductance(section(0.1, 0.3, 0.1)),
    ).toBeCloseTo(1, 10)
  })
})

describe('the edge shape factor of textbooks, 0.54', () => {
  // Incropera, conduction shape factors: edge of adjoining walls, 0.54 W, for sides longer than a fifth of the thickness.
  test('is 3.4 % below the corner itself, and at most 0.5 % off the conductance of a usual duct', () => {
    expect(0.54 / cornerShapeFactor(long)).toBeCloseTo(1 - 0.034, 3)
    for (const duct of [section(0.6, 0.4, 0.05), section(0.3, 0.2, 0.04), section(1, 0.5, 0.1)]) {
      const { widthM, heightM, thicknessM } = duct
      const byTextbook = 0.04 * ((2 * (widthM + heightM)) / thicknessM + 4 * 0.54)
      const off = byTextbook / ductConductance(duct) - 1
      expect(off).toBeLessThan(0)
      expect(off).toBeGreaterThan(-0.005)
    }
  })
})

/** The duct as the solver takes it, with the same even film, or one that holds the surface at the air's temperature. */
const systemOf = ({ widthM, heightM, thicknessM, ...rest }: DuctSection): System => ({
  ...plainFilm,
  shape: { kind: 'rect-duct', widthM, heightM, riseM: null },
  layers: [constant(thicknessM, rest.conductivityWPerMK)],
  mediumC: 60,
  around: still(20),
  film: { fixedWPerM2K: rest.outerFilmWPerM2K ?? 1e7 },
})

/** How much more the solver's mean-perimeter form lets through than the two-dimensional field, as a fraction. */
const overstatement = (duct: DuctSection): number =>
  (solve(systemOf(duct)).heatLossWPerM ?? Number.NaN) / 40 / ductConductance(duct, 5) - 1

describe('the mean perimeter of ISO 12241 beside the two-dimensional field', () => {
  // Width, height and thickness in m, then how many per cent too much the mean perimeter gives: with isothermal surfaces
  // (by hand for sides longer than the thickness: P/d + 4 beside P/d + 4 · 0.5587) and behind 8 W/(m²·K).
  test.each([
    [1.2, 0.8, 0.025, 1.1, 1.2],
    [0.6, 0.4, 0.05, 4.2, 4.4],
    [0.3, 0.2, 0.05, 7.9, 8.3],
    [0.3, 0.2, 0.1, 14.4, 14.6],
    [0.1, 0.1, 0.1, 28.7, 28.6],
  ])(
    'a duct of %d x %d m with %d m: too much by %d and %d per cent',
    (widthM, heightM, thicknessM, held, filmed) => {
      const duct = section(widthM, heightM, thicknessM)
      expect(100 * overstatement(duct)).toBeCloseTo(held, 1)
      expect(100 * overstatement({ ...duct, outerFilmWPerM2K: 8 })).toBeCloseTo(filmed, 1)
    },
  )

  test('never lets through less than the field: it errs on the side of loss', () => {
    for (const side of [0.05, 0.2, 1]) {
      for (const thicknessM of [0.02, 0.05, 0.2]) {
        for (const film of [null, 5, 30]) {
          expect(overstatement(section(2 * side, side, thicknessM, film))).toBeGreaterThan(0)
        }
      }
    }
  })
})

describe('the note on corners', () => {
  const percentage = (duct: DuctSection): number | null => {
    const system = systemOf(duct)
    const note = notesOf(system, solve(system)).find(({ code }) => code === 'duct-corners')
    return note ? Number(/ (?<percent>\d+) % less/.exec(note.text)?.groups?.percent) : null
  }
  /** What the field lets through less than the solver's form, in per cent of that form. */
  const less = (duct: DuctSection): number => 100 * (1 - 1 / (1 + overstatement(duct)))

  test('is right by the field about how much less passes: to a point, on sides longer than the thickness', () => {
    let notes = 0
    for (const side of [0.1, 0.15, 0.25, 0.4, 0.8]) {
      for (const thicknessM of [0.03, 0.05, 0.08, 0.1]) {
        const duct = section(1.5 * side, side, thicknessM)
        const said = percentage(duct)
        if (said === null) {
          // Nothing is said up to 5 % between the two forms, and the field lies between them.
          expect(less(duct)).toBeLessThan(5)
          continue
        }
        notes += 1
        expect(Math.abs(said - less(duct))).toBeLessThan(1.5)
      }
    }
    expect(notes).toBeGreaterThan(8)
  })
})
