import type { ScanPolarity } from '../../../shared/formats/mzml/scanCounts'
import type { RunTraces } from '../../../shared/science/traces/gatherTraces'

/** What the worker is given of one mzML file. */
export interface TraceTask {
  /** Also the name of its folder under `traces/`. */
  traceId: string
  fileName: string
  path: string
  bytes: number
  /** The data folder. */
  folder: string
  polarity: ScanPolarity
  /** Points below it are not kept, though they count for the total; 0 keeps all that are above nought. */
  intensityLimit: number
}

/** What the worker gives back; the points lie in their folder by then. */
export interface ReadTrace {
  polarity: ScanPolarity
  traces: RunTraces
  scans: number
  centroids: number
  /** Bytes of the slices. */
  keptBytes: number
  profile: boolean
  lowestMz: number
  highestMz: number
  /** What was noticed, as sentences. */
  remarks: string[]
}
