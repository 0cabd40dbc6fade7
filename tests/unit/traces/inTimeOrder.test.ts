import { describe, expect, it } from 'vitest'
import { inTimeOrder } from '../../../shared/science/traces/inTimeOrder'

describe('scans in the order of time', () => {
  it('are put in order with their values, ties as they came', () => {
    const minutes = Float64Array.of(1, 3, 2, 2, 4)
    const total = Float64Array.of(10, 30, 20, 21, 40)
    const sorted = inTimeOrder(minutes, [total])
    expect([...sorted.minutes]).toEqual([1, 2, 2, 3, 4])
    expect([...sorted.columns[0] ?? []]).toEqual([10, 20, 21, 30, 40])
    expect([...minutes]).toEqual([1, 3, 2, 2, 4])
    expect([...total]).toEqual([10, 30, 20, 21, 40])
  })

  it('are left as they are where they stand in order, or are none', () => {
    const minutes = Float64Array.of(1, 2, 2, 3)
    expect(inTimeOrder(minutes, []).minutes).toBe(minutes)
    expect(inTimeOrder(new Float64Array(0), [new Float64Array(0)]).columns).toHaveLength(1)
  })
})
