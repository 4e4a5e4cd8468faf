/** Worked examples of textbooks as their published companion calculations give them; the books take 0 °C as 273 K. */
import { describe } from 'vitest'
import { radiationWPerM2K } from '#solver/radiation.ts'
import { published } from '../published.ts'

const ABSOLUTE_ZERO_C = -273.15

describe('emissive power and irradiation', () => {
  published(
    ({ emissivity, surfaceC }: { emissivity: number; surfaceC: number }) =>
      radiationWPerM2K(emissivity, surfaceC, ABSOLUTE_ZERO_C) * (surfaceC - ABSOLUTE_ZERO_C),
    [
      {
        from: 'Incropera 1.2, emissive power of a steam pipe',
        given: { emissivity: 0.8, surfaceC: 473 - 273.15 },
        printed: '2270',
        within: { absolute: 5, because: 'three digits printed' },
      },
      {
        from: 'Incropera 1.2, irradiation from the room',
        given: { emissivity: 1, surfaceC: 298 - 273.15 },
        printed: '447',
      },
    ],
  )
})

describe('pipes by radiation, and by radiation with a given film', () => {
  type Pipe = {
    diameterM: number
    hotC: number
    coldC: number
    emissivity: number
    filmWPerM2K: number
  }
  published(
    ({ diameterM, hotC, coldC, emissivity, filmWPerM2K }: Pipe) =>
      Math.PI *
      diameterM *
      (filmWPerM2K + radiationWPerM2K(emissivity, hotC, coldC)) *
      (hotC - coldC),
    [
      {
        from: 'Incropera 1.2, loss of a steam pipe',
        given: { diameterM: 0.07, hotC: 200, coldC: 25, emissivity: 0.8, filmWPerM2K: 15 },
        printed: '998',
        within: { absolute: 1, because: 'the book takes 0 °C as 273 K' },
      },
      {
        from: 'Murphy and McKay 4.8, loss of a bare pipe',
        given: { diameterM: 0.1, hotC: 109.85, coldC: 14.85, emissivity: 0.9, filmWPerM2K: 0 },
        printed: '235',
      },
    ],
  )
})

describe('radiation coefficient of a sphere', () => {
  published(
    ({ surfaceC, surroundingsC }: { surfaceC: number; surroundingsC: number }) =>
      radiationWPerM2K(1, surfaceC, surroundingsC),
    [
      {
        from: 'Çengel 3-7 (from memory)',
        given: { surfaceC: 278 - 273.15, surroundingsC: 295 - 273.15 },
        printed: '5.34',
      },
    ],
  )
})
