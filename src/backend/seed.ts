/**
 * Fills the catalogue with the shipped rows of `db/seed`. One CSV per table, named after it; its headers are the
 * columns of the table and its numbers are already SI with temperatures in °C, so nothing is converted on the way.
 * Lengths of the inch series are exact (25.4 mm to the inch). An empty cell is NULL where the column allows it.
 *
 * To change a shipped figure, edit the CSV: the next start sees that the files changed and replaces the shipped rows.
 */
import { createHash } from 'node:crypto'
import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import type Database from 'better-sqlite3'
import Papa from 'papaparse'

/** Parents stand before the tables that refer to them. */
const parents = [
  'material',
  'conductivity_series',
  'finish',
  'wall_material',
  'code_table',
] as const
const others = [
  'conductivity_point',
  'wall_material_point',
  'pipe_size',
  'duct_size',
  'thickness_step',
  'inch_section',
  'layering_rule',
  'medium_state',
  'steam_state',
  'fuel',
  'burn_threshold',
  'code_row',
  'code_factor',
  'fitting_area',
  'fitting_length',
  'support_allowance',
  'price_model',
  'finish_price',
  'labour_rate',
  'layer_factor',
] as const
export const seedTables: readonly string[] = [...parents, ...others]

/** Rows of the user that still hang on a shipped parent keep it alive when a later seed has dropped it. */
const unused: Readonly<Record<(typeof parents)[number], string>> = {
  conductivity_series: `NOT EXISTS (SELECT 1 FROM conductivity_point AS point
    WHERE point.material_id = conductivity_series.material_id AND point.series = conductivity_series.name)`,
  material: `id NOT IN (SELECT material_id FROM conductivity_series UNION SELECT material_id FROM thickness_step
    UNION SELECT material_id FROM price_model)`,
  finish: 'id NOT IN (SELECT finish_id FROM finish_price)',
  wall_material: `id NOT IN (SELECT wall_material_id FROM pipe_size
    UNION SELECT wall_material_id FROM wall_material_point)`,
  code_table: 'id NOT IN (SELECT table_id FROM code_row UNION SELECT table_id FROM code_factor)',
}

/** Replaces the shipped rows if the seed files are not those they came from. Rows of the user stay as they are. */
export function seed(db: Database.Database, folder: string): void {
  const files = seedTables.map((table) => ({
    table,
    text: readFileSync(join(folder, `${table}.csv`), 'utf8'),
  }))
  const hash = createHash('sha256')
  for (const { table, text } of files) hash.update(`${table}\n${text}\n`)
  const contentHash = hash.digest('hex')
  if (seededFrom(db) === contentHash) return

  const replace = db.transaction(() => {
    if (seededFrom(db) === contentHash) return
    for (const table of others) db.exec(`DELETE FROM ${table} WHERE origin = 'shipped'`)
    // Series first, since a material is only free once its series are gone.
    for (const table of [
      'conductivity_series',
      'material',
      'finish',
      'wall_material',
      'code_table',
    ] as const)
      db.exec(`DELETE FROM ${table} WHERE origin = 'shipped' AND ${unused[table]}`)
    for (const { table, text } of files) insertRows(db, table, text)
    db.prepare('INSERT OR REPLACE INTO seed_state (id, content_hash) VALUES (1, ?)').run(
      contentHash,
    )
  })
  replace.immediate()
}

function seededFrom(db: Database.Database): unknown {
  return db.prepare('SELECT content_hash FROM seed_state WHERE id = 1').pluck().get()
}

interface Column {
  readonly name: string
  readonly type: string
  readonly notnull: number
}

function insertRows(db: Database.Database, table: string, text: string): void {
  const parsed = Papa.parse<string[]>(text, { delimiter: ',', skipEmptyLines: true })
  const [header, ...rows] = parsed.data
  const columns = db.pragma(`table_info(${table})`) as Column[]
  const used = (header ?? []).map((name) => {
    const column = columns.find((candidate) => candidate.name === name)
    if (!column) throw new Error(`${table}.csv: the table has no column ${name}`)
    return column
  })
  const names = used.map((column) => column.name)
  const insert = db.prepare(
    `INSERT INTO ${table} (${names.join(', ')}) VALUES (${names.map(() => '?').join(', ')})
     ON CONFLICT DO ${onConflict(db, table, names)}`,
  )
  rows.forEach((row, index) => {
    try {
      if (row.length !== used.length) throw new Error(`${row.length} cells, not ${used.length}`)
      insert.run(used.map((column, i) => cell(row[i] ?? '', column)))
    } catch (error) {
      throw new Error(`${table}.csv, row ${index + 2}: ${(error as Error).message}`, {
        cause: error,
      })
    }
  })
}

/** A row of the user with the same key wins; a shipped parent that was kept takes the new values. */
function onConflict(db: Database.Database, table: string, names: readonly string[]): string {
  if (!(parents as readonly string[]).includes(table)) return 'NOTHING'
  const keys = (db.pragma(`table_info(${table})`) as (Column & { pk: number })[])
    .filter((column) => column.pk > 0)
    .map((column) => column.name)
  const values = names.filter((name) => !keys.includes(name))
  return `UPDATE SET ${values.map((name) => `${name} = excluded.${name}`).join(', ')}
    WHERE ${table}.origin = 'shipped'`
}

function cell(text: string, column: Column): string | number | null {
  if (text === '' && column.notnull === 0) return null
  if (column.type === 'TEXT') return text
  const value = text === '' ? Number.NaN : Number(text)
  if (!Number.isFinite(value)) throw new Error(`${column.name} is "${text}", not a number`)
  return value
}
