import type { VerdictColumns, VerdictResult } from '../science/verdict/verdictResult'
import { columnOf, packColumns, unpackColumns, type Columns } from './packedColumns'

const BYTES = ['verdict', 'reason', 'method', 'notAboveBlank'] as const
const COUNTS = ['detectedA', 'detectedB', 'injectionsA', 'injectionsB'] as const
const NUMBERS = [
  'mz', 'retentionMinutes', 'levelA', 'levelB', 'log2Ratio', 'low', 'high', 'p', 'q', 'equivalenceP',
  'reach', 'atLeast', 'blankRatioA', 'blankRatioB', 'highestCounts',
] as const

type StoredMeta = Omit<VerdictResult, 'columns' | 'samplesA' | 'samplesB'> & Partial<Pick<VerdictResult, 'samplesA' | 'samplesB'>>

/** Packs the verdicts of a version: one column a value, counts and cautions beside them. */
export function packVerdicts(result: VerdictResult): Uint8Array<ArrayBuffer> {
  const { columns, ...meta } = result
  const ordered: Columns = {}
  for (const name of [...NUMBERS, ...BYTES, ...COUNTS, 'neighbour', 'traceRatio', 'traceSamples'] as const) ordered[name] = columns[name]
  return packColumns(meta, ordered)
}

/** Reads what packVerdicts wrote; of versions saved before traces were looked into, that nothing was checked. @throws RangeError where the bytes are something else */
export function unpackVerdicts(bytes: ArrayBuffer | Uint8Array): VerdictResult {
  const { meta, columns } = unpackColumns(bytes)
  const pick = <Name extends string, T extends Uint8Array | Uint16Array | Float64Array>(names: readonly Name[], Type: new (length: number) => T) =>
    Object.fromEntries(names.map(name => [name, columnOf(columns, name, Type)])) as Record<Name, T>
  const features = columnOf(columns, 'verdict', Uint8Array).length
  const read: VerdictColumns = {
    ...pick(NUMBERS, Float64Array),
    ...pick(BYTES, Uint8Array),
    ...pick(COUNTS, Uint16Array),
    neighbour: columnOf(columns, 'neighbour', Int32Array),
    traceRatio: columns.traceRatio ? columnOf(columns, 'traceRatio', Float64Array) : new Float64Array(features).fill(Number.NaN),
    traceSamples: columns.traceSamples ? columnOf(columns, 'traceSamples', Uint16Array) : new Uint16Array(features),
  }
  return { samplesA: 0, samplesB: 0, ...(meta as StoredMeta), columns: read }
}
