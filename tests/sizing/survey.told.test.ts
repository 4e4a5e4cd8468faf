/** What a survey says beside its numbers, and how each reading is varied. */
import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import type { SurveyResult } from '#sizing/result.ts'
import { variations } from '#sizing/survey.ts'
import type { System } from '#solver/types.ts'
import { noteCodes, sized, steamRun } from './catalogue.ts'

const found: RunValues = {
  ...steamRun,
  lengthM: 12,
  thicknessM: 0.05,
  surveyEmissivity: 0.9,
  surveyAirC: 24,
  measuredSurfaceC: 42,
}
const surveyed = (values: RunValues): SurveyResult =>
  sized(values).survey ?? expect.fail('nothing was measured')
const textOf = (values: RunValues, code: string): string =>
  surveyed(values).notes.find((note) => note.code === code)?.text ?? ''

describe('variations', () => {
  const system: System = {
    shape: { kind: 'pipe', outerDiameterM: 0.1, orientation: 'horizontal' },
    layers: [],
    emissivity: 0.9,
    mediumC: 100,
    insideFilmWPerM2K: null,
    around: { airC: 20, surroundingsC: 20, windMPerS: 0, altitudeM: 0 },
    sunAbsorbedWPerM2: 0,
    film: 'detailed',
    inclinedFilm: 'higher',
  }
  const reading = { surfaceTempC: 42, thermometerK: 1, airK: 2, emissivity: 0.05 }
  const varied = (of: System) => variations({ surfaceTempC: 42, system: of }, reading)

  test('of the thermometer and the air go as far to either side, the surroundings with the air', () => {
    const [surface, air] = varied(system)
    expect([surface?.low.surfaceTempC, surface?.high.surfaceTempC]).toEqual([41, 43])
    expect([surface?.share, air?.share]).toEqual([0.5, 0.5])
    expect(air?.low.system.around).toMatchObject({ airC: 18, surroundingsC: 18 })
    expect(air?.high.system.around).toMatchObject({ airC: 22, surroundingsC: 22 })
  })

  test('leave surroundings that are known as they are', () => {
    const [, air] = varied({ ...system, around: { ...system.around, surroundingsC: 12 } })
    expect(air?.low.system.around).toMatchObject({ airC: 18, surroundingsC: 12 })
  })

  // 0.98 ± 0.05 can go up to 1 only: of 0.07 in all, 0.05 is five sevenths.
  test.each([
    [0.9, 0.85, 0.95, 0.5],
    [0.98, 0.93, 1, 5 / 7],
    [0.03, 0.01, 0.08, 5 / 7],
  ])('of an emissivity of %d go from %d to %d', (emissivity, low, high, share) => {
    const [, , third] = varied({ ...system, emissivity })
    expect(third?.low.system.emissivity).toBeCloseTo(low, 12)
    expect(third?.high.system.emissivity).toBeCloseTo(high, 12)
    expect(third?.share).toBeCloseTo(share, 12)
  })
})

describe('notes', () => {
  test('say how far each reading may be off', () => {
    const text = textOf(found, 'survey-readings')
    expect(text).toMatch(/surface ±[\d.]+ K, air ±[\d.]+ K, emissivity 0\.9 ±[\d.]+\.$/)
  })

  test('say of what has several faces that the reading is taken for all', () => {
    const { material: _, size: __, ...plain } = found
    const duct: RunValues = {
      ...plain,
      shape: 'rect-duct',
      widthM: 0.6,
      heightM: 0.4,
      material: 'stone_wool_slab',
    }
    expect(textOf(duct, 'survey-faces')).toContain('every side')
    expect(textOf(found, 'survey-faces')).toBe('')
  })

  test('say where the surface is too near to the air to tell anything', () => {
    const near = { ...found, measuredSurfaceC: 24.2 }
    expect(textOf(near, 'survey-unclear')).toMatch(/^The surface stands so near to the air/)
    expect(surveyed(near).effectiveWPerMK).toBeNull()
    expect(textOf(found, 'survey-unclear')).toBe('')
  })

  test('say where the thickness as found is missing, and tell no loss', () => {
    const { thicknessM: _, ...unknown } = found
    expect(textOf(unknown, 'survey-thickness')).toMatch(/Give thickness_mm\.$/)
    expect(surveyed(unknown)).toMatchObject({
      heatLossWPerM: null,
      heatLossW: null,
      effectiveWPerMK: null,
      soundWPerMK: null,
      expectedSurfaceC: null,
    })
    expect(textOf(found, 'survey-thickness')).toBe('')
  })

  test('say where heat would flow against the difference', () => {
    const against = { ...found, mediumC: 10, measuredSurfaceC: 42 }
    expect(textOf(against, 'survey-contradiction')).toMatch(
      /^The surface read is not between medium \(/,
    )
    expect(surveyed(against).effectiveWPerMK).toBeNull()
  })

  test('say where the surface is too near to the medium to tell a conductivity', () => {
    const near = { ...found, mediumC: 60, measuredSurfaceC: 59.9 }
    expect(textOf(near, 'survey-contradiction')).toMatch(
      /^Between medium and surface too little is left/,
    )
    expect(surveyed(near).effectiveWPerMK).toBeNull()
  })

  test('are not more than they need be on a plain reading', () => {
    expect(noteCodes(surveyed(found))).toEqual(['survey-readings'])
  })
})

test('a square metre has no loss by the metre, a run of unknown length none in all', () => {
  const { lengthM: _, material: __, size: ___, ...plain } = found
  const wall: RunValues = {
    ...plain,
    shape: 'flat',
    heightM: 2,
    widthM: 3,
    material: 'stone_wool_slab',
  }
  const survey = surveyed(wall)
  expect(survey.heatLossWPerM).toBeNull()
  expect(survey.heatLossW?.value).toBeCloseTo(6 * survey.heatFluxWPerM2.value, 9)
  const { lengthM: ____, ...unmeasured } = found
  expect(surveyed(unmeasured).heatLossW).toBeNull()
  expect(surveyed(unmeasured).heatLossWPerM).not.toBeNull()
})
