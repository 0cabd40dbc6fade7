import { eq } from 'drizzle-orm'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { activity, people, secrets, studies } from '../../../server/db/schema'
import { createShareLink } from '../../../server/domain/share/createShareLink'
import { listShareLinks } from '../../../server/domain/share/listShareLinks'
import { openShareLink } from '../../../server/domain/share/openShareLink'
import { readSharedComparison } from '../../../server/domain/share/readSharedComparison'
import { sharedCsv } from '../../../server/domain/share/sharedCsv'
import { sharedData } from '../../../server/domain/share/sharedData'
import { withdrawShareLink } from '../../../server/domain/share/withdrawShareLink'
import type { Person } from '../../../server/domain/person/person'
import { hashSecret } from '../../../server/domain/secret/secret'
import { unpackComparisonData } from '../../../shared/formats/comparisonData'
import { shareSchema } from '../../../shared/schemas/share'
import { addComparedAlignment } from '../../support/comparedAlignment'
import { addKeptComparison, versionIdOf } from '../../support/keptComparison'
import { addTestPerson, addTestStudy, openTestLaboratory, type TestLaboratory } from '../../support/laboratory'

const DAY_MS = 86_400_000
let laboratory: TestLaboratory
let reviewer: Person
let studyId: string
let comparisonId: string
let versionId: string

/** An alignment of one sample a side, two features. */
const alignmentOf = (person: Person, b: number, practice = false) =>
  addComparedAlignment(laboratory, studyId, person.id, [{ name: `A against ${b}`, side: 'A', intensity: [1000, 900] }, { name: `B of ${b}`, side: 'B', intensity: [1000, b] }], { practice }).alignment.id

beforeEach(async () => {
  laboratory = await openTestLaboratory()
  const analyst = addTestPerson(laboratory, 'analyst')
  reviewer = addTestPerson(laboratory, 'reviewer')
  studyId = addTestStudy(laboratory, analyst).id
  comparisonId = addKeptComparison(laboratory, studyId, analyst.id, alignmentOf(analyst, 4000))
  versionId = versionIdOf(laboratory, comparisonId)
})
afterEach(() => laboratory.close())

const make = (input: Partial<Parameters<typeof createShareLink>[2]> = {}, now = new Date()) =>
  createShareLink(laboratory.db, studyId, { versionId, label: 'the customer', days: 30, allowExport: false, ...input }, reviewer, now)
const refusal = (secret: string, now?: Date) => {
  try {
    openShareLink(laboratory.db, secret, now)
    return 'opened'
  }
  catch (error) {
    return error instanceof Error ? error.message : ''
  }
}

describe('a share link', () => {
  it('opens its own version and no other', () => {
    const { secret, endsAt } = make({ allowExport: true })
    expect(openShareLink(laboratory.db, secret)).toEqual({ studyId, versionId, allowExport: true, endsAt })
  })

  it('is in force to its end date, and no longer', () => {
    const now = new Date()
    const { secret, endsAt } = make({ days: 7 }, now)
    expect(endsAt.getTime() - now.getTime()).toBe(7 * DAY_MS)
    expect(refusal(secret, new Date(endsAt.getTime() - 1))).toBe('opened')
    expect(refusal(secret, endsAt)).not.toBe('opened')
  })

  it('wrong, ended or withdrawn, says the same', () => {
    const withdrawn = make()
    withdrawShareLink(laboratory.db, studyId, withdrawn.id, reviewer)
    const ended = make({ days: 1 }, new Date(Date.now() - 2 * DAY_MS))
    const said = new Set([refusal('no such secret'), refusal(''), refusal(ended.secret), refusal(withdrawn.secret)])
    expect([...said]).toEqual(['There is nothing at this address, or you may not see it.'])
  })

  it('a secret of another kind opens nothing', () => {
    const { id } = make()
    laboratory.db.insert(secrets).values({ kind: 'invitation', hash: hashSecret('an invitation'), subject: id, expiresAt: new Date(Date.now() + DAY_MS) }).run()
    expect(refusal('an invitation')).not.toBe('opened')
  })

  it('stays in force when its maker\'s account is closed: it is the laboratory\'s', () => {
    const { secret } = make()
    laboratory.db.update(people).set({ closedAt: new Date() }).where(eq(people.id, reviewer.id)).run()
    expect(refusal(secret)).toBe('opened')
  })

  it('is kept as a hash only; neither the list nor the record holds the secret', () => {
    const { secret } = make()
    const kept = JSON.stringify([laboratory.db.select().from(secrets).all(), laboratory.db.select().from(activity).all(), listShareLinks(laboratory.db, studyId)])
    expect(kept).not.toContain(secret)
    expect(kept).toContain(hashSecret(secret))
  })

  it('is listed with its state and its version, newest first', () => {
    const past = Date.now() - 10 * DAY_MS
    make({ label: 'first', days: 2 }, new Date(past))
    const second = make({ label: 'second' }, new Date(past + 1))
    make({ label: 'third' }, new Date(past + 2))
    withdrawShareLink(laboratory.db, studyId, second.id, reviewer)
    const listed = listShareLinks(laboratory.db, studyId)
    expect(listed.map(({ label, state, versionNumber, by }) => ({ label, state, versionNumber, by }))).toEqual([
      { label: 'third', state: 'inForce', versionNumber: 1, by: reviewer.name },
      { label: 'second', state: 'withdrawn', versionNumber: 1, by: reviewer.name },
      { label: 'first', state: 'ended', versionNumber: 1, by: reviewer.name },
    ])
    expect(laboratory.db.select().from(activity).all().map(act => act.action).filter(action => action.includes('link'))).toEqual(['make share link', 'make share link', 'make share link', 'withdraw share link'])
  })

  it('can\'t be withdrawn twice, nor through another study', () => {
    const { id } = make()
    const other = addTestStudy(laboratory, reviewer)
    expect(() => withdrawShareLink(laboratory.db, other.id, id, reviewer)).toThrow('nothing at this address')
    withdrawShareLink(laboratory.db, studyId, id, reviewer)
    expect(() => withdrawShareLink(laboratory.db, studyId, id, reviewer)).toThrow('withdrawn already')
  })
})

describe('what can be shared', () => {
  it('not a version of another study', () => {
    const other = addTestStudy(laboratory, reviewer)
    expect(() => createShareLink(laboratory.db, other.id, { versionId, label: '', days: 30, allowExport: false }, reviewer)).toThrow('nothing at this address')
  })

  it('not practice work: not there for others, refused to its maker', () => {
    const lead = addTestPerson(laboratory, 'labLead')
    const practice = versionIdOf(laboratory, addKeptComparison(laboratory, studyId, lead.id, alignmentOf(lead, 4000, true), { practice: true }))
    expect(() => make({ versionId: practice })).toThrow('nothing at this address')
    expect(() => createShareLink(laboratory.db, studyId, { versionId: practice, label: '', days: 30, allowExport: false }, lead)).toThrow('Practice work')
  })

  it('for 1 to 365 whole days, 30 unless said', () => {
    expect(shareSchema.parse({ versionId }).days).toBe(30)
    for (const days of [0, 366, 1.5, Number.NaN]) expect(shareSchema.safeParse({ versionId, days }).success).toBe(false)
  })
})

describe('what a guest reads', () => {
  const open = (secret: string) => openShareLink(laboratory.db, secret)

  it('is one version: nothing of a later one, of the study or of people', async () => {
    const { secret } = make({ allowExport: true })
    const before = JSON.stringify(readSharedComparison(laboratory.db, open(secret)))
    addKeptComparison(laboratory, studyId, reviewer.id, alignmentOf(reviewer, 90_000), { comparisonId, settings: { reachLimit: 7 } })
    const shared = readSharedComparison(laboratory.db, open(secret))
    expect(JSON.stringify(shared)).toBe(before)
    expect(Object.keys(shared).sort()).toEqual(['alignMassPpm', 'cautions', 'counts', 'createdAt', 'endsAt', 'engineVersion', 'massKind', 'mayExport', 'number', 'polarity', 'samples', 'settings', 'sideAName', 'sideBName', 'title'])
    const data = unpackComparisonData(sharedData(laboratory.db, open(secret)))
    const csv = await textOf(sharedCsv(laboratory.db, open(secret)))
    expect(data.intensity.map(column => [...column])).toEqual([[1000, 900], [1000, 4000]])
    const study = laboratory.db.select().from(studies).where(eq(studies.id, studyId)).get()
    for (const text of [before, csv]) for (const name of [reviewer.name, study?.title ?? '', studyId, comparisonId]) expect(text).not.toContain(name)
    expect(csv).toContain('It does not mean absent.')
  })

  it('is downloaded only where the link allows it', () => {
    expect(() => sharedCsv(laboratory.db, open(make().secret))).toThrow('does not allow downloads')
  })
})

async function textOf({ chunks }: { chunks: AsyncGenerator<string> }) {
  let text = ''
  for await (const chunk of chunks) text += chunk
  return text
}
