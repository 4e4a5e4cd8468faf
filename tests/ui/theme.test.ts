/** Every text colour of the theme can be read on every ground it stands on, in both themes. */
import { readFileSync } from 'node:fs'
import { expect, test } from 'vitest'

const css = readFileSync(new URL('../../src/ui/theme.css', import.meta.url), 'utf8')

const tokens = new Map(
  [...css.matchAll(/--([\w-]+): light-dark\((#[0-9a-f]{6}), (#[0-9a-f]{6})\)/g)].map(
    ([, name, light, dark]) => [name, { light, dark }],
  ),
)

type Theme = 'light' | 'dark'

/** WCAG 2.2, definition of relative luminance, https://www.w3.org/TR/WCAG22/#dfn-relative-luminance */
function relativeLuminance(hex: string): number {
  const [red = 0, green = 0, blue = 0] = [1, 3, 5].map((at) => {
    const channel = Number.parseInt(hex.slice(at, at + 2), 16) / 255
    return channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4
  })
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue
}

/** WCAG 2.2, definition of contrast ratio. */
function contrastRatio(one: string, other: string): number {
  const [dark = 0, light = 0] = [relativeLuminance(one), relativeLuminance(other)].sort(
    (a, b) => a - b,
  )
  return (light + 0.05) / (dark + 0.05)
}

function colour(name: string, theme: Theme): string {
  const value = tokens.get(name)?.[theme]
  if (!value) throw new Error(`theme.css has no colour --${name}`)
  return value
}

const grounds = ['paper', 'sheet', 'act-ground']
const textPairs: readonly (readonly [string, string])[] = [
  ...['ink', 'soft', 'act', 'fail', 'heed'].flatMap((text) =>
    grounds.map((ground) => [text, ground] as const),
  ),
  ['pass', 'pass-ground'],
  ['pass', 'sheet'],
  ['pass', 'paper'],
  ['ink', 'pass-ground'],
  ['fail', 'fail-ground'],
  ['ink', 'fail-ground'],
  ['heed', 'heed-ground'],
  ['ink', 'heed-ground'],
  ['on-act', 'act'],
]
const drawnPairs: readonly (readonly [string, string])[] = [
  'edge',
  'chart-heat',
  'chart-lagging',
].flatMap((mark) => ['paper', 'sheet'].map((ground) => [mark, ground] as const))

for (const theme of ['light', 'dark'] as const) {
  // WCAG 2.2, 1.4.3: at least 4.5:1 for text.
  test.each(textPairs)(`${theme}: text %s on %s reads at 4.5:1`, (text, ground) => {
    expect(contrastRatio(colour(text, theme), colour(ground, theme))).toBeGreaterThanOrEqual(4.5)
  })

  // WCAG 2.2, 1.4.11: at least 3:1 for what is drawn.
  test.each(drawnPairs)(`${theme}: %s drawn on %s is seen at 3:1`, (mark, ground) => {
    expect(contrastRatio(colour(mark, theme), colour(ground, theme))).toBeGreaterThanOrEqual(3)
  })
}
