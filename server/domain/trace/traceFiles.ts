import { existsSync, readdirSync, rmSync } from 'node:fs'
import { join } from 'node:path'
import { eq } from 'drizzle-orm'
import type { Database } from '../../db/open'
import { traces } from '../../db/schema'
import { traceFolder, unfinishedFolder } from './files/traceFolder'

/** Lets go of a trace's files once the transaction under way has ended, if no row names them then. */
export function releaseTraceFiles(db: Database, folder: string, traceId: string) {
  // Transactions run to their end without a pause, so what is queued now runs after it.
  queueMicrotask(() => {
    removeFolder(unfinishedFolder(folder, traceId))
    const kept = db.select({ id: traces.id }).from(traces).where(eq(traces.id, traceId)).get()
    if (!kept) removeFolder(traceFolder(folder, traceId))
  })
}

/** At start-up: folders without a row go, and what a killed process left unfinished. */
export function sweepTraceFiles(db: Database, folder: string) {
  const all = join(folder, 'traces')
  if (!existsSync(all)) return
  const kept = new Set(db.select({ id: traces.id }).from(traces).all().map(row => row.id))
  for (const name of readdirSync(all)) if (!kept.has(name)) removeFolder(join(all, name))
}

/** A worker that is being stopped may still write its last file there. */
const removeFolder = (path: string) => rmSync(path, { recursive: true, force: true, maxRetries: 5, retryDelay: 20 })
