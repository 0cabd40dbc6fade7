import { describe, expect, it } from 'vitest'
import { chooseLabels, type PeakMark } from '../../../app/charts/chromatogramLabels'

const room = { width: 800, height: 300, fromMinutes: 0, toMinutes: 20, highest: 1000 }
const mark = (feature: number, minutes: number, rest: Partial<PeakMark> = {}): PeakMark => ({ feature, side: 'A', minutes, height: 500, why: 'flagged', text: '353.0878', ...rest })
const flat = () => 0
const chosen = (marks: PeakMark[], corners = [] as Parameters<typeof chooseLabels>[3]) => chooseLabels(marks, room, flat, corners).map(({ feature }) => feature)

describe('labels of peaks', () => {
  it('are all there where there is room', () => {
    expect(chosen([mark(0, 2), mark(1, 8), mark(2, 14)]).sort()).toEqual([0, 1, 2])
  })

  it('leave out what would overlap, what is looked at coming first, then the highest', () => {
    expect(chosen([mark(0, 8), mark(1, 8.2, { height: 510 }), mark(2, 8.4, { why: 'selected', height: 490 })])).toEqual([2])
    expect(chosen([mark(0, 8), mark(1, 8.2, { height: 510 })])).toEqual([1])
  })

  it('stand one above the other where several that are looked at stand close', () => {
    const close = [mark(0, 8, { why: 'selected', height: 400 }), ...[1, 2, 3].map(i => mark(i, 8 + i / 10, { why: 'picked', height: 400 - i }))]
    const lifts = chooseLabels(close, room, flat).map(({ lift }) => lift)
    expect(lifts).toHaveLength(4)
    expect(new Set(lifts).size).toBe(4)
    expect(Math.max(...lifts)).toBeLessThanOrEqual(66)
    // Never beyond the plot.
    expect(chosen([mark(0, 8, { why: 'selected', height: 900 }), mark(1, 8.1, { why: 'picked', height: 900 })])).toEqual([0])
  })

  it('stand on both sides at the same time, and one above the other', () => {
    expect(chosen([mark(0, 8), mark(1, 8, { side: 'B' }), mark(2, 8, { height: 900 })]).sort()).toEqual([0, 1, 2])
  })

  it('leave out what is not shown', () => {
    expect(chooseLabels([mark(0, 2), mark(1, 8)], { ...room, fromMinutes: 5 }, flat).map(({ feature }) => feature)).toEqual([1])
  })

  it('keep clear of the corners, the selected one apart', () => {
    const corner = [{ left: 0, right: 150, top: 0, bottom: 30 }]
    expect(chosen([mark(0, 2, { height: 800 })], corner)).toEqual([])
    expect(chosen([mark(0, 2, { height: 800, why: 'selected' })], corner)).toEqual([0])
  })

  it('are lifted clear of the lines beside, and left out where that is too far', () => {
    const beside = (height: number) => (side: 'A' | 'B', from: number, to: number) => side === 'A' && from < 8.1 && to > 8.1 ? height : 0
    expect(chooseLabels([mark(0, 8)], room, beside(600))).toMatchObject([{ feature: 0, lift: 15 }])
    expect(chooseLabels([mark(0, 8, { side: 'B' })], room, beside(600))).toMatchObject([{ lift: 0 }])
    expect(chooseLabels([mark(0, 8, { height: 10 })], room, beside(900))).toEqual([])
    expect(chooseLabels([mark(0, 8, { height: 10, why: 'selected' })], room, beside(900))).toMatchObject([{ lift: 64 }])
  })

  it('are few, however many there are', () => {
    const many = Array.from({ length: 500 }, (_, i) => mark(i, 20 * i / 500, { height: (i * 37) % 900, side: i % 2 ? 'A' : 'B' }))
    expect(chosen(many).length).toBeLessThanOrEqual(14)
    expect(chosen(many).length).toBeGreaterThan(6)
  })
})
