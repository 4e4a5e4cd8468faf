import { describe, expect, test } from 'vitest'
import { drawLadder, nearestRung } from '#ui/views/run-sheet/ladder-drawing.ts'
import { madeRung } from './rungs.ts'

const rungsMm = [20, 25, 30, 40, 50, 60, 80, 100]
const lifeCycles = [140, 120, 110, 102, 100, 101, 108, 118]
const ladder = rungsMm.map((mm, at) =>
  madeRung(mm / 1000, {
    passes: { touch: mm >= 40 },
    lifeCycle: lifeCycles[at] ?? 0,
    installed: 30 + mm / 2,
  }),
)
const draw = (marked: readonly number[] = [4], rungs = ladder) =>
  drawLadder({
    ladder: rungs,
    ends: [],
    marked,
    chosen: marked[0] ?? null,
    isWhole: true,
    width: 400,
    units: 'si',
  })

describe('rungs', () => {
  test('stand at their true thickness', () => {
    const [first, , , fourth, , sixth] = draw().rungs.map(({ x }) => x)
    // 20, 40 and 60 mm: equal steps.
    expect((fourth ?? 0) - (first ?? 0)).toBeCloseTo((sixth ?? 0) - (fourth ?? 0), 9)
  })

  test('stay inside the drawing, whatever the ladder', () => {
    for (const rungs of [
      ladder,
      ladder.slice(0, 2),
      [madeRung(0.3)],
      ladder.map((rung) => ({ ...rung, money: null })),
    ]) {
      for (const { x } of draw([0], rungs).rungs) {
        expect(x).toBeGreaterThan(0)
        expect(x).toBeLessThan(400)
      }
    }
  })

  test('keep the marked label and drop those that would run into it', () => {
    const close = [50, 51, 52, 53, 100].map((mm) => madeRung(mm / 1000))
    expect(
      draw([2], close)
        .rungs.filter(({ hasLabel }) => hasLabel)
        .map(({ label }) => label),
    ).toEqual(['52', '100'])
  })

  test('the nearest to a place is found', () => {
    const drawing = draw()
    for (const { index, x } of drawing.rungs) expect(nearestRung(drawing, x + 1)).toBe(index)
    expect(nearestRung(drawing, -50)).toBe(0)
    expect(nearestRung(drawing, 5000)).toBe(rungsMm.length - 1)
  })
})

describe('cost', () => {
  test('is drawn from nought: the parts add up to the whole', () => {
    const { cost, costBottom } = draw()
    cost?.total.forEach((point, at) => {
      const parts = [cost.lagging[at], cost.heat[at]].map((part) => costBottom - (part?.y ?? 0))
      expect(costBottom - point.y).toBeCloseTo((parts[0] ?? 0) + (parts[1] ?? 0), 9)
    })
  })

  test('is lowest on the drawing where it is least', () => {
    const ys = draw().cost?.total.map(({ y }) => y) ?? []
    expect(ys.indexOf(Math.max(...ys))).toBe(4)
  })

  test('stays in its frame, however dear the thickest rung is', () => {
    const dear = [...ladder.slice(0, -1), madeRung(0.1, { lifeCycle: 2000 })]
    const { cost, top, costBottom } = draw([4], dear)
    const points = cost ? [...cost.total, ...cost.lagging, ...cost.heat] : []
    expect(points.length).toBeGreaterThan(0)
    expect(points.every(({ y }) => y >= top && y <= costBottom)).toBe(true)
  })

  test('is left out unless every rung has one', () => {
    expect(draw([4], [...ladder.slice(1), madeRung(0.12)]).cost).toBeNull()
  })

  test('names of the lines do not touch', () => {
    const ys = draw().cost?.names.map(({ y }) => y) ?? []
    expect((ys[1] ?? 0) - (ys[0] ?? 0)).toBeGreaterThanOrEqual(13)
    expect((ys[2] ?? 0) - (ys[1] ?? 0)).toBeGreaterThanOrEqual(13)
  })
})

describe('bars', () => {
  const words = (fromM: number | null, units: 'si' | 'us' = 'si') =>
    drawLadder({
      ladder,
      ends: fromM === null ? [] : [{ limit: 'touch', fromM, upToM: null }],
      marked: [4],
      chosen: 4,
      isWhole: true,
      width: 400,
      units,
    }).bars[0]?.pieces[0]

  test('say a figure that itself passes: rounded up to the tenth', () => {
    expect(words(0.03121)?.words).toBe('passes from 31.3\u00a0mm')
    expect(words(null)?.words).toBe('passes from 40\u00a0mm')
    // 31.21 mm = 1.2287 in.
    expect(words(0.03121, 'us')?.words).toBe('passes from 1.23\u00a0in')
  })

  test('keep their words clear of the upright of the chosen rung', () => {
    const upright = draw().rungs[4]?.x ?? 0
    const piece = words(0.03121)
    const start = piece?.wordsX ?? 0
    expect(start > upright || start + (piece?.words.length ?? 0) * 6 < upright).toBe(true)
  })
})

describe('reach', () => {
  const long = [20, 30, 40, 50, 60, 70, 80, 90, 100, 120, 140, 160, 200, 240].map((mm) =>
    madeRung(mm / 1000, { passes: { touch: mm >= 40 }, lifeCycle: 100 + Math.abs(mm - 50) }),
  )
  const drawn = (chosen: number | null, isWhole = false, rungs = long) =>
    drawLadder({ ladder: rungs, ends: [], marked: [], chosen, isWhole, width: 400, units: 'si' })
      .rungs.length

  test('goes a little beyond what decides: 2.2 times the chosen or the cheapest rung', () => {
    expect(drawn(2)).toBe(9)
    expect(drawn(5)).toBe(11)
  })

  test('goes to the end where asked, or where nothing is chosen', () => {
    expect(drawn(2, true)).toBe(long.length)
    expect(drawn(null)).toBe(long.length)
  })

  test('goes as far as any limit begins', () => {
    const late = long.map((rung) => ({
      ...rung,
      limits: madeRung(0, { passes: { loss: rung.thicknessM >= 0.1 } }).limits,
    }))
    expect(drawn(2, false, late)).toBe(long.length - 1)
  })
})
