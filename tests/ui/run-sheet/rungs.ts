/** Rungs with just enough in them to draw; the numbers prove nothing about heat. */
import type { LimitName, Rating } from '#sizing/result.ts'

interface Made {
  readonly passes?: Partial<Record<LimitName, boolean>>
  readonly lifeCycle?: number
  readonly installed?: number
  readonly change?: Partial<Rating>
}

export function madeRung(thicknessM: number, made: Made = {}): Rating {
  const limits = Object.entries(made.passes ?? {}).map(([limit, pass]) => ({
    limit: limit as LimitName,
    pass,
    value: pass ? 50 : 60,
    bound: 55,
    rule: 'at most' as const,
    unit: '°C' as const,
    condition: 'touch' as const,
    what: 'surface',
  }))
  return {
    thicknessM,
    nominalThicknessM: null,
    piecesM: [thicknessM],
    outerDiameterM: 0.1 + 2 * thicknessM,
    heatLossWPerM: 40,
    heatFluxWPerM2: 80,
    heatLossW: 400,
    fittingsLossW: 0,
    yearlyMeanLossW: null,
    yearlyKWh: 3200,
    surfaceTempC: 35,
    convectionWPerM2K: 4,
    radiationWPerM2K: 2,
    interfaceTempsC: [170, 35],
    touchSurfaceC: 45,
    timeToFreezeH: null,
    arrivalTempC: null,
    condensateKgPerS: null,
    limits,
    pass: limits.every(({ pass }) => pass),
    money:
      made.lifeCycle === undefined
        ? null
        : { installed: made.installed ?? 0, energyPerYear: 1, lifeCycle: made.lifeCycle },
    ...made.change,
  }
}
