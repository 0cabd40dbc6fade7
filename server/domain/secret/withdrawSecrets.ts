import { and, eq, isNull } from 'drizzle-orm'
import type { Database } from '../../db/open'
import { secrets, type SecretKind } from '../../db/schema/secrets'

/** Withdraws every secret of this kind that opens the subject and was neither used nor withdrawn; returns how many. */
export function withdrawSecrets(db: Pick<Database, 'update'>, kind: SecretKind, subject: string | null, now = new Date()): number {
  return db.update(secrets).set({ withdrawnAt: now })
    .where(and(eq(secrets.kind, kind), subject === null ? isNull(secrets.subject) : eq(secrets.subject, subject), isNull(secrets.usedAt), isNull(secrets.withdrawnAt)))
    .run().changes
}
