/** Heat capacity, density and latent heat of what flows, linear between the states of the catalogue. */
import { between, type Figure, figureText, known, type Point, rising, unknown } from './figure.ts'
import type { Catalogue, SteamState } from './types.ts'

export type MediumWord = 'water' | 'steam' | 'air' | 'glycol' | 'oil' | 'other'

export interface MediumAt {
  readonly medium: MediumWord
  readonly temperatureC: number
}

/** Specific heat at constant pressure [J/(kg·K)]. */
export const heatCapacityOf = (catalogue: Catalogue, at: MediumAt): Figure =>
  figureOf(catalogue, at, {
    what: 'heat capacity',
    ofMedium: ({ specificHeatJPerKgK }) => specificHeatJPerKgK,
    ofSteam: ({ specificHeatVapourJPerKgK }) => specificHeatVapourJPerKgK,
    airIs: 'Air is taken as dry.',
  })

/** Density [kg/m³]. */
export const densityOf = (catalogue: Catalogue, at: MediumAt): Figure =>
  figureOf(catalogue, at, {
    what: 'density',
    ofMedium: ({ densityKgPerM3 }) => densityKgPerM3,
    ofSteam: ({ densityVapourKgPerM3 }) => densityVapourKgPerM3,
    airIs: 'Air is taken as dry and at 1.01325 bar.',
  })

/** Heat of vaporisation of saturated steam [J/kg]. */
export function latentHeatJPerKg(steam: readonly SteamState[], temperatureC: number): Figure {
  const points = steam.map((state): Point => [state.temperatureC, state.latentHeatJPerKg])
  return read(points, temperatureC, 'latent heat', 'steam', null)
}

type MediumState = Catalogue['media'][number]

interface Property {
  readonly what: string
  readonly ofMedium: (state: MediumState) => number | null
  readonly ofSteam: (state: SteamState) => number
  readonly airIs: string
}

/** Which rows stand for the word, and what that assumes. A mixture has to be named by its share by mass. */
const rowsFor = {
  water: { id: 'water', massFraction: null, assumption: null },
  glycol: {
    id: 'ethylene_glycol_aq',
    massFraction: 0.3,
    assumption: 'Glycol is taken as ethylene glycol in water, 30 % by mass.',
  },
  oil: {
    id: 'thermal_oil_mineral',
    massFraction: null,
    assumption:
      'Oil is taken as a generic mineral heat-transfer oil; the data sheet of the oil in the plant decides.',
  },
} as const

function figureOf(
  { media, steam }: Catalogue,
  { medium, temperatureC }: MediumAt,
  property: Property,
): Figure {
  const { what, ofMedium, ofSteam, airIs } = property
  if (medium === 'other')
    return unknown(
      `The ${what} of a medium given as "other" is not known: name water, steam, air, glycol or oil if it is one of them.`,
    )
  if (medium === 'steam') {
    const points = steam.map((state): Point => [state.temperatureC, ofSteam(state)])
    const assumption = 'Steam is taken as dry and saturated at its temperature.'
    return read(points, temperatureC, what, medium, assumption)
  }
  const { id, massFraction, assumption } =
    medium === 'air' ? { id: 'air', massFraction: null, assumption: airIs } : rowsFor[medium]
  const points = media.flatMap((state): Point[] => {
    const value = ofMedium(state)
    const isMeant = state.mediumId === id && state.massFraction === massFraction
    return isMeant && value !== null ? [[state.temperatureC, value]] : []
  })
  return read(points, temperatureC, what, medium, assumption)
}

function read(
  unsorted: readonly Point[],
  temperatureC: number,
  what: string,
  medium: string,
  assumption: string | null,
): Figure {
  const points = rising(unsorted)
  const value = between(points, temperatureC)
  if (value !== null) return known(value, assumption)
  const [first, last] = [points[0], points.at(-1)]
  return unknown(
    first && last
      ? `The ${what} of ${medium} is tabled from ${figureText(first[0])} to ${figureText(last[0])} °C, not at ${figureText(temperatureC)} °C.`
      : `The catalogue holds no ${what} of ${medium}.`,
  )
}
