/** What every formula says of itself: its printed equation is what it computes, and its range is that of its source. */
import { describe, expect, test } from 'vitest'
import { nusseltCylinderInWind, nusseltPlateInWind } from '#solver/convection/forced.ts'
import { nusseltInside, nusseltTurbulentInside } from '#solver/convection/inside.ts'
import {
  nusseltHorizontalCylinder,
  nusseltPlateDrivingFlow,
  nusseltPlateHinderedFlow,
  nusseltSlenderCylinder,
  nusseltVerticalPlate,
} from '#solver/convection/natural.ts'
import {
  branchUsed,
  simplifiedFreePipe,
  simplifiedFreeWall,
  simplifiedWindOnPipe,
  simplifiedWindOnWall,
} from '#solver/convection/simplified.ts'
import { nusseltSphere, nusseltSphereInWind } from '#solver/convection/sphere.ts'
import { outOfRange } from '#solver/correlation.ts'
import { clearSky } from '#solver/sky.ts'
import { calculate } from '../report/calculator.ts'

/** The formulas of an equation that has several, without the words that say where each holds. */
function formulasOf(equation: string): string[] {
  return equation
    .replace(/^(Nu|h|T) = /, '')
    .replace(', both in K', '')
    .split('; ')
    .map((piece) => piece.replace(/ (to|above|where|from) .*$/, '').replace(/ above$/, ''))
}

/** As the calculator of the tests reads it: one kind of bracket, and every product with its sign. */
function withProducts(formula: string): string {
  return formula
    .replaceAll(/[[{]/g, '(')
    .replaceAll(/[\]}]/g, ')')
    .replaceAll('²', '^2')
    .replaceAll('⁴', '^4')
    .replaceAll('·', '×')
    .replaceAll(/([\p{L}\p{N})]) ?(?=\()/gu, '$1 × ')
    .replaceAll(/([\p{L}\p{N})]) (?=[\p{L}\p{N}(])/gu, '$1 × ')
    .replaceAll(/(?<=[\d)])(?=[A-ZΔv])/gu, ' × ')
}

interface Told {
  readonly pedigree: {
    readonly name: string
    readonly source: string
    readonly equation: string
    readonly valid: object
  }
}

interface Row {
  readonly of: Told
  readonly name: string
  readonly source: string
  readonly valid: Readonly<Record<string, readonly [number, number]>>
  /** For each formula of the equation what its symbols are, and what the function gives there. */
  readonly at: readonly (readonly [Readonly<Record<string, number>>, number])[]
}

const free = (
  nusselt: (flow: { rayleigh: number; prandtl: number }) => number,
  rayleigh: number,
): Row['at'][number] => [{ Ra: rayleigh, Pr: 4.1 }, nusselt({ rayleigh, prandtl: 4.1 })]
const wind = (
  nusselt: (flow: { reynolds: number; prandtl: number }) => number,
  reynolds: number,
): Row['at'][number] => [{ Re: reynolds, Pr: 4.1 }, nusselt({ reynolds, prandtl: 4.1 })]

// Ranges as in the texts named, or, of the simplified forms, those that the module itself gives reasons for.
const rows: readonly Row[] = [
  {
    of: nusseltHorizontalCylinder,
    name: 'Churchill-Chu, horizontal cylinder',
    source: 'churchillChu1975cylinder',
    valid: { rayleigh: [1e-6, 1e13] },
    at: [free(nusseltHorizontalCylinder, 3e6)],
  },
  {
    of: nusseltVerticalPlate,
    name: 'Churchill-Chu, vertical plate',
    source: 'churchillChu1975plate',
    valid: { rayleigh: [0.1, 1e12] },
    at: [free(nusseltVerticalPlate, 3e6)],
  },
  {
    of: nusseltSlenderCylinder,
    name: 'Le Fevre-Ede, vertical cylinder',
    source: 'leFevreEde1956',
    valid: { rayleigh: [0, 1e9] },
    at: [
      [
        { Ra: 2e7, Pr: 4.1, L: 3, D: 0.06 },
        nusseltSlenderCylinder({ rayleigh: 2e7, prandtl: 4.1, slenderness: 50 }),
      ],
    ],
  },
  {
    of: nusseltPlateDrivingFlow,
    name: 'Horizontal surface, warm up or cold down',
    source: 'ashrae2021ch4',
    valid: { rayleigh: [1, 1e11] },
    at: [50, 900, 3e6, 5e9].map((rayleigh) => free(nusseltPlateDrivingFlow, rayleigh)),
  },
  {
    of: nusseltPlateHinderedFlow,
    name: 'Horizontal surface, warm down or cold up',
    source: 'ashrae2021ch4',
    valid: { rayleigh: [1e5, 1e10] },
    at: [free(nusseltPlateHinderedFlow, 3e7)],
  },
  {
    of: nusseltSphere,
    name: 'Churchill, sphere',
    source: 'churchill1983sphere',
    valid: { rayleigh: [0, 1e13] },
    at: [free(nusseltSphere, 3e8)],
  },
  {
    of: nusseltSphereInWind,
    name: 'Whitaker, sphere in wind',
    source: 'whitaker1972',
    valid: { reynolds: [3.5, 7.6e4], prandtl: [0.68, 380] },
    at: [
      [
        { Re: 3e4, Pr: 4.1, μ: 3, μs: 2 },
        nusseltSphereInWind({ reynolds: 3e4, prandtl: 4.1, viscosityRatio: 1.5 }),
      ],
    ],
  },
  {
    of: nusseltCylinderInWind,
    name: 'Churchill-Bernstein, cylinder in crossflow',
    source: 'churchillBernstein1977',
    valid: { reynolds: [0.3, 1e7] },
    at: [wind(nusseltCylinderInWind, 3e4)],
  },
  {
    of: nusseltPlateInWind,
    name: 'Plate in parallel wind',
    source: 'ashrae2021ch4',
    valid: { reynolds: [0, 1e8], prandtl: [0.6, 60] },
    at: [wind(nusseltPlateInWind, 3e6), wind(nusseltPlateInWind, 3e3)],
  },
  {
    of: nusseltTurbulentInside,
    name: 'Gnielinski, turbulent flow in a pipe',
    source: 'gnielinski1976',
    valid: { reynolds: [3000, 5e6], prandtl: [0.5, 2000] },
    at: [
      [
        { Re: 3e4, Pr: 4.1, f: 0.006 },
        nusseltTurbulentInside({ reynolds: 3e4, prandtl: 4.1, friction: 0.006 }),
      ],
    ],
  },
  {
    of: simplifiedFreePipe,
    name: 'ISO 12241 form, horizontal pipe in still air',
    source: 'iso12241form',
    valid: { differenceK: [0, 100] },
    at: [
      [{ Δθ: 30, D: 0.2 }, simplifiedFreePipe({ differenceK: 30, diameterM: 0.2 })],
      [{ Δθ: 30, D: 2 }, simplifiedFreePipe({ differenceK: 30, diameterM: 2 })],
    ],
  },
  {
    of: simplifiedFreeWall,
    name: 'ISO 12241 form, vertical wall or pipe in still air',
    source: 'iso12241form',
    valid: { differenceK: [0, 100] },
    at: [
      [{ Δθ: 30, H: 0.2 }, simplifiedFreeWall({ differenceK: 30, heightM: 0.2 })],
      [{ Δθ: 30, H: 2 }, simplifiedFreeWall({ differenceK: 30, heightM: 2 })],
    ],
  },
  {
    of: simplifiedWindOnWall,
    name: 'ISO 12241 form, plane wall in wind',
    source: 'iso12241form',
    valid: { windMPerS: [0, 30] },
    at: [
      [{ v: 3, H: 2 }, simplifiedWindOnWall({ windMPerS: 3, lengthM: 2 })],
      [{ v: 6, H: 2 }, simplifiedWindOnWall({ windMPerS: 6, lengthM: 2 })],
    ],
  },
  {
    of: simplifiedWindOnPipe,
    name: 'ISO 12241 form, pipe in wind',
    source: 'iso12241form',
    valid: { windMPerS: [0, 30] },
    at: [
      [{ v: 1, D: 0.06 }, simplifiedWindOnPipe({ windMPerS: 1, diameterM: 0.06 })],
      [{ v: 3, D: 0.2 }, simplifiedWindOnPipe({ windMPerS: 3, diameterM: 0.2 })],
    ],
  },
  {
    of: clearSky,
    name: 'Swinbank, clear sky',
    source: 'clearSkySwinbank1963',
    valid: { airC: [-10, 40] },
    at: [[{ T_air: 288.15 }, clearSky({ airC: 15 }) + 273.15]],
  },
]

describe.each(rows)('$name', ({ of: { pedigree }, name, source, valid, at }) => {
  test('computes what its equation says', () => {
    const formulas = formulasOf(pedigree.equation)
    expect(formulas).toHaveLength(at.length)
    for (const [index, [symbols, computed]] of at.entries()) {
      const again = calculate(withProducts(formulas[index] ?? ''), new Map(Object.entries(symbols)))
      expect(computed / again, formulas[index]).toBeCloseTo(1, 9)
    }
  })

  test('says its name, its source and where it holds', () => {
    expect(pedigree).toMatchObject({ name, source })
    expect(pedigree.valid).toEqual(valid)
  })
})

test('flow in a smooth pipe or duct says where each of its three formulas serves', () => {
  const { name, source, equation, valid } = nusseltInside.pedigree
  expect(name).toBe('Flow in a smooth pipe or duct')
  expect(source).toBe('ashrae2021ch4')
  const [, laminar = '', to = '', from = ''] =
    /^Nu = ([\d.]+) to Re (\d+); Gnielinski from Re (\d+);/.exec(equation) ?? []
  expect([laminar, to, from]).toEqual(['3.66', '2300', '4000'])
  expect(nusseltInside({ reynolds: Number(to), prandtl: 0.7 })).toBe(Number(laminar))
  expect(valid).toEqual({ reynolds: [0, 5e6], prandtl: [0.5, 2000] })
})

test('each simplified formula names the number that decides between its branches', () => {
  const numbers = [
    branchUsed(simplifiedFreePipe, { differenceK: 30, diameterM: 2 }),
    branchUsed(simplifiedFreeWall, { differenceK: 30, heightM: 2 }),
    branchUsed(simplifiedWindOnWall, { windMPerS: 3, lengthM: 2 }),
    branchUsed(simplifiedWindOnPipe, { windMPerS: 3, diameterM: 2 }),
  ]
  expect(numbers.map(({ number }) => number)).toEqual([
    'D³Δθ in m³K',
    'H³Δθ in m³K',
    'vH in m²/s',
    'vD in m²/s',
  ])
  expect(numbers.map(({ value }) => value)).toEqual([240, 240, 6, 6])
})

test('what left its range is named in words, with its unit', () => {
  const sentences = [
    ...outOfRange(nusseltPlateInWind, { reynolds: 2e8, prandtl: 70 }),
    ...outOfRange(simplifiedFreePipe, { differenceK: 150, diameterM: 0.1 }),
    ...outOfRange(simplifiedWindOnPipe, { windMPerS: 40, diameterM: 0.1 }),
    ...outOfRange(clearSky, { airC: 50 }),
  ]
  expect(sentences.map((text) => /: (.*) is outside its range (.*);/.exec(text)?.slice(1))).toEqual(
    [
      ['Reynolds number 2 × 10⁸', '0 to 1 × 10⁸'],
      ['Prandtl number 70', '0.6 to 60'],
      ['temperature difference in K 150', '0 to 100'],
      ['wind in m/s 40', '0 to 30'],
      ['air temperature in °C 50', '−10 to 40'],
    ],
  )
})
