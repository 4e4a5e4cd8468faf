/** Each limit at its own condition: what was found against what is allowed. */
import { kelvin, saturationPressurePa, sources } from '#solver/index.ts'
import type { Problem } from '../problem.ts'
import { type LimitName, type LimitResult, limitWords } from '../result.ts'
import { Ledger } from './ledger.ts'
import type { Section } from './types.ts'

/** The verdict of every limit of one name as one section; null where there is none. */
export function limitSection(
  name: LimitName,
  limits: readonly LimitResult[],
  prepare: (ledger: Ledger) => void = () => undefined,
): Section | null {
  if (!limits.some(({ limit }) => limit === name)) return null
  const ledger = new Ledger(`Limit: ${limitWords[name].toLowerCase()}`, null)
  prepare(ledger)
  verdicts(ledger, name, limits)
  return ledger.section()
}

export function verdicts(ledger: Ledger, name: LimitName, limits: readonly LimitResult[]): void {
  const judged = limits.filter(({ limit }) => limit === name)
  judged.forEach((limit, index) => {
    verdict(ledger, limit, judged.length === 1 ? '' : `_${index + 1}`)
  })
}

/** Found, allowed, and what is between them: not less than nothing where the limit is met. */
export function verdict(ledger: Ledger, limit: LimitResult, ending: string): void {
  const { value, bound, unit, rule, pass, what, condition } = limit
  ledger.given(`Found at the ${condition} condition: ${what}`, `X${ending}`, value, unit)
  ledger.given(`Bound, ${rule}`, `B${ending}`, bound, unit, { source: boundSource(limit) })
  ledger.step(
    pass ? 'Room to spare: the limit is met' : 'Room to spare: the limit is not met',
    `M${ending}`,
    rule === 'at least' ? `X${ending} − B${ending}` : `B${ending} − X${ending}`,
    unit,
  )
}

/** A surface passes only below the burn curve, and up to a stated temperature. */
const boundSource = ({ limit, rule }: LimitResult): string | null =>
  limit === 'touch' && rule === 'below'
    ? 'lower curve of ISO 13732-1 by surface and contact time, straight in the logarithm of time'
    : null

const HYLAND_WEXLER = sources.hylandWexler1983

/** The dew point: the temperature at which the vapour of the air saturates. */
export function dewSteps(ledger: Ledger, { limits, conditions }: Problem): void {
  if (limits.damp === null) return
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
