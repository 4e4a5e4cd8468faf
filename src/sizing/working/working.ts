/** The working of one run, put together from its sections. */
import { bare, rungsOf, type Settled } from '../build-up.ts'
import type { Problem } from '../problem.ts'
import type { Rating, RunResult } from '../result.ts'
import { yearlyFlowPerUnit } from '../run-loss.ts'
import { size } from '../size.ts'
import { isInclined, type States, solveStates } from '../states.ts'
import { arrivalSection } from './arrival.ts'
import { codeSections } from './code.ts'
import { frostSections } from './frost.ts'
import { insideSection } from './inside.ts'
import { burnSteps, dewSteps, limitSection } from './limits.ts'
import { steamSection } from './medium.ts'
import { moneySections } from './money.ts'
import { runSection } from './run.ts'
import { stateSections } from './state.ts'
import { surveySections } from './survey.ts'
import { totalsSection } from './totals.ts'
import type { Section, Working } from './types.ts'
import { yearSection } from './year.ts'

/** The build-up a working is about: the chosen one; the thickest where none passes; the bare run. */
interface Shown {
  readonly problem: Problem
  readonly result: RunResult
  readonly settled: Settled
  readonly rating: Rating
  readonly states: States
  readonly bareStates: States
}

export function workingOf(problem: Problem): Working {
  const shown = shownBuildUp(problem)
  const isBare = shown.settled.layers.length === 0
  const sections = [
    runSection(problem, shown.settled),
    ...present([steamSection(problem), insideSection(problem)]),
    ...lossSections(shown, isBare ? 'Bare run' : 'Loss condition'),
    ...(isBare ? [] : bareSections(shown)),
    ...touchSections(shown),
    ...dampSections(shown),
    ...limitSections(shown),
    ...costSections(shown),
    ...surveySections(problem, shown.result.survey),
    ...closing(shown),
  ]
  return { tag: problem.tag, title: titleOf(shown), sections }
}

function shownBuildUp(problem: Problem): Shown {
  const result = size(problem)
  const rungs = rungsOf(problem)
  const at = result.chosen ? result.ladder.indexOf(result.chosen) : rungs.length - 1
  const settled = rungs[at] ?? bare
  return {
    problem,
    result,
    settled,
    rating: result.ladder[at] ?? result.bare,
    states: solveStates(problem, settled),
    bareStates: solveStates(problem, bare),
  }
}

function titleOf({ problem, result, rating }: Shown): string {
  const thickness = `${Number((rating.thicknessM * 1000).toPrecision(6))} mm`
  if (rating.thicknessM === 0) return `${problem.tag}: bare`
  if (result.chosen) return `${problem.tag}: ${thickness}`
  const none =
    result.unmet.length > 0
      ? 'no thickness meets the limits'
      : 'the limits exclude each other, no thickness meets them all at once'
  return `${problem.tag}: ${none}; the thickest, ${thickness}`
}

function lossSections(shown: Shown, title: string): Section[] {
  const { problem, settled, states, bareStates } = shown
  const year = yearSection({ problem, settled, states, bareStates, title })
  return [
    ...stateSections({
      problem,
      settled,
      condition: problem.conditions.loss,
      solution: states.loss,
      title,
    }),
    ...surfaceSections(problem, settled, states, title),
    totalsSection(problem, settled, states.loss, bareStates.loss, title),
    ...(year ? [year] : []),
  ]
}

/** An inclined pipe lies between two films: the higher one is asked for its loss, the lower one for its temperatures. */
function surfaceSections(
  problem: Problem,
  settled: Settled,
  states: States,
  title: string,
): Section[] {
  if (!isInclined(problem) || states.surface.surfaceTempC === states.loss.surfaceTempC) return []
  return stateSections({
    problem,
    settled,
    condition: { ...problem.conditions.loss, inclinedFilm: 'lower' },
    solution: states.surface,
    title: `${title}, its temperatures with the lower film`,
  })
}

function bareSections({ problem, bareStates }: Shown): Section[] {
  const title = 'Bare run'
  const area = runSection(problem, bare)
  const year = yearSection({ problem, settled: bare, states: bareStates, bareStates, title })
  return [
    { ...area, title: 'The bare run and its sizes' },
    ...stateSections({
      problem,
      settled: bare,
      condition: problem.conditions.loss,
      solution: bareStates.loss,
      title,
    }),
    ...surfaceSections(problem, bare, bareStates, title),
    totalsSection(problem, bare, bareStates.loss, bareStates.loss, title),
    ...(year ? [year] : []),
  ]
}

const present = (sections: readonly (Section | null)[]): Section[] =>
  sections.filter((section) => section !== null)

function touchSections({ problem, settled, states, rating }: Shown): Section[] {
  return [
    ...stateSections({
      problem,
      settled,
      condition: problem.conditions.touch,
      solution: states.touch,
      title: 'Touch condition',
    }),
    ...present([
      limitSection('touch', rating.limits, (ledger) =>
        burnSteps(ledger, problem, settled.layers.length === 0),
      ),
    ]),
  ]
}

function dampSections({ problem, settled, states, rating }: Shown): Section[] {
  if (states.damp === null) return []
  return [
    ...stateSections({
      problem,
      settled,
      condition: problem.conditions.damp,
      solution: states.damp,
      title: 'Damp condition',
    }),
    ...present([limitSection('damp', rating.limits, (ledger) => dewSteps(ledger, problem))]),
  ]
}

function limitSections(shown: Shown): Section[] {
  const { problem, settled, rating } = shown
  return present([
    limitSection('loss', rating.limits),
    ...frostSections(problem, settled, rating),
    arrivalSection(shown),
    ...codeSections(problem, settled),
    limitSection('space', rating.limits),
    limitSection('service', rating.limits),
  ])
}

function costSections({ problem, settled, states, rating, result }: Shown): Section[] {
  const terms = problem.money
  if (!terms || !rating.money) return []
  return moneySections({
    problem,
    settled,
    terms,
    money: rating.money,
    yearlyFlowPerUnit: yearlyFlowPerUnit(problem, states),
    ladder: result.ladder,
  })
}

const plain = (title: string, texts: readonly string[]): Section => ({
  title,
  condition: null,
  texts,
  steps: [],
  table: null,
})

function closing({ result }: Shown): Section[] {
  return [
    plain('Why this thickness', [result.reason]),
    plain(
      'What was assumed, and what to know',
      result.notes.map(({ text }) => text),
    ),
  ].filter(({ texts }) => texts.length > 0)
}
