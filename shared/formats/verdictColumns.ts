import type { VerdictColumns, VerdictResult } from '../science/verdict/verdictResult'
import { columnOf, packColumns, unpackColumns, type Columns } from './packedColumns'

const BYTES = ['verdict', 'reason', 'method', 'notAboveBlank'] as const
const COUNTS = ['detectedA', 'detectedB', 'injectionsA', 'injectionsB'] as const
const NUMBERS = [
  'mz', 'retentionMinutes', 'levelA', 'levelB', 'log2Ratio', 'low', 'high', 'p', 'q', 'equivalenceP',
  'reach', 'atLeast', 'blankRatioA', 'blankRatioB', 'highestCounts',
] as const

/** Packs the verdicts of a version: one column a value, counts and cautions beside them. */
export function packVerdicts(result: VerdictResult): Uint8Array<ArrayBuffer> {
  const { columns, ...meta } = result
  const ordered: Columns = {}
  for (const name of [...NUMBERS, ...BYTES, ...COUNTS, 'neighbour'] as const) ordered[name] = columns[name]
  return packColumns(meta, ordered)
}

/** Reads what packVerdicts wrote. @throws RangeError where the bytes are something else */
export function unpackVerdicts(bytes: ArrayBuffer | Uint8Array): VerdictResult {
  const { meta, columns } = unpackColumns(bytes)
  const pick = <Name extends string, T extends Uint8Array | Uint16Array | Float64Array>(names: readonly Name[], Type: new (length: number) => T) =>
    Object.fromEntries(names.map(name => [name, columnOf(columns, name, Type)])) as Record<Name, T>
  const read: VerdictColumns = {
    ...pick(NUMBERS, Float64Array),
    ...pick(BYTES, Uint8Array),
    ...pick(COUNTS, Uint16Array),
    neighbour: columnOf(columns, 'neighbour', Int32Array),
  }
  return { ...(meta as Omit<VerdictResult, 'columns'>), columns: read }
}
