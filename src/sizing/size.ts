import { bare, rungsOf } from './build-up.ts'
import { passesFromM } from './continuous.ts'
import type { Problem } from './problem.ts'
import { type Rated, rate } from './rating.ts'
import { writeReason } from './reason.ts'
import type { Governing, Note, Rating, RunResult } from './result.ts'
import { hasUnpricedFittings, runMoney } from './run-money.ts'
import type { States } from './states.ts'
import { surveyOf } from './survey.ts'
import { unmetLimits } from './unmet.ts'

/** Sizes one run: rates the bare run and every rung, chooses, and says why. */
export function size(problem: Problem): RunResult {
  const bareRated = rate(problem, bare, null)
  const rungs = rungsOf(problem).map((settled) => rate(problem, settled, bareRated.states))
  const ladder = rungs.map(({ rating }) => rating)
  const choice = choose(problem, bareRated, rungs)
  const shown = choice.rated ?? rungs[rungs.length - 1] ?? bareRated
  const money = problem.money
    ? runMoney(problem, problem.money, bareRated, ladder, choice.rated)
    : null
  const result = {
    tag: problem.tag,
    bare: bareRated.rating,
    chosen: choice.rated?.rating ?? null,
    governing: choice.governing,
    mattThicknessM: mattThicknessM(problem, choice.governing, shown.rating, bareRated.states),
    unmet: choice.governing === 'unmet' ? unmetLimits(problem, ladder) : [],
    limits: shown.rating.limits,
    ladder,
    money,
    survey: surveyOf(problem),
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
function mattThicknessM(
  problem: Problem,
  governing: Governing,
  shown: Rating,
  bareStates: States,
): number | null {
  const { damp } = problem.conditions
  const isDampUnmet =
    governing === 'unmet' && shown.limits.some(({ limit, pass }) => limit === 'damp' && !pass)
  if (!(governing === 'damp' || isDampUnmet) || damp.emissivity > BRIGHT_EMISSIVITY) return null
  const matt: Problem = {
    ...problem,
    conditions: { ...problem.conditions, damp: { ...damp, emissivity: MATT_EMISSIVITY } },
  }
  const found = rungsOf(matt).find((settled) => rate(matt, settled, bareStates).rating.pass)
  return found?.thicknessM ?? null
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
  if (problem.money && shown.rating.money && hasUnpricedFittings(problem)) {
    notes.push({
      code: 'fittings-unpriced',
      text: 'Installed cost, saving and payback are those of the straight run: the lagging of its fittings has no price here.',
    })
  }
  return notes.filter((note, index) => notes.findIndex(({ text }) => text === note.text) === index)
}
