import type { Role } from '../permissions/roles'
import type { MethodInput } from '../schemas/method'

/** What stands in a study, as the person who asks may see it: practice work of others is not counted. */
export interface StudyCounts { samples: number, tables: number, traces: number, alignments: number, comparisons: number }

/** A line of the study list. Moments are ISO 8601, UTC. */
export interface StudyListItem {
  id: string
  title: string
  question: string
  matrix: string
  methodName: string
  restricted: boolean
  lastActivityAt: string
  archivedAt: string | null
  counts: StudyCounts
}

export interface StudyList {
  studies: StudyListItem[]
  /** How many archived studies fit the search, shown or not. */
  archived: number
}

export interface StudyMember { id: string, name: string, roles: Role[], closed: boolean }

export interface Method extends MethodInput { id: string }

/** A study as its pages need it. */
export interface StudyView extends Omit<StudyListItem, 'methodName'> {
  sideAName: string
  sideBName: string
  method: Method
  createdAt: string
  createdByName: string
  members: StudyMember[]
}

/** Members, and for those who may change them the others who could be added. */
export interface StudyMembers { members: StudyMember[], others: StudyMember[] }

/** `studies`: those that use it and that the person who asks may see. */
export interface MethodListItem extends Method { studies: { id: string, title: string }[] }
