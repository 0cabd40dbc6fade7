import type { Role } from './roles'

/** Every act that needs a right, and the roles that have it. The one table of truth for server, interface and tests. */
export const actions = {
  /** Read a study that is open, or whose member one is. */
  readStudy: ['analyst', 'scientist', 'reviewer', 'student', 'labLead'],
  /** Make and edit studies, methods, sample sheets, tables and layouts; run official alignments. */
  editStudy: ['analyst', 'labLead'],
  /** Make a comparison or a new version of an unsealed one. */
  compare: ['analyst', 'scientist', 'labLead'],
  flag: ['analyst', 'scientist', 'labLead'],
  /** Make and withdraw share links. */
  share: ['reviewer', 'labLead'],
  /** Download the data and results of a study. */
  export: ['analyst', 'scientist', 'reviewer', 'labLead'],
  /** Make alignments and comparisons that only oneself sees. */
  practise: ['analyst', 'scientist', 'student', 'labLead'],
  /** People and settings. */
  managePeople: ['labLead'],
  archive: ['labLead'],
} as const satisfies Record<string, readonly Role[]>

export type Action = keyof typeof actions
