import { describe, expect, test } from 'vitest'
import {
  inkOn,
  oklab,
  type Rgb,
  temperatureAnchors,
  temperatureColour,
  temperatureRgb,
} from '#ui/components/temperature-colour.ts'

const airC = 20
const rgbAt = (aboveAirK: number) => temperatureRgb(airC + aboveAirK, airC)

test('the four colours of the design stand where they should, exactly', () => {
  expect(temperatureAnchors.map(({ aboveAirK }) => rgbAt(aboveAirK))).toEqual([
    [43, 98, 138],
    [236, 229, 214],
    [226, 150, 74],
    [160, 38, 20],
  ])
})

test('beyond the ends the end colour stays', () => {
  expect(temperatureColour(-200, airC)).toBe('rgb(43,98,138)')
  expect(temperatureColour(900, airC)).toBe('rgb(160,38,20)')
})

test('the scale moves with the air', () => {
  expect(temperatureRgb(95, 35)).toEqual(temperatureRgb(80, 20))
})

test('lightness falls away from the air on both sides, without a step back', () => {
  const lightness = (aboveAirK: number) => oklab(rgbAt(aboveAirK))[0]
  for (let distanceK = 5; distanceK <= 180; distanceK += 5) {
    expect(lightness(distanceK)).toBeLessThan(lightness(distanceK - 5))
  }
  for (let distanceK = 5; distanceK <= 40; distanceK += 5) {
    expect(lightness(-distanceK)).toBeLessThan(lightness(5 - distanceK))
  }
})

test('ink is dark on pale grounds and light on deep ones', () => {
  expect([-40, 0, 60, 180].map((aboveAirK) => inkOn(rgbAt(aboveAirK)))).toEqual([
    'light',
    'dark',
    'dark',
    'light',
  ])
})

// WCAG 2.2, 1.4.3 and its definitions of contrast ratio and relative luminance.
test('black or white ink reads at 4.5:1 on every colour of the scale', () => {
  for (let aboveAirK = -40; aboveAirK <= 180; aboveAirK += 1) {
    const colour = rgbAt(aboveAirK)
    const [red = 0, green = 0, blue = 0] = colour.map((channel) => {
      const value = channel / 255
      return value <= 0.04045 ? value / 12.92 : ((value + 0.055) / 1.055) ** 2.4
    })
    const luminance = 0.2126 * red + 0.7152 * green + 0.0722 * blue
    const contrast =
      inkOn(colour) === 'light' ? 1.05 / (luminance + 0.05) : (luminance + 0.05) / 0.05
    expect(contrast).toBeGreaterThanOrEqual(4.5)
  }
})

// Ottosson (2020), table of test pairs: white is (1.000, 0.000, 0.000).
test('white is lightness 1 without hue', () => {
  const [lightness, a, b] = oklab([255, 255, 255])
  expect(lightness).toBeCloseTo(1, 3)
  expect(a).toBeCloseTo(0, 3)
  expect(b).toBeCloseTo(0, 3)
})

/**
 * Full loss of one cone type, on linear sRGB: G. M. Machado, M. M. Oliveira, L. A. F. Fernandes, "A physiologically-based
 * model for simulation of color vision deficiency", IEEE TVCG 15 (2009) 1291-1298, table of matrices, severity 1.0.
 */
const deficiencies: Readonly<Record<string, readonly (readonly [number, number, number])[]>> = {
  protan: [
    [0.152286, 1.052583, -0.204868],
    [0.114503, 0.786281, 0.099216],
    [-0.003882, -0.048116, 1.051998],
  ],
  deutan: [
    [0.367322, 0.860646, -0.227968],
    [0.280085, 0.672501, 0.047413],
    [-0.01182, 0.04294, 0.968881],
  ],
  tritan: [
    [1.255528, -0.076749, -0.178779],
    [-0.078411, 0.930809, 0.147602],
    [0.004733, 0.691367, 0.3039],
  ],
}

function seenBy(matrix: readonly (readonly [number, number, number])[], colour: Rgb): Rgb {
  const linear = colour.map((channel) => {
    const value = channel / 255
    return value <= 0.04045 ? value / 12.92 : ((value + 0.055) / 1.055) ** 2.4
  })
  const [red = 0, green = 0, blue = 0] = matrix.map((row) => {
    const value = Math.min(
      1,
      Math.max(
        0,
        row.reduce((sum, factor, at) => sum + factor * (linear[at] ?? 0), 0),
      ),
    )
    return 255 * (value <= 0.0031308 ? value * 12.92 : 1.055 * value ** (1 / 2.4) - 0.055)
  })
  return [red, green, blue]
}

/** Distance in OKLab; 0.02 is just noticeable (CSS Color 4, "deltaEOK", as used in its gamut mapping). */
function differenceOK(one: Rgb, other: Rgb): number {
  const [p, q] = [oklab(one), oklab(other)]
  return Math.hypot(p[0] - q[0], p[1] - q[1], p[2] - q[2])
}

describe.each(Object.entries(deficiencies))('%s colour vision', (_name, matrix) => {
  const seen = (aboveAirK: number) => seenBy(matrix, rgbAt(aboveAirK))

  test('tells the four anchors apart by at least five just noticeable differences', () => {
    const colours = temperatureAnchors.map(({ aboveAirK }) => seen(aboveAirK))
    const distances = colours.flatMap((one, at) =>
      colours.slice(at + 1).map((other) => differenceOK(one, other)),
    )
    expect(Math.min(...distances)).toBeGreaterThan(0.1)
  })

  test('tells cold from warm at the same distance from the air', () => {
    for (const distanceK of [10, 20, 40]) {
      expect(differenceOK(seen(-distanceK), seen(distanceK))).toBeGreaterThan(0.05)
    }
  })

  test('sees every step of 20 K up to the hot end', () => {
    for (let aboveAirK = -40; aboveAirK < 180; aboveAirK += 20) {
      expect(differenceOK(seen(aboveAirK), seen(aboveAirK + 20))).toBeGreaterThan(0.02)
    }
  })
})
