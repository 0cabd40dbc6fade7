import { isNull } from 'drizzle-orm'
import type { MethodInput } from '../../../shared/schemas/method'
import type { Database } from '../../db/open'
import { methods } from '../../db/schema'
import { record } from '../activity/record'
import { DomainError } from '../DomainError'
import type { Person } from '../person/person'

/** Makes a method. Called inside a transaction, or on its own. */
export function makeMethod(db: Pick<Database, 'insert' | 'select'>, input: MethodInput, person: Person): { id: string } {
  refuseTakenName(db, input.name)
  const { id } = db.insert(methods).values({ ...input, createdBy: person.id }).returning({ id: methods.id }).get()
  record(db, { personId: person.id, action: 'make method', subjectId: id, detail: input.name })
  return { id }
}

/** Two methods of one name could not be told apart in the study form. */
export function refuseTakenName(db: Pick<Database, 'select'>, name: string, exceptId?: string) {
  const taken = db.select({ id: methods.id, name: methods.name }).from(methods).where(isNull(methods.archivedAt)).all()
    .some(method => method.id !== exceptId && method.name.toLowerCase() === name.toLowerCase())
  if (taken) throw new DomainError('conflict', `There is a method called “${name}” already.`, [{ field: 'name', sentence: 'Another method has this name. Choose that one, or give this one another name.' }])
}
