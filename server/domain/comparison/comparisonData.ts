import { packComparisonData } from '../../../shared/formats/comparisonData'
import type { Database } from '../../db/open'
import type { Person } from '../person/person'
import { alignmentData } from './alignmentData'
import { findComparison, findVersion } from './findComparison'
import { readSamples } from './storedSample'

/** What a version rests on, packed: samples as they were, and the intensities of its alignment. */
export function readComparisonData(db: Database, studyId: string, comparisonId: string, person: Person, number?: number): Uint8Array {
  const comparison = findComparison(db, studyId, comparisonId, person)
  const version = findVersion(db, comparison.id, number)
  return packComparisonData({ ...alignmentData(db, version.alignmentId), samples: readSamples(version.samples) })
}
