/**
 * Present value of a yearly payment that grows: the sum over years k = 1…n of ((1 + growth)/(1 + discount))^k.
 *
 * Today's price, payments at year end; discount and growth per year as fractions, both nominal or both real; whole
 * years ≥ 0. Source: common financial mathematics; equals [1 − ((1+e)/(1+r))^n]/(r − e)·(1+e), and n for r = e.
 */
export function presentValueFactor(terms: {
  readonly discount: number
  readonly growth: number
  readonly lifeYears: number
}): number {
  const { discount, growth, lifeYears } = terms
  const ratio = (1 + growth) / (1 + discount)
  const below = 1 - ratio
  // Near ratio 1 the closed form loses its digits; the sum does not.
  if (Math.abs(below) < 1e-6) return lifeYears * ratio ** ((lifeYears + 1) / 2)
  return (ratio * (1 - ratio ** lifeYears)) / below
}

/** Share of a loan or an investment paid each year over its life: r(1+r)^n/((1+r)^n − 1); 1/n without interest. */
export function annuityFactor(terms: {
  readonly discount: number
  readonly lifeYears: number
}): number {
  return 1 / presentValueFactor({ ...terms, growth: 0 })
}
