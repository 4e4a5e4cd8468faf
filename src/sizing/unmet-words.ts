/** Why no thickness passes, in sentences. */
import { limitNames, nearestMiss, passesLimit } from './passes-limit.ts'
import { limitWords, type Rating, type RunResult } from './result.ts'
import { against, said, type Words } from './words.ts'

type UnmetFacts = Pick<RunResult, 'ladder' | 'unmet'>

/** One sentence for each limit that no rung meets; where each is met by some, the two that exclude each other. */
export function unmetWords(facts: UnmetFacts, words: Words): string {
  const alone = facts.unmet.map((limit) => cannotBeMet(limit, facts, words))
  return alone.length > 0 ? alone.join(' ') : excluding(facts.ladder, words)
}

/** One limit that no rung meets: how near the best of them comes, and what it would take. */
function cannotBeMet(
  { limit, neededM, because }: RunResult['unmet'][number],
  { ladder }: UnmetFacts,
  words: Words,
): string {
  const miss = nearestMiss(ladder, limit)
  if (!miss) return ''
  const { rung: best, failed } = miss
  // Service mostly stands at the medium, which no thickness moves: naming one would mislead.
  const where = limit === 'service' ? 'it' : `at best, ${said(best, words)}, it`
  const stands = `${limitWords[limit]} cannot be met: ${where} stands at ${against(failed, words)} (${failed.what})`
  return neededM === null
    ? `${stands}, because ${because ?? 'no thickness would do'}.`
    : `${stands}; it would take ${words.thickness(neededM, null)}, which is more than can be bought.`
}

/** Each limit is met by some rung, but no rung meets all: the one that needs most and the one that allows least. */
function excluding(ladder: readonly Rating[], words: Words): string {
  const ranges = limitNames(ladder).map((limit) => {
    const passing = ladder.filter((rung) => passesLimit(rung, limit))
    return { limit, first: passing[0], last: passing[passing.length - 1] }
  })
  const known = ranges.filter(({ first, last }) => first && last)
  if (known.length < 2) return ''
  const needs = known.reduce((a, b) => (thicker(b.first, a.first) ? b : a))
  const allows = known.reduce((a, b) => (thicker(a.last, b.last) ? b : a))
  if (!needs.first || !allows.last || needs.limit === allows.limit) return ''
  return `${limitWords[needs.limit]} needs ${said(needs.first, words)} or more, ${allows.limit} allows ${said(allows.last, words)} at most.`
}

const thicker = (a: Rating | undefined, b: Rating | undefined): boolean =>
  (a?.thicknessM ?? 0) > (b?.thicknessM ?? 0)
