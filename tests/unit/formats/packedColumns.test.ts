import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { packComparisonData, unpackComparisonData } from '../../../shared/formats/comparisonData'
import { columnOf, packColumns, unpackColumns } from '../../../shared/formats/packedColumns'
import { packVerdicts, unpackVerdicts } from '../../../shared/formats/verdictColumns'
import { reasonSentence } from '../../../shared/science/verdict/reasonSentence'
import { REASON } from '../../../shared/science/verdict/reasons'
import { comparisonDefaults } from '../../../shared/science/verdict/settings'
import { comparisonInput, judge, none, onA, onB } from '../../support/comparisonInput'

describe('packed columns', () => {
  it('come back as they were, of any type and length', () => {
    fc.assert(fc.property(fc.array(fc.double()), fc.array(fc.integer()), fc.array(fc.nat(65_535)), fc.array(fc.nat(255)), fc.string(), (numbers, integers, shorts, bytes, text) => {
      const columns = { a: Float64Array.from(numbers), b: Uint8Array.from(bytes), c: Int32Array.from(integers), d: Uint16Array.from(shorts), e: Float32Array.from(numbers) }
      expect(unpackColumns(packColumns({ text }, columns))).toEqual({ meta: { text }, columns })
    }))
  })

  it('are read at any place of a buffer', () => {
    const packed = packColumns(null, { a: Float64Array.from([1, none]) })
    const shifted = new Uint8Array(packed.length + 3)
    shifted.set(packed, 3)
    expect(unpackColumns(shifted.subarray(3)).columns.a).toEqual(Float64Array.from([1, none]))
    expect(unpackColumns(packed.buffer).columns.a).toEqual(Float64Array.from([1, none]))
  })

  it('refuse other bytes, and bytes cut short', () => {
    const packed = packColumns(null, { a: Float64Array.from([1, 2, 3]) })
    expect(() => unpackColumns(new Uint8Array(4))).toThrow('no packed columns')
    expect(() => unpackColumns(new TextEncoder().encode('{"some":"json"}'))).toThrow('no packed columns')
    expect(() => unpackColumns(packed.slice(0, -8))).toThrow('cut short')
    expect(() => unpackColumns(packed.slice(0, 14))).toThrow('cut short')
    expect(() => columnOf(unpackColumns(packed).columns, 'b', Float64Array)).toThrow('lack “b”')
    expect(() => columnOf(unpackColumns(packed).columns, 'a', Int32Array)).toThrow('lack “a”')
  })
})

describe('packed verdicts', () => {
  it('come back whole', () => {
    const { result } = judge([onA('a1', [1000, 500, none]), onA('a2', [1100, none, none]), onB('b1', [4000, none, none]), onB('b2', [3900, none, none])])
    expect(unpackVerdicts(packVerdicts(result))).toEqual(result)
  })

  it('come back with what traces show', () => {
    const { result } = judge([onA('a1', [1000, 1000], { trace: [500, 500] }), onB('b1', [none, none], { trace: [none, 20] })])
    expect([...result.columns.traceRatio]).toEqual([none, 0.04])
    expect(unpackVerdicts(packVerdicts(result))).toEqual(result)
  })

  it('saved before traces were looked into: nothing was checked', () => {
    const { result } = judge([onA('a1', [1000, 500], { trace: [9, 9] }), onB('b1', [none, none], { trace: [9, 9] })])
    const { meta, columns: { traceRatio: _, traceSamples: __, ...columns } } = unpackColumns(packVerdicts(result))
    const { samplesA: ___, samplesB: ____, ...earlier } = meta as typeof result
    const read = unpackVerdicts(packColumns(earlier, columns))
    expect(read).toEqual({ ...result, samplesA: 0, samplesB: 0, columns: { ...result.columns, traceRatio: Float64Array.of(none, none), traceSamples: Uint16Array.of(0, 0) } })
    expect(reasonSentence(0, { ...read, columns: { ...read.columns, reason: Uint8Array.of(REASON.foundOnly ?? 0, 0) } }, comparisonDefaults, { a: 'Millrace', b: 'Tallow Lane' })).toMatch(/No trace to check\. It rests on one injection\.$/)
  })
})

describe('packed comparison data', () => {
  it('come back whole, a floor that is not known too', () => {
    const { normaliseByAmount: _, ...data } = comparisonInput([onA('a1', [1000, none], { floor: none, trace: [0, none] }), onB('b1', [1, 2])], { neighbours: [[0, 1]] })
    expect(unpackComparisonData(packComparisonData(data))).toEqual(data)
  })

  it('come back without traces where there are none', () => {
    const { normaliseByAmount: _, traceMaxima, ...data } = comparisonInput([onA('a1', [1000]), onB('b1', [1])])
    expect(unpackComparisonData(packComparisonData(data))).toEqual({ ...data, traceMaxima })
    expect(traceMaxima).toEqual([null, null])
  })
})
