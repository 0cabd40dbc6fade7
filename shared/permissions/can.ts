import { actions, type Action } from './actions'
import type { Role } from './roles'

export interface Holder { id: string, roles: readonly Role[] }

/** Has the person a role with this right? */
export function can(person: Pick<Holder, 'roles'>, action: Action): boolean {
  const allowed: readonly Role[] = actions[action]
  return person.roles.some(role => allowed.includes(role))
}

/** May the person know that the study exists? Open studies: everyone who reads studies; restricted ones: members. */
export function canSeeStudy(person: Pick<Holder, 'roles'>, study: { restricted: boolean, isMember: boolean }): boolean {
  return can(person, 'readStudy') && (!study.restricted || study.isMember)
}

/** A practice alignment or comparison is seen and changed by the person who made it; an official one by all who see the study. */
export function canSeeWork(person: Pick<Holder, 'id'>, work: { practice: boolean, createdBy: string }): boolean {
  return !work.practice || work.createdBy === person.id
}

/** Exports of official work need the right; one's own practice may always be taken along. */
export function canExportWork(person: Holder, work: { practice: boolean, createdBy: string }): boolean {
  return canSeeWork(person, work) && (can(person, 'export') || work.practice)
}

/** Flags on official work need the right; on one's own practice the maker sets them. */
export function canFlagWork(person: Holder, work: { practice: boolean, createdBy: string }): boolean {
  return canSeeWork(person, work) && (work.practice || can(person, 'flag'))
}
