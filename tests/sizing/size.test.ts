/** The choice, what governs it and where a limit passes, sentence by sentence of the contract. */
import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import type { Limits, Problem } from '#sizing/problem.ts'
import type { LimitName, LimitResult, Rating, RunResult } from '#sizing/result.ts'
import { size } from '#sizing/size.ts'
import { problemOf } from '../model/resolve/problem.ts'
import { once } from '../once.ts'
import { coldRun, mm, sized, steamRun } from './catalogue.ts'

const weighed: RunValues = { fuel: 'natural_gas', hoursPerYear: 8000, lengthM: 10 }
const unreached: RunValues = { reach: false, reachReason: 'in a shaft' }

const withLimits = (problem: Problem, limits: Partial<Limits>): Problem => ({
  ...problem,
  limits: { ...problem.limits, ...limits },
})
const rung = ({ ladder }: RunResult, thicknessMm: number): Rating => {
  const found = ladder.find(({ thicknessM }) => mm(thicknessM) === thicknessMm)
  if (!found) throw new Error(`No rung of ${thicknessMm} mm`)
  return found
}
const limitOf = ({ limits }: Rating, name: LimitName): LimitResult => {
  const found = limits.find(({ limit }) => limit === name)
  if (!found) throw new Error(`No ${name}`)
  return found
}

const priceNote = ({ notes }: RunResult): string | undefined =>
  notes.find(({ code }) => code === 'price-missing')?.text

describe('choice', () => {
  test('without money the thinnest passing rung', () => {
    const result = sized({ ...steamRun, mediumC: 350 })
    expect(result.chosen).toEqual(result.ladder.find(({ pass }) => pass))
    expect(result.chosen?.thicknessM).toBeGreaterThan(0.02)
  })

  test('with money the cheapest to own among the passing, wherever it stands', () => {
    for (const mediumC of [80, 150, 350]) {
      const result = sized({ ...steamRun, ...weighed, mediumC })
      const costs = result.ladder
        .filter(({ pass }) => pass)
        .map(({ money }) => money?.lifeCycle ?? Number.NaN)
      expect(result.chosen?.money?.lifeCycle).toBe(Math.min(...costs))
    }
  })

  test('a tie goes to the thinner', () => {
    const problem = problemOf({
      ...steamRun,
      ...weighed,
      mediumC: 350,
      finish: 'asj',
      fuelPricePerKWh: 0,
    })
    const free = { perM3: 0, perM2: 0, perM: 0, labourHoursPerM: 0, labourHoursPerM2: 0 }
    const layers = problem.layers.map((layer) => ({
      ...layer,
      material: {
        ...layer.material,
        price: layer.material.price && { ...layer.material.price, ...free },
      },
    }))
    const result = size({ ...problem, layers })
    expect(new Set(result.ladder.map(({ money }) => money?.lifeCycle)).size).toBe(1)
    expect(result.chosen).toEqual(result.ladder.find(({ pass }) => pass))
  })

  test('a failing rung is never chosen, however cheap', () => {
    // Hours so few that the thinnest is the cheapest.
    const result = sized({ ...steamRun, ...weighed, mediumC: 350, hoursPerYear: 10 })
    expect(result.money?.cheapestThicknessM).toBe(0.02)
    expect(result.chosen?.thicknessM).toBeGreaterThan(0.02)
    expect(result.chosen?.pass).toBe(true)
  })

  test('without a price the thinnest passing one, said in a note', () => {
    const { material: _, ...plain } = steamRun
    const result = sized({ ...plain, ...weighed, conductivityWPerMK: 0.04 })
    expect(result.chosen).toEqual(result.ladder.find(({ pass }) => pass))
    expect(result.chosen?.money).toBeNull()
    expect(priceNote(result)).toContain('thinnest passing thickness was taken')
  })

  test('a finish without a price is not for nothing', () => {
    const result = sized({ ...steamRun, ...weighed, finish: 'timber_board' })
    expect(result.ladder.every(({ money }) => money === null)).toBe(true)
    expect(priceNote(result)).toContain('No price is held')
  })

  test('of a fixed thickness without a price nothing was taken', () => {
    const { material: _, ...plain } = steamRun
    const result = sized({ ...plain, ...weighed, conductivityWPerMK: 0.04, thicknessM: 0.05 })
    expect(priceNote(result)).toContain('No price is held')
    expect(priceNote(result)).not.toContain('taken')
  })
})

describe('the passing set need not be contiguous', () => {
  // Below the critical radius λ/h a thicker layer loses more: 8 mm pipe, λ 0.4.
  const thin: RunValues = {
    tag: 'A',
    shape: 'pipe',
    outerDiameterM: 0.008,
    mediumC: 80,
    airC: 20,
    conductivityWPerMK: 0.4,
    ...unreached,
  }
  const losses = once(() =>
    sized({ ...thin, maxLossWPerM: 1000 }).ladder.map(({ heatLossWPerM }) => heatLossWPerM ?? 0),
  )

  test('the loss rises and falls', () => {
    expect(losses()[1]).toBeGreaterThan(losses()[0] ?? 0)
    expect(losses().at(-1)).toBeLessThan(losses()[0] ?? 0)
  })

  test('a limit between passes the ends and fails the middle; the thinnest is chosen', () => {
    const result = sized({ ...thin, maxLossWPerM: ((losses()[0] ?? 0) + (losses()[1] ?? 0)) / 2 })
    expect(result.ladder.map(({ pass }) => pass).slice(0, 2)).toEqual([true, false])
    expect(result.ladder.at(-1)?.pass).toBe(true)
    expect([mm(result.chosen?.thicknessM), result.governing]).toEqual([20, 'smallest'])
  })

  test('where the thinnest fails and the last passes, the first that passes, and the limit governs', () => {
    const result = sized({ ...thin, maxLossWPerM: ((losses()[0] ?? 0) + (losses()[4] ?? 0)) / 2 })
    expect(result.chosen).toEqual(result.ladder.find(({ pass }) => pass))
    expect(result.governing).toBe('loss')
  })
})

describe('governing', () => {
  test.each<[string, RunValues]>([
    ['touch', { ...steamRun, mediumC: 350 }],
    ['loss', { ...steamRun, maxLossWPerM: 40 }],
    ['loss', { ...steamRun, maxLossWPerM2: 90 }],
    ['damp', coldRun],
    ['money', { ...steamRun, ...weighed }],
    ['smallest', steamRun],
    ['fixed', { ...steamRun, thicknessM: 0.05 }],
    ['bare', { ...steamRun, thicknessM: 0 }],
    ['unmet', { ...steamRun, maxLossWPerM: 0.5 }],
    // The jacket of PVC stands 60 °C, which touch at 5 s would not ask of it.
    ['service', { ...steamRun, mediumC: 350, finish: 'pvc_jacket' }],
  ])('%s', (governing, values) => {
    expect(sized(values).governing).toBe(governing)
  })

  test('a limit governs only if the next thinner rung fails it', () => {
    // Touch rules out the thinnest; money goes far beyond it.
    const result = sized({ ...steamRun, ...weighed, mediumC: 250 })
    const [first] = result.ladder
    const at = result.ladder.findIndex(({ thicknessM }) => thicknessM === result.chosen?.thicknessM)
    expect(first?.pass).toBe(false)
    expect(result.ladder[at - 1]?.pass).toBe(true)
    expect(result.governing).toBe('money')
  })

  test('with money too, a limit that the next thinner rung fails governs', () => {
    const result = sized({ ...steamRun, ...weighed, mediumC: 350, hoursPerYear: 10 })
    expect(result.governing).toBe('touch')
  })

  test('of several, the one with the largest continuous thickness', () => {
    // 50 mm fails both below; the loss bound is drawn to either side of where touch ends.
    const base = { ...steamRun, mediumC: 350 }
    const touchOnly = sized(base)
    const chosenMm = mm(touchOnly.chosen?.thicknessM)
    const at = touchOnly.ladder.findIndex(({ thicknessM }) => mm(thicknessM) === chosenMm)
    const thinner = touchOnly.ladder[at - 1]
    const passesLoss = touchOnly.chosen?.heatLossWPerM ?? 0
    const failsLoss = thinner?.heatLossWPerM ?? 0
    const nearThinner = failsLoss - 0.02 * (failsLoss - passesLoss)
    const nearChosen = passesLoss + 0.02 * (failsLoss - passesLoss)
    const easy = sized({ ...base, maxLossWPerM: nearThinner })
    const hard = sized({ ...base, maxLossWPerM: nearChosen })
    for (const { chosen } of [easy, hard]) expect(mm(chosen?.thicknessM)).toBe(chosenMm)
    expect([easy.governing, hard.governing]).toEqual(['touch', 'loss'])
  })

  test('none passes: nothing chosen, and the limits of the thickest are shown', () => {
    const result = sized({ ...steamRun, maxLossWPerM: 0.5 })
    expect(result.chosen).toBeNull()
    expect(result.limits).toEqual(result.ladder.at(-1)?.limits)
  })

  test('a fixed thickness that fails is still the answer, and says so', () => {
    const result = sized({ ...steamRun, mediumC: 350, thicknessM: 0.02 })
    expect(result).toMatchObject({ governing: 'fixed', chosen: { thicknessM: 0.02, pass: false } })
    expect(result.ladder).toHaveLength(1)
  })

  test('a bare run: chosen equals bare', () => {
    const result = sized({ ...steamRun, thicknessM: 0 })
    expect(result.chosen).toEqual(result.bare)
    expect(result.ladder).toEqual([])
    expect(result.bare.thicknessM).toBe(0)
  })
})

describe('where a limit passes', () => {
  const hot = once(() => problemOf({ ...steamRun, mediumC: 300 }))
  const at50 = once(() => rung(size(hot()), 50))

  test('a stated surface temperature at or below it', () => {
    const at = (maxSurfaceC: number): boolean | undefined =>
      rung(size(withLimits(hot(), { burn: null, maxSurfaceC })), 50).pass
    expect(at(at50().touchSurfaceC)).toBe(true)
    expect(at(at50().touchSurfaceC - 1e-9)).toBe(false)
  })

  test('the burn curve only below it, unrounded', () => {
    const at = (thresholdC: number): boolean | undefined =>
      rung(
        size(withLimits(hot(), { burn: { thresholdC, contact: '5 s', surface: 's', read: null } })),
        50,
      ).pass
    expect(at(at50().touchSurfaceC)).toBe(false)
    expect(at(at50().touchSurfaceC + 1e-9)).toBe(true)
  })

  test('both given: each is judged', () => {
    const { limits } = rung(sized({ ...steamRun, mediumC: 300, maxSurfaceC: 40 }), 50)
    const touch = limits.filter(({ limit }) => limit === 'touch')
    expect(touch.map(({ bound }) => bound)).toEqual([40, expect.closeTo(57.27, 2)])
    expect(touch.map(({ pass }) => pass)).toEqual([false, true])
    expect(rung(sized({ ...steamRun, mediumC: 300, maxSurfaceC: 40 }), 50).pass).toBe(false)
  })

  test('a loss at or below it, per metre and per m²', () => {
    const loss = at50().heatLossWPerM ?? 0
    const passes = (limits: Partial<Limits>): boolean =>
      limitOf(rung(size(withLimits(hot(), limits)), 50), 'loss').pass
    expect(passes({ maxLossWPerM: loss })).toBe(true)
    expect(passes({ maxLossWPerM: loss - 1e-9 })).toBe(false)
    expect(passes({ maxLossWPerM2: at50().heatFluxWPerM2 })).toBe(true)
    expect(passes({ maxLossWPerM2: at50().heatFluxWPerM2 - 1e-9 })).toBe(false)
  })

  test('a gain is compared by its absolute value', () => {
    const result = sized({ ...coldRun, maxLossWPerM: 6 })
    const limit = limitOf(rung(result, 25), 'loss')
    expect(rung(result, 25).heatLossWPerM).toBeLessThan(0)
    expect(limit.value).toBeGreaterThan(0)
    expect(limit.pass).toBe(limit.value <= 6)
    expect(rung(result, 6).limits.find((found) => found.limit === 'loss')?.pass).toBe(false)
  })

  test('damp at or above dew point and margin', () => {
    const cold = problemOf(coldRun)
    const surfaceC = limitOf(rung(size(cold), 25), 'damp').value
    const at = (dewPointC: number): boolean =>
      limitOf(rung(size(withLimits(cold, { damp: { dewPointC, marginK: 1 } })), 25), 'damp').pass
    expect(at(surfaceC - 1)).toBe(true)
    expect(at(surfaceC - 1 + 1e-9)).toBe(false)
  })

  test('each limit says the condition it was judged at', () => {
    const { limits } = rung(sized({ ...coldRun, maxLossWPerM: 20 }), 25)
    expect(limits.map(({ limit, condition }) => [limit, condition])).toEqual(
      expect.arrayContaining([
        ['touch', 'touch'],
        ['loss', 'loss'],
        ['damp', 'damp'],
      ]),
    )
  })

  test('rectangular ducts are judged on the worst side, named', () => {
    const duct: RunValues = {
      tag: 'D',
      shape: 'rect-duct',
      size: '600 x 400',
      airC: 27,
      humidity: 0.75,
      finish: 'asj',
      material: 'glass_wool_slab',
      mediumC: 13,
    }
    const cold = limitOf(rung(sized(duct), 25), 'damp')
    expect(cold.what).toMatch(/side|top|bottom/)
    const hot = rung(sized({ ...duct, mediumC: 90 }), 25)
    expect(limitOf(hot, 'touch').what).toMatch(/side|top|bottom/)
    expect(limitOf(hot, 'touch').value).toBeGreaterThan(hot.surfaceTempC)
  })
})

describe('surfaces at and beyond the temperature of the medium', () => {
  test('a medium at the temperature of the air loses nothing', () => {
    const result = sized({ ...steamRun, mediumC: 20 })
    expect(result.governing).toBe('smallest')
    for (const { heatLossWPerM, surfaceTempC } of [result.bare, ...result.ladder]) {
      expect(Math.abs(heatLossWPerM ?? 1)).toBeLessThan(1e-9)
      expect(surfaceTempC).toBeCloseTo(20, 9)
    }
  })

  test('hot surroundings make a surface hotter than medium and air: judged for touch all the same', () => {
    const result = sized({
      ...steamRun,
      mediumC: 30,
      airC: 25,
      surroundingsC: 200,
      emissivity: 0.9,
    })
    const thin = rung(result, 20)
    expect(thin.surfaceTempC).toBeGreaterThan(30)
    expect(thin.heatLossWPerM).toBeLessThan(0)
    expect(limitOf(thin, 'touch').pass).toBe(false)
  })
})

describe('the bare run beside a lagged one', () => {
  test('is judged as bare metal, not as the jacket', () => {
    // 65 °C: below the threshold of plastic at 5 s, above that of metal.
    const result = sized({ ...steamRun, mediumC: 65, finish: 'pvc_jacket' })
    expect(limitOf(result.bare, 'touch')).toMatchObject({ pass: false, value: 65 })
    expect(limitOf(result.bare, 'touch').bound).toBeCloseTo(57.27, 2)
  })
})

describe('damp under a bright jacket', () => {
  const bright = once(() => sized({ ...coldRun, finish: 'al_plain' }))

  test('also gives the thickness with a matt finish', () => {
    expect(bright().governing).toBe('damp')
    expect(bright().mattThicknessM).toBeLessThan(bright().chosen?.thicknessM ?? 0)
    expect(bright().reason).toContain('matt')
    expect(bright().reason).toContain(`${mm(bright().mattThicknessM ?? 0)} mm`)
  })

  test('which is what a matt finish takes', () => {
    const matt = sized({ ...coldRun, emissivity: 0.9 })
    expect(bright().mattThicknessM).toBe(matt.chosen?.thicknessM)
    expect(matt.mattThicknessM).toBeNull()
  })

  // Where bright ends is a rule of the product: half of black.
  test.each([
    [0.5, true],
    [0.51, false],
  ])('an emissivity of %d is bright: %s', (emissivity, isBright) => {
    const result = sized({ ...coldRun, emissivity })
    expect(result.governing).toBe('damp')
    expect(result.mattThicknessM !== null).toBe(isBright)
  })

  test('not where something else governs', () => {
    expect(sized({ ...steamRun, mediumC: 350 }).mattThicknessM).toBeNull()
  })
})

describe('what a rung says', () => {
  const result = once(() => sized({ ...steamRun, lengthM: 12, hoursPerYear: 8000 }))
  const at50 = once(() => rung(result(), 50))

  test('the whole run: loss times length, heat over the hours', () => {
    expect(at50().heatLossW).toBeCloseTo(12 * (at50().heatLossWPerM ?? 0), 9)
    expect(at50().yearlyKWh).toBeCloseTo(8 * (at50().heatLossW ?? 0), 9)
    expect(rung(sized(steamRun), 50)).toMatchObject({ heatLossW: null, yearlyKWh: null })
    expect(rung(sized({ ...steamRun, lengthM: 12 }), 50)).toMatchObject({
      heatLossW: at50().heatLossW,
      yearlyKWh: null,
    })
  })

  test('flux on the outer area, made of convection and radiation', () => {
    expect(at50().outerDiameterM).toBeCloseTo(0.1603, 9)
    expect(at50().heatLossWPerM).toBeCloseTo(at50().heatFluxWPerM2 * Math.PI * 0.1603, 8)
    expect(
      (at50().convectionWPerM2K + at50().radiationWPerM2K) * (at50().surfaceTempC - 20),
    ).toBeCloseTo(at50().heatFluxWPerM2, 6)
  })

  test('interfaces inside to outside, one more than the layers', () => {
    const { material: _, ...plain } = steamRun
    const two = sized({ ...plain, mediumC: 350, layers: 'calcium_silicate:40;stone_wool_slab:50' })
    const temps = two.chosen?.interfaceTempsC ?? []
    expect(temps).toHaveLength(3)
    expect(temps[0]).toBeCloseTo(350, 6)
    expect([...temps].sort((a, b) => b - a)).toEqual(temps)
    expect(temps.at(-1)).toBeCloseTo(two.chosen?.surfaceTempC ?? 0, 9)
    expect(result().bare.interfaceTempsC).toEqual([150])
  })

  test('per-metre values are null for a flat surface, which counts per m²', () => {
    const { size: _, ...flat } = steamRun
    const wall = sized({
      ...flat,
      shape: 'flat',
      heightM: 2,
      widthM: 3,
      material: 'stone_wool_slab',
    })
    expect(wall.ladder[0]).toMatchObject({ heatLossWPerM: null, outerDiameterM: null })
    expect(wall.ladder[0]?.heatLossW).toBeCloseTo(6 * (wall.ladder[0]?.heatFluxWPerM2 ?? 0), 9)
  })

  test('inch series: true thickness and nominal', () => {
    const inch = sized({ ...steamRun, steps: 'inch' })
    expect(inch.ladder.every(({ nominalThicknessM }) => nominalThicknessM !== null)).toBe(true)
    expect(result().ladder.every(({ nominalThicknessM }) => nominalThicknessM === null)).toBe(true)
  })
})
