/** The formulas are remembered, not read: they are worked by hand, and held against short forms that are in print. */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import {
  branchUsed,
  FREE_SWITCH_M3K,
  simplifiedFreePipe,
  simplifiedFreeWall,
  simplifiedWindOnPipe,
  simplifiedWindOnWall,
  WIND_ON_PIPE_SWITCH_M2_PER_S,
  WIND_ON_WALL_SWITCH_M2_PER_S,
} from '#solver/convection/simplified.ts'
import { spread } from '../arbitraries.ts'

const still = (differenceK: number, lengthM: number) => ({
  differenceK,
  diameterM: lengthM,
  heightM: lengthM,
})
const windy = (windMPerS: number, lengthM: number) => ({ windMPerS, diameterM: lengthM, lengthM })

describe('each branch, worked by hand', () => {
  test.each([
    // (16/1)^(1/4) = 2 with D³Δθ = 0.016 and 0.0001; 27^(1/3) = 3; 64^(1/3) = 4.
    ['pipe, laminar', simplifiedFreePipe(still(1.6, 0.1)), 2.5],
    ['pipe, turbulent', simplifiedFreePipe(still(27, 1)), 3.63],
    ['wall, laminar', simplifiedFreeWall(still(1.6, 0.1)), 2.64],
    ['wall, turbulent', simplifiedFreeWall(still(64, 2)), 6.96],
    // (4/1)^(1/2) = 2; (32⁴/1)^(1/5) = 16.
    ['wall in wind, laminar', simplifiedWindOnWall(windy(4, 1)), 7.92],
    ['wall in wind, turbulent', simplifiedWindOnWall(windy(32, 1)), 92.16],
    // 8.1e-3/0.01 + 3.14 · (4/0.01)^(1/2) = 0.81 + 62.8; 8.9 · 1 · 1.
    ['pipe in wind, laminar', simplifiedWindOnPipe(windy(4, 0.01)), 63.61],
    ['pipe in wind, turbulent', simplifiedWindOnPipe(windy(1, 1)), 8.9],
  ])('%s', (_, found, expected) => {
    expect(found).toBeCloseTo(expected, 9)
  })

  test('the change itself still belongs to the laminar branch', () => {
    expect(simplifiedFreePipe(still(10, 1))).toBeCloseTo(1.25 * 10 ** 0.25, 12)
    expect(branchUsed(simplifiedFreePipe, still(10, 1)).branch).toBe('laminar')
    expect(simplifiedWindOnWall(windy(8, 1))).toBeCloseTo(3.96 * 8 ** 0.5, 12)
  })

  test('without difference or wind nothing moves, and a pipe still conducts', () => {
    expect(simplifiedFreePipe(still(0, 0.1))).toBe(0)
    expect(simplifiedFreeWall(still(0, 0.1))).toBe(0)
    expect(simplifiedWindOnWall(windy(0, 0.1))).toBe(0)
    expect(simplifiedWindOnPipe(windy(0, 0.1))).toBeCloseTo(0.081, 12)
  })
})

describe('beside short forms for air in print', () => {
  const ashrae = (K: number, lengthM: number) => ({
    laminarWall: 1.33 * (K / lengthM) ** 0.25,
    turbulentPipe: 1.23 * K ** (1 / 3),
  })

  // ASHRAE Handbook Fundamentals 2021, ch. 4, simplified equations for air at 21 °C; Holman gives 1.32 for the pipe.
  test('still air agrees to some per cent, but for turbulent walls', () => {
    const wall = simplifiedFreeWall(still(20, 0.5)) / ashrae(20, 0.5).laminarWall
    expect(Math.abs(wall - 1)).toBeLessThan(0.02)
    const wide = simplifiedFreePipe(still(20, 1)) / ashrae(20, 1).turbulentPipe
    expect(Math.abs(wide - 1)).toBeLessThan(0.02)
    const narrow = simplifiedFreePipe(still(20, 0.1)) / (1.32 * (20 / 0.1) ** 0.25)
    expect(Math.abs(narrow - 1)).toBeLessThan(0.06)
  })

  // 1.24 Δt^(1/3) in Holman, 1.26 in ASHRAE.
  test('the turbulent wall lies some four tenths above', () => {
    expect(simplifiedFreeWall(still(20, 3)) / (1.26 * 20 ** (1 / 3))).toBeCloseTo(1.38, 2)
  })
})

const formulas = [
  {
    name: 'pipe in still air',
    at: (value: number, lengthM: number) =>
      simplifiedFreePipe(still(value / lengthM ** 3, lengthM)),
    used: (value: number, lengthM: number) =>
      branchUsed(simplifiedFreePipe, still(value / lengthM ** 3, lengthM)),
    switchValue: FREE_SWITCH_M3K,
    // 1.21/1.25 · 10^(1/12)
    jumpFraction: 0.968 * 10 ** (1 / 12) - 1,
  },
  {
    name: 'wall in still air',
    at: (value: number, lengthM: number) =>
      simplifiedFreeWall(still(value / lengthM ** 3, lengthM)),
    used: (value: number, lengthM: number) =>
      branchUsed(simplifiedFreeWall, still(value / lengthM ** 3, lengthM)),
    switchValue: FREE_SWITCH_M3K,
    jumpFraction: (1.74 / 1.32) * 10 ** (1 / 12) - 1,
  },
  {
    name: 'wall in wind',
    at: (value: number, lengthM: number) => simplifiedWindOnWall(windy(value / lengthM, lengthM)),
    used: (value: number, lengthM: number) =>
      branchUsed(simplifiedWindOnWall, windy(value / lengthM, lengthM)),
    switchValue: WIND_ON_WALL_SWITCH_M2_PER_S,
    jumpFraction: (5.76 / 3.96) * 8 ** 0.3 - 1,
  },
  {
    name: 'pipe in wind',
    at: (value: number, lengthM: number) => simplifiedWindOnPipe(windy(value / lengthM, lengthM)),
    used: (value: number, lengthM: number) =>
      branchUsed(simplifiedWindOnPipe, windy(value / lengthM, lengthM)),
    switchValue: WIND_ON_PIPE_SWITCH_M2_PER_S,
    jumpFraction: 0,
  },
]

describe.each(formulas)('$name', ({ at, used, switchValue, jumpFraction }) => {
  test('steps where it changes over by what it says, whatever the length', () => {
    fc.assert(
      fc.property(spread(0.01, 20), (lengthM) => {
        const step =
          at(switchValue * (1 + 1e-9), lengthM) / at(switchValue * (1 - 1e-9), lengthM) - 1
        expect(step).toBeCloseTo(jumpFraction, 6)
        expect(used(switchValue, lengthM).jumpFraction).toBeCloseTo(jumpFraction, 6)
      }),
    )
  })

  test('names the branch used and the number that decided', () => {
    expect(used(switchValue / 2, 0.3)).toMatchObject({ branch: 'laminar', besideJump: false })
    expect(used(switchValue * 2, 0.3)).toMatchObject({ branch: 'turbulent', besideJump: false })
    expect(used(switchValue / 2, 0.3).value).toBeCloseTo(switchValue / 2, 12)
    expect(used(1, 1).switchValue).toBeCloseTo(switchValue, 12)
  })

  test('says that the change is near within a fifth of it, where it steps at all', () => {
    const steps = Math.abs(jumpFraction) > 0.01
    expect(used(switchValue * 0.801, 0.3).besideJump).toBe(steps)
    expect(used(switchValue * 1.199, 0.3).besideJump).toBe(steps)
    expect(used(switchValue * 0.799, 0.3).besideJump).toBe(false)
    expect(used(switchValue * 1.201, 0.3).besideJump).toBe(false)
  })

  test('never falls with more flow', () => {
    fc.assert(
      fc.property(spread(1e-4, 1e4), spread(1, 10), spread(0.01, 20), (value, factor, lengthM) => {
        expect(at(value * factor, lengthM)).toBeGreaterThanOrEqual(at(value, lengthM) * (1 - 1e-8))
      }),
    )
  })
})

test('the steps in per cent, as the notes tell them', () => {
  const perCent = formulas
    .filter(({ used, switchValue }) => used(switchValue, 1).besideJump)
    .map(({ used }) => Math.round(used(1, 1).jumpFraction * 100))
  expect(perCent).toEqual([17, 60, 171])
})
