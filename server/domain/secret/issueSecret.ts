import type { Database } from '../../db/open'
import { secrets, type SecretKind } from '../../db/schema/secrets'
import { hashSecret, newSecret } from './secret'

export interface NewSecret { kind: SecretKind, subject: string | null, createdBy: string | null, expiresAt: Date }

/** Makes a secret (or takes a code made to be typed) and returns it: the only time it is known, since only its hash is kept. */
export function issueSecret(db: Pick<Database, 'insert'>, { kind, subject, createdBy, expiresAt }: NewSecret, secret = newSecret()): string {
  db.insert(secrets).values({ kind, hash: hashSecret(secret), subject, createdBy, expiresAt }).run()
  return secret
}
