/** The answer as CSV for a spreadsheet: mm and kWh, one row per run, empty where a value does not apply. */
import type { RunResult } from '#sizing/result.ts'
import { type Cell, cellText, millimetres, rowText } from './csv-cells.ts'
import { isJudged, meetsLimits, type SizedRun, sizeWords } from './run-words.ts'

const columns: readonly (readonly [header: string, cell: (run: SizedRun) => Cell])[] = [
  ['tag', ({ result }) => result.tag],
  ['description', ({ values }) => values.description],
  ['place', ({ values }) => values.place],
  ['service', ({ values }) => values.service],
  ['group', ({ values }) => values.group],
  ['size', ({ values }) => sizeWords(values, 'si')],
  ['length_m', ({ values }) => values.lengthM],
  ['area_m2', ({ values }) => values.areaM2],
  ['governing', ({ result }) => result.governing],
  ['meets_limits', ({ result }) => meetsWord(result)],
  ['thickness_mm', ({ result }) => millimetres(result.chosen?.thicknessM)],
  ['nominal_thickness_mm', ({ result }) => millimetres(result.chosen?.nominalThicknessM)],
  ['outer_diameter_mm', ({ result }) => millimetres(result.chosen?.outerDiameterM)],
  ['heat_loss_w_m', ({ result }) => result.chosen?.heatLossWPerM],
  ['heat_flux_w_m2', ({ result }) => result.chosen?.heatFluxWPerM2],
  ['heat_loss_w', ({ result }) => result.chosen?.heatLossW],
  ['yearly_kwh', ({ result }) => result.chosen?.yearlyKWh],
  ['surface_c', ({ result }) => result.chosen?.surfaceTempC],
  ['touch_surface_c', ({ result }) => result.chosen?.touchSurfaceC],
  ['bare_loss_w_m', ({ result }) => result.bare.heatLossWPerM],
  ['bare_flux_w_m2', ({ result }) => result.bare.heatFluxWPerM2],
  ['bare_loss_w', ({ result }) => result.bare.heatLossW],
  ['bare_yearly_kwh', ({ result }) => result.bare.yearlyKWh],
  ['bare_surface_c', ({ result }) => result.bare.surfaceTempC],
  ['currency', ({ result }) => result.money?.currency],
  ['installed', ({ result }) => result.money?.installedTotal],
  ['saving_per_year', ({ result }) => result.money?.savingPerYearTotal],
  ['payback_years', ({ result }) => result.money?.paybackYears],
  ['co2_kg_per_year', ({ result }) => result.money?.co2KgPerYear],
  ['co2_saved_kg_per_year', ({ result }) => result.money?.co2SavedKgPerYear],
  ['reason', ({ result }) => result.reason],
  ['notes', ({ result }) => result.notes.map(({ text }) => text).join(' ')],
]

function meetsWord(result: RunResult): string {
  if (!meetsLimits(result)) return 'no'
  return isJudged(result) ? 'yes' : 'none judged'
}

/** Header and rows, a text each, since a long list does not fit into one string. */
export function* writeResultsCsv(runs: Iterable<SizedRun>): Iterable<string> {
  yield rowText(columns.map(([header]) => header))
  for (const run of runs) yield rowText(columns.map(([, cell]) => cellText(cell(run))))
}
