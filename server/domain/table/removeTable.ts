import { and, eq } from 'drizzle-orm'
import type { Database } from '../../db/open'
import { tables } from '../../db/schema'
import { record } from '../activity/record'
import { DomainError, notFound } from '../DomainError'
import type { Person } from '../person/person'
import { touchStudy } from '../study/touchStudy'
import { dropTable, isUsed, tableBrief } from './retireTables'

/** Takes a table away for good. One that an alignment rests on stays: it can only be replaced. */
export function removeTable(db: Database, folder: string, studyId: string, tableId: string, person: Person): { id: string } {
  return db.transaction(() => {
    const table = db.select(tableBrief).from(tables).where(and(eq(tables.id, tableId), eq(tables.studyId, studyId))).get()
    if (!table) throw notFound()
    if (isUsed(db, tableId)) throw new DomainError('conflict', 'An alignment rests on this table, so it stays. Replace it, and run the alignment again.')
    dropTable(db, folder, table)
    record(db, { personId: person.id, action: 'remove table', studyId, subjectId: tableId, detail: table.fileName })
    touchStudy(db, studyId)
    return { id: tableId }
  }, { behavior: 'immediate' })
}
