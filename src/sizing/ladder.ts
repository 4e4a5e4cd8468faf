/** The ladder: every thickness of one material that can be bought, put together by the layering rule. */
import type { InchSection, ThicknessStep } from '#catalogue/types.ts'
import type { Step } from './problem.ts'

/** Up to this thickness one layer is usual. Source: layering rule `two_layers_over_50` of the catalogue. */
const SINGLE_UP_TO_M = 0.05
/** Nominal 2 in counts as 50 mm. */
const SINGLE_UP_TO_INCH_M = 0.0508
/** First layer of a pair. Source: layering rule `first_layer_40_50` of the catalogue. */
const FIRST_PIECES_M = [0.04, 0.05]
const FIRST_PIECES_INCH_M = [0.0381, 0.0508]

const EQUAL_M = 1e-9
const same = (a: number, b: number): boolean => Math.abs(a - b) < EQUAL_M

/** Section thicknesses of a conductivity given by hand [m]. Source: product rule, a common section series. */
const PLAIN_STEPS_M = [0.02, 0.025, 0.03, 0.04, 0.05, 0.06, 0.07, 0.08, 0.09, 0.1]

/** Rungs for a conductivity without a material: single pieces up to 50 mm, pairs above, up to 100 mm. */
export function plainSteps(): Step[] {
  const largestM = Math.max(...PLAIN_STEPS_M)
  return metricSteps(PLAIN_STEPS_M, { largestM, single: false }).filter(
    ({ thicknessM }) => thicknessM <= largestM + EQUAL_M,
  )
}

/**
 * Rungs of one material and series, thinnest first.
 *
 * Up to 50 mm one piece; above, the fewest pieces: a first layer of 40 or 50 mm and the piece that differs least from
 * it; beyond what such a pair reaches, the two pieces that differ least, up to twice the largest piece. A form sold as
 * a single layer stays single.
 */
export function metricLadder(steps: readonly ThicknessStep[]): Step[] {
  const metric = steps.filter((step) => step.series === 'metric')
  if (metric.length === 0) return []
  const largestM = Math.max(...metric.map((step) => step.maxSingleLayerM))
  return metricSteps(
    metric.map((step) => step.thicknessM),
    { largestM, single: metric.every((step) => step.singleLayerOnly) },
  )
}

function metricSteps(
  thicknessesM: readonly number[],
  form: { readonly largestM: number; readonly single: boolean },
): Step[] {
  const sold = distinct(thicknessesM)
  const pieces = sold.filter((thicknessM) => thicknessM <= form.largestM + EQUAL_M)
  const found: Step[] = pieces
    .filter((thicknessM) => form.single || thicknessM <= SINGLE_UP_TO_M + EQUAL_M)
    .map((thicknessM) => step([thicknessM]))
  if (!form.single) {
    found.push(...layered(pieces, FIRST_PIECES_M, SINGLE_UP_TO_M))
    // Listed thicknesses above the largest piece that no pair has made: wound up from the largest pieces.
    for (const totalM of sold) {
      if (!found.some((known) => same(known.thicknessM, totalM)))
        found.push(step(wound(totalM, pieces)))
    }
  }
  return thinnestFirst(found)
}

/** Every pair above what is laid in one: with a usual first piece as far as that reaches, then with any. */
function layered(
  pieces: readonly number[],
  firstPiecesM: readonly number[],
  singleUpToM: number,
): Step[] {
  const usual = pieces.filter((piece) => firstPiecesM.some((firstM) => same(firstM, piece)))
  const withUsual = pairs(usual, pieces, singleUpToM)
  const reachM = Math.max(singleUpToM, ...withUsual.map(({ thicknessM }) => thicknessM))
  return [...withUsual, ...pairs(pieces, pieces, reachM)]
}

/** For each total above a thickness, the pair with the smallest difference; the thinner first among equals. */
function pairs(firsts: readonly number[], seconds: readonly number[], aboveM: number): Step[] {
  const best: Step[] = []
  for (const firstM of firsts) {
    for (const secondM of seconds) {
      const candidate = step([firstM, secondM])
      if (candidate.thicknessM <= aboveM + EQUAL_M) continue
      const known = best.findIndex(({ thicknessM }) => same(thicknessM, candidate.thicknessM))
      const before = best[known]
      if (before === undefined) best.push(candidate)
      else if (difference(candidate) < difference(before) - EQUAL_M) best[known] = candidate
    }
  }
  return best
}

const difference = ({ piecesM }: Step): number => Math.abs((piecesM[0] ?? 0) - (piecesM[1] ?? 0))

/** The fewest pieces that make a total, largest first. */
function wound(totalM: number, pieces: readonly number[]): number[] {
  const made: number[] = []
  let leftM = totalM
  for (const pieceM of [...pieces].sort((a, b) => b - a)) {
    while (leftM >= pieceM - EQUAL_M) {
      made.push(pieceM)
      leftM -= pieceM
    }
  }
  return leftM > EQUAL_M ? [totalM] : made
}

/**
 * Rungs of an inch series on one pipe, thinnest first: computed with the true thickness of the section on that pipe.
 *
 * Pairs nest (the second section is the one whose bore is the first one's outside), so a pair's true thickness is that
 * of its nominal total. Without a table row (pipes above the series, ducts, flat surfaces) true equals nominal.
 */
export function inchLadder(
  steps: readonly ThicknessStep[],
  sections: readonly InchSection[],
  pipeOuterDiameterM: number | null,
): Step[] {
  const inch = steps.filter((candidate) => candidate.series === 'inch')
  if (inch.length === 0) return []
  const largestM = Math.max(...inch.map((candidate) => candidate.maxSingleLayerM))
  const pieces = distinct(inch.map((candidate) => candidate.thicknessM)).filter(
    (thicknessM) => thicknessM <= largestM + EQUAL_M,
  )
  const single = inch.every((candidate) => candidate.singleLayerOnly)
  const nominal = [
    ...pieces
      .filter((thicknessM) => single || thicknessM <= SINGLE_UP_TO_INCH_M + EQUAL_M)
      .map((thicknessM) => step([thicknessM])),
    ...(single ? [] : layered(pieces, FIRST_PIECES_INCH_M, SINGLE_UP_TO_INCH_M)),
  ]
  const fitting = sections.filter(
    (section) =>
      pipeOuterDiameterM !== null &&
      Math.abs(section.pipeOuterDiameterM - pipeOuterDiameterM) <= 0.01 * pipeOuterDiameterM,
  )
  return thinnestFirst(
    nominal.map((rung) => {
      const section = fitting.find(
        ({ nominalThicknessM }) => Math.abs(nominalThicknessM - rung.thicknessM) < 0.0004,
      )
      const actualM = section?.actualThicknessM ?? rung.thicknessM
      const stretch = actualM / rung.thicknessM
      return {
        thicknessM: actualM,
        nominalThicknessM: rung.thicknessM,
        piecesM: rung.piecesM.map((pieceM) => pieceM * stretch),
      }
    }),
  )
}

const step = (piecesM: readonly number[]): Step => ({
  thicknessM: cleanM(piecesM.reduce((sum, pieceM) => sum + pieceM, 0)),
  nominalThicknessM: null,
  piecesM,
})

/** A sum of millimetres without the dust of binary fractions, so that 40 + 50 mm is 90 mm. */
const cleanM = (lengthM: number): number => Math.round(lengthM * 1e7) / 1e7

function distinct(values: readonly number[]): number[] {
  return [...values]
    .sort((a, b) => a - b)
    .filter((value, index, sorted) => index === 0 || !same(value, sorted[index - 1] ?? 0))
}

function thinnestFirst(steps: readonly Step[]): Step[] {
  return [...steps]
    .sort((a, b) => a.thicknessM - b.thicknessM)
    .filter((rung, index, sorted) => {
      const before = sorted[index - 1]
      return before === undefined || !same(rung.thicknessM, before.thicknessM)
    })
}
