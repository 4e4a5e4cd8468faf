/** Result of a bracketed search: where it ended, and whether it ended on a root or on a jump of the function. */
export interface Root {
  readonly at: number
  readonly value: number
  /** The other end of the last bracket; the function has the other sign there, or is zero at `at`. */
  readonly otherEnd: number
  readonly evaluations: number
}

export interface Tolerance {
  /** Stop when the bracket is no wider than this (in the unit of the argument). */
  readonly width: number
  /** Stop when the function is this near to zero. */
  readonly value: number
}

const MAX_EVALUATIONS = 300

/**
 * Root of a function whose signs differ at the ends of a bracket.
 *
 * Chandrupatla 1997: inverse quadratic interpolation where it is safe, else bisection. It never leaves the bracket and
 * ends for every function; on a jump it closes in on the jump, and `value` stays large. Where the signs do not differ,
 * the end with the smaller value comes back: the caller sees it in `value`.
 */
export function bracketedRoot(
  f: (x: number) => number,
  bracket: { readonly low: number; readonly high: number },
  tolerance: Tolerance,
): Root {
  let x1 = bracket.high
  let x2 = bracket.low
  let f1 = f(x1)
  let f2 = f(x2)
  let evaluations = 2
  if (f1 === 0 || x1 === x2) return { at: x1, value: f1, otherEnd: x1, evaluations }
  if (f2 === 0) return { at: x2, value: f2, otherEnd: x2, evaluations }
  if (f1 > 0 === f2 > 0) {
    return Math.abs(f1) < Math.abs(f2)
      ? { at: x1, value: f1, otherEnd: x1, evaluations }
      : { at: x2, value: f2, otherEnd: x2, evaluations }
  }

  // The first step is by false position: our functions are nearly straight.
  let step = f1 / (f1 - f2)
  for (;;) {
    const x = x1 + step * (x2 - x1)
    const value = f(x)
    evaluations += 1
    let x3 = x1
    let f3 = f1
    if (value > 0 !== f1 > 0) {
      x3 = x2
      f3 = f2
      x2 = x1
      f2 = f1
    }
    x1 = x
    f1 = value

    const firstIsBest = Math.abs(f1) < Math.abs(f2)
    const at = firstIsBest ? x1 : x2
    const best = firstIsBest ? f1 : f2
    const width = Math.abs(x2 - x1)
    const smallest = Math.max(tolerance.width, 2 * Number.EPSILON * Math.abs(at))
    if (Math.abs(best) <= tolerance.value || width <= smallest || evaluations >= MAX_EVALUATIONS) {
      return { at, value: best, otherEnd: firstIsBest ? x2 : x1, evaluations }
    }

    const xi = (x1 - x2) / (x3 - x2)
    const phi = (f1 - f2) / (f3 - f2)
    const smooth = phi * phi < xi && (1 - phi) * (1 - phi) < 1 - xi
    step = smooth
      ? (f1 / (f2 - f1)) * (f3 / (f2 - f3)) +
        ((x3 - x1) / (x2 - x1)) * (f1 / (f3 - f1)) * (f2 / (f3 - f2))
      : 0.5
    const least = (0.5 * smallest) / width
    step = Math.min(Math.max(step, least), 1 - least)
  }
}

export interface Guess {
  readonly at: number
  /** What the function rises by there for each unit of its argument, > 0; asked for after the function itself. */
  readonly slopeAt: (x: number) => number
}

/**
 * Root of a function known not to be positive at `low` nor negative at `high`, looked for from a good guess.
 *
 * Neither end is evaluated unless the search comes to it. Steps go by the slope of the guess, then by the secant, then
 * by inverse quadratic interpolation; a step that leaves the bracket, or a bracket that does not shrink while the value
 * does not either, is answered with bisection. So it ends for every function, on a jump too, where `value` stays large;
 * `otherEnd` is then the far side of the jump.
 */
export function risingRoot(
  f: (x: number) => number,
  {
    low,
    high,
    guess,
    value: closed,
  }: {
    readonly low: number
    readonly high: number
    readonly guess: Guess
    /** Stop when the function is this near to zero. */
    readonly value: number
  },
): Root {
  let from = low
  let to = high
  let x = Math.min(Math.max(guess.at, from), to)
  let value = f(x)
  let evaluations = 1
  // The two points before the present one, newest first.
  let x1 = Number.NaN
  let f1 = Number.NaN
  let x2 = Number.NaN
  let f2 = Number.NaN
  let slowSteps = 0
  for (;;) {
    if (value > 0) to = x
    else from = x
    const smallest = 2 * Number.EPSILON * Math.max(Math.abs(from), Math.abs(to))
    if (Math.abs(value) <= closed || to - from <= smallest || evaluations >= MAX_EVALUATIONS) {
      return { at: x, value, otherEnd: x === to ? from : to, evaluations }
    }
    let next =
      evaluations === 1 ? x - value / guess.slopeAt(x) : interpolated(x, value, x1, f1, x2, f2)
    const isSlow = slowSteps >= 2
    if (!(next > from && next < to) || isSlow) {
      next = from + 0.5 * (to - from)
      slowSteps = 0
      if (next <= from || next >= to) {
        return { at: x, value, otherEnd: x === to ? from : to, evaluations }
      }
    }
    x2 = x1
    f2 = f1
    x1 = x
    f1 = value
    x = next
    value = f(x)
    evaluations += 1
    slowSteps = Math.abs(value) > 0.5 * Math.abs(f1) ? slowSteps + 1 : 0
  }
}

/** The next point by as many of the last three as there are and as differ. */
function interpolated(
  x: number,
  f: number,
  x1: number,
  f1: number,
  x2: number,
  f2: number,
): number {
  if (Number.isNaN(f2) || f2 === f || f2 === f1) return x - (f * (x - x1)) / (f - f1)
  return (
    (x * f1 * f2) / ((f - f1) * (f - f2)) +
    (x1 * f * f2) / ((f1 - f) * (f1 - f2)) +
    (x2 * f * f1) / ((f2 - f) * (f2 - f1))
  )
}
