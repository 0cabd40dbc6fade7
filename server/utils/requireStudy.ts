import type { H3Event } from 'h3'
import { can, type Action } from '../../shared/permissions'
import { DomainError } from '../domain/DomainError'
import { findVisibleStudy, type VisibleStudy } from '../domain/study/findVisibleStudy'
import { requirePerson, type PersonContext } from './requirePerson'

export interface StudyContext extends PersonContext { study: VisibleStudy }

/**
 * The whole chain for a route below /api/studies/[studyId]: signed in (401), may see the study (404), may do this (403).
 * An archived study is read only (409), but for acts that say they are for archived ones too.
 */
export async function requireStudy(event: H3Event, action: Action = 'readStudy', { archivedToo = false } = {}): Promise<StudyContext> {
  const { db, person } = await requirePerson(event)
  const study = findVisibleStudy(db, readParam(event, 'studyId'), person)
  if (!can(person, action)) throw new DomainError('forbidden', 'Your roles do not allow this.')
  if (study.archivedAt && !archivedToo && action !== 'readStudy' && action !== 'export' && action !== 'archive') {
    throw new DomainError('conflict', 'This study is archived. Bring it back before changing it.')
  }
  return { db, person, study }
}
