/** The design conditions: the same place judged at its worst for each question. */

import type { Finish } from '#catalogue/types.ts'
import type { Condition } from '#sizing/problem.ts'
import { clearSkyC, radiantMixC } from '#solver/index.ts'
import type { FilmChoice } from '#solver/types.ts'
import type { RunValues } from '../fields.ts'
import { type Findings, plain } from './findings.ts'
import type { Medium } from './medium.ts'
import { type MonthlyAir, parseMonthlyAir } from './monthly-air.ts'
import type { Thing } from './standing.ts'
import { resolveSurfaces, type Surfaces } from './surfaces.ts'

export interface Conditions {
  readonly loss: Condition
  readonly touch: Condition
  readonly damp: Condition
  readonly frost: Condition | null
  readonly survey: Condition | null
  readonly months: readonly Condition[]
}

export function resolveConditions(
  values: RunValues,
  medium: Medium,
  thing: Thing,
  finish: Finish | null,
  findings: Findings,
): Conditions | null {
  const { airC } = values
  const months = resolveMonths(values, findings)
  if (airC === undefined) {
    findings.fault('airC', 'nothing', 'the temperature of the air around the run in °C')
    return null
  }
  const isBuried = thing.shape.kind === 'buried-pipe'
  if (isBuried) noteUnusedUnderground(values, findings)
  const place = isBuried ? underground({ ...values, airC }) : { ...values, airC }
  const surfaces = resolveSurfaces(place, thing, finish, findings)
  return {
    loss: lossCondition(place, medium, surfaces),
    touch: touchCondition(place, medium, surfaces),
    damp: dampCondition(place, medium, surfaces),
    frost: frostCondition(place, medium, surfaces),
    survey: surveyCondition(place, medium, surfaces),
    months: months.map((monthC) => lossCondition(inMonth(place, monthC), medium, surfaces)),
  }
}

type Place = RunValues & { readonly airC: number }

/** Neither sun nor sky reaches a buried run, and its film is the soil; wind and surroundings say nothing to that. */
function underground({ filmWPerM2K: _, method: __, ...rest }: Place): Place {
  return { ...rest, solarWPerM2: 0, skyView: 0 }
}

/** Touch and damp are always judged with the detailed film: the simplified one makes hot surfaces too cool. */
const lossFilm = ({ filmWPerM2K, method }: RunValues): FilmChoice =>
  filmWPerM2K === undefined ? (method ?? 'detailed') : { fixedWPerM2K: filmWPerM2K }

interface Weather {
  readonly airC: number
  readonly surroundingsC: number
  readonly windMPerS: number
}

/** Under the open sky part of what a surface sees is colder than the air. */
function underSky(weather: Weather, { skyView = 0, altitudeM = 0 }: RunValues): UnderSky {
  if (skyView === 0) return { around: { ...weather, altitudeM }, sky: null }
  const { surroundingsC: groundC, airC } = weather
  const mixC = radiantMixC({ skyView, skyC: clearSkyC(airC), surroundingsC: groundC })
  return {
    around: { ...weather, surroundingsC: mixC, altitudeM },
    sky: { view: skyView, groundC },
  }
}

type UnderSky = Pick<Condition, 'around' | 'sky'>

function lossCondition(place: Place, { mediumC }: Medium, { aged, bare }: Surfaces): Condition {
  const { airC } = place
  const weather = underSky(
    { airC, surroundingsC: place.surroundingsC ?? airC, windMPerS: place.windMPerS ?? 0 },
    place,
  )
  return {
    ...weather,
    mediumC,
    emissivity: aged.emissivity,
    bareEmissivity: bare.emissivity,
    sunWPerM2: place.solarWPerM2 ?? 0,
    solarAbsorptance: aged.absorptance,
    bareSolarAbsorptance: bare.absorptance,
    film: lossFilm(place),
    inclinedFilm: 'higher',
  }
}

/** No wind, no cold sky, the hottest medium; in the sun a jacket is taken as dark as it gets. */
function touchCondition(place: Place, { hottestC }: Medium, surfaces: Surfaces): Condition {
  const airC = place.touchAirC ?? place.airC
  const { bare, new: fresh, aged } = surfaces
  return {
    // Surroundings are given once, for the yearly mean. Where a question's air is harder than they are, they follow it.
    around: {
      airC,
      surroundingsC: Math.max(place.surroundingsC ?? airC, airC),
      windMPerS: 0,
      altitudeM: place.altitudeM ?? 0,
    },
    sky: null,
    mediumC: hottestC,
    emissivity: fresh.emissivity,
    bareEmissivity: bare.emissivity,
    sunWPerM2: place.solarWPerM2 ?? 0,
    solarAbsorptance: Math.max(fresh.absorptance, aged.absorptance),
    bareSolarAbsorptance: bare.absorptance,
    film: 'detailed',
    inclinedFilm: 'lower',
  }
}

/** No wind, no sun, the coldest medium. */
function dampCondition(place: Place, { coldestC }: Medium, surfaces: Surfaces): Condition {
  const airC = place.dampAirC ?? place.airC
  const { bare, new: fresh } = surfaces
  const surroundingsC = Math.min(place.surroundingsC ?? airC, airC)
  return {
    ...underSky({ airC, surroundingsC, windMPerS: 0 }, place),
    mediumC: coldestC,
    emissivity: fresh.emissivity,
    bareEmissivity: bare.emissivity,
    sunWPerM2: 0,
    solarAbsorptance: fresh.absorptance,
    bareSolarAbsorptance: bare.absorptance,
    film: 'detailed',
    inclinedFilm: 'lower',
  }
}

/** The coldest day, with wind, without sun; the medium is the water at the start. */
function frostCondition(place: Place, { coldestC }: Medium, surfaces: Surfaces): Condition | null {
  if (place.frostHours === undefined) return null
  const airC = place.frostAirC ?? place.airC
  const cold: Place = {
    ...place,
    airC,
    surroundingsC: Math.min(place.surroundingsC ?? airC, airC),
    windMPerS: place.frostWindMPerS ?? place.windMPerS ?? 0,
    solarWPerM2: 0,
  }
  const mediumC = place.frostStartC ?? coldestC
  return lossCondition(cold, { mediumC, hottestC: mediumC, coldestC: mediumC }, surfaces)
}

/** What it was on the day; always the detailed film, since a surface temperature is what was measured. */
function surveyCondition(place: Place, medium: Medium, surfaces: Surfaces): Condition | null {
  if (place.measuredSurfaceC === undefined) return null
  const airC = place.surveyAirC ?? place.airC
  const { filmWPerM2K: _, skyView: __, ...rest } = place
  const day: Place = {
    ...rest,
    airC,
    surroundingsC: place.surveySurroundingsC ?? airC,
    windMPerS: place.surveyWindMPerS ?? 0,
    solarWPerM2: 0,
    method: 'detailed',
  }
  const mediumC = place.surveyMediumC ?? medium.mediumC
  const condition = lossCondition(day, { ...medium, mediumC }, surfaces)
  const { surveyEmissivity } = place
  return surveyEmissivity === undefined
    ? condition
    : { ...condition, emissivity: surveyEmissivity, bareEmissivity: surveyEmissivity }
}

/** Months and air_c may both be given if they agree within this [K]. */
const SAME_MEAN_K = 1

function resolveMonths(values: RunValues, findings: Findings): MonthlyAir | readonly [] {
  if (values.monthlyAirC === undefined) return []
  const parsed = parseMonthlyAir(values.monthlyAirC)
  if (!parsed.ok) {
    findings.fault('monthlyAirC', values.monthlyAirC, parsed.allowed)
    return []
  }
  const meanC = parsed.monthsC.reduce((sumC, monthC) => sumC + monthC, 0) / parsed.monthsC.length
  const { airC = meanC } = values
  const isMean = Math.abs(meanC - airC) <= SAME_MEAN_K
  findings.note(
    'by-the-month',
    `The loss of the year is that of its twelve months, the hours in service spread evenly over them; months in which heat flows the other way count as nothing.${isMean ? ' The loss shown beside it stands at the yearly mean.' : ''}`,
  )
  if (!isMean) {
    findings.note(
      'monthly-mean',
      `The twelve months have a mean of ${plain(meanC)} °C; the loss shown stands at air_c, ${plain(airC)} °C.`,
    )
  }
  return parsed.monthsC
}

/** A month keeps the difference between surroundings and air that the place has over the year. */
function inMonth(place: Place, monthC: number): Place {
  const { surroundingsC, airC } = place
  return surroundingsC === undefined
    ? { ...place, airC: monthC }
    : { ...place, airC: monthC, surroundingsC: monthC + surroundingsC - airC }
}

function noteUnusedUnderground(values: RunValues, findings: Findings): void {
  const given = [
    values.windMPerS !== undefined && values.windMPerS > 0 ? 'wind' : '',
    values.solarWPerM2 !== undefined && values.solarWPerM2 > 0 ? 'sun' : '',
    values.skyView !== undefined && values.skyView > 0 ? 'sky' : '',
    values.surroundingsC === undefined ? '' : 'surroundings',
    values.filmWPerM2K === undefined ? '' : 'film',
    values.method === 'simplified' ? 'the simplified method' : '',
  ].filter((word) => word !== '')
  if (given.length > 0) {
    findings.note('unused', `${given.join(', ')}: not used for a buried run.`)
  }
}
