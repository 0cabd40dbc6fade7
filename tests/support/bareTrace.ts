import type { OpenDatabase } from '../../server/db/open'
import { packFloat64 } from '../../server/db/packed'
import { traces } from '../../server/db/schema'
import type { UsedTrace } from '../../shared/types/trace'

/** A trace of a sample without any points kept, read in by nobody; as a version of a comparison names it. */
export function addBareTrace({ db }: Pick<OpenDatabase, 'db'>, studyId: string, createdBy: string, sample: { position: number, sampleId: string }, fileName: string, minutes: readonly number[] = [1, 2, 3]): UsedTrace {
  const column = packFloat64(Float64Array.from(minutes))
  const { id, sha256 } = db.insert(traces).values({
    studyId, sampleId: sample.sampleId, fileName, sha256: fileName, bytes: 100, keptBytes: 100, polarity: 'negative', profile: false, scans: minutes.length, centroids: 0,
    intensityLimit: 0, lowestMz: 50, highestMz: 1000, minutes: column, total: column, base: column, createdBy,
  }).returning().get()
  return { position: sample.position, traceId: id, fileName, sha256 }
}
