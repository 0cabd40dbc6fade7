import { eq } from 'drizzle-orm'
import type { Database } from '../../db/open'
import { shareLinks } from '../../db/schema'
import { notFound } from '../DomainError'
import { findSecret } from '../secret/findSecret'

/** What a guest's secret opens. */
export interface OpenShareLink { studyId: string, versionId: string, allowExport: boolean, endsAt: Date }

/** The version a guest's secret opens. A wrong, an ended and a withdrawn secret look the same: notFound. */
export function openShareLink(db: Pick<Database, 'select'>, secret: string, now = new Date()): OpenShareLink {
  const found = findSecret(db, 'share', secret, now)
  const link = found?.subject ? db.select().from(shareLinks).where(eq(shareLinks.id, found.subject)).get() : undefined
  if (!found || !link) throw notFound()
  return { studyId: link.studyId, versionId: link.versionId, allowExport: link.allowExport, endsAt: found.expiresAt }
}
