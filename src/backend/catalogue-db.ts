/** Opens the catalogue database, built and seeded from `db/` on first use, and reads it as plain values. */
import { existsSync, mkdirSync, renameSync } from 'node:fs'
import { join } from 'node:path'
import Database from 'better-sqlite3'
import type {
  BurnThreshold,
  Catalogue,
  Confidence,
  DuctSize,
  Finish,
  FinishPrice,
  FittingArea,
  FittingLength,
  Fuel,
  InchSection,
  LabourTerms,
  Material,
  MediumState,
  PipeSize,
  PriceModel,
  SteamState,
  SupportAllowance,
  ThicknessStep,
  WallMaterial,
} from '#catalogue/types.ts'
import { AppError } from '#contract/failures.ts'
import { codeTables } from './catalogue-codes.ts'
import { migrate } from './migrate.ts'
import { seed } from './seed.ts'
import { noPlaceWords } from './storage-failure.ts'

/**
 * `dataFolder` is where the catalogue lives; ':memory:' keeps it for this process only. So does a folder that takes no
 * files, as on a locked-down machine: what ships is there all the same.
 */
export function openCatalogue(dataFolder: string, dbFolder: string): Database.Database {
  if (dataFolder === ':memory:') return prepared(':memory:', dbFolder)
  const path = join(dataFolder, 'catalogue.db')
  try {
    mkdirSync(dataFolder, { recursive: true })
    return prepared(path, dbFolder)
  } catch (error) {
    if (noPlaceWords(error) !== null) return prepared(':memory:', dbFolder)
    if (!isDamage(error)) throw error
    // Shipped rows can be rebuilt; what the user added may still be read from the file set aside.
    renameSync(path, freeName(path))
    return prepared(path, dbFolder)
  }
}

function prepared(path: string, dbFolder: string): Database.Database {
  const db = new Database(path, { timeout: 5000 })
  try {
    migrate(
      db,
      join(dbFolder, 'migrations'),
      (found, known) => new AppError({ code: 'catalogue/too-new', path, found, known }),
    )
    db.pragma('foreign_keys = ON')
    seed(db, join(dbFolder, 'seed'))
    return db
  } catch (error) {
    db.close()
    throw error
  }
}

function isDamage(error: unknown): boolean {
  return (
    error instanceof Database.SqliteError &&
    (error.code.startsWith('SQLITE_CORRUPT') || error.code === 'SQLITE_NOTADB')
  )
}

function freeName(path: string): string {
  for (let n = 1; ; n += 1) {
    const name = `${path}.damaged-${n}`
    if (!existsSync(name)) return name
  }
}

const provenance = 'source, confidence'

type Flagged<T, K extends keyof T> = Omit<T, K> & { readonly [F in K]: number }

/** All rows, in the order of the seeds, the user's after them. */
export function readCatalogue(db: Database.Database): Catalogue {
  const all = <T>(sql: string) => db.prepare<[], T>(`${sql} ORDER BY rowid`).all()
  return {
    materials: materials(db),
    finishes: all<Flagged<Finish, 'outdoor'> & { whereNote: string }>(
      `SELECT id, name, category, emissivity_new AS emissivityNew, emissivity_aged AS emissivityAged,
        touch_class AS touchClass, coating, coating_thickness_m AS coatingThicknessM,
        surface_max_c AS surfaceMaxC, outdoor, solar_absorptance_new AS solarAbsorptanceNew,
        solar_absorptance_aged AS solarAbsorptanceAged, vapour_tight AS vapourTight,
        vapour_tightness AS vapourNote, note, where_note AS whereNote, ${provenance} FROM finish`,
    ).map(({ whereNote, outdoor, note, ...finish }) => ({
      ...finish,
      outdoor: outdoor === 1,
      note: [note, whereNote].filter((part) => part !== '').join(' '),
    })),
    wallMaterials: all<WallMaterial>(
      `SELECT id, name, conductivity_w_per_m_k AS conductivityWPerMK, density_kg_per_m3 AS densityKgPerM3,
        specific_heat_j_per_kg_k AS specificHeatJPerKgK, emissivity_bare AS emissivityBare,
        touch_class AS touchClass, ${provenance} FROM wall_material`,
    ),
    pipeSizes: all<PipeSize>(
      `SELECT system, standard, wall_material_id AS wallMaterial, label, dn, nps_in AS npsIn, series,
        outer_diameter_m AS outerDiameterM, wall_m AS wallM, ${provenance} FROM pipe_size`,
    ),
    ductSizes: all<DuctSize>(
      `SELECT standard, label, diameter_m AS diameterM, width_m AS widthM, height_m AS heightM,
        ${provenance} FROM duct_size`,
    ),
    steps: all<Flagged<ThicknessStep, 'singleLayerOnly'>>(
      `SELECT material_id AS materialId, form, series, thickness_m AS thicknessM,
        max_single_layer_m AS maxSingleLayerM, single_layer_only AS singleLayerOnly, ${provenance}
        FROM thickness_step`,
    ).map((step) => ({ ...step, singleLayerOnly: step.singleLayerOnly === 1 })),
    inchSections: all<InchSection>(
      `SELECT system, pipe_outer_diameter_m AS pipeOuterDiameterM, nominal_thickness_m AS nominalThicknessM,
        actual_thickness_m AS actualThicknessM, ${provenance} FROM inch_section`,
    ),
    steam: db
      .prepare<[], SteamState>(
        `SELECT pressure_absolute_pa AS pressureAbsolutePa, temperature_c AS temperatureC,
        latent_heat_j_per_kg AS latentHeatJPerKg, density_vapour_kg_per_m3 AS densityVapourKgPerM3,
        specific_heat_vapour_j_per_kg_k AS specificHeatVapourJPerKgK, ${provenance} FROM steam_state ORDER BY pressure_absolute_pa`,
      )
      .all(),
    media: all<MediumState>(
      `SELECT medium_id AS mediumId, name, phase, mass_fraction AS massFraction, temperature_c AS temperatureC,
        density_kg_per_m3 AS densityKgPerM3, specific_heat_j_per_kg_k AS specificHeatJPerKgK, ${provenance}
        FROM medium_state`,
    ),
    fuels: all<Fuel>(
      `SELECT id, name, price_per_kwh AS pricePerKWh, efficiency, co2_kg_per_kwh AS co2KgPerKWh, basis, note,
        ${provenance} FROM fuel`,
    ),
    burnThresholds: all<BurnThreshold>(
      `SELECT surface, contact_s AS contactS, lower_c AS lowerC, upper_c AS upperC, grade, ${provenance}
        FROM burn_threshold`,
    ),
    codeTables: codeTables(db),
    fittingAreas: all<FittingArea>(
      `SELECT item, dn, pipe_outer_diameter_m AS pipeOuterDiameterM, pressure_class AS pressureClass,
        area_m2 AS areaM2, note, ${provenance} FROM fitting_area`,
    ),
    fittingLengths: all<Flagged<FittingLength, 'lagged'>>(
      `SELECT item, dn, pipe_outer_diameter_m AS pipeOuterDiameterM, medium_c AS mediumC, lagged, place,
        length_m AS lengthM, length_low_m AS lowM, length_high_m AS highM, note, ${provenance} FROM fitting_length`,
    ).map((row) => ({ ...row, lagged: row.lagged === 1 })),
    supportAllowances: all<SupportAllowance>(
      `SELECT place, loss_fraction AS lossFraction, note, ${provenance} FROM support_allowance`,
    ),
    priceModels: all<PriceModel>(
      `SELECT material_id AS materialId, per_m3 AS perM3, per_m2 AS perM2, per_m AS perM,
        labour_hours_per_m AS labourHoursPerM, labour_hours_per_m2 AS labourHoursPerM2,
        waste_fraction AS wasteFraction, ${provenance} FROM price_model`,
    ),
    finishPrices: all<FinishPrice>(
      `SELECT finish_id AS finishId, per_m2 AS perM2, labour_hours_per_m AS labourHoursPerM,
        labour_hours_per_m2 AS labourHoursPerM2, waste_fraction AS wasteFraction, ${provenance}
        FROM finish_price`,
    ),
    labour: labour(db),
  }
}

type Default = Pick<Material, 'curveName' | 'curveSource' | 'curveConfidence'>
type MaterialRow = Omit<Material, 'conductivity'> & { readonly basis: 'point' | 'mean' }
interface PointRow {
  readonly materialId: string
  readonly temperatureC: number
  readonly conductivityWPerMK: number
}

function materials(db: Database.Database): Material[] {
  const points = db
    .prepare<[], PointRow>(
      `SELECT point.material_id AS materialId, temperature_c AS temperatureC,
        conductivity_w_per_m_k AS conductivityWPerMK
       FROM conductivity_point AS point
       JOIN conductivity_series AS series ON series.material_id = point.material_id AND series.name = point.series
       WHERE series.is_default = 1 ORDER BY temperature_c`,
    )
    .all()
  const byMaterial = Map.groupBy(points, (point) => point.materialId)
  const rows = db
    .prepare<[], MaterialRow & Default>(
      `SELECT material.id, material.name, family, form, density_kg_per_m3 AS densityKgPerM3,
        service_min_c AS serviceMinC, service_max_c AS serviceMaxC, vapour_resistance AS vapourResistance,
        not_on_diameters_up_to_m AS notOnDiametersUpToM, note, material.source, material.confidence,
        series.basis, series.name AS curveName, series.source AS curveSource,
        series.confidence AS curveConfidence
       FROM material JOIN conductivity_series AS series ON series.material_id = material.id AND is_default = 1
       ORDER BY material.rowid`,
    )
    .all()
  return rows.map(({ basis, ...material }) => {
    const curve = byMaterial.get(material.id) ?? []
    return {
      ...material,
      conductivity: {
        kind: 'curve',
        basis,
        pointsC: curve.map((point) => point.temperatureC),
        valuesWPerMK: curve.map((point) => point.conductivityWPerMK),
      },
    }
  })
}

function labour(db: Database.Database): LabourTerms {
  const rate = db
    .prepare<[], { ratePerHour: number; currency: string; source: string; confidence: Confidence }>(
      `SELECT rate_per_hour AS ratePerHour, currency, ${provenance} FROM labour_rate
       ORDER BY origin = 'user' DESC LIMIT 1`,
    )
    .get()
  if (!rate) throw new Error('The catalogue holds no labour rate')
  const layerFactors = db
    .prepare<[], number>('SELECT factor FROM layer_factor ORDER BY layers')
    .pluck()
    .all()
  return { ...rate, layerFactors }
}
