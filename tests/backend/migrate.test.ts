import { readdirSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import Database from 'better-sqlite3'
import { describe, expect, onTestFinished, test } from 'vitest'
import { migrate, migrationFiles, schemaVersion } from '#backend/migrate.ts'
import { catalogueMigrations, dbFolder, jobMigrations } from './program-folder.ts'
import { temporaryFolder } from './temporary-folder.ts'

const tooNew = (found: number, known: number) => new Error(`found ${found}, known ${known}`)

function memory(): Database.Database {
  const db = new Database(':memory:')
  onTestFinished(() => void db.close())
  return db
}

function schema(db: Database.Database): string {
  const statements = db
    .prepare<[], string>(
      'SELECT sql FROM sqlite_schema WHERE sql IS NOT NULL ORDER BY type DESC, name',
    )
    .pluck()
    .all()
  return `${statements.map((sql) => `${sql};`).join('\n\n')}\n`
}

describe.each([
  { chain: 'catalogue', folder: catalogueMigrations, snapshot: 'schema.sql' },
  { chain: 'job file', folder: jobMigrations, snapshot: 'job-schema.sql' },
])('the migrations of the $chain', ({ folder, snapshot }) => {
  test('are numbered without gaps', () => {
    const files = migrationFiles(folder)
    expect(files.length).toBeGreaterThan(0)
    expect(readdirSync(folder).sort()).toEqual(files)
    expect(files.map((name) => Number(name.slice(0, 4)))).toEqual(files.map((_, i) => i + 1))
  })

  // To write the snapshot anew after a migration was added: vitest run tests/backend/migrate.test.ts -u
  test('build the schema that is committed', async () => {
    const db = memory()
    migrate(db, folder, tooNew)
    await expect(schema(db)).toMatchFileSnapshot(join(dbFolder, snapshot))
  })

  test('build only STRICT tables', () => {
    const db = memory()
    migrate(db, folder, tooNew)
    const tables = db.pragma('table_list') as { name: string; strict: number }[]
    const loose = tables.filter(({ name, strict }) => !name.startsWith('sqlite_') && strict === 0)
    expect(loose).toEqual([])
  })

  test('change nothing the second time', () => {
    const db = memory()
    migrate(db, folder, tooNew)
    const once = schema(db)
    migrate(db, folder, tooNew)
    expect(schema(db)).toBe(once)
    expect(schemaVersion(db)).toBe(migrationFiles(folder).length)
  })

  test('refuse a database from a later program', () => {
    const db = memory()
    const known = migrationFiles(folder).length
    db.pragma(`user_version = ${known + 3}`)
    expect(() => migrate(db, folder, tooNew)).toThrow(`found ${known + 3}, known ${known}`)
    expect(schema(db)).toBe('\n')
  })
})

test('a broken migration leaves nothing behind', () => {
  const folder = temporaryFolder()
  writeFileSync(join(folder, '0001_good.sql'), 'CREATE TABLE good (id INTEGER PRIMARY KEY) STRICT;')
  const db = memory()
  migrate(db, folder, tooNew)
  writeFileSync(join(folder, '0002_fine.sql'), 'CREATE TABLE fine (id INTEGER PRIMARY KEY) STRICT;')
  writeFileSync(
    join(folder, '0003_broken.sql'),
    'CREATE TABLE half (id INTEGER PRIMARY KEY) STRICT; INSERT INTO nowhere VALUES (1);',
  )
  const before = schema(db)
  expect(() => migrate(db, folder, tooNew)).toThrow('no such table: nowhere')
  expect(schema(db)).toBe(before)
  expect(schemaVersion(db)).toBe(1)
  expect(db.inTransaction).toBe(false)
})

test('other files in the folder are no migrations', () => {
  const folder = temporaryFolder()
  writeFileSync(join(folder, '0001_good.sql'), 'CREATE TABLE good (id INTEGER PRIMARY KEY) STRICT;')
  writeFileSync(join(folder, 'notes.txt'), 'none of it SQL')
  writeFileSync(join(folder, '0002_good.sql.bak'), 'none of it SQL')
  expect(migrationFiles(folder)).toEqual(['0001_good.sql'])
})
