import type { ComparedSample } from '../science/verdict/settings'
import type { SideInput } from '../science/verdict/sideSummary'
import { columnOf, packColumns, unpackColumns, type Columns } from './packedColumns'

/** What summariseSides needs apart from the settings: intensities in counts, one column a sample. */
export type ComparisonData = Omit<SideInput, 'normaliseByAmount'>

/** Packs the intensities a comparison rests on, so that a page can preview other limits with the server's own functions. */
export function packComparisonData(data: ComparisonData): Uint8Array<ArrayBuffer> {
  const columns: Columns = { mz: data.mz, retentionMinutes: data.retentionMinutes, neighbourStart: data.neighbourStart, neighbourList: data.neighbourList }
  data.intensity.forEach((values, position) => { columns[`intensity${position}`] = values })
  data.traceMaxima?.forEach((values, position) => {
    if (values) columns[`traceMaxima${position}`] = values
  })
  return packColumns({ samples: data.samples.map(sample => ({ ...sample, floor: Number.isNaN(sample.floor) ? null : sample.floor })) }, columns)
}

/** Reads what packComparisonData wrote. @throws RangeError where the bytes are something else */
export function unpackComparisonData(bytes: ArrayBuffer | Uint8Array): ComparisonData {
  const { meta, columns } = unpackColumns(bytes)
  const samples = (meta as { samples: (Omit<ComparedSample, 'floor'> & { floor: number | null })[] }).samples.map(withKnownFloor)
  return {
    samples,
    intensity: samples.map((_, position) => columnOf(columns, `intensity${position}`, Float64Array)),
    traceMaxima: samples.map((_, position) => columns[`traceMaxima${position}`] ? columnOf(columns, `traceMaxima${position}`, Float64Array) : null),
    mz: columnOf(columns, 'mz', Float64Array),
    retentionMinutes: columnOf(columns, 'retentionMinutes', Float64Array),
    neighbourStart: columnOf(columns, 'neighbourStart', Int32Array),
    neighbourList: columnOf(columns, 'neighbourList', Int32Array),
  }
}

/** JSON has no NaN: a floor that is not known comes as null. */
export function withKnownFloor(sample: Omit<ComparedSample, 'floor'> & { floor: number | null }): ComparedSample {
  return { ...sample, floor: sample.floor ?? Number.NaN }
}
