/** Lagging in the ground: it has to lie within the soil, which would else count as no resistance at all. */
import type { Shape } from '#solver/types.ts'
import type { ResolvedBuildUp } from './build-up.ts'
import { type Findings, plain } from './findings.ts'

/** Leaves out the rungs that would reach out of the ground; null where nothing of the build-up fits into it. */
export function withinGround(
  buildUp: ResolvedBuildUp,
  shape: Shape,
  findings: Findings,
): ResolvedBuildUp | null {
  if (shape.kind !== 'buried-pipe') return buildUp
  const { depthM } = shape
  const { layers, steps } = buildUp
  const fixedM = layers.reduce((sumM, { thicknessM }) => sumM + (thicknessM ?? 0), 0)
  const leastM = shape.outerDiameterM / 2 + fixedM
  const fits = steps.filter(({ thicknessM }) => leastM + thicknessM < depthM)
  const isSized = steps.length > 0
  const [thinnest] = steps
  if (isSized ? fits.length === 0 : leastM >= depthM) {
    findings.fault(
      'buryDepthM',
      `${plain(depthM, 3)} m`,
      `more than ${plain(leastM + (thinnest?.thicknessM ?? 0), 3)} m: so far does ${isSized ? 'the thinnest lagging' : 'the lagging'} reach from the axis of the run`,
    )
    return null
  }
  const thickest = fits.at(-1)
  if (thickest && fits.length < steps.length) {
    findings.note(
      'steps-above-ground',
      `Thicknesses above ${plain(thickest.thicknessM * 1000)} mm are left out: with them the lagging would reach out of the ground, ${plain(depthM, 3)} m above the axis of the run.`,
    )
  }
  return { layers, steps: fits }
}
