import type { VerdictColumns } from '#shared/science/verdict/verdictResult'
import { reasonLabel, REASONS } from '#shared/science/verdict/reasons'
import { parseNumber } from '~/utils/parseNumber'

/** What a person typed into the search field, read as numbers or words. Absent parts do not restrict. */
export interface FeatureSearch {
  mz?: { value: number, tolerance: number }
  minutes?: { value: number, tolerance: number }
  /** Place in the alignment, from 1, as the table numbers it. */
  number?: number
  words?: string
}

const LEAST_MINUTES = 0.05
const NUMBER = String.raw`\d+(?:[.,]\d*)?`

/** Half a unit of the last typed decimal: "313.07" stands for all that round to it. */
const typedPrecision = (text: string) => 0.5 * 10 ** -(text.split(/[.,]/)[1]?.length ?? 0)
const read = (text: string) => parseNumber(text) ?? Number.NaN

/**
 * Reads a search: "313.0715" (m/z within `massPpm`, or all that round to it if fewer decimals were typed), "4.62 min",
 * "313.0715 4.62" (both), "#120" (the feature of that number); anything else is looked for in the reasons. Null: nothing typed.
 */
export function parseSearch(text: string, massPpm: number): FeatureSearch | null {
  const typed = text.trim()
  if (!typed) return null
  const byNumber = /^#\s*(\d+)$/.exec(typed)
  if (byNumber?.[1]) return { number: Number(byNumber[1]) }
  const byMinutes = new RegExp(`^(${NUMBER})\\s*min$`, 'i').exec(typed)
  if (byMinutes?.[1]) return { minutes: minutesOf(byMinutes[1]) }
  const byMass = new RegExp(`^(${NUMBER})(?:[\\s@/]+(${NUMBER})(?:\\s*min)?)?$`, 'i').exec(typed)
  if (byMass?.[1]) {
    const value = read(byMass[1])
    const mz = { value, tolerance: Math.max(value * massPpm * 1e-6, typedPrecision(byMass[1])) }
    return byMass[2] ? { mz, minutes: minutesOf(byMass[2]) } : { mz }
  }
  return { words: typed.toLowerCase() }
}

const minutesOf = (text: string) => ({ value: read(text), tolerance: Math.max(LEAST_MINUTES, typedPrecision(text)) })

/** A search as a question to one feature. `said` gives more words of a feature, such as its verdict in words. */
export function searchRule(search: FeatureSearch, columns: Pick<VerdictColumns, 'mz' | 'retentionMinutes' | 'reason' | 'notAboveBlank'>, said: (feature: number) => string): (feature: number) => boolean {
  const { mz, minutes, number, words } = search
  const reasonHas = [0, 1].map(notAboveBlank => words === undefined ? [] : REASONS.map((_, code) => reasonLabel(code, notAboveBlank).includes(words)))
  return (i) => {
    if (number !== undefined && i !== number - 1) return false
    if (mz && !(Math.abs(columns.mz[i]! - mz.value) <= mz.tolerance)) return false
    if (minutes && !(Math.abs(columns.retentionMinutes[i]! - minutes.value) <= minutes.tolerance)) return false
    return words === undefined || reasonHas[columns.notAboveBlank[i]! > 0 ? 1 : 0]?.[columns.reason[i]!] === true || said(i).toLowerCase().includes(words)
  }
}
