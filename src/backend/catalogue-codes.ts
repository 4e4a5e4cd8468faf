/** Reads the code tables of the catalogue with their rows and factors. */
import type Database from 'better-sqlite3'
import type { CodeConditions, CodeFactor, CodeRow, CodeTable } from '#catalogue/types.ts'

type Of<T> = T & { readonly tableId: string }
type FlatRow = Omit<CodeRow, 'conditions'> & {
  readonly [K in keyof CodeConditions]: CodeConditions[K] | null
}

export function codeTables(db: Database.Database): CodeTable[] {
  const rows = Map.groupBy(
    db
      .prepare<[], Of<FlatRow>>(
        `SELECT table_id AS tableId, size_min_m AS sizeMinM, size_max_m AS sizeMaxM, fluid_min_c AS fluidMinC,
          fluid_max_c AS fluidMaxC, conductivity_min_w_per_m_k AS conductivityMinWPerMK,
          conductivity_max_w_per_m_k AS conductivityMaxWPerMK, rating_mean_c AS ratingMeanC, quantity, value, rule,
          condition_medium_c AS mediumC, condition_air_c AS airC, condition_wind_m_per_s AS windMPerS,
          condition_emissivity AS emissivity, note, source, confidence
         FROM code_row ORDER BY rowid`,
      )
      .all(),
    ({ tableId }) => tableId,
  )
  const factors = Map.groupBy(
    db
      .prepare<[], Of<CodeFactor>>(
        `SELECT table_id AS tableId, factor, applies_to AS appliesTo, source, confidence
         FROM code_factor ORDER BY rowid`,
      )
      .all(),
    ({ tableId }) => tableId,
  )
  return db
    .prepare<[], Omit<CodeTable, 'rows' | 'factors'>>(
      `SELECT id, name, edition, service, size_basis AS sizeBasis, size_border AS sizeBorder,
        fluid_border AS fluidBorder, conversion, note, warning, source, confidence
       FROM code_table ORDER BY rowid`,
    )
    .all()
    .map((table) => ({
      ...table,
      rows: (rows.get(table.id) ?? []).map(row),
      factors: (factors.get(table.id) ?? []).map(({ tableId: _, ...factor }) => factor),
    }))
}

function row({ tableId: _, mediumC, airC, windMPerS, emissivity, ...cell }: Of<FlatRow>): CodeRow {
  const isStated = mediumC !== null && airC !== null && windMPerS !== null
  return { ...cell, conditions: isStated ? { mediumC, airC, windMPerS, emissivity } : null }
}
