import { wholeNumber } from '#shared/science/numeric/numberWords'

/** What stands where a number does not apply or was not detected. */
export const NO_NUMBER = '–'

const SUPERSCRIPT: Readonly<Record<string, string>> = { '-': '⁻', '+': '', '0': '⁰', '1': '¹', '2': '²', '3': '³', '4': '⁴', '5': '⁵', '6': '⁶', '7': '⁷', '8': '⁸', '9': '⁹' }

const fixed = (value: number, decimals: number) => Number.isFinite(value) ? value.toFixed(decimals).replace('-', '−') : NO_NUMBER

export const formatMz = (mz: number) => fixed(mz, 4)
export const formatMinutes = (minutes: number) => fixed(minutes, 2)
export const formatPpm = (ppm: number) => fixed(ppm, 1)

/** Three significant digits: 934, 1.24 × 10⁵. */
export function formatIntensity(intensity: number): string {
  if (!Number.isFinite(intensity)) return NO_NUMBER
  if (intensity === 0) return '0'
  const size = Math.abs(Number(intensity.toPrecision(3)))
  if (size >= 0.01 && size < 1000) return intensity.toPrecision(3).replace('-', '−')
  const [digits = '', exponent = ''] = intensity.toExponential(2).split('e')
  return `${digits.replace('-', '−')} × ${powerOfTen(Number(exponent))}`
}

/** A power of ten with its exponent raised: 10⁵. */
export function powerOfTen(exponent: number): string {
  return `10${[...String(exponent)].map(sign => SUPERSCRIPT[sign] ?? '').join('')}`
}

/** How a count stands on every page: 12 345. */
export const formatCount = wholeNumber

/** What a count has gained or lost: +12, −3 400, 0. */
export const formatGain = (gain: number) => gain === 0 ? '0' : `${gain < 0 ? '−' : '+'}${formatCount(Math.abs(gain))}`

/** A share as per cent: whole from 10 %, one decimal below; 0 only for none. */
export function formatShare(part: number, whole: number): string {
  if (whole === 0) return 'none'
  const value = 100 * part / whole
  return `${value >= 10 || value === 0 ? Math.round(value) : Math.max(0.1, Number(value.toFixed(1)))} %`
}
