import { and, eq, isNull, ne } from 'drizzle-orm'
import type { TableChange } from '../../../shared/schemas/table'
import type { Database } from '../../db/open'
import { tables } from '../../db/schema'
import { record } from '../activity/record'
import { DomainError, notFound } from '../DomainError'
import type { Person } from '../person/person'
import { sampleOfStudy } from '../sample/sampleOfStudy'
import { touchStudy } from '../study/touchStudy'

/** Sets the sample that a table belongs to, or its peak limit. A sample has one table at a time. */
export function changeTable(db: Database, studyId: string, tableId: string, change: TableChange, person: Person): { id: string } {
  return db.transaction(() => {
    const table = db.select({ id: tables.id, fileName: tables.fileName, replacedAt: tables.replacedAt }).from(tables).where(and(eq(tables.id, tableId), eq(tables.studyId, studyId))).get()
    if (!table) throw notFound()
    if (table.replacedAt) throw new DomainError('conflict', 'This table has been replaced: it stays as it is, with the alignments that used it.')
    if (change.sampleId) {
      const sample = sampleOfStudy(db, studyId, change.sampleId)
      const other = db.select({ fileName: tables.fileName }).from(tables).where(and(eq(tables.sampleId, change.sampleId), isNull(tables.replacedAt), ne(tables.id, tableId))).get()
      if (other) throw new DomainError('conflict', `“${sample.name}” has a table already, ${other.fileName}. Give that one another sample first, or replace it.`, [{ field: 'sampleId', sentence: `“${sample.name}” has a table already.` }])
    }
    db.update(tables).set(change).where(eq(tables.id, tableId)).run()
    record(db, { personId: person.id, action: 'edit table', studyId, subjectId: tableId, detail: table.fileName })
    touchStudy(db, studyId)
    return { id: tableId }
  }, { behavior: 'immediate' })
}
