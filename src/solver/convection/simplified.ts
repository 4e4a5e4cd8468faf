/**
 * Surface coefficients of convection by short formulas in the ISO 12241 form [W/(m²·K)]: air near room temperature and
 * one bar, no properties needed. From memory; to be held against a bought copy of the standard.
 *
 * Each formula has a laminar and a turbulent branch. As remembered, most do not meet where the one gives way to the
 * other, so that a result beside that place may step by the tenths that `branchUsed` tells.
 */
import { type Correlation, correlation, type Pedigree } from '../correlation.ts'

export interface FreeOnPipe {
  /** |surface − air| [K]. */
  readonly differenceK: number
  /** Outer diameter of the horizontal pipe [m]. */
  readonly diameterM: number
}

export interface FreeOnWall {
  /** |surface − air| [K]. */
  readonly differenceK: number
  /** Height of the wall or of the vertical pipe [m]. */
  readonly heightM: number
}

export interface WindOnWall {
  readonly windMPerS: number
  /** Length along the wind [m]. */
  readonly lengthM: number
}

export interface WindOnPipe {
  readonly windMPerS: number
  /** Outer diameter [m]; the pipe may lie or stand. */
  readonly diameterM: number
}

/** Where the branches of both still-air formulas change over: length³ · difference [m³·K]. */
export const FREE_SWITCH_M3K = 10

/** Where the branches on a wall in wind change over: wind · length [m²/s]. */
export const WIND_ON_WALL_SWITCH_M2_PER_S = 8

/**
 * Where the branches on a pipe in wind meet: wind · diameter [m²/s].
 *
 * 8.55e-3 is remembered as the standard's value, but there the coefficient would fall to 0.41 of itself; 8.55e-2 would
 * leave a step of 5 %. Until the text can be read the laminar branch serves as far as it meets the turbulent one.
 */
export const WIND_ON_PIPE_SWITCH_M2_PER_S = 0.07568026

interface Branches<Inputs> {
  /** What decides between the branches, with its unit. */
  readonly number: string
  readonly numberOf: (inputs: Inputs) => number
  /** Inputs exactly at the change; the step there is the same for all lengths. */
  readonly change: Inputs
  readonly laminar: (inputs: Inputs) => number
  readonly turbulent: (inputs: Inputs) => number
}

export type TwoBranchFormula<Inputs> = Correlation<Inputs> & {
  readonly branches: Branches<Inputs>
}

export interface BranchUsed {
  readonly branch: 'laminar' | 'turbulent'
  /** What decides between the branches, its value here and at the change. */
  readonly number: string
  readonly value: number
  readonly switchValue: number
  /** Turbulent over laminar coefficient at the change, less one. */
  readonly jumpFraction: number
  /** The change is near, and the formula steps there. */
  readonly besideJump: boolean
}

/** So near to the change that a small error of the inputs takes the other branch. */
const BESIDE_FRACTION = 0.2

/** A smaller step than this is lost in the accuracy of any of the formulas. */
const STEP_WORTH_TELLING_FRACTION = 0.01

/** Which branch of a formula serves these inputs, and how far the formula steps where it changes over. */
export function branchUsed<Inputs>(
  { branches }: TwoBranchFormula<Inputs>,
  inputs: Inputs,
): BranchUsed {
  const { number, numberOf, change, laminar, turbulent } = branches
  const value = numberOf(inputs)
  const switchValue = numberOf(change)
  const jumpFraction = turbulent(change) / laminar(change) - 1
  return {
    branch: value <= switchValue ? 'laminar' : 'turbulent',
    number,
    value,
    switchValue,
    jumpFraction,
    besideJump:
      Math.abs(value / switchValue - 1) <= BESIDE_FRACTION &&
      Math.abs(jumpFraction) >= STEP_WORTH_TELLING_FRACTION,
  }
}

function twoBranches<Inputs extends object>(
  pedigree: Pedigree<Inputs>,
  branches: Branches<Inputs>,
): TwoBranchFormula<Inputs> {
  const { numberOf, change, laminar, turbulent } = branches
  const switchValue = numberOf(change)
  const formula = correlation<Inputs>(pedigree, (inputs) =>
    numberOf(inputs) <= switchValue ? laminar(inputs) : turbulent(inputs),
  )
  return Object.assign(formula, { branches })
}

/*
 * No limits of range are remembered. Those given bound what the fixed constants can carry: air within some tens of
 * kelvin of room temperature, and winds that a design uses.
 */

/** Horizontal pipe in still air. */
export const simplifiedFreePipe = twoBranches<FreeOnPipe>(
  {
    name: 'ISO 12241 form, horizontal pipe in still air',
    source: 'iso12241form',
    equation: 'h = 1.25 (Δθ/D)^(1/4) to D³Δθ 10 m³K; 1.21 Δθ^(1/3) above',
    valid: { differenceK: [0, 100] },
  },
  {
    number: 'D³Δθ in m³K',
    numberOf: ({ differenceK, diameterM }) => diameterM ** 3 * differenceK,
    change: { differenceK: FREE_SWITCH_M3K, diameterM: 1 },
    laminar: ({ differenceK, diameterM }) => 1.25 * (differenceK / diameterM) ** 0.25,
    turbulent: ({ differenceK }) => 1.21 * Math.cbrt(differenceK),
  },
)

/** Vertical wall or vertical pipe in still air. Turbulent, it lies 15 to 40 % above the detailed formula for heights of 1 to 10 m. */
export const simplifiedFreeWall = twoBranches<FreeOnWall>(
  {
    name: 'ISO 12241 form, vertical wall or pipe in still air',
    source: 'iso12241form',
    equation: 'h = 1.32 (Δθ/H)^(1/4) to H³Δθ 10 m³K; 1.74 Δθ^(1/3) above',
    valid: { differenceK: [0, 100] },
  },
  {
    number: 'H³Δθ in m³K',
    numberOf: ({ differenceK, heightM }) => heightM ** 3 * differenceK,
    change: { differenceK: FREE_SWITCH_M3K, heightM: 1 },
    laminar: ({ differenceK, heightM }) => 1.32 * (differenceK / heightM) ** 0.25,
    turbulent: ({ differenceK }) => 1.74 * Math.cbrt(differenceK),
  },
)

/** Plane wall with the wind along it. */
export const simplifiedWindOnWall = twoBranches<WindOnWall>(
  {
    name: 'ISO 12241 form, plane wall in wind',
    source: 'iso12241form',
    equation: 'h = 3.96 (v/H)^(1/2) to vH 8 m²/s; 5.76 (v⁴/H)^(1/5) above',
    valid: { windMPerS: [0, 30] },
  },
  {
    number: 'vH in m²/s',
    numberOf: ({ windMPerS, lengthM }) => windMPerS * lengthM,
    change: { windMPerS: WIND_ON_WALL_SWITCH_M2_PER_S, lengthM: 1 },
    laminar: ({ windMPerS, lengthM }) => 3.96 * Math.sqrt(windMPerS / lengthM),
    turbulent: ({ windMPerS, lengthM }) => 5.76 * (windMPerS ** 4 / lengthM) ** 0.2,
  },
)

/**
 * Pipe in wind, lying or standing.
 *
 * Far above the detailed formula: 1.7 times at 0.1 m and 5 m/s, 3 times at 1 m and 10 m/s. That changes the loss of an
 * insulated pipe little, but makes its surface look cooler than it is.
 */
export const simplifiedWindOnPipe = twoBranches<WindOnPipe>(
  {
    name: 'ISO 12241 form, pipe in wind',
    source: 'iso12241form',
    equation: 'h = 8.1e-3/D + 3.14 (v/D)^(1/2) to vD 0.0757 m²/s; 8.9 v^0.9 / D^0.1 above',
    valid: { windMPerS: [0, 30] },
  },
  {
    number: 'vD in m²/s',
    numberOf: ({ windMPerS, diameterM }) => windMPerS * diameterM,
    change: { windMPerS: WIND_ON_PIPE_SWITCH_M2_PER_S, diameterM: 1 },
    laminar: ({ windMPerS, diameterM }) =>
      8.1e-3 / diameterM + 3.14 * Math.sqrt(windMPerS / diameterM),
    turbulent: ({ windMPerS, diameterM }) => (8.9 * windMPerS ** 0.9) / diameterM ** 0.1,
  },
)
