import { packFloat64, packInt32 } from '../../server/db/packed'
import { alignments } from '../../server/db/schema'
import type { OpenDatabase } from '../../server/db/open'
import { alignmentDefaults } from '../../shared/science/alignment/settings'

let made = 0

/** An alignment of `groups` features without tables, for tests of what points to an alignment. */
export function addTestAlignment({ db }: Pick<OpenDatabase, 'db'>, studyId: string, createdBy: string, { practice = false, groups = 10 } = {}) {
  const numbers = packFloat64(Float64Array.from({ length: groups }, (_, i) => 200 + i))
  return db.insert(alignments).values({
    studyId, createdBy, practice, groups, number: ++made, settings: alignmentDefaults, engineVersion: 'test', reference: -1,
    mz: numbers, retentionMinutes: numbers, groupSize: packInt32(new Int32Array(groups)),
    neighbourStart: packInt32(new Int32Array(groups + 1)), neighbourList: packInt32(new Int32Array(0)),
  }).returning().get()
}
