/** Whether vapour is kept out of cold work: a barrier is there, and on the warm side. */
import type { Finish } from '#catalogue/types.ts'
import type { BuildUpLayer, LayerMaterial } from '#sizing/problem.ts'
import type { ResolvedBuildUp } from './build-up.ts'
import type { Conditions } from './conditions.ts'
import { type Findings, listed, plain } from './findings.ts'

/** Vapour permeability of still air [kg/(m·s·Pa)]. Source: EN ISO 12572, 23 °C, from memory. */
const AIR_PERMEABILITY = 1.95e-10

/**
 * Highest permeance of the barrier of cold work by the temperature of the plant, for air of 10 °C [°C, kg/(m²·s·Pa)].
 * Source: TIASA Thermal Insulation Handbook, guide table, printed in g/(s·MN).
 */
const PERMEANCE_GUIDE = [
  [0, 0.01e-9],
  [-5, 0.004e-9],
  [-10, 0.002e-9],
  [-15, 0.0015e-9],
] as const
/** Of the guide from −20 to −40 °C. */
const LEAST_PERMEANCE = 0.001e-9

/** Layers up to this let vapour pass freely [m of still air]. Source: DIN 4108-3, open to diffusion, from memory. */
const OPEN_UP_TO_M = 0.5

/** The permeance that the guide allows a barrier [kg/(m²·s·Pa)]: between its temperatures that of the colder one. */
export function barrierPermeance(plantC: number): number {
  const row = PERMEANCE_GUIDE.find(([downToC]) => plantC >= downToC)
  return row?.[1] ?? LEAST_PERMEANCE
}

/** Still air that holds vapour back as well as a permeance does, s_d [m]. */
export const stillAirM = (permeance: number): number => AIR_PERMEABILITY / permeance

/** `dewPointC`: of the damp air where its humidity is known, else null and any work below that air counts as cold. */
export function noteVapour(
  { layers, steps }: ResolvedBuildUp,
  finish: Finish | null,
  { damp }: Conditions,
  dewPointC: number | null,
  findings: Findings,
): void {
  const { mediumC } = damp
  if (layers.length === 0 || mediumC >= damp.around.airC) return
  if (dewPointC !== null && mediumC >= dewPointC) return
  const tight = finish?.vapourTight ?? 'no'
  if (tight === 'yes') return
  const bands = inBands(layers, {
    thinnestM: Math.min(...steps.map(({ thicknessM }) => thicknessM)),
    thickestM: Math.max(...steps.map(({ thicknessM }) => thicknessM)),
  })
  const barrier = tight === 'if sealed' ? (finish?.name ?? null) : null
  const cold = { mediumC, barrier }
  noteOpen(bands, cold, findings)
  noteWrongSide(bands, cold, findings)
}

/** Neighbours of one material, and what vapour meets in them at the thinnest and thickest they can be, s_d [m]. */
interface Band {
  readonly material: LayerMaterial
  readonly sized: boolean
  readonly leastM: number | null
  readonly mostM: number | null
}

function inBands(
  layers: readonly BuildUpLayer[],
  sizedM: { readonly thinnestM: number; readonly thickestM: number },
): Band[] {
  const bands: Band[] = []
  for (const { material, thicknessM } of layers) {
    const factor = material.vapourResistance
    const leastM = factor === null ? null : factor * (thicknessM ?? sizedM.thinnestM)
    const mostM = factor === null ? null : factor * (thicknessM ?? sizedM.thickestM)
    const sized = thicknessM === null
    const inner = bands.at(-1)
    if (inner?.material.name === material.name) {
      bands[bands.length - 1] = {
        material,
        sized: inner.sized || sized,
        leastM: sum(inner.leastM, leastM),
        mostM: sum(inner.mostM, mostM),
      }
    } else bands.push({ material, sized, leastM, mostM })
  }
  return bands
}

const sum = (a: number | null, b: number | null): number | null =>
  a === null || b === null ? null : a + b

interface ColdWork {
  readonly mediumC: number
  /** A finish that is tight once its laps are sealed. */
  readonly barrier: string | null
}

function noteOpen(bands: readonly Band[], { mediumC, barrier }: ColdWork, findings: Findings) {
  const permeance = barrierPermeance(mediumC)
  const neededM = stillAirM(permeance)
  const knownM = bands.reduce((totalM, { leastM }) => totalM + (leastM ?? 0), 0)
  if (knownM >= neededM) return
  const guide = `at most ${plain(permeance * 1e9, 4)} g/(s·MN), as much as ${plain(neededM, 0)} m of still air (handbook guide, TIASA)`
  const cure =
    barrier === null
      ? `put a vapour barrier of ${guide} on its outside`
      : `seal every lap and end of the finish (${barrier}), which is tight only then: ${guide}`
  const unknown = bands.filter(({ leastM }) => leastM === null)
  if (unknown.length > 0) {
    findings.note(
      'vapour-unknown',
      `Cold work at ${plain(mediumC)} °C: how much vapour ${named(unknown)} ${lets(unknown)} through is not held. Unless it is closed to vapour, ${cure}.`,
    )
    return
  }
  const fixedM = bands.reduce((totalM, band) => totalM + (band.sized ? 0 : (band.leastM ?? 0)), 0)
  const sized = bands.find((band) => band.sized)
  const factor = sized?.material.vapourResistance ?? null
  if (sized && factor !== null && fixedM + (sized.mostM ?? 0) >= neededM) {
    const fromMm = ((neededM - fixedM) / factor) * 1000
    findings.note(
      'vapour-thin',
      `Cold work at ${plain(mediumC)} °C: ${named([sized])} keeps vapour out by itself from ${plain(fromMm)} mm on, its joints glued; where it is thinner, ${cure}.`,
    )
    return
  }
  findings.note(
    'vapour-open',
    `Cold work at ${plain(mediumC)} °C: ${named(bands)} ${lets(bands)} vapour through to where it condenses or freezes. To keep it dry, ${cure}.`,
  )
}

/** Said only where it holds for every thickness on the ladder. */
function noteWrongSide(bands: readonly Band[], { barrier }: ColdWork, findings: Findings): void {
  for (let index = bands.length - 2; index >= 0; index -= 1) {
    const inner = bands[index]
    const outside = bands.slice(index + 1)
    const outsideM = outside.reduce<number | null>((totalM, { mostM }) => sum(totalM, mostM), 0)
    if (!inner || inner.leastM === null || outsideM === null) continue
    if (inner.leastM <= OPEN_UP_TO_M || inner.leastM <= outsideM) continue
    findings.note(
      'vapour-wrong-side',
      `Cold work: ${named([inner])} is tighter to vapour than ${named(outside)} outside it. Moisture that comes in is caught where they meet if that is below the dew point: the tightest layer belongs outermost${barrier === null ? '' : `, or every lap of the finish (${barrier}) is sealed`}.`,
    )
    return
  }
}

const named = (bands: readonly Band[]): string => listed(namesOf(bands))
const lets = (bands: readonly Band[]): string => (namesOf(bands).length > 1 ? 'let' : 'lets')
const namesOf = (bands: readonly Band[]): readonly string[] => [
  ...new Set(bands.map(({ material }) => material.name)),
]
