import type { Database } from '../../server/db/open'
import { alignments, comparisons, comparisonVersions } from '../../server/db/schema'
import { comparisonDefaults } from '../../shared/science/verdict/settings'

/** A version of a comparison that looked into a trace, as far as the database must know. */
export function addUsedTrace(db: Database, studyId: string, createdBy: string, traceId: string) {
  const empty = Buffer.alloc(0)
  const alignment = db.insert(alignments).values({ studyId, number: 1, settings: {} as never, engineVersion: '1', groups: 0, reference: -1, mz: empty, retentionMinutes: empty, groupSize: empty, neighbourStart: empty, neighbourList: empty, createdBy }).returning().get()
  const comparison = db.insert(comparisons).values({ studyId, title: 'A against B', createdBy }).returning().get()
  db.insert(comparisonVersions).values({
    comparisonId: comparison.id, studyId, alignmentId: alignment.id, number: 1, sideAName: 'A', sideBName: 'B', settings: comparisonDefaults, samples: [],
    traces: [{ position: 0, traceId, fileName: 'a.mzML', sha256: '' }], engineVersion: '1', counts: {}, columns: empty, createdBy,
  }).run()
}
