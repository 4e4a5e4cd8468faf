/** Every interface and the jacket within what their materials stand, at the hottest and the coldest medium. */
import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import type { LimitResult, Rating } from '#sizing/result.ts'
import { coldRun, mm, sized, steamRun } from './catalogue.ts'

const service = ({ limits }: Rating): LimitResult | undefined =>
  limits.find(({ limit }) => limit === 'service')
const at = (values: RunValues, thicknessM: number): Rating => {
  const { chosen } = sized({ ...values, thicknessM })
  if (!chosen) throw new Error('Not rated')
  return chosen
}
const heeds = (values: RunValues): string[] =>
  sized(values)
    .notes.filter(({ code }) => code === 'service-heed')
    .map(({ text }) => text)

describe('hot end', () => {
  // The shipped row: stone wool pipe section −18 to 650 °C.
  test.each([
    [649, true],
    [650, true],
    [650.1, false],
    [700, false],
  ])('stone wool at %d °C: %s', (mediumMaxC, pass) => {
    const rating = at({ ...steamRun, mediumC: 500, mediumMaxC }, 0.1)
    expect(service(rating)).toMatchObject({ pass, condition: 'touch', bound: 650 })
  })

  test('a medium at the very maximum passes on every rung', () => {
    // Thinner ones fail by their mean temperature, beyond the conductivity curve.
    const { ladder } = sized({ ...steamRun, mediumC: 600, mediumMaxC: 650 })
    const thick = ladder.filter(({ thicknessM }) => thicknessM >= 0.06)
    expect(thick.length).toBeGreaterThan(10)
    for (const rating of thick) expect(service(rating)?.pass).toBe(true)
  })

  test('a failing rung is never chosen', () => {
    const result = sized({ ...steamRun, mediumC: 700 })
    expect([result.chosen, result.governing]).toEqual([null, 'unmet'])
  })

  test('the inner face of each layer counts', () => {
    const { material: _, ...plain } = steamRun
    // PIR stands 140 °C: behind 50 mm of calcium silicate it still sees more from 350 °C inside.
    const result = sized({
      ...plain,
      mediumC: 350,
      layers: 'calcium_silicate:50;pir_pipe_section:30',
    })
    expect(result.chosen && service(result.chosen)).toMatchObject({ pass: false, bound: 140 })
    expect(result.chosen && service(result.chosen)?.what).toContain('PIR')
  })

  // The shipped row: PVC jacket 60 °C.
  test('so does the jacket, at the hottest day and medium', () => {
    const rating = at({ ...steamRun, mediumC: 350, finish: 'pvc_jacket', touchClass: 'wood' }, 0.02)
    expect(service(rating)).toMatchObject({ pass: false, bound: 60 })
    expect(service(rating)?.what).toContain('jacket')
  })

  test('a bare run has no material to fail', () => {
    expect(service(sized({ ...steamRun, mediumC: 700, thicknessM: 0 }).bare)).toBeUndefined()
  })
})

describe('cold end', () => {
  // The shipped row: nitrile foam −50 to 105 °C, its curve from −20 to 50 °C.
  test.each([
    [-50, true],
    [-51, false],
  ])('nitrile foam at %d °C: %s', (mediumMinC, pass) => {
    const rating = at({ ...coldRun, mediumMinC }, 0.032)
    expect(service(rating)).toMatchObject({ pass, condition: 'damp', bound: -50 })
  })

  test('a hot run is not asked what its lagging stands in the cold', () => {
    // Calcium silicate is rated from 27 °C up; its outside is at 25 °C on any hot pipe.
    expect(
      service(at({ ...steamRun, material: 'calcium_silicate', mediumC: 120 }, 0.1))?.pass,
    ).toBe(true)
    expect(
      service(
        at(
          {
            ...steamRun,
            material: 'calcium_silicate',
            mediumC: 120,
            humidity: 0.5,
            surroundingsC: 0,
          },
          0.1,
        ),
      )?.pass,
    ).toBe(true)
  })
})

describe('the conductivity curve, judged at the mean temperature of the layer', () => {
  const foam: RunValues = { ...steamRun, material: 'elastomeric_foam_epdm', thicknessM: 0.025 }

  test('beyond its end: with a note; more than 20 K beyond: service fails', () => {
    // EPDM foam: curve up to 50 °C, service up to 150 °C. Mean temperature about (medium + surface)/2.
    const curveEndC = 50
    for (const [mediumC, pass] of [
      [85, true],
      [140, false],
    ] as const) {
      const { chosen, notes } = sized({ ...foam, mediumC })
      const [inner = 0, outer = 0] = chosen?.interfaceTempsC ?? []
      expect((inner + outer) / 2).toBeGreaterThan(curveEndC)
      expect((inner + outer) / 2 > curveEndC + 20).toBe(!pass)
      expect(chosen && service(chosen)?.pass).toBe(pass)
      expect(notes.map(({ code }) => code)).toContain('conductivity-extrapolated')
    }
  })

  test('a constant has no ends', () => {
    expect(sized({ ...foam, mediumC: 140, conductivityWPerMK: 0.045 }).chosen?.pass).toBe(true)
  })
})

describe('above 90 % of the maximum a note', () => {
  test('above, not at, and not beyond the maximum', () => {
    expect(heeds({ ...steamRun, mediumC: 400, mediumMaxC: 585, thicknessM: 0.2 })).toEqual([])
    expect(heeds({ ...steamRun, mediumC: 400, mediumMaxC: 586, thicknessM: 0.2 })).toHaveLength(1)
    expect(heeds({ ...steamRun, mediumC: 400, mediumMaxC: 651, thicknessM: 0.2 })).toEqual([])
  })

  test('for each material and the jacket, not only the one nearest to its end', () => {
    const { material: _, ...plain } = steamRun
    const values: RunValues = {
      ...plain,
      mediumC: 600,
      layers: 'calcium_silicate:100;stone_wool_pipe_section:40',
      finish: 'asj',
      touchClass: 'wood',
      touchAirC: 45,
    }
    const texts = heeds(values)
    expect(texts.some((text) => text.includes('Calcium silicate'))).toBe(true)
    // The facing stands 65 °C.
    const jacketC = sized(values).chosen?.touchSurfaceC ?? 0
    expect(texts.some((text) => text.includes('jacket'))).toBe(jacketC > 58.5 && jacketC <= 65)
    expect(jacketC).toBeGreaterThan(58.5)
  })

  test('not for the reach of a curve', () => {
    expect(
      heeds({ ...steamRun, material: 'elastomeric_foam_epdm', thicknessM: 0.025, mediumC: 95 }),
    ).toEqual([])
  })
})

test('a conductivity given alone has no service limit, only a note', () => {
  const { material: _, ...plain } = steamRun
  const result = sized({ ...plain, mediumC: 500, conductivityWPerMK: 0.06 })
  expect(result.ladder.every((rating) => service(rating) === undefined)).toBe(true)
  expect(result.notes.map(({ code }) => code)).toContain('service-unknown')
  expect(mm(result.ladder[0]?.thicknessM)).toBe(20)
})
