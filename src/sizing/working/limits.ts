/** Each limit at its own condition: what was found against what is allowed. */
import { kelvin, saturationPressurePa, sources } from '#solver/index.ts'
import type { Problem } from '../problem.ts'
import { type LimitName, type LimitResult, limitWords } from '../result.ts'
import { printNumber } from './digits.ts'
import { Ledger } from './ledger.ts'
import type { Section } from './types.ts'

/** Lines above a verdict that come to what was found, or to the bound; null where none does. */
export interface Above {
  readonly found?: (limit: LimitResult) => string | null
  readonly bound?: (limit: LimitResult) => string | null
}

/** The verdict of every limit of one name as one section; null where there is none. */
export function limitSection(
  name: LimitName,
  limits: readonly LimitResult[],
  prepare: (ledger: Ledger) => Above = () => ({}),
): Section | null {
  if (!limits.some(({ limit }) => limit === name)) return null
  const ledger = new Ledger(`Limit: ${limitWords[name].toLowerCase()}`, null)
  verdicts(ledger, name, limits, prepare(ledger))
  return ledger.section()
}

export function verdicts(
  ledger: Ledger,
  name: LimitName,
  limits: readonly LimitResult[],
  above: Above = {},
): void {
  const judged = limits.filter(({ limit }) => limit === name)
  judged.forEach((limit, index) => {
    verdict(ledger, limit, judged.length === 1 ? '' : `_${index + 1}`, above)
  })
}

/** Found, allowed, and what is to spare or missing between them. */
export function verdict(
  ledger: Ledger,
  limit: LimitResult,
  ending: string,
  above: Above = {},
): void {
  const { value, bound, unit, rule, pass, what, condition } = limit
  const line = (words: string, symbol: string, from: string | null, own: number): void => {
    if (from === null) ledger.given(words, symbol, own, unit)
    else ledger.step(words, symbol, from, unit, { value: own })
  }
  const [found, allowed] = [`X${ending}`, `B${ending}`]
  const foundWords = `Found at the ${condition} condition: ${what}`
  line(foundWords, found, above.found?.(limit) ?? null, value)
  line(`Bound, ${rule}`, allowed, above.bound?.(limit) ?? null, bound)
  const isFoundMore = (rule === 'at least') === pass
  ledger.step(
    pass ? 'Room to spare: the limit is met' : 'Missing: the limit is not met',
    `M${ending}`,
    isFoundMore ? `${found} − ${allowed}` : `${allowed} − ${found}`,
    unit === '°C' ? 'K' : unit,
  )
}

const CURVE =
  'lower curve of ISO 13732-1 by surface and contact time, straight in the logarithm of time'

/** The burn threshold, θ_B, read off its row of the curve; a surface passes only below it. */
export function burnSteps(ledger: Ledger, { limits }: Problem, isBare: boolean): Above {
  const burn = isBare ? limits.bareBurn : limits.burn
  if (!burn?.read) return {}
  const { contactS, cells } = burn.read
  const [low, high] = cells
  const bound = ({ rule }: LimitResult): string | null => (rule === 'below' ? 'θ_B' : null)
  const about = { source: CURVE }
  if (!low) return {}
  if (!high) {
    ledger.given(
      `Burn threshold: cell of ${burn.surface} at ${seconds(low.contactS)}`,
      'θ_B',
      low.thresholdC,
      '°C',
      about,
    )
    return { bound }
  }
  ledger.given('Contact time', 't', contactS, 's')
  for (const [cell, at] of [
    [low, 1],
    [high, 2],
  ] as const) {
    ledger.given(
      `Contact time of the cell ${at === 1 ? 'before' : 'after'}`,
      `t_${at}`,
      cell.contactS,
      's',
    )
    ledger.given(`Its threshold, ${burn.surface}`, `θ_${at}`, cell.thresholdC, '°C', about)
  }
  ledger.step('Burn threshold', 'θ_B', 'θ_1 + (θ_2 − θ_1) × ln(t / t_1) / ln(t_2 / t_1)', '°C', {
    value: burn.thresholdC,
    ...about,
  })
  return { bound }
}

const seconds = (contactS: number): string => `${printNumber(contactS, 6)} s`

const HYLAND_WEXLER = sources.hylandWexler1983

/** The dew point: the temperature at which the vapour of the air saturates. */
export function dewSteps(ledger: Ledger, { limits, conditions }: Problem): Above {
  if (limits.damp === null) return {}
  const { dewPointC, marginK } = limits.damp
  const { airC } = conditions.damp.around
  ledger.given('Air at the damp condition', 'θ_a', airC, '°C')
  ledger.given(
    'Dew point, found by search; the lines below give the humidity back',
    'θ_d',
    dewPointC,
    '°C',
  )
  saturation(ledger, 'the air', 'a', airC)
  saturation(ledger, 'the dew point', 'd', dewPointC)
  ledger.step('Relative humidity, as given', 'φ', 'p_d / p_a', '')
  ledger.given('Margin', 'm', marginK, 'K')
  ledger.step('Coldest that the surface may be', 'θ_D', 'θ_d + m', '°C')
  return { bound: () => 'θ_D' }
}

function saturation(ledger: Ledger, of: string, ending: string, tempC: number): void {
  ledger.step(`Absolute temperature of ${of}`, `T_${ending}`, `θ_${ending} + 273.15`, 'K', {
    value: kelvin(tempC),
  })
  const T = `T_${ending}`
  const formula =
    tempC < 0
      ? `exp(−5674.5359 / ${T} + 6.3925247 − 9.677843e-3 × ${T} + 6.2215701e-7 × ${T}^2 + 2.0747825e-9 × ${T}^3 − 9.484024e-13 × ${T}^4 + 4.1635019 × ln(${T}))`
      : `exp(−5800.2206 / ${T} + 1.3914993 − 4.8640239e-2 × ${T} + 4.1764768e-5 × ${T}^2 − 1.4452093e-8 × ${T}^3 + 6.5459673 × ln(${T}))`
  ledger.step(`Saturation pressure at ${of}`, `p_${ending}`, formula, 'Pa', {
    value: saturationPressurePa(tempC),
    source: HYLAND_WEXLER,
    validity: tempC < 0 ? 'over ice, −100 to 0 °C' : 'over water, 0 to 200 °C',
  })
}
