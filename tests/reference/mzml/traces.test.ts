// Reference: data/mzml/expected.json, made with the files by data/make-mzml.py from the mzML 1.1 standard (Martens et al. 2011).
import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { readScans } from '../../../shared/formats/mzml/readScans'
import { extractTrace, traceWindow } from '../../../shared/science/traces/extractTrace'
import { inPieces, scansOf, tracesOf } from '../../support/readMzml'

interface Expected { minutes: number[], total: number[], base: number[], extracted5ppm: Record<string, number[]> }
const folder = new URL('../data/mzml/', import.meta.url)
const bytesOf = (name: string) => readFileSync(new URL(`${name}.mzML`, folder))
const reference = JSON.parse(readFileSync(new URL('expected.json', folder), 'utf8')) as Record<string, Expected> & { refuse: Record<string, string> }
const files = ['minutes-zlib-indexed', 'seconds-plain-64bit', 'param-group-32bit', 'polarity-switching', 'empty-scan-without-time']

const refusals: Record<string, RegExp> = {
  'compression not supported, named': /MS-Numpress linear prediction compression.*not supported/,
  'document type declarations are not accepted': /document type declarations are not accepted/,
  'the file ends early': /the file ends early/,
}

function expectClose(found: Float64Array, expected: number[]) {
  expect(found).toHaveLength(expected.length)
  const worst = Math.max(...expected.map((value, i) => Math.abs((found[i] ?? Number.NaN) - value) / Math.max(Math.abs(value), 1e-300)))
  expect(worst).toBeLessThanOrEqual(1e-9)
}

describe('traces of mzML files', () => {
  it.each(files)('%s', async (name) => {
    const expected = reference[name] as Expected
    const { traces, centroids } = await tracesOf(bytesOf(name))
    expectClose(traces.minutes, expected.minutes)
    expectClose(traces.total, expected.total)
    expectClose(traces.base, expected.base)
    expect(Object.keys(expected.extracted5ppm)).toHaveLength(3)
    for (const [mz, trace] of Object.entries(expected.extracted5ppm)) {
      expectClose(extractTrace(centroids, traceWindow(Number(mz), 5, 0), expected.minutes.length), trace)
    }
  })

  it('says which files hold profile data', async () => {
    for (const name of files) {
      const scans = await scansOf(bytesOf(name))
      expect(scans.every(scan => scan.profile === (name === 'param-group-32bit')), name).toBe(true)
    }
  })

  it('reads the other polarity of a switching run alone', async () => {
    const scans = await scansOf(bytesOf('polarity-switching'), 'positive')
    expect(scans.length).toBeGreaterThanOrEqual(60)
    expect(scans.every(scan => scan.intensity[1] === 2e8)).toBe(true)
  })

  it('passes over a scan that has no time, and says so', async () => {
    expect(await readScans(inPieces(bytesOf('empty-scan-without-time')), 'negative', () => {})).toEqual({ scans: 20, withoutTime: 1 })
  })

  it.each(Object.entries(reference.refuse))('%s is refused: %s', async (name, reason) => {
    const sentence = refusals[reason]
    expect(sentence).toBeDefined()
    await expect(scansOf(bytesOf(name))).rejects.toThrow(sentence)
  })
})
