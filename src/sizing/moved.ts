/** A run with one of its inputs moved; everything else as it was. */
import { dewPointC, saturationPressurePa } from '#solver/index.ts'
import type { Conductivity } from '#solver/types.ts'
import type { Condition, Problem } from './problem.ts'
import { EMISSIVITIES } from './survey.ts'

/** Every condition but that of the survey, which was measured. */
function inConditions(problem: Problem, change: (condition: Condition) => Condition): Problem {
  const { loss, touch, damp, frost, months } = problem.conditions
  return {
    ...problem,
    conditions: {
      ...problem.conditions,
      loss: change(loss),
      touch: change(touch),
      damp: change(damp),
      frost: frost && change(frost),
      months: months.map(change),
    },
  }
}

export const withMedium = (problem: Problem, byK: number): Problem =>
  inConditions(problem, (condition) =>
    condition === problem.conditions.frost
      ? condition
      : { ...condition, mediumC: condition.mediumC + byK },
  )

/** Air and surroundings together, at the same relative humidity. */
export function withAir(problem: Problem, byK: number): Problem {
  const moved = inConditions(problem, (condition) => ({
    ...condition,
    around: {
      ...condition.around,
      airC: condition.around.airC + byK,
      surroundingsC: condition.around.surroundingsC + byK,
    },
  }))
  return withDewPoint(moved, humidityOf(problem))
}

/** Relative humidity that belongs to the dew point of the damp air; null where damp is not judged. */
export function humidityOf({ limits, conditions }: Problem): number | null {
  if (!limits.damp) return null
  const { airC } = conditions.damp.around
  return Math.min(1, saturationPressurePa(limits.damp.dewPointC) / saturationPressurePa(airC))
}

function withDewPoint(problem: Problem, humidity: number | null): Problem {
  const { damp } = problem.limits
  if (damp === null || humidity === null) return problem
  const { airC } = problem.conditions.damp.around
  return {
    ...problem,
    limits: { ...problem.limits, damp: { ...damp, dewPointC: dewPointC({ airC, humidity }) } },
  }
}

/** What the solver takes as humidity: hardly any to all the air can hold. */
const LEAST_HUMIDITY = 0.01

export const boundedHumidity = (humidity: number): number =>
  Math.min(1, Math.max(LEAST_HUMIDITY, humidity))

export function withHumidity(problem: Problem, by: number): Problem {
  const humidity = humidityOf(problem)
  return humidity === null ? problem : withDewPoint(problem, boundedHumidity(humidity + by))
}

/** Touch and damp are judged without wind, and stay so. */
export const withWind = (problem: Problem, byMPerS: number): Problem =>
  inConditions(problem, (condition) =>
    condition === problem.conditions.touch || condition === problem.conditions.damp
      ? condition
      : {
          ...condition,
          around: {
            ...condition.around,
            windMPerS: Math.max(0, condition.around.windMPerS + byMPerS),
          },
        },
  )

export const boundedEmissivity = (emissivity: number): number =>
  Math.min(EMISSIVITIES.most, Math.max(EMISSIVITIES.least, emissivity))

/** Of the jacket; of a bare run its own surface. */
export const withEmissivity = (problem: Problem, by: number): Problem =>
  inConditions(problem, (condition) =>
    problem.layers.length === 0
      ? { ...condition, bareEmissivity: boundedEmissivity(condition.bareEmissivity + by) }
      : { ...condition, emissivity: boundedEmissivity(condition.emissivity + by) },
  )

/** Equal conductivities stay one and the same, by which layers of one material are known. */
export function withConductivity(problem: Problem, share: number): Problem {
  const known = new Map<Conductivity, Conductivity>()
  const scaled = (conductivity: Conductivity): Conductivity => {
    const before = known.get(conductivity)
    if (before) return before
    const after = scaledBy(conductivity, 1 + share)
    known.set(conductivity, after)
    return after
  }
  return {
    ...problem,
    layers: problem.layers.map((layer) => ({
      ...layer,
      material: { ...layer.material, conductivity: scaled(layer.material.conductivity) },
    })),
  }
}

const scaledBy = (conductivity: Conductivity, factor: number): Conductivity =>
  conductivity.kind === 'constant'
    ? { ...conductivity, conductivityWPerMK: conductivity.conductivityWPerMK * factor }
    : {
        ...conductivity,
        valuesWPerMK: conductivity.valuesWPerMK.map((valueWPerMK) => valueWPerMK * factor),
      }

export const withFuelPrice = (problem: Problem, share: number): Problem =>
  withEnergy(problem, ({ fuelPricePerKWh, ...rest }) => ({
    ...rest,
    fuelPricePerKWh: fuelPricePerKWh * (1 + share),
  }))

const HOURS_OF_A_YEAR = 8784

export const boundedHours = (hours: number): number => Math.min(HOURS_OF_A_YEAR, hours)

export function withHours(problem: Problem, share: number): Problem {
  const { hoursPerYear } = problem
  const moved = hoursPerYear === null ? null : boundedHours(hoursPerYear * (1 + share))
  return withEnergy({ ...problem, hoursPerYear: moved }, (energy) => ({
    ...energy,
    hoursPerYear: boundedHours(energy.hoursPerYear * (1 + share)),
  }))
}

type Energy = NonNullable<Problem['money']>['energy']

const withEnergy = (problem: Problem, change: (energy: Energy) => Energy): Problem => ({
  ...problem,
  money: problem.money && { ...problem.money, energy: change(problem.money.energy) },
})
