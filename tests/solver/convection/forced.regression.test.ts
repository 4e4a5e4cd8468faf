/** Worked examples of textbooks as their published companion calculations give them, with the book's own properties. */
import { nusseltCylinderInWind, nusseltPlateInWind } from '#solver/convection/forced.ts'
import { published } from '../../published.ts'

// Holman 6-8: wire of 3.94e-5 m in wind of 50 m/s, 25 K warmer than the air (difference from memory).
const wire = {
  diameterM: 3.94e-5,
  windMPerS: 50,
  differenceK: 25,
  viscosity: 16.7e-6,
  k: 0.02704,
  prandtl: 0.706,
}
published(
  ({ diameterM, windMPerS, differenceK, viscosity, k, prandtl }) =>
    nusseltCylinderInWind({ reynolds: (windMPerS * diameterM) / viscosity, prandtl }) *
    k *
    Math.PI *
    differenceK,
  [{ from: 'Holman 6-8, fine wire', given: wire, printed: '11.88' }],
)

// Incropera 7.1: plate of 0.5 m in 10 m/s at 6 kPa, 300 °C in air of 27 °C; laminar all along.
const plate = {
  lengthM: 0.5,
  windMPerS: 10,
  differenceK: 273,
  viscosity: 5.21e-4,
  k: 0.0364,
  prandtl: 0.687,
}
published(
  ({ lengthM, windMPerS, differenceK, viscosity, k, prandtl }) =>
    nusseltPlateInWind({ reynolds: (windMPerS * lengthM) / viscosity, prandtl }) * k * differenceK,
  [
    {
      from: 'Incropera 7.1, cooling of a plate',
      given: plate,
      printed: '570',
      within: { absolute: 1, because: 'the book rounds its coefficient to 4.18 W/m²K' },
    },
  ],
)
