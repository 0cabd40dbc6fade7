import { createHash } from 'node:crypto'
import type { OpenDatabase } from '../../server/db/open'
import { packFloat64, packInt32 } from '../../server/db/packed'
import { alignments, alignmentTables, originals, samples, tables, uploads } from '../../server/db/schema'
import { keepColumns } from '../../server/domain/table/tableColumns'
import type { SampleInput } from '../../shared/schemas/sample'
import { alignmentDefaults, type AlignmentSettings } from '../../shared/science/alignment/settings'
import type { TableLayout } from '../../shared/science/table/layout'

/** One sample of a test alignment and its table: intensity per feature, NaN = not detected; rows are in the order of features. */
export interface TestColumn extends Partial<SampleInput> {
  name: string
  intensity: ArrayLike<number>
  statedFloor?: number | null
  emptyShare?: number
  /** An existing sample and table to use again. */
  again?: { sampleId: string, tableId: string, digest: string, member: readonly number[] }
}

const none = packInt32(new Int32Array(0))
const noNumbers = packFloat64(new Float64Array(0))
let made = 0

/** Samples, tables and an alignment of them, features at m/z 200, 201 … and minutes 1, 2 …; for tests of comparisons. */
export function addComparedAlignment({ db }: Pick<OpenDatabase, 'db'>, studyId: string, createdBy: string, columns: readonly TestColumn[], { practice = false, settings = alignmentDefaults, mz, retentionMinutes }: { practice?: boolean, settings?: AlignmentSettings, mz?: Float64Array, retentionMinutes?: Float64Array } = {}) {
  const features = columns[0]?.intensity.length ?? 0
  const alignment = db.insert(alignments).values({
    studyId, createdBy, practice, groups: features, number: ++made, settings, engineVersion: 'test', reference: 0,
    mz: packFloat64(mz ?? Float64Array.from({ length: features }, (_, i) => 200 + i)),
    retentionMinutes: packFloat64(retentionMinutes ?? Float64Array.from({ length: features }, (_, i) => 1 + i)),
    groupSize: packInt32(new Int32Array(features)), neighbourStart: packInt32(new Int32Array(features + 1)), neighbourList: none,
  }).returning().get()
  const placed = columns.map((column, position) => {
    const { sampleId, tableId, digest, member } = column.again ?? addTable({ db }, studyId, createdBy, column)
    db.insert(alignmentTables).values({
      alignmentId: alignment.id, position, tableId, sampleId, sampleName: column.name, tableDigest: digest,
      intensity: packFloat64(Float64Array.from(column.intensity)), member: packInt32(Int32Array.from(member)),
      correctedMinutes: noNumbers, leftOutRow: none, leftOutGroup: none, offsetPpm: 0, offsetApplied: false, timeCorrected: false, landmarks: 0,
      driftReason: '', driftMinutes: noNumbers, driftShift: noNumbers,
    }).run()
    return { sampleId, tableId, digest, member }
  })
  return { alignment, placed }
}

function addTable({ db }: Pick<OpenDatabase, 'db'>, studyId: string, createdBy: string, column: TestColumn) {
  const { intensity, statedFloor = null, emptyShare, again: _, ...sheet } = column
  const sample = db.insert(samples).values({ studyId, position: ++made, amount: 100, volumeMl: 1, dilution: 1, injectionUl: 2, ...sheet }).returning().get()
  const detected = Float64Array.from(intensity).filter(value => !Number.isNaN(value))
  const bytes = packFloat64(detected)
  const digest = createHash('sha256').update(bytes).update(String(made)).digest('hex')
  db.insert(originals).values({ sha256: digest, bytes: 1, compressedBytes: 1 }).run()
  const upload = db.insert(uploads).values({ studyId, fileName: `${column.name}.csv`, sha256: digest, bytes: 1, status: 'read', createdBy }).returning().get()
  const table = db.insert(tables).values({
    studyId, uploadId: upload.id, sampleId: sample.id, originalSha256: digest, fileName: `${column.name}.csv`, digest,
    columnName: emptyShare === undefined ? null : column.name, emptyShare: emptyShare ?? null,
    layout: {} as TableLayout, measure: 'area', massKind: 'mz', features: detected.length, statedFloor, createdBy,
  }).returning().get()
  keepColumns(db, table.id, { mz: detected, retentionMinutes: detected, intensity: detected })
  let row = 0
  return { sampleId: sample.id, tableId: table.id, digest, member: Array.from(intensity, value => Number.isNaN(value) ? -1 : row++) }
}
