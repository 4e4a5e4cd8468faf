/** The losses of a list for people at a terminal: a line per run, the total under it, notes and cautions. */
import { type LossTotal, totalLoss } from '#model/loss-total.ts'
import type { Built, RunLoss, YearlyLoss } from '#model/run-loss.ts'
import {
  ABSENT,
  formatNumber,
  formatQuantity,
  formatWithUnit,
  shownValue,
  thicknessDecimals,
  unitLabel,
} from '#units/format.ts'
import { displayUnit, type QuantityName, type UnitSystem } from '#units/quantities.ts'
import { restated } from '#units/restate.ts'
import { cautionLines, inParts, noteLines, tagList } from './closing-lines.ts'
import type { LossLine } from './loss-csv.ts'
import { inchName, sizeWords } from './run-words.ts'
import { type TextColumn, textTable } from './text-table.ts'

export interface LossTableOptions {
  readonly units: UnitSystem
  /** Columns of the terminal; null where the text is not for one. */
  readonly width: number | null
}

const builtWords: Readonly<Record<Built, string>> = {
  bare: 'bare',
  fixed: 'fixed',
  chosen: 'chosen',
  thickest: 'thickest',
}

export function writeLossTable(
  lines: Iterable<LossLine>,
  { units, width }: LossTableOptions,
): string {
  const all = [...lines]
  const losses = all.map(({ loss }) => loss)
  const said = losses.map(({ tag, notes }) => ({
    tag,
    notes: notes.map(({ text }) => (units === 'si' ? text : restated(text, units))),
  }))
  return inParts([
    textTable(columnsOf(all, units), width),
    [lossCountWords(totalLoss(losses))],
    noteLines(said),
    cautionLines(),
  ])
}

/** "41 runs in the total. Not in it, without a length: A-1. Heat without a cost, for want of a fuel: A-2." */
export function lossCountWords({ lost, gained, withoutLength, withoutFuel }: LossTotal): string {
  const runs = lost.runs + gained.runs
  const parts = [
    `${runs} ${runs === 1 ? 'run' : 'runs'} in the total, each whole with its fittings.`,
  ]
  if (withoutLength.length > 0)
    parts.push(`Not in it, without a length: ${tagList(withoutLength)}.`)
  if (withoutFuel.length > 0) {
    parts.push(`Without a cost, for want of a fuel: ${tagList(withoutFuel)}.`)
  }
  return parts.join(' ')
}

/** Which runs each line of totals adds up. */
interface Group {
  readonly title: string
  readonly holds: (loss: RunLoss) => boolean
}

const gains = ({ bare }: RunLoss): boolean => (bare.heatLossW ?? 0) < 0

function groupsOf(losses: readonly RunLoss[]): readonly Group[] {
  const groups: readonly Group[] = [
    { title: 'Total lost', holds: (loss) => !gains(loss) },
    { title: 'Total gained', holds: gains },
  ]
  const there = groups.filter(({ holds }) => losses.some(holds))
  return there.length === 1 ? there.map((group) => ({ ...group, title: 'Total' })) : there
}

function columnsOf(lines: readonly LossLine[], units: UnitSystem): readonly TextColumn[] {
  const losses = lines.map(({ loss }) => loss)
  const groups = groupsOf(losses)
  const blank = groups.map(() => '')
  const left = (
    header: string,
    cells: readonly string[],
    totals: readonly string[] = blank,
  ): TextColumn => ({
    header,
    align: 'left',
    cells: [...cells, ...totals],
  })
  const right = (
    header: string,
    cells: readonly string[],
    totals: readonly string[] = blank,
  ): TextColumn => ({
    header,
    align: 'right',
    cells: [...cells, ...totals],
  })
  /** A column whose totals are the sums of what it shows, so that they add up on paper. */
  const summed = (
    header: string,
    quantity: QuantityName,
    figure: (loss: RunLoss) => number | null,
  ): TextColumn => {
    const { decimals } = displayUnit(quantity, units)
    const cells = losses.map((loss) => formatQuantity(figure(loss), quantity, units))
    const totals = groups.map(({ holds }) => {
      const values = losses.filter(holds).flatMap((loss) => figure(loss) ?? [])
      if (values.length === 0) return ABSENT
      const shown = values.map((value) =>
        Number((shownValue(value, quantity, units) ?? 0).toFixed(decimals)),
      )
      return formatNumber(
        shown.reduce((sum, value) => sum + value, 0),
        decimals,
      )
    })
    return right(header, cells, totals)
  }
  const decimals = thicknessDecimals(
    losses.map(({ thicknessM }) => thicknessM),
    units,
  )
  const perMetre = unitLabel('heatLossPerLength', units)
  const power = unitLabel('power', units)
  const soldAs = losses.map(({ nominalThicknessM }) =>
    nominalThicknessM === null ? '' : inchName(nominalThicknessM),
  )
  const hasFuel = losses.some(({ currency }) => currency !== null)
  const hasCo2 = losses.some(({ bare }) => bare.co2Kg !== null)
  return [
    {
      ...left(
        'Tag',
        losses.map(({ tag }) => tag),
        groups.map(({ title }) => title),
      ),
      maxWidth: 24,
    },
    {
      ...left(
        'Size',
        lines.map(({ values }) => sizeWords(values, units)),
      ),
      maxWidth: 18,
    },
    right(
      'Length',
      lines.map((line) => extentWords(line, units)),
    ),
    right(
      `Lagging ${unitLabel('thickness', units)}`,
      losses.map(({ thicknessM }) => formatQuantity(thicknessM, 'thickness', units, decimals)),
    ),
    ...(soldAs.some((name) => name !== '') ? [right('Sold as', soldAs)] : []),
    left(
      'Built',
      losses.map(({ built }) => builtWords[built]),
    ),
    right(
      `Bare ${perMetre}`,
      losses.map(({ bare }) => lossWords(bare, units)),
    ),
    summed(`Bare ${power}`, 'power', ({ bare }) => bare.heatLossW),
    right(
      `Built ${perMetre}`,
      losses.map(({ asBuilt }) => lossWords(asBuilt, units)),
    ),
    summed(`Built ${power}`, 'power', ({ asBuilt }) => asBuilt.heatLossW),
    summed('Bare kWh/yr', 'energy', ({ bare }) => bare.heatKWh),
    summed('Built kWh/yr', 'energy', ({ asBuilt }) => asBuilt.heatKWh),
    summed('Saved kWh/yr', 'energy', ({ saved }) => saved.heatKWh),
    ...(hasFuel ? moneyColumns(losses, summed) : []),
    ...(hasCo2
      ? [
          summed(`Built CO2 ${unitLabel('mass', units)}/yr`, 'mass', ({ asBuilt }) => asBuilt.co2Kg),
          summed(`Saved CO2 ${unitLabel('mass', units)}/yr`, 'mass', ({ saved }) => saved.co2Kg),
        ]
      : []),
  ]
}

/** Costs of one currency each, since they do not add up. */
function moneyColumns(
  losses: readonly RunLoss[],
  summed: (
    header: string,
    quantity: QuantityName,
    figure: (loss: RunLoss) => number | null,
  ) => TextColumn,
): TextColumn[] {
  const currencies = [...new Set(losses.flatMap(({ currency }) => currency ?? []))]
  return currencies.flatMap((currency) => {
    const own = (loss: RunLoss, cost: number | null): number | null =>
      loss.currency === currency ? cost : null
    return [
      summed(`Built ${currency}/yr`, 'money', (loss) => own(loss, loss.asBuilt.cost)),
      summed(`Saved ${currency}/yr`, 'money', (loss) => own(loss, loss.saved.cost)),
    ]
  })
}

/** Loss per metre; where there is none the loss per area, with its unit. */
function lossWords({ heatLossWPerM, heatFluxWPerM2 }: YearlyLoss, units: UnitSystem): string {
  return heatLossWPerM === null
    ? formatWithUnit(heatFluxWPerM2, 'heatFlux', units)
    : formatQuantity(heatLossWPerM, 'heatLossPerLength', units)
}

/** "24.0 m", "26.0 m²"; a sphere or a vessel is one piece. */
function extentWords({ values, loss }: LossLine, units: UnitSystem): string {
  if (loss.bare.heatLossW === null) return ABSENT
  if (values.shape === 'sphere' || values.shape === 'vessel') return 'one'
  if (values.shape === 'flat') {
    const areaM2 = values.areaM2 ?? (values.widthM ?? 0) * (values.heightM ?? 0)
    return formatWithUnit(areaM2, 'area', units)
  }
  return formatWithUnit(values.lengthM ?? values.riseM, 'length', units)
}
