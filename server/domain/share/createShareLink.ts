import { and, eq } from 'drizzle-orm'
import { canSeeWork } from '../../../shared/permissions'
import type { ShareInput } from '../../../shared/schemas/share'
import type { Database } from '../../db/open'
import { comparisons, comparisonVersions, shareLinks } from '../../db/schema'
import { record } from '../activity/record'
import { DomainError, notFound } from '../DomainError'
import type { Person } from '../person/person'
import { issueSecret } from '../secret/issueSecret'

const DAY_MS = 86_400_000

/**
 * Makes a secret address for one version of an official comparison. The secret is returned this once.
 * The link belongs to the laboratory: it stays in force when the account of its maker is closed, until it ends or is withdrawn.
 */
export function createShareLink(db: Database, studyId: string, input: ShareInput, person: Person, now = new Date()): { id: string, secret: string, endsAt: Date } {
  return db.transaction((tx) => {
    const found = tx.select({ practice: comparisons.practice, createdBy: comparisons.createdBy, title: comparisons.title, number: comparisonVersions.number })
      .from(comparisonVersions).innerJoin(comparisons, eq(comparisons.id, comparisonVersions.comparisonId))
      .where(and(eq(comparisonVersions.id, input.versionId), eq(comparisons.studyId, studyId))).get()
    if (!found || !canSeeWork(person, found)) throw notFound()
    if (found.practice) throw new DomainError('conflict', 'Practice work can\'t be shared by a link. Make the comparison again as official work.')

    const endsAt = new Date(now.getTime() + input.days * DAY_MS)
    const { id } = tx.insert(shareLinks).values({ studyId, versionId: input.versionId, label: input.label, allowExport: input.allowExport, createdBy: person.id, createdAt: now }).returning().get()
    const secret = issueSecret(tx, { kind: 'share', subject: id, createdBy: person.id, expiresAt: endsAt })
    const detail = `version ${found.number} of ${found.title}, until ${endsAt.toISOString().slice(0, 10)}${input.label ? `, for ${input.label}` : ''}${input.allowExport ? ', export allowed' : ''}`
    record(tx, { personId: person.id, action: 'make share link', studyId, subjectId: id, detail })
    return { id, secret, endsAt }
  })
}
