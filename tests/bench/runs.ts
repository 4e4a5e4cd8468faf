/** The runs that are measured: those of a list, or random ones. */
import { readFileSync } from 'node:fs'
import { openCatalogue, readCatalogue } from '#backend/catalogue-db.ts'
import { type FieldKey, fieldOf, type RunValues } from '#model/fields.ts'
import { type CatalogueIndex, indexCatalogue } from '#model/resolve/index-catalogue.ts'
import { resolve } from '#model/resolve/resolve.ts'
import { parseRunsCsv, sentence } from '#report/runs-csv.ts'
import type { Problem } from '#sizing/problem.ts'

/** As many random runs as give the median a steady third digit. */
const RANDOM_RUNS = 1000

export function shippedCatalogue(): CatalogueIndex {
  const db = openCatalogue(':memory:', 'db')
  const index = indexCatalogue(readCatalogue(db))
  db.close()
  return index
}

/** The runs of a list; throws a sentence for each fault. */
export function readRuns(path: string): readonly RunValues[] {
  const list = parseRunsCsv(readFileSync(path))
  if (!list.ok) throw new Error(list.issues.map(sentence).join('\n'))
  if (list.runs.length === 0) throw new Error(`${path} has no runs.`)
  return list.runs
}

/** Looks a run up; throws where it cannot be sized. */
export function problemOf(values: RunValues, index: CatalogueIndex): Problem {
  const resolved = resolve(values, index)
  if (resolved.ok) return resolved.problem
  const faults = resolved.issues.map(
    ({ column, found, allowed }) => `${column}: ${found}, but ${allowed}`,
  )
  throw new Error(`${values.tag} cannot be sized: ${faults.join('; ')}`)
}

/** Lying pipes under one layer, over the whole range of every field; the same ones each time. */
export function randomRuns(): readonly RunValues[] {
  const random = seeded(1)
  const within = (
    key: FieldKey,
    from = Number.NEGATIVE_INFINITY,
    to = Number.POSITIVE_INFINITY,
  ) => {
    const field = fieldOf(key)
    if (field.kind !== 'number') throw new Error(`${key} is not a number`)
    const [min, max] = [Math.max(field.min, from), Math.min(field.max, to)]
    return min + random() * (max - min)
  }
  const evenInLogarithm = (from: number, to: number) => from * (to / from) ** random()
  return Array.from({ length: RANDOM_RUNS }, (_, n): RunValues => {
    const airC = within('airC')
    return {
      tag: `random-${n}`,
      shape: 'pipe',
      outerDiameterM: evenInLogarithm(0.01, 2),
      lengthM: evenInLogarithm(1, 1000),
      mediumC: within('mediumC'),
      airC,
      surroundingsC: random() < 0.5 ? airC : within('surroundingsC'),
      windMPerS: random() < 0.5 ? 0 : within('windMPerS'),
      altitudeM: within('altitudeM'),
      humidity: within('humidity'),
      dampAirC: within('dampAirC'),
      conductivityWPerMK: evenInLogarithm(0.01, 0.2),
      emissivity: within('emissivity'),
      maxLossWPerM: evenInLogarithm(1, 1e4),
    }
  })
}

/** Evenly between 0 and 1, the same series for the same seed (mulberry32, public domain). */
function seeded(seed: number): () => number {
  let state = seed
  return () => {
    state = (state + 0x6d2b79f5) | 0
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state)
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32
  }
}
