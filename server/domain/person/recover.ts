import type { Database } from '../../db/open'
import { record } from '../activity/record'
import { DomainError } from '../DomainError'
import { issueLink } from './invitations'
import { listLabLeads } from './listPeople'

/** A one-time link's secret for a locked-out lab lead. Whoever can run this on the machine itself can read its files anyway. */
export function recoverLabLead(db: Database, signInName: string): { name: string, secret: string } {
  return db.transaction((tx) => {
    const person = listLabLeads(tx).find(lead => lead.signInName === signInName)
    if (!person) throw new DomainError('notFound', `There is no open account of a lab lead with the sign-in name ${signInName}.`)
    record(tx, { personId: null, action: 'recover account', subjectId: person.id, detail: `${signInName}, on the machine itself` })
    return { name: person.name, secret: issueLink(tx, person, null) }
  }, { behavior: 'immediate' })
}
