/** What of the run is drawn: the base peak, the total, or the extracted traces of the features looked at. */
export const TRACE_KINDS = ['base', 'total', 'extracted'] as const
export type TraceKind = (typeof TRACE_KINDS)[number]

/** Normalised as the comparison, or each trace to its own highest point. */
export const TRACE_SCALES = ['normalised', 'own'] as const
export type TraceScale = (typeof TRACE_SCALES)[number]

/** Where traces come from: raw data, or drawn from the features of the tables. */
export const TRACE_ORIGINS = ['measured', 'features'] as const
export type TraceOrigin = (typeof TRACE_ORIGINS)[number]

/** A part of the run, minutes. */
export type TimeWindow = readonly [fromMinutes: number, toMinutes: number]

/** Rounded to a thousandth of a minute, as the address holds it. */
export const roundedMinutes = (minutes: number) => Math.round(minutes * 1000) / 1000

export const writeTimeWindow = (window: TimeWindow | null) => window ? window.join('-') : ''

/** Reads "4.2-5.6", whatever a person made of it; undefined: no part of a run. */
export function readTimeWindow(text: string): TimeWindow | undefined {
  const ends = /^(?<from>\d{1,4}(?:\.\d{1,9})?)-(?<to>\d{1,4}(?:\.\d{1,9})?)$/.exec(text)?.groups
  const [from, to] = [roundedMinutes(Number(ends?.from)), roundedMinutes(Number(ends?.to))]
  return from < to ? [from, to] : undefined
}
