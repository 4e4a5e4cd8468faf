/** Why the chosen rung is as thick as it is: a few plain sentences with the numbers that decided. */
import type { LimitName, LimitResult, Rating, RunResult } from './result.ts'

/** How numbers are said; the window and the documents pass their own units. */
export interface Words {
  thickness(thicknessM: number): string
  /** A number in one of the units of `LimitResult`, with its unit; `digits` after the point in SI. */
  quantity(value: number, unit: string, digits: number): string
}

export const siWords: Words = {
  thickness: (thicknessM) => `${Number((thicknessM * 1000).toFixed(1))} mm`,
  quantity: (value, unit, digits) => `${minus(value.toFixed(digits))} ${unit}`,
}

/** A true minus sign, and no sign on a zero. */
function minus(text: string): string {
  return /^-0(\.0*)?$/.test(text) ? text.slice(1) : text.replace('-', '−')
}

export type ReasonFacts = Pick<
  RunResult,
  'bare' | 'chosen' | 'governing' | 'ladder' | 'limits' | 'money' | 'mattThicknessM'
>

export function writeReason(facts: ReasonFacts, words: Words = siWords): string {
  const { chosen, governing } = facts
  if (!chosen) return unmet(facts, words)
  switch (governing) {
    case 'bare':
      return `Bare. ${failures(chosen, words) || bareWords(facts, words)}`
    case 'fixed':
      return `Fixed at ${words.thickness(chosen.thicknessM)}. ${failures(chosen, words) || passes(chosen, words)}`
    case 'money':
      return sentences('Cost decides.', allowed(facts, words), cheapest(facts, words))
    case 'smallest':
      return sentences('The thinnest that can be bought passes.', standing(chosen, words))
    case 'unmet':
      return unmet(facts, words)
    default:
      return sentences(
        `${names[governing]} decides.`,
        decided(facts, governing, words),
        matt(facts, words),
        dearer(facts, words),
      )
  }
}

const names: Readonly<Record<LimitName, string>> = {
  touch: 'Touch',
  loss: 'Loss',
  damp: 'Damp',
  frost: 'Frost',
  arrival: 'Arrival',
  code: 'Code',
  space: 'Space',
  service: 'Service',
}

const sentences = (...parts: readonly string[]): string =>
  parts.filter((part) => part !== '').join(' ')

/** Value and bound with as many digits as keep them apart, at least one. */
function against({ value, bound, unit }: LimitResult, words: Words): string {
  const digits = [1, 2, 3].find((count) => value.toFixed(count) !== bound.toFixed(count)) ?? 3
  return `${words.quantity(value, unit, digits)} against ${words.quantity(bound, unit, Number.isInteger(bound) ? 0 : digits)}`
}

/** A result that came through JSON or a worker holds the chosen rung twice: compared by thickness. */
const isSame = (a: Rating, b: Rating): boolean => a.thicknessM === b.thicknessM

const worst = (rating: Rating, limit: LimitName): LimitResult | undefined => {
  const own = rating.limits.filter((result) => result.limit === limit)
  return own.find(({ pass }) => !pass) ?? own[0]
}

function decided(facts: ReasonFacts, limit: LimitName, words: Words): string {
  const { chosen, ladder } = facts
  if (!chosen) return ''
  const thinner = ladder[ladder.findIndex((rung) => isSame(rung, chosen)) - 1]
  const failed = thinner && worst(thinner, limit)
  // The same question on both rungs: the failed one may be one of two touch limits.
  const here = chosen.limits.find(
    (result) => result.limit === limit && (!failed || result.bound === failed.bound),
  )
  const first = here ? `${words.thickness(chosen.thicknessM)} gives ${against(here, words)}` : ''
  const second = failed
    ? `${words.thickness(thinner.thicknessM)} would give ${words.quantity(failed.value, failed.unit, 1)}`
    : ''
  return `${[first, second].filter(Boolean).join('; ')}.`
}

function matt({ mattThicknessM, chosen }: ReasonFacts, words: Words): string {
  if (mattThicknessM === null || !chosen || mattThicknessM >= chosen.thicknessM) return ''
  return `Under a matt finish ${words.thickness(mattThicknessM)} would do.`
}

/** Where the limits cost something: the thickness that money alone would take. */
function dearer({ money, chosen }: ReasonFacts, words: Words): string {
  const free = money?.cheapestThicknessM ?? null
  if (free === null || !chosen || free === chosen.thicknessM) return ''
  return `Cost alone would take ${words.thickness(free)}.`
}

/** The thinnest rung that passes, where cost took a thicker one. */
function allowed({ ladder, chosen }: ReasonFacts, words: Words): string {
  const first = ladder.find((rung) => rung.pass)
  if (!first || !chosen || first.limits.length === 0 || first.thicknessM >= chosen.thicknessM)
    return ''
  const limit = nearest(first.limits)
  if (!limit) return ''
  return `The limits would allow ${words.thickness(first.thicknessM)} (${limit.limit}: ${against(limit, words)}).`
}

/** The limit that a rung passes most narrowly, by its share of the bound; service last, since it is always there. */
function nearest(limits: readonly LimitResult[]): LimitResult | undefined {
  const share = ({ value, bound }: LimitResult): number =>
    Math.abs(bound - value) / Math.max(1, Math.abs(bound))
  const asked = limits.filter(({ limit }) => limit !== 'service')
  return [...(asked.length > 0 ? asked : limits)].sort((a, b) => share(a) - share(b))[0]
}

function cheapest({ chosen, ladder, money }: ReasonFacts, words: Words): string {
  if (!chosen || !money) return ''
  const own = `${words.thickness(chosen.thicknessM)} is the cheapest to own over ${money.lifeYears} years`
  const most = (chosen.money?.lifeCycle ?? 0) * 1.02
  const near = ladder.filter(
    (rung) =>
      !isSame(rung, chosen) && rung.pass && rung.money !== null && rung.money.lifeCycle <= most,
  )
  const [first] = near
  const last = near[near.length - 1]
  if (!first || !last) return `${own}; every other thickness costs over 2 % more.`
  if (first === last) return `${own}; ${words.thickness(first.thicknessM)} costs within 2 % of it.`
  const joint = near.length === 2 ? 'and' : 'to'
  return `${own}; ${words.thickness(first.thicknessM)} ${joint} ${words.thickness(last.thicknessM)} cost within 2 % of it.`
}

/** How the narrowest limit stands. */
function standing(chosen: Rating, words: Words): string {
  const limit = nearest(chosen.limits)
  return limit
    ? `${words.thickness(chosen.thicknessM)} gives ${against(limit, words)} (${limit.limit}).`
    : ''
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
    : 'No limit is set.'
}

function bareWords({ bare }: ReasonFacts, words: Words): string {
  return `The surface is at ${words.quantity(bare.surfaceTempC, '°C', 1)}; no limit is broken.`
}

function unmet({ ladder, limits }: ReasonFacts, words: Words): string {
  const thickest = ladder[ladder.length - 1]
  if (!thickest) return 'No thickness of this material can be bought for this size.'
  const failed = limits.filter(({ pass }) => !pass)
  const detail = failed
    .map((limit) => `${names[limit.limit]} reaches ${against(limit, words)} (${limit.what})`)
    .join('; ')
  return `No thickness passes every limit. At the thickest, ${words.thickness(thickest.thicknessM)}: ${detail}.`
}
