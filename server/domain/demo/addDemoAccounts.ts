import type { Database } from '../../db/open'
import { addPersonWithPassword } from '../person/addPersonWithPassword'
import { hasPeople } from '../person/listPeople'
import type { PasswordHasher } from '../session/passwords'
import { demoAccounts, demoPassword } from './accounts'

/** Makes the demo accounts in a demo laboratory that has no account yet. */
export async function addDemoAccounts(db: Database, hasher: PasswordHasher) {
  if (hasPeople(db)) return
  const passwordHash = await hasher.hash(demoPassword)
  for (const { name, signInName, roles } of demoAccounts) addPersonWithPassword(db, { name, signInName, email: '', roles }, passwordHash)
}
