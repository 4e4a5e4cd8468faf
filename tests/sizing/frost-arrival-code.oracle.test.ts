/** Frost, arrival and code together: the rung and what governs it, against the formulas written out once more. */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import { solve } from '#solver/index.ts'
import { evenly } from '../model/any-values.ts'
import { catalogue, sized } from './catalogue.ts'

const run = fc.record({
  boreMm: evenly(15, 300),
  wallMm: evenly(1, 6),
  mediumC: evenly(30, 95),
  startC: evenly(2, 20),
  airC: evenly(-5, 25),
  frostAirC: evenly(-30, -3),
  conductivityWPerMK: evenly(0.025, 0.045),
  lengthM: evenly(20, 400),
  velocityMPerS: evenly(0.05, 1),
  frostHours: fc.option(evenly(1, 60), { nil: null }),
  frostFraction: fc.constantFrom(0, 0.25),
  maxDropK: fc.option(evenly(0.1, 4), { nil: null }),
  codeFactor: fc.option(fc.constantFrom(0.5, 1, 1.5), { nil: null }),
})
type Run = typeof run extends fc.Arbitrary<infer T> ? T : never

/** Density times heat capacity of the steel of the catalogue. */
const steelJPerM3K = catalogue.wallMaterials
  .filter(({ id }) => id === 'carbon_steel')
  .reduce((_, { densityKgPerM3, specificHeatJPerKgK }) => densityKgPerM3 * specificHeatJPerKgK, 0)

const flowKgPerS = ({ boreMm, velocityMPerS }: Run): number =>
  (Math.PI / 4) * (boreMm / 1000) ** 2 * 1000 * velocityMPerS
const outerM = ({ boreMm, wallMm }: Run): number => (boreMm + 2 * wallMm) / 1000

const valuesOf = (of: Run): RunValues => ({
  tag: 'A',
  shape: 'pipe',
  outerDiameterM: outerM(of),
  wallM: of.wallMm / 1000,
  medium: 'water',
  mediumC: of.mediumC,
  airC: of.airC,
  frostAirC: of.frostAirC,
  frostStartC: of.startC,
  conductivityWPerMK: of.conductivityWPerMK,
  emissivity: 0.9,
  reach: false,
  reachReason: 'in a shaft',
  // Never in the way, but something to size by.
  maxLossWPerM2: 1e6,
  lengthM: of.lengthM,
  flowKgPerS: flowKgPerS(of),
  heatCapacityJPerKgK: 4190,
  frostFraction: of.frostFraction,
  ...(of.frostHours !== null && { frostHours: of.frostHours }),
  ...(of.maxDropK !== null && { maxDropK: of.maxDropK }),
  ...(of.codeFactor !== null && { codeTable: 'geg-2024-heating', codeFactor: of.codeFactor }),
})

/** Resistance from the medium to the air for a metre of pipe. */
function resistance(of: Run, thicknessM: number, mediumC: number, airC: number): number {
  const { heatFlowWPerUnit } = solve({
    shape: { kind: 'pipe', outerDiameterM: outerM(of), orientation: 'horizontal' },
    layers: [
      { thicknessM, conductivity: { kind: 'constant', conductivityWPerMK: of.conductivityWPerMK } },
    ],
    emissivity: 0.9,
    mediumC,
    insideFilmWPerM2K: null,
    around: { airC, surroundingsC: airC, windMPerS: 0, altitudeM: 0 },
    sunAbsorbedWPerM2: 0,
    film: 'detailed',
    inclinedFilm: 'higher',
  })
  return (mediumC - airC) / heatFlowWPerUnit
}

/** How far a thickness is beyond each limit that is set: above 0 it fails. */
function beyond(of: Run, thicknessM: number): ReadonlyMap<string, number> {
  const found = new Map<string, number>()
  const {
    boreMm,
    startC,
    frostAirC: coldC,
    frostHours,
    frostFraction: f,
    maxDropK,
    codeFactor,
  } = of
  const boreM = boreMm / 1000
  if (frostHours !== null) {
    // Water 4.19 MJ/m³K; ice 920 kg/m³, 334 kJ/kg, 2.2 W/mK.
    const waterM2 = (Math.PI / 4) * boreM ** 2
    const wallM2 = (Math.PI / 4) * outerM(of) ** 2 - waterM2
    const cooling =
      (waterM2 * 4.19e6 + wallM2 * steelJPerM3K) *
      resistance(of, thicknessM, startC / 2, coldC) *
      Math.log((startC - coldC) / -coldC)
    const grown = (f + (1 - f) * Math.log(1 - f)) / (4 * Math.PI * 2.2)
    const freezing =
      ((920 * 334e3 * waterM2) / -coldC) * (f * resistance(of, thicknessM, 0, coldC) + grown)
    found.set('frost', frostHours - (cooling + freezing) / 3600)
  }
  if (maxDropK !== null) {
    const perM = resistance(of, thicknessM, of.mediumC, of.airC)
    const exponent = of.lengthM / perM / flowKgPerS(of) / 4190
    found.set('arrival', (of.mediumC - of.airC) * (1 - Math.exp(-exponent)) - maxDropK)
  }
  if (codeFactor !== null) {
    const cell = boreM <= 0.022 ? 0.02 : boreM <= 0.035 ? 0.03 : Math.min(boreM, 0.1)
    const radiusM = outerM(of) / 2
    const asked = (1 + (codeFactor * cell) / radiusM) ** (of.conductivityWPerMK / 0.035)
    found.set('code', radiusM * (asked - 1) - thicknessM)
  }
  return found
}

const failing = (of: Run, thicknessM: number): string[] =>
  [...beyond(of, thicknessM)].filter(([, by]) => by > 0).map(([limit]) => limit)

function endM(of: Run, limit: string, failsM: number, passesM: number): number {
  let [low, high] = [failsM, passesM]
  for (let step = 0; step < 40; step += 1) {
    const middle = (low + high) / 2
    if ((beyond(of, middle).get(limit) ?? 0) > 0) low = middle
    else high = middle
  }
  return high
}

const seen = new Map<string, number>()

function compare(of: Run): void {
  const { chosen, governing, ladder } = sized(valuesOf(of))
  const thicknessesM = ladder.map(({ thicknessM }) => thicknessM)
  const first = thicknessesM.findIndex((thicknessM) => failing(of, thicknessM).length === 0)
  const chosenM = thicknessesM[first]
  expect(chosen?.thicknessM).toBe(chosenM)
  seen.set(governing, (seen.get(governing) ?? 0) + 1)
  if (chosenM === undefined) {
    expect(governing).toBe('unmet')
    return
  }
  const thinnerM = thicknessesM[first - 1]
  const ends = (thinnerM === undefined ? [] : failing(of, thinnerM)).map((limit) => ({
    limit,
    fromM: endM(of, limit, thinnerM ?? 0, chosenM),
  }))
  const [governs] = ends.sort((a, b) => b.fromM - a.fromM)
  expect(governing).toBe(governs?.limit ?? 'smallest')
}

describe('the program against the formulas written out', () => {
  test('chooses the same rung for the same reason', () => {
    fc.assert(fc.property(run, compare), { seed: 61, numRuns: 300 })
  })

  test('and each kind of answer came up', () => {
    for (const governing of ['frost', 'arrival', 'code', 'smallest', 'unmet'])
      expect(seen.get(governing), governing).toBeGreaterThan(3)
  })
})
