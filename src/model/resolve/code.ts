/** The rows of a code table that hold for a run. */
import { codeRowsFor, findCodeTable, nominalSizeM } from '#catalogue/code-table.ts'
import type { CodeRow, CodeTable } from '#catalogue/types.ts'
import type { CodeLimit } from '#sizing/problem.ts'
import type { RunValues } from '../fields.ts'
import { asksOf, type CodeRun, diameterM, refuse, shapeWord } from './code-asks.ts'
import type { Conditions } from './conditions.ts'
import { type Findings, plain } from './findings.ts'
import type { CatalogueIndex } from './index-catalogue.ts'
import type { Thing } from './standing.ts'

export function resolveCode(
  values: RunValues,
  thing: Thing | null,
  conditions: Conditions | null,
  index: CatalogueIndex,
  findings: Findings,
): CodeLimit | null {
  const { codeTable: text, codeFactor } = values
  if (text === undefined) {
    if (codeFactor !== undefined)
      findings.note('unused', 'code_factor is not used: no code_table is given.')
    return null
  }
  const found = findCodeTable(index.catalogue, text)
  if (!found.ok) {
    findings.fault('codeTable', text, found.message)
    return null
  }
  if (!thing || !conditions) return null
  const run: CodeRun = { values, thing, conditions, index, findings }
  const rows = rowsOf(found.item, run)
  if (rows === null) return null
  const asks = asksOf(found.item, rows, run)
  if (asks === null) return null
  noteTable(found.item, rows, run)
  return { table: `${found.item.name}, ${found.item.edition}`, asks }
}

/** Rows of the run's band; null where it has none, or lacks what the table goes by. */
function rowsOf(table: CodeTable, run: CodeRun): readonly CodeRow[] | null {
  const size = sizeOf(table, run)
  if (size === null) return null
  const found = codeRowsFor(table, { ...size, fluidC: fluidC(run.conditions) })
  if (found.ok) return found.rows
  run.findings.note('code-asks-nothing', `Code is not judged. ${found.reason}`)
  return null
}

/** The medium as it is designed for: at its hottest where it is hotter than the air, else at its coldest. */
function fluidC({ loss, touch, damp }: Conditions): number {
  return loss.mediumC >= loss.around.airC ? touch.mediumC : damp.mediumC
}

interface Size {
  readonly nominalM: number | null
  readonly outerDiameterM: number | null
  readonly innerDiameterM: number | null
}

function sizeOf({ id, sizeBasis }: CodeTable, run: CodeRun): Size | null {
  const { thing, index, findings, values } = run
  const outerDiameterM = diameterM(thing)
  if (sizeBasis !== 'any' && outerDiameterM === null) {
    refuse(
      run,
      `a table that is not for pipes: ${id} goes by the size of a pipe, and a ${shapeWord(values)} has none`,
    )
    return null
  }
  const innerDiameterM =
    outerDiameterM !== null && thing.wallM !== null ? outerDiameterM - 2 * thing.wallM : null
  if (sizeBasis === 'inner-diameter' && innerDiameterM === null) {
    findings.fault(
      'wallM',
      'nothing',
      `the thickness of the pipe wall in mm, or a size such as DN 50: ${id} goes by the inner diameter`,
    )
    return null
  }
  let { nominalM } = thing
  if (sizeBasis === 'nominal' && nominalM === null && outerDiameterM !== null) {
    nominalM = nominalSizeM(index.catalogue, outerDiameterM)
    findings.note(
      'code-nominal-assumed',
      `${id} goes by nominal sizes: an outside diameter of ${plain(outerDiameterM * 1000)} mm is taken as DN ${plain(nominalM * 1000)}, the smallest steel pipe that is not thinner.`,
    )
  }
  return { nominalM, outerDiameterM, innerDiameterM }
}

/** Whatever a table says, a reader is to look it up; and which factor of it was taken. */
function noteTable(
  table: CodeTable,
  rows: readonly CodeRow[],
  { values, findings }: CodeRun,
): void {
  const { id, name, edition, service, warning, note, factors } = table
  const said = note === '' ? '' : ` ${note}`
  findings.note('code-table', `Code: ${name}, ${edition}, ${service} (${id}); ${warning}.${said}`)
  if (rows.some(({ confidence }) => confidence !== 'found')) {
    findings.note('code-recalled', `The figures of ${id} for this run are from memory: ${warning}.`)
  }
  const { codeFactor } = values
  if (codeFactor === undefined || codeFactor === 1) return
  const listed = factors
    .filter(({ factor }) => factor === codeFactor)
    .map(({ appliesTo }) => appliesTo)
  findings.note(
    'code-factor',
    listed.length > 0
      ? `The code's thickness is taken ${plain(codeFactor, 3)} times, which ${id} has for: ${listed.join('; ')}.`
      : `The code's figure is taken ${plain(codeFactor, 3)} times, as given; ${id} lists no such factor.`,
  )
}
