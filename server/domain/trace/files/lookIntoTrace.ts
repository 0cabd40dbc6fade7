import { existsSync } from 'node:fs'
import { highestSignals, type AlignedScans, type SignalWindow } from '../../../../shared/science/traces/highestSignals'
import { sliceReader } from './sliceReader'
import { traceFolder } from './traceFolder'

/** A trace that a job is to look into. */
export interface TraceToLookInto extends Omit<AlignedScans, 'centroidsBetween'> {
  traceId: string
  /** Place of its sample among the samples. */
  position: number
  sampleName: string
}

/** What is looked for: the aligned features, and how far from them a signal may stand. */
export interface LookedFor extends SignalWindow {
  mz: Float64Array
  /** Times of the features. */
  minutes: Float64Array
}

/** The highest signal of every aligned feature in one trace, read from its slices; null where its files are not there. `onStep` is told the share done. */
export function lookIntoTrace(folder: string, trace: TraceToLookInto, { mz, minutes, ...window }: LookedFor, onStep: (share: number) => void): Float64Array | null {
  if (!existsSync(traceFolder(folder, trace.traceId))) return null
  return highestSignals(mz, minutes, { ...trace, centroidsBetween: sliceReader(folder, trace.traceId) }, window, onStep)
}
