import type { MzmlScan } from '../../shared/formats/mzml/mzmlParser'
import { readScans } from '../../shared/formats/mzml/readScans'
import type { ScanPolarity } from '../../shared/formats/mzml/scanCounts'
import type { Centroids } from '../../shared/science/traces/centroids'
import { TraceGatherer, type RunTraces } from '../../shared/science/traces/gatherTraces'
import { sortCentroids } from '../../shared/science/traces/sortCentroids'

/** Bytes in pieces of this many. */
export async function* inPieces(source: Uint8Array | string, bytes = 65_536): AsyncGenerator<Uint8Array> {
  const all = typeof source === 'string' ? new TextEncoder().encode(source) : source
  for (let at = 0; at < all.length; at += bytes) yield all.subarray(at, at + bytes)
}

/** All scans of a small file. */
export async function scansOf(source: Uint8Array | string, polarity: ScanPolarity = 'negative', bytes?: number): Promise<MzmlScan[]> {
  const scans: MzmlScan[] = []
  await readScans(inPieces(source, bytes), polarity, scan => scans.push(scan))
  return scans
}

/** A small file as its traces and all of its points, sorted. */
export async function tracesOf(source: Uint8Array | string, polarity: ScanPolarity = 'negative', bytes?: number): Promise<{ traces: RunTraces, centroids: Centroids }> {
  const gatherer = new TraceGatherer()
  const mz: number[] = []
  const intensity: number[] = []
  const scan: number[] = []
  for (const one of await scansOf(source, polarity, bytes)) {
    const place = gatherer.add(one.minutes, one.mz, one.intensity)
    mz.push(...one.mz)
    intensity.push(...one.intensity)
    scan.push(...Array.from(one.mz, () => place))
  }
  const { traces, place } = gatherer.take()
  return { traces, centroids: sortCentroids({ mz: Float64Array.from(mz), intensity: Float64Array.from(intensity), scan: Int32Array.from(scan) }, place) }
}
