/** The table of printed figures as a page of Markdown, the same on every machine. */
import type { Row, Standing } from './rows.ts'
import { workOf } from './works.ts'

interface Group {
  readonly work: string
  readonly rows: readonly (Row & { readonly where: string })[]
}

const order = new Intl.Collator('en', { numeric: true }).compare

const chapters: readonly { standing: Standing; title: string; about: string }[] = [
  {
    standing: 'printed',
    title: 'Printed figures',
    about: 'Read in the source named.',
  },
  {
    standing: 'regression',
    title: "Worked examples through a book's companion calculation",
    about: 'Input and result were read in a companion of the book; its print is taken to be equal.',
  },
  {
    standing: 'unread',
    title: 'From memory, estimated, or computed from other figures',
    about: 'No print was read for these; they count as nothing but a reminder.',
  },
]

/** The page; or, where a row names no known work, the rows that do so. */
export function render(
  rows: readonly Row[],
): { readonly page: string } | { readonly unknown: readonly string[] } {
  const unknown = [...new Set(rows.map(({ from }) => from).filter((from) => !workOf(from)))]
  if (unknown.length > 0) return { unknown: unknown.toSorted(order) }
  const parts = chapters.map((chapter) => ({
    ...chapter,
    groups: groupsOf(rows.filter(({ standing }) => standing === chapter.standing)),
  }))
  return {
    page: [
      '# Printed figures and what is computed',
      '',
      'Made by the tests; `npm run published` renews it. A deviation is that of the computed figure from the printed',
      'one. The last column says how much of the tolerance it takes: half a unit of the last printed digit, unless the',
      'test states another and why.',
      '',
      '| | figures | sources |',
      '| --- | ---: | ---: |',
      ...parts.map(({ title, groups }) => `| ${title} | ${countOf(groups)} | ${groups.length} |`),
      ...parts.flatMap((part) => chapterLines(part)),
      '',
    ].join('\n'),
  }
}

function groupsOf(rows: readonly Row[]): Group[] {
  const placed = rows.flatMap((row) => {
    const place = workOf(row.from)
    return place ? [{ ...row, ...place }] : []
  })
  return [...Map.groupBy(placed, ({ work }) => work)]
    .map(([work, own]) => ({
      work,
      rows: own.toSorted(
        (a, b) => order(sortKey(a), sortKey(b)) || (a.printed < b.printed ? -1 : 1),
      ),
    }))
    .toSorted((a, b) => order(a.work, b.work))
}

const sortKey = ({ where, what, given }: Row & { where: string }): string =>
  `${where}\u0000${what}\u0000${given}`

const countOf = (groups: readonly Group[]): number =>
  groups.reduce((sum, { rows }) => sum + rows.length, 0)

function chapterLines(part: { title: string; about: string; groups: readonly Group[] }): string[] {
  return [
    '',
    `## ${part.title}`,
    '',
    part.about,
    ...part.groups.flatMap(({ work, rows }) => [
      '',
      `### ${work}`,
      '',
      `${rows.length === 1 ? 'One figure' : `${rows.length} figures`}; worst deviation ${worst(rows)}.`,
      '',
      '| where | what | given | printed | deviation | of tolerance |',
      '| --- | --- | --- | ---: | ---: | ---: |',
      ...rows.map((row) => rowLine(row)),
    ]),
  ]
}

function worst(rows: readonly Row[]): string {
  const sizes = rows.flatMap(({ deviation }) => (deviation === null ? [] : [Math.abs(deviation)]))
  return sizes.length > 0
    ? percent(Math.max(...sizes))
    : 'none in per cent, the figure being nought'
}

function rowLine({
  where,
  what,
  given,
  printed,
  deviation,
  ofTolerance,
}: Group['rows'][number]): string {
  const cells = [
    where,
    what,
    given,
    printed,
    deviation === null ? '' : percent(deviation),
    ofTolerance === null ? 'no number' : rounded(ofTolerance, 1),
  ]
  return `| ${cells.map((cell) => cell.replaceAll('|', '\\|')).join(' | ')} |`
}

const percent = (fraction: number): string => `${rounded(100 * fraction, 2)} %`

/** Keeps a figure that lies on the edge between two roundings from falling by its last bit, as machines differ there. */
const EDGE = 1e-6

function rounded(value: number, digits: number): string {
  const unit = 10 ** digits
  const size = Math.round(Math.abs(value) * unit + EDGE) / unit
  return `${value < 0 && size > 0 ? '−' : ''}${size.toFixed(digits)}`
}
