import { eq } from 'drizzle-orm'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { activity, people } from '../../../server/db/schema'
import { findInvitation } from '../../../server/domain/person/invitations'
import { renewLink } from '../../../server/domain/person/managePerson'
import { changePassword, editProfile, ownProfile } from '../../../server/domain/person/ownAccount'
import type { Person } from '../../../server/domain/person/person'
import { findSessionPerson, startSession } from '../../../server/domain/session/sessions'
import { profileSchema } from '../../../shared/schemas/person'
import { addTestPerson, openTestLaboratory, type TestLaboratory } from '../../support/laboratory'
import { testMeans } from '../../support/means'

const PRESENT = 'tangle ferry cobalt'
const NEXT = 'another long phrase'
let laboratory: TestLaboratory
let ada: Person

beforeEach(async () => {
  laboratory = await openTestLaboratory()
  ada = addTestPerson(laboratory, 'analyst')
  laboratory.db.update(people).set({ passwordHash: `hash of ${PRESENT}` }).where(eq(people.id, ada.id)).run()
})
afterEach(() => laboratory.close())

const hash = () => laboratory.db.select().from(people).where(eq(people.id, ada.id)).get()?.passwordHash

describe('changePassword', () => {
  it('ends every session and starts one for the browser that asked', async () => {
    const sessions = [startSession(laboratory.db, ada.id), startSession(laboratory.db, ada.id)]
    const { secret } = await changePassword(laboratory.db, { present: PRESENT, password: NEXT }, ada, testMeans())
    expect(sessions.map(session => findSessionPerson(laboratory.db, session))).toEqual([null, null])
    expect(findSessionPerson(laboratory.db, secret)?.id).toBe(ada.id)
    expect(hash()).toBe(`hash of ${NEXT}`)
    expect(laboratory.db.select().from(activity).all()).toMatchObject([{ action: 'change password', personId: ada.id, detail: '' }])
  })

  it('withdraws a link that waits', async () => {
    const { secret } = renewLink(laboratory.db, ada.id, ada)
    await changePassword(laboratory.db, { present: PRESENT, password: NEXT }, ada, testMeans())
    expect(() => findInvitation(laboratory.db, secret)).toThrow('does not open anything')
  })

  it('asks the present password, and names the field', async () => {
    const session = startSession(laboratory.db, ada.id)
    await expect(changePassword(laboratory.db, { present: 'wrong', password: NEXT }, ada, testMeans())).rejects.toMatchObject({ kind: 'invalid', issues: [{ field: 'present' }] })
    expect(hash()).toBe(`hash of ${PRESENT}`)
    expect(findSessionPerson(laboratory.db, session)?.id).toBe(ada.id)
  })

  it('is limited like signing in, so that a session left open can\'t be used to guess', async () => {
    const means = testMeans()
    for (let at = 0; at < 10; at++) await expect(changePassword(laboratory.db, { present: 'wrong', password: NEXT }, ada, means)).rejects.toMatchObject({ kind: 'invalid' })
    await expect(changePassword(laboratory.db, { present: PRESENT, password: NEXT }, ada, means)).rejects.toMatchObject({ kind: 'tooMany' })
  })

  it('refuses the commonest passwords', async () => {
    await expect(changePassword(laboratory.db, { present: PRESENT, password: 'password12345' }, ada, testMeans())).rejects.toMatchObject({ kind: 'invalid', issues: [{ field: 'password' }] })
    expect(hash()).toBe(`hash of ${PRESENT}`)
  })
})

describe('editProfile', () => {
  it('changes one\'s own name alone', () => {
    const other = addTestPerson(laboratory, 'student')
    expect(editProfile(laboratory.db, { name: 'Ada Quill' }, ada)).toEqual({ name: 'Ada Quill', benchKeys: true })
    expect(laboratory.db.select({ name: people.name }).from(people).all().map(row => row.name).sort()).toEqual(['Ada Quill', other.name].sort())
  })

  it('puts one\'s own keys of the bench off, and on again, and leaves the name', () => {
    const other = addTestPerson(laboratory, 'student')
    expect(ownProfile(laboratory.db, ada)).toEqual({ name: ada.name, benchKeys: true })
    expect(editProfile(laboratory.db, { benchKeys: false }, ada)).toEqual({ name: ada.name, benchKeys: false })
    expect(ownProfile(laboratory.db, other).benchKeys).toBe(true)
    expect(editProfile(laboratory.db, { benchKeys: true }, ada).benchKeys).toBe(true)
  })

  it('is not asked to change nothing, or to something that is no choice', () => {
    expect(profileSchema.safeParse({}).success).toBe(false)
    expect(profileSchema.safeParse({ benchKeys: 'no' }).success).toBe(false)
    expect(profileSchema.safeParse({ name: ' ' }).success).toBe(false)
  })
})
