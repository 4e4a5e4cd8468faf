/** A worked example as its published companion calculation gives it, as a run. */
import { published } from '../published.ts'
import { sized } from './catalogue.ts'

// Dutta 4.8: water of 110 °C at 1.8 m/s in a pipe of 35/42.2 mm with 20 mm of 0.12 W/(m·K), outside 10 W/(m²·K) to
// 20 °C, 15 m long. Inside film and wall are neglected here; density of water at 110 °C from tables, 951 kg/m³.
published(
  ({ lengthM }: { readonly lengthM: number }) =>
    sized({
      tag: 'A',
      shape: 'pipe',
      outerDiameterM: 0.0422,
      wallM: 0.0036,
      medium: 'water',
      mediumC: 110,
      airC: 20,
      filmWPerM2K: 10,
      conductivityWPerMK: 0.12,
      thicknessM: 0.02,
      lengthM,
      flowKgPerS: 1.8 * (Math.PI / 4) * 0.035 ** 2 * 951,
    }).chosen?.arrivalTempC ?? Number.NaN,
  [
    {
      from: 'Dutta 4.8, hot water line, as a run',
      given: { lengthM: 15 },
      printed: '109.8',
      within: { absolute: 0.1, because: 'the companion rounds its coefficients' },
    },
  ],
)
