/** What lagging adds to a shape, for quantities and prices. */
import { headOuterAreaM2, headVolumeM3 } from './heads.ts'
import type { Shape } from './types.ts'

/** Area [m²] and enclosed volume [m³] of one unit of a shape grown by a thickness; of a flat surface, the layer's own. */
export function grown(shape: Shape, thicknessM: number): { areaM2: number; volumeM3: number } {
  switch (shape.kind) {
    case 'pipe':
    case 'buried-pipe': {
      const diameterM = shape.outerDiameterM + 2 * thicknessM
      return { areaM2: Math.PI * diameterM, volumeM3: (Math.PI * diameterM * diameterM) / 4 }
    }
    case 'rect-duct': {
      const widthM = shape.widthM + 2 * thicknessM
      const heightM = shape.heightM + 2 * thicknessM
      return { areaM2: 2 * (widthM + heightM), volumeM3: widthM * heightM }
    }
    case 'flat':
      return { areaM2: 1, volumeM3: thicknessM }
    case 'sphere': {
      const diameterM = shape.outerDiameterM + 2 * thicknessM
      return { areaM2: Math.PI * diameterM ** 2, volumeM3: (Math.PI / 6) * diameterM ** 3 }
    }
    case 'vessel': {
      const diameterM = shape.outerDiameterM + 2 * thicknessM
      const headAreaM2 = headOuterAreaM2(shape.heads, shape.outerDiameterM, thicknessM)
      const domeM3 = headVolumeM3(shape.heads, shape.outerDiameterM, thicknessM)
      return {
        areaM2: Math.PI * diameterM * shape.shellLengthM + 2 * headAreaM2,
        volumeM3: (Math.PI / 4) * diameterM ** 2 * shape.shellLengthM + 2 * domeM3,
      }
    }
  }
}
