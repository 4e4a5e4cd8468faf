/** How the medium arrives: against print, against the line metre by metre, and as a limit. */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import { limitEnds } from '#sizing/continuous.ts'
import type { Problem } from '#sizing/problem.ts'
import { size } from '#sizing/size.ts'
import { evenly } from '../model/any-values.ts'
import { problemOf } from '../model/resolve/problem.ts'
import { published } from '../published.ts'
import { sized, steamRun } from './catalogue.ts'
import { limitOf } from './limit-of.ts'
import { type Standing, streamEndC } from './step-by-step.ts'

const line: RunValues = { ...steamRun, medium: 'water', lengthM: 100, flowKgPerS: 0.5, maxDropK: 2 }
const arrivesC = (values: RunValues): number => sized(values).chosen?.arrivalTempC ?? Number.NaN

/**
 * The duct of the handbook: 0.6 × 0.9 m, 20 m, 15 m/s of air of 1.20 kg/m³ and 1006 J/kgK, at one flux all along. A run
 * has no flux of its own: a weak film to far colder air makes it, and lets it change by less than the digits show.
 */
function handbookDropK({ fluxWPerM2 }: { readonly fluxWPerM2: number }): number {
  const filmWPerM2K = 0.5
  const mediumC = 20 + fluxWPerM2 / filmWPerM2K
  const { chosen } = sized({
    tag: 'D',
    shape: 'rect-duct',
    widthM: 0.6,
    heightM: 0.9,
    lengthM: 20,
    mediumC,
    airC: 20,
    thicknessM: 0,
    insideFilmWPerM2K: 1e5,
    filmWPerM2K,
    flowKgPerS: 1.2 * 15 * 0.6 * 0.9,
    heatCapacityJPerKgK: 1006,
  })
  return mediumC - (chosen?.arrivalTempC ?? Number.NaN)
}

describe('air in a duct', () => {
  const from = 'ASHRAE Handbook Fundamentals 2021, ch. 23, as a run,'
  published(handbookDropK, [
    { from: `${from} example 1, bare duct`, given: { fluxWPerM2: 444 }, printed: '2.7' },
    { from: `${from} example 2, insulated duct`, given: { fluxWPerM2: 44.7 }, printed: '0.27' },
  ])
})

const stream = fc.record({
  outerMm: evenly(15, 600),
  mediumC: evenly(-30, 250),
  airC: evenly(-20, 40),
  surroundingsK: fc.constantFrom(0, 0, -10, 15),
  solarWPerM2: fc.constantFrom(0, 0, 600),
  windMPerS: fc.constantFrom(0, 3),
  thicknessMm: fc.constantFrom(0, 20, 60, 120),
  lengthM: evenly(1, 500),
  /** Of the driving difference, about so much is used up. */
  use: evenly(0.001, 1),
})
type Stream = Omit<typeof stream extends fc.Arbitrary<infer T> ? T : never, 'thicknessMm'> & {
  readonly thicknessMm: number
}

function valuesOf(run: Stream): RunValues {
  return {
    tag: 'A',
    shape: 'pipe',
    outerDiameterM: run.outerMm / 1000,
    mediumC: run.mediumC,
    airC: run.airC,
    surroundingsC: run.airC + run.surroundingsK,
    solarWPerM2: run.solarWPerM2,
    windMPerS: run.windMPerS,
    conductivityWPerMK: 0.04,
    thicknessM: run.thicknessMm / 1000,
    emissivity: 0.9,
    lengthM: run.lengthM,
    heatCapacityJPerKgK: 2000,
    // Some 10 W/m²K bare, 1 lagged.
    flowKgPerS:
      ((run.thicknessMm === 0 ? 10 : 1) * Math.PI * (run.outerMm / 1000) * run.lengthM) /
      2000 /
      run.use,
  }
}

function standingOf(problem: Problem): Standing {
  const { loss } = problem.conditions
  const isBare = problem.layers.length === 0
  return {
    shape: problem.shape,
    layers: problem.layers.map(({ material, thicknessM }) => ({
      thicknessM: thicknessM ?? 0,
      conductivity: material.conductivity,
    })),
    emissivity: isBare ? loss.bareEmissivity : loss.emissivity,
    insideFilmWPerM2K: null,
    around: loss.around,
    sunAbsorbedWPerM2:
      loss.sunWPerM2 * (isBare ? loss.bareSolarAbsorptance : loss.solarAbsorptance),
    film: loss.film,
    inclinedFilm: 'higher',
  }
}

/** Drop by the program and by small steps, and the share of the driving difference that the latter uses up. */
function drops(run: Stream): { fastK: number; slowK: number; used: number } {
  const values = valuesOf(run)
  const problem = problemOf(values)
  const capacityRateWPerK = (values.flowKgPerS ?? 0) * 2000
  const endC = streamEndC(standingOf(problem), run.mediumC, run.lengthM, capacityRateWPerK)
  const farC = streamEndC(
    standingOf(problem),
    run.mediumC,
    run.lengthM,
    capacityRateWPerK / 50,
    400,
  )
  const chosenC = size(problem).chosen?.arrivalTempC ?? Number.NaN
  const slowK = run.mediumC - endC
  return { fastK: run.mediumC - chosenC, slowK, used: Math.abs(slowK / (run.mediumC - farC)) }
}

describe('against the line metre by metre', () => {
  const off = (run: Stream): { readonly share: number; readonly used: number } => {
    const { fastK, slowK, used } = drops(run)
    return { share: fastK / slowK - 1, used }
  }

  test('lagged: within 2 %', () => {
    const lagged = stream.map((run) => ({ ...run, thicknessMm: Math.max(20, run.thicknessMm) }))
    fc.assert(
      fc.property(lagged, (run) => {
        expect(Math.abs(off(run).share)).toBeLessThan(0.02)
      }),
      { seed: 41, numRuns: 60 },
    )
  })

  test('bare: within 4 % where a tenth of the difference is used up, else as the docstring says', () => {
    fc.assert(
      fc.property(stream, (run) => {
        const { share, used } = off({ ...run, thicknessMm: 0 })
        expect(share).toBeLessThan(used < 0.1 ? 0.04 : 0.2)
        expect(share).toBeGreaterThan(used < 0.1 ? -0.04 : -0.08)
      }),
      { seed: 42, numRuns: 60 },
    )
  })
})

describe('where the medium arrives', () => {
  test('on the same side of where it tends to, and never beyond; more flow arrives less changed', () => {
    fc.assert(
      fc.property(stream, evenly(1.01, 50), (run, factor) => {
        const values = valuesOf({ ...run, surroundingsK: 0, solarWPerM2: 0 })
        const { mediumC, airC } = run
        const endC = arrivesC(values)
        expect(endC).toBeGreaterThanOrEqual(Math.min(mediumC, airC) - 1e-9)
        expect(endC).toBeLessThanOrEqual(Math.max(mediumC, airC) + 1e-9)
        const faster = arrivesC({ ...values, flowKgPerS: factor * (values.flowKgPerS ?? 0) })
        expect(Math.abs(faster - mediumC)).toBeLessThanOrEqual(Math.abs(endC - mediumC) + 1e-9)
        const longer = arrivesC({ ...values, lengthM: factor * run.lengthM })
        expect(Math.abs(longer - mediumC)).toBeGreaterThanOrEqual(Math.abs(endC - mediumC) - 1e-9)
      }),
      { seed: 43, numRuns: 100 },
    )
  })

  test('a thicker rung drops less', () => {
    const { bare, ladder } = sized(line)
    const ends = [bare, ...ladder].map(({ arrivalTempC }) => arrivalTempC ?? Number.NaN)
    ends.slice(1).forEach((endC, n) => {
      expect(endC).toBeGreaterThan(ends[n] ?? Number.NaN)
    })
  })

  test('a medium at the temperature of the air arrives as it set out', () => {
    expect(arrivesC({ ...line, mediumC: 20 })).toBe(20)
  })

  test('as it set out over no length', () => {
    expect(arrivesC({ ...line, lengthM: 0 })).toBe(150)
  })

  test('with warmer surroundings it tends to what the run itself would take', () => {
    // So long a line that nothing of the start is left; bare, so that it takes what its surface takes.
    const bareLine: RunValues = {
      ...line,
      thicknessM: 0,
      surroundingsC: 60,
      lengthM: 1e4,
      flowKgPerS: 0.01,
    }
    const endC = arrivesC(bareLine)
    expect(endC).toBeGreaterThan(20)
    expect(endC).toBeLessThan(60)
    expect(sized({ ...bareLine, mediumC: endC }).chosen?.heatLossWPerM).toBeCloseTo(0, 4)
  })

  test('what bare ends take up of the sun counts to where it tends, without any bare fitting', () => {
    const capped: RunValues = {
      ...line,
      thicknessM: 0.1,
      fittings: 'bare',
      ends: 2,
      solarWPerM2: 600,
      lengthM: 0.5,
      flowKgPerS: 1e-6,
    }
    const endC = arrivesC(capped)
    const ofLagging = arrivesC({ ...capped, ends: 0 })
    expect(endC).toBeGreaterThan(ofLagging + 1)
    expect(sized({ ...capped, mediumC: endC }).chosen?.heatLossW).toBeCloseTo(0, 6)
  })

  test('what bare fittings lose cools it too', () => {
    const problem = problemOf(line)
    const fitted = (bareAreaM2: number, change: Partial<Problem['fittings']> = {}): number =>
      size({ ...problem, fittings: { ...problem.fittings, bareAreaM2, areBare: true, ...change } })
        .chosen?.arrivalTempC ?? Number.NaN
    expect(fitted(0.5)).toBeLessThan(fitted(0))
    const { bare, chosen } = size({
      ...problem,
      fittings: { ...problem.fittings, bareAreaM2: 0.5, areBare: true },
    })
    const lossW = (chosen?.heatLossWPerM ?? 0) * 100 + 0.5 * bare.heatFluxWPerM2
    // 4312 J/kgK: water of 150 °C, IAPWS-IF97.
    expect(chosen?.arrivalTempC).toBeCloseTo(20 + 130 * Math.exp(-lossW / 130 / (0.5 * 4312)), 3)
  })

  test('is told without being limited where a flow is given, and not without', () => {
    const { maxDropK: _, ...unlimited } = line
    const result = sized(unlimited)
    expect(result.chosen?.arrivalTempC).toBeLessThan(150)
    expect(result.limits.some(({ limit }) => limit === 'arrival')).toBe(false)
    expect(limitEnds(problemOf(unlimited)).map(({ limit }) => limit)).toEqual(['touch'])
    const { flowKgPerS: __, ...still } = unlimited
    expect(sized(still).chosen?.arrivalTempC).toBeNull()
  })
})

describe('steam', () => {
  const { mediumC: _, ...unheated } = line
  const steam: RunValues = { ...unheated, medium: 'steam', pressureGaugePa: 5e5, flowKgPerS: 0.02 }

  // Steam tables: saturated at 6.013 bar, 158.9 °C, heat of vaporisation 2085 kJ/kg (IAPWS-IF97: 2085.6 at 6 bar).
  test('condenses: loss over heat of vaporisation', () => {
    const { chosen } = sized(steam)
    const madeKgPerS = (100 * (chosen?.heatLossWPerM ?? Number.NaN)) / 2085e3
    expect((chosen?.condensateKgPerS ?? Number.NaN) / madeKgPerS).toBeCloseTo(1, 3)
    expect(chosen?.arrivalTempC).toBeCloseTo(158.9, 1)
  })

  test('meets the drop as long as some is left', () => {
    const limit = limitOf(sized(steam).chosen ?? sized(steam).bare, 'arrival')
    expect(limit).toMatchObject({
      pass: true,
      rule: 'at most',
      bound: 0.02,
      unit: 'kg/s',
      condition: 'loss',
      what: 'condensate, against the steam that flows',
    })
  })

  test('all of it condenses: fails, arrives at no temperature that could be told', () => {
    const { bare, governing, chosen, ladder } = sized({ ...steam, flowKgPerS: 0.0025 })
    expect(bare.arrivalTempC).toBeNull()
    expect(bare.condensateKgPerS).toBe(0.0025)
    expect(limitOf(bare, 'arrival').value).toBeGreaterThan(0.0025)
    expect(limitOf(bare, 'arrival').what).toContain('all of it would condense')
    expect(governing).toBe('arrival')
    expect(chosen?.condensateKgPerS).toBeLessThan(0.0025)
    expect(
      ladder.filter(({ pass }) => !pass).every(({ arrivalTempC }) => arrivalTempC === null),
    ).toBe(true)
  })

  test('of a run that gains heat makes no condensate', () => {
    const vacuum: RunValues = { ...line, medium: 'steam', mediumC: 35, airC: 40, flowKgPerS: 0.02 }
    expect(sized(vacuum).chosen).toMatchObject({ condensateKgPerS: 0, arrivalTempC: 35 })
  })

  test('makes none of it where it is told how it cools', () => {
    const superheated = sized({ ...line, medium: 'steam', heatCapacityJPerKgK: 2100 })
    expect(superheated.chosen?.condensateKgPerS).toBeNull()
    expect(superheated.chosen?.arrivalTempC).toBeLessThan(150)
  })
})

describe('the arrival limit', () => {
  test('governs, and is judged at the loss condition in kelvin', () => {
    const result = sized(line)
    expect(result.governing).toBe('arrival')
    const limit = limitOf(result.chosen ?? result.bare, 'arrival')
    expect(limit).toMatchObject({
      rule: 'at most',
      bound: 2,
      unit: 'K',
      condition: 'loss',
      what: 'drop of the medium along the run',
    })
    expect(limit.value).toBeCloseTo(150 - (result.chosen?.arrivalTempC ?? 0), 12)
  })

  test('passes at the very drop, not a hair above', () => {
    const dropK = limitOf(
      sized({ ...line, thicknessM: 0.05 }).chosen ?? sized(line).bare,
      'arrival',
    ).value
    const passes = (maxDropK: number): boolean =>
      limitOf(sized({ ...line, thicknessM: 0.05, maxDropK }).chosen ?? sized(line).bare, 'arrival')
        .pass
    expect(passes(dropK)).toBe(true)
    expect(passes(dropK * (1 - 1e-12))).toBe(false)
  })

  test('a cold medium warms up: the rise counts alike', () => {
    const cold = sized({ ...line, mediumC: 5, airC: 27, flowKgPerS: 0.1, thicknessM: 0.03 })
    const limit = limitOf(cold.chosen ?? cold.bare, 'arrival')
    expect(limit.what).toBe('rise of the medium along the run')
    expect(limit.value).toBeCloseTo((cold.chosen?.arrivalTempC ?? 0) - 5, 12)
    expect(limit.value).toBeGreaterThan(0)
  })

  test('its exact end passes, a hair below fails', () => {
    const end = limitEnds(problemOf(line)).find(({ limit }) => limit === 'arrival')
    const fromM = end?.fromM ?? Number.NaN
    expect(150 - arrivesC({ ...line, thicknessM: fromM + 1e-6 })).toBeLessThan(2)
    expect(150 - arrivesC({ ...line, thicknessM: fromM - 1e-6 })).toBeGreaterThan(2)
  })
})
