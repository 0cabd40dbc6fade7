import { and, asc, eq, isNull } from 'drizzle-orm'
import type { Database } from '../../db/open'
import { flags, people } from '../../db/schema'

/** The flags that stand on an alignment, oldest first, each with who set it and when. */
export function listFlags(db: Pick<Database, 'select'>, alignmentId: string) {
  return db.select({ id: flags.id, featureIndex: flags.featureIndex, kind: flags.kind, reason: flags.reason, by: people.name, at: flags.createdAt })
    .from(flags).innerJoin(people, eq(people.id, flags.createdBy))
    .where(and(eq(flags.alignmentId, alignmentId), isNull(flags.removedAt)))
    .orderBy(asc(flags.createdAt), asc(flags.featureIndex)).all()
}
