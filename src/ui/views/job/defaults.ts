/** What a job can give to all of its runs, in groups. */
import type { FieldKey } from '#model/fields.ts'

export const defaultGroups: readonly {
  readonly title: string
  readonly keys: readonly FieldKey[]
}[] = [
  {
    title: 'Place',
    keys: [
      'airC',
      'monthlyAirC',
      'touchAirC',
      'dampAirC',
      'frostAirC',
      'humidity',
      'windMPerS',
      'altitudeM',
    ],
  },
  { title: 'Lagging', keys: ['material', 'finish', 'steps', 'method'] },
  {
    title: 'Money',
    keys: [
      'fuel',
      'hoursPerYear',
      'fuelPricePerKWh',
      'efficiency',
      'discount',
      'growth',
      'lifeYears',
      'currency',
    ],
  },
]
