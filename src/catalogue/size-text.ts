/** Reads what people type for a size: `DN 50`, `NPS 1 1/2 sch 80`, `CU 28`, `Ø 250`, `600 x 400`. */
import { neighbours } from './nearest.ts'

export type PipeText =
  | { readonly kind: 'dn'; readonly dn: number }
  | { readonly kind: 'nps'; readonly npsIn: number; readonly schedule: string | null }
  | { readonly kind: 'cu'; readonly outerDiameterMm: number; readonly wallMm: number | null }

export type DuctText =
  | { readonly kind: 'round'; readonly diameterMm: number }
  | { readonly kind: 'rectangular'; readonly widthMm: number; readonly heightMm: number }

const decimal = String.raw`\d+(?:[.,]\d+)?`
const dnForm = /^dn\s*(\d+)$/
const npsForm =
  /^nps\s*(\d+\/\d+|\d+(?:[.,]\d+)?(?:(?:\s*-\s*|\s+)\d+\/\d+)?)\s*(?:"|''|in\b|inch\b)?\s*(.*)$/
const scheduleForm = /^(?:,\s*)?(?:(?:sch|sched|schedule)\.?\s*)?(\d{1,3}s?|std|xs|xxs)$/
const copperForm = new RegExp(String.raw`^cu\s*(${decimal})(?:\s*[x×*]\s*(${decimal}))?(?:\s*mm)?$`)
const roundForm = new RegExp(String.raw`^(?:d|ø|⌀|dia\.?)\s*(${decimal})(?:\s*mm)?$`)
const rectangularForm = new RegExp(String.raw`^(${decimal})\s*[x×*]\s*(${decimal})(?:\s*mm)?$`)

export function readPipeText(text: string): PipeText | null {
  const plain = plainText(text)
  const dn = dnForm.exec(plain)
  if (dn) return { kind: 'dn', dn: Number(dn[1]) }
  const nps = npsForm.exec(plain)
  if (nps) {
    const npsIn = inches(nps[1] ?? '')
    const rest = nps[2] ?? ''
    const schedule = scheduleForm.exec(rest)
    if (rest !== '' && !schedule) return null
    return { kind: 'nps', npsIn, schedule: schedule ? scheduleName(schedule[1] ?? '') : null }
  }
  const copper = copperForm.exec(plain)
  if (copper)
    return {
      kind: 'cu',
      outerDiameterMm: number(copper[1]),
      wallMm: copper[2] === undefined ? null : number(copper[2]),
    }
  return null
}

export function readDuctText(text: string): DuctText | null {
  const plain = plainText(text)
  const round = roundForm.exec(plain)
  if (round) return { kind: 'round', diameterMm: number(round[1]) }
  const sides = rectangularForm.exec(plain)
  if (sides) return { kind: 'rectangular', widthMm: number(sides[1]), heightMm: number(sides[2]) }
  return null
}

const fractions: Readonly<Record<string, string>> = {
  '¼': '1/4',
  '½': '1/2',
  '¾': '3/4',
  '⅛': '1/8',
  '⅜': '3/8',
}

function plainText(text: string): string {
  return text
    .replace(/[¼½¾⅛⅜]/g, (mark) => ` ${fractions[mark] ?? ''}`)
    .toLowerCase()
    .replace(/[\s_]+/g, ' ')
    .trim()
}

function number(text: string | undefined): number {
  return Number((text ?? '').replace(',', '.'))
}

/** `1-1/2`, `1 1/2`, `3/4`, `2.5` in inches. */
function inches(text: string): number {
  return text
    .split(/[\s-]+/)
    .map((part) => {
      const [top, bottom] = part.split('/')
      return bottom === undefined ? number(top) : number(top) / number(bottom)
    })
    .reduce((sum, part) => sum + part, 0)
}

/** The name the size tables use. */
function scheduleName(text: string): string {
  return /^\d/.test(text) ? `Sch ${text.toUpperCase()}` : text.toUpperCase()
}

/** What a system allows where it lacks a size: the nearest ones and all of them. */
export function noSize(
  system: string,
  value: number,
  sizes: readonly number[],
  text: (size: number) => string,
): string {
  const near = neighbours(value, sizes).map((size) => `${system} ${text(size)}`)
  return `${system === 'NPS' ? 'an' : 'a'} ${system} of the table; the nearest ${near.length > 1 ? 'are' : 'is'} ${near.join(' and ')}, all of them ${sizes.map(text).join(', ')}`
}

/** Rising, each once. */
export function numbers<T>(rows: readonly T[], of: (row: T) => number | null): number[] {
  const values = rows.map(of).filter((value) => value !== null)
  return [...new Set(values)].sort((a, b) => a - b)
}

/** 1.5 as 1-1/2, the way the tables print it. */
export function npsText(npsIn: number): string {
  const whole = Math.floor(npsIn)
  const eighths = Math.round((npsIn - whole) * 8)
  if (eighths === 0 || eighths / 8 !== npsIn - whole) return String(npsIn)
  const [top, bottom] =
    eighths % 4 === 0 ? [1, 2] : eighths % 2 === 0 ? [eighths / 2, 4] : [eighths, 8]
  return `${whole > 0 ? `${whole}-` : ''}${top}/${bottom}`
}

/** Millimetres as the tables print them. */
export const mm = (metres: number): number => Number((metres * 1000).toFixed(3))
