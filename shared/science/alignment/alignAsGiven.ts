import { align } from './align'
import type { AlignmentSettings } from './settings'
import type { AlignmentProgress, AlignmentResult, FeatureTable } from './types'

/** Which wide file a table is a column of, and the row of that file each of its features stood in. */
export interface WideColumn { group: string, row: Int32Array }

/** Tables that share rows: the columns of one wide file, or one long table. */
interface RowSource { columns: number[], rowOf: Map<number, number>, table: FeatureTable }

/**
 * Takes the rows of wide tables as aligned features: the columns of one file share its rows; several files, and
 * long tables beside them, are matched by the centres of their rows.
 *
 * @param tables as for `align`
 * @param wide per table: its wide file and rows, or null for a long table
 * @returns as `align`, in the order of `tables`
 */
export function alignAsGiven(tables: readonly FeatureTable[], wide: readonly (WideColumn | null)[], settings: AlignmentSettings, onProgress?: AlignmentProgress): AlignmentResult {
  const sources = rowSources(tables, wide)
  const found = align(sources.map(source => source.table), { ...settings, referenceDigest: null }, onProgress)
  const place = new Map(sources.flatMap((source, s) => source.columns.map(column => [column, { source, s }] as const)))
  const groups = found.mz.length
  const groupSize = new Int32Array(groups)
  const members: Int32Array[] = []
  const correctedMinutes: Float64Array[] = []
  const leftOut: AlignmentResult['leftOut'] = []
  tables.forEach((table, t) => {
    const { source, s } = place.get(t)!
    const centre = centreOfRow(table, wide[t] ?? null, source)
    const rowAt = new Int32Array(source.table.mz.length).fill(-1)
    centre.forEach((at, row) => {
      rowAt[at] = row
    })
    const own = Int32Array.from(found.members[s]!, at => at < 0 ? -1 : rowAt[at]!)
    own.forEach((row, g) => {
      if (row >= 0) groupSize[g]!++
    })
    members.push(own)
    correctedMinutes.push(Float64Array.from(centre, at => found.correctedMinutes[s]![at]!))
    const kept = [...found.leftOut[s]!.rows.keys()].filter(k => rowAt[found.leftOut[s]!.rows[k]!]! >= 0)
    leftOut.push({ rows: Int32Array.from(kept, k => rowAt[found.leftOut[s]!.rows[k]!]!), groups: Int32Array.from(kept, k => found.leftOut[s]!.groups[k]!) })
  })
  const drift = tables.map((_, t) => {
    const { source, s } = place.get(t)!
    const reason = source.columns.length > 1 ? `A column of a wide table: its rows are taken as given. ${sources.length > 1 ? found.drift[s]!.reason : ''}`.trim() : found.drift[s]!.reason
    return { ...found.drift[s]!, reason, borrowedFrom: null }
  })
  return { ...found, members, correctedMinutes, leftOut, drift, groupSize, reference: found.reference < 0 ? -1 : sources[found.reference]!.columns[0]! }
}

function rowSources(tables: readonly FeatureTable[], wide: readonly (WideColumn | null)[]): RowSource[] {
  const byGroup = new Map<string, number[]>()
  tables.forEach((_, t) => {
    const key = wide[t] ? `wide ${wide[t].group}` : `long ${t}`
    byGroup.set(key, [...byGroup.get(key) ?? [], t])
  })
  return [...byGroup.values()].map(columns => sourceOf(tables, wide, columns))
}

/** One table whose rows are the centres of the rows that the columns share: mean m/z and time, greatest intensity. */
function sourceOf(tables: readonly FeatureTable[], wide: readonly (WideColumn | null)[], columns: number[]): RowSource {
  const [only] = columns
  const first = only === undefined ? undefined : tables[only]
  if (!first) throw new RangeError('A wide table without columns.')
  if (!wide[only!]) return { columns, rowOf: new Map(), table: first }
  const rows = [...new Set(columns.flatMap(t => [...wide[t]!.row]))].sort((a, b) => a - b)
  const rowOf = new Map(rows.map((row, at) => [row, at]))
  const [mz, retentionMinutes, intensity, seen] = [new Float64Array(rows.length), new Float64Array(rows.length), new Float64Array(rows.length), new Int32Array(rows.length)]
  for (const t of columns) {
    wide[t]!.row.forEach((row, k) => {
      const at = rowOf.get(row)!
      mz[at]! += tables[t]!.mz[k]!
      retentionMinutes[at]! += tables[t]!.retentionMinutes[k]!
      intensity[at] = Math.max(intensity[at]!, tables[t]!.intensity[k]!)
      seen[at]!++
    })
  }
  for (let at = 0; at < rows.length; at++) {
    mz[at]! /= seen[at]!
    retentionMinutes[at]! /= seen[at]!
  }
  const digest = columns.map(t => tables[t]!.digest).sort().join('')
  return { columns, rowOf, table: { digest, blank: columns.every(t => tables[t]!.blank), runOrder: null, mz, retentionMinutes, intensity } }
}

/** Per row of the column: its place among the source's rows. */
function centreOfRow(table: FeatureTable, wide: WideColumn | null, source: RowSource): Int32Array {
  return wide ? Int32Array.from(wide.row, row => source.rowOf.get(row)!) : Int32Array.from({ length: table.mz.length }, (_, row) => row)
}
