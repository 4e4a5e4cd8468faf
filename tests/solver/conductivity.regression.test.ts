/** A worked example of a textbook as its published companion calculation gives it. */
import { layerDifferenceK } from '#solver/conductivity.ts'
import type { Conductivity } from '#solver/types.ts'
import { published } from '../published.ts'

// Çengel 2-21: bronze plate 0.1 m thick, 1.4 m², k = 38(1 + 9.21e-4 T) with T in kelvin, 600 K and 400 K on its sides.
const at = (temperatureK: number): number => 38 * (1 + 9.21e-4 * temperatureK)
const bronze: Conductivity = {
  kind: 'curve',
  basis: 'point',
  pointsC: [400 - 273.15, 600 - 273.15],
  valuesWPerMK: [at(400), at(600)],
}

/** Heat flow at which the plate has 200 K across it, found from the flow of one trial: straight λ makes it exact. */
published(
  ({ kilowatts }: { kilowatts: number }) =>
    layerDifferenceK(bronze, 400 - 273.15, ((kilowatts * 1000) / 1.4) * 0.1),
  [
    {
      from: 'Çengel 2-21, temperature difference at the printed 155 kW',
      given: { kilowatts: 155 },
      printed: '200',
      within: { absolute: 0.7, because: 'the flow is printed with three digits, 155 of 155.4' },
    },
  ],
)
