/** Line charts on a canvas, in the colours of the theme: drawn again when data, theme or motion setting change. */
import {
  Chart,
  type ChartConfiguration,
  type ChartDataset,
  LinearScale,
  LineController,
  LineElement,
  type Plugin,
  PointElement,
  type ScaleOptions,
  Tooltip,
} from 'chart.js'
import type { Attachment } from 'svelte/attachments'
import { formatNumber } from '#units/format.ts'
import { prefersStillness, themeColour } from './theme.svelte.ts'

Chart.register(LineController, LineElement, LinearScale, PointElement, Tooltip)

/** Colours of the theme a line may take. */
export type LineColour = '--ink' | '--act' | '--soft' | '--chart-heat' | '--chart-lagging'

export interface Series {
  readonly name: string
  readonly colour: LineColour
  /** Lengths of dash and gap; none is a full line. */
  readonly dash: readonly number[]
  readonly axis: 'left' | 'right'
  /** One value for each of `xs`. */
  readonly values: readonly number[]
  readonly format: (value: number) => string
}

export interface LineChartData {
  readonly xs: readonly number[]
  readonly xTitle: string
  readonly formatX: (x: number) => string
  readonly leftTitle: string
  /** Null where there is one axis only. */
  readonly rightTitle: string | null
  /** Whether the left axis starts at nought. */
  readonly startsAtZero: boolean
  readonly series: readonly Series[]
  /** Index of the point that is marked. */
  readonly marked: number | null
}

type Point = { x: number; y: number }
type LineChart = Chart<'line', Point[]>

/** `{@attach lineChart(() => data)}` on a canvas. */
export function lineChart(read: () => LineChartData): Attachment<HTMLCanvasElement> {
  return (canvas) => {
    const chart: LineChart = new Chart(
      canvas,
      configuration(canvas, () => read().marked),
    )
    $effect(() => {
      const data = read()
      chart.data.datasets = data.series.map((series) => dataset(series, data, canvas))
      chart.options = options(data, canvas)
      chart.update()
    })
    // Text drawn before the bundled font has arrived would keep the stand-in.
    void document.fonts.ready.then(() => chart.update('none'))
    return () => chart.destroy()
  }
}

function configuration(
  canvas: HTMLCanvasElement,
  marked: () => number | null,
): ChartConfiguration<'line', Point[]> {
  return { type: 'line', data: { datasets: [] }, plugins: [uprightAtMarked(canvas, marked)] }
}

/** An upright through the marked point, as on the ladder. */
function uprightAtMarked(canvas: HTMLCanvasElement, marked: () => number | null): Plugin<'line'> {
  return {
    id: 'upright',
    beforeDatasetsDraw({ ctx, chartArea, data, scales }) {
      const points = data.datasets[0]?.data as Point[] | undefined
      const point = points?.[marked() ?? -1]
      const x = point && scales.x?.getPixelForValue(point.x)
      if (x === undefined) return
      ctx.save()
      ctx.strokeStyle = themeColour(canvas, '--act')
      ctx.lineWidth = 2
      ctx.beginPath()
      ctx.moveTo(x, chartArea.top)
      ctx.lineTo(x, chartArea.bottom)
      ctx.stroke()
      ctx.restore()
    },
  }
}

function dataset(
  series: Series,
  { xs, marked }: LineChartData,
  canvas: HTMLCanvasElement,
): ChartDataset<'line', Point[]> {
  const colour = themeColour(canvas, series.colour)
  const sheet = themeColour(canvas, '--sheet')
  const isMarked = (at: number) => at === marked
  return {
    label: series.name,
    data: xs.map((x, at) => ({ x, y: series.values[at] ?? Number.NaN })),
    yAxisID: series.axis,
    borderColor: colour,
    borderDash: [...series.dash],
    borderWidth: 1.75,
    pointRadius: xs.map((_, at) => (isMarked(at) ? 5 : xs.length > 14 ? 1.75 : 2.5)),
    pointHoverRadius: 5,
    pointBorderWidth: 1.5,
    pointBorderColor: colour,
    pointBackgroundColor: xs.map((_, at) => (isMarked(at) ? colour : sheet)),
  }
}

function options(data: LineChartData, canvas: HTMLCanvasElement): LineChart['options'] {
  const ink = themeColour(canvas, '--ink')
  const font = { family: getComputedStyle(canvas).fontFamily, size: 11.5 }
  const axis = axisOptions({
    soft: themeColour(canvas, '--soft'),
    hair: themeColour(canvas, '--hair'),
    font,
  })
  return {
    maintainAspectRatio: false,
    animation: prefersStillness() ? false : { duration: 140, easing: 'easeOutQuad' },
    interaction: { mode: 'index', intersect: false },
    layout: { padding: { top: 6 } },
    scales: {
      x: { ...axis(data.xTitle), type: 'linear', grid: { display: false } },
      left: { ...axis(data.leftTitle), position: 'left', beginAtZero: data.startsAtZero },
      ...(data.rightTitle === null
        ? {}
        : { right: { ...axis(data.rightTitle), position: 'right', grid: { display: false } } }),
    },
    plugins: {
      tooltip: {
        backgroundColor: ink,
        titleColor: themeColour(canvas, '--sheet'),
        bodyColor: themeColour(canvas, '--sheet'),
        titleFont: { ...font, weight: 650 },
        bodyFont: font,
        displayColors: false,
        cornerRadius: 4,
        callbacks: {
          title: ([item]) => (item ? data.formatX(item.parsed.x ?? 0) : ''),
          label: ({ datasetIndex, parsed }) => {
            const series = data.series[datasetIndex]
            return series ? `${series.name} ${series.format(parsed.y ?? 0)}` : ''
          },
        },
      },
    },
  }
}

function axisOptions(look: { soft: string; hair: string; font: { family: string; size: number } }) {
  return (title: string): ScaleOptions<'linear'> => ({
    title: { display: true, text: title, color: look.soft, font: look.font, padding: 2 },
    ticks: { color: look.soft, font: look.font, maxTicksLimit: 6, padding: 4, callback: tickWords },
    border: { color: look.hair },
    grid: { color: look.hair, tickLength: 0 },
  })
}

/** Whole numbers plain, others with the decimals they need. */
function tickWords(value: number | string): string {
  const exact = Number(Number(value).toPrecision(6))
  return formatNumber(exact, String(Math.abs(exact)).split('.')[1]?.length ?? 0)
}
