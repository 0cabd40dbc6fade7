import { mkdtempSync, readdirSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { eq } from 'drizzle-orm'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { openDatabase } from '../../server/db/open'
import { people, studyMembers } from '../../server/db/schema'
import { Jobs } from '../../server/jobs/runner'
import { roles } from '../../shared/permissions'
import { startBuiltServer, type BuiltServer } from '../support/builtServer'
import { addTestPerson, addTestStudy, migrations, type TestLaboratory } from '../support/laboratory'
import { addressOf, askers, expectedGuestStatus, expectedStatus, guestLinks, routesIn, secretName, type Asker, type Fixture, type RightsFile } from '../support/rights'
import { signInCookie, testPasswordHash } from '../support/signIn'
import { secondConnection } from '../support/secondConnection'

const SIGN_OUT = 'DELETE /api/sessions'
const here = fileURLToPath(new URL('.', import.meta.url))
const files = await Promise.all(readdirSync(join(here, 'rights')).map(async name => (await import(`./rights/${name.replace('.ts', '')}.ts`) as { default: RightsFile }).default))
// Signing out ends the askers' sessions, so it is asked last.
const rows = files.flatMap(file => file.rows).sort((a, b) => Number(a.route === SIGN_OUT) - Number(b.route === SIGN_OUT))

let server: BuiltServer
let laboratory: TestLaboratory
const folder = mkdtempSync(join(tmpdir(), 'steelyard-rights-'))
const fixture: Fixture = {}
const cookies = new Map<Asker, string>()

beforeAll(async () => {
  const open = await openDatabase(folder, 'lab', migrations)
  const prepared: TestLaboratory = { ...open, folder, jobs: new Jobs({ db: open.db, folder }, {}, {}) }
  const passwordHash = await testPasswordHash()
  const members = Object.fromEntries(roles.map(role => [role, addTestPerson(prepared, role)]))
  const stranger = addTestPerson(prepared, 'analyst', 'labLead')
  const closed = addTestPerson(prepared, ...roles)
  const study = addTestStudy(prepared, members.analyst!, { restricted: true })
  for (const person of [...Object.values(members), closed]) open.db.insert(studyMembers).values({ studyId: study.id, personId: person.id }).run()
  open.db.update(people).set({ passwordHash }).run()
  Object.assign(fixture, { studyId: study.id, methodId: study.methodId, analystId: members.analyst!.id, studentId: members.student!.id, strangerId: stranger.id })
  for (const file of files) await file.prepare?.(fixture, prepared)
  open.close()

  server = await startBuiltServer({ folder })
  laboratory = secondConnection(folder)
  for (const [asker, person] of [...Object.entries(members), ['stranger', stranger] as const, ['closed', closed] as const]) {
    cookies.set(asker as Asker, await signInCookie(server.url, person.signInName))
  }
  // Closed after signing in: the row itself, so that reading the person on each request is what turns them away.
  laboratory.db.update(people).set({ closedAt: new Date() }).where(eq(people.id, closed.id)).run()
})

afterAll(async () => {
  laboratory?.close()
  await server?.stop()
  rmSync(folder, { recursive: true, force: true })
})

describe('every route, asked by everyone', () => {
  it('has a row, and every row has a route', () => {
    const routes = routesIn(fileURLToPath(new URL('../../server/api', import.meta.url))).sort()
    expect([...new Set(rows.map(row => row.route))].sort()).toEqual(routes)
  })

  it.each(rows.map(row => [row.route, row] as const))('%s', async (_, row) => {
    const statuses: Record<string, number> = {}
    const expected: Record<string, number> = {}
    for (const asker of askers) {
      row.before?.(fixture, laboratory)
      const { method, path } = addressOf(row, fixture)
      const body = row.body?.(fixture)
      const response = await fetch(server.url + path, {
        method,
        headers: {
          origin: server.url,
          cookie: cookies.get(asker) ?? '',
          ...(method === 'GET' ? {} : { 'content-type': body instanceof Uint8Array ? 'application/octet-stream' : 'application/json' }),
        },
        body: method === 'GET' || method === 'DELETE' ? undefined : body instanceof Uint8Array ? body.slice() : JSON.stringify(body ?? {}),
        redirect: 'manual',
      })
      await response.arrayBuffer()
      statuses[asker] = response.status
      expected[asker] = expectedStatus(row, asker)
    }
    expect(statuses).toEqual(expected)
  })
})

describe('every shared route, asked with each kind of link', () => {
  it.each(rows.filter(row => row.route.includes('/api/shared/')).map(row => [row.route, row] as const))('%s', async (_, row) => {
    const answers = await Promise.all(guestLinks.map(async (link) => {
      const { path } = addressOf({ ...row, from: { secret: secretName(link) } }, fixture)
      const response = await fetch(server.url + path)
      const body = (await response.text()).replaceAll(fixture[secretName(link)] ?? '', '')
      expect(response.headers.get('cache-control')).toBe(response.status === 404 ? 'no-cache' : 'no-store')
      expect(response.headers.get('referrer-policy')).toBe('no-referrer')
      expect(server.output()).not.toContain(fixture[secretName(link)])
      return { link, status: response.status, body }
    }))
    expect(Object.fromEntries(answers.map(({ link, status }) => [link, status]))).toEqual(Object.fromEntries(guestLinks.map(link => [link, expectedGuestStatus(row, link)])))
    const bodies = new Map(answers.map(({ link, body }) => [link, body]))
    // Wrong, ended and withdrawn can't be told apart; another version's link shows its own data.
    expect(new Set([bodies.get('wrong'), bodies.get('ended'), bodies.get('withdrawn')]).size).toBe(1)
    expect(bodies.get('otherVersion')).not.toBe(bodies.get('right'))
  })
})
