/** The loss of a whole run: straight length, fittings, supports and ends. */
import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import { problemOf } from '../model/resolve/problem.ts'
import { published } from '../published.ts'
import { sized, steamRun } from './catalogue.ts'

const run: RunValues = { ...steamRun, size: 'DN 100', lengthM: 20, thicknessM: 0.05 }
const VALVE_M2 = 0.435
const VALVE_M = 4.5 + 2 / 6

const lossOf = (values: RunValues) => {
  const { chosen, bare } = sized(values)
  if (!chosen) throw new Error('None chosen')
  return { chosen, bare }
}
const perM = ({ heatLossWPerM }: { readonly heatLossWPerM: number | null }): number =>
  heatLossWPerM ?? Number.NaN

describe('the loss of a valve', () => {
  /** Room of 80 °F, as in the handbook's tables of bare pipes; the page of the tip sheet does not print its own. */
  const airC = (80 - 32) / 1.8

  // The saving is area × (bare flux − flux of the cover): by the surface convention for both, 25 mm on the same area.
  // Left out: NPS 4 at 204.4 °C, 996 W. It is 1.48 times the saving at 148.9 °C where the other sizes have 1.70 to 1.76,
  // and ours is a third more.
  published<{ size: string; mediumC: number }>(
    ({ size, mediumC }) => {
      const values: RunValues = {
        tag: 'V',
        shape: 'pipe',
        size,
        mediumC,
        airC,
        lengthM: 0,
        valves: 1,
        fittings: 'bare',
        // Dull cover of glass cloth, conductivity of needle mat at these temperatures.
        conductivityWPerMK: 0.05,
        thicknessM: 0.025,
        emissivity: 0.9,
      }
      const { chosen, bare } = lossOf(values)
      const { bareAreaM2 } = problemOf(values).fittings
      return (bare.heatLossW ?? Number.NaN) - chosen.heatFluxWPerM2 * bareAreaM2
    },
    (
      [
        ['NPS 3', 93.3, '234'],
        ['NPS 4', 93.3, '319'],
        ['NPS 6', 93.3, '457'],
        ['NPS 8', 93.3, '645'],
        ['NPS 10', 93.3, '850'],
        ['NPS 3', 148.9, '501'],
        ['NPS 4', 148.9, '674'],
        ['NPS 6', 148.9, '967'],
        ['NPS 8', 148.9, '1407'],
        ['NPS 10', 148.9, '1817'],
        ['NPS 3', 204.4, '850'],
        ['NPS 6', 204.4, '1700'],
        ['NPS 8', 204.4, '2432'],
      ] as const
    ).map(([size, mediumC, printed]) => ({
      from: 'US government steam tip sheet on removable valve insulation, 25 mm cover against bare',
      given: { size, mediumC },
      printed,
      within: {
        fraction: 0.2,
        because:
          'the sheet prints neither its areas nor the air and the cover it assumed, and our areas of valves are from memory',
      },
    })),
  )

  test('bare: its surface by the flux of the bare run, also on a lagged run', () => {
    const { chosen, bare } = lossOf({ ...run, valves: 1, fittings: 'bare' })
    const valveW = VALVE_M2 * bare.heatFluxWPerM2
    expect(chosen.fittingsLossW).toBeCloseTo(valveW, 9)
    expect(chosen.heatLossW).toBeCloseTo(20 * perM(chosen) + valveW, 9)
    expect(bare.heatLossW).toBeCloseTo(20 * perM(bare) + valveW, 9)
  })

  test('lagged: as much as metres of the lagged run; on the bare run by its surface', () => {
    const { chosen, bare } = lossOf({ ...run, valves: 1 })
    expect(chosen.fittingsLossW).toBeCloseTo(VALVE_M * perM(chosen), 9)
    expect(bare.fittingsLossW).toBeCloseTo(VALVE_M2 * bare.heatFluxWPerM2, 9)
  })

  test('of a run of length 0 is all it loses', () => {
    const { chosen, bare } = lossOf({ ...run, lengthM: 0, valves: 2 })
    expect(chosen.heatLossW).toBeCloseTo(2 * VALVE_M * perM(chosen), 9)
    expect(chosen.fittingsLossW).toBe(chosen.heatLossW)
    expect(bare.heatLossW).toBeCloseTo(2 * VALVE_M2 * bare.heatFluxWPerM2, 9)
  })

  test('of a bare run', () => {
    const { chosen, bare } = lossOf({ ...run, thicknessM: 0, valves: 1, supports: 3, ends: 1 })
    const discM2 = (Math.PI / 4) * 0.1143 ** 2
    expect(chosen).toEqual(bare)
    expect(chosen.fittingsLossW).toBeCloseTo((VALVE_M2 + discM2) * bare.heatFluxWPerM2, 6)
  })

  test('leaves what holds for a metre alone', () => {
    const {
      fittingsLossW: _,
      heatLossW: __,
      yearlyMeanLossW: ___,
      ...with2
    } = lossOf({ ...run, valves: 2 }).chosen
    const { fittingsLossW: _a, heatLossW: _b, yearlyMeanLossW: _c, ...without } = lossOf(run).chosen
    expect(with2).toEqual(without)
  })

  test('is not added up without a length', () => {
    const { lengthM: _, ...unmeasured } = run
    expect(lossOf({ ...unmeasured, valves: 1 }).chosen).toMatchObject({
      heatLossW: null,
      fittingsLossW: null,
    })
  })
})

describe('supports and ends', () => {
  test('supports add 15 % of the straight run indoors, 25 % outdoors', () => {
    const indoors = lossOf({ ...run, supports: 4 }).chosen
    expect(indoors.fittingsLossW).toBeCloseTo(0.15 * 20 * perM(indoors), 9)
    const outdoors = lossOf({ ...run, supports: 4, windMPerS: 4 }).chosen
    expect(outdoors.fittingsLossW).toBeCloseTo(0.25 * 20 * perM(outdoors), 9)
  })

  test('an end loses the flux of the lagged run over its lagged disc', () => {
    const { chosen } = lossOf({ ...run, ends: 2 })
    const discM2 = (Math.PI / 4) * 0.2143 ** 2
    expect(chosen.fittingsLossW).toBeCloseTo(2 * discM2 * chosen.heatFluxWPerM2, 6)
  })

  test('a bare end that of the bare run over the bare disc', () => {
    const { chosen, bare } = lossOf({ ...run, ends: 1, fittings: 'bare' })
    const discM2 = (Math.PI / 4) * 0.1143 ** 2
    expect(chosen.fittingsLossW).toBeCloseTo(discM2 * bare.heatFluxWPerM2, 6)
  })

  test('the end of a duct is its outer rectangle', () => {
    const { chosen } = lossOf({
      ...run,
      shape: 'rect-duct',
      size: '600 x 400',
      material: 'stone_wool_slab',
      ends: 1,
    })
    expect(chosen.fittingsLossW).toBeCloseTo(0.7 * 0.5 * chosen.heatFluxWPerM2, 9)
  })
})

test('energy, money and CO2 of the year hold what the fittings lose', () => {
  const weighed: RunValues = { ...run, fuel: 'natural_gas', hoursPerYear: 8000 }
  const plain = sized(weighed)
  const fitted = sized({ ...weighed, valves: 3, supports: 1, fittings: 'bare' })
  const [plainW, fittedW] = [plain.chosen?.heatLossW ?? 0, fitted.chosen?.heatLossW ?? 0]
  expect(fittedW).toBeGreaterThan(plainW)
  expect(fitted.chosen?.yearlyKWh).toBeCloseTo(8 * fittedW, 6)
  expect((fitted.money?.co2KgPerYear ?? 0) / (plain.money?.co2KgPerYear ?? 1)).toBeCloseTo(
    fittedW / plainW,
    9,
  )
  const saved = (result: typeof plain) =>
    ((result.bare.heatLossW ?? 0) - (result.chosen?.heatLossW ?? 0)) /
    (result.money?.savingPerYearTotal ?? Number.NaN)
  expect(saved(fitted)).toBeCloseTo(saved(plain), 6)
  expect(fitted.money?.bareEnergyPerYear).toBe(plain.money?.bareEnergyPerYear)
})

test('a saving leaves out the fittings whose lagging has no price', () => {
  const weighed: RunValues = { ...run, fuel: 'natural_gas', hoursPerYear: 8000 }
  const plain = sized(weighed)
  const fitted = sized({ ...weighed, valves: 3, fittings: 'lagged' })
  expect(fitted.money?.savingPerYearTotal).toBeCloseTo(plain.money?.savingPerYearTotal ?? 0, 6)
  expect(fitted.money?.paybackYears).toBeCloseTo(
    (fitted.money?.installedTotal ?? 0) / (fitted.money?.savingPerYearTotal ?? Number.NaN),
    9,
  )
  expect(fitted.notes.map(({ code }) => code)).toContain('fittings-unpriced')
  expect(plain.notes.map(({ code }) => code)).not.toContain('fittings-unpriced')
})

test('what the sun brings to a heated run costs nothing, and is no cooling either', () => {
  const sunny: RunValues = {
    ...run,
    mediumC: 50,
    airC: 30,
    solarWPerM2: 800,
    thicknessM: 0.05,
    fuel: 'natural_gas',
    hoursPerYear: 8000,
  }
  const result = sized(sunny)
  expect(result.chosen?.heatLossW).toBeLessThan(0)
  expect(result.chosen?.yearlyMeanLossW).toBe(0)
  expect(result.chosen?.money?.energyPerYear).toBe(0)
})
