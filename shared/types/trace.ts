import type { UploadLine } from './table'

/** A trace that a version of a comparison looked into. */
export interface UsedTrace {
  /** Place of its sample among the version's samples. */
  position: number
  traceId: string
  fileName: string
  /** SHA-256 of the mzML file. */
  sha256: string
}

/** One sample's trace as the list of traces shows it. Moments are ISO texts. */
export interface TraceLine {
  id: string
  fileName: string
  sampleId: string | null
  sampleName: string | null
  /** Of the file as it came, and of what is kept of it. */
  bytes: number
  keptBytes: number
  polarity: 'positive' | 'negative'
  profile: boolean
  scans: number
  centroids: number
  /** Points below it were not kept; 0: all were. */
  intensityLimit: number
  lowestMz: number
  highestMz: number
  /** What was noticed while it was read, as sentences. */
  remark: string | null
  createdAt: string
  createdByName: string
  /** Versions of comparisons that looked into it. */
  versions: number
  replacedAt: string | null
}

export interface StudyTraces { traces: TraceLine[], uploads: UploadLine[], samples: { id: string, name: string }[] }
