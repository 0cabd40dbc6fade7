import { describe, expect, it } from 'vitest'
import { readTimeWindow, writeTimeWindow } from '../../../app/utils/traceView'

describe('a part of the run in the address', () => {
  it('is read as it was written', () => {
    expect(writeTimeWindow([4.2, 5.605])).toBe('4.2-5.605')
    expect(readTimeWindow('4.2-5.605')).toEqual([4.2, 5.605])
    expect(writeTimeWindow(null)).toBe('')
  })

  it.each(['', '5', '5-', '-5', '5-4', '4-4', 'a-b', '1-2-3', '1e3-2e9', '4.2–5.6', '4,2-5,6', 'NaN-1', '0.0001-0.0002', '99999-100000'])('is none in %j', (text) => {
    expect(readTimeWindow(text)).toBeUndefined()
  })
})
