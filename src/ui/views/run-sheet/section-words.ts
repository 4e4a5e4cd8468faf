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
    round: `${values.shape === 'round-duct' ? 'round duct' : 'pipe'} ${size(bare.outerDiameterM)} across`,
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
  return `Section to scale: ${[core, lagging, ...across].join(', ')}. ${temperature(view.mediumC)} inside, ${temperature(shown.surfaceTempC)} at the surface, air ${temperature(airC)}.`
}
