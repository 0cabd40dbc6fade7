import { existsSync, mkdirSync, readdirSync, statSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { eq } from 'drizzle-orm'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { activity, jobs, samples, uploads } from '../../../server/db/schema'
import { DomainError } from '../../../server/domain/DomainError'
import type { Person } from '../../../server/domain/person/person'
import { sweepFiles } from '../../../server/domain/table/originals'
import { listTables } from '../../../server/domain/table/listTables'
import { removeUpload } from '../../../server/domain/table/removeUpload'
import { changeTrace } from '../../../server/domain/trace/changeTrace'
import { readCentroids, readCentroidsNow } from '../../../server/domain/trace/files/readCentroids'
import { listTraces } from '../../../server/domain/trace/listTraces'
import { removeTrace } from '../../../server/domain/trace/removeTrace'
import { sweepTraceFiles } from '../../../server/domain/trace/traceFiles'
import { Jobs } from '../../../server/jobs/runner'
import { jobKinds } from '../../../server/jobs'
import { extractTrace, traceWindow } from '../../../shared/science/traces/extractTrace'
import { addTestPerson, addTestStudy, openTestLaboratory, workerSources, type TestLaboratory } from '../../support/laboratory'
import { addUsedTrace } from '../../support/usedTrace'
import { mzmlText, writtenScan } from '../../support/mzmlText'
import { tracesOf } from '../../support/readMzml'
import { readRunTraces } from '../../support/readRunTraces'
import { referenceFile } from '../../support/upload'
import { sendTrace, uploadTrace } from '../../support/uploadTrace'

let laboratory: TestLaboratory
let person: Person
let studyId: string

beforeEach(async () => {
  laboratory = await openTestLaboratory(['trace'])
  person = addTestPerson(laboratory, 'analyst')
  studyId = addTestStudy(laboratory, person).id
})
afterEach(() => laboratory.close())

const list = () => listTraces(laboratory.db, studyId)
const upload = (name: string, content: string | Uint8Array, query = {}) => uploadTrace(laboratory, studyId, person, name, content, query)
const addSample = (name: string) => laboratory.db.insert(samples).values({ studyId, name, position: 0 }).returning().get().id
const below = (name: string) => existsSync(join(laboratory.folder, name)) ? readdirSync(join(laboratory.folder, name)) : []
const small = (seed = 0) => mzmlText([writtenScan({ minutes: 1, mz: [100 + seed, 159.9999, 160.0001], intensity: [5, 10, 20] }), writtenScan({ minutes: 2, mz: [160], intensity: [30] })])
const onlyTrace = () => {
  const [trace] = list().traces
  if (!trace) throw new Error('no trace')
  return trace
}

describe('an mzML file', () => {
  it('becomes a sample\'s traces and points, and is not kept itself', async () => {
    const sampleId = addSample('Press A1')
    const file = referenceFile('mzml/minutes-zlib-indexed.mzML')
    const answer = await upload('press_a1.mzML', file)
    expect(answer).toMatchObject({ known: null, upload: { fileName: 'press_a1.mzML', status: 'reading' } })
    const { traces: expected, centroids } = await tracesOf(file)
    const trace = onlyTrace()
    expect(trace).toMatchObject({ sampleId, sampleName: 'Press A1', bytes: file.length, polarity: 'negative', profile: false, scans: 300, centroids: centroids.mz.length, intensityLimit: 0, lowestMz: centroids.mz[0], highestMz: centroids.mz.at(-1), remark: null, versions: 0, replacedAt: null })
    expect(readRunTraces(laboratory.db, studyId, trace.id)).toEqual(expected)
    const slices = readdirSync(join(laboratory.folder, 'traces', trace.id))
    const kept = slices.reduce((sum, name) => sum + statSync(join(laboratory.folder, 'traces', trace.id, name)).size, 0)
    expect(trace.keptBytes).toBe(kept + 3 * 8 * 300)
    expect([below('incoming'), below('received'), below('originals'), below('traces')]).toEqual([[], [], [], [trace.id]])
    expect(listTables(laboratory.db, studyId)).toMatchObject({ tables: [], uploads: [] })
    for (const mz of [153.01933, 353.08781, 435.12967]) {
      const window = traceWindow(mz, 10)
      expect(extractTrace(readCentroidsNow(laboratory.folder, trace.id, window), window, trace.scans)).toEqual(extractTrace(centroids, window, trace.scans))
    }
    expect(laboratory.db.select().from(activity).all().map(line => line.action)).toEqual(expect.arrayContaining(['upload trace', 'read trace']))
  })

  it('gives the points of a window from one slice, at a border from two, and none where nothing was measured', async () => {
    await upload('a.mzML', small())
    const { id } = onlyTrace()
    const wide = { lowMz: 159.9, highMz: 160.1 }
    const points = await readCentroids(laboratory.folder, id, wide)
    expect([[...points.mz], [...points.intensity], [...points.scan]]).toEqual([[159.9999, 160, 160.0001], [10, 30, 20], [0, 1, 0]])
    expect(readCentroidsNow(laboratory.folder, id, wide)).toEqual(points)
    expect([...(await readCentroids(laboratory.folder, id, { lowMz: 160, highMz: 160.00005 })).mz]).toEqual([160])
    expect((await readCentroids(laboratory.folder, id, { lowMz: 700, highMz: 720 })).mz).toHaveLength(0)
    expect(readCentroidsNow(laboratory.folder, 'none', wide).mz).toHaveLength(0)
    expect([...readCentroidsNow(laboratory.folder, id, { lowMz: 0, highMz: 1000 }).mz]).toEqual([100, 159.9999, 160, 160.0001])
  })

  it('keeps points from a stated intensity on; all count for the total', async () => {
    await upload('a.mzML', small(), { intensityLimit: 10 })
    expect(onlyTrace()).toMatchObject({ intensityLimit: 10, centroids: 3, lowestMz: 159.9999 })
    expect([...readRunTraces(laboratory.db, studyId, onlyTrace().id).total]).toEqual([35, 30])
    await upload('b.mzML', small(1), { intensityLimit: 1000 })
    expect(list().uploads[0]?.remark).toMatch(/no signal of at least 1000 counts/)
  })

  it('says what was passed over', async () => {
    await upload('profile.mzML', referenceFile('mzml/param-group-32bit.mzML'))
    expect(onlyTrace()).toMatchObject({ profile: true, remark: expect.stringContaining('profile data') })
    await upload('b.mzML', mzmlText([writtenScan({ mz: [100, 101], intensity: [1, Number.NaN] }), writtenScan({ minutes: null })]))
    expect(list().traces.find(trace => trace.fileName === 'b.mzML')?.remark).toBe('1 scan does not say when it was taken and was passed over. 1 point with an m/z or an intensity that can\'t be was left out.')
  })

  it.each(['numpress', 'external-entity', 'cut-short', 'entity-bomb'])('is refused with its reason, and nothing of it kept: %s', async (name) => {
    await upload(`${name}.mzML`, referenceFile(`mzml/refuse-${name}.mzML`))
    expect(list()).toMatchObject({ traces: [], uploads: [{ status: 'refused', remark: expect.stringMatching(/not supported|not accepted|ends early/) }] })
    expect([below('incoming'), below('received'), below('originals'), below('traces')]).toEqual([[], [], [], []])
  })

  it('is refused where no scan has the study\'s polarity, saying what is there', async () => {
    await upload('a.mzML', small().replaceAll('MS:1000129', 'MS:1000130'))
    expect(list().uploads[0]?.remark).toMatch(/no MS1 scan in negative mode.*It holds 2 scans MS1 in positive mode/)
    await expect(upload('empty.mzML', '')).rejects.toThrow('The file is empty.')
    await upload('flat.mzML', mzmlText([writtenScan({ mz: [], intensity: [] })]))
    expect(list().uploads.some(line => /hold no signal/.test(line.remark ?? ''))).toBe(true)
    expect(below('traces')).toEqual([])
  })

  it('is known again by its content', async () => {
    await upload('a.mzML', small())
    expect(await upload('b.mzML', small())).toEqual({ upload: null, known: 'The study has this content already, as a.mzML. It was not kept twice.' })
    expect(list().traces).toHaveLength(1)
    const other = addTestStudy(laboratory, person).id
    expect((await uploadTrace(laboratory, other, person, 'a.mzML', small())).known).toBeNull()
  })
})

describe('a sample', () => {
  it('has one trace at a time', async () => {
    const first = addSample('Press A1')
    const second = addSample('Press B1')
    await upload('Press A1.mzML', small())
    await upload('Press A1 again.mzML', small(1))
    const again = list().traces.find(trace => trace.sampleId === null)
    expect(again?.remark).toBe('“Press A1” has a trace already: choose a sample, or replace that trace.')
    if (!again) throw new Error('no second trace')
    expect(() => changeTrace(laboratory.db, studyId, again.id, { sampleId: first }, person)).toThrow('“Press A1” has a trace already, Press A1.mzML.')
    expect(() => changeTrace(laboratory.db, studyId, again.id, { sampleId: 'x'.repeat(21) }, person)).toThrow('not in the sheet')
    expect(() => changeTrace(laboratory.db, addTestStudy(laboratory, person).id, again.id, { sampleId: null }, person)).toThrow(DomainError)
    changeTrace(laboratory.db, studyId, again.id, { sampleId: second }, person)
    expect(list().traces.find(trace => trace.id === again.id)?.sampleName).toBe('Press B1')
  })

  it('gets a new trace in the place of the old, whose files go', async () => {
    const sampleId = addSample('Press A1')
    await upload('Press A1.mzML', small())
    const before = onlyTrace()
    await upload('other name.mzML', small(1), { replaces: before.id })
    const after = onlyTrace()
    expect(after).toMatchObject({ fileName: 'other name.mzML', sampleId })
    await vi.waitFor(() => expect(below('traces')).toEqual([after.id]))
    await upload('lower.mzML', small(1), { replaces: after.id, intensityLimit: 10 })
    expect(onlyTrace()).toMatchObject({ fileName: 'lower.mzML', intensityLimit: 10, sampleId })
    await expect(upload('x.mzML', small(2), { replaces: before.id })).rejects.toThrow('not in this study any more')
  })

  it('keeps a trace that a version used, out of use', async () => {
    await upload('a.mzML', small())
    const used = onlyTrace()
    addUsedTrace(laboratory.db, studyId, person.id, used.id)
    expect(onlyTrace().versions).toBe(1)
    expect(removeTrace(laboratory.db, laboratory.folder, studyId, used.id, person)).toEqual({ id: used.id, retired: true })
    expect(onlyTrace().replacedAt).not.toBeNull()
    expect(readCentroidsNow(laboratory.folder, used.id, { lowMz: 0, highMz: 1000 }).mz).toHaveLength(4)
    expect(() => removeTrace(laboratory.db, laboratory.folder, studyId, used.id, person)).toThrow(DomainError)
    expect(() => changeTrace(laboratory.db, studyId, used.id, { sampleId: null }, person)).toThrow('out of use')
    expect((await upload('again.mzML', small())).known).toBeNull()
  })

  it('loses a trace that nothing used, with its files', async () => {
    await upload('a.mzML', small())
    const { id } = onlyTrace()
    expect(() => removeTrace(laboratory.db, laboratory.folder, addTestStudy(laboratory, person).id, id, person)).toThrow(DomainError)
    expect(removeTrace(laboratory.db, laboratory.folder, studyId, id, person)).toEqual({ id, retired: false })
    await vi.waitFor(() => expect(below('traces')).toEqual([]))
    expect([list().traces, laboratory.db.select().from(uploads).all()]).toEqual([[], []])
  })
})

describe('a reading that does not end', () => {
  it('leaves nothing where it is stopped', async () => {
    const answer = await sendTrace(laboratory, studyId, person, 'a.mzML', small())
    expect(below('received')).toHaveLength(1)
    removeUpload(laboratory, studyId, answer.upload?.id ?? '', person)
    await vi.waitFor(() => expect([below('received'), below('traces'), list()]).toEqual([[], [], { traces: [], uploads: [], samples: [] }]))
    expect(laboratory.db.select({ status: jobs.status }).from(jobs).all()).toEqual([{ status: 'cancelled' }])
  })

  it('goes on after a restart from the received file', async () => {
    await laboratory.jobs.stop()
    const { upload: line } = await sendTrace(laboratory, studyId, person, 'a.mzML', small())
    laboratory.db.update(jobs).set({ status: 'running', attempts: 1 }).where(eq(jobs.id, line?.jobId ?? '')).run()
    mkdirSync(join(laboratory.folder, 'traces', `${line?.id}.part`), { recursive: true })
    writeFileSync(join(laboratory.folder, 'traces', `${line?.id}.part`, '10.spill'), 'half a block')
    mkdirSync(join(laboratory.folder, 'traces', 'nobody'))
    sweepFiles(laboratory.db, laboratory.folder)
    sweepTraceFiles(laboratory.db, laboratory.folder)
    expect([below('received').length, below('traces')]).toEqual([1, []])
    const again = new Jobs({ db: laboratory.db, folder: laboratory.folder }, jobKinds, workerSources(['trace']))
    again.resume()
    await again.idle()
    await again.stop()
    expect(onlyTrace()).toMatchObject({ fileName: 'a.mzML', centroids: 4 })
    expect([below('received'), below('traces')]).toEqual([[], [onlyTrace().id]])
    sweepTraceFiles(laboratory.db, laboratory.folder)
    expect(below('traces')).toEqual([onlyTrace().id])
  })
})
