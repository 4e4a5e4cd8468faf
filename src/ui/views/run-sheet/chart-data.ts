/** Rungs as the lines of the two charts. */
import type { Rating } from '#sizing/result.ts'
import type { LineChartData, Series } from '#ui/components/line-chart.svelte.ts'
import { formatNumber, shownValue, thicknessDecimals, unitLabel } from '#units/format.ts'
import { displayUnit, type QuantityName, type UnitSystem } from '#units/quantities.ts'
import { costQuantity, lossOf, lossQuantity, type Per } from './per.ts'

interface Ladder {
  readonly ladder: readonly Rating[]
  readonly chosen: number | null
  readonly units: UnitSystem
}
type Line = Pick<Series, 'name' | 'colour' | 'dash'> & {
  readonly of: (rung: Rating) => number | undefined
}

/** Cost against thickness: what it costs to own, to install, and to feed. */
export function costChart(input: Ladder, per: Per, currency: string): LineChartData {
  const quantity = costQuantity[per]
  const lines: Line[] = [
    { name: 'Life-cycle', colour: '--ink', dash: [], of: ({ money }) => money?.lifeCycle },
    {
      name: 'Installed',
      colour: '--chart-lagging',
      dash: [5, 3],
      of: ({ money }) => money?.installed,
    },
    {
      name: 'Energy a year',
      colour: '--chart-heat',
      dash: [1.5, 3],
      of: ({ money }) => money?.energyPerYear,
    },
  ]
  return {
    ...thicknessAxis(input),
    leftTitle: [currency, unitLabel(quantity, input.units)].filter((word) => word !== '').join(' '),
    rightTitle: null,
    startsAtZero: true,
    series: lines.map((line) => ({ ...drawn(line, quantity, input), axis: 'left' })),
  }
}

/** Loss on the left axis, surface temperatures on the right. */
export function lossChart(input: Ladder, per: Per): LineChartData {
  const { ladder, units } = input
  const loss = lossQuantity[per]
  const lossLine: Line = {
    name: 'Loss',
    colour: '--ink',
    dash: [],
    of: (rung) => lossOf(rung) ?? undefined,
  }
  const surfaces: Line[] = [
    {
      name: 'Surface, mean',
      colour: '--chart-heat',
      dash: [5, 3],
      of: (rung) => rung.surfaceTempC,
    },
    {
      name: 'Surface, hot day',
      colour: '--chart-heat',
      dash: [1.5, 3],
      of: (rung) => rung.touchSurfaceC,
    },
  ]
  return {
    ...thicknessAxis(input),
    leftTitle: `Loss, ${unitLabel(loss, units)}`,
    rightTitle: `Surface, ${unitLabel('temperature', units)}`,
    startsAtZero: ladder.every((rung) => rung.heatFluxWPerM2 >= 0),
    series: [
      { ...drawn(lossLine, loss, input), axis: 'left' },
      ...surfaces.map((line) => ({ ...drawn(line, 'temperature', input), axis: 'right' as const })),
    ],
  }
}

function thicknessAxis({ ladder, chosen, units }: Ladder) {
  const thicknessesM = ladder.map(({ thicknessM }) => thicknessM)
  const label = unitLabel('thickness', units)
  const decimals = thicknessDecimals(thicknessesM, units)
  return {
    xs: thicknessesM.map((thicknessM) => shownValue(thicknessM, 'thickness', units) ?? 0),
    xTitle: `Thickness, ${label}`,
    formatX: (x: number) => `${formatNumber(x, units === 'us' ? 2 : decimals)} ${label}`,
    marked: chosen,
  }
}

function drawn({ of, ...line }: Line, quantity: QuantityName, { ladder, units }: Ladder) {
  return {
    ...line,
    values: ladder.map((rung) => shownValue(of(rung), quantity, units) ?? Number.NaN),
    format: (shown: number) => shownWithUnit(shown, quantity, units),
  }
}

/** A value already in its shown unit. */
function shownWithUnit(shown: number, quantity: QuantityName, units: UnitSystem): string {
  return `${formatNumber(shown, displayUnit(quantity, units).decimals)} ${unitLabel(quantity, units)}`
}
