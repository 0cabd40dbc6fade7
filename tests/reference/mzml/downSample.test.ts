// Reference: data/mzml/expected.json (see traces.test.ts). Whatever is left out for drawing, the tops of the reference traces stay.
import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { downSample } from '../../../shared/science/traces/downSample'

interface Expected { minutes: number[], total: number[], base: number[], extracted5ppm: Record<string, number[]> }
const reference = JSON.parse(readFileSync(new URL('../data/mzml/expected.json', import.meta.url), 'utf8')) as Record<string, Expected>
const files = Object.entries(reference).filter(([, each]) => Array.isArray(each.minutes))
const traces = files.flatMap(([name, { minutes, total, base, extracted5ppm }]) =>
  [['total', total], ['base', base], ...Object.entries(extracted5ppm)].map(([which, values]) => ({ name: `${name}, ${String(which)}`, minutes: Float64Array.from(minutes), values: Float64Array.from(values as number[]) })))

describe('reference traces, down-sampled', () => {
  it.each(traces)('$name', ({ minutes, values }) => {
    const [fromMinutes = 0, toMinutes = 0] = [minutes[0], minutes.at(-1)]
    for (const columns of [1, 2, 5, 8]) {
      const kept = downSample(minutes, values, { fromMinutes, toMinutes, columns })
      expect(kept.length).toBeLessThanOrEqual(4 * columns + 2)
      const width = (toMinutes - fromMinutes) / columns
      for (let column = 0; column < columns; column++) {
        const inside = [...minutes.keys()].filter(i => Math.min(columns - 1, Math.floor(((minutes[i] ?? 0) - fromMinutes) * (columns / (toMinutes - fromMinutes)))) === column)
        const highest = (places: number[]) => Math.max(...places.map(i => values[i] ?? 0))
        if (inside.length > 0) expect(highest([...kept].filter(i => inside.includes(i))), `column ${column} of ${width} min`).toBe(highest(inside))
      }
    }
  })

  it('are many and long enough to need it', () => {
    expect(traces.length).toBeGreaterThanOrEqual(20)
    expect(Math.max(...traces.map(({ minutes }) => minutes.length))).toBeGreaterThan(4 * 8 + 2)
  })
})
