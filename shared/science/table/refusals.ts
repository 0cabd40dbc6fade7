import { wholeNumber } from '../numeric/numberWords'
import { MOST_COUNTS, MOST_MINUTES } from '../numeric/measurable'
import { MAX_REFUSED_ROWS } from './layout'
import { TableRefused } from './tableRefused'

/** A row, or in a wide table a cell, that can't be used: where (line counted from 1, header included), what stood there, and why. */
export interface RefusedRow { line: number, column: string, value: string, reason: string }


/** Collects refused rows; far too many of them mean that the file is read in the wrong way. */
export class Refusals {
  readonly rows: RefusedRow[] = []

  add(line: number, column: string, value: string, reason: string): void {
    const kept = value.length > 60 ? `${value.slice(0, 60)}…` : value
    // The copy lets go of the chunk of text that the cell was cut from.
    this.rows.push({ line, column, value: Array.from(kept).join(''), reason })
    if (this.rows.length > MAX_REFUSED_ROWS) {
      const first = this.rows[0]
      throw new TableRefused(`More than ${wholeNumber(MAX_REFUSED_ROWS)} rows can't be used, the first on line ${first?.line}, column ${first?.column}: ${first?.reason}. Correct the layout or the file.`)
    }
  }
}

/** Why a cell is no m/z; null where it is one. */
export function whyNoMz(text: string | undefined, value: number): string | null {
  return whyNoNumber(text, value) ?? (value > 0 && value < 1e5 ? null : 'm/z must lie above 0 and below 100\u202F000')
}

/** Why a cell is no retention time; null where it is one. */
export function whyNoTime(text: string | undefined, value: number): string | null {
  return whyNoNumber(text, value) ?? (value >= 0 ? (value < MOST_MINUTES ? null : 'a retention time must lie below 100\u202F000 minutes') : 'a retention time can\'t be negative')
}

/** Why a cell is no intensity; null where it is one. */
export function whyNoIntensity(text: string | undefined, value: number): string | null {
  return whyNoNumber(text, value) ?? (value > 0 ? (value < MOST_COUNTS ? null : 'an intensity must lie below 1e30') : 'an intensity must be above 0')
}

function whyNoNumber(text: string | undefined, value: number): string | null {
  if (Number.isFinite(value)) return null
  if (text === undefined) return 'the line ends before this column'
  if (text.trim() === '') return 'empty'
  return Number.isNaN(value) ? 'not a number' : 'too large to be a number'
}
