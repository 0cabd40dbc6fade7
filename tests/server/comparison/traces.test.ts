import { rmSync } from 'node:fs'
import { join } from 'node:path'
import { gunzipSync } from 'node:zlib'
import { and, eq } from 'drizzle-orm'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { packFloat64, unpackFloat64 } from '../../../server/db/packed'
import { alignmentTables, comparisons, comparisonVersions, jobs, traceMaxima, traces } from '../../../server/db/schema'
import type { CompareInput } from '../../../server/domain/comparison/compareInput'
import { readComparisonData } from '../../../server/domain/comparison/comparisonData'
import { prepareComparison, prepareVersion } from '../../../server/domain/comparison/prepareComparison'
import { readComparison } from '../../../server/domain/comparison/readComparison'
import { versionColumns } from '../../../server/domain/comparison/readVersion'
import { verdictCsv } from '../../../server/domain/comparison/verdictCsv'
import { keepVersion } from '../../../server/domain/comparison/keepVersion'
import { readSamples } from '../../../server/domain/comparison/storedSample'
import type { Person } from '../../../server/domain/person/person'
import { sharedData } from '../../../server/domain/share/sharedData'
import type { VisibleStudy } from '../../../server/domain/study/findVisibleStudy'
import { standingTraces, usedTraces } from '../../../server/domain/trace/alignedTraces'
import type { TraceMaxima } from '../../../server/domain/trace/traceMaxima'
import { removeTrace } from '../../../server/domain/trace/removeTrace'
import { unpackComparisonData } from '../../../shared/formats/comparisonData'
import { packVerdicts, unpackVerdicts } from '../../../shared/formats/verdictColumns'
import { newComparisonSchema, newVersionSchema, type NewVersionInput } from '../../../shared/schemas/comparison'
import { decideVerdicts } from '../../../shared/science/verdict/decideVerdicts'
import { reasonSentence } from '../../../shared/science/verdict/reasonSentence'
import { REASONS } from '../../../shared/science/verdict/reasons'
import { comparisonDefaults } from '../../../shared/science/verdict/settings'
import { summariseSides } from '../../../shared/science/verdict/summariseSides'
import { VERDICTS, type Verdict } from '../../../shared/science/verdict/verdicts'
import { addComparedAlignment } from '../../support/comparedAlignment'
import { none } from '../../support/comparisonInput'
import { addTestPerson, addTestStudy, openTestLaboratory, type TestLaboratory } from '../../support/laboratory'
import { smallTrace, type SmallPeak } from '../../support/smallTrace'
import { uploadTrace } from '../../support/uploadTrace'

let laboratory: TestLaboratory
let analyst: Person
let student: Person
let study: VisibleStudy
let alignmentId: string

/** Features at m/z 200, 201, 202, 203 and minutes 1, 2, 3, 4: on both sides, and three in side A's tables alone. */
beforeEach(async () => {
  laboratory = await openTestLaboratory(['compare', 'trace'])
  analyst = addTestPerson(laboratory, 'analyst')
  student = addTestPerson(laboratory, 'student')
  study = addTestStudy(laboratory, analyst)
  alignmentId = addComparedAlignment(laboratory, study.id, analyst.id, [
    { name: 'a1', side: 'A', intensity: [9000, 9000, 9000, 9000], statedFloor: 500 },
    { name: 'b1', side: 'B', intensity: [9000, none, none, none], statedFloor: 500 },
    { name: 'pool', kind: 'pooledQc', side: null, intensity: [9000, none, none, none], statedFloor: 500 },
  ]).alignment.id
})
afterEach(() => laboratory.close())

const inA: readonly SmallPeak[] = [[200, 1, 900], [201, 2, 900], [202, 3, 900], [203, 4, 900]]
/** Of what B's table does not list, its trace shows the second strongly, the third faintly, the fourth not at all. */
const inB: readonly SmallPeak[] = [[200, 1, 900], [201.001, 2.05, 450], [202, 3, 9]]
const upload = (name: string, peaks: readonly SmallPeak[], query = {}) => uploadTrace(laboratory, study.id, analyst, name, smallTrace(peaks), query)
const both = async () => {
  await upload('a1.mzML', inA)
  await upload('b1.mzML', inB)
}
const traceOf = (fileName: string) => {
  const row = laboratory.db.select({ id: traces.id }).from(traces).where(eq(traces.fileName, fileName)).get()
  if (!row) throw new Error(`no trace ${fileName}`)
  return row.id
}
const remove = (fileName: string) => removeTrace(laboratory.db, laboratory.folder, study.id, traceOf(fileName), analyst)

const start = (input: CompareInput, person = analyst) => laboratory.jobs.add({ kind: 'compare', studyId: study.id, input, personId: person.id })
async function end(job: { id: string }) {
  await laboratory.jobs.idle()
  const ended = laboratory.db.select().from(jobs).where(eq(jobs.id, job.id)).get()
  if (!ended) throw new Error('no job')
  return ended
}
async function run(input: CompareInput, person = analyst): Promise<string> {
  const ended = await end(start(input, person))
  if (ended.status !== 'done' || !ended.resultId) throw new Error(ended.message)
  return ended.resultId
}
const newComparison = (input: object = {}, person = analyst) => prepareComparison(laboratory.db, study, newComparisonSchema.parse({ alignmentId, ...input }), person)
const newVersion = (id: string, input: Partial<NewVersionInput> = {}, person = analyst) => prepareVersion(laboratory.db, study, id, newVersionSchema.parse({ from: 1, settings: comparisonDefaults, ...input }), person)
const create = (input: object = {}, person = analyst) => run(newComparison(input, person), person)
const save = (id: string, input: Partial<NewVersionInput> = {}, person = analyst) => run(newVersion(id, input, person), person)
const read = (id: string, number?: number, person = analyst) => readComparison(laboratory.db, study.id, id, person, number).version
const result = (id: string, number?: number, person = analyst) => unpackVerdicts(gunzipSync(versionColumns(laboratory.db, read(id, number, person).id)))
const reasons = (id: string, number?: number, person = analyst) => [...result(id, number, person).columns.reason].map(code => REASONS[code])
const maximaKept = () => laboratory.db.select({ traceId: traceMaxima.traceId, maxima: traceMaxima.maxima }).from(traceMaxima).where(eq(traceMaxima.alignmentId, alignmentId)).all()

const emptyCounts = Object.fromEntries(VERDICTS.map(name => [name, 0])) as Record<Verdict, number>

const withTraces = ['levelAssumed', 'signalInTrace', 'foundOnly', 'foundOnly']
const withoutTraces = ['levelAssumed', 'foundOnly', 'foundOnly', 'foundOnly']

describe('a comparison', () => {
  it('looks into the traces that stand, and keeps what it found there', async () => {
    await both()
    await upload('pool.mzML', inB.slice(1))
    const id = await create()
    expect(reasons(id)).toEqual(withTraces)
    const { columns } = result(id)
    expect([...columns.traceRatio].map(ratio => Number(ratio.toFixed(4)))).toEqual([none, 0.5, 0.01, 0])
    expect([...columns.traceSamples]).toEqual([0, 1, 1, 1])
    expect(read(id).traces.map(({ position, fileName, traceId }) => ({ position, fileName, traceId }))).toEqual([
      { position: 0, fileName: 'a1.mzML', traceId: traceOf('a1.mzML') }, { position: 1, fileName: 'b1.mzML', traceId: traceOf('b1.mzML') },
    ])
    expect(read(id).traceChanges).toEqual([])
    expect(maximaKept()).toHaveLength(2)
    expect([...unpackFloat64(maximaKept().find(({ traceId }) => traceId === traceOf('b1.mzML'))?.maxima ?? Buffer.alloc(0))].map(Math.round)).toEqual([900, 450, 9, 0])
    const names = { a: 'Millrace', b: 'Tallow Lane' }
    expect(reasonSentence(1, result(id), comparisonDefaults, names)).toContain('a signal stands in Tallow Lane\'s trace (1 of 1 sample) that its table does not list: up to ×0.5 of Millrace\'s there')
    expect(reasonSentence(2, result(id), comparisonDefaults, names)).toContain('Trace seen: Tallow Lane\'s trace (1 of 1 sample) shows at most ×0.01 of Millrace\'s there.')
  })

  it('is previewed in the page as it was judged, and for guests too', async () => {
    await both()
    const id = await create()
    const packed = readComparisonData(laboratory.db, study.id, id, analyst)
    const preview = decideVerdicts(summariseSides({ ...unpackComparisonData(packed), normaliseByAmount: true }), comparisonDefaults)
    expect(packVerdicts(preview)).toEqual(new Uint8Array(gunzipSync(versionColumns(laboratory.db, read(id).id))))
    expect(sharedData(laboratory.db, { studyId: study.id, versionId: read(id).id, allowExport: false, endsAt: new Date() })).toEqual(packed)
  })

  it('says so in its CSV', async () => {
    await both()
    const id = await create()
    let text = ''
    for await (const chunk of verdictCsv(laboratory.db, study, id, analyst).chunks) text += chunk
    expect(text).toMatch(/Trace of b1 looked into: b1\.mzML, SHA-256 [0-9a-f]{64}/)
    expect(text).toContain('trace of the other side (times),traces of the other side')
  })

  it('without traces is judged as ever', async () => {
    const id = await create()
    expect(reasons(id)).toEqual(withoutTraces)
    expect(reasonSentence(1, result(id), comparisonDefaults, { a: 'A', b: 'B' })).toContain('No trace to check.')
    expect([read(id).traces, read(id).traceChanges, maximaKept()]).toEqual([[], [], []])
    expect(read(id).cautions.join(' ')).not.toContain('race')
  })

  it('finds what drift and a mass offset have moved', async () => {
    await upload('a1.mzML', inA)
    await upload('b1.mzML', inB.map(([mz, minutes, height]): SmallPeak => [mz * (1 + 40e-6), minutes + 0.4, height]))
    const moved = and(eq(alignmentTables.alignmentId, alignmentId), eq(alignmentTables.sampleName, 'b1'))
    const missed = await create()
    expect([...result(missed).columns.traceRatio].map(ratio => Number(ratio.toFixed(4)))).toEqual([none, 0, 0, 0])
    laboratory.db.delete(traceMaxima).run()
    laboratory.db.update(alignmentTables).set({ offsetPpm: 40, offsetApplied: true, driftMinutes: packFloat64(Float64Array.of(1, 4)), driftShift: packFloat64(Float64Array.of(0.4, 0.4)) }).where(moved).run()
    expect(reasons(await create())).toEqual(withTraces)
    const [, second] = standingTraces(laboratory.db, alignmentId)
    expect([second?.sampleName, second?.offsetPpm, second?.scanMinutes[0]?.toFixed(9)]).toEqual(['b1', 40, '0.100000000'])
  })
})

describe('traces that came in since', () => {
  it('are told, move nothing by themselves, and are looked into by a new version on wish', async () => {
    const id = await create()
    await both()
    expect(read(id).traceChanges).toEqual(['Not looked into here: the traces of a1, b1.'])
    expect(reasons(id)).toEqual(withoutTraces)
    await save(id, { settings: { ...comparisonDefaults, reachLimit: 4 } })
    expect([reasons(id), read(id).traces]).toEqual([withoutTraces, []])

    await save(id, { from: 2, settings: { ...comparisonDefaults, reachLimit: 4 }, useTraces: true })
    expect(read(id).differs).toEqual(['Traces of 2 samples were looked into.'])
    expect([reasons(id), read(id).traceChanges]).toEqual([withTraces, []])
    expect([reasons(id, 1), read(id, 1).traces]).toEqual([withoutTraces, []])
  })

  it('were all looked into already: nothing to save', async () => {
    await both()
    const id = await create()
    expect(() => newVersion(id, { useTraces: true })).toThrow('Nothing differs from version 1')
  })
})

describe('a later version', () => {
  it('uses again what was found, without the files', async () => {
    await both()
    const id = await create()
    rmSync(join(laboratory.folder, 'traces'), { recursive: true })
    await save(id, { settings: { ...comparisonDefaults, reachLimit: 2.5 } })
    expect(reasons(id)).toEqual(withTraces)
    expect(read(id).traces).toEqual(read(id, 1).traces)
    expect(maximaKept()).toHaveLength(2)
  })

  it('goes without traces on wish', async () => {
    await both()
    const id = await create()
    await save(id, { useTraces: false })
    expect([reasons(id), read(id).traces, read(id).differs]).toEqual([withoutTraces, [], ['Traces were not looked into any more.']])
  })

  it('keeps to the traces it starts from where one was replaced, and takes the new one on wish', async () => {
    await both()
    const id = await create()
    const replaced = traceOf('b1.mzML')
    await upload('b1 again.mzML', inB.slice(0, 1), { replaces: replaced })
    expect(read(id).traceChanges).toEqual(['Replaced since: the trace of b1.'])
    await save(id, { settings: { ...comparisonDefaults, alpha: 0.01 } })
    expect([reasons(id), read(id).traces[1]?.traceId]).toEqual([withTraces, replaced])
    await save(id, { from: 2, settings: { ...comparisonDefaults, alpha: 0.01 }, useTraces: true })
    expect([reasons(id), read(id).traces[1]?.traceId]).toEqual([withoutTraces, traceOf('b1 again.mzML')])
    expect(read(id).differs).toEqual(['Other traces were looked into, of b1.', 'No longer looked into: b1.mzML.'])
    expect(reasons(id, 2)).toEqual(withTraces)
  })

  it('on another alignment looks into the traces that stand', async () => {
    await both()
    const id = await create()
    const placed = laboratory.db.select({ sampleId: alignmentTables.sampleId, tableId: alignmentTables.tableId, digest: alignmentTables.tableDigest }).from(alignmentTables).where(eq(alignmentTables.alignmentId, alignmentId)).all()
    const again = (place: number, member: number[]) => ({ sampleId: placed[place]?.sampleId ?? '', tableId: placed[place]?.tableId ?? '', digest: placed[place]?.digest ?? '', member })
    const other = addComparedAlignment(laboratory, study.id, analyst.id, [
      { name: 'b1', intensity: [none, 9000], again: again(1, [-1, 0]) }, { name: 'a1', intensity: [9000, 9000], again: again(0, [1, 0]) },
    ], { mz: Float64Array.of(201, 200), retentionMinutes: Float64Array.of(2, 1) })
    await save(id, { alignmentId: other.alignment.id })
    expect(reasons(id)).toEqual(['signalInTrace', 'levelAssumed'])
    expect(read(id).traces.map(({ position, fileName }) => [position, fileName])).toEqual([[0, 'b1.mzML'], [1, 'a1.mzML']])
  })
})

describe('a trace that is taken off', () => {
  it('stays for the versions that used it, and is told', async () => {
    await both()
    const id = await create()
    expect(remove('b1.mzML')).toMatchObject({ retired: true })
    expect(read(id).traceChanges).toEqual(['Taken off since: the trace of b1.'])
    expect(reasons(id)).toEqual(withTraces)
    expect(unpackComparisonData(readComparisonData(laboratory.db, study.id, id, analyst)).traceMaxima?.map(values => values !== null)).toEqual([true, true, false])
    expect(usedTraces(laboratory.db, alignmentId, read(id).traces).map(({ fileName }) => fileName)).toEqual(['a1.mzML', 'b1.mzML'])
    expect(standingTraces(laboratory.db, alignmentId).map(({ fileName }) => fileName)).toEqual(['a1.mzML'])
    await save(id, { useTraces: true })
    expect(reasons(id)).toEqual(withoutTraces)
    expect(read(id).cautions).toContain('Traces of 1 of 2 compared samples were looked into. What the tables of b1 do not list was not looked for there.')
  })

  it('while a comparison waits for it: the comparison ends with a sentence, and nothing of it stays', async () => {
    await both()
    const input = newComparison()
    remove('b1.mzML')
    const ended = await end(start(input))
    expect([ended.status, ended.message]).toEqual(['failed', 'A trace that was to be looked into was taken off meanwhile. Start again: it takes the traces that stand then.'])
    expect(laboratory.db.select().from(comparisonVersions).all()).toEqual([])
  })

  it('while a comparison looks into it, or uses what was found before: neither is kept', async () => {
    await both()
    await create({ practice: true }, student)
    const input = newComparison()
    // A practice copy that used it is deleted: nothing holds the trace then.
    laboratory.db.delete(comparisons).run()
    remove('b1.mzML')
    const finish = (maxima: TraceMaxima[]) => () => keepVersion(laboratory.db, study.id, input, { samples: readSamples(input.samples), counts: emptyCounts, cautions: [], columns: new Uint8Array(0), maxima }, analyst.id)
    expect(finish([])).toThrow('was taken off meanwhile')
    expect(finish([{ traceId: input.traces?.[1]?.traceId ?? '', maxima: new Float64Array(4) }])).toThrow('was taken off meanwhile')
    expect(laboratory.db.select().from(comparisonVersions).all()).toEqual([])
  })

  it('with its files alone: never taken for a trace that shows nothing', async () => {
    await both()
    rmSync(join(laboratory.folder, 'traces', traceOf('b1.mzML')), { recursive: true })
    const ended = await end(start(newComparison()))
    expect([ended.status, ended.message]).toEqual(['failed', 'The files of the trace of b1 are not on the server any more. Upload its mzML again, then compare again.'])
    expect(maximaKept()).toEqual([])
  })
})

describe('practice copies', () => {
  it('look into traces too, and share what was found', async () => {
    await both()
    const id = await create({ practice: true }, student)
    expect(reasons(id, undefined, student)).toEqual(withTraces)
    await save(id, { settings: { ...comparisonDefaults, reachLimit: 1.5 } }, student)
    expect(reasons(id, undefined, student)).toEqual(withoutTraces)
    expect(maximaKept()).toHaveLength(2)
    expect(reasons(await create())).toEqual(withTraces)
    expect(maximaKept()).toHaveLength(2)
  })
})
