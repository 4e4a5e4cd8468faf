import { describe, expect, test } from 'vitest'
import { isEnough, type Mutant, survivorsText, tallyLine, tallyOf } from './tally.ts'

const mutant = (status: string, line = 1, fileName = 'src/money/a.ts'): Mutant => ({
  status,
  fileName,
  location: { start: { line, column: 5 } },
  mutatorName: 'ArithmeticOperator',
  replacement: 'a\n  - b',
})
const many = (count: number, status: string): Mutant[] =>
  Array.from({ length: count }, () => mutant(status))

describe('the score', () => {
  test('counts what was killed or ran without end, of all that load', () => {
    const tally = tallyOf([
      ...many(17, 'Killed'),
      ...many(1, 'Timeout'),
      ...many(1, 'Survived'),
      ...many(1, 'NoCoverage'),
      ...many(3, 'RuntimeError'),
    ])
    expect(tally).toEqual({
      killed: 17,
      timedOut: 1,
      survived: 1,
      notCovered: 1,
      invalid: 3,
      scorePercent: 90,
    })
  })

  test('is enough from 85 % on, and is not rounded up to it', () => {
    const enough = tallyOf([...many(85, 'Killed'), ...many(15, 'Survived')])
    expect(isEnough(enough)).toBe(true)
    expect(tallyLine('money', enough)).not.toContain('BELOW')
    const short = tallyOf([...many(8499, 'Killed'), ...many(1501, 'Survived')])
    expect(isEnough(short)).toBe(false)
    expect(tallyLine('money', short)).toContain('84.9 %, BELOW 85 %')
  })

  test('of no mutants is none, which is not enough', () => {
    expect(isEnough(tallyOf([]))).toBe(false)
    expect(tallyLine('money', tallyOf([]))).toContain('no mutants')
  })
})

test('survivors stand in the order of the source, each on a line', () => {
  const text = survivorsText([
    mutant('Survived', 9),
    mutant('Killed', 3),
    mutant('NoCoverage', 2),
    mutant('Survived', 1, 'src/money/b.ts'),
  ])
  expect(text.split('\n')).toEqual([
    'src/money/a.ts:2:5 not covered ArithmeticOperator: a - b',
    'src/money/a.ts:9:5 survived ArithmeticOperator: a - b',
    'src/money/b.ts:1:5 survived ArithmeticOperator: a - b',
    '',
  ])
})
