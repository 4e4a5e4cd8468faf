/** Why the chosen rung is as thick as it is: a few plain sentences with the numbers that decided. */
import { LEAST_BURN_THRESHOLD_C } from '#touch/burn-threshold.ts'
import {
  type LimitName,
  type LimitResult,
  limitWords,
  type Rating,
  type RunResult,
} from './result.ts'
import { unmetWords } from './unmet-words.ts'
import { against, enoughDigits, said, shownValue, sides, siWords, type Words } from './words.ts'

export type ReasonFacts = Pick<
  RunResult,
  'bare' | 'chosen' | 'governing' | 'ladder' | 'limits' | 'money' | 'mattThicknessM' | 'unmet'
>

export function writeReason(facts: ReasonFacts, words: Words = siWords): string {
  const { chosen, governing } = facts
  if (!chosen) return unmet(facts, words)
  switch (governing) {
    case 'bare':
      return sentences('Bare.', failures(chosen, words) || bareWords(facts, words))
    case 'fixed':
      return sentences(
        `Fixed at ${said(chosen, words)}.`,
        failures(chosen, words) || passes(chosen, facts, words),
      )
    case 'money':
      return sentences('Cost decides.', allowed(facts, words), cheapest(facts, words))
    case 'smallest':
      return sentences('The thinnest that can be bought passes.', standing(chosen, facts, words))
    case 'unmet':
      return unmet(facts, words)
    default:
      return sentences(
        `${limitWords[governing]} decides.`,
        decided(facts, governing, words),
        matt(facts, words),
        dearer(facts, words),
      )
  }
}

const sentences = (...parts: readonly string[]): string =>
  parts.filter((part) => part !== '').join(' ')

/** A thickness that is a rung of the ladder, with the name its series gives it. */
function saidThickness(thicknessM: number, { ladder }: ReasonFacts, words: Words): string {
  const rung = ladder.find((candidate) => candidate.thicknessM === thicknessM)
  return words.thickness(thicknessM, rung?.nominalThicknessM ?? null)
}

/** A result that came through JSON or a worker holds the chosen rung twice: compared by thickness. */
const isSame = (a: Rating, b: Rating): boolean => a.thicknessM === b.thicknessM

function decided(facts: ReasonFacts, limit: LimitName, words: Words): string {
  const { chosen, ladder } = facts
  if (!chosen) return ''
  const thinner = ladder[ladder.findIndex((rung) => isSame(rung, chosen)) - 1]
  const failed = thinner?.limits.find((result) => result.limit === limit && !result.pass)
  // Service is judged at many places, and the narrowest differs from rung to rung: the place that failed is named.
  if (limit === 'service' && thinner && failed) {
    return `${said(chosen, words)} serves; at ${said(thinner, words)} ${failed.what} would stand at ${against(failed, words)}.`
  }
  // A code that asks for a thickness is met or not by the thickness itself.
  if (thinner && failed && failed.unit === 'm') {
    const [, asked] = sides(failed, words)
    return `${said(chosen, words)} meets the ${asked} asked for; ${said(thinner, words)} does not.`
  }
  // Touch may be judged twice: the chosen rung is shown against the bound that the thinner one failed.
  const own = chosen.limits.filter((result) => result.limit === limit)
  const here = own.find((result) => result.bound === failed?.bound) ?? own[0]
  const first = here ? `${said(chosen, words)} gives ${against(here, words)}${touched(here)}` : ''
  const second = thinner && failed ? `${said(thinner, words)} would ${missed(failed, words)}` : ''
  return `${[first, second].filter((part) => part !== '').join('; ')}.`
}

/** A burn threshold belongs to a surface and a contact time: both are said with it. */
const touched = ({ limit, rule, what }: LimitResult): string =>
  limit === 'touch' && rule === 'below' ? ` (${what})` : ''

/** What a failed rung gives; where its digits do not tell it from its bound, that it just misses. */
function missed({ value, bound, unit }: LimitResult, words: Words): string {
  const [shown, shownBound] = [shownValue(value, unit), shownValue(bound, unit)]
  const digits = enoughDigits(shown, unit)
  return shown.toFixed(digits) === shownBound.toFixed(digits)
    ? 'just miss it'
    : `give ${words.quantity(value, unit, digits)}`
}

function matt(facts: ReasonFacts, words: Words): string {
  const { mattThicknessM, chosen } = facts
  if (mattThicknessM === null || (chosen && mattThicknessM >= chosen.thicknessM)) return ''
  return `Under a matt finish ${saidThickness(mattThicknessM, facts, words)} would do.`
}

/** Where the limits cost something: the thickness that money alone would take. */
function dearer(facts: ReasonFacts, words: Words): string {
  const free = facts.money?.cheapestThicknessM ?? null
  if (free === null || free === facts.chosen?.thicknessM) return ''
  return `Cost alone would take ${saidThickness(free, facts, words)}.`
}

/** The thinnest rung that passes, where cost took a thicker one. */
function allowed({ ladder, chosen, bare }: ReasonFacts, words: Words): string {
  const first = ladder.find((rung) => rung.pass)
  if (!first || !chosen || first.thicknessM >= chosen.thicknessM) return ''
  const limit = nearest(first.limits, bare)
  if (!limit) return ''
  return `The limits would allow ${said(first, words)} (${limit.limit}: ${against(limit, words)}).`
}

/**
 * The asked limit that a rung passes most narrowly, by its share of the bound; service is not asked for, nor is the
 * burn threshold of a run that even bare burns nobody.
 */
function nearest(limits: readonly LimitResult[], bare: Rating): LimitResult | undefined {
  const share = ({ value, bound }: LimitResult): number =>
    Math.abs(bound - value) / Math.max(1, Math.abs(bound))
  return limits
    .filter((limit) => limit.limit !== 'service' && !isIdle(limit, bare))
    .sort((a, b) => share(a) - share(b))[0]
}

const isIdle = ({ limit, rule, value }: LimitResult, bare: Rating): boolean =>
  limit === 'touch' &&
  rule === 'below' &&
  Math.max(value, bare.touchSurfaceC) < LEAST_BURN_THRESHOLD_C

function cheapest({ chosen, ladder, money }: ReasonFacts, words: Words): string {
  if (!chosen || !money) return ''
  const years = money.lifeYears === 1 ? '1 year' : `${money.lifeYears} years`
  const own = `${said(chosen, words)} is the cheapest to own over ${years}`
  const most = (chosen.money?.lifeCycle ?? 0) * 1.02
  const near = ladder.filter(
    (rung) =>
      !isSame(rung, chosen) && rung.pass && rung.money !== null && rung.money.lifeCycle <= most,
  )
  const [first] = near
  const last = near[near.length - 1]
  if (!first || !last) return `${own}; every other thickness that passes costs over 2 % more.`
  if (first === last) return `${own}; ${said(first, words)} costs within 2 % of it.`
  if (near.length === 2)
    return `${own}; ${said(first, words)} and ${said(last, words)} cost within 2 % of it.`
  const between = ladder.filter(
    ({ thicknessM }) => thicknessM >= first.thicknessM && thicknessM <= last.thicknessM,
  )
  const hasGap = between.some((rung) => !isSame(rung, chosen) && !near.includes(rung))
  const range = `${said(first, words)} to ${said(last, words)}`
  return hasGap
    ? `${own}; ${near.length} others from ${range} cost within 2 % of it.`
    : `${own}; ${range} cost within 2 % of it.`
}

/** How the narrowest limit stands. */
function standing(chosen: Rating, { bare }: ReasonFacts, words: Words): string {
  const limit = nearest(chosen.limits, bare)
  return limit ? `${said(chosen, words)} gives ${against(limit, words)} (${limit.limit}).` : ''
}

/** One sentence for each limit that is failed, however often it is judged. */
function failures(rating: Rating, words: Words): string {
  const failed = Map.groupBy(
    rating.limits.filter(({ pass }) => !pass),
    ({ limit }) => limit,
  )
  return [...failed]
    .map(([name, limits]) => `It fails ${name}${times(limits.length)}: ${eachOf(limits, words)}.`)
    .join(' ')
}

const times = (count: number): string =>
  count < 2 ? '' : count === 2 ? ' twice' : ` ${count} times`

/** Of several, each by what tells it from the others; a value that all have in common is said once. */
function eachOf(limits: readonly LimitResult[], words: Words): string {
  const told = limits.map((limit) => {
    const [value, bound] = sides(limit, words)
    return { value, bound: `${bound} (${limits.length > 1 ? asked(limit) : limit.what})` }
  })
  const [first] = told
  const parts = told.map(({ value, bound }, index) =>
    index > 0 && value === first?.value ? bound : `${value} against ${bound}`,
  )
  const last = parts.at(-1) ?? ''
  return parts.length < 2 ? last : `${parts.slice(0, -1).join(', ')} and ${last}`
}

/** Which of several: a touched surface is judged as given, or by its burn threshold. */
function asked({ limit, rule, what }: LimitResult): string {
  if (limit !== 'touch') return what
  const place = what.replace(/^surface(, )?/, '')
  if (rule === 'below') return `burn, ${place}`
  return place === '' ? 'as given' : `as given, ${place}`
}

function passes(rating: Rating, { bare }: ReasonFacts, words: Words): string {
  const limit = nearest(rating.limits, bare)
  return limit
    ? `It passes every limit; the narrowest is ${limit.limit}, ${against(limit, words)}.`
    : 'It is rated as given.'
}

function bareWords({ bare, limits }: ReasonFacts, words: Words): string {
  const surface = `The surface is at ${words.quantity(bare.surfaceTempC, '°C', 1)}`
  return limits.length > 0
    ? `${surface}; every limit is met.`
    : `${surface}; no limit is set for it.`
}

function unmet(facts: ReasonFacts, words: Words): string {
  if (facts.ladder.length === 0) {
    return 'No thickness of this material can be bought for this size.'
  }
  return sentences('No thickness passes every limit.', unmetWords(facts, words), matt(facts, words))
}
