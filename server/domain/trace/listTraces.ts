import { asc, eq } from 'drizzle-orm'
import type { StudyTraces } from '../../../shared/types/trace'
import type { Database } from '../../db/open'
import { people, samples, traces, uploads } from '../../db/schema'
import { filesOnTheirWay } from '../upload/filesOnTheirWay'
import { versionsByTrace } from './retireTrace'

/** A study's traces (never their columns), the mzML files that are being read or were refused, and the samples to choose from. */
export function listTraces(db: Database, studyId: string): StudyTraces {
  const rows = db.select({
    id: traces.id, fileName: traces.fileName, sampleId: traces.sampleId, sampleName: samples.name, bytes: traces.bytes, keptBytes: traces.keptBytes, polarity: traces.polarity, profile: traces.profile,
    scans: traces.scans, centroids: traces.centroids, intensityLimit: traces.intensityLimit, lowestMz: traces.lowestMz, highestMz: traces.highestMz, remark: uploads.remark, createdAt: traces.createdAt, createdByName: people.name, replacedAt: traces.replacedAt,
  }).from(traces)
    .innerJoin(people, eq(people.id, traces.createdBy))
    .leftJoin(uploads, eq(uploads.id, traces.id))
    .leftJoin(samples, eq(samples.id, traces.sampleId))
    .where(eq(traces.studyId, studyId)).orderBy(asc(samples.position), asc(traces.createdAt), asc(traces.fileName)).all()
  const used = versionsByTrace(db, studyId)
  return {
    traces: rows.map(row => ({ ...row, versions: used.get(row.id) ?? 0, createdAt: row.createdAt.toISOString(), replacedAt: row.replacedAt?.toISOString() ?? null })),
    ...filesOnTheirWay(db, studyId, 'trace'),
  }
}
