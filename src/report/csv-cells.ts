/** Cells and rows of the CSV files that are written for a spreadsheet. */
import Papa from 'papaparse'
import { writeDecimal } from '#model/decimal.ts'
import { guardFormula } from './csv-text.ts'

export type Cell = string | number | null | undefined

export function rowText(cells: readonly string[]): string {
  return `${Papa.unparse([[...cells]])}\n`
}

export function millimetres(metres: number | null | undefined): number | null {
  return metres === null || metres === undefined ? null : metres * 1000
}

/** Six digits: more than any input has. */
export function cellText(cell: Cell): string {
  if (typeof cell === 'number') return writeDecimal(Number(cell.toPrecision(6)))
  return guardFormula(cell ?? '')
}
