import { gzipSync } from 'node:zlib'
import { columnOf, packColumns, unpackColumns } from '../../../../shared/formats/packedColumns'
import { firstAbove, firstNotBelow } from '../../../../shared/science/numeric/firstPlace'
import type { Centroids } from '../../../../shared/science/traces/centroids'
import type { MzWindow } from '../../../../shared/science/traces/extractTrace'

/** Quick, and nearly as small as slower ways: the last digits of measured numbers don't compress. */
const COMPRESSION_LEVEL = 3

export const noCentroids = (): Centroids => ({ mz: new Float64Array(0), intensity: new Float64Array(0), scan: new Int32Array(0) })

/** A slice's sorted points as bytes. */
export const packSlice = ({ mz, intensity, scan }: Centroids): Buffer => gzipSync(packColumns({}, { mz, intensity, scan }), { level: COMPRESSION_LEVEL })

/** The points within a window from the unpacked bytes of one slice: views, not copies. */
export function pointsWithin(bytes: Uint8Array, { lowMz, highMz }: MzWindow): Centroids {
  const { columns } = unpackColumns(bytes)
  const mz = columnOf(columns, 'mz', Float64Array)
  const [from, to] = [firstNotBelow(mz, lowMz), firstAbove(mz, highMz)]
  return { mz: mz.subarray(from, to), intensity: columnOf(columns, 'intensity', Float64Array).subarray(from, to), scan: columnOf(columns, 'scan', Int32Array).subarray(from, to) }
}

/** Points of ascending slices, one after the other. */
export function joinCentroids(parts: readonly Centroids[]): Centroids {
  if (parts.length === 1 && parts[0]) return parts[0]
  const length = parts.reduce((sum, part) => sum + part.mz.length, 0)
  const joined = { mz: new Float64Array(length), intensity: new Float64Array(length), scan: new Int32Array(length) }
  let at = 0
  for (const part of parts) {
    joined.mz.set(part.mz, at)
    joined.intensity.set(part.intensity, at)
    joined.scan.set(part.scan, at)
    at += part.mz.length
  }
  return joined
}
