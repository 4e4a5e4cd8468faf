/** Films of worked examples, with the properties of air that the books print; each figure read in the text. */
import { describe } from 'vitest'
import { nusseltCylinderInWind } from '#solver/convection/forced.ts'
import {
  nusseltHorizontalCylinder,
  nusseltPlateDrivingFlow,
  nusseltPlateHinderedFlow,
  nusseltVerticalPlate,
} from '#solver/convection/natural.ts'
import { nusseltSphereInWind } from '#solver/convection/sphere.ts'
import { radiationWPerM2K } from '#solver/radiation.ts'
import { type PublishedRow, published } from '../../published.ts'

const cengel = 'Çengel, Heat and Mass Transfer, 5th edition, example'
const solutions = 'Çengel, Heat and Mass Transfer, printed solutions, problem'
const becauseRounded = 'the book goes on with its rounded Nusselt number'
/** The books take 0 °C as 273 K. */
const BOOK_ZERO_K = 273

describe('a pipe across the wind', () => {
  published(nusseltCylinderInWind, [
    {
      from: `${cengel} 7-5, steam pipe`,
      given: { reynolds: 4.219e4, prandtl: 0.7202 },
      printed: '124',
    },
    {
      from: `${solutions} 7-100, insulated steam pipe`,
      given: { reynolds: 3.254e4, prandtl: 0.7336 },
      printed: '107.0',
    },
    {
      from: 'Çengel, Cimbala and Turner, printed solutions, problem 19-35, steam pipe',
      given: { reynolds: 6.228e4, prandtl: 0.7232 },
      printed: '159.1',
    },
  ])

  interface Pipe {
    readonly windMPerS: number
    readonly diameterM: number
    readonly viscosityM2PerS: number
    readonly prandtl: number
    readonly conductivityWPerMK: number
  }
  const coefficient = ({ windMPerS, diameterM, viscosityM2PerS, prandtl, ...air }: Pipe): number =>
    (nusseltCylinderInWind({ reynolds: (windMPerS * diameterM) / viscosityM2PerS, prandtl }) *
      air.conductivityWPerMK) /
    diameterM
  const steamPipe: Pipe = {
    windMPerS: 8,
    diameterM: 0.1,
    viscosityM2PerS: 1.896e-5,
    prandtl: 0.7202,
    conductivityWPerMK: 0.02808,
  }
  published(coefficient, [
    {
      from: `${cengel} 7-5, coefficient`,
      given: steamPipe,
      printed: '34.8',
      within: { absolute: 0.15, because: becauseRounded },
    },
  ])
  published(
    (given: Pipe) => coefficient(given) * Math.PI * given.diameterM * (110 - 10),
    [
      {
        from: `${cengel} 7-5, loss per metre`,
        given: steamPipe,
        printed: '1093',
        within: { absolute: 5, because: becauseRounded },
      },
    ],
  )
})

describe('a sphere in the wind', () => {
  const ball = { reynolds: 4.802e4, prandtl: 0.7296, viscosityRatio: 1.849 / 2.76 }
  published(nusseltSphereInWind, [
    { from: `${cengel} 7-6, steel ball`, given: ball, printed: '135' },
    {
      from: `${solutions} 7-101, tank of liquid nitrogen`,
      given: { reynolds: 2.932e6, prandtl: 0.7309, viscosityRatio: 1.825e-5 / 5.023e-6 },
      printed: '2333',
    },
  ])
  published(
    (given: typeof ball) => (nusseltSphereInWind(given) * 0.02551) / 0.25,
    [{ from: `${cengel} 7-6, coefficient`, given: ball, printed: '13.8' }],
  )
  published(
    (given: typeof ball) => nusseltSphereInWind(given) * 0.02551 * 0.25 * Math.PI * (250 - 25),
    [
      {
        from: `${cengel} 7-6, heat flow`,
        given: ball,
        printed: '610',
        within: { absolute: 1, because: 'the book goes on with its rounded coefficient' },
      },
    ],
  )
})

interface Still {
  readonly hotC: number
  readonly coldC: number
  readonly lengthM: number
  readonly viscosityM2PerS: number
  readonly prandtl: number
}
const rayleighOf = ({ hotC, coldC, lengthM, viscosityM2PerS, prandtl }: Still): number =>
  ((9.81 / ((hotC + coldC) / 2 + BOOK_ZERO_K)) * (hotC - coldC) * lengthM ** 3 * prandtl) /
  viscosityM2PerS ** 2

describe('a hot-water pipe lying in still air', () => {
  const pipe: Still = {
    hotC: 70,
    coldC: 20,
    lengthM: 0.08,
    viscosityM2PerS: 1.75e-5,
    prandtl: 0.7241,
  }
  const nusselt = (given: Still): number =>
    nusseltHorizontalCylinder({ rayleigh: rayleighOf(given), prandtl: given.prandtl })
  const row = (what: string, printed: string): PublishedRow<Still> => ({
    from: `${cengel} 9-1, ${what}`,
    given: pipe,
    printed,
  })
  published(nusselt, [row('Nusselt number', '17.39')])
  published(
    (given: Still) => (nusselt(given) * 0.02699) / 0.08,
    [
      {
        ...row('coefficient', '5.867'),
        within: { absolute: 0.002, because: becauseRounded },
      },
    ],
  )
  published(
    (given: Still) => nusselt(given) * 0.02699 * Math.PI * 6 * (given.hotC - given.coldC),
    [row('convection of 6 m', '442')],
  )
  published(
    ({ hotC, coldC }: Still) =>
      radiationWPerM2K(1, hotC + BOOK_ZERO_K - 273.15, coldC + BOOK_ZERO_K - 273.15) *
      (hotC - coldC) *
      Math.PI *
      0.08 *
      6,
    [row('radiation of 6 m', '553')],
  )
})

describe('a hot plate in still air', () => {
  const standing: Still = {
    hotC: 90,
    coldC: 30,
    lengthM: 0.6,
    viscosityM2PerS: 1.896e-5,
    prandtl: 0.7202,
  }
  const lying: Still = { ...standing, lengthM: 0.15 }
  const vertical = (given: Still): number =>
    nusseltVerticalPlate({ rayleigh: rayleighOf(given), prandtl: given.prandtl })
  const down = (given: Still): number =>
    nusseltPlateHinderedFlow({ rayleigh: rayleighOf(given), prandtl: given.prandtl })
  const wattsOf = (nusselt: (given: Still) => number) => (given: Still) =>
    ((nusselt(given) * 0.02808) / given.lengthM) * 0.36 * (given.hotC - given.coldC)

  published(vertical, [{ from: `${cengel} 9-2, vertical`, given: standing, printed: '113.3' }])
  published(wattsOf(vertical), [
    { from: `${cengel} 9-2, vertical, heat flow`, given: standing, printed: '115' },
  ])
  published(down, [
    {
      from: `${cengel} 9-2, facing down`,
      given: lying,
      printed: '15.87',
      within: { absolute: 0.006, because: 'the book rounds its Rayleigh number to 1.195e7' },
    },
  ])
  published(wattsOf(down), [
    { from: `${cengel} 9-2, facing down, heat flow`, given: lying, printed: '64.2' },
  ])
  published(
    (rayleigh: number) => nusseltVerticalPlate({ rayleigh, prandtl: 0.7256 }),
    [{ from: `${solutions} 9-19E, vertical plate`, given: 5.503e8, printed: '102.6' }],
  )
})

// The library takes the same two lines as the handbook for plates of high Rayleigh number.
describe('a lying plate', () => {
  const from = 'check value of a public heat-transfer library, McAdams, plate'
  const flow = (grashof: number, prandtl: number) => ({ rayleigh: grashof * prandtl, prandtl })
  published(nusseltPlateDrivingFlow, [
    { from: `${from} facing up`, given: flow(3.21e8, 5.54), printed: '181.73121274384457' },
    { from: `${from} facing up`, given: flow(3.21e8, 0.01), printed: '22.857041558492334' },
  ])
  published(nusseltPlateHinderedFlow, [
    { from: `${from} facing down`, given: flow(3.21e8, 5.54), printed: '55.44564799362829' },
    { from: `${from} facing down`, given: flow(3.21e8, 0.01), printed: '11.428520779246167' },
  ])
})
