import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { highestSignals } from '../../../shared/science/traces/highestSignals'
import { slicedTrace } from '../../support/manyCentroids'
import { tracesOf } from '../../support/readMzml'
import { referenceFile } from '../../support/upload'

const expected = JSON.parse(readFileSync(new URL('../data/mzml/expected.json', import.meta.url), 'utf8')) as Record<string, { minutes: number[], extracted5ppm: Record<string, number[]> }>
/** The three compounds of make-mzml.py near the times of their peaks; one more time, between peaks. */
const compounds: readonly (readonly [mz: string, minutes: number])[] = [['153.01933', 1.15], ['153.01933', 1.2], ['353.08781', 3], ['435.12967', 4.4], ['353.08781', 1.85]]
const RETENTION_MINUTES = 0.105

describe('the highest signals of traces made outside', () => {
  it.each(['minutes-zlib-indexed', 'seconds-plain-64bit', 'param-group-32bit', 'polarity-switching'])('%s', async (name) => {
    const { minutes = [], extracted5ppm = {} } = expected[name] ?? {}
    const { traces, centroids } = await tracesOf(referenceFile(`mzml/${name}.mzML`))
    const covered = compounds.filter(([, time]) => time < (minutes.at(-1) ?? 0))
    const found = highestSignals(
      Float64Array.from(compounds, ([mz]) => Number(mz)), Float64Array.from(compounds, ([, time]) => time),
      slicedTrace(centroids, { scanMinutes: traces.minutes, offsetPpm: 0 }), { alignMassPpm: 5, massFloorDa: 0, retentionMinutes: RETENTION_MINUTES })
    expect(covered.length).toBeGreaterThan(0)
    compounds.forEach((compound, i) => {
      const [mz, time] = compound
      const near = (extracted5ppm[mz] ?? []).filter((_, scan) => Math.abs((minutes[scan] ?? Number.NaN) - time) <= RETENTION_MINUTES)
      const highest = covered.includes(compound) ? Math.max(...near) : Number.NaN
      if (Number.isNaN(highest)) expect(found[i]).toBeNaN()
      else expect(Math.abs((found[i] ?? Number.NaN) - highest)).toBeLessThanOrEqual(1e-9 * highest)
    })
  })
})
