/**
 * Economic thickness against closed forms and printed examples: volume-priced lagging, one film coefficient, so that the
 * least life-cycle cost can be worked out by hand. The method reference, section 8, derives the forms.
 */
import { describe, expect, test } from 'vitest'
import { type EnergyTerms, yearlyEnergyCost } from '#money/energy-cost.ts'
import { installedCost } from '#money/installed-cost.ts'
import { presentValueFactor } from '#money/present-value.ts'

const from = { source: 'test', confidence: 'estimate' } as const
const labour = { ...from, ratePerHour: 0, layerFactors: [1], currency: 'units' }

interface Case {
  readonly perM3: number
  readonly perM?: number
  readonly energy: EnergyTerms
  readonly discount: number
  readonly lifeYears: number
}

function lifeCycle(money: Case, volumeM3: number, heatW: number): number {
  const price = {
    ...from,
    materialId: 'm',
    perM3: money.perM3,
    perM2: 0,
    perM: money.perM ?? 0,
    labourHoursPerM: 0,
    labourHoursPerM2: 0,
    wasteFraction: 0,
  }
  const installed = installedCost([{ price, volumeM3, outerAreaM2: 0, pieces: 1 }], null, labour)
  const factor = presentValueFactor({ ...money, growth: 0 })
  return installed + yearlyEnergyCost(heatW, money.energy) * factor
}

/** The thickness of least cost, on a ladder of hundredths of a millimetre [m]. */
function leastM(cost: (thicknessM: number) => number): number {
  let best = 1e-5
  for (let step = 1; step <= 40_000; step += 1) {
    if (cost(step * 1e-5) < cost(best)) best = step * 1e-5
  }
  return best
}

/** Heat flow through a lagged pipe with one film coefficient [W/m]. */
function pipeW(
  pipe: { D: number; lambda: number; h: number; dT: number },
  thicknessM: number,
): number {
  const De = pipe.D + 2 * thicknessM
  return (Math.PI * pipe.dT) / (Math.log(De / pipe.D) / (2 * pipe.lambda) + 1 / (pipe.h * De))
}
const pipeM3 = (D: number, thicknessM: number): number =>
  (Math.PI / 4) * ((D + 2 * thicknessM) ** 2 - D ** 2)

const perYear = (fuelPricePerKWh: number, hoursPerYear: number): EnergyTerms => ({
  fuelPricePerKWh,
  efficiency: 1,
  cop: 1,
  hoursPerYear,
})

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

describe('printed examples', () => {
  // Murphy and McKay, Energy Management, example 3.15, as computed by its companion: cost 150 000/x + 65x + 3600 over
  // the thickness x in mm; 48.3 mm printed, 48.04 recomputed.
  test('a cost of 150 000/x + 65x + 3600 is least at 48.3 mm', () => {
    const money: Case = {
      perM3: 65_000,
      perM: 3600,
      energy: perYear(1, 1000),
      discount: 0,
      lifeYears: 1,
    }
    const found = leastM((d) => lifeCycle(money, d, 150_000 / (d * 1000)))
    expect(found * 1000).toBeCloseTo(48.04, 1)
    expect(Math.abs(found * 1000 - 48.3)).toBeLessThan(0.3)
  })

  // Dutta, Heat Transfer, example 3.14, as computed by its companion: steam main of 168 mm, 172/20 °C, k 0.031 and
  // h 10.32 in kcal, 7200 h, 5 years at 18 %, steam 700 per tonne of 487 kcal/kg, 15 750 per m³; 71 mm printed.
  test('a steam main is cheapest at 71 mm', () => {
    const kcalPerHour = 1.163
    const pipe = { D: 0.168, lambda: 0.031 * kcalPerHour, h: 10.32 * kcalPerHour, dT: 152 }
    const money: Case = {
      perM3: 15_750,
      energy: perYear(700 / (1000 * 487 * (kcalPerHour / 1000)), 7200),
      discount: 0.18,
      lifeYears: 5,
    }
    const found = leastM((d) => lifeCycle(money, pipeM3(pipe.D, d), pipeW(pipe, d)))
    expect(Math.abs(found * 1000 - 71)).toBeLessThan(0.5)
  })
})
