import { describe, expect, it } from 'vitest'
import { simulateStudy } from '../../../server/domain/demo/injections'
import { ionsOf } from '../../../server/domain/demo/ions'
import { runFileName, runFiles } from '../../../server/domain/demo/runFiles'
import { DEMO_PEAK_LIMIT } from '../../../server/domain/demo/simulateTable'
import { demoStudies } from '../../../server/domain/demo/studies'
import { extractTrace, traceWindow } from '../../../shared/science/traces/extractTrace'
import { judgeDemoStudy } from '../../support/judgeDemoStudy'
import { tracesOf } from '../../support/readMzml'

const [juices] = demoStudies
const tables = simulateStudy(juices)

/** The raw data of one sample: its highest signal at an m/z within a time of minutes, and its table. */
async function runOf(sampleName: string) {
  const [file] = [...runFiles(juices, [sampleName])]
  const { traces, centroids } = await tracesOf(file?.text ?? '', juices.polarity)
  const table = tables[juices.sheet.findIndex(sample => sample.name === sampleName)]
  if (!table) throw new Error(`no table of ${sampleName}`)
  const highest = (mz: number, minutes: number, within: number) => {
    const trace = extractTrace(centroids, traceWindow(mz, 10), traces.minutes.length)
    return Math.max(...trace.filter((_, scan) => Math.abs((traces.minutes[scan] ?? 0) - minutes) <= within))
  }
  const lists = (mz: number, minutes: number) => table.mz.some((value, row) => Math.abs(value - mz) / mz < 10e-6 && Math.abs((table.retentionMinutes[row] ?? 0) - minutes) < 0.3)
  return { table, traces, highest, lists, bytes: file?.text.length ?? 0, name: file?.name }
}
const mainIon = (name: string) => {
  const ion = ionsOf(juices.compounds).find(({ compound }) => juices.compounds[compound]?.name === name)
  if (!ion) throw new Error(`no ${name}`)
  return ion
}

describe('the demo\'s raw data', () => {
  it('are small, the same at each making, and of both sides, blanks and QCs', async () => {
    const { bytes, name, traces } = await runOf('Millrace-1')
    expect(name).toBe(runFileName('Millrace-1'))
    expect(bytes).toBeLessThan(600_000)
    expect(traces.minutes).toHaveLength(500)
    expect([...runFiles(juices, ['Millrace-1'])]).toEqual([...runFiles(juices, ['Millrace-1'])])
    const kinds = juices.traced.map(traced => juices.sheet.find(sample => sample.name === traced)).map(sample => `${sample?.kind} ${sample?.side ?? ''}`.trim())
    for (const kind of ['sample A', 'sample B', 'pooledQc']) expect(kinds.filter(each => each === kind).length, kind).toBeGreaterThanOrEqual(2)
    expect(kinds).toEqual(expect.arrayContaining(['solventBlank', 'processBlank']))
  })

  it('show what the table lists, at its m/z, time and height', async () => {
    for (const name of ['Millrace-2', 'Tallow-Lane-1']) {
      const { table, highest } = await runOf(name)
      const strong = table.intensity.flatMap((intensity, row) => intensity > 2 * DEMO_PEAK_LIMIT && (table.retentionMinutes[row] ?? 0) > 0.8 ? [row] : [])
      expect(strong.length).toBeGreaterThan(500)
      const shares = strong.map(row => highest(table.mz[row] ?? 0, table.retentionMinutes[row] ?? 0, 0.05) / (table.intensity[row] ?? 1))
      expect(Math.min(...shares)).toBeGreaterThan(0.7)
      // Where more is seen, another peak of the same mass stands beside it.
      expect(shares.filter(share => share < 1.25).length / shares.length).toBeGreaterThan(0.85)
    }
  })

  it('hold a signal that no table of the side lists, where the tables alone say that only the other has it', async () => {
    const { featuresOf } = judgeDemoStudy(juices)
    for (const { compound, side, share } of juices.overlooked ?? []) {
      const ion = mainIon(compound)
      const own = juices.compounds[ion.compound]
      expect(featuresOf(compound).map(feature => feature.verdict)).toContain(side === 'B' ? 'onlyA' : 'onlyB')
      const { highest, lists } = await runOf(side === 'B' ? 'Tallow-Lane-2' : 'Millrace-2')
      expect(lists(ion.mz, ion.retentionMinutes)).toBe(false)
      const seen = highest(ion.mz, ion.retentionMinutes, 0.3)
      expect(seen).toBeGreaterThan(share * Math.max(own?.levelA ?? 0, own?.levelB ?? 0) * 0.6)
    }
  })

  it('are empty where a compound truly is not there', async () => {
    for (const [compound, sample] of [['patulin', 'Tallow-Lane-1'], ['5-hydroxymethylfurfural', 'Millrace-1']] as const) {
      const { mz, retentionMinutes } = mainIon(compound)
      const { highest } = await runOf(sample)
      expect(highest(mz, retentionMinutes, 0.25), compound).toBeLessThan(DEMO_PEAK_LIMIT / 1.5)
    }
  })
})
