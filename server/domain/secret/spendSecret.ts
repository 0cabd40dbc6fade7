import { and, eq, gt, isNull } from 'drizzle-orm'
import type { Database } from '../../db/open'
import { secrets } from '../../db/schema/secrets'

/** Marks a one-time secret used; false where another request was first, or where it was withdrawn or ended meanwhile. */
export function spendSecret(db: Pick<Database, 'update'>, id: string, now = new Date()): boolean {
  return db.update(secrets).set({ usedAt: now })
    .where(and(eq(secrets.id, id), isNull(secrets.usedAt), isNull(secrets.withdrawnAt), gt(secrets.expiresAt, now))).run().changes === 1
}
