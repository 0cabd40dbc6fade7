import { createHash } from 'node:crypto'
import type { OpenDatabase } from '../../server/db/open'
import { packFloat64, packInt32 } from '../../server/db/packed'
import { alignmentTables } from '../../server/db/schema'
import type { SampleInput } from '../../shared/schemas/sample'
import type { AlignmentSettings } from '../../shared/science/alignment/settings'
import { addTestAlignment, stepsFrom } from './testAlignment'
import { addTestTable } from './testTable'

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
export function addComparedAlignment({ db }: Pick<OpenDatabase, 'db'>, studyId: string, createdBy: string, columns: readonly TestColumn[], { practice, settings, mz: givenMz, retentionMinutes: givenMinutes }: { practice?: boolean, settings?: AlignmentSettings, mz?: Float64Array, retentionMinutes?: Float64Array } = {}) {
  const features = columns[0]?.intensity.length ?? 0
  const [mz, retentionMinutes] = [givenMz ?? stepsFrom(200, features), givenMinutes ?? stepsFrom(1, features)]
  const alignment = addTestAlignment({ db }, studyId, createdBy, { practice, settings, groups: features, reference: 0, mz, retentionMinutes })
  const placed = columns.map((column, position) => {
    const { sampleId, tableId, digest, member } = column.again ?? addTable({ db }, studyId, createdBy, column, { mz, retentionMinutes })
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

function addTable(open: Pick<OpenDatabase, 'db'>, studyId: string, createdBy: string, column: TestColumn, alignment: { mz: Float64Array, retentionMinutes: Float64Array }) {
  const { intensity, statedFloor, emptyShare, again: _, ...sheet } = column
  const isFound = (_: number, i: number) => !Number.isNaN(intensity[i])
  const digest = createHash('sha256').update(packFloat64(Float64Array.from(intensity))).update(String(++made)).digest('hex')
  const table = addTestTable(open, studyId, createdBy, {
    mz: alignment.mz.filter(isFound), minutes: alignment.retentionMinutes.filter(isFound), intensity: Float64Array.from(intensity).filter(isFound), digest, statedFloor, emptyShare,
  }, { amount: 100, volumeMl: 1, dilution: 1, injectionUl: 2, ...sheet })
  if (!table.sampleId) throw new Error(`${column.name} has no sample`)
  let row = 0
  return { sampleId: table.sampleId, tableId: table.id, digest, member: Array.from(intensity, value => Number.isNaN(value) ? -1 : row++) }
}
