/** The columns of a table of losses, with the totals under them. */
import { gainsHeat, type RunLoss } from '#model/run-loss.ts'
import type { YearlyLoss } from '#model/yearly-loss.ts'
import { inchName } from '#sizing/words.ts'
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
import type { LossLine } from './loss-csv.ts'
import { sizeWords } from './run-words.ts'
import type { TextColumn } from './text-table.ts'

/** Which runs each line of totals adds up. */
interface Group {
  readonly title: string
  readonly holds: (loss: RunLoss) => boolean
}

function groupsOf(losses: readonly RunLoss[]): readonly Group[] {
  const groups: readonly Group[] = [
    { title: 'Total lost', holds: (loss) => !gainsHeat(loss) },
    { title: 'Total gained', holds: gainsHeat },
  ]
  const there = groups.filter(({ holds }) => losses.some(holds))
  return there.length === 1 ? there.map((group) => ({ ...group, title: 'Total' })) : there
}

export function lossColumns(lines: readonly LossLine[], units: UnitSystem): readonly TextColumn[] {
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
      losses.map(({ built }) => built),
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
    ...(losses.some(hasMeanOfItsOwn)
      ? [
          summed(`Bare ${power}, mean of year`, 'power', ({ bare }) => bare.yearlyMeanLossW),
          summed(`Built ${power}, mean of year`, 'power', ({ asBuilt }) => asBuilt.yearlyMeanLossW),
        ]
      : []),
    summed('Bare kWh/yr', 'energy', ({ bare }) => bare.heatKWh),
    summed('Built kWh/yr', 'energy', ({ asBuilt }) => asBuilt.heatKWh),
    summed('Saved kWh/yr', 'energy', ({ saved }) => saved.heatKWh),
    ...(hasFuel ? moneyColumns(losses, summed) : []),
    ...(hasCo2
      ? [
          summed(
            `Built CO2 ${unitLabel('mass', units)}/yr`,
            'mass',
            ({ asBuilt }) => asBuilt.co2Kg,
          ),
          summed(`Saved CO2 ${unitLabel('mass', units)}/yr`, 'mass', ({ saved }) => saved.co2Kg),
        ]
      : []),
  ]
}

/** Months, or sun that brings more than goes out, part the mean of the year from the loss at the loss condition. */
const hasMeanOfItsOwn = ({ bare, asBuilt }: RunLoss): boolean =>
  [bare, asBuilt].some(({ heatLossW, yearlyMeanLossW }) => heatLossW !== yearlyMeanLossW)

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
