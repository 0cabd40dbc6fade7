import { eq, inArray } from 'drizzle-orm'
import { packExtractedTraces, packSampleTraces, type ExtractedTrace } from '../../../shared/formats/traceColumns'
import { slicesBetween } from '../../../shared/science/traces/centroids'
import { extractTrace, traceWindow, type MzWindow } from '../../../shared/science/traces/extractTrace'
import { inTimeOrder } from '../../../shared/science/traces/inTimeOrder'
import type { Database } from '../../db/open'
import { unpackFloat64 } from '../../db/packed'
import { alignments, traces } from '../../db/schema'
import { DomainError, notFound } from '../DomainError'
import type { AlignedTrace } from './alignedTraces'
import { readCentroids } from './files/readCentroids'

/** Total and base peak of these traces on the alignment's common time, packed. */
export function packedSampleTraces(db: Database, aligned: readonly AlignedTrace[]): Uint8Array {
  const rows = db.select({ id: traces.id, total: traces.total, base: traces.base }).from(traces).where(inArray(traces.id, aligned.map(({ traceId }) => traceId))).all()
  const byId = new Map(rows.map(row => [row.id, row]))
  return packSampleTraces(aligned.flatMap(({ traceId, position, scanMinutes }) => {
    const row = byId.get(traceId)
    if (!row) return []
    const { minutes, columns: [total = minutes, base = minutes] } = inTimeOrder(scanMinutes, [unpackFloat64(row.total), unpackFloat64(row.base)])
    return [{ position, minutes, total, base }]
  }))
}

/**
 * The extracted traces of these features in each of these traces, packed: mass tolerance of the alignment, each trace's mass
 * offset taken out. A trace that does not reach a feature's m/z has none of it.
 *
 * @param features places in the alignment
 * @param signal ends the work where nobody waits for it any more
 * @throws DomainError where the alignment has no such feature; the signal's reason once it is aborted
 */
export async function packedExtractedTraces({ db, folder }: { db: Database, folder: string }, alignmentId: string, aligned: readonly AlignedTrace[], features: readonly number[], signal?: AbortSignal): Promise<Uint8Array> {
  const windows = featureWindows(db, alignmentId, features)
  const extracted: ExtractedTrace[] = []
  // One trace after the other, so that no more than one's points are in memory.
  for (const trace of aligned) extracted.push(...await extractFrom(folder, trace, windows, signal))
  return packExtractedTraces(extracted)
}

interface FeatureWindow extends MzWindow { feature: number }

function featureWindows(db: Database, alignmentId: string, features: readonly number[]): FeatureWindow[] {
  const row = db.select({ mz: alignments.mz, settings: alignments.settings }).from(alignments).where(eq(alignments.id, alignmentId)).get()
  if (!row) throw notFound()
  const mz = unpackFloat64(row.mz)
  return [...new Set(features)].map((feature) => {
    const own = mz[feature]
    if (own === undefined) throw new DomainError('invalid', `This alignment has ${mz.length} features, and no #${feature + 1} among them.`)
    return { feature, ...traceWindow(own, row.settings.alignMassPpm, row.settings.massFloorDa) }
  })
}

async function extractFrom(folder: string, trace: AlignedTrace, windows: readonly FeatureWindow[], signal?: AbortSignal): Promise<ExtractedTrace[]> {
  const shift = 1 + trace.offsetPpm * 1e-6
  const asMeasured = windows.map(({ feature, lowMz, highMz }) => ({ feature, lowMz: lowMz * shift, highMz: highMz * shift }))
    .filter(({ lowMz, highMz }) => highMz >= trace.lowestMz && lowMz <= trace.highestMz)
  const extracted: ExtractedTrace[] = []
  for (const group of bySlices(asMeasured)) {
    signal?.throwIfAborted()
    const around = { lowMz: Math.min(...group.map(({ lowMz }) => lowMz)), highMz: Math.max(...group.map(({ highMz }) => highMz)) }
    const points = await readCentroids(folder, trace.traceId, around)
    for (const { feature, ...window } of group) {
      const { minutes, columns: [values = trace.scanMinutes] } = inTimeOrder(trace.scanMinutes, [extractTrace(points, window, trace.scanMinutes.length)])
      extracted.push({ position: trace.position, feature, minutes, values })
    }
  }
  return extracted
}

/** Features whose windows lie in the same slices, so that each slice is read once. */
function bySlices(windows: readonly FeatureWindow[]): FeatureWindow[][] {
  const groups = new Map<string, FeatureWindow[]>()
  for (const window of windows) {
    const slices = slicesBetween(window.lowMz, window.highMz).join()
    groups.set(slices, [...groups.get(slices) ?? [], window])
  }
  return [...groups.values()]
}
