/** Heat capacity, density and latent heat of what flows, linear between the states of the catalogue. */
import {
  between,
  type Figure,
  figureText,
  known,
  type Point,
  readAt,
  rising,
  unknown,
} from './figure.ts'
import type { Catalogue, SteamState } from './types.ts'

export type MediumWord = 'water' | 'steam' | 'air' | 'glycol' | 'oil' | 'other'

export interface MediumAt {
  readonly medium: MediumWord
  readonly temperatureC: number
}

/** Specific heat at constant pressure [J/(kg·K)]. */
export const heatCapacityOf = (catalogue: Catalogue, at: MediumAt): Figure =>
  figureOf(catalogue, at, heatCapacity)

/** The states that `heatCapacityOf` reads: temperature [°C] and heat capacity [J/(kg·K)], one or the two around it. */
export const heatCapacityCells = (catalogue: Catalogue, at: MediumAt): readonly Point[] =>
  readAt(rising(tableOf(catalogue, at.medium, heatCapacity).points), at.temperatureC)

/** Density [kg/m³]. */
export const densityOf = (catalogue: Catalogue, at: MediumAt): Figure =>
  figureOf(catalogue, at, {
    what: 'density',
    ofMedium: ({ densityKgPerM3 }) => densityKgPerM3,
    ofSteam: ({ densityVapourKgPerM3 }) => densityVapourKgPerM3,
    airIs: 'Air is taken as dry and at 1.01325 bar.',
  })

/** Heat of vaporisation of saturated steam [J/kg]. */
export const latentHeatJPerKg = (steam: readonly SteamState[], temperatureC: number): Figure =>
  read(latentHeats(steam), temperatureC, 'latent heat', 'steam', null)

/** The states that `latentHeatJPerKg` reads: temperature [°C] and heat [J/kg], one or the two around it. */
export const latentHeatCells = (
  steam: readonly SteamState[],
  temperatureC: number,
): readonly Point[] => readAt(rising(latentHeats(steam)), temperatureC)

const latentHeats = (steam: readonly SteamState[]): Point[] =>
  steam.map((state) => [state.temperatureC, state.latentHeatJPerKg])

type MediumState = Catalogue['media'][number]

interface Property {
  readonly what: string
  readonly ofMedium: (state: MediumState) => number | null
  readonly ofSteam: (state: SteamState) => number
  readonly airIs: string
}

const heatCapacity: Property = {
  what: 'heat capacity',
  ofMedium: ({ specificHeatJPerKgK }) => specificHeatJPerKgK,
  ofSteam: ({ specificHeatVapourJPerKgK }) => specificHeatVapourJPerKgK,
  airIs: 'Air is taken as dry.',
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
  catalogue: Catalogue,
  { medium, temperatureC }: MediumAt,
  property: Property,
): Figure {
  const { what } = property
  if (medium === 'other')
    return unknown(
      `The ${what} of a medium given as "other" is not known: name water, steam, air, glycol or oil if it is one of them.`,
    )
  const { points, assumption } = tableOf(catalogue, medium, property)
  return read(points, temperatureC, what, medium, assumption)
}

interface PropertyTable {
  readonly points: readonly Point[]
  readonly assumption: string | null
}

function tableOf(
  { media, steam }: Catalogue,
  medium: MediumWord,
  { ofMedium, ofSteam, airIs }: Property,
): PropertyTable {
  if (medium === 'other') return { points: [], assumption: null }
  if (medium === 'steam') {
    return {
      points: steam.map((state): Point => [state.temperatureC, ofSteam(state)]),
      assumption: 'Steam is taken as dry and saturated at its temperature.',
    }
  }
  const { id, massFraction, assumption } =
    medium === 'air' ? { id: 'air', massFraction: null, assumption: airIs } : rowsFor[medium]
  const points = media.flatMap((state): Point[] => {
    const value = ofMedium(state)
    const isMeant = state.mediumId === id && state.massFraction === massFraction
    return isMeant && value !== null ? [[state.temperatureC, value]] : []
  })
  return { points, assumption }
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
