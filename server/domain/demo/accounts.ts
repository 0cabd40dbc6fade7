import type { Role } from '../../../shared/permissions'

export interface DemoAccount {
  signInName: string
  /** An invented person. */
  name: string
  roles: Role[]
}

/** Written on the sign-in page of a demo laboratory, for everyone to use. */
export const demoPassword = 'apples on two pans'

export const demoAccounts: DemoAccount[] = [
  { signInName: 'analyst', name: 'Ada Quillon', roles: ['analyst'] },
  { signInName: 'scientist', name: 'Teodor Wray', roles: ['scientist'] },
  { signInName: 'reviewer', name: 'Maren Oldacre', roles: ['reviewer'] },
  { signInName: 'student', name: 'Jonas Fairweel', roles: ['student'] },
  { signInName: 'lead', name: 'Ines Harrowgate', roles: ['labLead'] },
]
