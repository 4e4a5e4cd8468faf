/** What flanges, valves, supports and ends add to the loss of a run. */
import type { Figure } from '#catalogue/figure.ts'
import { fittingAreaM2, laggedLengthM, supportFraction } from '#catalogue/fittings.ts'
import type { FittingItem } from '#catalogue/types.ts'
import type { Fittings } from '#sizing/problem.ts'
import { type FieldKey, fieldOf, type RunValues } from '../fields.ts'
import { type Findings, listed, plain } from './findings.ts'
import type { CatalogueIndex } from './index-catalogue.ts'
import type { Medium } from './medium.ts'
import type { Thing } from './standing.ts'

const none: Fittings = {
  bareAreaM2: 0,
  laggedLengthM: 0,
  areBare: false,
  supportShare: 0,
  ends: 0,
  items: [],
  convention: '',
}

/** By item, in the singular and the plural. A strainer counts as a valve. Source: common practice, no source. */
const counted = [
  { key: 'valves', item: 'valve', one: 'valve', many: 'valves' },
  { key: 'strainers', item: 'valve', one: 'strainer', many: 'strainers' },
  { key: 'flanges', item: 'flange-pair', one: 'flange pair', many: 'flange pairs' },
] as const satisfies readonly {
  readonly key: FieldKey
  readonly item: FittingItem
  readonly one: string
  readonly many: string
}[]

const countedKeys = counted.map(({ key }) => key)
const inLength = ['bends', 'tees', 'reducers'] as const satisfies readonly FieldKey[]
const others = ['supports', 'ends'] as const satisfies readonly FieldKey[]

/** Without a thing or a medium (their own faults are already found) nothing is looked up. */
export function resolveFittings(
  values: RunValues,
  thing: Thing | null,
  medium: Medium | null,
  index: CatalogueIndex,
  findings: Findings,
): Fittings {
  if (!thing || !medium) return none
  const { shape } = thing
  if (shape.kind === 'flat' || shape.kind === 'sphere' || shape.kind === 'vessel') {
    noteUnused([...countedKeys, ...inLength, ...others], values, findings)
    return none
  }
  const isBareRun = values.thicknessM === 0
  const areBare = isBareRun || values.fittings === 'bare'
  noteInLength(values, findings)
  const found = countedFittings(values, thing, medium, areBare, index, findings)
  const supportShare = isBareRun ? 0 : supports(values, index, findings)
  return {
    bareAreaM2: found.bareAreaM2,
    laggedLengthM: found.laggedLengthM,
    areBare,
    supportShare,
    ends: ends(values, areBare, findings),
    items: found.items,
    convention: [found.convention, supportShare > 0 ? bySupports : '']
      .filter((text) => text !== '')
      .join('; '),
  }
}

type Counted = Pick<Fittings, 'bareAreaM2' | 'laggedLengthM' | 'items' | 'convention'>

/** Valves, strainers and flanges, by the outside diameter of the pipe. */
function countedFittings(
  values: RunValues,
  { shape }: Thing,
  { mediumC }: Medium,
  areBare: boolean,
  { catalogue }: CatalogueIndex,
  findings: Findings,
): Counted {
  if (!('outerDiameterM' in shape)) {
    noteUnused(countedKeys, values, findings, 'the catalogue holds them for pipes only')
    return none
  }
  const given = counted.filter(({ key }) => (values[key] ?? 0) > 0)
  if (given.length === 0) return none
  const { outerDiameterM } = shape
  const areaOf = (item: FittingItem): Figure => fittingAreaM2(catalogue, item, outerDiameterM)
  const lengthOf = (item: FittingItem): Figure =>
    laggedLengthM(catalogue, item, outerDiameterM, mediumC)
  const figure = (of: Figure): number => (of.ok ? of.value : 0)
  const items = given.map(({ key, item, many }) => ({
    name: many,
    count: values[key] ?? 0,
    bareAreaM2: figure(areaOf(item)),
    laggedLengthM: areBare ? 0 : figure(lengthOf(item)),
  }))
  const sum = (each: 'bareAreaM2' | 'laggedLengthM'): number =>
    items.reduce((total, item) => total + item.count * item[each], 0)
  const found = {
    bareAreaM2: sum('bareAreaM2'),
    laggedLengthM: sum('laggedLengthM'),
    items,
    convention: areBare ? byArea : byLength,
  }
  const what = listed(given.map(({ key, one, many }) => numbered(values[key] ?? 0, one, many)))
  noteFittings(what, found, values, mediumC, findings)
  const kinds = new Set(given.map(({ item }) => item))
  for (const item of kinds) noteFigure(areBare ? areaOf(item) : lengthOf(item), findings)
  return found
}

const byArea =
  'surface of the bare fitting, losing the flux of the bare run (flanges from their dimensions in class 150 without bolts, valves from memory: verify)'
const byLength =
  'metres of the lagged run that lose as much (ISO 12241 annex A / VDI 2055, from memory: verify)'
const bySupports =
  'supports as a share of the loss of the straight run (ISO 12241 annex A / VDI 2055, from memory: verify)'

function noteUnused(
  keys: readonly FieldKey[],
  values: RunValues,
  findings: Findings,
  why = 'fittings are reckoned for pipes and ducts',
): void {
  const given = keys.filter((key) => Number(values[key] ?? 0) > 0)
  if (given.length === 0) return
  const columns = listed(given.map((key) => fieldOf(key).column))
  findings.note('unused', `${columns}: not used for a ${values.shape}, since ${why}.`)
}

const numbered = (count: number, one: string, many: string): string =>
  `${count} ${count === 1 ? one : many}`

function noteFittings(
  what: string,
  { bareAreaM2, laggedLengthM: equivalentM, convention }: Counted,
  values: RunValues,
  mediumC: number,
  findings: Findings,
): void {
  const area = `${plain(bareAreaM2, 3)} m² of bare surface`
  const length = `${plain(equivalentM, 2)} m of the lagged run`
  const isBareRun = values.thicknessM === 0
  const extreme = mediumC < (values.airC ?? mediumC) ? 'colder' : 'hotter'
  const stay = isBareRun ? '' : ` They stay bare on a lagged run: far ${extreme} than its jacket.`
  findings.note(
    'fittings',
    convention === byArea
      ? `${what}: ${area}; convention: ${convention}.${stay}`
      : `${what}, lagged like the run: ${length}; convention: ${convention}. On the bare run they count as ${area}.`,
  )
  if (values.fittings === 'lagged' && isBareRun) {
    findings.note('fittings-bare', 'The run is bare, and its fittings are taken as bare with it.')
  }
  if (values.lengthM === undefined) {
    findings.note(
      'fittings-length',
      'The run has no length: the loss of its fittings is not added up. Give length_m, 0 for fittings alone.',
    )
  }
  if (values.shape === 'round-duct') {
    findings.note(
      'fittings-duct',
      'The figures for valves and flanges are those of pipes of the same diameter: flanges and dampers of ducts are lighter.',
    )
  }
}

function noteFigure(figure: Figure, findings: Findings): void {
  const text = figure.ok ? figure.assumption : figure.reason
  if (text !== null) findings.note(figure.ok ? 'fittings-figure' : 'fittings-unknown', text)
}

/** Supports count as present or not; wind, sun and sky are outdoors. */
function supports(values: RunValues, index: CatalogueIndex, findings: Findings): number {
  if (!(values.supports ?? 0)) return 0
  const isOutdoors =
    (values.windMPerS ?? 0) > 0 || (values.solarWPerM2 ?? 0) > 0 || (values.skyView ?? 0) > 0
  const place = isOutdoors ? 'outdoors' : 'indoors'
  const share = supportFraction(index.catalogue, place)
  findings.note(
    'supports',
    `Supports add ${plain(share * 100)} % to the loss of the lagged run, ${place}, however many they are (ISO 12241 annex A / VDI 2055, from memory: verify).`,
  )
  return share
}

function ends({ ends: count = 0 }: RunValues, areBare: boolean, findings: Findings): number {
  if (count > 0) {
    findings.note(
      'ends',
      `${numbered(count, 'open end', 'open ends')}: ${areBare ? 'bare, the flux of the bare run over the cross-section of the bare run' : 'closed off like the run, its flux over its cross-section'} (common practice, no source).`,
    )
  }
  return count
}

function noteInLength(values: RunValues, findings: Findings): void {
  const given = inLength.filter((key) => (values[key] ?? 0) > 0)
  if (given.length === 0) return
  const what = listed(given)
  findings.note(
    'in-length',
    `${what.charAt(0).toUpperCase()}${what.slice(1)} lie within the length of the run and lose as much as it does (common practice, no source).`,
  )
}
