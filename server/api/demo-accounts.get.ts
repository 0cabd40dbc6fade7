import { demoAccounts, demoPassword } from '../domain/demo/accounts'
import { notFound } from '../domain/DomainError'

/** The accounts of a demo laboratory; a real one has nothing here. */
export default defineRoute(() => {
  if (useLaboratory().kind !== 'demo') throw notFound()
  return { password: demoPassword, accounts: demoAccounts }
})
