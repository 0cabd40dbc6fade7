import { parentPort, workerData } from 'node:worker_threads'
import { gzipSync } from 'node:zlib'
import type { ComparisonData } from '../../shared/formats/comparisonData'
import { packVerdicts } from '../../shared/formats/verdictColumns'
import { CannotCompare } from '../../shared/science/normalisation/cannotCompare'
import { decideVerdicts } from '../../shared/science/verdict/decideVerdicts'
import { estimateFloor } from '../../shared/science/verdict/estimateFloor'
import type { ComparisonSettings } from '../../shared/science/verdict/settings'
import { summariseSides } from '../../shared/science/verdict/summariseSides'

/** Estimated floors are still NaN where `tableIntensity` is given: all intensities of each table. */
export interface CompareWork extends ComparisonData {
  settings: ComparisonSettings
  tableIntensity: Float64Array[] | null
}

const { settings, tableIntensity, ...data } = workerData as CompareWork
try {
  const samples = data.samples.map((sample, position) => {
    const intensity = tableIntensity?.[position]
    return sample.floorSource === 'estimated' && intensity ? { ...sample, floor: estimateFloor(intensity) } : sample
  })
  parentPort?.postMessage({ progress: 0.1, message: 'Summarising both sides.' })
  const summary = summariseSides({ ...data, samples, normaliseByAmount: settings.normaliseByAmount })
  parentPort?.postMessage({ progress: 0.6, message: 'Deciding verdicts.' })
  const result = decideVerdicts(summary, settings)
  const columns = Uint8Array.from(gzipSync(packVerdicts(result), { level: 1 }))
  parentPort?.postMessage({ result: { samples, counts: result.counts, cautions: result.cautions, columns } }, [columns.buffer])
}
catch (error) {
  if (!(error instanceof CannotCompare)) throw error
  parentPort?.postMessage({ refusal: error.message })
}
