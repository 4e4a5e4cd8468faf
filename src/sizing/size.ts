import { yearlyFuelKWh } from '#money/energy-cost.ts'
import { presentValueFactor } from '#money/present-value.ts'
import { bare, rungsOf } from './build-up.ts'
import { passesFromM } from './continuous.ts'
import { energyCost, flowPerUnit } from './cost.ts'
import type { MoneyTerms, Problem } from './problem.ts'
import { type Rated, rate } from './rating.ts'
import { writeReason } from './reason.ts'
import type { Governing, Note, Rating, RunMoney, RunResult } from './result.ts'

/** Sizes one run: rates the bare run and every rung, chooses, and says why. */
export function size(problem: Problem): RunResult {
  const bareRated = rate(problem, bare)
  const rungs = rungsOf(problem).map((settled) => rate(problem, settled))
  const ladder = rungs.map(({ rating }) => rating)
  const choice = choose(problem, bareRated, rungs)
  const shown = choice.rated ?? rungs[rungs.length - 1] ?? bareRated
  const money = problem.money
    ? runMoney(problem, problem.money, bareRated.rating, ladder, choice.rated?.rating ?? null)
    : null
  const result = {
    tag: problem.tag,
    bare: bareRated.rating,
    chosen: choice.rated?.rating ?? null,
    governing: choice.governing,
    mattThicknessM: mattThicknessM(problem, choice.governing, shown.rating),
    limits: shown.rating.limits,
    ladder,
    money,
    notes: notesOf(problem, shown, choice.governing),
  }
  return { ...result, reason: writeReason(result) }
}

interface Choice {
  readonly rated: Rated | null
  readonly governing: Governing
}

function choose(problem: Problem, bareRated: Rated, rungs: readonly Rated[]): Choice {
  if (problem.layers.length === 0) return { rated: bareRated, governing: 'bare' }
  if (problem.layers.every((layer) => layer.thicknessM !== null)) {
    return { rated: rungs[0] ?? null, governing: 'fixed' }
  }
  const index = chosenIndex(rungs.map(({ rating }) => rating))
  const rated = rungs[index]
  if (!rated) return { rated: null, governing: 'unmet' }
  return {
    rated,
    governing: governingLimit(problem, rungs[index - 1]?.rating ?? null, rated.rating),
  }
}

/** Among the passing rungs the cheapest over the life (the thinner of equals); without money the thinnest. */
function chosenIndex(ladder: readonly Rating[]): number {
  let best = -1
  ladder.forEach((rung, index) => {
    if (!rung.pass) return
    const before = ladder[best]
    if (!before || (rung.money && before.money && rung.money.lifeCycle < before.money.lifeCycle))
      best = index
  })
  return best
}

/** A limit governs only if the next thinner rung fails it; of several, the one with the largest exact thickness. */
function governingLimit(problem: Problem, thinner: Rating | null, chosen: Rating): Governing {
  const failed = thinner
    ? [...new Set(thinner.limits.filter((limit) => !limit.pass).map(({ limit }) => limit))]
    : []
  const [only] = failed
  if (thinner === null || only === undefined) return chosen.money ? 'money' : 'smallest'
  if (failed.length === 1) return only
  const fixedM = problem.layers.reduce((sum, layer) => sum + (layer.thicknessM ?? 0), 0)
  const between = { failsM: thinner.thicknessM - fixedM, passesM: chosen.thicknessM - fixedM }
  const needed = failed.map((limit) => ({ limit, fromM: passesFromM(problem, limit, between) }))
  return needed.reduce((a, b) => (b.fromM > a.fromM ? b : a)).limit
}

/** A jacket at or below this emissivity counts as bright: on cold work it costs thickness. */
const BRIGHT_EMISSIVITY = 0.5
const MATT_EMISSIVITY = 0.9

/** Where damp decides, or cannot be met, under a bright jacket: the rung a matt finish would need [m]. */
function mattThicknessM(problem: Problem, governing: Governing, shown: Rating): number | null {
  const { damp } = problem.conditions
  const isDampUnmet =
    governing === 'unmet' && shown.limits.some(({ limit, pass }) => limit === 'damp' && !pass)
  if (!(governing === 'damp' || isDampUnmet) || damp.emissivity > BRIGHT_EMISSIVITY) return null
  const matt: Problem = {
    ...problem,
    conditions: { ...problem.conditions, damp: { ...damp, emissivity: MATT_EMISSIVITY } },
  }
  const found = rungsOf(matt)
    .map((settled) => rate(matt, settled).rating)
    .find(({ pass }) => pass)
  return found?.thicknessM ?? null
}

function runMoney(
  problem: Problem,
  terms: MoneyTerms,
  bareRating: Rating,
  ladder: readonly Rating[],
  chosen: Rating | null,
): RunMoney | null {
  const priced = ladder.filter((rung) => rung.money !== null)
  const cost = (rung: Rating): number => rung.money?.lifeCycle ?? Number.POSITIVE_INFINITY
  const cheapest = priced.length > 0 ? priced.reduce((a, b) => (cost(b) < cost(a) ? b : a)) : null
  if (!cheapest && !chosen) return null
  const { extent } = problem
  const bareFlow = flowPerUnit(bareRating)
  const chosenFlow = chosen ? flowPerUnit(chosen) : null
  const bareEnergyPerYear = energyCost(bareFlow, terms.energy)
  const installed = chosen?.money?.installed ?? null
  const saving =
    chosenFlow === null ? null : bareEnergyPerYear - energyCost(chosenFlow, terms.energy)
  const fuelKWh = (flow: number): number => yearlyFuelKWh(flow, terms.energy)
  const co2 = (fuelPerUnit: number): number | null =>
    extent === null || terms.co2KgPerKWh === null ? null : fuelPerUnit * extent * terms.co2KgPerKWh
  return {
    currency: terms.currency,
    per: problem.shape.kind === 'flat' ? 'm2' : 'm',
    hoursPerYear: terms.energy.hoursPerYear,
    fuel: terms.fuelName,
    fuelPricePerKWh: terms.energy.fuelPricePerKWh,
    efficiency: bareFlow < 0 ? terms.energy.cop : terms.energy.efficiency,
    discount: terms.discount,
    growth: terms.growth,
    lifeYears: terms.lifeYears,
    presentValueFactor: presentValueFactor(terms),
    bareEnergyPerYear,
    installedTotal: installed === null || extent === null ? null : installed * extent,
    savingPerYearTotal: saving === null || extent === null ? null : saving * extent,
    paybackYears: paybackYears(installed, saving),
    co2KgPerYear: chosenFlow === null ? null : co2(fuelKWh(chosenFlow)),
    co2SavedKgPerYear: chosenFlow === null ? null : co2(fuelKWh(bareFlow) - fuelKWh(chosenFlow)),
    cheapestThicknessM: cheapest?.thicknessM ?? null,
    withinTwoPercentM: chosen ? flatRange(ladder, chosen) : null,
  }
}

/** Null where nothing is saved, or next to nothing. */
function paybackYears(installed: number | null, saving: number | null): number | null {
  if (installed === null || saving === null || saving <= 0) return null
  const years = installed / saving
  return Number.isFinite(years) ? years : null
}

/** Smallest and largest passing thickness that cost at most 2 % more than the chosen one. */
function flatRange(ladder: readonly Rating[], chosen: Rating): readonly [number, number] | null {
  if (!chosen.money) return null
  const most = chosen.money.lifeCycle * 1.02
  const near = ladder.filter(
    (rung) => rung.pass && rung.money !== null && rung.money.lifeCycle <= most,
  )
  const first = near[0]
  const last = near[near.length - 1]
  return first && last ? [first.thicknessM, last.thicknessM] : null
}

const thinnestTaken = ' The thinnest passing thickness was taken.'

function notesOf(problem: Problem, shown: Rated, governing: Governing): Note[] {
  const notes: Note[] = [...problem.notes, ...shown.notes()]
  if (problem.money && !shown.rating.money && shown.rating.thicknessM > 0) {
    const taken = governing === 'fixed' || governing === 'unmet' ? '' : thinnestTaken
    notes.push({
      code: 'price-missing',
      text: `No price is held for this build-up: its cost is not weighed.${taken}`,
    })
  }
  return notes.filter((note, index) => notes.findIndex(({ text }) => text === note.text) === index)
}
