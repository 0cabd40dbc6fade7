import { packComparisonData } from '../../../shared/formats/comparisonData'
import type { Database } from '../../db/open'
import type { Person } from '../person/person'
import { findComparison, findVersion } from './findComparison'
import { versionData } from './versionData'

/** What a version rests on, packed: samples as they were, the intensities of its alignment, and what its traces show. */
export function readComparisonData(db: Database, studyId: string, comparisonId: string, person: Person, number?: number): Uint8Array {
  const comparison = findComparison(db, studyId, comparisonId, person)
  const version = findVersion(db, comparison.id, number)
  return packComparisonData(versionData(db, version))
}
