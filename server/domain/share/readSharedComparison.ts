import { eq } from 'drizzle-orm'
import type { Verdict } from '../../../shared/science/verdict/verdicts'
import type { SharedComparison } from '../../../shared/types/sharedComparison'
import type { Database } from '../../db/open'
import { alignments, comparisons, comparisonVersions } from '../../db/schema'
import { alignedMasses } from '../comparison/alignedMasses'
import { readSamples, storeSample } from '../comparison/storedSample'
import { notFound } from '../DomainError'
import type { OpenShareLink } from './openShareLink'

/** The version a link opens, as a guest may see it: picked field by field, so that nothing new slips in. */
export function readSharedComparison(db: Database, link: OpenShareLink): SharedComparison {
  const { number, createdAt, sideAName, sideBName, counts, settings, samples, engineVersion, cautions } = comparisonVersions
  const row = db.select({ title: comparisons.title, number, createdAt, sideAName, sideBName, counts, settings, samples, engineVersion, cautions, alignmentId: alignments.id })
    .from(comparisonVersions)
    .innerJoin(comparisons, eq(comparisons.id, comparisonVersions.comparisonId))
    .innerJoin(alignments, eq(alignments.id, comparisonVersions.alignmentId))
    .where(eq(comparisonVersions.id, link.versionId)).get()
  if (!row) throw notFound()
  const { alignmentId, ...version } = row
  return {
    ...version,
    ...alignedMasses(db, alignmentId),
    createdAt: row.createdAt.toISOString(),
    counts: row.counts as Record<Verdict, number>,
    samples: readSamples(row.samples).map(storeSample),
    endsAt: link.endsAt.toISOString(),
    mayExport: link.allowExport,
  }
}
