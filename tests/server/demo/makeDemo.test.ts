import { gunzipSync } from 'node:zlib'
import { and, eq } from 'drizzle-orm'
import { afterEach, describe, expect, it } from 'vitest'
import { alignments, alignmentTables, comparisons, comparisonVersions, flags, layouts, samples, studies, tables, traces, uploads } from '../../../server/db/schema'
import { ionsOf } from '../../../server/domain/demo/ions'
import { makeDemo } from '../../../server/domain/demo/makeDemo'
import { demoStudies } from '../../../server/domain/demo/studies'
import { jobKinds } from '../../../server/jobs'
import { Jobs } from '../../../server/jobs/runner'
import { unpackVerdicts } from '../../../shared/formats/verdictColumns'
import { REASONS } from '../../../shared/science/verdict/reasons'
import { addTestPerson, addTestStudy, openTestLaboratory, workerSources, type TestLaboratory } from '../../support/laboratory'

let laboratory: TestLaboratory
afterEach(() => laboratory.close())

async function emptyLaboratory() {
  laboratory = await openTestLaboratory(['read', 'trace', 'align', 'compare'])
  return { analyst: addTestPerson(laboratory, 'analyst'), scientist: addTestPerson(laboratory, 'scientist') }
}
const told: string[] = []
const make = (signal = new AbortController().signal, jobs = laboratory.jobs) => makeDemo({ ...laboratory, jobs }, now => told.push(now), signal)

/** What stands in the laboratory once the demo is whole. */
function standing() {
  const { db } = laboratory
  return db.select().from(studies).orderBy(studies.createdAt).all().map(({ id, title, createdBy }) => ({
    title,
    createdBy,
    samples: db.select({ id: samples.id }).from(samples).where(eq(samples.studyId, id)).all().length,
    uploads: db.select().from(uploads).where(and(eq(uploads.studyId, id), eq(uploads.kind, 'table'))).all().map(upload => upload.status).join(' '),
    traces: db.select({ name: samples.name }).from(traces).innerJoin(samples, eq(samples.id, traces.sampleId)).where(eq(traces.studyId, id)).all().map(row => row.name).sort(),
    tables: db.select().from(tables).where(eq(tables.studyId, id)).all().filter(table => table.sampleId !== null && table.refusedRows === 0).length,
    alignments: db.select({ id: alignments.id }).from(alignments).where(eq(alignments.studyId, id)).all().length,
    comparisons: db.select({ id: comparisons.id }).from(comparisons).where(eq(comparisons.studyId, id)).all().length,
    flags: db.select({ id: flags.id }).from(flags).where(eq(flags.studyId, id)).all().length,
  }))
}

function expectWhole(analystId: string) {
  expect(standing()).toEqual(demoStudies.map(({ study, sheet, fileStyle, traced, flags: story }) => ({
    title: study.title,
    createdBy: analystId,
    samples: sheet.length,
    uploads: (fileStyle === 'wide' ? ['read'] : sheet.map(() => 'read')).join(' '),
    traces: [...traced].sort(),
    tables: sheet.length,
    alignments: 1,
    comparisons: 1,
    flags: story.length,
  })))
}

describe('making the demo laboratory', { timeout: 240_000 }, () => {
  it('makes every study whole through uploads and jobs, once', async () => {
    const { analyst } = await emptyLaboratory()
    await make()
    expectWhole(analyst.id)
    const { db } = laboratory
    const [first] = db.select().from(studies).where(eq(studies.title, demoStudies[0].study.title)).all()
    const version = db.select().from(comparisonVersions).where(eq(comparisonVersions.studyId, first?.id ?? '')).get()
    expect(version?.counts.onlyA).toBeGreaterThan(20)
    expect(version?.counts.setAside).toBeGreaterThan(50)
    expect(version?.settings.divertWindows).toEqual(demoStudies[0].method.divertWindows)
    // What its tables alone would call found on one side stands in the other's traces: two juices, three bottles each.
    expect(version?.traces).toHaveLength(6)
    const { columns } = unpackVerdicts(gunzipSync(version?.columns ?? Buffer.alloc(0)))
    const ions = ionsOf(demoStudies[0].compounds)
    for (const { compound } of demoStudies[0].overlooked ?? []) {
      const ion = ions.find(each => demoStudies[0].compounds[each.compound]?.name === compound)
      const there = [...columns.mz].flatMap((mz, i) => Math.abs(mz - (ion?.mz ?? 0)) / mz < 8e-6 && Math.abs(columns.retentionMinutes[i]! - (ion?.retentionMinutes ?? 0)) < 0.2 ? [REASONS[columns.reason[i]!]] : [])
      expect(there, compound).toContain('signalInTrace')
    }
    // The seconds-and-semicolon files were answered once and their layout remembered.
    expect(db.select().from(layouts).all().length).toBeGreaterThan(0)
    expect(told.at(-1)).toContain('study 3 of 3')

    // The wide file's rows are taken as given, the others' features aligned; every sample has its table.
    for (const { study, fileStyle, sheet } of demoStudies) {
      const row = db.select({ id: alignments.id, asGiven: alignments.asGiven, groups: alignments.groups }).from(alignments)
        .innerJoin(studies, eq(studies.id, alignments.studyId)).where(eq(studies.title, study.title)).get()
      expect(row?.asGiven).toBe(fileStyle === 'wide')
      expect(row?.groups).toBeGreaterThan(700)
      const named = db.select().from(alignmentTables).where(eq(alignmentTables.alignmentId, row?.id ?? '')).all().map(table => table.sampleName)
      expect(named.sort()).toEqual(sheet.map(sample => sample.name).sort())
    }

    const before = standing()
    await make()
    expect(standing()).toEqual(before)
  })

  it('goes on where it was stopped, without doing anything twice', async () => {
    const { analyst } = await emptyLaboratory()
    for (const part of ['Reading the tables', 'Reading the raw data', 'Aligning', 'Comparing']) {
      const stop = new AbortController()
      const jobs = new Jobs(laboratory, jobKinds, workerSources(['read', 'trace', 'align', 'compare']))
      jobs.resume()
      const making = makeDemo({ ...laboratory, jobs }, (now) => {
        if (now.startsWith(part)) setTimeout(() => stop.abort(), 60)
      }, stop.signal)
      await expect(making).rejects.toThrow()
      // As a kill would: nothing more is written, jobs are left running.
      await jobs.stop()
    }
    const jobs = new Jobs(laboratory, jobKinds, workerSources(['read', 'trace', 'align', 'compare']))
    jobs.resume()
    await make(undefined, jobs)
    await jobs.stop()
    expectWhole(analyst.id)
  })

  it('leaves a laboratory alone in which people have begun by themselves', async () => {
    const { analyst } = await emptyLaboratory()
    addTestStudy(laboratory, analyst)
    await make()
    expect(laboratory.db.select().from(studies).all()).toHaveLength(1)
  })
})
