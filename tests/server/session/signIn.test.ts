import { eq } from 'drizzle-orm'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { activity, people, sessions } from '../../../server/db/schema'
import type { Person } from '../../../server/domain/person/person'
import { endSession, endSessionsOf, findSessionPerson, startSession } from '../../../server/domain/session/sessions'
import { signIn } from '../../../server/domain/session/signIn'
import { limitAtOnce } from '../../../server/domain/session/passwords'
import { signInSchema } from '../../../shared/schemas/person'
import { addTestPerson, openTestLaboratory, type TestLaboratory } from '../../support/laboratory'
import { testMeans } from '../../support/means'

const PASSWORD = 'tangle ferry cobalt'
const NOT_TOGETHER = 'This name and password do not fit together.'
let laboratory: TestLaboratory
let ada: Person

beforeEach(async () => {
  laboratory = await openTestLaboratory()
  ada = addTestPerson(laboratory, 'analyst', 'reviewer')
  laboratory.db.update(people).set({ passwordHash: `hash of ${PASSWORD}` }).where(eq(people.id, ada.id)).run()
})
afterEach(() => {
  vi.useRealTimers()
  laboratory.close()
})

const input = (signInName: string, password: string) => signInSchema.parse({ signInName, password })

describe('signIn', () => {
  it('does not unfold a name of megabytes', () => {
    // This sign becomes 18 letters when it is normalised.
    const { error } = signInSchema.safeParse({ signInName: '\uFDFA'.repeat(200_000), password: PASSWORD })
    expect(error?.issues).toMatchObject([{ path: ['signInName'], message: 'At most 200 characters.' }])
  })

  it('starts a session that stands for the person and their roles', async () => {
    const { secret } = await signIn(laboratory.db, input(ada.signInName, PASSWORD), testMeans())
    expect(findSessionPerson(laboratory.db, secret)).toEqual(ada)
    expect(laboratory.db.select().from(activity).all()).toMatchObject([{ action: 'sign in', personId: ada.id }])
  })

  it('takes the name in any case and with spaces around it', async () => {
    await expect(signIn(laboratory.db, input(` ${ada.signInName.toUpperCase()} `, PASSWORD), testMeans())).resolves.toMatchObject({ personId: ada.id })
  })

  it('keeps only the hash of what the cookie names', async () => {
    const { secret } = await signIn(laboratory.db, input(ada.signInName, PASSWORD), testMeans())
    expect(JSON.stringify(laboratory.db.select().from(sessions).all())).not.toContain(secret)
  })

  it.each([
    ['a wrong password', (): string => ada.signInName],
    ['a wrong name', (): string => 'nobody'],
    ['an account without a password', (): string => addTestPerson(laboratory, 'student').signInName],
    ['a closed account', (): string => {
      laboratory.db.update(people).set({ closedAt: new Date() }).where(eq(people.id, ada.id)).run()
      return ada.signInName
    }],
  ])('answers %s the same, after the same work: one hash checked', async (_, name) => {
    const means = testMeans()
    await expect(signIn(laboratory.db, input(name(), 'not the password'), means)).rejects.toThrow(NOT_TOGETHER)
    expect(means.hasher.verified).toHaveLength(1)
    expect(means.hasher.verified[0]?.password).toBe('not the password')
  })

  it('lets nobody in by the password of the stand-in hash', async () => {
    const means = testMeans()
    await expect(signIn(laboratory.db, input('nobody', 'no account has this password'), means)).rejects.toThrow(NOT_TOGETHER)
    expect(means.hasher.verified[0]?.hash).toBe('hash of no account has this password')
  })

  it('limits wrong passwords, then lets the right one in again after the window', async () => {
    vi.useFakeTimers()
    const means = testMeans()
    for (let at = 0; at < 10; at++) await expect(signIn(laboratory.db, input(ada.signInName, 'wrong'), means)).rejects.toThrow(NOT_TOGETHER)
    await expect(signIn(laboratory.db, input(ada.signInName, PASSWORD), means)).rejects.toThrow('too many attempts')
    expect(means.hasher.verified).toHaveLength(10)
    await vi.advanceTimersByTimeAsync(300_000)
    await expect(signIn(laboratory.db, input(ada.signInName, PASSWORD), means)).resolves.toMatchObject({ personId: ada.id })
  })

  it('limits guesses at names that do not exist in the same way', async () => {
    const means = testMeans()
    for (let at = 0; at < 10; at++) await expect(signIn(laboratory.db, input('nobody', 'wrong'), means)).rejects.toThrow(NOT_TOGETHER)
    await expect(signIn(laboratory.db, input('nobody', 'wrong'), means)).rejects.toThrow('too many attempts')
  })
})

describe('a session', () => {
  it('ends after 12 hours', () => {
    vi.useFakeTimers()
    const secret = startSession(laboratory.db, ada.id)
    vi.advanceTimersByTime(12 * 3_600_000 - 1000)
    expect(findSessionPerson(laboratory.db, secret)?.id).toBe(ada.id)
    vi.advanceTimersByTime(1000)
    expect(findSessionPerson(laboratory.db, secret)).toBeNull()
  })

  it('is ended alone, or with all others of the person', () => {
    const [first, second, third] = [1, 2, 3].map(() => startSession(laboratory.db, ada.id))
    const other = startSession(laboratory.db, addTestPerson(laboratory, 'student').id)
    endSession(laboratory.db, first ?? '')
    expect([first, second, third].map(secret => findSessionPerson(laboratory.db, secret ?? '')?.id)).toEqual([undefined, ada.id, ada.id])
    endSessionsOf(laboratory.db, ada.id)
    expect(findSessionPerson(laboratory.db, second ?? '')).toBeNull()
    expect(findSessionPerson(laboratory.db, other)).not.toBeNull()
  })

  it('stands for nobody once the account is closed', () => {
    const secret = startSession(laboratory.db, ada.id)
    laboratory.db.update(people).set({ closedAt: new Date() }).where(eq(people.id, ada.id)).run()
    expect(findSessionPerson(laboratory.db, secret)).toBeNull()
  })
})

describe('limitAtOnce', () => {
  it('verifies at most two at once, in turn', async () => {
    let busy = 0
    let most = 0
    const verify = async () => {
      most = Math.max(most, ++busy)
      await new Promise(resolve => setTimeout(resolve, 5))
      busy--
      return true
    }
    const hasher = limitAtOnce({ hash: password => Promise.resolve(password), verify })
    await Promise.all(Array.from({ length: 12 }, () => hasher.verify('hash', 'password')))
    expect(most).toBe(2)
  })

  it('turns away with a time to come back when too many wait', async () => {
    const hasher = limitAtOnce({ hash: password => Promise.resolve(password), verify: () => new Promise(resolve => setTimeout(() => resolve(true), 5)) })
    const results = await Promise.allSettled(Array.from({ length: 60 }, () => hasher.verify('hash', 'password')))
    const refused = results.filter(result => result.status === 'rejected')
    expect(refused.length).toBeGreaterThan(0)
    expect(refused[0]?.reason).toMatchObject({ kind: 'tooMany', retryAfterSeconds: 5 })
  })

  it('takes the same letters in another encoding as the same password', async () => {
    const hasher = limitAtOnce({ hash: password => Promise.resolve(password), verify: (hash, password) => Promise.resolve(hash === password) })
    expect(await hasher.verify(await hasher.hash('cafe\u0301 au lait'), 'caf\u00E9 au lait')).toBe(true)
  })
})
