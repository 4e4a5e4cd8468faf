import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import type { Material } from '#catalogue/types.ts'
import type { RunValues } from '#model/fields.ts'
import { evenly } from '../model/any-values.ts'
import { catalogue, sized } from './catalogue.ts'
import { type Plain, verdict } from './oracle.ts'

const maybe = <T>(arbitrary: fc.Arbitrary<T>): fc.Arbitrary<T | null> =>
  fc.option(arbitrary, { freq: 2 })

const priced = new Set(catalogue.priceModels.map(({ materialId }) => materialId))
const stepped = new Set(
  catalogue.steps.filter(({ series }) => series === 'metric').map(({ materialId }) => materialId),
)
const materials = catalogue.materials.filter(({ id }) => priced.has(id) && stepped.has(id))
const finishes = ['al_plain', 'galv_steel', 'stainless', 'pvc_jacket', 'asj', 'elastomeric_bare']
  .map((id) => catalogue.finishes.find((finish) => finish.id === id))
  .filter((finish) => finish !== undefined)

const shape: fc.Arbitrary<Plain['shape']> = fc.oneof(
  evenly(-2, 0).map((exponent) => ({
    kind: 'pipe' as const,
    outerDiameterM: 10 ** exponent,
    orientation: 'horizontal' as const,
  })),
  fc.tuple(evenly(0.02, 1), evenly(0.5, 12)).map(([outerDiameterM, riseM]) => ({
    kind: 'pipe' as const,
    outerDiameterM,
    orientation: 'vertical' as const,
    riseM,
  })),
  fc.tuple(evenly(0.1, 2), evenly(0.1, 1)).map(([widthM, heightM]) => ({
    kind: 'rect-duct' as const,
    widthM,
    heightM,
    riseM: null,
  })),
  evenly(0.3, 5).map((characteristicLengthM) => ({
    kind: 'flat' as const,
    facing: 'vertical' as const,
    characteristicLengthM,
  })),
)

const money = fc.record({
  pricePerKWh: evenly(0.005, 0.3),
  efficiency: evenly(0.6, 1),
  cop: evenly(1.5, 5),
  hoursPerYear: evenly(200, 8700),
  discount: evenly(0, 0.15),
  growth: evenly(-0.02, 0.06),
  lifeYears: fc.integer({ min: 3, max: 30 }),
})

function plain(mediumC: fc.Arbitrary<number>): fc.Arbitrary<Plain> {
  return fc
    .record({
      shape,
      pick: fc.nat(),
      isSuited: fc.integer({ min: 0, max: 3 }).map((dice) => dice > 0),
      finish: fc.constantFrom(...finishes),
      mediumC,
      hotterK: evenly(0, 40),
      colderK: evenly(0, 10),
      airC: evenly(-10, 35),
      touchAirC: evenly(20, 45),
      dampAirC: evenly(15, 35),
      windMPerS: fc.oneof(fc.constant(0), evenly(0.1, 8)),
      humidity: maybe(evenly(0.3, 0.92)),
      contactS: evenly(4, 590),
      maxSurfaceC: maybe(evenly(30, 60)),
      maxLossWPerM: maybe(evenly(10, 400)),
      maxLossWPerM2: maybe(evenly(30, 500)),
      money: maybe(money),
    })
    .map(({ hotterK, colderK, pick, isSuited, ...run }) => ({
      ...run,
      material: pickMaterial(pick, isSuited, run.mediumC - colderK, run.mediumC + hotterK),
      maxLossWPerM: run.shape.kind === 'flat' ? null : run.maxLossWPerM,
      isDuct: run.shape.kind === 'rect-duct',
      mediumMaxC: run.mediumC + hotterK,
      mediumMinC: run.mediumC - colderK,
    }))
}

/** Mostly a material that stands the medium; now and then any. */
function pickMaterial(pick: number, isSuited: boolean, coldC: number, hotC: number): Material {
  const suited = materials.filter(
    ({ serviceMinC, serviceMaxC }) => serviceMinC <= coldC && hotC <= serviceMaxC,
  )
  const from = isSuited && suited.length > 0 ? suited : materials
  const material = from[pick % from.length]
  if (!material) throw new Error('The catalogue has no material with steps and a price')
  return material
}

function valuesOf(run: Plain): RunValues {
  const given = <K extends keyof RunValues>(key: K, value: RunValues[K] | null): RunValues =>
    value === null ? {} : { [key]: value }
  return {
    tag: 'A',
    material: run.material.id,
    finish: run.finish.id,
    mediumC: run.mediumC,
    mediumMaxC: run.mediumMaxC,
    mediumMinC: run.mediumMinC,
    airC: run.airC,
    touchAirC: run.touchAirC,
    dampAirC: run.dampAirC,
    windMPerS: run.windMPerS,
    contactS: run.contactS,
    ...given('humidity', run.humidity),
    ...given('maxSurfaceC', run.maxSurfaceC),
    ...given('maxLossWPerM', run.maxLossWPerM),
    ...given('maxLossWPerM2', run.maxLossWPerM2),
    ...shapeValues(run.shape),
    ...(run.money && {
      fuel: 'natural_gas',
      fuelPricePerKWh: run.money.pricePerKWh,
      efficiency: run.money.efficiency,
      cop: run.money.cop,
      hoursPerYear: run.money.hoursPerYear,
      discount: run.money.discount,
      growth: run.money.growth,
      lifeYears: run.money.lifeYears,
    }),
  }
}

function shapeValues(of: Plain['shape']): RunValues {
  switch (of.kind) {
    case 'pipe':
      return of.orientation === 'vertical'
        ? {
            shape: 'pipe',
            outerDiameterM: of.outerDiameterM,
            orientation: 'vertical',
            riseM: of.riseM,
          }
        : { shape: 'pipe', outerDiameterM: of.outerDiameterM }
    case 'rect-duct':
      return { shape: 'rect-duct', widthM: of.widthM, heightM: of.heightM }
    case 'flat':
      return { shape: 'flat', orientation: 'vertical', heightM: of.characteristicLengthM }
  }
}

const seen = new Map<string, number>()

function compare(run: Plain): void {
  const result = sized(valuesOf(run))
  const expected = verdict(run)
  const rungsMm = result.ladder.map(({ thicknessM }) => Math.round(thicknessM * 1e4))
  expect(rungsMm).toEqual(expected.thicknessesM.map((thicknessM) => Math.round(thicknessM * 1e4)))
  expect(result.chosen?.thicknessM ?? null).toEqual(
    expected.chosenM === null ? null : expect.closeTo(expected.chosenM, 9),
  )
  expect(result.governing).toBe(expected.governing)
  if (expected.lifeCycle === null) {
    expect(result.chosen?.money ?? null).toBeNull()
  } else {
    const lifeCycle = result.chosen?.money?.lifeCycle ?? Number.NaN
    expect(Math.abs(lifeCycle - expected.lifeCycle)).toBeLessThan(1e-9 * expected.lifeCycle)
  }
  seen.set(result.governing, (seen.get(result.governing) ?? 0) + 1)
}

describe('the program against the slow way', () => {
  test('hot runs', () => {
    fc.assert(fc.property(plain(evenly(40, 450)), compare), { seed: 21, numRuns: 300 })
  })

  test('cold runs', () => {
    fc.assert(fc.property(plain(evenly(-40, 25)), compare), { seed: 22, numRuns: 300 })
  })

  test('and each kind of answer came up', () => {
    for (const governing of ['touch', 'loss', 'damp', 'service', 'money', 'smallest', 'unmet'])
      expect(seen.get(governing), governing).toBeGreaterThan(0)
  })
})
