import type { Database } from '../../db/open'
import { activity } from '../../db/schema'

export interface Act { personId: string | null, action: string, studyId?: string | null, subjectId?: string | null, detail?: string }

/** Adds one line to the activity log. Called inside the transaction of the act it speaks of. */
export function record(db: Pick<Database, 'insert'>, act: Act) {
  db.insert(activity).values({ studyId: null, subjectId: null, detail: '', ...act }).run()
}
