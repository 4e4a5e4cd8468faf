import { formatNumber } from '#units/format.ts'

/** `7 months`, `2.4 years`: as exact as a payback is. */
export function durationWords(years: number): string {
  const months = Math.round(years * 12)
  if (months < 1) return 'under a month'
  if (months === 1) return '1 month'
  return months <= 18 ? `${months} months` : `${formatNumber(years, years < 10 ? 1 : 0)} years`
}
