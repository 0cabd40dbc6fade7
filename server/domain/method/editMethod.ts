import { and, eq, isNull } from 'drizzle-orm'
import type { MethodInput } from '../../../shared/schemas/method'
import type { Database } from '../../db/open'
import { methods } from '../../db/schema'
import { record } from '../activity/record'
import { notFound } from '../DomainError'
import type { Person } from '../person/person'
import { refuseTakenName } from './makeMethod'

/** Changes a method, in all studies that use it. Comparisons keep the times sent to waste that they were made with. */
export function editMethod(db: Database, methodId: string, input: MethodInput, person: Person): { id: string } {
  return db.transaction((tx) => {
    refuseTakenName(tx, input.name, methodId)
    const { changes } = tx.update(methods).set(input).where(and(eq(methods.id, methodId), isNull(methods.archivedAt))).run()
    if (changes === 0) throw notFound()
    record(tx, { personId: person.id, action: 'edit method', subjectId: methodId, detail: input.name })
    return { id: methodId }
  })
}
