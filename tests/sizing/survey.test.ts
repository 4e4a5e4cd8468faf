/** What a measured surface temperature says, and how far that may be off. */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import type { Problem } from '#sizing/problem.ts'
import type { SurveyResult } from '#sizing/result.ts'
import { surveyOf } from '#sizing/survey.ts'
import { problemOf } from '../model/resolve/problem.ts'
import { noteCodes, sized, steamRun } from './catalogue.ts'

const found: RunValues = {
  ...steamRun,
  lengthM: 12,
  thicknessM: 0.05,
  surveyEmissivity: 0.9,
  surveyAirC: 24,
  measuredSurfaceC: 42,
}

function surveyed(values: RunValues): SurveyResult {
  const { survey } = sized(values)
  if (!survey) throw new Error('Nothing was measured')
  return survey
}

function told(problem: Problem): SurveyResult {
  const survey = surveyOf(problem)
  if (!survey) throw new Error('Nothing was measured')
  return survey
}

/** A problem whose readings are as given, to the last digit. */
const exactly = (problem: Problem, surfaceTempC: number): Problem => ({
  ...problem,
  survey: { surfaceTempC, thermometerK: 0, airK: 0, emissivity: 0 },
})

describe('the flux', () => {
  test('is that of the surface, by the metre and for the whole run', () => {
    const survey = surveyed(found)
    const outerM = 0.0603 + 0.1
    const perM = survey.heatFluxWPerM2.value * Math.PI * outerM
    expect(survey.heatLossWPerM?.value).toBeCloseTo(perM, 9)
    expect(survey.heatLossW?.value).toBeCloseTo(12 * perM, 9)
    expect(survey.heatLossW?.plusMinus).toBeCloseTo(12 * (survey.heatLossWPerM?.plusMinus ?? 0), 9)
  })

  test('is what the run loses where the surface is where it should be', () => {
    const problem = problemOf(found)
    const expectedC = told(problem).expectedSurfaceC ?? Number.NaN
    const survey = told(exactly(problem, expectedC))
    // The same day as the loss condition of another run.
    const sameDay = sized({ ...steamRun, thicknessM: 0.05, emissivity: 0.9, airC: 24 })
    expect(survey.heatLossWPerM?.value).toBeCloseTo(sameDay.chosen?.heatLossWPerM ?? Number.NaN, 6)
    expect(expectedC).toBeCloseTo(sameDay.chosen?.surfaceTempC ?? Number.NaN, 6)
    expect(survey.effectiveWPerMK?.value).toBeCloseTo(survey.soundWPerMK ?? Number.NaN, 8)
  })

  test('of a bare run is all that is told', () => {
    const survey = surveyed({ ...found, thicknessM: 0, measuredSurfaceC: 146 })
    expect(survey.heatFluxWPerM2.value).toBeGreaterThan(1000)
    expect(survey).toMatchObject({ effectiveWPerMK: null, soundWPerMK: null })
    expect(noteCodes(survey)).toEqual(['survey-readings'])
    // The wall of a bare pipe is neglected: its surface should be at the medium.
    expect(survey.expectedSurfaceC).toBe(150)
  })

  test('of a cold run is negative', () => {
    const cold = { ...found, mediumC: -20, measuredSurfaceC: 15, finish: 'elastomeric_bare' }
    const survey = surveyed(cold)
    expect(survey.heatFluxWPerM2.value).toBeLessThan(0)
    expect(survey.effectiveWPerMK?.value).toBeGreaterThan(0)
  })
})

describe('the conductivity of the lagging as it stands', () => {
  test('is the true one for a measurement made by the solver', () => {
    const { material: _, ...plain } = found
    for (const shape of [
      { shape: 'pipe', size: 'DN 50' },
      { shape: 'pipe', size: 'DN 50', orientation: 'vertical', riseM: 4 },
      { shape: 'flat', widthM: 2, heightM: 1, orientation: 'up' },
      { shape: 'sphere', outerDiameterM: 1 },
    ] as const) {
      const { lengthM: __, size: ___, ...bareValues } = plain
      const problem = problemOf({ ...bareValues, ...shape, conductivityWPerMK: 0.047 })
      const survey = told(problem)
      const exact = told(exactly(problem, survey.expectedSurfaceC ?? Number.NaN))
      expect(Math.abs((exact.effectiveWPerMK?.value ?? Number.NaN) / 0.047 - 1)).toBeLessThan(1e-6)
      expect(survey.soundWPerMK).toBeCloseTo(0.047, 10)
    }
  })

  test('is greater than the sound one where the surface is hotter than it should be', () => {
    const { expectedSurfaceC } = surveyed(found)
    const hot = surveyed({ ...found, measuredSurfaceC: (expectedSurfaceC ?? 0) + 8 })
    expect(hot.effectiveWPerMK?.value).toBeGreaterThan(hot.soundWPerMK ?? Number.NaN)
  })

  test('grows with the measured surface', () => {
    const at = (measuredSurfaceC: number): number =>
      surveyed({ ...found, measuredSurfaceC }).effectiveWPerMK?.value ?? Number.NaN
    expect(at(40)).toBeLessThan(at(45))
    expect(at(45)).toBeLessThan(at(60))
  })
})

describe('how far it may be off', () => {
  test('not at all with readings that are exact', () => {
    const survey = told(exactly(problemOf(found), 42))
    for (const part of [survey.heatFluxWPerM2, survey.heatLossWPerM, survey.effectiveWPerMK]) {
      expect(part?.plusMinus).toBe(0)
    }
  })

  test('is the root of the sum of the squares of each reading on its own', () => {
    const problem = problemOf(found)
    const { survey: reading } = problem
    if (!reading) throw new Error('no reading')
    const none = { ...reading, thermometerK: 0, airK: 0, emissivity: 0 }
    const only = (part: Partial<typeof none>) => told({ ...problem, survey: { ...none, ...part } })
    const parts = [
      only({ thermometerK: reading.thermometerK }),
      only({ airK: reading.airK }),
      only({ emissivity: reading.emissivity }),
    ]
    const all = told(problem)
    const together = (pick: (survey: SurveyResult) => number) =>
      Math.sqrt(parts.reduce((sum, part) => sum + pick(part) ** 2, 0))
    expect(all.heatFluxWPerM2.plusMinus).toBeCloseTo(
      together(({ heatFluxWPerM2 }) => heatFluxWPerM2.plusMinus),
      9,
    )
    expect(all.effectiveWPerMK?.plusMinus).toBeCloseTo(
      together(({ effectiveWPerMK }) => effectiveWPerMK?.plusMinus ?? Number.NaN),
      12,
    )
    // Each counts.
    for (const part of parts) expect(part.heatFluxWPerM2.plusMinus).toBeGreaterThan(0)
  })

  test('goes with the thermometer, the steeper the film', () => {
    const at = (surveyToleranceK: number): number =>
      surveyed({ ...found, surveyToleranceK }).heatFluxWPerM2.plusMinus
    expect(at(1)).toBeLessThan(at(2))
    expect(at(2)).toBeLessThan(at(5))
  })

  test('the emissivity is uncertain by half where it is bright, by 0.05 where it is dull', () => {
    const half = (surveyEmissivity: number) =>
      problemOf({ ...found, surveyEmissivity }).survey?.emissivity
    expect(half(0.1)).toBeCloseTo(0.05, 12)
    expect(half(0.3)).toBeCloseTo(0.15, 12)
    expect(half(0.5)).toBe(0.05)
    expect(half(1)).toBe(0.05)
    // At the end of what an emissivity may be the other side stands for both.
    expect(surveyed({ ...found, surveyEmissivity: 1 }).heatFluxWPerM2.plusMinus).toBeGreaterThan(0)
  })

  test('surroundings that are not given go with the air; given ones stay', () => {
    const problem = problemOf(found)
    const apart = problemOf({ ...found, surveySurroundingsC: 24.001 })
    const airOnly = { surfaceTempC: 42, thermometerK: 0, airK: 1, emissivity: 0 }
    const off = (given: Problem) => told({ ...given, survey: airOnly }).heatFluxWPerM2.plusMinus
    expect(off(problem)).toBeGreaterThan(1.5 * off(apart))
  })
})

describe('what cannot be told is said', () => {
  test('a surface as warm as the air', () => {
    const survey = surveyed({ ...found, measuredSurfaceC: 25 })
    expect(survey.effectiveWPerMK).toBeNull()
    expect(noteCodes(survey)).toContain('survey-unclear')
  })

  test('a medium on the wrong side of the surface', () => {
    const survey = surveyed({ ...found, surveyMediumC: 30, measuredSurfaceC: 60 })
    expect(survey.effectiveWPerMK).toBeNull()
    expect(noteCodes(survey)).toContain('survey-contradiction')
  })

  test('lagging whose thickness is not given', () => {
    const { thicknessM: _, ...unfixed } = found
    const survey = surveyed(unfixed)
    expect(survey).toMatchObject({
      heatLossWPerM: null,
      heatLossW: null,
      effectiveWPerMK: null,
      soundWPerMK: null,
      expectedSurfaceC: null,
    })
    expect(noteCodes(survey)).toContain('survey-thickness')
  })

  test('nothing measured: no survey, and the rest of the day is not used', () => {
    const { measuredSurfaceC: _, ...without } = found
    const result = sized(without)
    expect(result.survey).toBeNull()
    expect(result.notes.map(({ text }) => text).join(' ')).toContain('no surface was measured')
  })

  test('what was assumed of the day', () => {
    const { surveyAirC: _, surveyEmissivity: __, ...bare } = found
    const note = sized(bare).notes.find(({ code }) => code === 'survey-assumed')?.text
    expect(note).toBe(
      'The survey is taken with a medium of 150 °C, air of 20 °C, still air, an emissivity of 0.2, a thermometer within 2 K, and the surface out of the sun.',
    )
  })

  test('a duct is measured at one place', () => {
    const duct: RunValues = {
      ...found,
      shape: 'rect-duct',
      size: '600 x 400',
      material: 'stone_wool_slab',
      mediumC: 60,
    }
    expect(noteCodes(surveyed({ ...duct, measuredSurfaceC: 30 }))).toContain('survey-faces')
  })
})

test('whatever is measured, no conductivity is negative and every figure is finite', () => {
  fc.assert(
    fc.property(
      fc.double({ min: -200, max: 1000, noNaN: true }),
      fc.double({ min: -70, max: 200, noNaN: true }),
      fc.double({ min: -200, max: 1000, noNaN: true }),
      fc.double({ min: 0.01, max: 1, noNaN: true }),
      fc.double({ min: 0, max: 50, noNaN: true }),
      (measuredSurfaceC, surveyAirC, surveyMediumC, surveyEmissivity, surveyToleranceK) => {
        const survey = told(
          problemOf({
            ...found,
            measuredSurfaceC,
            surveyAirC,
            surveyMediumC,
            surveyEmissivity,
            surveyToleranceK,
          }),
        )
        const { heatFluxWPerM2, effectiveWPerMK, soundWPerMK, expectedSurfaceC } = survey
        for (const figure of [
          heatFluxWPerM2.value,
          heatFluxWPerM2.plusMinus,
          effectiveWPerMK?.value ?? 1,
          effectiveWPerMK?.plusMinus ?? 1,
          soundWPerMK ?? 1,
          expectedSurfaceC ?? 1,
        ]) {
          expect(Number.isFinite(figure)).toBe(true)
        }
        expect(effectiveWPerMK?.value ?? 1).toBeGreaterThan(0)
        expect(soundWPerMK ?? 1).toBeGreaterThan(0)
        if (effectiveWPerMK === null) expect(survey.notes.length).toBeGreaterThan(1)
      },
    ),
    { seed: 1, numRuns: 500 },
  )
})
