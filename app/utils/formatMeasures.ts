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
  return `${digits.replace('-', '−')} × 10${[...exponent].map(sign => SUPERSCRIPT[sign] ?? '').join('')}`
}

/** A whole number with thin groups: 12 345. */
export function formatCount(count: number): string {
  return String(count).replace(/\B(?=(\d{3})+$)/g, '\u202F')
}
