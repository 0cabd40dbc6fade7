import { and, eq, gt, isNull } from 'drizzle-orm'
import type { Database } from '../../db/open'
import { secrets, type SecretKind } from '../../db/schema/secrets'
import { hashSecret } from './secret'

/** The row of a secret of this kind that is in force: not used, not withdrawn, not ended. Undefined for all else alike. */
export function findSecret(db: Pick<Database, 'select'>, kind: SecretKind, secret: string, now = new Date()) {
  return db.select().from(secrets)
    .where(and(eq(secrets.hash, hashSecret(secret)), eq(secrets.kind, kind), isNull(secrets.usedAt), isNull(secrets.withdrawnAt), gt(secrets.expiresAt, now)))
    .get()
}
