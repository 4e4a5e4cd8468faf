/**
 * Economic thickness against closed forms: volume-priced lagging, one film coefficient, so that the least life-cycle cost
 * can be worked out by hand. The method reference, section 8, derives the forms.
 */
import { describe, expect, test } from 'vitest'
import { presentValueFactor } from '#money/present-value.ts'
import { type Case, leastM, lifeCycle, perYear, pipeM3, pipeW } from './life-cycle.ts'

describe('plane: d = √(λ·C·Δθ·PVF/b) − λ/h', () => {
  test.each([
    [0.04, 10, 130, 400, 0.06, 8000, 0.08, 15],
    [0.06, 8, 300, 900, 0.03, 6000, 0.12, 10],
    [0.035, 9, 60, 250, 0.1, 4000, 0.05, 20],
  ])('λ %d, h %d, Δθ %d, %d per m³', (lambda, h, dT, perM3, fuel, hours, discount, lifeYears) => {
    const money: Case = { perM3, energy: perYear(fuel, hours), discount, lifeYears }
    const perWatt = (hours / 1000) * fuel * presentValueFactor({ discount, growth: 0, lifeYears })
    const closed = Math.sqrt((lambda * perWatt * dT) / perM3) - lambda / h
    const found = leastM((d) => lifeCycle(money, d, dT / (d / lambda + 1 / h)))
    expect(Math.abs(found - closed)).toBeLessThan(0.01 * closed)
  })
})

describe('pipe: D·ln(D/D0) + 2λ/h = 2√(λ·C·Δθ·PVF/b)', () => {
  // GB 50264, numbers from memory; the method reference works this one out: 0.4643 m closed, 0.4626 m at the exact least.
  test('heat at 40 per GJ, λ 0.045, 8000 h, 230 K, 2000 per m³, 8 years at 10 %, h 11.63, pipe 219 mm', () => {
    const pipe = { D: 0.219, lambda: 0.045, h: 11.63, dT: 230 }
    const money: Case = {
      perM3: 2000,
      energy: perYear(40 * 0.0036, 8000),
      discount: 0.1,
      lifeYears: 8,
    }
    const found = leastM((d) => lifeCycle(money, pipeM3(pipe.D, d), pipeW(pipe, d)))
    expect(pipe.D + 2 * found).toBeCloseTo(0.4626, 3)
    // The closed form drops the factor 1 − 2λ/(hD): its diameter is within 1 %.
    expect(Math.abs(pipe.D + 2 * found - 0.4643)).toBeLessThan(0.01 * 0.4643)
  })
})
