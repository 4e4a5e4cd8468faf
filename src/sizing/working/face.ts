/** What the lines of one face are about: the face as solved, and all around it. */
import type { FaceShape } from '#solver/index.ts'
import type { Face, System } from '#solver/types.ts'
import type { Condition } from '../problem.ts'

export interface FaceAt {
  readonly system: System
  readonly shape: FaceShape
  readonly face: Face
  /** Sun on the surface and what of it is taken up. */
  readonly sunWPerM2: number
  readonly solarAbsorptance: number
  readonly sky: Condition['sky']
  /** Where the surface temperature was not found but measured: what it is. */
  readonly surfaceWords?: string
}
