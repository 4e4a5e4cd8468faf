/** Every word, unit and source of a working is there, and each section says what it is about. */
import { describe, expect, test } from 'vitest'
import { sizeRun, workRun } from '#model/size-run.ts'
import type { Section, Working } from '#sizing/working/types.ts'
import { once } from '../../once.ts'
import { workingRuns } from '../../report/working-runs.ts'
import { index } from '../catalogue.ts'

const worked = (values: (typeof workingRuns)[number]): Working =>
  workRun(values, {}, index) ?? expect.fail(`${values.tag} has no working`)

const sentence = /^[\p{Lu}\d].*[.:]$/su
const phrase = /^\p{L}.{3,}[^.]$/u

describe.each(workingRuns)('the sections of $tag', (values) => {
  const working = once(() => worked(values))
  const sections = (): readonly Section[] => working().sections

  test('have titles of their own, and conditions and texts in whole words', () => {
    const titles = sections().map(({ title }) => title)
    expect(new Set(titles).size).toBe(titles.length)
    for (const { title, condition, texts } of sections()) {
      expect(title).toMatch(phrase)
      if (condition !== null) expect(condition, title).toMatch(phrase)
      for (const text of texts) expect(text, title).toMatch(sentence)
    }
  })

  test('name sources and ranges in words where they name any', () => {
    for (const { title, steps } of sections()) {
      for (const { symbol, source, validity } of steps) {
        if (source !== null) expect(source, `${title}: ${symbol}`).toMatch(phrase)
        if (validity !== null) expect(validity, `${title}: ${symbol}`).toMatch(phrase)
      }
    }
  })

  test('say what every symbol is, and leave no unit out where a unit is owed', () => {
    for (const { title, steps } of sections()) {
      for (const { symbol, words, unit, printed, formula } of steps) {
        const what = `${title}: ${symbol}, ${words}`
        expect(symbol, what).toMatch(/^[\p{L}]/u)
        expect(printed, what).toMatch(/^−?\d/)
        expect(unit, what).toMatch(/^[^ ]*( [^ ]+)?$/)
        if (formula !== null) expect(formula, what).not.toBe('')
        if (/temperature|°C/i.test(words) && symbol.startsWith('θ')) expect(unit, what).toBe('°C')
        if (/^Heat flow|^Loss/.test(words)) expect(unit, what).toMatch(/W/)
        if (/^Area/.test(words)) expect(unit, what).toBe('m²')
      }
    }
  })

  test('have tables without an empty head or cell', () => {
    for (const { title, table } of sections()) {
      if (!table) continue
      expect(table.rows.length, title).toBeGreaterThan(0)
      for (const head of table.headers) expect(head, title).toMatch(/\p{L}/u)
      for (const row of table.rows) expect(row, title).toHaveLength(table.headers.length)
    }
  })

  test('end with the reason and the notes of the run', () => {
    const outcome = sizeRun(values, {}, index)
    if (!outcome.ok) return expect.fail('not sized')
    const { reason, notes, tag } = outcome.result
    const last = sections().slice(-2)
    const why = sections().find(({ title }) => title === 'Why this thickness')
    expect(why?.texts).toEqual([reason])
    if (notes.length > 0) {
      expect(last.at(-1)?.title).toBe('What was assumed, and what to know')
      expect(last.at(-1)?.texts).toEqual(notes.map(({ text }) => text))
    }
    expect(working().title.startsWith(`${tag}: `)).toBe(true)
  })
})
