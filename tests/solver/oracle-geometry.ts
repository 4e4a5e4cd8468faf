/** Areas and resistances of the second solver, written out anew: nothing comes from `src/`. */
import type { Shape, System } from '#solver/types.ts'

/** What a flow passes on its way out: areas in m², resistance of layer j in K/W is `coefficients[j]` / λ. */
interface Through {
  readonly innerArea: number
  readonly outerArea: number
  readonly coefficients: readonly number[]
}

export interface Surface {
  readonly side: string
  readonly area: number
  readonly kind: 'lying' | 'standing' | 'leaning' | 'wall' | 'up' | 'down' | 'ball' | 'soil'
  /** In the number of free convection, and in that of the wind [m]. */
  readonly length: number
  readonly across: number
  /** Resistance of the soil around a metre of pipe [m·K/W]; 0 where there is none. */
  readonly soil: number
  readonly through: Through
}

type Of<K extends Shape['kind']> = Extract<Shape, { kind: K }>

/** The surfaces of a metre of run, of a square metre of a flat thing, or of a whole sphere or vessel. */
export function surfacesOf({ shape, layers }: Pick<System, 'shape' | 'layers'>): Surface[] {
  const thicknesses = layers.map(({ thicknessM }) => thicknessM)
  switch (shape.kind) {
    case 'flat': {
      const kind = shape.facing === 'vertical' ? 'wall' : shape.facing
      const length = shape.characteristicLengthM
      const through = { innerArea: 1, outerArea: 1, coefficients: thicknesses }
      return [surface('all round', kind, length, length, 1, through)]
    }
    case 'pipe':
      return [pipe(shape, thicknesses)]
    case 'buried-pipe':
      return [buried(shape, thicknesses)]
    case 'rect-duct':
      return duct(shape, thicknesses)
    case 'sphere': {
      const outer = shape.outerDiameterM + 2 * sum(thicknesses)
      const through = ball(shape.outerDiameterM / 2, thicknesses, 4 * Math.PI)
      return [surface('all round', 'ball', outer, outer, Math.PI * outer ** 2, through)]
    }
    case 'vessel':
      return vessel(shape, thicknesses)
  }
}

const sum = (numbers: readonly number[]): number => numbers.reduce((total, one) => total + one, 0)

const surface = (
  side: string,
  kind: Surface['kind'],
  length: number,
  across: number,
  area: number,
  through: Through,
): Surface => ({ side, kind, length, across, area, soil: 0, through })

/** Radii from inside to outside. */
function radii(inner: number, thicknesses: readonly number[]): number[] {
  const all = [inner]
  for (const t of thicknesses) all.push((all.at(-1) ?? inner) + t)
  return all
}

/** ln(D_e/D_i)/(2πλ) for each metre of a hollow cylinder. */
function tube(diameter: number, length: number, thicknesses: readonly number[]): Through {
  const r = radii(diameter / 2, thicknesses)
  const outer = r.at(-1) ?? 0
  return {
    innerArea: Math.PI * diameter * length,
    outerArea: 2 * Math.PI * outer * length,
    coefficients: thicknesses.map(
      (_, j) => Math.log((r[j + 1] ?? 0) / (r[j] ?? 0)) / (2 * Math.PI * length),
    ),
  }
}

/** (1/r_i − 1/r_e)/(Ωλ): a whole sphere has the solid angle Ω = 4π, half of one 2π. */
function ball(radius: number, thicknesses: readonly number[], angle: number): Through {
  const r = radii(radius, thicknesses)
  const outer = r.at(-1) ?? 0
  return {
    innerArea: angle * radius ** 2,
    outerArea: angle * outer ** 2,
    coefficients: thicknesses.map((_, j) => (1 / (r[j] ?? 0) - 1 / (r[j + 1] ?? 0)) / angle),
  }
}

function pipe(shape: Of<'pipe'>, thicknesses: readonly number[]): Surface {
  const outer = shape.outerDiameterM + 2 * sum(thicknesses)
  const through = tube(shape.outerDiameterM, 1, thicknesses)
  if (shape.orientation === 'horizontal') {
    return surface('all round', 'lying', outer, outer, Math.PI * outer, through)
  }
  const kind = shape.orientation === 'vertical' ? 'standing' : 'leaning'
  return surface('all round', kind, shape.riseM, outer, Math.PI * outer, through)
}

/** R_E = arcosh(2H/D_e)/(2πλ_E); a pipe that reaches out of the soil has as good as none. */
function buried(shape: Of<'buried-pipe'>, thicknesses: readonly number[]): Surface {
  const outer = shape.outerDiameterM + 2 * sum(thicknesses)
  const ratio = Math.max(1, (2 * shape.depthM) / outer)
  const arcosh = Math.log(ratio + Math.sqrt((ratio - 1) * (ratio + 1)))
  const least = 1 / (1e4 * Math.PI * outer)
  return {
    ...surface(
      'all round',
      'soil',
      outer,
      outer,
      Math.PI * outer,
      tube(shape.outerDiameterM, 1, thicknesses),
    ),
    soil: Math.max(least, arcosh / (2 * Math.PI * shape.soilWPerMK)),
  }
}

/** R_l = 2d/(λ(P_i + P_e)), P_e = P_i + 8d, for the whole perimeter: each face carries its share of it. */
function duct(shape: Of<'rect-duct'>, thicknesses: readonly number[]): Surface[] {
  const innerArea = 2 * (shape.widthM + shape.heightM)
  let perimeter = innerArea
  const coefficients = thicknesses.map((t) => {
    const inner = perimeter
    perimeter += 8 * t
    return (2 * t) / (inner + perimeter)
  })
  const through = { innerArea, outerArea: perimeter, coefficients }
  const w = shape.widthM + 2 * sum(thicknesses)
  const h = shape.heightM + 2 * sum(thicknesses)
  return shape.riseM === null
    ? [
        surface('side', 'wall', h, h, 2 * h, through),
        surface('top', 'up', w / 2, w, w, through),
        surface('bottom', 'down', w / 2, w, w, through),
      ]
    : [surface('all round', 'wall', shape.riseM, perimeter / 4, perimeter, through)]
}

function vessel(shape: Of<'vessel'>, thicknesses: readonly number[]): Surface[] {
  const { outerDiameterM: bare, shellLengthM, orientation, heads } = shape
  const outer = bare + 2 * sum(thicknesses)
  const shellThrough = tube(bare, shellLengthM, thicknesses)
  const isLying = orientation === 'horizontal'
  const shell = surface(
    'shell',
    isLying ? 'lying' : 'standing',
    isLying ? outer : shellLengthM,
    outer,
    shellThrough.outerArea,
    shellThrough,
  )
  if (heads === 'domed') {
    const through = ball(Math.sqrt(domeArea(bare) / (2 * Math.PI)), thicknesses, 2 * Math.PI)
    return [shell, surface('heads', 'ball', outer, outer, 2 * through.outerArea, through)]
  }
  // A disc conducts straight through; the layers stand out over its rim.
  const area = (Math.PI / 4) * outer ** 2
  const through = {
    innerArea: area,
    outerArea: area,
    coefficients: thicknesses.map((t) => t / area),
  }
  return isLying
    ? [shell, surface('heads', 'wall', outer, outer, 2 * area, through)]
    : [
        shell,
        surface('top head', 'up', outer / 4, outer, area, through),
        surface('bottom head', 'down', outer / 4, outer, area, through),
      ]
}

/** Area of a half ellipsoid half as high as it is wide: its profile turned about the axis, by Simpson's rule. */
function domeArea(diameter: number): number {
  const [a, b] = [diameter / 2, diameter / 4]
  const ring = (angle: number) =>
    2 * Math.PI * a * Math.cos(angle) * Math.hypot(a * Math.sin(angle), b * Math.cos(angle))
  const steps = 2000
  const step = Math.PI / 2 / steps
  let area = 0
  for (let i = 0; i < steps; i += 1) {
    area += (step / 6) * (ring(i * step) + 4 * ring((i + 0.5) * step) + ring((i + 1) * step))
  }
  return area
}
