import { eq } from 'drizzle-orm'
import { people, personRoles } from '../../../server/db/schema'
import type { RightsFile, RightsRow } from '../../support/rights'

/** An open account of a student, new for each request, which the row's act is done to. */
const before: RightsRow['before'] = (fixture, { db }) => {
  if (fixture.personId) db.update(people).set({ closedAt: new Date() }).where(eq(people.id, fixture.personId)).run()
  const person = db.insert(people).values({ name: 'somebody', signInName: `somebody${Math.random()}` }).returning().get()
  db.insert(personRoles).values({ personId: person.id, role: 'student' }).run()
  fixture.personId = person.id
}
let added = 0

const file: RightsFile = {
  rows: [
    { route: 'GET /api/people', needs: 'managePeople' },
    { route: 'POST /api/people', needs: 'managePeople', body: () => ({ name: 'somebody', signInName: `added${++added}`, roles: ['student'] }) },
    { route: 'PATCH /api/people/[personId]', needs: 'managePeople', before, body: () => ({ name: 'somebody else', roles: ['reviewer'] }) },
    { route: 'POST /api/people/[personId]/link', needs: 'managePeople', before },
    { route: 'POST /api/people/[personId]/close', needs: 'managePeople', before },
    { route: 'POST /api/people/[personId]/reopen', needs: 'managePeople', before },
    { route: 'PATCH /api/me', needs: 'signedIn', body: () => ({ name: 'a person', benchKeys: false }) },
    // Without its body: a change would end the asker's session. tests/e2e/signIn.test.ts has it in full.
    { route: 'PUT /api/me/password', needs: 'signedIn', ok: 400 },
    // Open to all, for those who hold a secret; what opens is in tests/e2e/people.test.ts.
    { route: 'GET /api/invitations/[secret]', needs: 'public', ok: 404 },
    { route: 'POST /api/invitations/[secret]', needs: 'public', ok: 404 },
    // This laboratory has accounts and is a real one.
    { route: 'POST /api/first', needs: 'public', ok: 404 },
    { route: 'GET /api/demo-accounts', needs: 'public', ok: 404 },
  ],
}
export default file
