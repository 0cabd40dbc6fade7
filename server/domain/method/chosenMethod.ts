import { eq } from 'drizzle-orm'
import type { MethodInput } from '../../../shared/schemas/method'
import type { Database } from '../../db/open'
import { methods } from '../../db/schema'
import { DomainError } from '../DomainError'
import type { Person } from '../person/person'
import { makeMethod } from './makeMethod'

/** The id of the method a study form names: made now where it is a new one. */
export function chosenMethod(db: Pick<Database, 'insert' | 'select'>, input: { methodId: string | null, newMethod?: MethodInput | null }, person: Person): string {
  if (input.newMethod) return madeMethod(db, input.newMethod, person)
  const method = input.methodId === null ? undefined : db.select({ id: methods.id }).from(methods).where(eq(methods.id, input.methodId)).get()
  if (!method) throw new DomainError('invalid', 'This method is not there any more.', [{ field: 'methodId', sentence: 'Choose another method.' }])
  return method.id
}

/** What is wrong with the new method is said at its own fields in the form. */
function madeMethod(db: Pick<Database, 'insert' | 'select'>, input: MethodInput, person: Person): string {
  try {
    return makeMethod(db, input, person).id
  }
  catch (error) {
    if (!(error instanceof DomainError)) throw error
    throw new DomainError(error.kind, error.message, error.issues.map(({ field, sentence }) => ({ field: `newMethod.${field}`, sentence })))
  }
}
