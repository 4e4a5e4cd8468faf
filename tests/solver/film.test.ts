import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { nusseltSphere, nusseltSphereInWind } from '#solver/convection/sphere.ts'
import {
  notesOf,
  nusseltCylinderInWind,
  nusseltHorizontalCylinder,
  nusseltPlateDrivingFlow,
  nusseltPlateHinderedFlow,
  nusseltPlateInWind,
  nusseltVerticalCylinder,
  nusseltVerticalPlate,
  solve,
} from '#solver/index.ts'
import type { Shape, System } from '#solver/types.ts'
import { detailedSystem, spread, within } from './arbitraries.ts'
import { filmNumbers } from './oracle.ts'
import { plainFilm } from './systems.ts'

const bare = (shape: Shape, mediumC: number, airC: number, windMPerS: number): System => ({
  shape,
  layers: [],
  ...plainFilm,
  emissivity: 0.5,
  mediumC,
  around: { airC, surroundingsC: airC, windMPerS, altitudeM: 0 },
})
const pipe = (outerDiameterM: number): Shape => ({
  kind: 'pipe',
  outerDiameterM,
  orientation: 'horizontal',
})
const wall = (characteristicLengthM: number): Shape => ({
  kind: 'flat',
  facing: 'vertical',
  characteristicLengthM,
})
const coefficient = (system: System): number => solve(system).convectionWPerM2K

describe('the film in wind', () => {
  const [size, temperatureC, air] = [spread(0.005, 5), within(-40, 300), within(-40, 40)]
  const given = [size, temperatureC, air, spread(0.01, 60)] as const

  test.each([
    ['cylinder', pipe, 4],
    ['plate', wall, 3],
  ] as const)('a %s blends free and forced flow with its own exponent', (_, shapeOf, exponent) => {
    fc.assert(
      fc.property(...given, (size, mediumC, airC, windMPerS) => {
        const free = coefficient(bare(shapeOf(size), mediumC, airC, 0))
        const both = coefficient(bare(shapeOf(size), mediumC, airC, windMPerS))
        const state = filmNumbers(bare(shapeOf(size), mediumC, airC, windMPerS), 0, mediumC)
        const nusselt = exponent === 4 ? nusseltCylinderInWind : nusseltPlateInWind
        const forced = (nusselt(state) * state.airConductivityWPerMK) / size
        const expected = (free ** exponent + forced ** exponent) ** (1 / exponent)
        expect(both / expected).toBeCloseTo(1, 10)
      }),
    )
  })

  test('more wind never carries less heat', () => {
    fc.assert(
      fc.property(...given, spread(1, 10), (size, mediumC, airC, windMPerS, factor) => {
        for (const shapeOf of [pipe, wall]) {
          const slow = coefficient(bare(shapeOf(size), mediumC, airC, windMPerS))
          const fast = coefficient(bare(shapeOf(size), mediumC, airC, windMPerS * factor))
          expect(fast).toBeGreaterThanOrEqual(slow * (1 - 1e-12))
        }
      }),
    )
  })

  test('a breath of wind changes nothing: no switch of regime', () => {
    fc.assert(
      fc.property(size, temperatureC, air, (sizeM, mediumC, airC) => {
        fc.pre(Math.abs(mediumC - airC) > 1)
        for (const shapeOf of [pipe, wall]) {
          const still = coefficient(bare(shapeOf(sizeM), mediumC, airC, 0))
          expect(coefficient(bare(shapeOf(sizeM), mediumC, airC, 1e-9)) / still).toBeLessThan(1.05)
        }
      }),
    )
  })
})

/** The range each free-convection formula states for itself, read from its pedigree. */
const rangeOf = (formula: { pedigree: { valid: { rayleigh?: readonly [number, number] } } }) =>
  formula.pedigree.valid.rayleigh ?? [Number.NaN, Number.NaN]

describe('a note on the range of a film formula', () => {
  /** What a face ought to say, from the pedigrees alone. */
  function expectedNotes(system: System): number {
    return solve(system).faces.reduce((count, face, index) => {
      const numbers = filmNumbers(system, index, face.surfaceTempC)
      const { kind, rayleigh, reynolds, prandtl, filmC, slenderness } = numbers
      const excessK = face.surfaceTempC - system.around.airC
      const outside = (value: number, [from, to]: readonly [number, number] | readonly number[]) =>
        value < (from ?? 0) || value > (to ?? 0)
      if (kind === 'soil') return count
      let expected = outside(filmC, [200 - 273.15, 1000 - 273.15]) ? 1 : 0
      if (system.around.windMPerS > 0) {
        const isRound = kind === 'lying' || kind === 'standing' || kind === 'leaning'
        const { valid } = (
          kind === 'ball'
            ? nusseltSphereInWind
            : isRound
              ? nusseltCylinderInWind
              : nusseltPlateInWind
        ).pedigree
        // A sphere reads the air at its own temperature, where film and surface are at that of the air.
        const wind =
          kind === 'ball' ? filmNumbers(system, index, system.around.airC) : { reynolds, prandtl }
        if (valid.reynolds && outside(wind.reynolds, valid.reynolds)) expected += 1
        if (valid.prandtl && outside(wind.prandtl, valid.prandtl)) expected += 1
      }
      if (Math.abs(excessK) <= 0.01) return count + expected
      if (kind === 'lying' && outside(rayleigh, rangeOf(nusseltHorizontalCylinder))) expected += 1
      if (kind === 'wall' && outside(rayleigh, rangeOf(nusseltVerticalPlate))) expected += 1
      if (kind === 'ball' && outside(rayleigh, rangeOf(nusseltSphere))) expected += 1
      if (kind === 'leaning') {
        const lyingRayleigh = rayleigh / slenderness ** 3
        if (outside(lyingRayleigh, rangeOf(nusseltHorizontalCylinder))) expected += 1
      }
      if (kind === 'standing' || kind === 'leaning') {
        // The thin-cylinder form is left at the end of its own range, so only the plate can be beyond.
        const flow = { rayleigh, prandtl, slenderness }
        const usesPlate = nusseltVerticalCylinder(flow) === nusseltVerticalPlate(flow)
        if (usesPlate && outside(rayleigh, rangeOf(nusseltVerticalPlate))) expected += 1
      }
      if (kind === 'up' || kind === 'down') {
        const isDriving = (kind === 'up') === excessK > 0
        const formula = isDriving ? nusseltPlateDrivingFlow : nusseltPlateHinderedFlow
        if (outside(rayleigh, rangeOf(formula))) expected += 1
      }
      return count + expected
    }, 0)
  }

  test('stands exactly where a number leaves the range of the formula in use', () => {
    fc.assert(
      fc.property(detailedSystem, (system) => {
        const texts = notesOf(system, solve(system))
          .filter(({ code }) => code === 'film-range')
          .map(({ text }) => text)
        const expected = expectedNotes(system)
        // Top and bottom of a duct or vessel may say the very same sentence once.
        if (system.shape.kind === 'rect-duct' || system.shape.kind === 'vessel') {
          expect(texts.length).toBeLessThanOrEqual(expected)
          expect(texts.length > 0).toBe(expected > 0)
        } else {
          expect(texts).toHaveLength(expected)
        }
      }),
      { numRuns: 1000 },
    )
  })

  test.each([
    ['a hair-thin pipe hardly warmer than the air', bare(pipe(0.001), 20.011, 20, 0), 0],
    ['a wall of 30 m at 300 °C', bare(wall(30), 300, 20, 0), 1],
    ['a wall of 3 m at 60 °C', bare(wall(3), 60, 20, 0), 0],
    ['a duct of 20 m in a storm', bare(pipe(20), 60, 20, 60), 2],
    ['an iced pipe at -150 °C in air of -50 °C', bare(pipe(0.1), -150, -50, 0), 1],
    ['a wall at the temperature of the air', bare(wall(30), 20, 20, 0), 0],
  ])('%s', (_, system, count) => {
    const notes = notesOf(system, solve(system))
    expect(notes.filter(({ code }) => code === 'film-range')).toHaveLength(count)
  })
})
