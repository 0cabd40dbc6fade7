import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { downSample, POINTS_A_COLUMN } from '../../../shared/science/traces/downSample'

const trace = fc.array(fc.tuple(fc.double({ min: 0, max: 20, noNaN: true }), fc.double({ min: 0, max: 1e9, noNaN: true })), { maxLength: 600 }).map((points) => {
  points.sort((one, other) => one[0] - other[0])
  return { minutes: Float64Array.from(points, ([time]) => time), values: Float64Array.from(points, ([, value]) => value) }
})
const drawn = fc.record({ fromMinutes: fc.double({ min: 0, max: 9, noNaN: true }), length: fc.double({ min: 0.5, max: 12, noNaN: true }), columns: fc.integer({ min: 1, max: 60 }) })
  .map(({ fromMinutes, length, columns }) => ({ fromMinutes, toMinutes: fromMinutes + length, columns }))

/** The column a time is drawn in, by the plainest rule. */
const columnOf = (time: number, { fromMinutes, toMinutes, columns }: { fromMinutes: number, toMinutes: number, columns: number }) =>
  Math.min(columns - 1, Math.floor((time - fromMinutes) * (columns / (toMinutes - fromMinutes))))

describe('down-sampling a trace for drawing', () => {
  it('keeps every local maximum that is the highest of its column, and the highest of all', () => {
    fc.assert(fc.property(trace, drawn, ({ minutes, values }, window) => {
      const kept = [...downSample(minutes, values, window)]
      const inside = [...minutes.keys()].filter(i => (minutes[i] ?? 0) >= window.fromMinutes && (minutes[i] ?? 0) <= window.toMinutes)
      const highestOf = new Map<number, number>()
      for (const i of inside) {
        const column = columnOf(minutes[i] ?? 0, window)
        highestOf.set(column, Math.max(highestOf.get(column) ?? 0, values[i] ?? 0))
      }
      const keptTops = new Set(kept.map(i => `${columnOf(minutes[i] ?? 0, window)} ${values[i]}`))
      for (const i of inside) {
        const isTop = (values[i] ?? 0) >= (values[i - 1] ?? 0) && (values[i] ?? 0) >= (values[i + 1] ?? 0)
        const column = columnOf(minutes[i] ?? 0, window)
        if (isTop && values[i] === highestOf.get(column)) expect(keptTops).toContain(`${column} ${values[i]}`)
      }
      if (inside.length > 0) expect(Math.max(...kept.map(i => values[i] ?? 0))).toBeGreaterThanOrEqual(Math.max(...inside.map(i => values[i] ?? 0)))
    }))
  })

  it('keeps the order of time, no point twice, and at most four a column and one beside each edge', () => {
    fc.assert(fc.property(trace, drawn, ({ minutes, values }, window) => {
      const kept = downSample(minutes, values, window)
      for (let k = 1; k < kept.length; k++) expect(kept[k]).toBeGreaterThan(kept[k - 1] ?? -1)
      expect(kept.length).toBeLessThanOrEqual(POINTS_A_COLUMN * window.columns + 2)
    }))
  })

  it('keeps first and last of the window and the point beside each edge', () => {
    fc.assert(fc.property(trace, drawn, ({ minutes, values }, window) => {
      const kept = downSample(minutes, values, window)
      const start = minutes.findIndex(time => time >= window.fromMinutes)
      const end = minutes.findLastIndex(time => time <= window.toMinutes)
      if (start < 0 || end < start) return
      for (const edge of [start - 1, start, end, end + 1]) if (edge >= 0 && edge < minutes.length) expect(kept).toContain(edge)
    }))
  })

  it('draws the same line where nothing had to go', () => {
    const minutes = Float64Array.of(0, 1, 2, 3)
    expect([...downSample(minutes, Float64Array.of(1, 5, 2, 9), { fromMinutes: 0, toMinutes: 3, columns: 1 })]).toEqual([0, 1, 2, 3])
    expect([...downSample(minutes, Float64Array.of(1, 5, 2, 9), { fromMinutes: 0.5, toMinutes: 1.5, columns: 100 })]).toEqual([0, 1, 2])
  })

  it('changes nothing it was given, and takes empty, single and equal input', () => {
    const values = Float64Array.from({ length: 1000 }, (_, i) => (i * 7919) % 1000)
    const minutes = Float64Array.from({ length: 1000 }, (_, i) => i / 100)
    const before = [...values]
    downSample(minutes, values, { fromMinutes: 0, toMinutes: 10, columns: 10 })
    expect([...values]).toEqual(before)
    expect([...downSample(new Float64Array(0), new Float64Array(0), { fromMinutes: 0, toMinutes: 1, columns: 5 })]).toEqual([])
    expect([...downSample(Float64Array.of(2), Float64Array.of(3), { fromMinutes: 0, toMinutes: 4, columns: 5 })]).toEqual([0])
    expect([...downSample(new Float64Array(100).fill(1), new Float64Array(100).fill(3), { fromMinutes: 0, toMinutes: 2, columns: 2 })]).toEqual([0, 99])
  })

  it('keeps a top beside values that are no numbers', () => {
    const minutes = Float64Array.from({ length: 100 }, (_, i) => i)
    const values = new Float64Array(100).fill(Number.NaN)
    values[40] = 5
    values[41] = 2
    expect([...downSample(minutes, values, { fromMinutes: 0, toMinutes: 99, columns: 1 })]).toEqual([0, 40, 41, 99])
  })

  it('refuses columns of different length and a drawing without a column', () => {
    expect(() => downSample(new Float64Array(2), new Float64Array(3), { fromMinutes: 0, toMinutes: 1, columns: 1 })).toThrow(RangeError)
    expect(() => downSample(new Float64Array(2), new Float64Array(2), { fromMinutes: 0, toMinutes: 1, columns: 0 })).toThrow(RangeError)
  })
})
