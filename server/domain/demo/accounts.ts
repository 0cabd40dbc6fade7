import type { Role } from '../../../shared/permissions'

export interface DemoAccount {
  signInName: string
  /** An invented person. */
  name: string
  roles: Role[]
  does: string
}

/** Written on the sign-in page of a demo laboratory, for everyone to use. */
export const demoPassword = 'apples on two pans'

export const demoAccounts: DemoAccount[] = [
  { signInName: 'analyst', name: 'Ada Quillon', roles: ['analyst'], does: 'makes studies, uploads tables, aligns and compares' },
  { signInName: 'scientist', name: 'Teodor Wray', roles: ['scientist'], does: 'explores, flags, names and compares' },
  { signInName: 'reviewer', name: 'Maren Oldacre', roles: ['reviewer'], does: 'reads, returns or seals, shares' },
  { signInName: 'student', name: 'Jonas Fairweel', roles: ['student'], does: 'reads, and tries other settings in practice copies' },
  { signInName: 'lead', name: 'Ines Harrowgate', roles: ['labLead'], does: 'what an analyst does, and keeps people and settings' },
]
