import { and, eq } from 'drizzle-orm'
import type { Database } from '../../db/open'
import { shareLinks } from '../../db/schema'
import { record } from '../activity/record'
import { DomainError, notFound } from '../DomainError'
import type { Person } from '../person/person'
import { withdrawSecrets } from '../secret/withdrawSecrets'

/** Withdraws a link at once: the next request with its secret finds nothing. */
export function withdrawShareLink(db: Database, studyId: string, shareLinkId: string, person: Person): { id: string } {
  return db.transaction((tx) => {
    const link = tx.select().from(shareLinks).where(and(eq(shareLinks.id, shareLinkId), eq(shareLinks.studyId, studyId))).get()
    if (!link) throw notFound()
    if (withdrawSecrets(tx, 'share', link.id) === 0) throw new DomainError('conflict', 'This link is withdrawn already.')
    record(tx, { personId: person.id, action: 'withdraw share link', studyId, subjectId: link.id, detail: link.label ? `for ${link.label}` : '' })
    return { id: link.id }
  })
}
