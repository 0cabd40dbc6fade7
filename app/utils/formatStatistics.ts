import { probability, signed, threeDigits } from '#shared/science/numeric/numberWords'
import type { SideNames } from '#shared/science/verdict/reasonFacts'
import { NO_NUMBER } from '~/utils/formatMeasures'

/** p or q with two significant digits; never 0. */
export function formatProbability(p: number): string {
  return Number.isFinite(p) ? probability(p) : NO_NUMBER
}

/** A ratio of two intensities: ×3.2. */
export function formatTimes(ratio: number): string {
  return Number.isFinite(ratio) ? `×${ratio >= 100 ? threeDigits(ratio) : Number(ratio.toPrecision(ratio >= 10 ? 3 : 2))}` : NO_NUMBER
}

/** log2 ratio with its sign and two decimals: +1.68. */
export function formatLog2(log2Ratio: number): string {
  return Number.isFinite(log2Ratio) ? signed(log2Ratio, 2) : NO_NUMBER
}

/** A log2 ratio of B over A as the ratio of the greater to the smaller side: "×3.2 in B"; "×1.0" where equal. */
export function formatFold(log2Ratio: number, names: SideNames): string {
  if (!Number.isFinite(log2Ratio)) return NO_NUMBER
  const times = formatTimes(2 ** Math.abs(log2Ratio))
  return times === '×1' ? 'equal' : `${times} in ${log2Ratio < 0 ? names.a : names.b}`
}

/** A score or loading with its sign and three significant digits: −12.4, +0.0312. */
export function formatScore(value: number | undefined): string {
  if (value === undefined || !Number.isFinite(value)) return NO_NUMBER
  const digits = threeDigits(Math.abs(value))
  return Number(digits) === 0 ? '0' : `${value < 0 ? '−' : '+'}${digits}`
}
