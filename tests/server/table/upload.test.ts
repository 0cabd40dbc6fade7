import { once } from 'node:events'
import { existsSync, mkdirSync, readdirSync, readlinkSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { buffer } from 'node:stream/consumers'
import { eq } from 'drizzle-orm'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { activity, alignments, alignmentTables, originals, samples, tables, uploads } from '../../../server/db/schema'
import { DomainError } from '../../../server/domain/DomainError'
import type { Person } from '../../../server/domain/person/person'
import { answerUpload } from '../../../server/domain/table/answerUpload'
import { changeTable } from '../../../server/domain/table/changeTable'
import { emptyIncoming } from '../../../server/domain/upload/incoming'
import { findUpload, listTables } from '../../../server/domain/table/listTables'
import { openOriginal } from '../../../server/domain/table/openOriginal'
import { originalPath, sweepFiles } from '../../../server/domain/table/originals'
import { checkRoom, receiveFile } from '../../../server/domain/upload/receiveFile'
import { findRefusedRows, refusedCsv } from '../../../server/domain/table/refusedRows'
import { removeTable } from '../../../server/domain/table/removeTable'
import { readColumn, readWideRows } from '../../../server/domain/table/tableColumns'
import { dropExpiredUploads, removeUpload } from '../../../server/domain/table/removeUpload'
import { MAX_TABLE_BYTES } from '../../../shared/schemas/table'
import { addTestPerson, addTestStudy, openTestLaboratory, type TestLaboratory } from '../../support/laboratory'
import { referenceFile, uploadContent, uploadReference } from '../../support/upload'

let laboratory: TestLaboratory
let person: Person
let studyId: string

beforeEach(async () => {
  laboratory = await openTestLaboratory(['read'])
  person = addTestPerson(laboratory, 'analyst')
  studyId = addTestStudy(laboratory, person).id
})
afterEach(() => laboratory.close())

const plain = 'm/z,RT (min),Area\n100.1,1.5,1000.5\n200.2,2.5,2000.5\n'
const upload = (name: string, content: string | Uint8Array, replaces?: string) => uploadContent(laboratory, studyId, person, name, content, replaces)
const list = () => listTables(laboratory.db, studyId)
const addSample = (name: string) => laboratory.db.insert(samples).values({ studyId, name, position: 0 }).returning().get().id
const filesIn = (folder: string) => existsSync(join(laboratory.folder, folder)) ? readdirSync(join(laboratory.folder, folder), { recursive: true, withFileTypes: true }).filter(entry => entry.isFile()).map(entry => entry.name) : []
const onlyTable = () => {
  const [table] = list().tables
  if (!table) throw new Error('no table')
  return table
}

/** An alignment that rests on a table, as far as the database must know. */
function addAlignment(tableId: string) {
  const empty = Buffer.alloc(0)
  const { id } = laboratory.db.insert(alignments).values({ studyId, number: 1, settings: {} as never, engineVersion: '1', groups: 0, reference: -1, mz: empty, retentionMinutes: empty, groupSize: empty, neighbourStart: empty, neighbourList: empty, createdBy: person.id }).returning().get()
  laboratory.db.insert(alignmentTables).values({ alignmentId: id, position: 0, tableId, sampleName: 's', tableDigest: 'd', intensity: empty, member: empty, correctedMinutes: empty, leftOutRow: empty, leftOutGroup: empty, offsetPpm: 0, offsetApplied: false, timeCorrected: false, landmarks: 0, driftReason: '', driftMinutes: empty, driftShift: empty }).run()
}

describe('a clear file', () => {
  it('becomes a table with its columns, sample and original', async () => {
    const sampleId = addSample('Press A1')
    const answer = await upload('press_a1.csv', plain)
    expect(answer).toMatchObject({ known: null, upload: { fileName: 'press_a1.csv', status: 'reading' } })
    expect(list().uploads).toEqual([])
    expect(onlyTable()).toMatchObject({ fileName: 'press_a1.csv', sampleId, sampleName: 'Press A1', features: 2, refusedRows: 0, measure: 'area', massKind: 'mz', bytes: plain.length, alignments: 0, gapFilled: false, remark: null })
    const row = laboratory.db.select().from(tables).get()
    if (!row) throw new Error('no row')
    expect((['mz', 'retentionMinutes', 'intensity', 'width'] as const).map(name => Array.from(readColumn(laboratory.db, row.id, name)))).toEqual([[100.1, 200.2], [1.5, 2.5], [1000.5, 2000.5], []])
    expect([readWideRows(laboratory.db, row.id).length, row.wideGroup]).toEqual([0, null])
    expect([filesIn('incoming'), filesIn('received'), filesIn('originals')]).toEqual([[], [], [`${row.originalSha256}.gz`]])
  })

  it('lets go of its original where a download ends half way', async () => {
    const rows = Array.from({ length: 40_000 }, (_, i) => `${100 + i * 0.0137},${(i * 7919 % 1500) / 100},${(i * 104_729 % 999_983) + 1}`)
    await upload('x.txt', `m/z,RT (min),Area\n${rows.join('\n')}\n`)
    const { stream } = openOriginal(laboratory.db, laboratory.folder, studyId, onlyTable().id)
    await once(stream, 'readable')
    const pathOf = (descriptor: string) => {
      try {
        return readlinkSync(`/proc/self/fd/${descriptor}`)
      }
      catch {
        return ''
      }
    }
    const open = () => readdirSync('/proc/self/fd').map(pathOf).filter(path => path.startsWith(join(laboratory.folder, 'originals')))
    expect(open()).toHaveLength(1)
    stream.destroy()
    await vi.waitFor(() => expect(open()).toEqual([]), 30_000)
  })

  it('gives its original back byte for byte', async () => {
    const content = referenceFile('tables/utf16-bom.txt')
    await upload('x.txt', content)
    const original = openOriginal(laboratory.db, laboratory.folder, studyId, onlyTable().id)
    expect([original.fileName, original.bytes]).toEqual(['x.txt', content.length])
    expect(Buffer.compare(await buffer(original.stream), content)).toBe(0)
  })

  it('lists the rows that could not be used, and gives them as CSV', async () => {
    await uploadReference(laboratory, studyId, person, 'tables/seven-bad-rows.csv')
    expect(onlyTable()).toMatchObject({ features: 33, refusedRows: 7 })
    expect(findRefusedRows(laboratory.db, studyId, onlyTable().id).rows[0]).toEqual({ line: 5, column: 'm/z', value: 'abc', reason: 'not a number' })
    const { name, text } = refusedCsv(laboratory.db, studyId, onlyTable().id)
    expect([name, text.split('\r\n').length]).toEqual(['seven-bad-rows refused rows.csv', 10])
    expect(text).toContain('13,m/z,\'-5,')
  })

  it('says what was passed over and noticed', async () => {
    await uploadReference(laboratory, studyId, person, 'tables/space-thousands-total-line.csv')
    expect(onlyTable().remark).toBe('Passed over: 1 total line.')
    await uploadReference(laboratory, studyId, person, 'tables/area-and-height.csv')
    expect(list().tables[1]?.remark).toContain('Both area and height are there: the area is read.')
  })

  it('is said to hold the features of another', async () => {
    await upload('one.csv', plain)
    await upload('two.tsv', plain.replaceAll(',', '\t'))
    expect(list().tables.map(table => table.remark)).toEqual([null, 'The same features stand in one.csv.'])
  })

  it('leaves a sample alone that has a table', async () => {
    addSample('Press A1')
    await upload('Press A1.csv', plain)
    await upload('Press A1.txt', plain.replace('100.1', '100.2'))
    expect(list().tables.map(table => table.sampleName).sort()).toEqual(['Press A1', null].sort())
    expect(list().tables.find(table => table.sampleId === null)?.remark).toContain('“Press A1” has a table already')
  })
})

describe('the same content', () => {
  it('is said and not kept twice', async () => {
    await upload('one.csv', plain)
    expect(await upload('two.csv', plain)).toEqual({ upload: null, known: 'The study has this content already, as one.csv. It was not kept twice.' })
    expect([list().tables.length, list().uploads.length, filesIn('incoming')]).toEqual([1, 0, []])
  })
  it('is said while it waits', async () => {
    await upload('one.csv', referenceFile('tables/ambiguous-thousands.csv'))
    expect((await upload('two.csv', referenceFile('tables/ambiguous-thousands.csv'))).known).toContain('as one.csv')
  })
  it('may stand in two studies, and stays while one needs it', async () => {
    await upload('one.csv', plain)
    const other = addTestStudy(laboratory, person).id
    await uploadContent(laboratory, other, person, 'one.csv', plain)
    removeTable(laboratory.db, laboratory.folder, studyId, onlyTable().id, person)
    await Promise.resolve()
    expect(filesIn('originals')).toHaveLength(1)
    const [left] = listTables(laboratory.db, other).tables
    removeTable(laboratory.db, laboratory.folder, other, left?.id ?? '', person)
    await Promise.resolve()
    expect([filesIn('originals'), laboratory.db.select().from(uploads).all(), laboratory.db.select().from(originals).all()]).toEqual([[], [], []])
  })
})

describe('a refused file', () => {
  it.each(['empty.csv', 'header-only.csv', 'not-a-table.csv'])('%s leaves nothing but its line', async (name) => {
    await uploadReference(laboratory, studyId, person, `tables/${name}`).catch((error: unknown) => expect(error).toBeInstanceOf(DomainError))
    expect([list().tables, filesIn('incoming'), filesIn('received'), filesIn('originals'), laboratory.db.select().from(originals).all()]).toEqual([[], [], [], [], []])
    const [line] = list().uploads
    if (name === 'empty.csv') expect(line).toBeUndefined()
    else expect(line).toMatchObject({ status: 'refused', remark: expect.stringMatching(/no rows|not a text table/) as unknown })
  })
  it('can be cleared away', async () => {
    await uploadReference(laboratory, studyId, person, 'tables/not-a-table.csv')
    removeUpload(laboratory, studyId, list().uploads[0]?.id ?? '', person)
    expect(list().uploads).toEqual([])
  })
})

describe('a file that leaves something open', () => {
  const open = (digits: string) => `m/z,RT,Intensity\n100.5,1.5,"12,${digits}"\n`
  const waiting = () => list().uploads.filter(line => line.status === 'waiting')

  it('waits with its original and an end date, over a restart too', async () => {
    await upload('one.csv', open('345'))
    expect(list().tables).toEqual([])
    expect(waiting()).toHaveLength(1)
    expect(Date.parse(waiting()[0]?.expiresAt ?? '')).toBeGreaterThan(Date.now() + 13 * 86_400_000)
    emptyIncoming(laboratory.folder)
    sweepFiles(laboratory.db, laboratory.folder)
    laboratory.jobs.resume()
    expect(findUpload(laboratory.db, studyId, waiting()[0]?.id ?? '').basis?.survey.preview[0]?.cells).toEqual(['100.5', '1.5', '12,345'])
    expect(filesIn('originals')).toHaveLength(1)
  })

  it('is read as answered, with all of its shape, and later ones at once', async () => {
    await upload('one.csv', open('345'))
    await upload('two.csv', open('346'))
    await upload('other.csv', 'Name,Time,Area\nx,1.5,5\n')
    const first = waiting().find(line => line.fileName === 'one.csv')
    expect(answerUpload(laboratory, studyId, first?.id ?? '', { intensityDecimalMark: '.' }, person)).toEqual({ reading: 2, waiting: 0 })
    await laboratory.jobs.idle()
    expect(waiting().map(line => line.fileName)).toEqual(['other.csv'])
    await upload('three.csv', open('347'))
    const intensities = list().tables.map(table => [table.fileName, readColumn(laboratory.db, table.id, 'intensity')[0]])
    expect(intensities.sort()).toEqual([['one.csv', 12345], ['three.csv', 12347], ['two.csv', 12346]])
  })

  it('can\'t be read while something is open, and says which field', async () => {
    await upload('one.csv', open('345'))
    const answer = () => answerUpload(laboratory, studyId, waiting()[0]?.id ?? '', { timeUnit: 'minutes' }, person)
    expect(answer).toThrow(expect.objectContaining({ kind: 'invalid', issues: [expect.objectContaining({ field: 'intensityDecimalMark' })] }) as Error)
  })

  it('waits for a confirmation as well', async () => {
    await uploadReference(laboratory, studyId, person, 'tables/seconds-without-a-word.csv')
    expect(waiting()).toHaveLength(1)
    answerUpload(laboratory, studyId, waiting()[0]?.id ?? '', { timeUnit: 'seconds' }, person)
    await laboratory.jobs.idle()
    expect(onlyTable()).toMatchObject({ features: 40, timeUnit: 'seconds' })
  })

  it('goes back to waiting, with the reason, where an answer makes no row usable', async () => {
    await upload('one.csv', 'Name,Time,Area\nx,1.5,-5\nx,2.5,-6\n')
    answerUpload(laboratory, studyId, waiting()[0]?.id ?? '', { mzColumn: 0 }, person)
    await laboratory.jobs.idle()
    expect(waiting()[0]?.remark).toContain('No row can be used')
  })

  it('is let go at its end date, or by a person', async () => {
    await upload('one.csv', open('345'))
    await upload('two.csv', open('346'))
    laboratory.db.update(uploads).set({ expiresAt: new Date(0) }).where(eq(uploads.fileName, 'one.csv')).run()
    dropExpiredUploads(laboratory.db, laboratory.folder)
    expect(waiting().map(line => line.fileName)).toEqual(['two.csv'])
    removeUpload(laboratory, studyId, waiting()[0]?.id ?? '', person)
    await Promise.resolve()
    expect([list().uploads, filesIn('originals')]).toEqual([[], []])
  })

  it('belongs to its study', async () => {
    await upload('one.csv', open('345'))
    const other = addTestStudy(laboratory, person).id
    expect(() => answerUpload(laboratory, other, waiting()[0]?.id ?? '', {}, person)).toThrow(DomainError)
    expect(() => findUpload(laboratory.db, other, waiting()[0]?.id ?? '')).toThrow(DomainError)
    expect(() => removeUpload(laboratory, other, waiting()[0]?.id ?? '', person)).toThrow(DomainError)
  })
})

describe('a wide file', () => {
  it('gives a table a column, with one row index, matched by the column\'s name', async () => {
    const names = ['Press A1', 'Press A2', 'Carton B1', 'Carton B2']
    names.forEach(addSample)
    await uploadReference(laboratory, studyId, person, 'tables/wide-four-samples.csv')
    expect(list().tables.map(table => [table.columnName, table.sampleName, table.features]).sort()).toEqual([['Carton B1', 'Carton B1', 31], ['Carton B2', 'Carton B2', 31], ['Press A1', 'Press A1', 30], ['Press A2', 'Press A2', 33]])
    const rows = laboratory.db.select().from(tables).all()
    expect(new Set(rows.map(row => row.wideGroup)).size).toBe(1)
    for (const row of rows) expect([readWideRows(laboratory.db, row.id).length, readColumn(laboratory.db, row.id, 'mz').length]).toEqual([row.features, row.features])
    expect(readWideRows(laboratory.db, rows.find(row => row.columnName === 'Carton B1')?.id ?? '')[0]).toBe(0)
  })
  it('marks a column with hardly an empty cell as gap-filled', async () => {
    const lines = Array.from({ length: 200 }, (_, row) => `${100 + row},1,5,${row < 10 ? '' : 5}`)
    await upload('wide.csv', `m/z,RT,A1,B1\n${lines.join('\n')}\n`)
    expect(list().tables.map(table => [table.columnName, table.gapFilled]).sort()).toEqual([['A1', true], ['B1', false]])
  })
  it('gives each table the refused cells of its own column, and the refused rows', async () => {
    await upload('wide.csv', 'm/z,RT,A1,B1\n100,1,5,-3\n200,2,6,7\nbad,3,6,7\n')
    const refused = Object.fromEntries(list().tables.map(table => [table.columnName, findRefusedRows(laboratory.db, studyId, table.id).rows.map(row => [row.line, row.column])]))
    expect(refused).toEqual({ A1: [[4, 'm/z']], B1: [[2, 'B1'], [4, 'm/z']] })
  })
  it('drops columns that a person says are no samples, when it is read again', async () => {
    await upload('wide.csv', 'm/z,RT,A1,B1,Mean\n100,1,5,3,4\n')
    answerUpload(laboratory, studyId, onlyTable().uploadId, { notSamples: [4] }, person)
    await laboratory.jobs.idle()
    expect(list().tables.map(table => table.columnName).sort()).toEqual(['A1', 'B1'])
  })
})

describe('a wrong table', () => {
  it('is replaced: the new one takes its sample and peak limit, the old one goes', async () => {
    const sampleId = addSample('S')
    await upload('wrong.csv', plain)
    changeTable(laboratory.db, studyId, onlyTable().id, { sampleId, statedFloor: 50 }, person)
    await upload('right.csv', plain.replace('100.1', '100.2'), onlyTable().id)
    expect(list().tables).toHaveLength(1)
    expect(onlyTable()).toMatchObject({ fileName: 'right.csv', sampleId, statedFloor: 50 })
    await Promise.resolve()
    expect(filesIn('originals')).toHaveLength(1)
  })
  it('stays, marked, where an alignment rests on it, and can\'t be changed, replaced again or removed', async () => {
    await upload('wrong.csv', plain)
    const old = onlyTable().id
    addAlignment(old)
    await upload('right.csv', plain.replace('100.1', '100.2'), old)
    const line = list().tables.find(table => table.id === old)
    expect(line).toMatchObject({ alignments: 1, replacedByFile: 'right.csv' })
    expect(line?.replacedAt).not.toBeNull()
    expect(() => changeTable(laboratory.db, studyId, old, { sampleId: null }, person)).toThrow('has been replaced')
    expect(() => removeTable(laboratory.db, laboratory.folder, studyId, old, person)).toThrow('An alignment rests on this table')
    await expect(upload('x.csv', plain.replace('100.1', '9.2'), old)).rejects.toThrow('replaced already')
  })
  it('is read again with other columns, and the old reading stays with its alignment', async () => {
    await upload('one.csv', 'm/z,RT (min),Area,Height\n100,1,50,5\n')
    const { id, uploadId } = onlyTable()
    addAlignment(id)
    answerUpload(laboratory, studyId, uploadId, { intensityColumn: 3 }, person)
    await laboratory.jobs.idle()
    expect(list().tables.map(table => [table.measure, table.replacedAt === null]).sort()).toEqual([['area', false], ['height', true]])
  })
  it('stands where reading it again fails', async () => {
    await upload('one.csv', plain)
    laboratory.db.update(uploads).set({ status: 'reading' }).run()
    laboratory.jobs.add({ kind: 'read', studyId, input: { uploadId: onlyTable().uploadId }, personId: person.id })
    const [row] = laboratory.db.select().from(uploads).all()
    const path = originalPath(laboratory.folder, row?.sha256 ?? '')
    writeFileSync(path, 'no gzip')
    await laboratory.jobs.idle()
    expect(laboratory.db.select({ status: uploads.status }).from(uploads).get()).toEqual({ status: 'read' })
    expect(list().tables).toHaveLength(1)
  })
})

describe('a table', () => {
  it('is given a sample of its study that has none', async () => {
    const one = addSample('one')
    await upload('one.csv', plain)
    await upload('two.csv', plain.replace('100.1', '100.2'))
    const two = list().tables.find(table => table.fileName === 'two.csv')?.id ?? ''
    expect(() => changeTable(laboratory.db, studyId, two, { sampleId: one }, person)).toThrow('“one” has a table already, one.csv')
    const stranger = laboratory.db.insert(samples).values({ studyId: addTestStudy(laboratory, person).id, name: 'x', position: 0 }).returning().get().id
    expect(() => changeTable(laboratory.db, studyId, two, { sampleId: stranger }, person)).toThrow('not in the sheet')
    expect(() => changeTable(laboratory.db, addTestStudy(laboratory, person).id, two, { sampleId: null }, person)).toThrow(DomainError)
  })
  it('is recorded in the activity log with all that is done to it', async () => {
    await upload('one.csv', plain)
    changeTable(laboratory.db, studyId, onlyTable().id, { statedFloor: 5 }, person)
    removeTable(laboratory.db, laboratory.folder, studyId, onlyTable().id, person)
    expect(laboratory.db.select({ action: activity.action }).from(activity).all().map(row => row.action)).toEqual(['upload table', 'read table', 'edit table', 'remove table'])
  })
})

describe('limits', () => {
  it('refuses a file over 64 MB by its announced size, and by its count', async () => {
    await expect(checkRoom(laboratory.folder, MAX_TABLE_BYTES + 1)).rejects.toThrow('at most 64 MB')
    const piece = new Uint8Array(2 ** 20)
    await expect(receiveFile(laboratory.folder, (async function* () {
      for (let part = 0; part < 65; part++) yield piece
    })())).rejects.toThrow('at most 64 MB')
    expect(filesIn('incoming')).toEqual([])
  })
  it('keeps nothing of a body that is cut off', async () => {
    await expect(receiveFile(laboratory.folder, (async function* () {
      yield new Uint8Array(10)
      throw new Error('aborted')
    })())).rejects.toThrow('aborted')
    expect(filesIn('incoming')).toEqual([])
  })
  it('says that the disk is full where it fills up while a file comes, and keeps nothing', async () => {
    await expect(receiveFile(laboratory.folder, (async function* () {
      yield new Uint8Array(10)
      throw Object.assign(new Error('ENOSPC: no space left on device, write'), { code: 'ENOSPC' })
    })())).rejects.toMatchObject({ kind: 'full' })
    expect(filesIn('incoming')).toEqual([])
  })
})

describe('after a kill', () => {
  it('reads a received file whose job had not ended, and takes away what belongs to nothing', async () => {
    const file = await receiveFile(laboratory.folder, (async function* () {
      yield new TextEncoder().encode(plain)
    })())
    const { acceptUpload } = await import('../../../server/domain/table/acceptUpload')
    // The job is in the table, but this server never came to run it.
    const dead = { ...laboratory, jobs: Object.assign(Object.create(laboratory.jobs), { next: () => {} }) as typeof laboratory.jobs }
    acceptUpload(dead, studyId, file, { name: 'one.csv' }, person)
    writeFileSync(join(laboratory.folder, 'incoming', 'half'), 'x')
    writeFileSync(join(laboratory.folder, 'received', 'nobody'), 'x')
    mkdirSync(join(laboratory.folder, 'originals', 'ab'), { recursive: true })
    writeFileSync(join(laboratory.folder, 'originals', 'ab', 'half.gz.part'), 'x')
    emptyIncoming(laboratory.folder)
    sweepFiles(laboratory.db, laboratory.folder)
    laboratory.jobs.resume()
    await laboratory.jobs.idle()
    expect([filesIn('incoming'), filesIn('received'), filesIn('originals').length]).toEqual([[], [], 1])
    expect(onlyTable().features).toBe(2)
  })
})
