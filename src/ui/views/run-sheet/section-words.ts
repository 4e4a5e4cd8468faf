/** The section drawing in words, for who cannot see it. */
import type { RunValues } from '#model/fields.ts'
import type { Rating } from '#sizing/result.ts'
import { formatWithUnit } from '#units/format.ts'
import type { UnitSystem } from '#units/quantities.ts'
import type { SectionView } from './section.ts'
import { thicknessWords } from './words.ts'

interface Drawn {
  readonly values: RunValues
  readonly bare: Rating
  readonly view: SectionView
  readonly shown: Rating
  readonly airC: number
  readonly units: UnitSystem
  readonly buildUp: string
}

export function sectionWords({ values, bare, view, shown, airC, units, buildUp }: Drawn): string {
  const size = (sizeM: number | null) => formatWithUnit(sizeM, 'size', units)
  const temperature = (tempC: number) => formatWithUnit(tempC, 'temperature', units)
  const core = {
    round: `${roundWord(values)} ${size(bare.outerDiameterM)} across`,
    box: 'rectangular duct',
    slab: 'flat surface',
  }[view.core.kind]
  const lagging =
    shown.thicknessM === 0
      ? 'bare'
      : `${thicknessWords(shown.thicknessM, units)} of ${buildUp}${shown.piecesM.length > 1 ? ` in ${shown.piecesM.length} layers` : ''}`
  const across =
    shown.outerDiameterM === null || shown.thicknessM === 0
      ? []
      : [`${size(shown.outerDiameterM)} over all`]
  const ground =
    view.core.kind === 'round' && view.core.buriedM !== null
      ? [`buried, ${depthWords(view.core.buriedM, units)}`]
      : []
  return `Section to scale: ${[core, lagging, ...across, ...ground].join(', ')}. ${temperature(view.mediumC)} inside, ${temperature(shown.surfaceTempC)} at the surface, air ${temperature(airC)}.`
}

function roundWord({ shape }: RunValues): string {
  return shape === 'round-duct'
    ? 'round duct'
    : shape === 'sphere' || shape === 'vessel'
      ? shape
      : 'pipe'
}

/** How deep a run lies: `0.80 m to the axis`. */
export function depthWords(depthM: number | null, units: UnitSystem): string {
  return `${formatWithUnit(depthM, 'length', units, units === 'si' ? 2 : 1)} to the axis`
}
