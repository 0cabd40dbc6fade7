import { describe, expect, it } from 'vitest'
import { areaBounds, MOST_CORNERS, readArea, rectangleArea, roundedArea, writeArea } from '../../../app/utils/plotArea'
import { readWindow, windowOf, writeWindow } from '../../../app/utils/plotWindow'

describe('an area in the address', () => {
  it('is short, rounded and read back', () => {
    const area = rectangleArea('laneA', [350.123456, 102.5], [0.47712, 2])
    expect(writeArea(area)).toBe('laneA:102.5,0.4771;350.1235,0.4771;350.1235,2;102.5,2')
    expect(readArea(writeArea(area))).toEqual(area)
    expect(areaBounds(area)).toEqual({ x: [102.5, 350.1235], y: [0.4771, 2] })
  })

  it.each([
    '', 'certainty', 'certainty:', 'certainty:1,2;3,4', 'nowhere:1,2;3,4;5,6', 'certainty:1,2;3,4;5', 'certainty:1,2;3,4;5,six', 'certainty:1,2;3,4;,6',
    'certainty:1,2;3,4;5,Infinity', 'certainty:1,2;3,4;5,1e9', `certainty:${Array.from({ length: MOST_CORNERS + 1 }, () => '1,2').join(';')}`,
  ])('is none where it says “%s”', (text) => {
    expect(readArea(text)).toBeUndefined()
  })

  it('knows no −0, which would be read back as 0', () => {
    expect(Object.is(roundedArea({ pane: 'certainty', corners: [[-0.00001, 0]] }).corners[0]?.[0], 0)).toBe(true)
  })
})

describe('a window in the address', () => {
  it('is read back, its ends in order', () => {
    const shown = windowOf([2, -1.23456], [4, 0])
    expect(shown).toEqual({ x: [-1.235, 2], y: [0, 4] })
    expect(readWindow(writeWindow(shown ?? null))).toEqual(shown)
  })

  it.each(['', '1,2,3', '1,2,3,4,5', '1,1,0,3', '1,2,x,4', '1,2,,4', '0,99999,0,1', '1,1.001,0,3'])('is none where it says “%s”', (text) => {
    expect(readWindow(text)).toBeUndefined()
  })
})
