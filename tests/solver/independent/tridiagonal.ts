/** Elimination of a tridiagonal system; the right-hand side is overwritten with the answer. */
export interface Tridiagonal {
  readonly below: Float64Array
  readonly main: Float64Array
  readonly above: Float64Array
  readonly right: Float64Array
}

export function emptyTridiagonal(size: number): Tridiagonal {
  return {
    below: new Float64Array(size),
    main: new Float64Array(size),
    above: new Float64Array(size),
    right: new Float64Array(size),
  }
}

/** Row i reads below[i]·x[i−1] + main[i]·x[i] + above[i]·x[i+1] = right[i]. */
export function eliminate({ below, main, above, right }: Tridiagonal): Float64Array {
  const size = main.length
  for (let i = 1; i < size; i += 1) {
    const factor = at(below, i) / at(main, i - 1)
    main[i] = at(main, i) - factor * at(above, i - 1)
    right[i] = at(right, i) - factor * at(right, i - 1)
  }
  for (let i = size - 1; i >= 0; i -= 1) {
    const beyond = i + 1 < size ? at(above, i) * at(right, i + 1) : 0
    right[i] = (at(right, i) - beyond) / at(main, i)
  }
  return right
}

export const at = (values: Float64Array, index: number): number => values[index] as number
