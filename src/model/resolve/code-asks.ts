/** What the rows of a code table ask of a run. */
import type { CodeRow, CodeTable } from '#catalogue/types.ts'
import type { CodeAsk, CodeThickness, Condition } from '#sizing/problem.ts'
import type { RunValues } from '../fields.ts'
import type { Conditions } from './conditions.ts'
import { type Findings, plain } from './findings.ts'
import type { CatalogueIndex } from './index-catalogue.ts'
import type { Thing } from './standing.ts'

/** What is asked about, and where to say what was found. */
export interface CodeRun {
  readonly values: RunValues
  readonly thing: Thing
  readonly conditions: Conditions
  readonly index: CatalogueIndex
  readonly findings: Findings
}

/** Of a pipe or round duct [m]; null of anything else. */
export function diameterM({ shape }: Thing): number | null {
  return shape.kind === 'pipe' || shape.kind === 'buried-pipe' ? shape.outerDiameterM : null
}

export const shapeWord = ({ shape }: RunValues): string =>
  shape === 'flat' ? 'flat surface' : (shape ?? 'run')

export const refuse = ({ values, findings }: CodeRun, allowed: string): void =>
  findings.fault('codeTable', values.codeTable ?? '', allowed)

/** What the rows ask, quantity by quantity; null where the run is not what they are for. */
export function asksOf(
  table: CodeTable,
  rows: readonly CodeRow[],
  run: CodeRun,
): readonly CodeAsk[] | null {
  const asks: (CodeAsk | null)[] = []
  const thicknesses = rows.filter(({ quantity }) => quantity === 'min-thickness')
  if (thicknesses.length > 0) asks.push(thicknessAsk(table, thicknesses, run))
  for (const row of rows) {
    if (row.quantity === 'min-resistance') asks.push(resistanceAsk(table, row, run))
    if (row.quantity === 'max-loss') asks.push(lossAsk(table, row, run))
  }
  const made = asks.filter((ask) => ask !== null)
  return made.length === asks.length ? made : null
}

function thicknessAsk(
  table: CodeTable,
  rows: readonly CodeRow[],
  run: CodeRun,
): CodeThickness | null {
  const { thing, values } = run
  const outerDiameterM = diameterM(thing)
  if (outerDiameterM === null) {
    refuse(run, `a table for a ${shapeWord(values)}: ${table.id} asks for a thickness on pipes`)
    return null
  }
  const boreM = thing.wallM === null ? null : outerDiameterM - 2 * thing.wallM
  const factor = values.codeFactor ?? 1
  const asked = rows
    .map((row) => ({
      rangeWPerMK: rangeOf(row),
      thicknessM: row.rule === 'inner-diameter' ? boreM : row.value,
    }))
    .toSorted((a, b) => (a.rangeWPerMK?.[1] ?? 0) - (b.rangeWPerMK?.[1] ?? 0))
    .flatMap(({ rangeWPerMK, thicknessM }) =>
      thicknessM === null ? [] : [{ rangeWPerMK, thicknessM: factor * thicknessM }],
    )
  if (asked.length < rows.length) {
    run.findings.fault(
      'wallM',
      'nothing',
      `the thickness of the pipe wall in mm, or a size such as DN 50: ${table.id} asks for the inner diameter as thickness`,
    )
    return null
  }
  return {
    kind: 'thickness',
    rows: asked,
    conversion: table.conversion,
    radiusM: outerDiameterM / 2,
    ratingMeanC: ratingMeanC(table, rows, run),
  }
}

function rangeOf({
  conductivityMinWPerMK,
  conductivityMaxWPerMK,
}: CodeRow): readonly [number, number] | null {
  return conductivityMinWPerMK === null || conductivityMaxWPerMK === null
    ? null
    : [conductivityMinWPerMK, conductivityMaxWPerMK]
}

/** As the table states; where it states none, midway between medium and air. */
function ratingMeanC(
  { id }: CodeTable,
  rows: readonly CodeRow[],
  { conditions, findings }: CodeRun,
): number {
  const stated = rows.find((row) => row.ratingMeanC !== null)?.ratingMeanC ?? null
  if (stated !== null) return stated
  const { mediumC, around } = conditions.loss
  const meanC = (mediumC + around.airC) / 2
  findings.note(
    'code-mean-assumed',
    `${id} states no mean temperature for its conductivity: taken midway between medium and air, ${plain(meanC)} °C.`,
  )
  return meanC
}

function resistanceAsk(table: CodeTable, row: CodeRow, run: CodeRun): CodeAsk | null {
  const { values } = run
  const isSheet =
    values.shape === 'round-duct' || values.shape === 'rect-duct' || values.shape === 'flat'
  if (!isSheet) {
    refuse(run, `a table for a ${shapeWord(values)}: ${table.id} asks for a resistance of ducts`)
    return null
  }
  return {
    kind: 'resistance',
    resistanceM2KPerW: (row.value ?? 0) * (values.codeFactor ?? 1),
    ratingMeanC: ratingMeanC(table, [row], run),
  }
}

function lossAsk(
  { id }: CodeTable,
  { value, conditions: stated }: CodeRow,
  run: CodeRun,
): CodeAsk | null {
  const { values, thing, findings } = run
  if (values.codeFactor !== undefined && values.codeFactor !== 1) {
    findings.fault(
      'codeFactor',
      plain(values.codeFactor, 3),
      `nothing beside ${id}: it limits a loss, and factors are for thicknesses`,
    )
    return null
  }
  const isInAir = thing.shape.kind === 'pipe' || thing.shape.kind === 'rect-duct'
  if (!isInAir || stated === null || value === null) {
    refuse(
      run,
      `a table for a ${thing.shape.kind === 'buried-pipe' ? 'buried run' : shapeWord(values)}: ${id} limits the loss of a metre of run in air`,
    )
    return null
  }
  return {
    kind: 'loss',
    maxLossWPerM: value,
    condition: statedCondition(stated, run.conditions.loss),
  }
}

/** The table's own medium, air and wind, without sun; the emissivity of the aged finish where it states none. */
function statedCondition(
  { mediumC, airC, windMPerS, emissivity }: NonNullable<CodeRow['conditions']>,
  loss: Condition,
): Condition {
  return {
    ...loss,
    around: { airC, surroundingsC: airC, windMPerS, altitudeM: 0 },
    sky: null,
    mediumC,
    emissivity: emissivity ?? loss.emissivity,
    sunWPerM2: 0,
    film: 'detailed',
  }
}
