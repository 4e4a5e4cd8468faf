import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import {
  findDuctSize,
  findFinish,
  findFuel,
  findMaterial,
  findPipeSize,
  findWallMaterial,
  type Lookup,
  saturationTemperatureC,
} from '#catalogue/lookup.ts'
import { published } from '../published.ts'
import { shippedCatalogue } from './shipped-catalogue.ts'

const catalogue = shippedCatalogue()

function item<T>(lookup: Lookup<T>): T {
  if (!lookup.ok) throw new Error(lookup.message)
  return lookup.item
}
const notes = <T>(lookup: Lookup<T>) => (lookup.ok ? lookup.notes : [])
const message = <T>(lookup: Lookup<T>) => (lookup.ok ? '' : lookup.message)
const millimetres = (text: string) => {
  const { outerDiameterM, wallM } = item(findPipeSize(catalogue, text))
  return [Number((outerDiameterM * 1000).toFixed(3)), Number((wallM * 1000).toFixed(3))]
}

describe('pipe sizes', () => {
  // Outside diameters as printed in EN 10220 (series 1), ASME B36.10M and EN 1057; walls of EN 10220 from memory.
  test.each([
    ['DN 50', 60.3, 2.9],
    ['DN50', 60.3, 2.9],
    [' dn  50 ', 60.3, 2.9],
    ['DN 150', 168.3, 4.5],
    ['DN 600', 610, 12.5],
    ['NPS 2', 60.3, 3.91],
    ['NPS2', 60.3, 3.91],
    ['nps 2 sch 80', 60.3, 5.54],
    ['NPS 2 Schedule 80', 60.3, 5.54],
    ['NPS 2, sch. 80', 60.3, 5.54],
    ['NPS 2 XS', 60.3, 5.54],
    ['NPS 2" std', 60.3, 3.91],
    ['NPS 1-1/2 sch 80', 48.3, 5.08],
    ['NPS 1 1/2', 48.3, 3.68],
    ['NPS 1½', 48.3, 3.68],
    ['NPS 1.5', 48.3, 3.68],
    ['NPS 1,5', 48.3, 3.68],
    ['NPS 3/4', 26.7, 2.87],
    ['NPS ¾ in', 26.7, 2.87],
    ['NPS 10', 273, 9.27],
    ['NPS 12', 323.8, 9.53],
    ['NPS 12 sch 40', 323.8, 10.31],
    ['NPS 48', 1219, 9.53],
    ['NPS 2 sch 10S', 60.3, 2.77],
    ['CU 28', 28, 0.9],
    ['cu28', 28, 0.9],
    ['CU 28 x 1.5', 28, 1.5],
    ['CU 76,1', 76.1, 1.5],
    ['CU 18', 18, 1],
  ])('%s', (text, outerMm, wallMm) => {
    expect(millimetres(text)).toEqual([outerMm, wallMm])
  })

  test('the standard wall and the thinner of two walls are said', () => {
    expect(notes(findPipeSize(catalogue, 'NPS 12'))).toEqual([
      'NPS 12 without a schedule: standard wall (STD), 9.53 mm.',
    ])
    expect(notes(findPipeSize(catalogue, 'CU 28'))).toEqual([
      'CU 28 is taken with the thinner wall, 0.9 mm; there is also 1.5 mm.',
    ])
    for (const text of ['DN 50', 'NPS 2', 'NPS 12 STD', 'CU 18', 'CU 28 x 0.9'])
      expect(notes(findPipeSize(catalogue, text)), text).toEqual([])
  })

  test.each([
    ['DN 55', 'a DN of the table; the nearest are DN 50 and DN 65, all of them 6, 8, '],
    ['DN 700', 'a DN of the table; the nearest is DN 600,'],
    ['NPS 1.75', 'an NPS of the table; the nearest are NPS 1-1/2 and NPS 2,'],
    ['NPS 2 sch 81', 'a schedule that ASME B36.10M has for NPS 2: Sch 5, Sch 10, '],
    ['CU 29', 'a CU of the table; the nearest are CU 28 and CU 35,'],
    ['CU 28 x 2', 'CU 28 with a wall of 0.9 or 1.5 mm'],
    ['two inch', 'a size such as DN 50, NPS 2, '],
    ['NPS 2 thick', 'a size such as DN 50, '],
    ['', 'a size such as DN 50, '],
  ])('%s is refused with what is allowed', (text, start) => {
    const said = message(findPipeSize(catalogue, text))
    expect(said.slice(0, start.length)).toBe(start)
  })

  test('each size of the three systems is found under its own name', () => {
    const { pipeSizes } = catalogue
    const dn = pipeSizes.filter(({ standard }) => standard.startsWith('EN 10220'))
    for (const pipe of dn) expect(item(findPipeSize(catalogue, `DN ${pipe.dn}`))).toBe(pipe)
    const nps = pipeSizes.filter(({ standard }) => standard.startsWith('ASME'))
    for (const pipe of nps)
      expect(item(findPipeSize(catalogue, `${pipe.label} ${pipe.series}`))).toBe(pipe)
    const cu = pipeSizes.filter(({ standard }) => standard === 'EN 1057')
    for (const pipe of cu) expect(item(findPipeSize(catalogue, `CU ${pipe.label}`))).toBe(pipe)
    expect([dn.length, nps.length, cu.length]).toEqual([22, 382, 31])
  })

  test('nothing typed makes it throw', () => {
    const start = fc.constantFrom('', 'DN ', 'NPS ', 'CU ', 'D ', 'Ø', '600 x ')
    fc.assert(
      fc.property(start, fc.string({ unit: 'grapheme', maxLength: 80 }), (head, tail) => {
        const text = head + tail
        for (const lookup of [findPipeSize(catalogue, text), findDuctSize(catalogue, text)])
          expect(lookup.ok || lookup.message.length > 0).toBe(true)
      }),
      { numRuns: 500, seed: 50 },
    )
  })
})

describe('duct sizes', () => {
  test.each(['D 250', 'd250', 'Ø 250', 'ø250 mm', '⌀ 250'])('%s is round', (text) => {
    expect(item(findDuctSize(catalogue, text))).toMatchObject({ diameterM: 0.25, widthM: null })
  })

  test.each([
    ['600 x 400', 0.6, 0.4],
    ['600x400', 0.6, 0.4],
    ['400 × 600 mm', 0.4, 0.6],
  ])('%s is width by height', (text, widthM, heightM) => {
    const found = findDuctSize(catalogue, text)
    expect(item(found)).toMatchObject({ diameterM: null, widthM, heightM })
    expect(notes(found)).toEqual([])
  })

  test('a rectangle off the standard is taken with a note, a round one is refused', () => {
    expect(notes(findDuctSize(catalogue, '610 x 400'))).toEqual([
      '610 x 400 mm is not a size of EN 1505; taken as given.',
    ])
    expect(message(findDuctSize(catalogue, 'D 260'))).toMatch(
      /^a D of the table; the nearest are D 250 and D 300, .* no size and an od_mm$/,
    )
    expect(message(findDuctSize(catalogue, '2 x 400'))).toContain('sides from 10 to 50000 mm')
  })
})

describe('names', () => {
  test.each(['stone_wool_slab', 'STONE WOOL SLAB', ' stone-wool slab '])('%s is found', (text) => {
    expect(item(findMaterial(catalogue, text)).id).toBe('stone_wool_slab')
  })

  test('the name people read finds it too', () => {
    for (const material of catalogue.materials)
      expect(item(findMaterial(catalogue, material.name))).toBe(material)
    for (const finish of catalogue.finishes)
      expect(item(findFinish(catalogue, finish.name))).toBe(finish)
    for (const fuel of catalogue.fuels) expect(item(findFuel(catalogue, fuel.name))).toBe(fuel)
    for (const wall of catalogue.wallMaterials)
      expect(item(findWallMaterial(catalogue, wall.name))).toBe(wall)
  })

  test.each([
    ['stonewool', ['stone_wool_pipe_section', 'stone_wool_mat_wired', 'stone_wool_slab']],
    ['calcium silicat', ['calcium_silicate']],
    ['corc', ['cork']],
    ['mineral wool', ['stone_wool']],
  ])('%s suggests what is meant', (text, parts) => {
    const said = message(findMaterial(catalogue, text))
    expect(said).toMatch(/^a material of the catalogue; did you mean .*\?$/)
    for (const part of parts) expect(said).toContain(part)
  })

  test('where nothing comes close, all that is known is listed', () => {
    const said = message(findFuel(catalogue, 'qqqqqqq'))
    expect(said).toBe(
      `a fuel of the catalogue; known are ${catalogue.fuels.map(({ id }) => id).join(', ')}`,
    )
  })

  test('a pasted page is answered in a few words', () => {
    const said = message(findMaterial(catalogue, 'wool '.repeat(2000)))
    expect(said.length).toBeLessThan(2000)
  })
})

describe('saturated steam', () => {
  const { steam } = catalogue
  const atGauge = (gaugePa: number) => {
    const saturation = saturationTemperatureC(steam, gaugePa)
    if (!saturation.ok) throw new Error(saturation.message)
    return saturation.temperatureC
  }
  const atAbsolute = (pressurePa: number) => atGauge(pressurePa - 101_325)

  // Verification values of the saturation equation, region 4.
  const because = 'interpolated in the shipped table'
  const near = { absolute: 0.001, because }
  const between = { absolute: 0.02, because }
  published(
    (pressurePa: number) => atAbsolute(pressurePa) + 273.15,
    [
      { from: 'IAPWS-IF97, table 36', given: 0.1e6, printed: '372.755919', within: near },
      { from: 'IAPWS-IF97, table 36', given: 1e6, printed: '453.035632', within: near },
      { from: 'IAPWS-IF97, table 36', given: 10e6, printed: '584.149488', within: near },
      { from: 'IAPWS-IF97, table 35', given: 2.63889776e6, printed: '500', within: between },
      { from: 'IAPWS-IF97, table 35', given: 12.3443146e6, printed: '600', within: between },
    ],
  )

  test('a state left out is found again from its neighbours', () => {
    // Twice the spacing makes four times the error, so the table itself is within 0.05 K and mostly 0.02 K.
    const errors = steam.slice(1, -1).map((left) => {
      const others = steam.filter((state) => state !== left)
      const found = saturationTemperatureC(others, left.pressureAbsolutePa - 101_325)
      return {
        pressurePa: left.pressureAbsolutePa,
        errorK: found.ok ? Math.abs(found.temperatureC - left.temperatureC) : Number.NaN,
      }
    })
    expect(errors.every(({ errorK }) => errorK < 0.15)).toBe(true)
    const usual = errors.filter(({ pressurePa }) => pressurePa > 101_325 && pressurePa < 15e6)
    expect(usual.every(({ errorK }) => errorK < 0.05)).toBe(true)
  })

  test('rises with pressure all the way', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -96_325, max: 21_898_675, noNaN: true }),
        fc.double({ min: 1, max: 1e5, noNaN: true }),
        (gaugePa, more) => {
          const higher = Math.min(gaugePa + more, 21_898_675)
          expect(atGauge(higher)).toBeGreaterThanOrEqual(atGauge(gaugePa))
        },
      ),
      { seed: 97 },
    )
  })

  test('both ends of the table belong to it', () => {
    expect(atGauge(-0.96325e5)).toBe(32.875)
    expect(atGauge(218.98675e5)).toBe(373.707)
  })

  test.each([-1e5, 219e5, Number.NaN, Number.POSITIVE_INFINITY])(
    '%d Pa is out of range and says so',
    (gaugePa) => {
      const saturation = saturationTemperatureC(steam, gaugePa)
      expect(saturation.ok ? '' : saturation.message).toMatch(
        /^a pressure from -0\.96 to 218\.99 bar gauge, .* or medium_c instead$/,
      )
    },
  )
})
