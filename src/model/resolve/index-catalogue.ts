import {
  type DuctDimensions,
  findDuctSize,
  findFinish,
  findFuel,
  findMaterial,
  findPipeSize,
  findWallMaterial,
  type Lookup,
} from '#catalogue/lookup.ts'
import type {
  Catalogue,
  Finish,
  FinishPrice,
  Fuel,
  Material,
  PipeSize,
  PriceModel,
  WallMaterial,
} from '#catalogue/types.ts'
import type { Step } from '#sizing/problem.ts'

/** The catalogue prepared for thousands of look-ups: each text is searched once. */
export interface CatalogueIndex {
  readonly catalogue: Catalogue
  readonly material: (text: string) => Lookup<Material>
  readonly finish: (text: string) => Lookup<Finish>
  readonly fuel: (text: string) => Lookup<Fuel>
  readonly wallMaterial: (text: string) => Lookup<WallMaterial>
  readonly pipeSize: (text: string) => Lookup<PipeSize>
  readonly ductSize: (text: string) => Lookup<DuctDimensions>
  readonly priceModel: (materialId: string) => PriceModel | null
  readonly finishPrice: (finishId: string) => FinishPrice | null
  /** Ladders already built, by material, series and pipe. */
  readonly ladders: Map<string, readonly Step[]>
}

export function indexCatalogue(catalogue: Catalogue): CatalogueIndex {
  const prices = new Map(catalogue.priceModels.map((row) => [row.materialId, row]))
  const finishPrices = new Map(catalogue.finishPrices.map((row) => [row.finishId, row]))
  return {
    catalogue,
    material: remembered((text) => findMaterial(catalogue, text)),
    finish: remembered((text) => findFinish(catalogue, text)),
    fuel: remembered((text) => findFuel(catalogue, text)),
    wallMaterial: remembered((text) => findWallMaterial(catalogue, text)),
    pipeSize: remembered((text) => findPipeSize(catalogue, text)),
    ductSize: remembered((text) => findDuctSize(catalogue, text)),
    priceModel: (materialId) => prices.get(materialId) ?? null,
    finishPrice: (finishId) => finishPrices.get(finishId) ?? null,
    ladders: new Map(),
  }
}

/** So many different texts are kept; a list with more has none that repeat. */
const MOST_REMEMBERED = 5000

function remembered<T>(find: (text: string) => T): (text: string) => T {
  const known = new Map<string, T>()
  return (text) => {
    const before = known.get(text)
    if (before !== undefined) return before
    const found = find(text)
    if (known.size < MOST_REMEMBERED) known.set(text, found)
    return found
  }
}
