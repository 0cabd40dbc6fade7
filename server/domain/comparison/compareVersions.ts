import { eq } from 'drizzle-orm'
import { unpackVerdicts } from '../../../shared/formats/verdictColumns'
import { settingDifferences } from '../../../shared/science/alignment/settingDifferences'
import type { VerdictColumns } from '../../../shared/science/verdict/verdictResult'
import type { Verdict } from '../../../shared/science/verdict/verdicts'
import type { ChangedVersion, VersionChanges } from '../../../shared/types/comparison'
import type { Database } from '../../db/open'
import { alignments } from '../../db/schema'
import { findVisibleAlignment } from '../alignment/findVisibleAlignment'
import { DomainError } from '../DomainError'
import type { Person } from '../person/person'
import { changesOf } from './changesOf'
import { findComparison, findVersion, type FoundVersion } from './findComparison'
import { matchAlignments } from './matchAlignments'
import { versionColumns } from './readVersion'
import { readSamples } from './storedSample'
import { unzip } from './unzip'
import { versionDifferences } from './versionDifferences'

export interface ChangesQuery { version?: number, against?: number, againstComparison?: string }

/** What changed between two versions, of one comparison or of two, on one alignment or on two. */
export async function compareVersions(db: Database, studyId: string, comparisonId: string, query: ChangesQuery, person: Person): Promise<VersionChanges> {
  const comparison = findComparison(db, studyId, comparisonId, person)
  const version = findVersion(db, comparison.id, query.version)
  const other = query.againstComparison ? findComparison(db, studyId, query.againstComparison, person) : comparison
  if (other.id === comparison.id && query.against === undefined && version.number === 1) throw new DomainError('invalid', 'This is the first version; name another to compare with.')
  const earlier = findVersion(db, other.id, query.against ?? (other.id === comparison.id ? version.number - 1 : undefined))
  const numberOf = (found: FoundVersion) => findVisibleAlignment(db, studyId, found.alignmentId, person).number
  const [after, before] = [await columnsOf(db, version.id), await columnsOf(db, earlier.id)]
  const match = version.alignmentId === earlier.alignmentId ? null : await matchAlignments(db, version.alignmentId, earlier.alignmentId, after.mz.length)
  const content = (found: FoundVersion) => ({ ...found, samples: readSamples(found.samples), alignmentNumber: numberOf(found) })
  const line = (found: FoundVersion, of: typeof comparison): ChangedVersion => ({
    comparisonId: of.id, title: of.title, number: found.number, alignmentNumber: numberOf(found), counts: found.counts as Record<Verdict, number>,
  })
  return {
    before: line(earlier, other),
    after: line(version, comparison),
    differs: [...versionDifferences(content(earlier), content(version)), ...alignedOtherwise(db, earlier.alignmentId, version.alignmentId)],
    ...changesOf(before, after, match),
  }
}

/** What two alignments were set otherwise, as sentences. */
function alignedOtherwise(db: Database, before: string, after: string): string[] {
  const settingsOf = (id: string) => db.select({ settings: alignments.settings }).from(alignments).where(eq(alignments.id, id)).get()?.settings
  const [was, is] = [settingsOf(before), settingsOf(after)]
  return was && is ? settingDifferences(was, is) : []
}

async function columnsOf(db: Database, versionId: string): Promise<VerdictColumns> {
  return unpackVerdicts(await unzip(versionColumns(db, versionId))).columns
}
