import { eq } from 'drizzle-orm'
import { packComparisonData } from '../../../shared/formats/comparisonData'
import type { Database } from '../../db/open'
import { comparisonVersions } from '../../db/schema'
import { alignmentData } from '../comparison/alignmentData'
import { readSamples } from '../comparison/storedSample'
import { notFound } from '../DomainError'
import type { OpenShareLink } from './openShareLink'

/** The intensities a shared version rests on, packed: for values per sample on the guest's bench. */
export function sharedData(db: Database, link: OpenShareLink): Uint8Array {
  const { alignmentId, samples } = comparisonVersions
  const version = db.select({ alignmentId, samples }).from(comparisonVersions).where(eq(comparisonVersions.id, link.versionId)).get()
  if (!version) throw notFound()
  return packComparisonData({ ...alignmentData(db, version.alignmentId), samples: readSamples(version.samples) })
}
