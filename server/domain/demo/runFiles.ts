import { writeMzml } from '../../../shared/formats/mzml/writeMzml'
import type { DemoFile } from './exportFiles'
import { overlookedSignals, simulateStudy } from './injections'
import { seededRandom } from './seededRandom'
import { simulateRun } from './simulateRun'
import type { DemoStudy } from './studies'

export const runFileName = (sampleName: string) => `${sampleName}.mzML`

/** The raw data of a study's traced samples, one after the other: of the same injections as its tables. */
export function* runFiles(study: DemoStudy, names: readonly string[] = study.traced): Generator<DemoFile> {
  const tables = simulateStudy(study)
  for (const [index, sample] of study.sheet.entries()) {
    const table = tables[index]
    if (!table || !names.includes(sample.name)) continue
    const scans = simulateRun(table.signals, overlookedSignals(study, sample), study.polarity, seededRandom(`${study.seed} run ${sample.name}`))
    // Not compressed: so its bytes are the same whatever the version of zlib, and hardly more.
    yield { name: runFileName(sample.name), text: [...writeMzml(scans.length, scans, { zlib: false, mzBits: 32, intensityBits: 32, grouped: true })].join('') }
  }
}
