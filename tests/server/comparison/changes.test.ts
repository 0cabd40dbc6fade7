import { eq } from 'drizzle-orm'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { jobs } from '../../../server/db/schema'
import { compareVersions } from '../../../server/domain/comparison/compareVersions'
import { prepareComparison, prepareVersion } from '../../../server/domain/comparison/prepareComparison'
import { verdictCsv } from '../../../server/domain/comparison/verdictCsv'
import type { Person } from '../../../server/domain/person/person'
import type { VisibleStudy } from '../../../server/domain/study/findVisibleStudy'
import { alignmentDefaults } from '../../../shared/science/alignment/settings'
import { newComparisonSchema, newVersionSchema } from '../../../shared/schemas/comparison'
import { ENGINE_VERSION } from '../../../shared/science/engineVersion'
import { comparisonDefaults } from '../../../shared/science/verdict/settings'
import { addComparedAlignment } from '../../support/comparedAlignment'
import { none } from '../../support/comparisonInput'
import { addTestPerson, addTestStudy, openTestLaboratory, type TestLaboratory } from '../../support/laboratory'

let laboratory: TestLaboratory
let analyst: Person
let student: Person
let reviewer: Person
let study: VisibleStudy
let official: string
let practice: string

async function run(input: ReturnType<typeof prepareComparison>, person: Person): Promise<string> {
  const job = laboratory.jobs.add({ kind: 'compare', studyId: study.id, input, personId: person.id })
  await laboratory.jobs.idle()
  return laboratory.db.select().from(jobs).where(eq(jobs.id, job.id)).get()?.resultId ?? ''
}

beforeAll(async () => {
  laboratory = await openTestLaboratory(['compare'])
  ;[analyst, student, reviewer] = [addTestPerson(laboratory, 'analyst'), addTestPerson(laboratory, 'student'), addTestPerson(laboratory, 'reviewer')]
  study = addTestStudy(laboratory, analyst)
  const { db } = laboratory
  const { alignment, placed } = addComparedAlignment(laboratory, study.id, analyst.id, [
    { name: '=a1', side: 'A', intensity: [1000, 5000, 400], statedFloor: 10 },
    { name: 'b1', side: 'B', intensity: [1100, 4900, none], statedFloor: 10 },
  ])
  official = await run(prepareComparison(db, study, newComparisonSchema.parse({ alignmentId: alignment.id, title: 'Official' }), analyst), analyst)
  await run(prepareVersion(db, study, official, newVersionSchema.parse({ from: 1, settings: { ...comparisonDefaults, reachLimit: 50 } }), analyst), analyst)
  // The student's tighter alignment splits the second feature: A's member stands alone, B's too.
  const [a, b] = placed
  if (!a || !b) throw new Error('no tables')
  const tighter = addComparedAlignment(laboratory, study.id, student.id, [
    { name: '=a1', intensity: [1000, 5000, none, 400], again: { ...a, member: [0, 1, -1, 2] } },
    { name: 'b1', intensity: [1100, none, 4900, none], again: { ...b, member: [0, -1, 1, -1] } },
  ], { practice: true, settings: { ...alignmentDefaults, retentionMinutes: 0.02 } })
  practice = await run(prepareComparison(db, study, newComparisonSchema.parse({ alignmentId: tighter.alignment.id, title: 'Tighter' }), student), student)
})
afterAll(() => laboratory.close())

const changes = (query: object, person = analyst, id = official) => compareVersions(laboratory.db, study.id, id, query, person)

describe('what changed', () => {
  it('between a version and the one before', async () => {
    const { before, after, differs, matched, moves, features, changed } = await changes({})
    expect([before.number, after.number]).toEqual([1, 2])
    expect(differs).toEqual(['Reach limit: ×3 → ×50.'])
    expect(matched).toBe(3)
    expect(moves).toEqual([{ from: 'onlyA', to: 'unsettled', count: 1 }, { from: 'level', to: 'level', count: 2 }])
    expect(changed).toBe(1)
    expect(features).toEqual([expect.objectContaining({ index: 2, indexBefore: 2, mz: 202, from: 'onlyA', to: 'unsettled' })])
  })

  it('between two alignments, each feature followed by its most intense member', async () => {
    const result = await changes({ againstComparison: official, against: 1 }, student, practice)
    expect(result.matched).toBe(3)
    expect([result.onlyBefore, result.onlyAfter]).toEqual([0, 1])
    expect(result.features).toEqual([expect.objectContaining({ index: 1, indexBefore: 1, from: 'level', to: 'onlyA', highestCounts: 5000 })])
    expect(result.differs[0]).toMatch(/^Alignment \d+ → \d+\.$/)
    expect(result.differs).toContain('Time tolerance 0.02 min (before: time tolerance 0.1 min).')
    expect(result.before.title).toBe('Official')
  })

  it('takes the latest version of another comparison unless one is named', async () => {
    expect((await changes({ againstComparison: official }, student, practice)).before.number).toBe(2)
  })

  it('needs a version before the first, and one that is there', async () => {
    await expect(changes({ version: 1 })).rejects.toThrow('This is the first version')
    await expect(changes({ version: 7 })).rejects.toThrow('nothing at this address')
  })

  it('never looks into another\'s practice copy', async () => {
    await expect(changes({ againstComparison: practice })).rejects.toThrow('nothing at this address')
    await expect(changes({}, reviewer, practice)).rejects.toThrow('nothing at this address')
  })
})

describe('the verdict CSV', () => {
  const read = async (id: string, person: Person, version?: number) => {
    let text = ''
    for await (const chunk of verdictCsv(laboratory.db, study, id, person, version).chunks) text += chunk
    return text
  }

  it('states settings, engine, digests and cautions above, and a reason for each feature', async () => {
    const text = await read(official, reviewer, 1)
    const lines = text.split('\r\n')
    expect(text.startsWith('\uFEFF"# Steelyard: verdicts') || text.startsWith('\uFEFF# Steelyard: verdicts')).toBe(true)
    for (const expected of ['Ratios are B over A.', `Engine version ${ENGINE_VERSION}`, 'Reach limit: ×3', 'SHA-256 ', 'Caution: Assumed precision', 'floor 10 (stated)']) expect(text).toContain(expected)
    const header = lines.findIndex(line => line.startsWith('feature,'))
    expect(lines.length - header - 2).toBe(3)
    expect(lines[header + 3]).toContain('found only in A')
    expect(lines[header + 3]).toContain('Found in 1 of 1 preparation of A')
    expect(text).not.toMatch(/Infinity|NaN/)
  })

  it('is for those who may export, and for one\'s own practice', async () => {
    expect(() => verdictCsv(laboratory.db, study, official, student)).toThrow('do not allow exports')
    expect(await read(practice, student)).toContain('practice copy')
    expect(() => verdictCsv(laboratory.db, study, practice, reviewer)).toThrow('nothing at this address')
  })
})
