/** The build-up of a run: its materials, thicknesses, finish, and the rungs of the sized layer. */
import type { Finish, Material } from '#catalogue/types.ts'
import { inchLadder, metricLadder, plainSteps } from '#sizing/ladder.ts'
import type { BuildUpLayer, LayerMaterial, Step } from '#sizing/problem.ts'
import type { RunValues } from '../fields.ts'
import { type Findings, plain } from './findings.ts'
import type { CatalogueIndex } from './index-catalogue.ts'
import { parseLayers } from './layers-text.ts'
import type { Thing } from './standing.ts'

export interface ResolvedBuildUp {
  /** Inside to outside; empty for a bare run. */
  readonly layers: readonly BuildUpLayer[]
  readonly steps: readonly Step[]
}

export function resolveFinish(
  values: RunValues,
  index: CatalogueIndex,
  findings: Findings,
): Finish | null {
  if (values.finish === undefined) return null
  const finish = index.finish(values.finish)
  if (finish.ok) return finish.item
  findings.fault('finish', values.finish, finish.message)
  return null
}

/** Without a thing (its own faults are already found) only the names are checked. */
export function resolveBuildUp(
  values: RunValues,
  thing: Thing | null,
  index: CatalogueIndex,
  findings: Findings,
): ResolvedBuildUp | null {
  if (values.layers !== undefined) return layered(values, values.layers, thing, index, findings)
  if (values.thicknessM === 0) return { layers: [], steps: [] }
  const material = singleMaterial(values, thing, index, findings)
  if (!material) return null
  const steps = material.catalogued
    ? ladderOf(material.catalogued, values, thing, index)
    : plainSteps()
  if (values.thicknessM !== undefined) {
    return { layers: [fixedLayer(material.layer, values.thicknessM, steps)], steps: [] }
  }
  if (steps.length === 0) {
    findings.fault(
      'thicknessM',
      'nothing',
      `a thickness in mm: ${noSteps(material.catalogued, values)}`,
    )
    return null
  }
  return { layers: [{ material: material.layer, thicknessM: null, piecesM: [] }], steps }
}

function noSteps(material: Material | null, { steps = 'metric' }: RunValues): string {
  const none = steps === 'both' ? 'no steps, metric or inch,' : `no ${steps} steps`
  return `the catalogue holds ${none} for ${material?.name ?? 'this material'}`
}

interface Single {
  readonly layer: LayerMaterial
  readonly catalogued: Material | null
}

function singleMaterial(
  values: RunValues,
  thing: Thing | null,
  index: CatalogueIndex,
  findings: Findings,
): Single | null {
  const { conductivityWPerMK } = values
  if (values.material === undefined) {
    if (conductivityWPerMK === undefined) {
      findings.fault(
        'material',
        'nothing',
        'a material of the catalogue, conductivity_w_mk, layers, or thickness_mm 0 for a bare run',
      )
      return null
    }
    const layer = {
      name: `lagging of ${plain(conductivityWPerMK, 4)} W/mK`,
      conductivity: { kind: 'constant', conductivityWPerMK } as const,
      serviceMinC: null,
      serviceMaxC: null,
      vapourResistance: null,
      price: null,
    }
    findings.note(
      'service-unknown',
      'The conductivity is given by hand: no service range and no price are known for it.',
    )
    return { layer, catalogued: null }
  }
  const material = materialOf('material', values.material, index, findings)
  if (!material) return null
  noteFit(material, thing, findings)
  const layer = layerMaterial(material, index)
  if (conductivityWPerMK === undefined) return { layer, catalogued: material }
  findings.note(
    'conductivity-given',
    `The conductivity of ${material.name.toLowerCase()} is overridden by the constant given, ${plain(conductivityWPerMK, 4)} W/mK.`,
  )
  const conductivity = { kind: 'constant', conductivityWPerMK } as const
  return { layer: { ...layer, conductivity }, catalogued: material }
}

function materialOf(
  key: 'material' | 'layers',
  text: string,
  index: CatalogueIndex,
  findings: Findings,
): Material | null {
  const material = index.material(text)
  if (material.ok) return material.item
  findings.fault(key, text, material.message)
  return null
}

function layerMaterial(material: Material, index: CatalogueIndex): LayerMaterial {
  return {
    name: material.name,
    conductivity: material.conductivity,
    serviceMinC: material.serviceMinC,
    serviceMaxC: material.serviceMaxC,
    vapourResistance: material.vapourResistance,
    price: index.priceModel(material.id),
  }
}

/** A form that does not go on this shape is said, not refused: site practice differs. */
function noteFit(material: Material, thing: Thing | null, findings: Findings): void {
  if (!thing) return
  const { shape } = thing
  const upToM = material.notOnDiametersUpToM
  const isPipe = shape.kind === 'pipe' || shape.kind === 'buried-pipe'
  if (isPipe && upToM !== null && shape.outerDiameterM <= upToM) {
    findings.note(
      'form-unusual',
      `${material.name} is not used on outside diameters of ${plain(upToM * 1000)} mm or less: choose a section.`,
    )
  }
  if (!isPipe && material.form === 'pipe section') {
    findings.note(
      'form-unusual',
      `${material.name} is made for pipes: on this shape a slab or mat is usual.`,
    )
  }
}

function layered(
  values: RunValues,
  text: string,
  thing: Thing | null,
  index: CatalogueIndex,
  findings: Findings,
): ResolvedBuildUp | null {
  for (const key of ['material', 'thicknessM', 'conductivityWPerMK'] as const) {
    if (values[key] !== undefined) {
      findings.fault(
        key,
        'a value beside layers',
        'nothing: layers names materials and thicknesses by itself',
      )
    }
  }
  const parsed = parseLayers(text)
  if (!parsed.ok) {
    findings.fault('layers', text, parsed.allowed)
    return null
  }
  const layers: BuildUpLayer[] = []
  let steps: readonly Step[] = []
  let isComplete = true
  for (const { name, thicknessM } of parsed.layers) {
    const material = materialOf('layers', name, index, findings)
    if (!material) {
      isComplete = false
      continue
    }
    noteFit(material, thing, findings)
    const layer = layerMaterial(material, index)
    const ladder = ladderOf(material, values, thing, index)
    if (thicknessM === null) {
      steps = ladder
      layers.push({ material: layer, thicknessM: null, piecesM: [] })
      if (ladder.length === 0) {
        findings.fault(
          'layers',
          text,
          `a thickness in mm in place of ?: ${noSteps(material, values)}`,
        )
      }
    } else {
      layers.push(fixedLayer(layer, thicknessM, ladder))
    }
  }
  return isComplete ? { layers, steps } : null
}

/** A fixed thickness, made of the pieces that a rung of that thickness would have, else in one piece. */
function fixedLayer(
  material: LayerMaterial,
  thicknessM: number,
  ladder: readonly Step[],
): BuildUpLayer {
  const rung = ladder.find((step) => Math.abs(step.thicknessM - thicknessM) < 1e-6)
  return { material, thicknessM, piecesM: rung?.piecesM ?? [thicknessM] }
}

function ladderOf(
  material: Material,
  values: RunValues,
  thing: Thing | null,
  index: CatalogueIndex,
): readonly Step[] {
  const series = values.steps ?? 'metric'
  const diameterM = thing?.shape.kind === 'pipe' ? thing.shape.outerDiameterM : null
  const key = `${material.id}|${series}|${series === 'metric' ? '' : diameterM}`
  const known = index.ladders.get(key)
  if (known) return known
  const own = index.catalogue.steps.filter((step) => step.materialId === material.id)
  const system =
    material.family === 'cellular' && material.form.includes('tube') ? 'flexible' : 'rigid'
  const sections = index.catalogue.inchSections.filter((section) => section.system === system)
  const metric = series === 'inch' ? [] : metricLadder(own)
  const inch = series === 'metric' ? [] : inchLadder(own, sections, diameterM)
  const ladder = [...metric, ...inch].sort((a, b) => a.thicknessM - b.thicknessM)
  index.ladders.set(key, ladder)
  return ladder
}
