import { eq } from 'drizzle-orm'
import type { Database } from '../../db/open'
import { laboratory, studies } from '../../db/schema'

/** What the laboratory knows of its demo: rows named `demo …` beside its kind. */
const MADE = 'demo made'
const rowName = (seed: string) => `demo study ${seed}`

const valueOf = (db: Pick<Database, 'select'>, name: string) => db.select().from(laboratory).where(eq(laboratory.name, name)).get()?.value ?? null

/** The demo is made once: never again after it was whole, nor in a laboratory where people have begun by themselves. */
export function demoIsWanted(db: Pick<Database, 'select'>): boolean {
  if (valueOf(db, MADE) !== null) return false
  return !db.select({ id: studies.id }).from(studies).limit(1).get() || db.select().from(laboratory).all().some(row => row.name.startsWith(rowName('')))
}

export function markDemoMade(db: Pick<Database, 'insert'>) {
  db.insert(laboratory).values({ name: MADE, value: new Date().toISOString() }).onConflictDoNothing().run()
}

/** The study that a demo study became, or null where it was not begun. */
export const demoStudyId = (db: Pick<Database, 'select'>, seed: string) => valueOf(db, rowName(seed))

/** Called in the transaction that makes the study, so that it is begun once. */
export function rememberDemoStudy(db: Pick<Database, 'insert'>, seed: string, studyId: string) {
  db.insert(laboratory).values({ name: rowName(seed), value: studyId }).run()
}
