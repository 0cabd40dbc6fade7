import { columnOf, packColumns, unpackColumns, type Columns } from './packedColumns'

/** A sample's total and base peak over time. */
export interface SampleTrace {
  /** Place of its sample among the samples of the version. */
  position: number
  /** Common time of the alignment, ascending. */
  minutes: Float64Array
  /** Counts. */
  total: Float64Array
  base: Float64Array
}

/** The trace of one feature's m/z in one sample. */
export interface ExtractedTrace {
  position: number
  /** Its place in the alignment. */
  feature: number
  minutes: Float64Array
  values: Float64Array
}

/** Packs the traces of a version's samples, without the names of their files, which guests are not told; single precision is finer than any drawing. */
export function packSampleTraces(traces: readonly SampleTrace[]): Uint8Array<ArrayBuffer> {
  const columns: Columns = {}
  traces.forEach(({ minutes, total, base }, at) => {
    columns[`minutes${at}`] = minutes
    columns[`total${at}`] = Float32Array.from(total)
    columns[`base${at}`] = Float32Array.from(base)
  })
  return packColumns(traces.map(({ position }) => ({ position })), columns)
}

/** Reads what packSampleTraces wrote. @throws RangeError where the bytes are something else */
export function unpackSampleTraces(bytes: ArrayBuffer | Uint8Array): SampleTrace[] {
  const { meta, columns } = unpackColumns(bytes)
  return (meta as Pick<SampleTrace, 'position'>[]).map((each, at) => ({
    ...each,
    minutes: columnOf(columns, `minutes${at}`, Float64Array),
    total: Float64Array.from(columnOf(columns, `total${at}`, Float32Array)),
    base: Float64Array.from(columnOf(columns, `base${at}`, Float32Array)),
  }))
}

/** Packs extracted traces; the times of a sample, the same for all its features, once. */
export function packExtractedTraces(traces: readonly ExtractedTrace[]): Uint8Array<ArrayBuffer> {
  const columns: Columns = {}
  traces.forEach(({ position, minutes, values }, at) => {
    columns[`minutes${position}`] ??= minutes
    columns[`values${at}`] = Float32Array.from(values)
  })
  return packColumns(traces.map(({ position, feature }) => ({ position, feature })), columns)
}

/** Reads what packExtractedTraces wrote. @throws RangeError where the bytes are something else */
export function unpackExtractedTraces(bytes: ArrayBuffer | Uint8Array): ExtractedTrace[] {
  const { meta, columns } = unpackColumns(bytes)
  return (meta as Pick<ExtractedTrace, 'position' | 'feature'>[]).map((each, at) => ({
    ...each,
    minutes: columnOf(columns, `minutes${each.position}`, Float64Array),
    values: Float64Array.from(columnOf(columns, `values${at}`, Float32Array)),
  }))
}
