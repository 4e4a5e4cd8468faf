/** Which field the words above a column of somebody else's list mean, and the unit they name. */
import { displayUnit, type UnitSystem } from '#units/quantities.ts'
import { twinOf } from './cell.ts'
import { type FieldKey, fieldOf, fields } from './fields.ts'
import { quantities } from './quantities.ts'

/** A column as it is read: into a field, in the unit its words name or else in the one the window shows. */
export interface ReadAs {
  readonly key: FieldKey
  readonly units: UnitSystem | 'shown'
}

/** What our own lists call the column, or the word for it on the screen. */
export function knownColumn(header: string): ReadAs | null {
  return ownColumns.get(normal(header)) ?? null
}

/** What is probably meant; null where the words say nothing to us, or name a unit that is not one of the field. */
export function guessColumn(header: string): ReadAs | null {
  const known = knownColumn(header)
  if (known) return known
  const { phrase, unit } = parted(header)
  const key = keyMeant(phrase, unit)
  const units = key && unitsNamed(key, unit)
  return units ? { key, units } : null
}

/** Whether every word is one that stands above columns, and not in them. */
export function isColumnName(header: string): boolean {
  return keyByPhrase.has(parted(header).phrase) || knownColumn(header) !== null
}

function keyMeant(phrase: string, unit: string): FieldKey | null {
  const key = keyByPhrase.get(phrase) ?? longestWithin(phrase)
  // "Fluid" names what flows, "Fluid °C" how hot it is.
  return key === 'medium' && (unit === 'c' || unit === 'f') ? 'mediumC' : key
}

function longestWithin(phrase: string): FieldKey | null {
  const within = [...keyByPhrase].filter(
    ([known]) => known.length > 3 && ` ${phrase} `.includes(` ${known} `),
  )
  return within.sort(([one], [other]) => other.length - one.length)[0]?.[1] ?? null
}

function unitsNamed(key: FieldKey, unit: string): ReadAs['units'] | null {
  const field = fieldOf(key)
  if (unit === '' || field.kind !== 'number') return 'shown'
  if (field.quantity === 'count' && piecesWords.has(unit)) return 'si'
  if (unit === plainUnit(quantities[field.quantity].unit)) return 'si'
  return unit === plainUnit(displayUnit(field.quantity, 'us').label) ? 'us' : null
}

/** How a list says that it counts pieces: "Valves (no)", "Flanges [pcs]". */
const piecesWords: ReadonlySet<string> = new Set([
  'no',
  'nr',
  'nos',
  'pc',
  'pcs',
  'ea',
  'each',
  'qty',
])

/** The words of a header without its unit, and the unit: "Length (m)", "Fluid temp °C", "od_mm". */
function parted(header: string): { readonly phrase: string; readonly unit: string } {
  const [, before = header, inside = ''] = /^(.*?)[([]([^)\]]*)[)\]]\s*$/.exec(header) ?? []
  const words = normal(before).split(' ')
  const last = plainUnit(words.at(-1) ?? '')
  if (inside !== '') return { phrase: phraseOf(words), unit: plainUnit(inside) }
  const hasUnit = words.length > 1 && unitsKnown.has(last)
  return hasUnit
    ? { phrase: phraseOf(words.slice(0, -1)), unit: last }
    : { phrase: phraseOf(words), unit: '' }
}

const phraseOf = (words: readonly string[]): string =>
  words
    .map((word) => word.replaceAll(/[^\p{L}\p{N}]/gu, ''))
    .filter((word) => word !== '' && word !== 'in')
    .map((word) => sameWord.get(word) ?? word)
    .join(' ')

/** How the same word is written shorter, or otherwise. */
const sameWord: ReadonlyMap<string, string> = new Map([
  ['temperature', 'temp'],
  ['number', 'no'],
  ['nr', 'no'],
  ['dia', 'diameter'],
  ['diam', 'diameter'],
  ['thk', 'thickness'],
  ['insul', 'insulation'],
  ['op', 'operating'],
  ['max', 'maximum'],
  ['min', 'minimum'],
  ['ref', 'reference'],
  ['amb', 'ambient'],
  ['matl', 'material'],
  ['desc', 'description'],
])

const normal = (header: string): string =>
  header
    .trim()
    .toLowerCase()
    .replaceAll(/[\s_]+/g, ' ')

const plainUnit = (unit: string): string => {
  const plain = unit
    .toLowerCase()
    .replaceAll('²', '2')
    .replaceAll(/deg(?:rees?)?|[°\s.·*]/g, '')
  return sameUnit.get(plain) ?? plain
}
const sameUnit: ReadonlyMap<string, string> = new Map([
  ['celsius', 'c'],
  ['fahrenheit', 'f'],
  ['"', 'in'],
  ['inch', 'in'],
  ['inches', 'in'],
  ['feet', 'ft'],
  ['foot', 'ft'],
  ['metres', 'm'],
  ['meters', 'm'],
  ['lm', 'm'],
  ['millimetres', 'mm'],
  ['h/yr', 'h/year'],
  ['m^2', 'm2'],
  ['sqm', 'm2'],
])
const unitsKnown: ReadonlySet<string> = new Set(
  'c f k m mm cm in ft m2 ft2 % bar barg psi psig kpa m/s mph w/m w/m2 h/year h kg/s lb/h'.split(
    ' ',
  ),
)

const ownColumns: ReadonlyMap<string, ReadAs> = new Map<string, ReadAs>([
  ...fields.map(({ label, key }) => [normal(label), { key, units: 'shown' }] as const).toReversed(),
  ...fields.flatMap((field) => {
    const twin = field.kind === 'number' ? twinOf(field) : undefined
    if (field.kind !== 'number' || !twin) return []
    const stem = field.column.slice(0, -quantities[field.quantity].suffix.length)
    return [[normal(stem + twin.suffix), { key: field.key, units: 'us' }] as const]
  }),
  ...fields.map(({ column, key, kind }) => {
    const units = kind === 'number' ? 'si' : 'shown'
    return [normal(column), { key, units }] as const
  }),
])

const phrases: Readonly<Partial<Record<FieldKey, string>>> = {
  tag: 'tag, tag no, line, line no, line id, line tag, pipe no, duct no, run no, item, item no, reference, reference no, mark, no, id',
  description: 'description, run, run name, name, line description, pipe description',
  place: 'place, location, room, zone, building, floor, level',
  service: 'service, duty, system',
  group: 'group',
  shape: 'shape',
  size: 'size, pipe size, line size, duct size, nominal size, nominal diameter, nominal bore, bore, nb, dn, nps, diameter, pipe diameter',
  outerDiameterM: 'od, pipe od, outside diameter, outer diameter',
  wallM: 'wall, wall thickness, pipe wall',
  pipeMaterial: 'pipe material',
  widthM: 'width',
  heightM: 'height',
  lengthM:
    'length, pipe length, run length, line length, total length, metres, lineal metres, shell length, tan to tan',
  areaM2: 'surface area',
  orientation: 'orientation, direction',
  riseM: 'rise, height of the riser',
  heads: 'heads, head type, vessel heads, dished ends',
  buryDepthM:
    'bury depth, burial depth, buried depth, depth of burial, depth to axis, depth of axis',
  soilWPerMK: 'soil conductivity, ground conductivity',
  valves: 'valves, valve, no of valves, valve count',
  flanges: 'flanges, flange pairs, flanged joints, no of flanges',
  strainers: 'strainers, strainer',
  bends: 'bends, elbows, bend, elbow',
  tees: 'tees, tee, branches',
  reducers: 'reducers, reducer',
  supports: 'supports, hangers, pipe supports, brackets',
  ends: 'open ends, ends, end caps',
  fittings: 'fittings are, fittings lagged, fittings insulated',
  medium: 'medium, fluid, media, content, contents, commodity',
  mediumC:
    'temp, fluid temp, medium temp, operating temp, process temp, service temp, pipe temp, line temp, flow temp, water temp, content temp',
  mediumMaxC: 'maximum temp, design temp, maximum operating temp, maximum fluid temp',
  mediumMinC: 'minimum temp, minimum operating temp, minimum fluid temp',
  pressureGaugePa: 'pressure, steam pressure, operating pressure',
  flowKgPerS: 'flow, flow rate, mass flow, mass flow rate',
  velocityMPerS: 'velocity, air velocity, duct velocity',
  heatCapacityJPerKgK: 'heat capacity, specific heat, cp',
  airC: 'air, air temp, ambient, ambient temp, room temp, ambient air, ambient air temp',
  surroundingsC: 'surroundings, surroundings temp',
  windMPerS: 'wind, wind speed, air speed',
  humidity: 'humidity, rh, relative humidity',
  altitudeM: 'altitude, elevation, height above sea level',
  solarWPerM2: 'sun, solar, solar radiation, solar gain, irradiance',
  monthlyAirC: 'monthly air temp, monthly mean temp, monthly temp',
  frostAirC: 'winter air temp, winter design temp, minimum ambient temp, coldest air temp',
  touchAirC: 'summer air temp, summer design temp, maximum ambient temp, hottest air temp',
  material:
    'insulation, insulation material, insulation type, lagging, lagging material, lagging type, insulant',
  thicknessM: 'thickness, insulation thickness, lagging thickness',
  finish:
    'finish, cladding, cladding material, cladding type, jacket, jacketing, jacket material, covering, outer finish',
  emissivity: 'emissivity',
  maxSurfaceC: 'maximum surface temp, surface temp limit, maximum touch temp',
  frostHours: 'frost hours, freezing time, time to freeze, hours to freeze, frost protection',
  frostStartC: 'water start temp, initial water temp',
  maxDropK: 'temp drop, maximum temp drop, allowable temp drop, drop',
  codeTable: 'code, code table, energy code, regulation',
  codeFactor: 'code factor',
  maxOuterDiameterM: 'maximum od, maximum outside diameter, maximum overall diameter, clear space',
  measuredSurfaceC:
    'measured, measured temp, measured surface temp, surface temp measured, surface measured, skin temp, skin temp measured',
  surveyMediumC: 'medium temp measured, measured fluid temp',
  surveyAirC: 'air temp measured, measured air temp, survey air temp',
  surveyEmissivity: 'emissivity setting, survey emissivity',
  surveyToleranceK: 'thermometer tolerance, thermometer accuracy',
  fuel: 'fuel',
  hoursPerYear: 'hours, operating hours, running hours, hours per year',
}

const keyByPhrase: ReadonlyMap<string, FieldKey> = new Map(
  (Object.keys(phrases) as FieldKey[]).flatMap((key) =>
    (phrases[key] ?? '').split(', ').map((phrase) => [phrase, key] as const),
  ),
)
