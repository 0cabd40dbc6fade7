import { describe, expect, it } from 'vitest'
import { featureFacts } from '../../../app/utils/featureFacts'
import { comparisonDefaults } from '../../../shared/science/verdict/settings'
import { judge, none, onA, onB } from '../../support/comparisonInput'

const traceOf = (a: readonly number[] | undefined, b: readonly number[] | undefined) => {
  const { result } = judge([onA('a1', [1000], { trace: a }), onB('b1', [none], { trace: b })])
  return featureFacts(result, 0, comparisonDefaults, { a: 'Millrace', b: 'Tallow Lane' }).find(({ term }) => term === 'Trace')
}

describe('facts of a feature', () => {
  it('say what the other side\'s traces show', () => {
    expect(traceOf([500], [20])).toEqual({ term: 'Trace', value: '×0.04', remark: 'highest signal in the other side\'s traces, 1 sample, over the side that shows it; less than ×0.33 is asked' })
    expect(traceOf([500], [0])?.value).toBe('nothing there')
    expect(traceOf(undefined, [20])).toEqual({ term: 'Trace', value: 'not measured', remark: 'in the other side\'s traces, 1 sample: the side that shows it has no signal there to measure by' })
  })

  it('say nothing of traces where none was looked into', () => {
    expect(traceOf([500], undefined)).toBeUndefined()
    expect(traceOf([500], [none])).toBeUndefined()
  })
})
