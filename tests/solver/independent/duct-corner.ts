/**
 * Steady conduction in the cross-section of a lagged rectangular duct, in two dimensions, by finite volumes.
 *
 * One quarter: the halves of two sides and the sharp corner between them. Inside is at 1 K, outside at 0 K or behind an
 * even film, the cuts are lines of symmetry. Grid lines carry the nodes. Numbered along the diagonals p − q = const, the
 * quarter becomes a band that is eliminated directly.
 */

export interface DuctSection {
  readonly widthM: number
  readonly heightM: number
  readonly thicknessM: number
  readonly conductivityWPerMK: number
  /** Even coefficient on the whole outer surface [W/(m²·K)]; null holds the outer surface itself at 0 K. */
  readonly outerFilmWPerM2K: number | null
}

/** Heat per metre of duct and kelvin between inside and outside [W/(m·K)], extrapolated to an endless grid. */
export function ductConductance(section: DuctSection, cells = 8): number {
  const at = (factor: number): number => 4 * quarterConductance(section, factor * cells)
  return extrapolated(at(1), at(2), at(4))
}

/**
 * What one corner adds to the two sides that meet in it, in units of λ: the edge shape factor of textbooks.
 * Only meaningful with isothermal surfaces and sides long beside the thickness.
 */
export function cornerShapeFactor(section: DuctSection, cells = 8): number {
  const { widthM, heightM, thicknessM, conductivityWPerMK } = section
  const sides = (2 * (widthM + heightM)) / thicknessM
  return (ductConductance(section, cells) / conductivityWPerMK - sides) / 4
}

/**
 * At the inner corner, a solid angle of 270°, the temperature goes with r^(2/3), so the flow converges with the step to
 * the power 4/3, and the smooth rest with its square: both are taken out, from three grids each twice as fine.
 */
function extrapolated(coarse: number, middle: number, fine: number): number {
  const without = (order: number, one: number, two: number): number =>
    two + (two - one) / (2 ** order - 1)
  return without(2, without(4 / 3, coarse, middle), without(4 / 3, middle, fine))
}

/** A corner is no longer felt at this many thicknesses along a side: its trace falls as exp(−πx/d), to 4e-6. */
const REACH = 4

/** Heat of one quarter per kelvin with `cells` cells across the thickness [W/(m·K)]. */
export function quarterConductance(section: DuctSection, cells: number): number {
  const { thicknessM, conductivityWPerMK: lambda, outerFilmWPerM2K: film } = section
  const halves = [section.widthM / 2, section.heightM / 2] as const
  const armsM = halves.map((half) => Math.min(half, REACH * thicknessM))
  const armCells = armsM.map((armM) => cells * Math.ceil(armM / thicknessM - 1e-9))
  const stepM = thicknessM / cells
  const alongX = axis(armsM[0] as number, armCells[0] as number, stepM, cells)
  const alongY = axis(armsM[1] as number, armCells[1] as number, stepM, cells)
  const { nodes, indexOf } = numbered(armCells[0] as number, armCells[1] as number, cells)
  const band = new Band(nodes.length, 2 * cells + 2)
  const right = new Float64Array(nodes.length)
  const isInside = ([p, q]: Node): boolean => (p === 0 && q <= 0) || (q === 0 && p <= 0)
  const isOutside = ([p, q]: Node): boolean => p === cells || q === cells
  let flow = 0
  const links: { one: Node; two: Node; conductance: number }[] = []
  nodes.forEach((node, index) => {
    const [p, q] = node
    // Half a face only where the other half lies in the duct, outside, or beyond a line of symmetry.
    if (indexOf(p + 1, q) !== null) {
      const acrossM = alongY.faceM(q, p < 0 ? 0 : null)
      links.push({ one: node, two: [p + 1, q], conductance: (lambda * acrossM) / alongX.gapM(p) })
    }
    if (indexOf(p, q + 1) !== null) {
      const acrossM = alongX.faceM(p, q < 0 ? 0 : null)
      links.push({ one: node, two: [p, q + 1], conductance: (lambda * acrossM) / alongY.gapM(q) })
    }
    const isHeld = isInside(node) || (film === null && isOutside(node))
    if (isHeld) {
      band.add(index, index, 1)
      right[index] = isInside(node) ? 1 : 0
    } else if (film !== null) {
      const edgeM =
        (p === cells ? alongY.faceM(q, null) : 0) + (q === cells ? alongX.faceM(p, null) : 0)
      band.add(index, index, film * edgeM)
    }
  })
  const heldAt = (node: Node): number | null => {
    if (isInside(node)) return 1
    return film === null && isOutside(node) ? 0 : null
  }
  for (const { one, two, conductance } of links) {
    const [i, j] = [indexOf(...one), indexOf(...two)] as [number, number]
    const [heldOne, heldTwo] = [heldAt(one), heldAt(two)]
    if (heldOne === null) {
      band.add(i, i, conductance)
      if (heldTwo === null) band.add(i, j, -conductance)
      else right[i] = (right[i] as number) + conductance * heldTwo
    }
    if (heldTwo === null) {
      band.add(j, j, conductance)
      if (heldOne !== null) right[j] = (right[j] as number) + conductance * heldOne
    }
  }
  const temps = band.solve(right)
  for (const { one, two, conductance } of links) {
    if (isInside(one) === isInside(two)) continue
    const [i, j] = [indexOf(...one), indexOf(...two)] as [number, number]
    flow += conductance * Math.abs((temps[i] as number) - (temps[j] as number))
  }
  // The rest of the sides, beyond the corner's reach, is flat.
  const flat = 1 / (thicknessM / lambda + (film === null ? 0 : 1 / film))
  return halves.reduce((sum, half, i) => sum + flat * (half - (armsM[i] as number)), flow)
}

/** p counts grid lines along the width and q along the height; both are 0 at the duct's corner, and the lagging is p > 0 or q > 0. */
type Node = readonly [p: number, q: number]

/** Distances along one axis: `count` cells over the arm, which ends at a line of symmetry, then `cells` over the thickness. */
function axis(armM: number, count: number, stepM: number, cells: number) {
  const gapM = (index: number): number => (index < 0 ? armM / count : stepM)
  return {
    /** From line `index` to the next. */
    gapM,
    /** Half a gap to either side of a line; `from` is the line below which there is no lagging. */
    faceM: (index: number, from: number | null): number => {
      const below = index === -count || (from !== null && index <= from) ? 0 : gapM(index - 1) / 2
      return below + (index === cells ? 0 : gapM(index) / 2)
    },
  }
}

/** Nodes of the quarter, diagonal by diagonal: neighbours lie on diagonals next to each other. */
function numbered(left: number, down: number, cells: number) {
  const nodes: Node[] = []
  for (let p = -left; p <= cells; p += 1) {
    for (let q = p < 0 ? 0 : -down; q <= cells; q += 1) nodes.push([p, q])
  }
  nodes.sort((one, two) => one[0] - one[1] - (two[0] - two[1]) || one[0] - two[0])
  const indices = new Map(nodes.map(([p, q], index) => [p * 1e5 + q, index]))
  return {
    nodes,
    indexOf: (p: number, q: number): number | null => indices.get(p * 1e5 + q) ?? null,
  }
}

/** Symmetric positive band matrix, upper half only; solved by Cholesky's method without taking roots. */
class Band {
  private readonly values: Float64Array
  private readonly size: number
  private readonly width: number

  constructor(size: number, width: number) {
    this.size = size
    this.width = width
    this.values = new Float64Array(size * (width + 1))
  }

  add(row: number, column: number, value: number): void {
    const [low, high] = row < column ? [row, column] : [column, row]
    if (high - low > this.width) throw new Error('The grid is numbered outside its band.')
    const place = low * (this.width + 1) + high - low
    this.values[place] = (this.values[place] as number) + value
  }

  solve(right: Float64Array): Float64Array {
    const { values, size, width } = this
    const stride = width + 1
    for (let row = 0; row < size; row += 1) {
      const pivot = values[row * stride] as number
      const reach = Math.min(width, size - 1 - row)
      for (let k = 1; k <= reach; k += 1) {
        const entry = values[row * stride + k] as number
        if (entry === 0) continue
        const factor = entry / pivot
        const target = (row + k) * stride
        for (let m = k; m <= reach; m += 1) {
          values[target + m - k] =
            (values[target + m - k] as number) - factor * (values[row * stride + m] as number)
        }
        right[row + k] = (right[row + k] as number) - factor * (right[row] as number)
      }
    }
    for (let row = size - 1; row >= 0; row -= 1) {
      let sum = right[row] as number
      for (let k = 1; k <= Math.min(width, size - 1 - row); k += 1) {
        sum -= (values[row * stride + k] as number) * (right[row + k] as number)
      }
      right[row] = sum / (values[row * stride] as number)
    }
    return right
  }
}
