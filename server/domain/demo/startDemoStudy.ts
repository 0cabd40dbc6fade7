import { eq } from 'drizzle-orm'
import type { Database } from '../../db/open'
import { methods } from '../../db/schema'
import { makeMethod } from '../method/makeMethod'
import type { Person } from '../person/person'
import { editSheet } from '../sample/editSheet'
import { makeStudy } from '../study/makeStudy'
import { demoStudyId, rememberDemoStudy } from './demoProgress'
import type { DemoStudy } from './studies'

/** The study with its method and sample sheet: made in one transaction, or found where an earlier start made it. */
export function startDemoStudy(db: Database, { seed, method, study, sheet }: DemoStudy, analyst: Person): string {
  const begun = demoStudyId(db, seed)
  if (begun) return begun
  return db.transaction((tx) => {
    const methodId = tx.select({ id: methods.id }).from(methods).where(eq(methods.name, method.name)).get()?.id ?? makeMethod(tx, method, analyst).id
    const { id } = makeStudy(db, { ...study, methodId }, analyst)
    editSheet(db, id, { edits: [], removed: [], added: sheet.map(sample => ({ key: sample.name, sample })) }, analyst)
    rememberDemoStudy(tx, seed, id)
    return id
  }, { behavior: 'immediate' })
}
