import { describe, expect, it } from 'vitest'
import { packColumns } from '../../../shared/formats/packedColumns'
import { packExtractedTraces, packSampleTraces, unpackExtractedTraces, unpackSampleTraces } from '../../../shared/formats/traceColumns'

const minutes = Float64Array.of(0.1, 0.2, 0.30000000000000004)

describe('traces on the wire', () => {
  it('come back with times as they were and values in single precision', () => {
    const traces = [{ position: 2, minutes, total: Float64Array.of(1e6, 0, 123456.789), base: Float64Array.of(5, 6, 7) }]
    const [read] = unpackSampleTraces(packSampleTraces(traces))
    expect(read).toMatchObject({ position: 2, minutes, base: Float64Array.of(5, 6, 7) })
    expect((read?.total[2] ?? 0) / 123456.789).toBeCloseTo(1, 6)
  })

  it('hold the times of a sample once for all its features', () => {
    const traces = [0, 1].flatMap(position => [40, 7].map(feature => ({ position, feature, minutes: minutes.map(time => time + position), values: Float64Array.of(feature, position, 0) })))
    const bytes = packExtractedTraces(traces)
    expect(unpackExtractedTraces(bytes)).toEqual(traces)
    expect(new TextDecoder().decode(bytes).match(/"minutes\d+"/g)).toEqual(['"minutes0"', '"minutes1"'])
  })

  it('may be none', () => {
    expect(unpackSampleTraces(packSampleTraces([]))).toEqual([])
    expect(unpackExtractedTraces(packExtractedTraces([]))).toEqual([])
  })

  it('are refused where a column is missing', () => {
    expect(() => unpackSampleTraces(packColumns([{ position: 0 }], {}))).toThrow(RangeError)
  })
})
