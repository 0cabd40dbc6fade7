import { eq } from 'drizzle-orm'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { people, secrets } from '../../../server/db/schema'
import { addPerson } from '../../../server/domain/person/addPerson'
import { acceptInvitation, findInvitation } from '../../../server/domain/person/invitations'
import { renewLink } from '../../../server/domain/person/managePerson'
import type { Person } from '../../../server/domain/person/person'
import { recoverLabLead } from '../../../server/domain/person/recover'
import { hashSecret } from '../../../server/domain/secret/secret'
import { findSessionPerson, startSession } from '../../../server/domain/session/sessions'
import { addTestPerson, openTestLaboratory, type TestLaboratory } from '../../support/laboratory'
import { NotingHasher } from '../../support/means'

const PASSWORD = 'tangle ferry cobalt'
let laboratory: TestLaboratory
let lead: Person
let id: string
let secret: string

beforeEach(async () => {
  laboratory = await openTestLaboratory()
  lead = addTestPerson(laboratory, 'labLead')
  ;({ id, secret } = addPerson(laboratory.db, { name: 'Ben Dow', signInName: 'bendow', email: '', roles: ['student'] }, lead))
})
afterEach(() => {
  vi.useRealTimers()
  laboratory.close()
})

const accept = (link: string, password = PASSWORD) => acceptInvitation(laboratory.db, link, password, new NotingHasher())
const refusal = (link: string) => {
  try {
    findInvitation(laboratory.db, link)
    return 'opened'
  }
  catch (error) {
    return error instanceof Error ? error.message : ''
  }
}
const hash = () => laboratory.db.select().from(people).where(eq(people.id, id)).get()?.passwordHash

describe('a one-time link', () => {
  it('has 256 random bits, of which only a hash is kept', () => {
    expect(Buffer.from(secret, 'base64url')).toHaveLength(32)
    const kept = laboratory.db.select().from(secrets).all()
    expect(kept).toMatchObject([{ kind: 'invitation', subject: id, hash: hashSecret(secret) }])
    expect(JSON.stringify(kept)).not.toContain(secret)
  })

  it('sets the password, signs in, and opens nothing afterwards', async () => {
    const session = await accept(secret)
    expect(hash()).toBe(`hash of ${PASSWORD}`)
    expect(findSessionPerson(laboratory.db, session.secret)?.id).toBe(id)
    await expect(accept(secret, 'another long phrase')).rejects.toThrow('does not open anything')
    expect(hash()).toBe(`hash of ${PASSWORD}`)
  })

  it('is used once when it is used twice at once', async () => {
    const results = await Promise.allSettled([accept(secret), accept(secret, 'another long phrase')])
    expect(results.map(result => result.status).sort()).toEqual(['fulfilled', 'rejected'])
  })

  it('holds for 7 days', () => {
    vi.useFakeTimers({ now: Date.now() + 7 * 86_400_000 - 60_000 })
    expect(refusal(secret)).toBe('opened')
    vi.advanceTimersByTime(60_000)
    expect(refusal(secret)).not.toBe('opened')
  })

  it('looks the same when it is wrong, used, ended or withdrawn', async () => {
    const withdrawn = renewLink(laboratory.db, id, lead).secret
    const used = renewLink(laboratory.db, id, lead).secret
    await accept(used)
    const ended = renewLink(laboratory.db, id, lead).secret
    laboratory.db.update(secrets).set({ expiresAt: new Date(Date.now() - 1) }).where(eq(secrets.hash, hashSecret(ended))).run()
    const sentences = [refusal('x'.repeat(43)), refusal(withdrawn), refusal(used), refusal(ended), refusal(secret)]
    expect(new Set(sentences).size).toBe(1)
    expect(sentences[0]).toContain('does not open anything')
  })

  it('renewed for a forgotten password ends the sessions there were, once it is used', async () => {
    const before = await accept(secret)
    const reset = renewLink(laboratory.db, id, lead).secret
    expect(findSessionPerson(laboratory.db, before.secret)?.id).toBe(id)
    await accept(reset, 'another long phrase')
    expect(findSessionPerson(laboratory.db, before.secret)).toBeNull()
    expect(hash()).toBe('hash of another long phrase')
  })

  it('stays good when the password is refused', async () => {
    await expect(accept(secret, 'bendow-bendow-1')).rejects.toThrow('choose another password')
    expect(refusal(secret)).toBe('opened')
  })

  it('of a share is no invitation', () => {
    laboratory.db.insert(secrets).values({ kind: 'share', hash: hashSecret('share secret'), subject: id, expiresAt: new Date(Date.now() + 60_000) }).run()
    expect(refusal('share secret')).toContain('does not open anything')
  })
})

describe('recoverLabLead', () => {
  it('makes a link for a lab lead, and for nobody else', async () => {
    laboratory.db.update(people).set({ passwordHash: 'forgotten' }).where(eq(people.id, lead.id)).run()
    const session = startSession(laboratory.db, lead.id)
    const link = recoverLabLead(laboratory.db, lead.signInName)
    await accept(link.secret)
    expect(findSessionPerson(laboratory.db, session)).toBeNull()
    expect(() => recoverLabLead(laboratory.db, 'bendow')).toThrow('no open account of a lab lead')
  })
})
