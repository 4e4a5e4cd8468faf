/** How the table is read: which row decides when the surface's own may not, how sure that is, and what is said of it. */
import { describe, expect, test } from 'vitest'
import type { BurnThreshold } from '#catalogue/types.ts'
import { burnThreshold, contactWords, type TouchedSurface } from '#touch/burn-threshold.ts'

type Cell = Pick<BurnThreshold, 'surface' | 'contactS' | 'lowerC' | 'grade' | 'confidence'>

const cell = (
  surface: string,
  contactS: number,
  lowerC: number,
  sure: Partial<Pick<Cell, 'grade' | 'confidence'>> = {},
): BurnThreshold => ({
  surface,
  contactS,
  lowerC,
  upperC: null,
  grade: 'H',
  source: 'lower curve of ISO 13732-1',
  confidence: 'found',
  ...sure,
})
const doubtful = { grade: 'L' } as const

// Lower ends as public quotations of EN 563 and EN ISO 13732-1 print them.
const metal = [
  cell('smooth-metal', 0.5, 67),
  cell('smooth-metal', 1, 65),
  cell('smooth-metal', 60, 51),
  cell('smooth-metal', 600, 48),
]
const ceramic = [
  cell('ceramic-glass-stone', 0.5, 84),
  cell('ceramic-glass-stone', 1, 80),
  cell('ceramic-glass-stone', 60, 56),
]

const plain = (touchClass: TouchedSurface['touchClass']): TouchedSurface => ({
  touchClass,
  coating: null,
  coatingThicknessM: null,
})
const coated = (coating: string | null, coatingThicknessM: number | null): TouchedSurface => ({
  touchClass: 'coated-metal',
  coating,
  coatingThicknessM,
})

describe('where the own row is not confirmed', () => {
  test('plastic is judged as ceramic, not at once as metal', () => {
    const table = [...metal, ...ceramic, cell('plastic', 1, 85, doubtful)]
    expect(burnThreshold(table, plain('plastic'), 1)).toMatchObject({
      surface: 'ceramic-glass-stone',
      thresholdC: 80,
      because: 'the threshold for plastic at this contact time is not confirmed',
    })
  })

  test('the reason names the own row, however many are passed over', () => {
    const table = [
      ...metal,
      cell('ceramic-glass-stone', 1, 80, doubtful),
      cell('plastic', 1, 85, doubtful),
      cell('wood', 1, 110, doubtful),
    ]
    expect(burnThreshold(table, plain('wood'), 1)).toMatchObject({
      surface: 'smooth-metal',
      thresholdC: 65,
      because: 'the threshold for wood at this contact time is not confirmed',
    })
  })

  test('one doubtful cell of two is enough', () => {
    const table = [...metal, cell('plastic', 0.5, 91), cell('plastic', 2, 80, doubtful)]
    expect(burnThreshold(table, plain('plastic'), 1)).toMatchObject({ surface: 'smooth-metal' })
    expect(burnThreshold(table, plain('plastic'), 0.5)).toMatchObject({ surface: 'plastic' })
  })

  test('bare metal, below which there is nothing, decides all the same', () => {
    const table = [cell('smooth-metal', 1, 65, { ...doubtful, confidence: 'estimate' })]
    expect(burnThreshold(table, plain('smooth-metal'), 1)).toEqual({
      thresholdC: 65,
      surface: 'smooth-metal',
      confidence: 'estimate',
      because: null,
      read: { contactS: 1, cells: [{ contactS: 1, thresholdC: 65 }] },
    })
  })
})

describe('the columns', () => {
  test('may stand in any order', () => {
    const [a, b, c, d] = metal
    for (const table of [
      [c, a, d, b],
      [d, c, b, a],
    ].map((cells) => cells.filter((any) => any !== undefined))) {
      expect(burnThreshold(table, plain('smooth-metal'), 1)?.thresholdC).toBe(65)
      // Half way between 60 and 600 s on a logarithmic scale.
      expect(
        burnThreshold(table, plain('smooth-metal'), Math.sqrt(36_000))?.thresholdC,
      ).toBeCloseTo(49.5, 9)
    }
  })

  test('beyond the last the last holds, and before the first the first', () => {
    expect(burnThreshold(metal, plain('smooth-metal'), 3600)?.thresholdC).toBe(48)
    expect(burnThreshold(metal, plain('smooth-metal'), 0.4)?.thresholdC).toBe(67)
  })
})

describe('the confidence', () => {
  const table = [
    cell('smooth-metal', 0.5, 67),
    cell('smooth-metal', 1, 65),
    cell('smooth-metal', 4, 58, { confidence: 'memory' }),
    cell('smooth-metal', 10, 55, { confidence: 'estimate' }),
    cell('smooth-metal', 60, 51),
  ]
  test.each([
    [0.7, 'found'],
    [1, 'found'],
    [2, 'memory'],
    [4, 'memory'],
    [7, 'estimate'],
    [30, 'estimate'],
    [60, 'found'],
  ])('at %d s is that of the least sure cell used: %s', (contactS, confidence) => {
    expect(burnThreshold(table, plain('smooth-metal'), contactS)).toMatchObject({ confidence })
  })
})

describe('a coat that gives no relief', () => {
  const table = [...metal, cell('lacquer-50', 0.5, 80)]
  const unknown = 'a coating of unknown thickness gives no relief'

  test.each([
    ['of unknown thickness', coated('lacquer', null), unknown],
    ['of unknown kind', coated(null, 1e-4), unknown],
    ['too thin', coated('lacquer', 25e-6), 'a coating of 25 µm is too thin to give relief'],
  ])('%s: the reason says so', (_, surface, because) => {
    expect(burnThreshold(table, surface, 0.5)).toMatchObject({ surface: 'smooth-metal', because })
  })

  test('as thick as the row itself, it does', () => {
    expect(burnThreshold(table, coated('lacquer', 50e-6), 0.5)).toMatchObject({
      surface: 'lacquer-50',
      because: null,
    })
  })
})

test.each([
  [3600, '1 h'],
  [5400, '90 min'],
  [7200, '2 h'],
  [3661, '61 min'],
  [118.252555, '118 s'],
  [0.5312, '0.531 s'],
  [1234, '20.6 min'],
  [10_000, '2.8 h'],
  [28_800, '8 h'],
  [86_400, '24 h (the threshold of 8 h)'],
  [387_193.438053, '4.5 days (the threshold of 8 h)'],
  [2_592_000, '30 days (the threshold of 8 h)'],
])('%d s of contact is said as %s', (contactS, words) => {
  expect(contactWords(contactS)).toBe(words)
})
