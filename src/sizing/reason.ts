/** Why the chosen rung is as thick as it is: a few plain sentences with the numbers that decided. */
import { limitNames, passesLimit } from './passes-limit.ts'
import {
  type LimitName,
  type LimitResult,
  limitWords,
  type Rating,
  type RunResult,
} from './result.ts'

/** How numbers are said; the window and the documents pass their own units. */
export interface Words {
  /** A thickness, and what an inch series calls it where it is one of those. */
  thickness(thicknessM: number, nominalThicknessM: number | null): string
  /** A number in one of the units of `LimitResult`, with its unit; `digits` after the point in SI. */
  quantity(value: number, unit: string, digits: number): string
}

/** What reads better than the SI unit: millimetres and kilograms an hour. */
const shownUnits: Readonly<Partial<Record<string, { unit: string; per: number }>>> = {
  m: { unit: 'mm', per: 0.001 },
  'kg/s': { unit: 'kg/h', per: 1 / 3600 },
}

const shownValue = (value: number, unit: string): number => value / (shownUnits[unit]?.per ?? 1)

export const siWords: Words = {
  thickness: (thicknessM, nominalThicknessM) => {
    const mm = `${Number((thicknessM * 1000).toFixed(1))} mm`
    return nominalThicknessM === null
      ? mm
      : `${Number((nominalThicknessM / 0.0254).toFixed(3))} in (${mm})`
  },
  quantity: (value, unit, digits) =>
    `${minus(shownValue(value, unit).toFixed(digits))} ${shownUnits[unit]?.unit ?? unit}`,
}

/** A true minus sign, and no sign on a zero. */
function minus(text: string): string {
  return /^-0(\.0*)?$/.test(text) ? text.slice(1) : text.replace('-', '−')
}

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
        failures(chosen, words) || passes(chosen, words),
      )
    case 'money':
      return sentences('Cost decides.', allowed(facts, words), cheapest(facts, words))
    case 'smallest':
      return sentences('The thinnest that can be bought passes.', standing(chosen, words))
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

const said = (rung: Rating, words: Words): string =>
  words.thickness(rung.thicknessM, rung.nominalThicknessM)

/** A thickness that is a rung of the ladder, with the name its series gives it. */
function saidThickness(thicknessM: number, { ladder }: ReasonFacts, words: Words): string {
  const rung = ladder.find((candidate) => candidate.thicknessM === thicknessM)
  return words.thickness(thicknessM, rung?.nominalThicknessM ?? null)
}

/** As many digits as tell a value from its bound, at least one. */
function tellingDigits({ value, bound, unit }: LimitResult): number {
  const [shown, shownBound] = [shownValue(value, unit), shownValue(bound, unit)]
  return (
    [1, 2, 3, 4, 5, 6].find((digits) => shown.toFixed(digits) !== shownBound.toFixed(digits)) ?? 6
  )
}

/** A bound that somebody wrote down as a whole number, millimetres kept in metres included. */
const isWhole = (value: number): boolean => Math.abs(value - Math.round(value)) < 1e-9

function against(limit: LimitResult, words: Words): string {
  const { value, bound, unit } = limit
  const digits = tellingDigits(limit)
  const boundDigits = isWhole(shownValue(bound, unit)) ? 0 : digits
  return `${words.quantity(value, unit, digits)} against ${words.quantity(bound, unit, boundDigits)}`
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

/** What a failed rung gives; where one decimal does not tell it from its bound, that it just misses. */
function missed({ value, bound, unit }: LimitResult, words: Words): string {
  return shownValue(value, unit).toFixed(1) === shownValue(bound, unit).toFixed(1)
    ? 'just miss it'
    : `give ${words.quantity(value, unit, 1)}`
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
function allowed({ ladder, chosen }: ReasonFacts, words: Words): string {
  const first = ladder.find((rung) => rung.pass)
  if (!first || !chosen || first.thicknessM >= chosen.thicknessM) return ''
  const limit = nearest(first.limits)
  if (!limit) return ''
  return `The limits would allow ${said(first, words)} (${limit.limit}: ${against(limit, words)}).`
}

/** The asked limit that a rung passes most narrowly, by its share of the bound; service is not asked for. */
function nearest(limits: readonly LimitResult[]): LimitResult | undefined {
  const share = ({ value, bound }: LimitResult): number =>
    Math.abs(bound - value) / Math.max(1, Math.abs(bound))
  return limits.filter(({ limit }) => limit !== 'service').sort((a, b) => share(a) - share(b))[0]
}

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
function standing(chosen: Rating, words: Words): string {
  const limit = nearest(chosen.limits)
  return limit ? `${said(chosen, words)} gives ${against(limit, words)} (${limit.limit}).` : ''
}

function failures(rating: Rating, words: Words): string {
  return rating.limits
    .filter(({ pass }) => !pass)
    .map((limit) => `It fails ${limit.limit}: ${against(limit, words)} (${limit.what}).`)
    .join(' ')
}

function passes(rating: Rating, words: Words): string {
  const limit = nearest(rating.limits)
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
  const { ladder } = facts
  if (ladder.length === 0) return 'No thickness of this material can be bought for this size.'
  const alone = facts.unmet.map((limit) => cannotBeMet(limit, facts, words))
  return sentences(
    'No thickness passes every limit.',
    ...(alone.length > 0 ? alone : [excluding(ladder, words)]),
    matt(facts, words),
  )
}

/** One limit that no rung meets: how near the best of them comes, and what it would take. */
function cannotBeMet(
  { limit, neededM, because }: RunResult['unmet'][number],
  { ladder }: ReasonFacts,
  words: Words,
): string {
  const best = nearestTo(ladder, limit)
  const failed = best?.limits.find((result) => result.limit === limit && !result.pass)
  if (!best || !failed) return ''
  const stands = `${limitWords[limit]} cannot be met: at best, ${said(best, words)}, it stands at ${against(failed, words)} (${failed.what})`
  return neededM === null
    ? `${stands}, because ${because ?? 'no thickness would do'}.`
    : `${stands}; it would take ${words.thickness(neededM, null)}, which is more than can be bought.`
}

/** The rung that misses a limit by least; the thinnest of equals. */
function nearestTo(ladder: readonly Rating[], limit: LimitName): Rating | undefined {
  const shortfall = (rung: Rating): number =>
    Math.max(
      ...rung.limits
        .filter((result) => result.limit === limit && !result.pass)
        .map(({ value, bound }) => Math.abs(value - bound)),
    )
  return ladder.length === 0
    ? undefined
    : ladder.reduce((a, b) => (shortfall(b) < shortfall(a) - 1e-9 ? b : a))
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
