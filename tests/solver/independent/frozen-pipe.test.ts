/** Cooling and freezing times beside the same pipe followed in time. */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import {
  coolingTimeS,
  freezingTimeOfThinIceS,
  freezingTimeS,
  ICE_KG_PER_M3,
  ICE_LATENT_J_PER_KG,
  ICE_W_PER_M_K,
} from '#solver/frost.ts'
import { spread, within } from '../arbitraries.ts'
import { cooledAfterS, frozenAfterS, type LaggedPipe } from './frozen-pipe.ts'

/** Closed form of what the rings are made of: Fourier's law and the film. */
const resistanceMKPerW = (pipe: LaggedPipe): number =>
  Math.log(pipe.outerRadiusM / pipe.innerRadiusM) / (2 * Math.PI * pipe.conductivityWPerMK) +
  1 / (2 * Math.PI * pipe.outerRadiusM * pipe.filmWPerM2K)

const pipes = fc
  .record({
    boreM: spread(0.01, 0.3),
    wallM: spread(0.001, 0.01),
    thicknessM: spread(0.005, 0.15),
    conductivityWPerMK: spread(0.02, 0.08),
    filmWPerM2K: spread(2, 40),
    airC: within(-40, -2),
  })
  .map(({ boreM, wallM, thicknessM, ...rest }) => ({
    ...rest,
    // Water, and steel around it.
    contentJPerMK:
      (Math.PI / 4) * boreM ** 2 * 4.19e6 + Math.PI * (boreM + wallM) * wallM * 7850 * 460,
    innerRadiusM: boreM / 2 + wallM,
    outerRadiusM: boreM / 2 + wallM + thicknessM,
  }))

describe('a content that cools through its insulation', () => {
  test('without heat in the insulation takes the time of the formula, to 3e-4', () => {
    fc.assert(
      fc.property(pipes, within(2, 90), within(0, 1), (given, startC, endShare) => {
        const pipe = { ...given, insulationJPerM3K: 0 }
        const endC = endShare * 0.9 * startC
        const formulaS = coolingTimeS({
          capacityJPerMK: pipe.contentJPerMK,
          resistanceMKPerW: resistanceMKPerW(pipe),
          startC,
          endC,
          airC: pipe.airC,
        }) as number
        // 200 steps, each of second order: 200⁻²/12 of the cube of the logarithm at most; 60 rings: (ln ratio/60)²/12.
        const followedS = cooledAfterS(pipe, startC, endC, { rings: 60, stepS: formulaS / 200 })
        expect(Math.abs(followedS / formulaS - 1)).toBeLessThan(3e-4)
      }),
      { numRuns: 60 },
    )
  })

  test('with the heat of the insulation takes longer, by at most the share of that heat in the content’s', () => {
    fc.assert(
      fc.property(pipes, within(2, 30), spread(1e4, 2e5), (given, startC, insulationJPerM3K) => {
        const pipe = { ...given, insulationJPerM3K }
        const formulaS = coolingTimeS({
          capacityJPerMK: pipe.contentJPerMK,
          resistanceMKPerW: resistanceMKPerW(pipe),
          startC,
          endC: 0,
          airC: pipe.airC,
        }) as number
        const followedS = cooledAfterS(pipe, startC, 0, { stepS: formulaS / 400 })
        const ringsJPerMK =
          Math.PI * (pipe.outerRadiusM ** 2 - pipe.innerRadiusM ** 2) * insulationJPerM3K
        const ratio = followedS / formulaS
        // At first the insulation is on the mean cooler than the content, so it gives up less than its heat would be.
        expect(ratio).toBeGreaterThan(1 - 1e-3)
        expect(ratio).toBeLessThan(1 + ringsJPerMK / pipe.contentJPerMK + 1e-3)
      }),
      { numRuns: 40 },
    )
  })
})

describe('water that freezes from the wall inwards', () => {
  const freezing = fc.record({
    boreM: spread(0.01, 0.2),
    // From hardly any insulation, where the ice itself resists, to thick lagging.
    resistanceMKPerW: spread(0.02, 8),
    airC: within(-30, -2),
  })
  const ice = {
    iceKgPerM3: ICE_KG_PER_M3,
    latentJPerKg: ICE_LATENT_J_PER_KG,
    iceWPerMK: ICE_W_PER_M_K,
  }

  test('takes the time of the formula, and longer only by the heat of the ice below 0 °C', () => {
    fc.assert(
      fc.property(freezing, within(0.05, 0.95), (pipe, iceFraction) => {
        const formulaS = freezingTimeS({ ...pipe, iceFraction }) as number
        const followedS = frozenAfterS({ ...pipe, ...ice, iceJPerKgK: 2100 }, iceFraction)
        // Through the ice the last heat goes from 0 °C to the wall: no ice is colder than the wall at the end.
        const iceMKPerW = -Math.log(1 - iceFraction) / (4 * Math.PI * ICE_W_PER_M_K)
        const wallC = (pipe.airC * iceMKPerW) / (iceMKPerW + pipe.resistanceMKPerW)
        const stefan = (2100 * -wallC) / ICE_LATENT_J_PER_KG
        expect(followedS / formulaS).toBeGreaterThan(1 - 2e-3)
        expect(followedS / formulaS).toBeLessThan(1 + stefan + 2e-3)
      }),
      { numRuns: 20 },
    )
  })

  test('takes the time of the formula where ice holds hardly any heat, to 3e-3', () => {
    const pipe = { boreM: 0.03, resistanceMKPerW: 0.05, airC: -20 }
    for (const iceFraction of [0.1, 0.25, 0.6, 0.9, 1]) {
      const formulaS = freezingTimeS({ ...pipe, iceFraction }) as number
      const followedS = frozenAfterS({ ...pipe, ...ice, iceJPerKgK: 50 }, iceFraction)
      // Fifteen rings: a front is known to a small part of one.
      expect(Math.abs(followedS / formulaS - 1)).toBeLessThan(3e-3)
    }
  })

  test('is later than the form without the ice’s own resistance says, which errs on the safe side', () => {
    const pipe = { boreM: 0.05, resistanceMKPerW: 0.1, airC: -10, iceFraction: 0.8 }
    const followedS = frozenAfterS({ ...pipe, ...ice, iceJPerKgK: 2100 }, 0.8)
    expect(followedS / (freezingTimeOfThinIceS(pipe) as number)).toBeGreaterThan(1.1)
  })
})
