// npm run bench: what one solve and a list of 10 000 runs cost on this machine, one thread.
import { readFileSync } from 'node:fs'
import { cpus, loadavg, totalmem } from 'node:os'
import { openCatalogue, readCatalogue } from '../../src/backend/catalogue-db.ts'
import { resolve } from '../../src/model/resolve/resolve.ts'
import { indexCatalogue, sizeRun } from '../../src/model/size-run.ts'
import { parseRunsCsv } from '../../src/report/runs-csv.ts'
import { bare, rungsOf } from '../../src/sizing/build-up.ts'
import { systemOf } from '../../src/sizing/states.ts'
import { solve } from '../../src/solver/index.ts'

const ROUNDS = 5
const RUNS = 10_000

/** @param {readonly number[]} values */
const median = (values) => [...values].sort((a, b) => a - b)[Math.floor(values.length / 2)] ?? 0

/**
 * Seconds that `work` takes: median of five rounds, after one that is not counted.
 * @param {() => void} work
 */
function secondsOf(work) {
  work()
  return median(
    Array.from({ length: ROUNDS }, () => {
      const start = performance.now()
      work()
      return (performance.now() - start) / 1000
    }),
  )
}

/**
 * Seconds per call, over enough calls to fill a fifth of a second.
 * @param {() => void} once
 */
function secondsPerCall(once) {
  let calls = 64
  for (;;) {
    const start = performance.now()
    for (let i = 0; i < calls; i += 1) once()
    if (performance.now() - start > 200) break
    calls *= 2
  }
  return (
    secondsOf(() => {
      for (let i = 0; i < calls; i += 1) once()
    }) / calls
  )
}

/** @param {string} what @param {number} value @param {string} unit @param {number} [digits] */
function say(what, value, unit, digits = 3) {
  console.log(
    `${what.padEnd(58)}${Number(value.toPrecision(digits)).toLocaleString('en').padStart(12)} ${unit}`,
  )
}

const [cpu] = cpus()
console.log(`${cpu?.model ?? 'unknown processor'}, ${cpus().length} cores`)
console.log(
  `${(totalmem() / 2 ** 30).toFixed(1)} GiB, Node ${process.version}, ${process.platform} ${process.arch}`,
)
console.log(
  `Load ${loadavg()[0]?.toFixed(1)} before the start; median of ${ROUNDS} rounds, one thread.\n`,
)

/** @type {import('../../src/solver/types.ts').System} */
const lagged = {
  shape: { kind: 'pipe', outerDiameterM: 0.1683, orientation: 'horizontal' },
  layers: [{ thicknessM: 0.1, conductivity: { kind: 'constant', conductivityWPerMK: 0.06 } }],
  emissivity: 0.13,
  mediumC: 250,
  insideFilmWPerM2K: null,
  around: { airC: 20, surroundingsC: 20, windMPerS: 0, altitudeM: 0 },
}
/** @type {import('../../src/solver/types.ts').System} */
const curved = {
  ...lagged,
  layers: [
    {
      thicknessM: 0.1,
      conductivity: {
        kind: 'curve',
        basis: 'point',
        pointsC: [10, 50, 100, 150, 200, 300],
        valuesWPerMK: [0.033, 0.037, 0.044, 0.052, 0.062, 0.088],
      },
    },
  ],
}
const windy = { ...lagged, around: { ...lagged.around, windMPerS: 5 } }
for (const [what, system] of /** @type {const} */ ([
  ['One solve, lagged pipe, constant conductivity', lagged],
  ['One solve, lagged pipe, conductivity curve', curved],
  ['One solve, lagged pipe in wind', windy],
  ['One solve, bare pipe', { ...lagged, layers: [] }],
])) {
  say(what, 1e6 * secondsPerCall(() => solve(system)), 'µs')
}

const db = openCatalogue(':memory:', 'db')
const index = indexCatalogue(readCatalogue(db))
db.close()
const list = parseRunsCsv(readFileSync('db/demo/harrowmere-creamery.csv'))
if (!list.ok) throw new Error('The demo list does not read')

const systems = list.runs.flatMap((values) => {
  const resolved = resolve(values, index)
  if (!resolved.ok) throw new Error(`The demo run ${values.tag} does not resolve`)
  const { problem } = resolved
  return [bare, ...rungsOf(problem)].flatMap((settled) =>
    Object.values(problem.conditions).map((condition) => systemOf(problem, settled, condition)),
  )
})
const perSolve = secondsOf(() => {
  for (const system of systems) solve(system)
})
console.log()
say(
  `Solves a second, all rungs of the demo list (${systems.length} solves)`,
  systems.length / perSolve,
  '',
)

const runs = Array.from({ length: RUNS }, (_, n) => {
  const values = list.runs[n % list.runs.length] ?? list.runs[0] ?? {}
  return { ...values, tag: `${values.tag}-${n}` }
})
let rungs = 0
const seconds = secondsOf(() => {
  rungs = 0
  for (const values of runs) {
    const outcome = sizeRun(values, {}, index)
    if (!outcome.ok) throw new Error(`${values.tag} does not size`)
    rungs += outcome.result.ladder.length
  }
})
say(`Ladders of ${RUNS.toLocaleString('en')} runs through sizeRun`, seconds, 's')
say('Rungs of those ladders, each at its conditions', rungs, '', 6)
say('One run', (1e6 * seconds) / RUNS, 'µs')
