import { eq } from 'drizzle-orm'
import type { Database } from '../../db/open'
import { comparisonVersions } from '../../db/schema'
import { notFound } from '../DomainError'
import { usedTraces } from '../trace/alignedTraces'
import { packedExtractedTraces, packedSampleTraces } from '../trace/packedTraces'
import type { OpenShareLink } from './openShareLink'

/** Total and base peak of the raw data that a shared version looked into, packed: nothing that came to its samples otherwise. */
export function sharedTraces(db: Database, link: OpenShareLink): Uint8Array {
  const { alignmentId, traces } = sharedVersion(db, link)
  return packedSampleTraces(db, usedTraces(db, alignmentId, traces))
}

/** The extracted traces of some features in the same raw data, packed. */
export async function sharedExtracted(open: { db: Database, folder: string }, link: OpenShareLink, features: readonly number[], signal?: AbortSignal): Promise<Uint8Array> {
  const { alignmentId, traces } = sharedVersion(open.db, link)
  return packedExtractedTraces(open, alignmentId, usedTraces(open.db, alignmentId, traces), features, signal)
}

function sharedVersion(db: Database, link: OpenShareLink) {
  const { alignmentId, traces } = comparisonVersions
  const version = db.select({ alignmentId, traces }).from(comparisonVersions).where(eq(comparisonVersions.id, link.versionId)).get()
  if (!version) throw notFound()
  return version
}
