/**
 * Conduction through layered walls with films of given coefficients: worked examples of textbooks as their published
 * companion calculations give them, through the whole of `solve` with fixed coefficients.
 */
import { describe } from 'vitest'
import { solve } from '#solver/solve.ts'
import type { Shape } from '#solver/types.ts'
import { type PublishedRow, published } from '../published.ts'
import { constant, plainFilm, still } from './systems.ts'

interface Example {
  /** Null for a flat wall. */
  readonly innerRadiusM: number | null
  /** Thickness [m] and conductivity, inside to outside. */
  readonly layers: readonly (readonly [thicknessM: number, conductivityWPerMK: number])[]
  readonly insideC: number
  readonly outsideC: number
  readonly insideFilmWPerM2K?: number
  readonly outsideFilmWPerM2K?: number
}

/** A film that lets through whatever comes, where the example has none. */
const NO_RESISTANCE_W_PER_M2_K = 1e9

/** Heat flux on the outer area [W/m²], heat loss per metre [W/m], temperatures of the layers' borders [°C]. */
function worked(given: Example): { flux: number; perM: number; bordersC: number[] } {
  const { innerRadiusM, insideC, outsideC, insideFilmWPerM2K, outsideFilmWPerM2K } = given
  const shape: Shape =
    innerRadiusM === null
      ? { kind: 'flat', facing: 'vertical', characteristicLengthM: 1 }
      : { kind: 'pipe', outerDiameterM: 2 * innerRadiusM, orientation: 'horizontal' }
  const solution = solve({
    ...plainFilm,
    shape,
    layers: given.layers.map((layer) => constant(...layer)),
    mediumC: insideC,
    insideFilmWPerM2K: insideFilmWPerM2K ?? null,
    film: { fixedWPerM2K: outsideFilmWPerM2K ?? NO_RESISTANCE_W_PER_M2_K },
    around: still(outsideC),
  })
  return {
    flux: solution.heatFluxWPerM2,
    perM: solution.heatLossWPerM ?? Number.NaN,
    bordersC: [...solution.interfaceTempsC],
  }
}

const row = (
  from: string,
  given: Example,
  printed: string,
  within?: PublishedRow<Example>['within'],
): PublishedRow<Example> => ({ from, given, printed, ...(within ? { within } : {}) })

const kelvin = (temperatureK: number): number => temperatureK - 273.15
const radii =
  (...radiiM: readonly number[]) =>
  (λs: readonly number[]): Pick<Example, 'innerRadiusM' | 'layers'> => ({
    innerRadiusM: radiiM[0] ?? 0,
    layers: λs.map((λ, j) => [(radiiM[j + 1] ?? 0) - (radiiM[j] ?? 0), λ]),
  })
const flat = (...layers: Example['layers']): Pick<Example, 'innerRadiusM' | 'layers'> => ({
  innerRadiusM: null,
  layers,
})

const furnace = { ...flat([0.15, 1.7]), insideC: 1400, outsideC: 1150 }
const tank = { ...flat([0.005, 45], [0.05, 0.04]), insideC: 100, outsideC: 25 }
const coldRoom = {
  ...flat([0.0127, 0.151], [0.1016, 0.0433], [0.0762, 0.768]),
  insideC: kelvin(255.4),
  outsideC: kelvin(297.1),
}
const kiln = { ...flat([0.5, 1.4], [0.161, 0.35]), insideC: 1200, outsideC: 15 }
const oven = {
  ...flat([0.2, 1.4], [0.1, 0.21], [0.2, 0.7]),
  insideC: kelvin(1200),
  outsideC: kelvin(330),
}

describe('heat flux through flat walls', () => {
  published(
    (given: Example) => worked(given).flux * 0.6,
    [row('Incropera 1.1, furnace wall of 0.6 m²', furnace, '1700')],
  )
  published(
    (given: Example) => worked(given).flux,
    [
      row('Murphy and McKay 4.2, lagged tank', tank, '60'),
      row('Geankoplis 4.3-1, cold room', coldRoom, '-16.48'),
      row('Sachdeva 3.8, kiln', kiln, '1450', {
        absolute: 1,
        because: 'the thickness that gives it is printed in millimetres',
      }),
      row('Coulson and Richardson 9.3, furnace', oven, '961', {
        absolute: 1,
        because: 'the book rounds its resistances',
      }),
    ],
  )
  published(
    (given: Example) => worked(given).bordersC[1] ?? Number.NaN,
    [
      row('Geankoplis 4.3-1, behind the inner board', coldRoom, (256.79 - 273.15).toFixed(2)),
      row('Coulson and Richardson 9.3, behind the fire brick', oven, (1063 - 273.15).toFixed(2), {
        absolute: 0.5,
        because: 'printed in whole kelvin',
      }),
    ],
  )
})

const steamPipe = { ...radii(0.01, 0.02, 0.05)([19, 0.2]), insideC: 600, outsideC: 100 }
const lagged320 = {
  ...radii(0.025, 0.0275, 0.0575)([80, 0.05]),
  insideFilmWPerM2K: 60,
  outsideFilmWPerM2K: 18,
  insideC: 320,
  outsideC: 5,
}
const plasticPipe = {
  ...radii(0.015, 0.02)([0.5]),
  insideFilmWPerM2K: 300,
  outsideFilmWPerM2K: 10,
  insideC: 200,
  outsideC: 30,
}
const tube = {
  ...radii(0.0127, 0.0254, 0.0508)([21.63, 0.2423]),
  insideC: kelvin(811),
  outsideC: kelvin(310.8),
}
const hotWater = { ...radii(0.025, 0.028, 0.068)([26, 0.038]), insideC: 105, outsideC: 25 }
const steamLine = {
  ...radii(0.011, 0.013)([19]),
  insideFilmWPerM2K: 190,
  outsideFilmWPerM2K: 14,
  insideC: 124,
  outsideC: 2,
}
const steamLineLagged = { ...steamLine, ...radii(0.011, 0.013, 0.038)([19, 0.2]) }
const gas = {
  ...radii(0.05, 0.06, 0.09)([58, 0.2]),
  insideFilmWPerM2K: 720,
  outsideFilmWPerM2K: 9,
  insideC: 85,
  outsideC: 25,
}
const goodInside = {
  ...radii(0.05, 0.055, 0.105, 0.155)([50, 0.06, 0.12]),
  insideC: 250,
  outsideC: 50,
}
const goodOutside = {
  ...radii(0.05, 0.055, 0.105, 0.155)([50, 0.12, 0.06]),
  insideC: 250,
  outsideC: 50,
}
const twoLayers = { ...radii(0.044, 0.094, 0.124)([0.087, 0.064]), insideC: 350, outsideC: 40 }
const rod = { outsideFilmWPerM2K: 140, insideC: 200, outsideC: 25 }

/** IP example: diameters in inches, conductivity in Btu/(h·ft·°F), temperatures in °F, result in Btu/(h·ft). */
const ip = (
  innerIn: number,
  layers: Example['layers'],
  insideC: number,
  outsideC: number,
): Example => ({
  innerRadiusM: innerIn / 2 / 12,
  layers: layers.map(([inches, λ]) => [inches / 12, λ]),
  insideC,
  outsideC,
})

describe('heat loss of pipes per metre', () => {
  published(
    (given: Example) => worked(given).perM,
    [
      row('Holman 2-2, steel tube with asbestos', steamPipe, '680'),
      row('Çengel 3-8, lagged steam pipe', lagged320, '121'),
      row('Kreith 2.3, plastic pipe', plasticPipe, '184'),
      row('Theodore 19.10, bare steam line', steamLine, '128.1', {
        absolute: 0.06,
        because: '128.15 printed to one digit',
      }),
      row('Theodore 19.10, lagged steam line', steamLineLagged, '99.2'),
      row('Sachdeva 3.13, lagged pipe', gas, '114.4', {
        absolute: 0.1,
        because: 'the book rounds its logarithms',
      }),
      row('Sachdeva 3.14, good lagging inside', goodInside, '89.6'),
      row('Sachdeva 3.15, good lagging outside', goodOutside, '105.7', {
        absolute: 0.07,
        because: 'the book rounds its logarithms',
      }),
      row('Gavhane 2.3, two layers', twoLayers, '149.2'),
      row('Jakob and Hawkins 3.3, Btu/(h·ft)', ip(2.375, [[1, 0.0375]], 380, 80), '116'),
      row(
        'Jakob and Hawkins 3.4, Btu/(h·ft)',
        ip(
          10.75,
          [
            [1.5, 0.05],
            [2, 0.039],
          ],
          700,
          110,
        ),
        '323',
      ),
    ],
  )
  published(
    (given: Example) => worked(given).perM * 0.305,
    [row('Geankoplis 4.3-2, 0.305 m of tube', tube, '331.4')],
  )
  published(
    (given: Example) => worked(given).perM * 15,
    [row('Murphy and McKay 4.3, 15 m of pipe', hotWater, '323')],
  )
  published(
    (given: Example) => worked(given).perM * 2.5,
    [
      row('Theodore 19.9, bare rod of 2.5 m', { ...radii(0.005)([]), ...rod }, '1924'),
      row(
        'Theodore 19.9, rod lagged to the critical radius',
        { ...radii(0.005, 0.01)([1.4]), ...rod },
        '2273',
      ),
    ],
  )
})

describe('temperatures between the layers', () => {
  published(
    (given: Example) => worked(given).bordersC[1] ?? Number.NaN,
    [
      row('Holman 2-2, between steel and asbestos (from memory)', steamPipe, '595.8', {
        absolute: 0.3,
        because: 'the book rounds the heat flow to 680 W/m',
      }),
      row('Theodore 19.10, under the lagging of the steam line', steamLineLagged, '116.3'),
      row('Geankoplis 4.3-2, between the layers', tube, (805.5 - 273.15).toFixed(2), {
        absolute: 0.06,
        because: 'printed in tenths of a kelvin',
      }),
    ],
  )
  published(
    (given: Example) => worked(given).bordersC[2] ?? Number.NaN,
    [row('Sachdeva 3.14, between the layers', goodInside, '96.3')],
  )
  published(
    (given: Example) => {
      const { bordersC } = worked(given)
      return (bordersC[0] ?? Number.NaN) - (bordersC[1] ?? Number.NaN)
    },
    [row('Çengel 3-8, across the pipe wall', lagged320, '0.02')],
  )
  published(
    (given: Example) => {
      const { bordersC } = worked(given)
      return (bordersC[1] ?? Number.NaN) - (bordersC[2] ?? Number.NaN)
    },
    [row('Çengel 3-8, across the lagging', lagged320, '284')],
  )
})

const asbestosPipe = { outsideFilmWPerM2K: 3, insideC: 200, outsideC: 20 }
const wire = { outsideFilmWPerM2K: 20, insideC: kelvin(400), outsideC: kelvin(300) }

describe('the critical radius λ/h', () => {
  published(
    (given: Example) => worked(given).perM,
    [
      row('Holman 2-5, bare pipe', { ...radii(0.025)([]), ...asbestosPipe }, '84.8'),
      row(
        'Holman 2-5, lagged to 56.7 mm',
        { ...radii(0.025, 0.17 / 3)([0.17]), ...asbestosPipe },
        '105.7',
      ),
      row('Geankoplis 4.3-5, bare wire', { ...radii(0.00075)([]), ...wire }, '9.42'),
      row(
        'Geankoplis 4.3-5, covered wire',
        { ...radii(0.00075, 0.00325)([0.4]), ...wire },
        '32.98',
      ),
    ],
  )
  // At λ/h the loss is at its peak: the slope of the resistance vanishes there.
  published(
    ({
      conductivityWPerMK,
      filmWPerM2K,
      innerRadiusM,
    }: {
      conductivityWPerMK: number
      filmWPerM2K: number
      innerRadiusM: number
    }) => {
      const loss = (radiusM: number) =>
        worked({
          ...radii(innerRadiusM, radiusM)([conductivityWPerMK]),
          outsideFilmWPerM2K: filmWPerM2K,
          insideC: 100,
          outsideC: 0,
        }).perM
      let [low, high] = [innerRadiusM, 40 * innerRadiusM]
      for (let i = 0; i < 100; i += 1) {
        const step = (high - low) / 3
        if (loss(low + step) < loss(high - step)) low += step
        else high -= step
      }
      return 1000 * low
    },
    [
      {
        from: 'Holman 2-5, radius of most loss [mm]',
        given: { conductivityWPerMK: 0.17, filmWPerM2K: 3, innerRadiusM: 0.025 },
        printed: '56.7',
      },
      {
        from: 'Çengel 3-9, radius of most loss [mm]',
        given: { conductivityWPerMK: 0.15, filmWPerM2K: 12, innerRadiusM: 0.0015 },
        printed: '12.5',
      },
      {
        from: 'Geankoplis 4.3-5, radius of most loss [mm]',
        given: { conductivityWPerMK: 0.4, filmWPerM2K: 20, innerRadiusM: 0.00075 },
        printed: '20',
      },
      {
        from: 'Theodore 19.9, radius of most loss [mm]',
        given: { conductivityWPerMK: 1.4, filmWPerM2K: 140, innerRadiusM: 0.005 },
        printed: '10',
      },
    ],
  )
})

describe('a heated wire', () => {
  // Çengel 3-9: 80 W in 5 m of 3 mm wire under 2 mm of plastic; the resistance of the covering and its film.
  published(
    (given: Example) => {
      const { perM } = worked({ ...given, insideC: 1, outsideC: 0 })
      return given.outsideC + 80 / 5 / perM
    },
    [
      row(
        'Çengel 3-9, under the plastic',
        { ...radii(0.0015, 0.0035)([0.15]), outsideFilmWPerM2K: 12, insideC: 0, outsideC: 30 },
        '105',
      ),
    ],
  )
})
