import { eq } from 'drizzle-orm'
import { can } from '../../../shared/permissions'
import type { ComparisonDetail } from '../../../shared/types/comparison'
import type { Database } from '../../db/open'
import { people } from '../../db/schema'
import { notFound } from '../DomainError'
import type { Person } from '../person/person'
import { findComparison, findVersion } from './findComparison'
import { versionDetail } from './readVersion'
import { versionLines } from './versionLine'

/** A comparison with one version of it (the latest unless a number is given), without its columns. */
export function readComparison(db: Database, studyId: string, comparisonId: string, person: Person, number?: number): ComparisonDetail {
  const comparison = findComparison(db, studyId, comparisonId, person)
  const version = findVersion(db, comparison.id, number)
  const versions = versionLines(db, [comparison.id]).get(comparison.id) ?? []
  const line = versions.find(candidate => candidate.number === version.number)
  const maker = db.select({ name: people.name }).from(people).where(eq(people.id, comparison.createdBy)).get()
  if (!line || !maker) throw notFound()
  return {
    id: comparison.id,
    title: comparison.title,
    practice: comparison.practice,
    createdBy: comparison.createdBy,
    createdByName: maker.name,
    versions,
    version: versionDetail(db, version, line),
    mayChange: can(person, comparison.practice ? 'practise' : 'compare'),
  }
}
