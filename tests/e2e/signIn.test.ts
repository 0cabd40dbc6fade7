import { mkdtempSync, readFileSync, rmSync } from 'node:fs'
import { IncomingMessage, request, ServerResponse } from 'node:http'
import { Socket } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { eq } from 'drizzle-orm'
import { createEvent, unsealSession } from 'h3'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { openDatabase } from '../../server/db/open'
import { activity, people, sessions } from '../../server/db/schema'
import { Jobs } from '../../server/jobs/runner'
import type { Person } from '../../server/domain/person/person'
import { answerOf, ask, cookiesOf, whoIs } from '../support/ask'
import { startBuiltServer, type BuiltServer } from '../support/builtServer'
import { addTestPerson, migrations, type TestLaboratory } from '../support/laboratory'
import { secondConnection } from '../support/secondConnection'
import { signInCookie, TEST_PASSWORD, testPasswordHash } from '../support/signIn'

const folder = mkdtempSync(join(tmpdir(), 'steelyard-sign-in-'))
let server: BuiltServer
let laboratory: TestLaboratory
let passwordHash: string

beforeAll(async () => {
  passwordHash = await testPasswordHash()
  const open = await openDatabase(folder, 'lab', migrations)
  addWithPassword({ ...open, folder, jobs: new Jobs({ db: open.db, folder }, {}, {}) })
  open.close()
  server = await startBuiltServer({ folder })
  laboratory = secondConnection(folder)
})
afterAll(async () => {
  laboratory?.close()
  await server?.stop()
  rmSync(folder, { recursive: true, force: true })
})

function addWithPassword(to: TestLaboratory = laboratory): Person {
  const person = addTestPerson(to, 'labLead')
  to.db.update(people).set({ passwordHash }).where(eq(people.id, person.id)).run()
  return person
}
const signIn = (signInName: string, password: string, extra: { cookie?: string, headers?: Record<string, string> } = {}) => ask(server.url, 'POST', '/api/sessions', { body: { signInName, password }, ...extra })
const sessionCookie = (cookies: string) => cookies.split('; ').find(cookie => cookie.startsWith('steelyard-session=')) ?? ''
async function unsealed(cookies: string) {
  const sealed = decodeURIComponent(sessionCookie(cookies).replace('steelyard-session=', ''))
  const message = new IncomingMessage(new Socket())
  const { id, createdAt = 0, data } = await unsealSession(createEvent(message, new ServerResponse(message)), { password: readFileSync(join(folder, 'sealing-secret'), 'utf8') }, sealed)
  return { id, createdAt, data }
}

describe('a session', () => {
  it('is not begun by reading a page: a visitor gets no cookie', async () => {
    for (const path of ['/api/me', '/sign-in', '/', '/invitation/none', '/api/people']) {
      const response = await fetch(server.url + path, { redirect: 'manual' })
      expect(response.headers.getSetCookie(), path).toEqual([])
    }
  })

  it('has a cookie that scripts can\'t read and other sites don\'t send', async () => {
    const response = await signIn(addWithPassword().signInName, TEST_PASSWORD)
    const cookies = response.headers.getSetCookie()
    expect(cookies.filter(cookie => cookie.startsWith('steelyard-session='))).toHaveLength(1)
    for (const cookie of cookies) expect(cookie).toMatch(/HttpOnly.*Secure.*SameSite=Lax|HttpOnly; SameSite=Lax; Secure/i)
  })

  it('is dead after sign-out, for a copy of its cookie too', async () => {
    const person = addWithPassword()
    const cookie = await signInCookie(server.url, person.signInName)
    const copy = cookie
    expect(await whoIs(server.url, copy)).toBe(person.signInName)
    const response = await ask(server.url, 'DELETE', '/api/sessions', { cookie })
    expect(response.headers.getSetCookie().join()).toMatch(/steelyard-session=;/)
    expect(await whoIs(server.url, copy)).toBeNull()
    expect((await ask(server.url, 'GET', '/api/people', { cookie: copy })).status).toBe(401)
    const acts = laboratory.db.select().from(activity).where(eq(activity.personId, person.id)).all().map(row => row.action)
    expect(acts).toEqual(['sign in', 'sign out'])
  })

  it('is dead when its account is closed, and stays so when it is reopened', async () => {
    const lead = await signInCookie(server.url, addWithPassword().signInName)
    const person = addWithPassword()
    const cookie = await signInCookie(server.url, person.signInName)
    expect((await ask(server.url, 'POST', `/api/people/${person.id}/close`, { cookie: lead })).status).toBe(200)
    expect(await whoIs(server.url, cookie)).toBeNull()
    expect((await signIn(person.signInName, TEST_PASSWORD)).status).toBe(401)
    expect((await ask(server.url, 'POST', `/api/people/${person.id}/reopen`, { cookie: lead })).status).toBe(200)
    expect(await whoIs(server.url, cookie)).toBeNull()
    expect((await signIn(person.signInName, TEST_PASSWORD)).status).toBe(200)
  })

  it('is dead after 12 hours', async () => {
    const person = addWithPassword()
    const cookie = await signInCookie(server.url, person.signInName)
    laboratory.db.update(sessions).set({ expiresAt: new Date() }).where(eq(sessions.personId, person.id)).run()
    expect(await whoIs(server.url, cookie)).toBeNull()
  })

  it('ends with a password change, but for the browser that asked', async () => {
    const person = addWithPassword()
    const [own, elsewhere] = [await signInCookie(server.url, person.signInName), await signInCookie(server.url, person.signInName)]
    const change = (present: string, password: string) => ask(server.url, 'PUT', '/api/me/password', { cookie: own, body: { present, password } })
    expect((await change('not the present one', 'tangle ferry cobalt')).status).toBe(400)
    expect((await change(TEST_PASSWORD, 'too short')).status).toBe(400)
    expect((await change(TEST_PASSWORD, 'Password12345')).status).toBe(400)
    expect(await whoIs(server.url, elsewhere)).toBe(person.signInName)

    const changed = await change(TEST_PASSWORD, 'tangle ferry cobalt')
    expect(changed.status).toBe(200)
    expect(await whoIs(server.url, elsewhere)).toBeNull()
    expect(await whoIs(server.url, own)).toBeNull()
    expect(await whoIs(server.url, cookiesOf(changed))).toBe(person.signInName)
    expect((await signIn(person.signInName, TEST_PASSWORD)).status).toBe(401)
  })

  it('carries nothing over from the cookie before it: neither id nor age nor keys', async () => {
    const [ada, ben] = [addWithPassword(), addWithPassword()]
    const first = await signInCookie(server.url, ada.signInName)
    const second = cookiesOf(await signIn(ben.signInName, TEST_PASSWORD, { cookie: first }))
    const [before, after] = [await unsealed(first), await unsealed(second)]
    expect(after.id).not.toBe(before.id)
    expect(after.createdAt).toBeGreaterThan(before.createdAt)
    expect(after.data).toEqual({ user: { id: ben.id }, secure: { sid: expect.any(String) } })
    expect(await whoIs(server.url, second)).toBe(ben.signInName)
    expect(await whoIs(server.url, first)).toBeNull()
  })

  it('can\'t be made by altering a cookie, nor brought by a header', async () => {
    const person = addWithPassword()
    const cookie = sessionCookie(await signInCookie(server.url, person.signInName))
    expect(await whoIs(server.url, `${cookie.slice(0, -3)}abc`)).toBeNull()
    expect(await whoIs(server.url, 'steelyard-session=nonsense')).toBeNull()
    const response = await ask(server.url, 'GET', '/api/me', { headers: { 'x-steelyard-session-session': decodeURIComponent(cookie.replace('steelyard-session=', '')) } })
    expect(await response.json()).toMatchObject({ person: null })
  })

  it('is not told by the module\'s own route', async () => {
    const cookie = await signInCookie(server.url, addWithPassword().signInName)
    expect((await ask(server.url, 'GET', '/api/_auth/session', { cookie })).status).toBe(404)
    expect((await ask(server.url, 'DELETE', '/api/_auth/session', { cookie })).status).toBe(404)
    expect(await whoIs(server.url, cookie)).not.toBeNull()
  })
})

describe('signing in', () => {
  it('answers a wrong name as it answers a wrong password', async () => {
    const person = addWithPassword()
    const wrongPassword = await answerOf(await signIn(person.signInName, 'not the password'))
    expect(wrongPassword).toMatchObject({ status: 401 })
    expect(await answerOf(await signIn('nobody at all', 'not the password'))).toEqual(wrongPassword)
  })

  it('from another site\'s page is refused', async () => {
    const person = addWithPassword()
    const claims: Record<string, string>[] = [{ origin: 'https://attacker.example' }, { 'sec-fetch-site': 'cross-site' }, { origin: '' }]
    for (const headers of claims) {
      expect((await signIn(person.signInName, TEST_PASSWORD, { headers })).status).toBe(403)
    }
  })

  it('under a name that is not this server\'s is refused', async () => {
    const status = await new Promise((resolve, reject) => {
      request(`${server.url}/api/me`, { headers: { host: 'attacker.example' } }, response => resolve(response.resume().statusCode)).on('error', reject).end()
    })
    expect(status).toBe(421)
  })
})

describe('guessing', () => {
  it('is limited at an account, says when to try again, and does not keep the right person out where they signed in before', async () => {
    const person = addWithPassword()
    const known = cookiesOf(await signIn(person.signInName, TEST_PASSWORD))
    for (let at = 0; at < 10; at++) expect((await signIn(person.signInName, `guess ${at}`)).status).toBe(401)

    const refused = await signIn(person.signInName, TEST_PASSWORD)
    expect(refused.status).toBe(429)
    const seconds = Number(refused.headers.get('retry-after'))
    expect(seconds).toBeGreaterThan(200)
    expect(seconds).toBeLessThanOrEqual(300)
    expect(await refused.json()).toMatchObject({ message: 'There were too many attempts. Please try again in 5 minutes.' })

    expect((await signIn(person.signInName, TEST_PASSWORD, { cookie: known })).status).toBe(200)
    // Remembering a browser opens nothing, is no other account's, and can't be made up.
    const remembered = known.split('; ').find(cookie => cookie.startsWith('steelyard-known-')) ?? ''
    expect(await whoIs(server.url, remembered)).toBeNull()
    expect((await signIn(person.signInName, TEST_PASSWORD, { cookie: `${remembered.split('.')[0]}x.${remembered.split('.')[1]}` })).status).toBe(429)
    expect((await signIn(person.signInName, TEST_PASSWORD, { cookie: `${remembered.split('=')[0]}=made-up` })).status).toBe(429)
  })

  // Last: it uses up this address.
  it('is limited from an address, whatever address a header claims', async () => {
    const person = addWithPassword()
    const known = cookiesOf(await signIn(person.signInName, TEST_PASSWORD))
    const statuses: number[] = []
    for (let at = 0; at < 31; at++) statuses.push((await signIn(`nobody ${at}`, 'a guess', { headers: { 'x-forwarded-for': `198.51.100.${at}`, 'x-real-ip': `198.51.100.${at}`, 'forwarded': `for=198.51.100.${at}` } })).status)
    expect(statuses.at(-1)).toBe(429)
    expect(statuses.filter(status => status === 429).length).toBeLessThan(31)
    expect((await signIn(person.signInName, TEST_PASSWORD, { cookie: known })).status).toBe(200)
  })
})
