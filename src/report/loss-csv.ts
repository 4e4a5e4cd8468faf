/** Losses as CSV for a spreadsheet: one row per run, empty where a value does not apply; a spreadsheet sums for itself. */
import type { RunValues } from '#model/fields.ts'
import type { RunLoss } from '#model/run-loss.ts'
import { type Cell, cellText, millimetres, rowText } from './csv-cells.ts'
import { sizeWords } from './run-words.ts'

/** One run and what it loses; the values are those it was sized with. */
export interface LossLine {
  readonly values: RunValues
  readonly loss: RunLoss
}

const columns: readonly (readonly [header: string, cell: (line: LossLine) => Cell])[] = [
  ['tag', ({ loss }) => loss.tag],
  ['description', ({ values }) => values.description],
  ['place', ({ values }) => values.place],
  ['service', ({ values }) => values.service],
  ['group', ({ values }) => values.group],
  ['size', ({ values }) => sizeWords(values, 'si')],
  ['length_m', ({ values }) => values.lengthM],
  ['area_m2', ({ values }) => values.areaM2],
  ['built', ({ loss }) => loss.built],
  ['thickness_mm', ({ loss }) => millimetres(loss.thicknessM)],
  ['nominal_thickness_mm', ({ loss }) => millimetres(loss.nominalThicknessM)],
  ['bare_loss_w_m', ({ loss }) => loss.bare.heatLossWPerM],
  ['bare_flux_w_m2', ({ loss }) => loss.bare.heatFluxWPerM2],
  ['bare_loss_w', ({ loss }) => loss.bare.heatLossW],
  ['bare_mean_of_year_w', ({ loss }) => loss.bare.yearlyMeanLossW],
  ['built_loss_w_m', ({ loss }) => loss.asBuilt.heatLossWPerM],
  ['built_flux_w_m2', ({ loss }) => loss.asBuilt.heatFluxWPerM2],
  ['built_loss_w', ({ loss }) => loss.asBuilt.heatLossW],
  ['built_mean_of_year_w', ({ loss }) => loss.asBuilt.yearlyMeanLossW],
  ['hours_per_year', ({ loss }) => loss.hoursPerYear],
  ['bare_kwh', ({ loss }) => loss.bare.heatKWh],
  ['built_kwh', ({ loss }) => loss.asBuilt.heatKWh],
  ['saved_kwh', ({ loss }) => loss.saved.heatKWh],
  ['fuel', ({ loss }) => loss.fuel],
  ['currency', ({ loss }) => loss.currency],
  ['bare_cost', ({ loss }) => loss.bare.cost],
  ['built_cost', ({ loss }) => loss.asBuilt.cost],
  ['saved_cost', ({ loss }) => loss.saved.cost],
  ['bare_co2_kg', ({ loss }) => loss.bare.co2Kg],
  ['built_co2_kg', ({ loss }) => loss.asBuilt.co2Kg],
  ['saved_co2_kg', ({ loss }) => loss.saved.co2Kg],
  ['notes', ({ loss }) => loss.notes.map(({ text }) => text).join(' ')],
]

/** Header and rows, a text each, since a long list does not fit into one string. */
export function* writeLossCsv(lines: Iterable<LossLine>): Iterable<string> {
  yield rowText(columns.map(([header]) => header))
  for (const line of lines) yield rowText(columns.map(([, cell]) => cellText(cell(line))))
}
