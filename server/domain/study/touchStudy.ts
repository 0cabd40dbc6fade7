import { eq } from 'drizzle-orm'
import type { Database } from '../../db/open'
import { studies } from '../../db/schema'

/** Marks the study as changed now. Called in the transaction of every change in it, practice work apart. */
export function touchStudy(db: Pick<Database, 'update'>, studyId: string) {
  db.update(studies).set({ lastActivityAt: new Date() }).where(eq(studies.id, studyId)).run()
}
