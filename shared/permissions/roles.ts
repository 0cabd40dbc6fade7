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
