/** A trace that a version of a comparison looked into. */
export interface UsedTrace {
  /** Place of its sample among the version's samples. */
  position: number
  traceId: string
  fileName: string
  /** SHA-256 of the mzML file. */
  sha256: string
}
