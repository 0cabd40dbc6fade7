import { eq } from 'drizzle-orm'
import type { Database } from '../../db/open'
import { studies } from '../../db/schema'
import { record } from '../activity/record'
import type { Person } from '../person/person'
import type { VisibleStudy } from './findVisibleStudy'

/** Archives a study, or brings it back. Asking for what is so already changes nothing. */
export function archiveStudy(db: Database, study: VisibleStudy, archived: boolean, person: Person): { archivedAt: string | null } {
  if ((study.archivedAt !== null) === archived) return { archivedAt: study.archivedAt?.toISOString() ?? null }
  const archivedAt = archived ? new Date() : null
  db.transaction((tx) => {
    tx.update(studies).set({ archivedAt, lastActivityAt: new Date() }).where(eq(studies.id, study.id)).run()
    record(tx, { personId: person.id, action: archived ? 'archive study' : 'bring back study', studyId: study.id, subjectId: study.id, detail: study.title })
  })
  return { archivedAt: archivedAt?.toISOString() ?? null }
}
