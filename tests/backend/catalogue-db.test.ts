import { cpSync, readFileSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import type Database from 'better-sqlite3'
import { describe, expect, onTestFinished, test } from 'vitest'
import { openCatalogue, readCatalogue } from '#backend/catalogue-db.ts'
import { AppError } from '#contract/failures.ts'
import { dbFolder } from './program-folder.ts'
import { temporaryFolder } from './temporary-folder.ts'

function opened(dataFolder: string, from = dbFolder): Database.Database {
  const db = openCatalogue(dataFolder, from)
  onTestFinished(() => void db.close())
  return db
}

/** A copy of db/ whose seeds a test may change. */
function ownSeeds(change: (text: string) => string, table = 'finish'): string {
  const folder = join(temporaryFolder(), 'db')
  cpSync(dbFolder, folder, { recursive: true })
  const file = join(folder, 'seed', `${table}.csv`)
  writeFileSync(file, change(readFileSync(file, 'utf8')))
  return folder
}

const emissivity = (db: Database.Database, id: string) =>
  db.prepare('SELECT emissivity_new FROM finish WHERE id = ?').pluck().get(id)

function ownLossTable(db: Database.Database): void {
  db.exec(`
    INSERT INTO code_table (id, name, edition, service, size_basis, size_border, fluid_border, conversion, note,
      warning, source, confidence, origin)
    VALUES ('my-losses', 'Losses of our contract', '2026', 'hot water', 'outer-diameter', 'band-below', 'band-below',
      'none', '', 'ours', 'contract', 'found', 'user');
    INSERT INTO code_row (table_id, size_max_m, quantity, value, condition_medium_c, condition_air_c,
      condition_wind_m_per_s, condition_emissivity, note, source, confidence, origin)
    VALUES ('my-losses', 0.008, 'max-loss', 7.06, 60, 15, 0, 0.9, '', 'contract', 'found', 'user');`)
}

describe('reading', () => {
  const catalogue = () => readCatalogue(opened(':memory:'))

  test('gives everything that ships', () => {
    const { materials, pipeSizes, steps, inchSections, labour, ...rest } = catalogue()
    expect(materials).toHaveLength(30)
    expect(pipeSizes).toHaveLength(730)
    expect(steps).toHaveLength(247)
    expect(inchSections).toHaveLength(352)
    expect(Object.values(rest).every((rows) => rows.length > 0)).toBe(true)
    expect(labour.layerFactors).toEqual([1, 1.65, 2.25])
  })

  test('a material carries its default curve in rising temperatures', () => {
    const { materials } = catalogue()
    const wool = materials.find(({ id }) => id === 'stone_wool_pipe_section')
    // Generic property tables of a trade handbook, 120 kg/m3, as in db/seed/conductivity_point.csv.
    expect(wool?.conductivity).toEqual({
      kind: 'curve',
      basis: 'point',
      pointsC: [10, 50, 100, 200, 300, 400],
      valuesWPerMK: [0.033, 0.037, 0.044, 0.06, 0.081, 0.106],
    })
    expect(wool?.curveConfidence).toBe('found')
    for (const { conductivity, id } of materials) {
      expect(conductivity.pointsC.length, id).toBe(conductivity.valuesWPerMK.length)
      expect([...conductivity.pointsC], id).toEqual([...conductivity.pointsC].sort((a, b) => a - b))
    }
  })

  test('mats are kept off small pipes, and only mats', () => {
    const kept = catalogue().materials.filter((material) => material.notOnDiametersUpToM !== null)
    expect(kept.map(({ form, notOnDiametersUpToM }) => [form, notOnDiametersUpToM])).toEqual([
      ['mat', 0.2],
      ['mat', 0.2],
      ['mat', 0.2],
    ])
  })

  test('a finish says how it takes the sun and whether vapour gets through', () => {
    const finish = (wanted: string) => {
      const row = catalogue().finishes.find(({ id }) => id === wanted)
      return [
        row?.solarAbsorptanceNew,
        row?.solarAbsorptanceAged,
        row?.vapourTight,
        row?.vapourNote,
      ]
    }
    // As in db/seed/finish.csv; the absorptances are from memory there.
    expect(finish('al_plain')).toEqual([0.15, 0.4, 'if sealed', 'only if all laps sealed'])
    expect(finish('grp_uv')).toEqual([0.5, 0.6, 'yes', 'yes'])
    expect(finish('canvas_glasscloth')).toEqual([0.4, 0.6, 'no', 'no'])
    expect(finish('bare_steel_pipe')).toEqual([0.85, 0.9, null, ''])
  })

  test('a code table carries its rows and factors', () => {
    const { codeTables } = catalogue()
    const geg = codeTables.find(({ id }) => id === 'geg-2024-heating')
    // German Building Energy Act, annex 8: 20 and 30 mm, then the inner diameter, then 100 mm; half and double.
    expect(geg?.rows.map(({ value, rule }) => rule ?? value)).toEqual([
      0.02,
      0.03,
      'inner-diameter',
      0.1,
    ])
    expect(geg?.factors.map(({ factor }) => factor)).toEqual([0.5, 0.5, 2])
    expect(codeTables.every(({ rows }) => rows.length > 0)).toBe(true)
    expect(codeTables.flatMap(({ rows }) => rows)).toHaveLength(200)
  })

  test('a code table of the user may hold losses with conditions of their own', () => {
    const db = opened(':memory:')
    // BS 5422:2023 table 20A as quoted in an open-source hot-water model: 60 °C in still air at 15 °C, emissivity 0.90.
    ownLossTable(db)
    const own = readCatalogue(db).codeTables.find(({ id }) => id === 'my-losses')
    expect(own).toMatchObject({ sizeBasis: 'outer-diameter', conversion: 'none', factors: [] })
    expect(own?.rows).toMatchObject([
      {
        sizeMinM: null,
        sizeMaxM: 0.008,
        quantity: 'max-loss',
        value: 7.06,
        rule: null,
        conductivityMinWPerMK: null,
        conditions: { mediumC: 60, airC: 15, windMPerS: 0, emissivity: 0.9 },
      },
    ])
  })

  const thickness = { quantity: 'min-thickness', value: 0.02 }
  const range = { conductivity_min_w_per_m_k: 0.04, conductivity_max_w_per_m_k: 0.04 }
  const loss = { quantity: 'max-loss', value: 7.06, condition_medium_c: 60 }
  test.each([
    ['a thickness without a conductivity', thickness],
    ['a loss without its air', { ...loss, condition_wind_m_per_s: 0 }],
    ['a loss without its wind', { ...loss, condition_air_c: 15 }],
    ['a resistance for one conductivity', { ...range, quantity: 'min-resistance', value: 1 }],
    ['a row that asks for nothing', { ...range, quantity: 'min-thickness' }],
    ['a number beside a rule', { ...range, ...thickness, rule: 'inner-diameter' }],
    ['a band that ends before it starts', { ...range, ...thickness, size_min_m: 2, size_max_m: 1 }],
  ])('refuses %s in a code', (_, cells) => {
    const row = {
      ...{ table_id: 'dpr-412-a', note: '', source: 'mine', confidence: 'found', origin: 'user' },
      ...cells,
    }
    const names = Object.keys(row)
    const insert = opened(':memory:').prepare(
      `INSERT INTO code_row (${names.join(', ')}) VALUES (${names.map(() => '?').join(', ')})`,
    )
    expect(() => insert.run(Object.values(row))).toThrow('CHECK constraint failed')
  })

  test('each key that one list takes from another is there', () => {
    const read = catalogue()
    const materials = new Set(read.materials.map(({ id }) => id))
    const finishes = new Set(read.finishes.map(({ id }) => id))
    const walls = new Set(read.wallMaterials.map(({ id }) => id))
    expect(read.steps.filter(({ materialId }) => !materials.has(materialId))).toEqual([])
    expect(read.priceModels.filter(({ materialId }) => !materials.has(materialId))).toEqual([])
    expect(read.finishPrices.filter(({ finishId }) => !finishes.has(finishId))).toEqual([])
    expect(read.pipeSizes.filter(({ wallMaterial }) => !walls.has(wallMaterial))).toEqual([])
  })
})

describe('opening', () => {
  test('a second time reads what the first time built', () => {
    const folder = temporaryFolder()
    const first = readCatalogue(opened(folder))
    expect(readCatalogue(opened(folder))).toEqual(first)
  })

  test('takes new seeds, and leaves rows of the user alone', () => {
    const folder = temporaryFolder()
    const before = opened(folder)
    before.exec(`
      INSERT INTO finish SELECT 'my_jacket', 'My jacket', category, 0.33, 0.5, 0.4, touch_class, coating,
        coating_thickness_m, surface_max_c, indoor, outdoor, where_note, vapour_tightness,
        solar_absorptance_new, solar_absorptance_aged, solar_confidence, conductivity_w_per_m_k,
        density_kg_per_m3, specific_heat_j_per_kg_k, thickness_min_m, thickness_max_m, properties_source, note,
        'measured on site', 'found', 'user', vapour_tight FROM finish WHERE id = 'al_plain';
      UPDATE finish_price SET per_m2 = 99, origin = 'user' WHERE finish_id = 'al_plain';`)
    before.close()

    const after = opened(
      folder,
      ownSeeds((text) => text.replace('metal,0.1,0.2,0.13', 'metal,0.12,0.2,0.13')),
    )
    expect(emissivity(after, 'al_plain')).toBe(0.12)
    expect(emissivity(after, 'my_jacket')).toBe(0.33)
    expect(
      after.prepare('SELECT per_m2 FROM finish_price WHERE finish_id = ?').pluck().all('al_plain'),
    ).toEqual([99])
    expect(after.pragma('foreign_key_check')).toEqual([])
  })

  test('a shipped row that a later seed drops goes, unless a row of the user needs it', () => {
    const folder = temporaryFolder()
    const before = opened(folder)
    before.exec(`UPDATE finish_price SET origin = 'user' WHERE finish_id = 'stainless'`)
    before.close()

    const seeds = ownSeeds((text) =>
      text
        .split('\n')
        .filter((line) => !/^(stainless|timber_board),/.test(line))
        .join('\n'),
    )
    const prices = join(seeds, 'seed', 'finish_price.csv')
    const others = readFileSync(prices, 'utf8').replace(/^stainless,.*\n/m, '')
    writeFileSync(prices, others)
    const after = opened(folder, seeds)
    expect(emissivity(after, 'timber_board')).toBeUndefined()
    expect(emissivity(after, 'stainless')).toBe(0.2)
  })

  test('code tables of the user outlive a new seed, and keep a shipped table they add to', () => {
    const folder = temporaryFolder()
    const before = opened(folder)
    ownLossTable(before)
    before.exec(
      `INSERT INTO code_factor VALUES ('geg-2024-floor', 2, 'our own rule', 'mine', 'found', 'user')`,
    )
    before.close()

    const seeds = ownSeeds(
      (text) => text.replace(/^geg-20.*-(floor|chilled),.*\n/gm, ''),
      'code_table',
    )
    const rows = join(seeds, 'seed', 'code_row.csv')
    const left = readFileSync(rows, 'utf8').replace(/^geg-20.*-(floor|chilled),.*\n/gm, '')
    writeFileSync(rows, left)
    const after = opened(folder, seeds)
    const tables = readCatalogue(after).codeTables
    const ids = tables.map(({ id }) => id).filter((id) => !/^(ashrae|dpr)/.test(id))
    expect(ids.toSorted()).toEqual(['geg-2024-floor', 'geg-2024-heating', 'my-losses'])
    const floor = tables.find(({ id }) => id === 'geg-2024-floor')
    expect(floor).toMatchObject({ rows: [], factors: [{ factor: 2 }] })
    expect(after.pragma('foreign_key_check')).toEqual([])
  })

  test('a seed that is wrong is named by file, row and cell, and changes nothing', () => {
    const folder = temporaryFolder()
    opened(folder).close()
    const wrong = ownSeeds((text) => text.replace('metal,0.1,0.2,0.13', 'metal,shiny,0.2,0.13'))
    expect(() => openCatalogue(folder, wrong)).toThrow(
      'finish.csv, row 2: emissivity_new is "shiny", not a number',
    )
    const beyond = ownSeeds((text) => text.replace('metal,0.1,0.2,0.13', 'metal,1.1,0.2,0.13'))
    expect(() => openCatalogue(folder, beyond)).toThrow(
      'finish.csv, row 2: CHECK constraint failed',
    )
    expect(emissivity(opened(folder), 'al_plain')).toBe(0.1)
  })

  test('a catalogue of a later program is refused and kept', () => {
    const folder = temporaryFolder()
    const db = opened(folder)
    db.pragma('user_version = 99')
    db.close()
    const bytes = readFileSync(join(folder, 'catalogue.db'))
    expect(() => openCatalogue(folder, dbFolder)).toThrow(AppError)
    expect(() => openCatalogue(folder, dbFolder)).toThrow('version 99')
    expect(readFileSync(join(folder, 'catalogue.db')).equals(bytes)).toBe(true)
  })

  test('a damaged catalogue is set aside and built anew', () => {
    const folder = temporaryFolder()
    writeFileSync(join(folder, 'catalogue.db'), 'this was a database once '.repeat(400))
    expect(readCatalogue(opened(folder)).materials).toHaveLength(30)
    const kept = readFileSync(join(folder, 'catalogue.db.damaged-1'), 'utf8')
    expect(kept.startsWith('this was a database once')).toBe(true)
  })
})
