/**
 * The colour of a temperature: a diverging scale centred on the air of the place, so that what loses heat is warm and
 * what gains it is cold. Straight lines in OKLab between four anchors; beyond the ends the end colour stays.
 */

/** Red, green, blue, 0 to 255. */
export type Rgb = readonly [red: number, green: number, blue: number]
type Triple = readonly [number, number, number]

/** Distance from the air [K] and the colour there. */
export const temperatureAnchors: readonly { readonly aboveAirK: number; readonly colour: Rgb }[] = [
  { aboveAirK: -40, colour: [43, 98, 138] },
  { aboveAirK: 0, colour: [236, 229, 214] },
  { aboveAirK: 60, colour: [226, 150, 74] },
  { aboveAirK: 180, colour: [160, 38, 20] },
]

/** The colour of a temperature beside air of `airC`, as CSS writes it. */
export function temperatureColour(tempC: number, airC: number): string {
  const [red, green, blue] = temperatureRgb(tempC, airC)
  return `rgb(${red},${green},${blue})`
}

export function temperatureRgb(tempC: number, airC: number): Rgb {
  const aboveAirK = tempC - airC
  const upper = temperatureAnchors.findIndex((anchor) => aboveAirK <= anchor.aboveAirK)
  const above = temperatureAnchors.at(upper)
  const below = temperatureAnchors[upper - 1]
  if (!above) throw new Error('The temperature scale has no anchors')
  if (!below || upper < 0) return above.colour
  return mixed(
    below.colour,
    above.colour,
    (aboveAirK - below.aboveAirK) / (above.aboveAirK - below.aboveAirK),
  )
}

/** Dark or light ink, whichever reads better on this ground: the one with the higher contrast. */
export function inkOn([red, green, blue]: Rgb): 'dark' | 'light' {
  const [r, g, b] = [red, green, blue].map(linear) as unknown as Triple
  const luminance = 0.2126 * r + 0.7152 * g + 0.0722 * b
  // Contrast against black equals that against white at 0.179 (WCAG 2.2, contrast ratio: (L + 0.05) / 0.05 = 1.05 / (L + 0.05)).
  return luminance > 0.179 ? 'dark' : 'light'
}

function mixed(from: Rgb, to: Rgb, share: number): Rgb {
  const start = oklab(from)
  const end = oklab(to)
  const between = (at: 0 | 1 | 2) => start[at] + (end[at] - start[at]) * share
  return rgbOf([between(0), between(1), between(2)])
}

// OKLab: B. Ottosson, "A perceptual color space for image processing" (2020), conversion from and to linear sRGB.

/** Lightness 0 to 1, and the two opponent axes. */
export function oklab([red, green, blue]: Rgb): Triple {
  const r = linear(red)
  const g = linear(green)
  const b = linear(blue)
  const long = Math.cbrt(0.4122214708 * r + 0.5363325363 * g + 0.0514459929 * b)
  const medium = Math.cbrt(0.2119034982 * r + 0.6806995451 * g + 0.1073969566 * b)
  const short = Math.cbrt(0.0883024619 * r + 0.2817188376 * g + 0.6299787005 * b)
  return [
    0.2104542553 * long + 0.793617785 * medium - 0.0040720468 * short,
    1.9779984951 * long - 2.428592205 * medium + 0.4505937099 * short,
    0.0259040371 * long + 0.7827717662 * medium - 0.808675766 * short,
  ]
}

function rgbOf([lightness, a, b]: Triple): Rgb {
  const long = (lightness + 0.3963377774 * a + 0.2158037573 * b) ** 3
  const medium = (lightness - 0.1055613458 * a - 0.0638541728 * b) ** 3
  const short = (lightness - 0.0894841775 * a - 1.291485548 * b) ** 3
  return [
    encoded(4.0767416621 * long - 3.3077115913 * medium + 0.2309699292 * short),
    encoded(-1.2684380046 * long + 2.6097574011 * medium - 0.3413193965 * short),
    encoded(-0.0041960863 * long - 0.7034186147 * medium + 1.707614701 * short),
  ]
}

// The transfer function of sRGB, IEC 61966-2-1.

function linear(channel: number): number {
  const value = channel / 255
  return value <= 0.04045 ? value / 12.92 : ((value + 0.055) / 1.055) ** 2.4
}

function encoded(value: number): number {
  const channel = value <= 0.0031308 ? value * 12.92 : 1.055 * value ** (1 / 2.4) - 0.055
  return Math.min(255, Math.max(0, Math.round(channel * 255)))
}
