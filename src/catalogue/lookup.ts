/** Finds what people name in the catalogue; on a miss, says what is allowed and what comes closest. */
import { bareName, closeNames } from './nearest.ts'
import {
  mm,
  noSize,
  npsText,
  numbers,
  type PipeText,
  readDuctText,
  readPipeText,
} from './size-text.ts'
import type {
  Catalogue,
  Finish,
  Fuel,
  Material,
  PipeSize,
  SteamState,
  WallMaterial,
} from './types.ts'

/** Either the thing, with what a reader should know about the choice, or what is allowed, to be read after "allowed:". */
export type Lookup<T> =
  | { readonly ok: true; readonly item: T; readonly notes: readonly string[] }
  | { readonly ok: false; readonly message: string }

const found = <T>(item: T, ...notes: string[]): Lookup<T> => ({ ok: true, item, notes })
const missed = (message: string): { readonly ok: false; readonly message: string } => ({
  ok: false,
  message,
})

/**
 * DN: outside diameter of EN 10220, normal wall. NPS: ASME B36.10M, schedule 40 up to NPS 10, where it is also the
 * standard wall, STD above; a schedule that ends in S is stainless pipe of B36.19M. CU: EN 1057, the thinner wall.
 */
export function findPipeSize(catalogue: Catalogue, text: string): Lookup<PipeSize> {
  const asked = readPipeText(text)
  if (!asked)
    return missed('a size such as DN 50, NPS 2, NPS 1-1/2 sch 80 or CU 28, or no size and an od_mm')
  switch (asked.kind) {
    case 'dn':
      return findDn(catalogue, asked)
    case 'nps':
      return findNps(catalogue, asked)
    case 'cu':
      return findCopper(catalogue, asked)
  }
}

type Asked<K extends PipeText['kind']> = Extract<PipeText, { kind: K }>

function findDn({ pipeSizes }: Catalogue, { dn }: Asked<'dn'>): Lookup<PipeSize> {
  const sizes = pipeSizes.filter((pipe) => pipe.standard.startsWith('EN 10220'))
  const size = sizes.find((pipe) => pipe.dn === dn)
  return size
    ? found(size)
    : missed(
        noSize(
          'DN',
          dn,
          numbers(sizes, (pipe) => pipe.dn),
          String,
        ),
      )
}

function findNps({ pipeSizes }: Catalogue, asked: Asked<'nps'>): Lookup<PipeSize> {
  const { npsIn, schedule } = asked
  const stainless = schedule?.endsWith('S') && schedule.startsWith('Sch')
  const standard = stainless ? 'ASME B36.19M' : 'ASME B36.10M'
  const sizes = pipeSizes.filter((pipe) => pipe.standard === standard)
  const ofSize = sizes.filter((pipe) => pipe.npsIn === npsIn)
  if (ofSize.length === 0)
    return missed(
      noSize(
        'NPS',
        npsIn,
        numbers(sizes, (pipe) => pipe.npsIn),
        npsText,
      ),
    )
  const series = schedule ?? (npsIn <= 10 ? 'Sch 40' : 'STD')
  const size = ofSize.find((pipe) => pipe.series === series)
  if (!size)
    return missed(
      `a schedule that ${standard} has for NPS ${npsText(npsIn)}: ${listed(ofSize.map((pipe) => pipe.series))}`,
    )
  return schedule === null && series === 'STD'
    ? found(size, `${size.label} without a schedule: standard wall (STD), ${mm(size.wallM)} mm.`)
    : found(size)
}

function findCopper({ pipeSizes }: Catalogue, asked: Asked<'cu'>): Lookup<PipeSize> {
  const sizes = pipeSizes.filter((pipe) => pipe.standard === 'EN 1057')
  const ofSize = sizes
    .filter((pipe) => mm(pipe.outerDiameterM) === asked.outerDiameterMm)
    .sort((a, b) => a.wallM - b.wallM)
  const [thinnest, ...thicker] = ofSize
  if (!thinnest)
    return missed(
      noSize(
        'CU',
        asked.outerDiameterMm,
        numbers(sizes, (pipe) => mm(pipe.outerDiameterM)),
        String,
      ),
    )
  if (asked.wallMm !== null) {
    const size = ofSize.find((pipe) => mm(pipe.wallM) === asked.wallMm)
    return size
      ? found(size)
      : missed(
          `CU ${asked.outerDiameterMm} with a wall of ${listed(ofSize.map((pipe) => String(mm(pipe.wallM))))} mm`,
        )
  }
  if (thicker.length === 0) return found(thinnest)
  return found(
    thinnest,
    `CU ${asked.outerDiameterMm} is taken with the thinner wall, ${mm(thinnest.wallM)} mm; there is also ${thicker.map((pipe) => mm(pipe.wallM)).join(' and ')} mm.`,
  )
}

/** Of a round duct the diameter, of a rectangular one the outer width and height. */
export interface DuctDimensions {
  readonly label: string
  readonly diameterM: number | null
  readonly widthM: number | null
  readonly heightM: number | null
}

/** `D 250`, `Ø 250`: a diameter of EN 1506. `600 x 400`: width by height, any size, with a note off EN 1505. */
export function findDuctSize(catalogue: Catalogue, text: string): Lookup<DuctDimensions> {
  const asked = readDuctText(text)
  if (!asked)
    return missed(
      'a size such as D 250 for a round duct, or 600 x 400 (width x height in mm) for a rectangular one',
    )
  if (asked.kind === 'round') {
    const { diameterMm } = asked
    const sizes = catalogue.ductSizes.filter((duct) => duct.diameterM !== null)
    const size = sizes.find((duct) => mm(duct.diameterM ?? 0) === diameterMm)
    return size
      ? found({ ...size, widthM: null, heightM: null })
      : missed(
          `${noSize(
            'D',
            diameterMm,
            numbers(sizes, (duct) => (duct.diameterM === null ? null : mm(duct.diameterM))),
            String,
          )}; for another diameter no size and an od_mm`,
        )
  }
  const { widthMm, heightMm } = asked
  if (Math.min(widthMm, heightMm) < 10 || Math.max(widthMm, heightMm) > 50_000)
    return missed('sides from 10 to 50000 mm')
  const dimensions = {
    label: `${widthMm}x${heightMm}`,
    diameterM: null,
    widthM: widthMm / 1000,
    heightM: heightMm / 1000,
  }
  const labels = [dimensions.label, `${heightMm}x${widthMm}`]
  return catalogue.ductSizes.some((duct) => labels.includes(duct.label))
    ? found(dimensions)
    : found(dimensions, `${widthMm} x ${heightMm} mm is not a size of EN 1505; taken as given.`)
}

export const findMaterial = (catalogue: Catalogue, idOrName: string): Lookup<Material> =>
  findNamed(catalogue.materials, 'a material of the catalogue', idOrName)
export const findFinish = (catalogue: Catalogue, idOrName: string): Lookup<Finish> =>
  findNamed(catalogue.finishes, 'a finish of the catalogue', idOrName)
export const findFuel = (catalogue: Catalogue, idOrName: string): Lookup<Fuel> =>
  findNamed(catalogue.fuels, 'a fuel of the catalogue', idOrName)
export const findWallMaterial = (catalogue: Catalogue, idOrName: string): Lookup<WallMaterial> =>
  findNamed(catalogue.wallMaterials, 'a pipe or duct material of the catalogue', idOrName)

interface Named {
  readonly id: string
  readonly name: string
}

/** By id or name; on a miss the nearest ids, or all of them where nothing is near. */
export function findNamed<T extends Named>(
  rows: readonly T[],
  what: string,
  text: string,
): Lookup<T> {
  const wanted = bareName(text)
  const item = rows.find((row) => bareName(row.id) === wanted || bareName(row.name) === wanted)
  if (item) return found(item)
  const close = closeNames(
    text,
    rows.flatMap((row) => [row.id, row.name]),
    6,
  )
  const ids = rows.filter((row) => close.includes(row.id) || close.includes(row.name))
  const hint =
    ids.length > 0
      ? `did you mean ${listed(ids.slice(0, 3).map((row) => row.id))}?`
      : `known are ${rows.map((row) => row.id).join(', ')}`
  return missed(`${what}; ${hint}`)
}

const listed = (names: readonly string[]): string =>
  names.length > 1 ? `${names.slice(0, -1).join(', ')} or ${names.at(-1)}` : (names[0] ?? '')

const atmospherePa = 101_325
const zeroCelsiusK = 273.15

export type Saturation =
  | { readonly ok: true; readonly temperatureC: number }
  /** What is allowed. */
  | { readonly ok: false; readonly message: string }

/**
 * Temperature of saturated steam at a gauge pressure above one standard atmosphere.
 *
 * Between the states of the table 1/T is taken as linear in ln p, which is what the Clausius-Clapeyron relation gives
 * for a constant latent heat. Against the IAPWS-IF97 saturation equation this is within 0.05 K below atmospheric
 * pressure and within 0.02 K above it. The states must stand in rising pressure.
 */
export function saturationTemperatureC(
  steam: readonly SteamState[],
  gaugePressurePa: number,
): Saturation {
  const [lower, upper] = saturationCells(steam, gaugePressurePa)
  if (!lower) return { ok: false, message: outOfRange(steam) }
  if (!upper) return { ok: true, temperatureC: lower.temperatureC }
  const share =
    Math.log((gaugePressurePa + atmospherePa) / lower.pressureAbsolutePa) /
    Math.log(upper.pressureAbsolutePa / lower.pressureAbsolutePa)
  const inverseK =
    (1 - share) / (lower.temperatureC + zeroCelsiusK) + share / (upper.temperatureC + zeroCelsiusK)
  return { ok: true, temperatureC: 1 / inverseK - zeroCelsiusK }
}

/** The states that `saturationTemperatureC` reads: the one of that pressure, the two around it, or none. */
export function saturationCells(
  steam: readonly SteamState[],
  gaugePressurePa: number,
): readonly SteamState[] {
  const pressurePa = gaugePressurePa + atmospherePa
  const above = steam.findIndex((state) => state.pressureAbsolutePa >= pressurePa)
  const [lower, upper] = [steam[above - 1], steam[above]]
  if (!upper) return []
  // The gauge form of a tabulated pressure may miss the end of the table by a rounding.
  if (upper.pressureAbsolutePa - pressurePa < 1e-6 * pressurePa) return [upper]
  return lower ? [lower, upper] : []
}

function outOfRange(steam: readonly SteamState[]): string {
  const gaugeBar = (state: SteamState | undefined) =>
    state ? ((state.pressureAbsolutePa - atmospherePa) / 1e5).toFixed(2) : 'nothing'
  return `a pressure from ${gaugeBar(steam[0])} to ${gaugeBar(steam.at(-1))} bar gauge, which is what the steam table of the catalogue covers, or medium_c instead`
}
