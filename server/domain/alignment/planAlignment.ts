import { and, desc, eq } from 'drizzle-orm'
import { can } from '../../../shared/permissions'
import type { NewAlignment } from '../../../shared/schemas/alignment'
import type { Database } from '../../db/open'
import { alignments } from '../../db/schema'
import { DomainError } from '../DomainError'
import type { Person } from '../person/person'
import type { AlignInput } from './alignInput'
import { alignableTables } from './alignableTables'
import { findVisibleAlignment } from './findVisibleAlignment'

/** Checks a wish to align and fixes what it takes: the tables as they stand now, and the alignment it will be held against. */
export function planAlignment(db: Database, studyId: string, input: NewAlignment, person: Person): AlignInput {
  if (!input.practice && !can(person, 'editStudy')) throw new DomainError('forbidden', 'Official alignments are made by analysts and lab leads. You can make a practice run.')
  const ready = alignableTables(db, studyId)
  if (ready.problem) throw new DomainError('conflict', ready.problem)
  const { referenceDigest } = input.settings
  if (referenceDigest && !ready.tables.some(table => table.digest === referenceDigest && !table.blank)) {
    throw new DomainError('invalid', 'The reference is not among the tables that are aligned.', [{ field: 'settings.referenceDigest', sentence: 'Choose a table of a sample, not of a blank.' }])
  }
  const rerunOf = input.rerunOf ? findVisibleAlignment(db, studyId, input.rerunOf, person).id : latestOfficial(db, studyId)
  return { tableIds: ready.tables.map(table => table.id), settings: input.settings, asGiven: input.asGiven && ready.tables.some(table => table.wide), practice: input.practice, rerunOf }
}

function latestOfficial(db: Database, studyId: string): string | null {
  return db.select({ id: alignments.id }).from(alignments).where(and(eq(alignments.studyId, studyId), eq(alignments.practice, false)))
    .orderBy(desc(alignments.number)).limit(1).get()?.id ?? null
}
