export const roles = ['analyst', 'scientist', 'reviewer', 'student', 'labLead'] as const

/** A person may hold several; their rights add up. */
export type Role = (typeof roles)[number]

export const roleNames: Record<Role, string> = {
  analyst: 'analyst',
  scientist: 'scientist',
  reviewer: 'reviewer',
  student: 'student',
  labLead: 'lab lead',
}

/** What each role is for, in a few words. */
export const roleDuties: Record<Role, string> = {
  analyst: 'makes studies, uploads tables, aligns and compares',
  scientist: 'explores, flags, names and compares',
  reviewer: 'reads everything, returns or seals, shares',
  student: 'reads, and tries other settings in practice copies',
  labLead: 'what an analyst does, and keeps people and settings',
}
