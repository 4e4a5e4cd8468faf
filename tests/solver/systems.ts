/** Small systems, and questions to their answers, that several tests share. */
import fc from 'fast-check'
import type { Layer, Shape, Solution, System } from '#solver/types.ts'
import { spread } from './arbitraries.ts'

export const still = (airC: number) => ({ airC, surroundingsC: airC, windMPerS: 0, altitudeM: 0 })

export const lying = (outerDiameterM: number): Shape => ({
  kind: 'pipe',
  outerDiameterM,
  orientation: 'horizontal',
})

export const constant = (thicknessM: number, conductivityWPerMK: number): Layer => ({
  thicknessM,
  conductivity: { kind: 'constant', conductivityWPerMK },
})

/** What a system has besides shape, layers, medium and air where a test says nothing else. */
export const plainFilm = {
  emissivity: 0.9,
  insideFilmWPerM2K: null,
  sunAbsorbedWPerM2: 0,
  film: 'detailed',
  inclinedFilm: 'higher',
} as const satisfies Partial<System>

export const hasJump = ({ faces }: Solution): boolean =>
  faces.some(({ closure }) => closure === 'on-jump')

/** Convection and radiation at a face, from its reported coefficients and temperature [W/m²]. */
export function flowsOf(
  system: System,
  face: Solution['faces'][number],
): { convection: number; radiation: number } {
  const { airC, surroundingsC } = system.around
  return {
    convection: face.convectionWPerM2K * (face.surfaceTempC - airC),
    radiation:
      system.emissivity *
      5.670374419e-8 *
      ((face.surfaceTempC + 273.15) ** 4 - (surroundingsC + 273.15) ** 4),
  }
}

/** Shapes whose film has no step anywhere: a hotter surface always gives off more. */
export const unfacing = fc.oneof(
  fc.record({
    kind: fc.constant('pipe' as const),
    outerDiameterM: spread(0.001, 20),
    orientation: fc.constant('horizontal' as const),
  }),
  fc.record({
    kind: fc.constant('flat' as const),
    facing: fc.constant('vertical' as const),
    characteristicLengthM: spread(0.01, 50),
  }),
)
