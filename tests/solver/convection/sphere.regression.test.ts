/** A worked example of a textbook as its published companion calculation gives it, with the book's own properties. */
import { nusseltSphereInWind } from '#solver/convection/sphere.ts'
import { published } from '../../published.ts'

// Çengel 7-6: ball of 0.25 m, on average 250 °C, in wind of 3 m/s and 25 °C; viscosities 1.849e-5 and 2.76e-5 Pa·s.
const ball = { diameterM: 0.25, windMPerS: 3, viscosity: 1.562e-5, k: 0.02551, prandtl: 0.7296 }
published(
  ({ diameterM, windMPerS, viscosity, k, prandtl }) =>
    ((nusseltSphereInWind({
      reynolds: (windMPerS * diameterM) / viscosity,
      prandtl,
      viscosityRatio: 1.849 / 2.76,
    }) *
      k) /
      diameterM) *
    Math.PI *
    diameterM ** 2 *
    (250 - 25),
  [
    {
      from: 'Çengel 7-6, cooling of a steel ball',
      given: ball,
      printed: '608',
      within: { absolute: 2, because: 'editions give 606 to 610 W by the rounding of h' },
    },
  ],
)
