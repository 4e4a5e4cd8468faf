/** The points that a search looks at, worked by hand, and where it ends. */
import { describe, expect, test } from 'vitest'
import { bracketedRoot, type Root, risingRoot } from '#solver/root.ts'

/** Where a search looked, and what it came to. */
function watched(
  f: (x: number) => number,
  search: (f: (x: number) => number) => Root,
): { seen: number[]; root: Root } {
  const seen: number[] = []
  const root = search((x) => {
    seen.push(x)
    return f(x)
  })
  expect(root.evaluations).toBe(seen.length)
  return { seen, root }
}

function expectSeen(seen: readonly number[], expected: readonly number[]): void {
  for (const [index, x] of expected.entries()) {
    expect(seen[index], `look ${index + 1} of ${seen.join(', ')}`).toBeCloseTo(x, 9)
  }
}

/** Straight from each point to the next. */
const straight =
  (points: readonly (readonly [x: number, value: number])[]) =>
  (x: number): number => {
    const after = Math.max(
      1,
      points.findIndex(([at]) => x <= at),
    )
    const [x0, f0] = points[after - 1] ?? [0, 0]
    const [x1, f1] = points[after] ?? [1, 0]
    return f0 + ((x - x0) / (x1 - x0)) * (f1 - f0)
  }

const step = (at: number) => (x: number) => (x <= at ? -1 : 1)

describe('bracketedRoot', () => {
  const between = (low: number, high: number, tolerance = { width: 0, value: 1e-12 }) =>
    function search(f: (x: number) => number): Root {
      return bracketedRoot(f, { low, high }, tolerance)
    }

  test.each([
    ['high', (x: number) => 1 - x, 1],
    ['low', (x: number) => -x, 0],
    ['low, rising', (x: number) => x, 0],
  ])('a root at the %s end is found with the ends alone', (_, f, at) => {
    const { root } = watched(f, between(0, 1))
    expect(root).toMatchObject({ at, otherEnd: at, evaluations: 2 })
  })

  // √x − 1: x is a parabola in the value. The chord from (¼, −½) to (4, 1) meets 0 at 1½; the parabola through all
  // three then meets it at 1 exactly.
  test('goes by the chord, then by the parabola through three points', () => {
    const { seen, root } = watched((x) => Math.sqrt(x) - 1, between(0.25, 4))
    expectSeen(seen, [4, 0.25, 1.5, 1])
    expect(root.evaluations).toBe(4)
  })

  // ∛x − 1 from 0 to 8: the chord meets 0 at 4, where the curve has done 0.794 of its rise on half of the way; 0.794² is
  // more than a half, so that the parabola is not trusted.
  test('halves the bracket where the parabola cannot be trusted', () => {
    const { seen } = watched((x) => Math.cbrt(x) - 1, between(0, 8))
    expectSeen(seen, [8, 0, 4, 2])
  })

  // Steep between 0.05 and 0.1, so that 0.05 is half of the way to 0 with 0.158 of the rise left; (1 − 0.158)² is more
  // than a half, and the parabola is not trusted from the other side.
  test('nor is it where the curve bends the other way', () => {
    const f = straight([
      [0, -0.1],
      [0.05, 0.05],
      [0.1, 0.85],
      [1, 0.9],
    ])
    expectSeen(watched(f, between(0, 1)).seen, [1, 0, 0.1, 0.05, 0.025])
  })

  // The parabola would lead from 0.5 by a hundredth of the bracket's 0.5; half of the width asked for is 0.05.
  test('goes at least half of the width asked for', () => {
    const f = straight([
      [0, -1],
      [0.5, 0.01],
      [1, 1],
    ])
    expectSeen(watched(f, between(0, 1, { width: 0.1, value: 0 })).seen, [1, 0, 0.5, 0.45])
  })

  // The chord leads to 1/51; from there the parabola would go 0.93 of the way to 0, nearer than half of the width.
  test('and stays as far from the other end', () => {
    const f = straight([
      [0, -0.02],
      [1 / 51, 0.1],
      [1, 1],
    ])
    const { seen } = watched(f, between(0, 1, { width: 0.5 / 51, value: 0 }))
    expectSeen(seen, [1, 0, 1 / 51, 0.25 / 51])
  })

  test('gives the end with the smaller value, and the other one beside it', () => {
    const f = (x: number) => (x <= 0 ? -1 : x < 1 ? 5 : 9)
    const { root } = watched(f, between(0, 1, { width: 0.1000001, value: 0 }))
    expect(root).toMatchObject({ at: 0, value: -1, evaluations: 3 })
    expect(root.otherEnd).toBeCloseTo(0.1, 12)
  })

  test('a value or a width of just the tolerance is enough', () => {
    const f = (x: number) => (x <= 0 ? -1 : x < 1 ? 0.25 : 1)
    expect(watched(f, between(0, 1, { width: 0, value: 0.25 })).root.evaluations).toBe(3)
    expect(watched(f, between(0, 1, { width: 0.5, value: 0 })).root.evaluations).toBe(3)
  })

  test('ends after 300 looks at the latest, as at a step on 0, to which there are a thousand halvings', () => {
    const { root } = watched(step(0), between(0, 1, { width: 0, value: 0 }))
    expect(root.evaluations).toBe(300)
    expect([root.at, root.otherEnd]).toContain(0)
    expect(Math.max(root.at, root.otherEnd)).toBeLessThan(1e-50)
  })
})

describe('risingRoot', () => {
  const from = (at: number, slope: number, low = 0, high = 1, value = 1e-12) =>
    function search(f: (x: number) => number): Root {
      return risingRoot(f, { low, high, guess: { at, slopeAt: () => slope }, value })
    }
  const line = (x: number) => 3 * x - 1.2

  test('the slope of a straight line leads to its root at once', () => {
    const { seen, root } = watched(line, from(1, 3))
    expectSeen(seen, [1, 0.4])
    expect(root.evaluations).toBe(2)
    expect(root.at).toBeCloseTo(0.4, 12)
  })

  test('after a wrong slope the secant does: 1 − 1.8/6 = 0.7', () => {
    const { seen, root } = watched(line, from(1, 6))
    expectSeen(seen, [1, 0.7, 0.4])
    expect(root.evaluations).toBe(3)
  })

  test('the slope is asked for at the guess', () => {
    const asked: number[] = []
    const slopeAt = (x: number) => {
      asked.push(x)
      return 3
    }
    risingRoot(line, { low: 0, high: 1, guess: { at: 0.9, slopeAt }, value: 1e-12 })
    expect(asked).toEqual([0.9])
  })

  // From (4, 2) the slope 1 leads to 2, the secant from there to 2 − √2, the parabola through all three to 1.
  test('then the parabola through three points', () => {
    const { seen, root } = watched((x) => 2 * (Math.sqrt(x) - 1), from(4, 1, 0, 16))
    expectSeen(seen, [4, 2, 2 - Math.SQRT2, 1])
    expect(root.evaluations).toBe(4)
  })

  test.each([
    ['below the bracket', -5, 0],
    ['above it', 7, 1],
  ])('a guess %s is taken as its end', (_, at, end) => {
    const { seen, root } = watched(line, from(at, 3))
    expectSeen(seen, [end, 0.4])
    expect(root.evaluations).toBe(2)
  })

  test.each([
    ['far below the bracket', 1, 0.1],
    ['onto its low end', 1, 1.8],
    ['far above it', 0, 0.1],
    ['onto its high end', 0, 1.2],
  ])('a step that leads %s is answered with its middle', (_, at, slope) => {
    expectSeen(watched(line, from(at, slope)).seen, [at, 0.5])
  })

  // 1 at 1, 0.9 at 0.9, and from there on nearly flat: the secant leads to 0, where the value has hardly fallen either.
  // The parabola through all three would lead to −36.
  test('two steps without gain are answered with the middle of the bracket', () => {
    const f = straight([
      [-100, -0.8],
      [0, 0.8],
      [0.9, 0.9],
      [1, 1],
    ])
    const { seen, root } = watched(f, from(1, 10, -100))
    expectSeen(seen, [1, 0.9, 0, -50])
    expect(root.evaluations).toBe(4)
  })

  // As before, but half of the value is gone at 0: the parabola through (1, 1), (0.9, 0.9) and (0, 0.45) leads to −18/11.
  test('half of the value is gain enough', () => {
    const f = (x: number) => {
      if (x >= 0.9) return x
      return x >= 0 ? 0.45 + x / 2 : 0.45 + x / 4
    }
    expectSeen(watched(f, from(1, 10, -2)).seen, [1, 0.9, 0, -18 / 11])
  })

  // No parabola goes through two equal values: (−0.05, 0.4) and (0.9, 1) alone lead to −41/60.
  test('of two equal values only one counts', () => {
    const f = (x: number) => {
      if (x >= 0.9) return 1
      return x > -0.05 ? 0.9 : 0.4 + 0.6 * (x + 0.05)
    }
    expectSeen(watched(f, from(1, 10, -1)).seen, [1, 0.9, -0.05, -41 / 60])
  })

  test('a value of just the tolerance is enough, above nought and below', () => {
    expect(watched((x) => x, from(0.25, 1, -1, 1, 0.25)).root.evaluations).toBe(1)
    expect(watched((x) => x, from(-0.25, 1, -1, 1, 0.25)).root.evaluations).toBe(1)
  })

  test.each([0, 1])('closes in on a step from %d, and shows both sides of it', (at) => {
    const { root } = watched((x) => (x < 0.3 ? -5 : 9), from(at, 1))
    expect(root.at).toBeCloseTo(0.3, 14)
    expect(root.otherEnd).toBeCloseTo(0.3, 14)
    expect(root.at < 0.3).not.toBe(root.otherEnd < 0.3)
    expect(root.value).toBe(root.at < 0.3 ? -5 : 9)
    expect(root.evaluations).toBeLessThan(60)
  })

  test('ends after 300 looks at the latest, as with a root on the end itself', () => {
    const { root } = watched((x) => x, from(1, 2, 0, 1, 0))
    expect(root.evaluations).toBe(300)
    expect(root.otherEnd).toBe(0)
    expect(root.at).toBeLessThan(1e-50)
  })

  test('ends where no number is left between the ends', () => {
    const { root } = watched(step(0), from(Number.MIN_VALUE, 1, 0, 1, 0))
    expect(root).toEqual({ at: Number.MIN_VALUE, value: 1, otherEnd: 0, evaluations: 1 })
  })
})
