/** The run sheet with the demo's own results: what it says, how it is walked, and that it keeps quiet on the console. */
import { afterEach, beforeEach, describe, expect, inject, test, vi } from 'vitest'
import { page, userEvent } from 'vitest/browser'
import { render } from 'vitest-browser-svelte'
import '#ui/theme.css'
import type { RunValues } from '#model/fields.ts'
import { detailRun, indexCatalogue, sizeRun } from '#model/size-run.ts'
import type { RunResult } from '#sizing/result.ts'
import RunSheet from '#ui/views/run-sheet/RunSheet.svelte'

const catalogue = inject('demoCatalogue')
const index = indexCatalogue(catalogue)

function demoRun(tag: string): RunValues {
  const run = inject('demoRuns').find((values) => values.tag === tag)
  if (!run) throw new Error(`The demo has no run ${tag}`)
  return run
}

function sheetOf(values: RunValues, more: object = {}) {
  return {
    values,
    outcome: sizeRun(values, {}, index),
    detail: detailRun(values, {}, index),
    airC: values.airC ?? 20,
    units: 'si' as const,
    catalogue,
    onoverride: () => undefined,
    ...more,
  }
}

function resultOf(values: RunValues): RunResult {
  const outcome = sizeRun(values, {}, index)
  if (!outcome.ok) throw new Error('The demo run cannot be sized')
  return outcome.result
}

const complaints: unknown[] = []
beforeEach(() => {
  complaints.length = 0
  vi.spyOn(console, 'error').mockImplementation((...words) => void complaints.push(words))
  vi.spyOn(console, 'warn').mockImplementation((...words) => void complaints.push(words))
})
afterEach(() => {
  vi.restoreAllMocks()
  expect(complaints).toEqual([])
})

const ladder = page.getByRole('slider', { name: 'Ladder of thicknesses' })

describe('every run of the demo', () => {
  test.each(inject('demoRuns').map((values) => [values.tag ?? '', values] as const))(
    '%s is shown',
    async (tag, values) => {
      await render(RunSheet, sheetOf(values))
      await expect.element(page.getByRole('heading', { level: 2 })).toHaveTextContent(tag)
      await expect.element(page.getByRole('img', { name: /^Section to scale/ })).toBeVisible()
      expect(document.body.textContent).not.toMatch(/NaN|undefined|null|Infinity/)
    },
  )
})

describe('a sized run', () => {
  const values = demoRun('ST-104')
  const result = resultOf(values)
  const chosenMm = ((result.chosen?.thicknessM ?? 0) * 1000).toFixed(0)

  test('says its thickness, its reason and its limits', async () => {
    await render(RunSheet, sheetOf(values))
    await expect.element(page.getByText('Cost decides.')).toBeVisible()
    await expect
      .element(page.getByRole('table', { name: 'Limits at this thickness' }))
      .toHaveTextContent('passes')
    expect(document.querySelector('.hero')?.textContent).toContain(chosenMm)
  })

  test('is walked with the arrow keys, and fixed with Enter', async () => {
    const onoverride = vi.fn()
    await render(RunSheet, sheetOf(values, { onoverride }))
    const at = result.ladder.findIndex((rung) => rung.thicknessM === result.chosen?.thicknessM)
    const thinner = result.ladder[at - 1]
    ladder.element().focus()
    await expect
      .element(ladder)
      .toHaveAttribute('aria-valuetext', expect.stringContaining('chosen'))
    await userEvent.keyboard('{ArrowLeft}')
    await expect.element(ladder).toHaveAttribute('aria-valuenow', String(at))
    await expect.element(page.getByText(/instead of/)).toBeVisible()
    await userEvent.keyboard('{Enter}')
    expect(onoverride).toHaveBeenCalledExactlyOnceWith(thinner?.thicknessM)
    await userEvent.keyboard('{Escape}')
    await expect.element(ladder).toHaveAttribute('aria-valuenow', String(at + 1))
  })

  test('follows the pointer and offers the rung that was clicked', async () => {
    const onoverride = vi.fn()
    await render(RunSheet, sheetOf(values, { onoverride }))
    await userEvent.click(ladder, { position: { x: 75, y: 60 } })
    await page.getByRole('button', { name: /^Use / }).click()
    expect(onoverride).toHaveBeenCalledExactlyOnceWith(result.ladder[0]?.thicknessM)
  })

  test('shows the failed limit of a rung that is too thin', async () => {
    await render(RunSheet, sheetOf(values))
    ladder.element().focus()
    await userEvent.keyboard('{Home}')
    await expect
      .element(ladder)
      .toHaveAttribute('aria-valuetext', expect.stringContaining('fails Touch'))
    await expect
      .element(page.getByRole('table', { name: 'Limits at this thickness' }))
      .toHaveTextContent('fails')
  })

  test('has tabs for table, cost, loss and notes, each with its own content', async () => {
    await render(RunSheet, sheetOf(values))
    await expect.element(page.getByRole('table', { name: /^The ladder/ })).toBeVisible()
    await page.getByRole('tab', { name: 'Cost' }).click()
    await expect
      .element(page.getByRole('figure', { name: /^Cost against thickness/ }))
      .toBeVisible()
    await page.getByText('The same as a table').click()
    const rows = page.getByRole('figure').getByRole('row')
    expect(rows.elements()).toHaveLength(result.ladder.length + 1)
    await page.getByRole('tab', { name: 'Loss' }).click()
    await expect.element(page.getByRole('figure', { name: /^Heat loss and surface/ })).toBeVisible()
    await page.getByRole('tab', { name: /^Notes/ }).click()
    expect(page.getByRole('tabpanel').getByRole('listitem').elements()).toHaveLength(
      result.notes.length,
    )
  })

  test('is said in US units throughout', async () => {
    await render(RunSheet, sheetOf(values, { units: 'us' }))
    await expect.element(page.getByText(/Btu\/h·ft²°F/)).toBeVisible()
    const text = document.querySelector('article')?.textContent ?? ''
    expect(text).not.toMatch(/\d[\s\u00a0](mm|W\/m|°C)/)
  })
})

test('a chart is drawn again when the theme changes', async () => {
  await render(RunSheet, sheetOf(demoRun('ST-104')))
  document.documentElement.dataset.theme = 'light'
  await page.getByRole('tab', { name: 'Cost' }).click()
  const canvas = document.querySelector('canvas')
  const light = await settled(canvas)
  document.documentElement.dataset.theme = 'dark'
  const dark = await settled(canvas)
  delete document.documentElement.dataset.theme
  expect(dark).not.toBe(light)
})

/** The picture once two looks at it, 100 ms apart, are the same. */
async function settled(canvas: HTMLCanvasElement | null): Promise<string> {
  let before = ''
  await expect
    .poll(
      () => {
        const now = canvas?.toDataURL() ?? ''
        const isStill = now === before
        before = now
        return isStill
      },
      { interval: 100 },
    )
    .toBe(true)
  return before
}

describe('special cases', () => {
  test('no run: says what to do and offers it', async () => {
    const onaddrun = vi.fn()
    await render(RunSheet, { ...sheetOf(demoRun('ST-104')), values: null, outcome: null, onaddrun })
    await page.getByRole('button', { name: 'Add a run' }).click()
    expect(onaddrun).toHaveBeenCalledOnce()
  })

  test('a run with problems: names each cell and goes there', async () => {
    const onmend = vi.fn()
    await render(RunSheet, sheetOf({ ...demoRun('ST-104'), size: 'DN 81' }, { onmend }))
    await expect.element(page.getByText('DN 81', { exact: true })).toBeVisible()
    await page.getByRole('button', { name: 'Go to Size' }).click()
    expect(onmend).toHaveBeenCalledExactlyOnceWith('size')
    await expect.element(ladder).not.toBeInTheDocument()
  })

  test('a bare run: says so and draws no ladder', async () => {
    await render(RunSheet, sheetOf(demoRun('ST-110')))
    await expect.element(page.getByText('Bare', { exact: true })).toBeVisible()
    await expect.element(ladder).not.toBeInTheDocument()
  })

  test('nothing passes: says so, with the thickest rung', async () => {
    await render(RunSheet, sheetOf(demoRun('GL-322')))
    await expect.element(page.getByText('No thickness passes', { exact: true })).toBeVisible()
    await expect.element(page.getByText(/fails on every thickness/)).toBeInTheDocument()
  })

  test('a fixed thickness can be given back', async () => {
    const onrelease = vi.fn()
    await render(RunSheet, sheetOf(demoRun('ST-106'), { onrelease }))
    await page.getByRole('button', { name: 'Let it be sized again' }).click()
    expect(onrelease).toHaveBeenCalledOnce()
  })

  test('a fixed thickness keeps the ladder of what it could be instead', async () => {
    const values = { ...demoRun('ST-104'), thicknessM: 0.033 }
    await render(RunSheet, sheetOf(values))
    await expect.element(page.getByText('Fixed at 33\u00a0mm.')).toBeVisible()
    await expect
      .element(ladder)
      .toHaveAttribute('aria-valuetext', expect.stringMatching(/^33\u00a0mm, chosen/))
    const others = resultOf(demoRun('ST-104')).ladder.length
    await expect.element(ladder).toHaveAttribute('aria-valuemax', String(others + 1))
  })

  test('a measured surface: what it says, how far it may be off, and what sound lagging would show', async () => {
    const values = demoRun('ST-106')
    await render(RunSheet, sheetOf(values))
    const found = page.getByRole('table', { name: 'As measured' })
    const survey = resultOf(values).survey
    await expect
      .element(found.getByRole('row', { name: /^Surface, measured/ }))
      .toHaveTextContent('58.0')
    await expect.element(found.getByRole('row', { name: /^Heat flux/ })).toHaveTextContent('±')
    await expect
      .element(found.getByRole('row', { name: /^Conducts/ }))
      .toHaveTextContent(`${survey?.soundWPerMK?.toFixed(3)} W/mK if sound`)
  })

  test('a vessel: loss and cost are those of the whole', async () => {
    await render(
      RunSheet,
      sheetOf({ ...demoRun('MS-611'), fuel: 'electricity', hoursPerYear: 8000 }),
    )
    await expect.element(page.getByText(/vessel, shell 4.2/)).toBeVisible()
    await expect.element(page.getByRole('img', { name: /^Section to scale: vessel/ })).toBeVisible()
    await expect.element(page.getByText(/Life-cycle cost, each/)).toBeInTheDocument()
    await expect.element(page.getByRole('columnheader', { name: /^Loss\s*W$/ })).toBeVisible()
  })

  test('a buried run: the ground over it, and no hot day', async () => {
    await render(RunSheet, sheetOf(demoRun('LH-414')))
    await expect
      .element(page.getByRole('img', { name: /buried, 0\.80\sm to the axis/ }))
      .toBeVisible()
    await expect.element(page.getByText('Surface, hot day')).not.toBeInTheDocument()
    await expect.element(page.getByText('Arrives at')).toBeVisible()
    await expect
      .element(page.getByRole('table', { name: 'Limits at this thickness' }))
      .toHaveTextContent(/Arrival[\s\S]*at most 1\sK/)
  })

  test('frost: hours to freeze, and that lagging only delays it', async () => {
    await render(RunSheet, sheetOf(demoRun('CW-433')))
    await expect.element(page.getByText('Time to freeze')).toBeVisible()
    await expect
      .element(page.getByRole('table', { name: 'Limits at this thickness' }))
      .toHaveTextContent(/Frost[\s\S]*at least 8\sh/)
    await expect.element(page.getByText(/delays freezing/)).toBeVisible()
  })

  test('fittings and the steam that condenses', async () => {
    await render(RunSheet, sheetOf(demoRun('ST-101')))
    await expect.element(page.getByText('Of it, fittings')).toBeVisible()
    await expect.element(page.getByText(/\d\skg\/h$/)).toBeVisible()
  })

  test('what moves the answer, by keyboard: a line for each end of each range', async () => {
    const values = demoRun('ST-104')
    await render(RunSheet, sheetOf(values))
    page.getByRole('tab', { name: 'Ladder' }).element().focus()
    await userEvent.keyboard('{ArrowRight}{ArrowRight}{ArrowRight}')
    const table = page.getByRole('table', { name: 'What moves the answer' })
    await expect.element(table).toBeVisible()
    const ends = detailRun(values, {}, index)?.sensitivity.flatMap((one) => one.ends) ?? []
    expect(table.getByRole('row').elements()).toHaveLength(ends.length + 1)
    await expect.element(table.getByRole('rowheader', { name: 'Conductivity' })).toBeVisible()
  })

  test('an answer on its way is said to be so', async () => {
    await render(RunSheet, { ...sheetOf(demoRun('ST-104')), outcome: null })
    await expect.element(page.getByRole('status')).toBeVisible()
  })
})
