import { setTimeout } from 'node:timers/promises'
import { and, eq, inArray } from 'drizzle-orm'
import type { Database } from '../../db/open'
import { jobs } from '../../db/schema'

const LOOK_AGAIN_MS = 50

/** Waits until no job of the study runs or waits. Rejects with the signal's reason where the server stops meanwhile. */
export async function awaitJobs(db: Pick<Database, 'select'>, studyId: string, signal: AbortSignal) {
  const open = () => db.select({ id: jobs.id }).from(jobs).where(and(eq(jobs.studyId, studyId), inArray(jobs.status, ['queued', 'running']))).get()
  for (;;) {
    signal.throwIfAborted()
    if (!open()) return
    await setTimeout(LOOK_AGAIN_MS, undefined, { signal })
  }
}
