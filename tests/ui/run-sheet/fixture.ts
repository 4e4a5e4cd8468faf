/**
 * Results to lay out the run sheet with. The numbers are plausible and made by one short rule, so that the drawings
 * have something to show; they prove nothing about heat.
 */
import type { RunValues } from '#model/fields.ts'
import type { LimitResult, Rating, RunMoney, RunResult } from '#sizing/result.ts'

const rungsMm = [20, 25, 30, 40, 50, 60, 80, 100]

interface Made {
  readonly mediumC?: number
  readonly airC?: number
  readonly outerDiameterM?: number | null
  readonly isFlat?: boolean
  readonly hasMoney?: boolean
  /** Loss allowed [W/m]; touch is always judged at 58 °C. */
  readonly maxLossWPerM?: number
}

export function madeRung(thicknessMm: number, made: Made = {}): Rating {
  const { mediumC = 170, airC = 25, isFlat = false, hasMoney = true } = made
  const bareM = made.outerDiameterM === undefined ? 0.0889 : made.outerDiameterM
  const thicknessM = thicknessMm / 1000
  const radiusM = bareM === null ? 0.3 : bareM / 2
  const outerM = radiusM + thicknessM
  const resistance = Math.log(outerM / radiusM) / (2 * Math.PI * 0.045) + 1 / (2 * Math.PI * outerM * 8)
  const lossWPerM = (mediumC - airC) / resistance
  const surfaceTempC = airC + lossWPerM / (2 * Math.PI * outerM * 8)
  const touchSurfaceC = surfaceTempC + 13
  const limits: LimitResult[] = [
    { limit: 'touch', pass: touchSurfaceC < 58, value: touchSurfaceC, bound: 58, unit: '°C', condition: 'touch', what: 'jacket, 5 s' },
    ...(made.maxLossWPerM === undefined
      ? []
      : [{ limit: 'loss', pass: lossWPerM <= made.maxLossWPerM, value: lossWPerM, bound: made.maxLossWPerM, unit: 'W/m', condition: 'loss', what: 'per metre' } as const]),
    { limit: 'service', pass: true, value: mediumC, bound: 650, unit: '°C', condition: 'loss', what: 'stone wool, inside' },
  ]
  const installed = 22 + 900 * thicknessM
  return {
    thicknessM,
    nominalThicknessM: null,
    piecesM: thicknessMm === 0 ? [] : thicknessMm > 50 ? [0.04, thicknessM - 0.04] : [thicknessM],
    outerDiameterM: bareM === null ? null : 2 * outerM,
    heatLossWPerM: isFlat ? null : lossWPerM,
    heatFluxWPerM2: lossWPerM / (2 * Math.PI * outerM),
    heatLossW: lossWPerM * 41.5,
    yearlyKWh: lossWPerM * 41.5 * 8,
    surfaceTempC,
    convectionWPerM2K: 4.6,
    radiationWPerM2K: 1.4,
    interfaceTempsC: thicknessMm === 0 ? [surfaceTempC] : [mediumC, surfaceTempC],
    touchSurfaceC,
    limits,
    pass: limits.every(({ pass }) => pass),
    money: hasMoney ? { installed, energyPerYear: Math.abs(lossWPerM) * 0.5, lifeCycle: installed + Math.abs(lossWPerM) * 1.8 } : null,
  }
}

export function madeResult(made: Made = {}, change: Partial<RunResult> = {}): RunResult {
  const ladder = rungsMm.map((thicknessMm) => madeRung(thicknessMm, made))
  const chosen = ladder.find(({ thicknessM }) => thicknessM === 0.05) ?? null
  return {
    tag: 'ST-104',
    bare: madeRung(0, made),
    chosen,
    governing: 'money',
    reason:
      'Cost decides. Touch would allow 40 mm (52.7 °C against 58 °C; 30 mm reaches 58.2 °C). 50 mm is the cheapest to own over 15 years; 40 mm and 60 mm cost within 2 % of it.',
    limits: chosen?.limits ?? [],
    ladder,
    money: made.hasMoney === false ? null : madeMoney,
    notes: [
      { code: 'touch-air-assumed', text: 'No air temperature was given for the hottest day; the yearly mean was used.' },
      { code: 'finish-aged', text: 'The aged emissivity of the jacket, 0.20, is an estimate.' },
    ],
    ...change,
  }
}

const madeMoney: RunMoney = {
  currency: 'GBP',
  per: 'm',
  hoursPerYear: 8000,
  fuel: 'natural-gas',
  fuelPricePerKWh: 0.06,
  efficiency: 0.82,
  discount: 0.05,
  growth: 0.02,
  lifeYears: 15,
  presentValueFactor: 11.9,
  bareEnergyPerYear: 221,
  installedTotal: 2780,
  savingPerYearTotal: 8010,
  paybackYears: 0.35,
  co2KgPerYear: 3600,
  co2SavedKgPerYear: 24300,
  cheapestThicknessM: 0.05,
  withinTwoPercentM: [0.04, 0.06],
}

export const steamValues: RunValues = {
  tag: 'ST-104',
  description: 'Branch to pasteuriser',
  size: 'DN 80',
  shape: 'pipe',
  lengthM: 41.5,
  service: 'Steam main',
  place: 'Process hall',
  medium: 'steam',
  mediumC: 170,
  airC: 25,
  material: 'stone_wool_pipe_section',
  finish: 'al_plain',
}
