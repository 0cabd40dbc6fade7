import type { Database } from '../../db/open'
import { activity } from '../../db/schema'

interface Act {
  personId: string | null
  /** A verb and what it was done to: “edit study”. */
  action: `${string} ${string}`
  studyId?: string | null
  subjectId?: string | null
  detail?: string
}

/** Adds one line to the activity log. Called inside the transaction of the act it speaks of. */
export function record(db: Pick<Database, 'insert'>, act: Act) {
  db.insert(activity).values({ studyId: null, subjectId: null, detail: '', ...act }).run()
}
