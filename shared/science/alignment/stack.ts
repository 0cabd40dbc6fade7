import { ascendingOrder } from '../numeric/ascendingOrder'
import type { FeatureTable } from './types'

/**
 * All features of all tables in canonical order: m/z (offset taken out), time as read, table digest, greater intensity.
 * Sums run in this order, so neither the order of tables nor of rows can change a bit of the result.
 */
export interface FeatureStack {
  size: number
  mz: Float64Array
  /** Minutes as the table gives them. */
  rawMinutes: Float64Array
  intensity: Float64Array
  /** Canonical table number: tables count by digest. */
  table: Int32Array
  /** Row in its table. */
  row: Int32Array
  /** Input position of each canonical table number. */
  inputPosition: Int32Array
}

/** @param offsetPpm per input table, the offset to take out of its m/z */
export function stackFeatures(tables: readonly FeatureTable[], offsetPpm: ArrayLike<number>): FeatureStack {
  const inputPosition = digestOrder(tables)
  const size = tables.reduce((sum, table) => sum + table.mz.length, 0)
  const loose = { mz: new Float64Array(size), minutes: new Float64Array(size), intensity: new Float64Array(size), table: new Int32Array(size), row: new Int32Array(size) }
  let at = 0
  inputPosition.forEach((position, number) => {
    const table = tables[position]!
    const factor = 1 + offsetPpm[position]! * 1e-6
    for (let row = 0; row < table.mz.length; row++, at++) {
      loose.mz[at] = table.mz[row]! / factor
      loose.row[at] = row
    }
    loose.minutes.set(table.retentionMinutes, at - table.mz.length)
    loose.intensity.set(table.intensity, at - table.mz.length)
    loose.table.fill(number, at - table.mz.length, at)
  })
  const order = ascendingOrder(loose.mz, ascendingOrder(loose.minutes))
  settleTies(order, loose)
  return {
    size,
    mz: pick(loose.mz, order),
    rawMinutes: pick(loose.minutes, order),
    intensity: pick(loose.intensity, order),
    table: pickWhole(loose.table, order),
    row: pickWhole(loose.row, order),
    inputPosition,
  }
}

/** Input positions of the tables by digest. Equal digests mean equal tables, whose order cannot matter. */
export function digestOrder(tables: readonly FeatureTable[]): Int32Array {
  const positions = tables.map((_, position) => position)
  positions.sort((a, b) => compareText(tables[a]!.digest, tables[b]!.digest) || a - b)
  return Int32Array.from(positions)
}

/** Orders text by code units: the same everywhere, unlike an order by language. */
export function compareText(a: string, b: string): number {
  return a < b ? -1 : a > b ? 1 : 0
}

/** Puts runs of equal m/z and time in order of table digest, then greater intensity. */
function settleTies(order: Int32Array, loose: { mz: Float64Array, minutes: Float64Array, intensity: Float64Array, table: Int32Array }): void {
  const { mz, minutes, intensity, table } = loose
  let start = 0
  for (let i = 1; i <= order.length; i++) {
    if (i < order.length && mz[order[i]!] === mz[order[start]!] && minutes[order[i]!] === minutes[order[start]!]) continue
    if (i - start > 1) order.subarray(start, i).sort((a, b) => table[a]! - table[b]! || intensity[b]! - intensity[a]! || a - b)
    start = i
  }
}

function pick(values: Float64Array, order: Int32Array): Float64Array {
  const picked = new Float64Array(order.length)
  for (let i = 0; i < order.length; i++) picked[i] = values[order[i]!]!
  return picked
}

function pickWhole(values: Int32Array, order: Int32Array): Int32Array {
  const picked = new Int32Array(order.length)
  for (let i = 0; i < order.length; i++) picked[i] = values[order[i]!]!
  return picked
}
