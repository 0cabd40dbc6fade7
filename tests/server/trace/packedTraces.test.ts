import { eq } from 'drizzle-orm'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { packFloat64 } from '../../../server/db/packed'
import { alignmentTables, traces } from '../../../server/db/schema'
import { comparisonExtracted, comparisonTraces } from '../../../server/domain/comparison/comparisonTraces'
import { DomainError } from '../../../server/domain/DomainError'
import type { Person } from '../../../server/domain/person/person'
import { sharedExtracted, sharedTraces } from '../../../server/domain/share/sharedTraces'
import { unpackExtractedTraces, unpackSampleTraces } from '../../../shared/formats/traceColumns'
import { extractQuerySchema } from '../../../shared/schemas/comparison'
import { addComparedAlignment } from '../../support/comparedAlignment'
import { addKeptComparison, versionIdOf } from '../../support/keptComparison'
import { addTestPerson, addTestStudy, openTestLaboratory, type TestLaboratory } from '../../support/laboratory'
import { mzmlText, writtenScan } from '../../support/mzmlText'
import { uploadTrace } from '../../support/uploadTrace'

let laboratory: TestLaboratory
let analyst: Person
let studyId: string
let comparisonId: string
let alignmentId: string

/** Features at m/z 200, 201 and 202; only M1 and T1 have raw data, from 1 to 4 minutes. */
const scans = (height: number, shift = 1) => mzmlText([1, 2, 3, 4].map(minutes => writtenScan({ minutes, mz: [150, 200 * shift, 201 * shift, 260], intensity: [0.5, minutes === 2 ? height : 1, 7, 3] })))

beforeEach(async () => {
  laboratory = await openTestLaboratory(['trace'])
  analyst = addTestPerson(laboratory, 'analyst')
  studyId = addTestStudy(laboratory, analyst).id
  const columns = [['M1', 'A'], ['M2', 'A'], ['T1', 'B']].map(([name = '', side]) => ({ name, side: side as 'A' | 'B', intensity: [1000, 900, 800] }))
  alignmentId = addComparedAlignment(laboratory, studyId, analyst.id, columns).alignment.id
  comparisonId = addKeptComparison(laboratory, studyId, analyst.id, alignmentId)
  await uploadTrace(laboratory, studyId, analyst, 'M1.mzML', scans(100))
  await uploadTrace(laboratory, studyId, analyst, 'T1.mzML', scans(50))
})
afterEach(() => laboratory.close())

const total = (number?: number) => unpackSampleTraces(comparisonTraces(laboratory.db, studyId, comparisonId, analyst, number))
const extracted = async (features: number[]) => unpackExtractedTraces(await comparisonExtracted(laboratory, studyId, comparisonId, analyst, { features }))
const link = () => ({ studyId, versionId: versionIdOf(laboratory, comparisonId), allowExport: false, endsAt: new Date() })
/** A second version that looked into these files. */
function lookInto(fileNames: readonly string[]) {
  const standing = laboratory.db.select().from(traces).all().filter(({ fileName }) => fileNames.includes(fileName))
  const used = standing.map(({ id, fileName, sha256 }) => ({ position: fileName.startsWith('M1') ? 0 : 2, traceId: id, fileName, sha256 }))
  addKeptComparison(laboratory, studyId, analyst.id, alignmentId, { comparisonId, traces: used })
  return versionIdOf(laboratory, comparisonId, 2)
}

describe('the traces of a version', () => {
  it('are those of its samples that have raw data, by their place', () => {
    const found = total()
    expect(found.map(({ position }) => position)).toEqual([0, 2])
    expect([...found[0]?.minutes ?? []]).toEqual([1, 2, 3, 4])
    expect([...found[0]?.total ?? []]).toEqual([11.5, 110.5, 11.5, 11.5])
    expect([...found[1]?.base ?? []]).toEqual([7, 50, 7, 7])
  })

  it('stand on the common time of the alignment, in its order even where times cross', () => {
    const drift = { driftMinutes: packFloat64(Float64Array.of(2, 2.5)), driftShift: packFloat64(Float64Array.of(0, 1.8)) }
    laboratory.db.update(alignmentTables).set(drift).where(eq(alignmentTables.position, 0)).run()
    const [first] = total()
    const minutes = [...first?.minutes ?? []]
    expect(minutes).toEqual([...minutes].sort((a, b) => a - b))
    expect(minutes[0]).toBeCloseTo(1, 9)
    expect(minutes[1]).toBeCloseTo(3 - 1.8, 9)
    expect([...first?.total ?? []]).toEqual([11.5, 11.5, 110.5, 11.5])
  })

  it('give what the version looked into, where it looked into any', () => {
    lookInto(['T1.mzML'])
    expect(total(2).map(({ position }) => position)).toEqual([2])
    expect(total(1)).toHaveLength(2)
  })
})

describe('extracted traces', () => {
  it('are cut out at the features\' m/z, each in each sample', async () => {
    const found = await extracted([0, 1])
    expect(found.map(({ position, feature }) => `${position} ${feature}`)).toEqual(['0 0', '0 1', '2 0', '2 1'])
    expect([...found[0]?.values ?? []]).toEqual([1, 100, 1, 1])
    expect([...found[3]?.values ?? []]).toEqual([7, 7, 7, 7])
  })

  it('are flat where nothing was measured, and none beyond the m/z of a trace', async () => {
    expect((await extracted([2])).map(({ values }) => [...values])).toEqual([[0, 0, 0, 0], [0, 0, 0, 0]])
    laboratory.db.update(traces).set({ highestMz: 201 }).where(eq(traces.fileName, 'M1.mzML')).run()
    expect((await extracted([2])).map(({ position }) => position)).toEqual([2])
  })

  it('take the mass offset of the table out', async () => {
    await uploadTrace(laboratory, studyId, analyst, 'M2.mzML', scans(80, 1 + 25e-6))
    expect([...(await extracted([0])).find(({ position }) => position === 1)?.values ?? []]).toEqual([0, 0, 0, 0])
    laboratory.db.update(alignmentTables).set({ offsetPpm: 25, offsetApplied: true }).where(eq(alignmentTables.position, 1)).run()
    expect([...(await extracted([0])).find(({ position }) => position === 1)?.values ?? []]).toEqual([1, 80, 1, 1])
  })

  it('are refused for what is no feature of the alignment', async () => {
    await expect(extracted([3])).rejects.toThrow('This alignment has 3 features, and no #4 among them.')
    await expect(comparisonExtracted(laboratory, studyId, 'elsewhere', analyst, { features: [0] })).rejects.toThrow(DomainError)
  })
})

describe('a guest', () => {
  it('gets what the version looked into and nothing that came besides', async () => {
    expect(unpackSampleTraces(sharedTraces(laboratory.db, link()))).toEqual([])
    expect(unpackExtractedTraces(await sharedExtracted(laboratory, link(), [0]))).toEqual([])
    const looked = { ...link(), versionId: lookInto(['M1.mzML']) }
    expect(unpackSampleTraces(sharedTraces(laboratory.db, looked)).map(({ position }) => position)).toEqual([0])
    expect(unpackExtractedTraces(await sharedExtracted(laboratory, looked, [0])).map(({ position }) => position)).toEqual([0])
  })
})

describe('a guest, and whoever else draws traces', () => {
  it('is not told what the files are called', async () => {
    const looked = { ...link(), versionId: lookInto(['M1.mzML']) }
    for (const packed of [sharedTraces(laboratory.db, looked), await sharedExtracted(laboratory, looked, [0])]) expect(Buffer.from(packed).includes('M1.mzML')).toBe(false)
  })

  it('ends the work by going away', async () => {
    const looked = { ...link(), versionId: lookInto(['M1.mzML']) }
    await expect(sharedExtracted(laboratory, looked, [0], AbortSignal.abort())).rejects.toThrow('aborted')
  })
})

describe('the features asked for', () => {
  it('are places joined by points, at most twelve', () => {
    expect(extractQuerySchema.parse({ features: '0.7.12' }).features).toEqual([0, 7, 12])
    for (const features of ['', '1.', '-1', 'a', '1,2', '1e3', Array.from({ length: 13 }, (_, i) => i).join('.'), undefined]) {
      expect(extractQuerySchema.safeParse({ features }).success).toBe(false)
    }
  })
})
