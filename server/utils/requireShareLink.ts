import type { H3Event } from 'h3'
import type { Database } from '../db/open'
import { openShareLink, type OpenShareLink } from '../domain/share/openShareLink'

/** The version a guest's secret opens; 404 for a wrong, an ended and a withdrawn one alike. Signing in plays no part. */
export function requireShareLink(event: H3Event): { db: Database, link: OpenShareLink } {
  const { db } = useLaboratory()
  return { db, link: openShareLink(db, readParam(event, 'secret')) }
}
