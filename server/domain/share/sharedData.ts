import { eq } from 'drizzle-orm'
import { packComparisonData } from '../../../shared/formats/comparisonData'
import type { Database } from '../../db/open'
import { comparisonVersions } from '../../db/schema'
import { versionData } from '../comparison/versionData'
import { notFound } from '../DomainError'
import type { OpenShareLink } from './openShareLink'

/** The intensities a shared version rests on, packed: for values per sample on the guest's bench. */
export function sharedData(db: Database, link: OpenShareLink): Uint8Array {
  const { alignmentId, samples, traces } = comparisonVersions
  const version = db.select({ alignmentId, samples, traces }).from(comparisonVersions).where(eq(comparisonVersions.id, link.versionId)).get()
  if (!version) throw notFound()
  return packComparisonData(versionData(db, version))
}
