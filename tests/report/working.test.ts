/** Every line of a printed working is repeated with a calculator that knows only the page. */
import { readFileSync } from 'node:fs'
import { describe, expect, test } from 'vitest'
import type { RunValues } from '#model/fields.ts'
import { indexCatalogue, sizeRun, workRun } from '#model/size-run.ts'
import { parseRunsCsv } from '#report/runs-csv.ts'
import { writeWorkingText } from '#report/working-text.ts'
import type { RunResult } from '#sizing/result.ts'
import type { Working } from '#sizing/working/types.ts'
import { shippedCatalogue } from '../catalogue/shipped-catalogue.ts'
import { once } from '../once.ts'
import { demoFile } from './demo-runs.ts'
import { agrees, inexact, repeated } from './repeated.ts'
import { numberOf, type PageSection, readPage } from './working-page.ts'
import { workingRuns } from './working-runs.ts'

const index = indexCatalogue(shippedCatalogue())

function demoRuns(): readonly RunValues[] {
  const read = parseRunsCsv(readFileSync(demoFile))
  if (!read.ok) throw new Error('The demo list has problems')
  return read.runs
}

function workingOf(values: RunValues): Working {
  const working = workRun(values, {}, index)
  if (!working) throw new Error(JSON.stringify(sizeRun(values, {}, index)))
  return working
}

function resultOf(values: RunValues): RunResult {
  const outcome = sizeRun(values, {}, index)
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.issues))
  return outcome.result
}

function printed(sections: readonly PageSection[], title: string, symbol: string): number {
  const section = sections.find((found) => found.title === title)
  const line = section?.lines.find((found) => found.symbol === symbol)
  return numberOf(line?.parts.at(-1) ?? '')
}

const throughWords = /through the (layers|film inside)/

const runs = [...demoRuns(), ...workingRuns]

function workedOut(values: RunValues) {
  const working = workingOf(values)
  const text = writeWorkingText(working)
  const sections = readPage(text)
  const result = resultOf(values)
  const { chosen, bare } = result
  const shown = chosen ?? result.ladder.at(-1) ?? bare
  const isBare = shown.thicknessM === 0
  const title = isBare ? 'Bare run' : 'Loss condition'
  const at = (section: string, symbol: string): number => printed(sections, section, symbol)
  return { working, text, sections, result, bare, shown, isBare, title, at }
}

describe.each(runs)('the working of $tag', (values) => {
  const worked = once(() => workedOut(values))

  test('repeats line by line from the page alone', () => {
    const { sections } = worked()
    const all = sections.map(repeated)
    expect(all.flatMap(({ wrong }) => wrong)).toEqual([])
    expect(all.reduce((sum, { formulas }) => sum + formulas, 0)).toBeGreaterThan(12)
  })

  test('shows formulas that are the program’s own', () => {
    const { working } = worked()
    expect(working.sections.flatMap(inexact)).toEqual([])
  })

  test('fits a page and hides nothing', () => {
    const { text, result } = worked()
    expect(text.split('\n').filter((row) => [...row].length > 100)).toEqual([])
    expect(text).not.toMatch(/NaN|Infinity|undefined|null/)
    for (const note of result.notes) {
      expect(text.replace(/\s+/g, ' ')).toContain(note.text.replace(/\s+/g, ' '))
    }
  })

  test('closes its balances: layers carry what the film gives off', () => {
    const { sections, isBare, at } = worked()
    const layered = sections.filter((section) => throughWords.test(section.title))
    if (!isBare) expect(layered.length).toBeGreaterThan(1)
    for (const { title: of } of layered) {
      const q = at(of, 'q')
      expect(agrees(at(of, 'q_L'), q), of).toBe(true)
      const film = at(of.replace(throughWords, 'outer film'), 'q')
      expect(agrees(film, q), of).toBe(true)
    }
  })

  test('ends at the figures of the schedule', () => {
    const { sections, bare, result, shown, title, at } = worked()
    const pairs: [string, number, number | null | undefined][] = [
      ['flux', at(`${title}: the whole run`, 'q'), shown.heatFluxWPerM2],
      ['total', at(`${title}: the whole run`, 'Q'), shown.heatLossW],
      ['mean of the year', at(`${title}: the year`, 'Q'), shown.yearlyMeanLossW],
      ['surface', surfaceOf(sections, title), shown.surfaceTempC],
      ['bare surface', surfaceOf(sections, 'Bare run'), bare.surfaceTempC],
      ['bare total', at('Bare run: the whole run', 'Q'), bare.heatLossW],
      ['year', at(`${title}: the year`, 'E'), shown.yearlyKWh],
      ['installed', at('Money: installed cost', 'C'), shown.money?.installed],
      ['life', at('Money: energy and cost over the life', 'LCC'), shown.money?.lifeCycle],
      ['factor', at('Money: energy and cost over the life', 'F'), result.money?.presentValueFactor],
      ['freezing', at('Limit: frost', 't'), shown.timeToFreezeH],
      ['arrival', at('Arrival of what flows', 'θ_2'), condenses(shown) ? null : shown.arrivalTempC],
      ['condensate', at('Arrival of what flows', 'm_c'), shown.condensateKgPerS],
      ['survey', at('Survey: what it says', 'q'), result.survey?.heatFluxWPerM2.value],
      ['effective', at('Survey: what it says', 'λ'), result.survey?.effectiveWPerMK?.value],
    ]
    if (shown.heatLossWPerM !== null) {
      pairs.push(['per metre', at(`${title}: the whole run`, 'Φ'), shown.heatLossWPerM])
    }
    for (const [name, found, wanted] of pairs) {
      if (wanted === null || wanted === undefined) expect(found, name).toBeNaN()
      else expect(agrees(found, wanted), `${name}: ${found} for ${wanted}`).toBe(true)
    }
  })

  test('judges every limit as the schedule does', () => {
    const { sections, shown } = worked()
    const verdicts = sections.flatMap(({ lines }) =>
      lines.filter(({ symbol }) => /^X(_\d)?$/.test(symbol)),
    )
    expect(verdicts).toHaveLength(shown.limits.length)
    for (const { value, bound } of shown.limits) {
      const found = verdicts.some(({ parts }) => agrees(numberOf(parts.at(-1) ?? ''), value))
      expect(found, `${value} against ${bound}`).toBe(true)
    }
  })
})

/** The surface of an inclined pipe stands at its lower film; that of several faces is their mean. */
function surfaceOf(sections: readonly PageSection[], title: string): number {
  const titles = sections.map((section) => section.title)
  const own = [
    `${title}, its temperatures with the lower film: outer film`,
    `${title}: mean of the faces`,
    `${title}: outer film`,
  ].find((candidate) => titles.includes(candidate))
  return printed(sections, own ?? '', 'θ_s')
}

const condenses = ({ condensateKgPerS }: { condensateKgPerS: number | null }): boolean =>
  condensateKgPerS !== null

function textOf(tag: string): string {
  const values = workingRuns.find((run) => run.tag === tag)
  if (!values) throw new Error(`No run ${tag}`)
  return writeWorkingText(workingOf(values)).replace(/\s+/g, ' ')
}

describe('what a working takes apart', () => {
  test('a burn threshold between two cells of its row', () => {
    expect(textOf('lying')).toMatch(
      /θ_B = θ_1 \+ \(θ_2 − θ_1\) × ln\(t \/ t_1\) \/ ln\(t_2 \/ t_1\) = \d+ \+ \(\d+ − \d+\) × ln\(5 \/ \d+\) \/ ln/,
    )
    expect(textOf('contact of a cell')).toContain('Burn threshold: cell of smooth metal at 60 s')
  })

  test('the clear sky in what a surface sees', () => {
    expect(textOf('sun and sky')).toContain('T_S = 0.0552 × (θ_a + 273.15)^1.5')
  })

  test('the film inside a duct by the velocity of its air, or by what flows', () => {
    expect(textOf('duct')).toContain('Nusselt number inside: turbulent')
    expect(textOf('slow duct')).toContain('Nusselt number inside: laminar')
    expect(textOf('slower duct')).toContain('on the straight line between laminar and turbulent')
    expect(textOf('duct by flow')).toContain('v = m / (ρ × A_i)')
  })

  test('fittings by their kinds, water and wall by their measures', () => {
    expect(textOf('strainers too')).toContain('A_F = n_1 × A_1 + n_2 × A_2 + n_3 × A_3')
    expect(textOf('fittings lagged')).toContain('l_F = n_1 × l_1 + n_2 × l_2')
    expect(textOf('frost')).toContain('C_p = ρ_p × c_p × π / 4 × (D^2 − d^2)')
  })

  test('months in which heat flows the other way, and sun that turns it round', () => {
    const both = textOf('months, heat both ways')
    expect(both).toContain('31 × max(0, Q_1)')
    expect(both).toMatch(/July 24 31 0\.08493 −[\d.]+ 0 /)
    expect(textOf('months, mostly cold')).toContain('31 × min(0, Q_1)')
    expect(textOf('sun against the loss')).toContain('Q = max(0, Q_0)')
  })

  test('how far a survey may be off, from the readings at both ends of what is believed', () => {
    const survey = textOf('survey')
    expect(survey).toContain('Survey, thermometer high: outer film')
    expect(survey).toContain('λ_1l = q_1l × F / (θ_i − θ_l)')
    expect(survey).toContain('u_λ = sqrt((w_1 × (λ_1h − λ_1l))^2')
    expect(textOf('survey, film inside')).toContain('λ_3h = F / ((θ_i − θ_s) / q_3h − a / h_i)')
    expect(textOf('survey, vessel')).toContain('G = a_1 / F_1 + a_2 / F_2')
    expect(textOf('survey, vessel with a film inside')).toContain('F_1 / λ + o_1 / h_i')
  })

  test('steam and heat capacities by the states of their tables', () => {
    const steam = textOf('condensate')
    expect(steam).toContain('x = ln(p_S / p_1) / ln(p_2 / p_1)')
    expect(steam).toContain('r = r_a + (r_b − r_a) × (θ_1 − θ_a) / (θ_b − θ_a)')
  })

  test('what is missing from a limit as a difference, what is to spare only where it is met', () => {
    const unmet = textOf('unmet')
    expect(unmet).toMatch(
      /Missing: the limit is not met M\S* = X\S* − B\S* = [\d.]+ − [\d.]+ = [\d.]+ K/,
    )
    expect(unmet).not.toMatch(/Room to spare: the limit is not met/)
    expect(textOf('limits that exclude each other')).toContain(
      'the limits exclude each other, no thickness meets them all at once',
    )
  })
})
