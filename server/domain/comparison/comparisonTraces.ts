import type { ExtractQuery } from '../../../shared/schemas/comparison'
import type { Database } from '../../db/open'
import type { Person } from '../person/person'
import { packedExtractedTraces, packedSampleTraces } from '../trace/packedTraces'
import { versionTraces } from '../trace/versionTraces'
import { findComparison, findVersion } from './findComparison'

/** Total and base peak of the samples of a version that have raw data, packed. */
export function comparisonTraces(db: Database, studyId: string, comparisonId: string, person: Person, number?: number): Uint8Array {
  const version = findVersion(db, findComparison(db, studyId, comparisonId, person).id, number)
  return packedSampleTraces(db, versionTraces(db, version))
}

/** The extracted traces of some features in these samples, packed. */
export async function comparisonExtracted(open: { db: Database, folder: string }, studyId: string, comparisonId: string, person: Person, { version: number, features }: ExtractQuery, signal?: AbortSignal): Promise<Uint8Array> {
  const version = findVersion(open.db, findComparison(open.db, studyId, comparisonId, person).id, number)
  return packedExtractedTraces(open, version.alignmentId, versionTraces(open.db, version), features, signal)
}
