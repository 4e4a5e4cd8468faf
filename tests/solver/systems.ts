/** Small systems, and questions to their answers, that several tests share. */
import type { Layer, Shape, Solution, System } from '#solver/types.ts'

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

/** Soil and a fixed coefficient take convection and radiation in one. */
export const radiates = ({ shape, film }: System): boolean =>
  shape.kind !== 'buried-pipe' && typeof film !== 'object'

/** Convection, radiation and sun at a face, from its reported coefficients and temperature [W/m²]; all outwards. */
export function flowsOf(system: System, face: Solution['faces'][number]) {
  const { airC, surroundingsC } = system.around
  const convection = face.convectionWPerM2K * (face.surfaceTempC - airC)
  const radiation = radiates(system)
    ? system.emissivity *
      5.670374419e-8 *
      ((face.surfaceTempC + 273.15) ** 4 - (surroundingsC + 273.15) ** 4)
    : 0
  const sun = 0 - system.sunAbsorbedWPerM2
  const larger = Math.max(Math.abs(convection), Math.abs(radiation), -sun, 1e-6)
  return { convection, radiation, sun, larger }
}
