import { and, desc, eq } from 'drizzle-orm'
import type { ShareState } from '../../../shared/schemas/share'
import type { Database } from '../../db/open'
import { comparisons, comparisonVersions, people, secrets, shareLinks } from '../../db/schema'

/** The share links of a study, newest first, each with the version it shows and its state. Never the secret: it is not kept. */
export function listShareLinks(db: Pick<Database, 'select'>, studyId: string, now = new Date()) {
  const rows = db.select({
    id: shareLinks.id, label: shareLinks.label, allowExport: shareLinks.allowExport, by: people.name, at: shareLinks.createdAt,
    comparisonId: comparisons.id, comparisonTitle: comparisons.title, versionId: comparisonVersions.id, versionNumber: comparisonVersions.number,
    endsAt: secrets.expiresAt, withdrawnAt: secrets.withdrawnAt,
  }).from(shareLinks)
    .innerJoin(secrets, and(eq(secrets.subject, shareLinks.id), eq(secrets.kind, 'share')))
    .innerJoin(comparisonVersions, eq(comparisonVersions.id, shareLinks.versionId))
    .innerJoin(comparisons, eq(comparisons.id, comparisonVersions.comparisonId))
    .innerJoin(people, eq(people.id, shareLinks.createdBy))
    .where(eq(shareLinks.studyId, studyId)).orderBy(desc(shareLinks.createdAt)).all()
  return rows.map(row => ({ ...row, state: stateOf(row, now) }))
}

function stateOf({ withdrawnAt, endsAt }: { withdrawnAt: Date | null, endsAt: Date }, now: Date): ShareState {
  if (withdrawnAt) return 'withdrawn'
  return endsAt > now ? 'inForce' : 'ended'
}
