/** What every line of a working carries: words, a unit that fits its symbol, a source for what is empirical. */
import { describe, expect, test } from 'vitest'
import { workRun } from '#model/size-run.ts'
import type { Step } from '#sizing/working/types.ts'
import { once } from '../../once.ts'
import { workingRuns } from '../../report/working-runs.ts'
import { index } from '../catalogue.ts'

/** Units of symbols that mean one thing wherever they stand. Source: the SI. */
const unitOf: readonly (readonly [symbol: RegExp, units: readonly string[]])[] = [
  [/^θ_/, ['°C']],
  [/^T_?[srwvad]?$/, ['K', 'm']],
  [/^ΔT$/, ['K']],
  [/^q(_.+)?$/, ['W/m²']],
  [/^[hU]_[cnwrlui]$/, ['W/(m²·K)']],
  [/^λ/, ['W/(m·K)']],
  [/^[DLs]_\d$/, ['m']],
  [/^F_\d$|^G_\d$/, ['m']],
  [/^R_[1-9i]$/, ['m²·K/W']],
  [/^R_[0hE]$/, ['m·K/W']],
  [/^(Ra|Re|Nu|Pr)(_.*)?$/, ['']],
  [/^ε$|^α$|^η$|^φ$/, ['']],
  [/^μ/, ['Pa·s']],
  [/^ν/, ['m²/s']],
  [/^ρ/, ['kg/m³']],
  [/^p(_[ad])?$/, ['Pa']],
  [/^Q(_.+)?$/, ['W']],
  [/^E(_f)?$/, ['kWh']],
  [/^v$/, ['m/s']],
]

const stepsOf = (tag: string | undefined): readonly Step[] => {
  const values = workingRuns.find((run) => run.tag === tag)
  const working = values && workRun(values, {}, index)
  return working ? working.sections.flatMap(({ steps }) => steps) : []
}

describe.each(workingRuns)('the lines of $tag', ({ tag }) => {
  const steps = once(() => stepsOf(tag))

  test('say in words what they are', () => {
    expect(steps().length).toBeGreaterThan(20)
    for (const { words, symbol } of steps()) {
      expect(words, symbol).toMatch(/^\p{Lu}.*[^.]$/u)
      expect(words, symbol).not.toMatch(/ {2}|undefined/)
    }
  })

  test('carry the unit of what they are', () => {
    for (const { symbol, unit, words } of steps()) {
      const [, units] = unitOf.find(([pattern]) => pattern.test(symbol)) ?? []
      if (units) expect(units, `${symbol}: ${words}`).toContain(unit)
    }
  })

  test('name the source of every empirical formula', () => {
    const empirical = /^(Nu|Nu_[wpcD]|λ_a|λ_a_w|c|p|h_r)$/
    for (const { symbol, formula, source, unit } of steps()) {
      if (formula === null || !empirical.test(symbol) || unit.includes('/kWh')) continue
      // The larger of two stands on theirs.
      if (formula.startsWith('max(Nu')) continue
      expect(source, `${symbol} = ${formula}`).toMatch(/\d{4}|memory/)
    }
  })
})
