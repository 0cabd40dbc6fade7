import { packFloat64, packInt32 } from '../../server/db/packed'
import { alignments } from '../../server/db/schema'
import type { OpenDatabase } from '../../server/db/open'
import { alignmentDefaults, type AlignmentSettings } from '../../shared/science/alignment/settings'

let made = 0

interface AlignmentOptions {
  practice?: boolean
  settings?: AlignmentSettings
  groups?: number
  reference?: number
  mz?: Float64Array
  retentionMinutes?: Float64Array
}

/** Numbers from `first` on, one apart. */
export const stepsFrom = (first: number, length: number) => Float64Array.from({ length }, (_, i) => first + i)

/** An alignment of `groups` features without tables, at m/z 200, 201 … and minutes 1, 2 …; for tests of what points to an alignment. */
export function addTestAlignment({ db }: Pick<OpenDatabase, 'db'>, studyId: string, createdBy: string, { practice = false, settings = alignmentDefaults, groups = 10, reference = -1, mz = stepsFrom(200, groups), retentionMinutes = stepsFrom(1, groups) }: AlignmentOptions = {}) {
  return db.insert(alignments).values({
    studyId, createdBy, practice, groups, number: ++made, settings, engineVersion: 'test', reference,
    mz: packFloat64(mz), retentionMinutes: packFloat64(retentionMinutes), groupSize: packInt32(new Int32Array(groups)),
    neighbourStart: packInt32(new Int32Array(groups + 1)), neighbourList: packInt32(new Int32Array(0)),
  }).returning().get()
}
