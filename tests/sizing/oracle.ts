/**
 * A second, slow way to the same answer: every rung made by trying all pieces, every rung solved and judged in the order
 * of the contract, the choice made over the whole list. It shares the solver and the catalogue with the program, nothing
 * of `src/sizing`, `src/money`, `src/touch` or `src/model/resolve`.
 */
import type { Finish, Material } from '#catalogue/types.ts'
import { dewPointC, solve } from '#solver/index.ts'
import type { Shape, Solution } from '#solver/types.ts'
import { catalogue } from './catalogue.ts'

/** A run with nothing left to look up but its rows. */
export interface Plain {
  readonly shape: Extract<Shape, { kind: 'pipe' | 'rect-duct' | 'flat' }>
  readonly isDuct: boolean
  readonly material: Material
  readonly finish: Finish
  readonly mediumC: number
  readonly mediumMaxC: number
  readonly mediumMinC: number
  readonly airC: number
  readonly touchAirC: number
  readonly dampAirC: number
  readonly windMPerS: number
  readonly humidity: number | null
  readonly contactS: number
  readonly maxSurfaceC: number | null
  readonly maxLossWPerM: number | null
  readonly maxLossWPerM2: number | null
  readonly money: {
    readonly pricePerKWh: number
    readonly efficiency: number
    readonly cop: number
    readonly hoursPerYear: number
    readonly discount: number
    readonly growth: number
    readonly lifeYears: number
  } | null
}

type Limit = 'touch' | 'loss' | 'damp' | 'service'

interface Verdict {
  readonly thicknessesM: readonly number[]
  readonly chosenM: number | null
  readonly governing: string
  readonly lifeCycle: number | null
}

/** Totals in millimetres with the number of pieces each is made of. */
function rungs(material: Material): ReadonlyMap<number, number> {
  const own = catalogue.steps.filter(
    (step) => step.materialId === material.id && step.series === 'metric',
  )
  const tenths = (lengthM: number): number => Math.round(lengthM * 10_000)
  const largest = Math.max(...own.map((step) => tenths(step.maxSingleLayerM)))
  const sold = [...new Set(own.map((step) => tenths(step.thicknessM)))]
  const pieces = sold.filter((piece) => piece <= largest)
  const totals = new Map<number, number>()
  const single = own.every((step) => step.singleLayerOnly)
  for (const piece of pieces) if (single || piece <= 500) totals.set(piece, 1)
  if (!single) {
    const sums = (firsts: readonly number[], above: number): number[] =>
      firsts.flatMap((a) => pieces.map((b) => a + b)).filter((total) => total > above)
    const usual = sums(
      pieces.filter((piece) => piece === 400 || piece === 500),
      500,
    )
    for (const total of [...usual, ...sums(pieces, Math.max(500, ...usual))]) totals.set(total, 2)
    for (const total of sold) {
      if (totals.has(total)) continue
      // Wound up from the largest pieces.
      let left = total
      let count = 0
      for (const piece of [...pieces].sort((a, b) => b - a)) {
        count += Math.floor(left / piece)
        left %= piece
      }
      totals.set(total, count)
    }
  }
  return new Map([...totals].sort(([a], [b]) => a - b).map(([total, n]) => [total / 10_000, n]))
}

const curve: Readonly<Record<string, readonly (readonly [number, number])[]>> = {
  'smooth-metal': [
    [4, 58],
    [10, 55],
    [60, 51],
    [600, 48],
  ],
  plastic: [
    [4, 74],
    [10, 70],
    [60, 60],
    [600, 48],
  ],
}

/** The two rows and the times that the tests use, written out. */
function burnC(touchClass: string, contactS: number): number {
  const row = curve[touchClass] ?? []
  for (let i = 1; i < row.length; i += 1) {
    const [lowS, lowC] = row[i - 1] ?? [0, 0]
    const [highS, highC] = row[i] ?? [0, 0]
    if (contactS >= lowS && contactS <= highS)
      return lowC + ((highC - lowC) * Math.log(contactS / lowS)) / Math.log(highS / lowS)
  }
  throw new Error(`No threshold for ${touchClass} at ${contactS} s`)
}

interface Solved {
  readonly loss: Solution
  readonly touch: Solution
  readonly damp: Solution
}

function solveAll(run: Plain, thicknessM: number): Solved {
  const at = (airC: number, windMPerS: number, mediumC: number, emissivity: number): Solution =>
    solve({
      shape: run.shape,
      layers: [{ thicknessM, conductivity: run.material.conductivity }],
      emissivity,
      mediumC,
      insideFilmWPerM2K: run.isDuct ? 15.5 : null,
      around: { airC, surroundingsC: airC, windMPerS, altitudeM: 0 },
      sunAbsorbedWPerM2: 0,
      film: 'detailed',
      inclinedFilm: 'higher',
    })
  const { emissivityNew, emissivityAged } = run.finish
  return {
    loss: at(run.airC, run.windMPerS, run.mediumC, emissivityAged),
    touch: at(run.touchAirC, 0, run.mediumMaxC, emissivityNew),
    damp: at(run.dampAirC, 0, run.mediumMinC, emissivityNew),
  }
}

const temps = (solution: Solution): number[] => solution.faces.map((face) => face.surfaceTempC)

function isServed(run: Plain, { touch, damp }: Solved): boolean {
  const { material, finish } = run
  const { pointsC } = material.conductivity
  const first = (pointsC[0] ?? 0) - 20
  const last = (pointsC.at(-1) ?? 0) + 20
  const isWithin = (solution: Solution): boolean =>
    solution.faces.every(({ interfaceTempsC }) => {
      const [inner = 0, outer = 0] = interfaceTempsC
      const mean = (inner + outer) / 2
      return mean >= first && mean <= last
    })
  const all = (solution: Solution): number[] =>
    solution.faces.flatMap((face) => [...face.interfaceTempsC])
  const isCold = run.mediumMinC < run.dampAirC
  if (!isWithin(touch) || (isCold && !isWithin(damp))) return false
  if (Math.max(...all(touch)) > material.serviceMaxC + 1e-6) return false
  if (isCold && Math.min(...all(damp)) < material.serviceMinC - 1e-6) return false
  return finish.surfaceMaxC === null || Math.max(...temps(touch)) <= finish.surfaceMaxC + 1e-6
}

function failing(run: Plain, thicknessM: number): ReadonlySet<Limit> {
  const solved = solveAll(run, thicknessM)
  const failed = new Set<Limit>()
  const hottest = Math.max(...temps(solved.touch))
  if (run.maxSurfaceC !== null && hottest > run.maxSurfaceC) failed.add('touch')
  if (hottest >= burnC(run.finish.touchClass, run.contactS)) failed.add('touch')
  const { heatLossWPerM, heatFluxWPerM2 } = solved.loss
  if (run.maxLossWPerM !== null && Math.abs(heatLossWPerM ?? 0) > run.maxLossWPerM)
    failed.add('loss')
  if (run.maxLossWPerM2 !== null && Math.abs(heatFluxWPerM2) > run.maxLossWPerM2) failed.add('loss')
  if (run.humidity !== null && run.mediumMinC < run.dampAirC) {
    const dewC = dewPointC({ airC: run.dampAirC, humidity: run.humidity })
    if (Math.min(...temps(solved.damp)) < dewC + 1) failed.add('damp')
  }
  if (!isServed(run, solved)) failed.add('service')
  return failed
}

/** Perimeter and area of the cross-section grown by a thickness. */
function section({ shape }: Plain, thicknessM: number): [perimeterM: number, areaM2: number] {
  if (shape.kind === 'flat') return [1, thicknessM]
  if (shape.kind === 'rect-duct') {
    const [a, b] = [shape.widthM + 2 * thicknessM, shape.heightM + 2 * thicknessM]
    return [2 * a + 2 * b, a * b]
  }
  const radiusM = shape.outerDiameterM / 2 + thicknessM
  return [2 * Math.PI * radiusM, Math.PI * radiusM * radiusM]
}

function lifeCycleCost(run: Plain, thicknessM: number, pieces: number): number | null {
  const { money } = run
  const price = catalogue.priceModels.find((row) => row.materialId === run.material.id)
  const cover = catalogue.finishPrices.find((row) => row.finishId === run.finish.id)
  if (!money || !price || !cover) return null
  const { ratePerHour, layerFactors } = catalogue.labour
  const [areaM2, outerM2] = section(run, thicknessM)
  const volumeM3 = outerM2 - section(run, 0)[1]
  const material = price.perM3 * volumeM3 + pieces * (price.perM2 * areaM2 + price.perM)
  const hours =
    (price.labourHoursPerM + price.labourHoursPerM2 * areaM2) *
    (layerFactors[Math.min(pieces, layerFactors.length) - 1] ?? 1)
  const coverCost = cover.perM2 * areaM2 * (1 + cover.wasteFraction)
  const coverHours = cover.labourHoursPerM + cover.labourHoursPerM2 * areaM2
  const installed =
    material * (1 + price.wasteFraction) + coverCost + (hours + coverHours) * ratePerHour
  const { heatLossWPerM, heatFluxWPerM2 } = solveAll(run, thicknessM).loss
  const flowW = heatLossWPerM ?? heatFluxWPerM2
  const useful = (Math.abs(flowW) * money.hoursPerYear) / 1000
  const perYear = (useful / (flowW < 0 ? money.cop : money.efficiency)) * money.pricePerKWh
  let worth = 0
  for (let year = 1; year <= money.lifeYears; year += 1)
    worth += perYear * ((1 + money.growth) / (1 + money.discount)) ** year
  return installed + worth
}

/** Where a limit stops failing between two rungs, by halving. */
function endM(run: Plain, limit: Limit, failsM: number, passesM: number): number {
  let [low, high] = [failsM, passesM]
  for (let step = 0; step < 45; step += 1) {
    const middle = (low + high) / 2
    if (failing(run, middle).has(limit)) low = middle
    else high = middle
  }
  return high
}

export function verdict(run: Plain): Verdict {
  const ladder = [...rungs(run.material)].map(([thicknessM, pieces]) => ({
    thicknessM,
    failed: failing(run, thicknessM),
    cost: lifeCycleCost(run, thicknessM, pieces),
  }))
  const thicknessesM = ladder.map(({ thicknessM }) => thicknessM)
  const passing = ladder.filter(({ failed }) => failed.size === 0)
  const isWeighed = ladder.every(({ cost }) => cost !== null)
  const chosen = isWeighed
    ? [...passing].sort((a, b) => (a.cost ?? 0) - (b.cost ?? 0) || a.thicknessM - b.thicknessM)[0]
    : passing[0]
  if (!chosen) return { thicknessesM, chosenM: null, governing: 'unmet', lifeCycle: null }
  const thinner = ladder[ladder.indexOf(chosen) - 1]
  const failed = [...(thinner?.failed ?? [])]
  const ends = failed.map((limit) => ({
    limit,
    fromM: endM(run, limit, thinner?.thicknessM ?? 0, chosen.thicknessM),
  }))
  const [governs] = ends.sort((a, b) => b.fromM - a.fromM)
  return {
    thicknessesM,
    chosenM: chosen.thicknessM,
    governing: governs?.limit ?? (isWeighed ? 'money' : 'smallest'),
    lifeCycle: chosen.cost,
  }
}
