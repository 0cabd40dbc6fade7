import { parentPort, workerData } from 'node:worker_threads'
import { gzipSync } from 'node:zlib'
import { packVerdicts } from '../../shared/formats/verdictColumns'
import { CannotCompare } from '../../shared/science/normalisation/cannotCompare'
import { decideVerdicts } from '../../shared/science/verdict/decideVerdicts'
import { estimateFloor } from '../../shared/science/verdict/estimateFloor'
import { summariseSides } from '../../shared/science/verdict/summariseSides'
import type { CompareWork } from '../domain/comparison/compareWork'
import { lookIntoTrace } from '../domain/trace/files/lookIntoTrace'
import type { TraceMaxima } from '../domain/trace/traceMaxima'

/** Share of the work that looking into traces is told to be, where there is any. */
const LOOKING_SHARE = 0.8

const { settings, tableIntensity, folder, toLookInto, window, ...data } = workerData as CompareWork
const post = (message: unknown, transfer: ArrayBuffer[] = []) => parentPort?.postMessage(message, transfer)

class TraceMissing extends Error {}

function lookIntoTraces(): TraceMaxima[] {
  return toLookInto.map((trace, at) => {
    const message = `Looking into the trace of ${trace.sampleName}, ${at + 1} of ${toLookInto.length}.`
    const maxima = lookIntoTrace(folder, trace, { mz: data.mz, minutes: data.retentionMinutes, ...window }, share => post({ progress: LOOKING_SHARE * (at + share) / toLookInto.length, message }))
    if (!maxima) throw new TraceMissing(`The files of the trace of ${trace.sampleName} are not on the server any more. Upload its mzML again, then compare again.`)
    return { traceId: trace.traceId, maxima }
  })
}

try {
  const maxima = lookIntoTraces()
  const traceMaxima = data.samples.map((_, position) => data.traceMaxima?.[position] ?? maxima[toLookInto.findIndex(trace => trace.position === position)]?.maxima ?? null)
  const start = toLookInto.length > 0 ? LOOKING_SHARE : 0
  const samples = data.samples.map((sample, position) => {
    const intensity = tableIntensity?.[position]
    return sample.floorSource === 'estimated' && intensity ? { ...sample, floor: estimateFloor(intensity) } : sample
  })
  post({ progress: start + 0.1 * (1 - start), message: 'Summarising both sides.' })
  const summary = summariseSides({ ...data, samples, traceMaxima, normaliseByAmount: settings.normaliseByAmount })
  post({ progress: start + 0.6 * (1 - start), message: 'Deciding verdicts.' })
  const result = decideVerdicts(summary, settings)
  const columns = Uint8Array.from(gzipSync(packVerdicts(result), { level: 1 }))
  post({ result: { samples, counts: result.counts, cautions: result.cautions, columns, maxima } }, [columns.buffer])
}
catch (error) {
  if (!(error instanceof CannotCompare || error instanceof TraceMissing)) throw error
  post({ refusal: error.message })
}
