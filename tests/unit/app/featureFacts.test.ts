import { describe, expect, it } from 'vitest'
import { featureFacts } from '../../../app/utils/featureFacts'
import { reasonLabel } from '../../../shared/science/verdict/reasons'
import { comparisonDefaults } from '../../../shared/science/verdict/settings'
import { blank, judge, none, onA, onB } from '../../support/comparisonInput'

const traceOf = (a: readonly number[] | undefined, b: readonly number[] | undefined) => {
  const { result } = judge([onA('a1', [1000], { trace: a }), onB('b1', [none], { trace: b })])
  return featureFacts(result, 0, comparisonDefaults, { a: 'Millrace', b: 'Tallow Lane' }).find(({ term }) => term === 'Trace')
}

describe('facts of a feature', () => {
  it('say over what it stands, and so does the reason in the table', () => {
    const names = { a: 'Millrace', b: 'Tallow Lane' }
    const told = (other: readonly number[]) => {
      const { result } = judge([onA('a1', [5000]), onB('b1', other), blank('k1', [1000])])
      const { reason, notAboveBlank } = result.columns
      return [featureFacts(result, 0, comparisonDefaults, names).find(({ term }) => term === 'Reach')?.remark, reasonLabel(reason[0] ?? 0, notAboveBlank[0] ?? 0)]
    }
    expect(told([none])).toEqual(['above the other side\'s highest floor; ×3 is asked', 'found on one side'])
    expect(told([1500])).toEqual(['above what the blank shows, beside which the other side does not stand out; ×3 is asked', 'other side not above blank'])
  })

  it('label a log2 ratio as B over A, whichever side is more', () => {
    const { result, sentences } = judge([onA('a1', [8000]), onB('b1', [1000])])
    expect(featureFacts(result, 0, comparisonDefaults, { a: 'Millrace', b: 'Tallow Lane' }).find(({ term }) => term === 'Ratio')?.value).toContain('log2 B/A −3.00')
    expect(sentences[0]).toContain('Millrace holds ×8 of Tallow Lane (log2 B/A −3.00)')
  })

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
