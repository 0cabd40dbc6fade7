import { eq } from 'drizzle-orm'
import type { Database } from '../../db/open'
import { unpackFloat64, unpackInt32 } from '../../db/packed'
import { alignments, flags } from '../../db/schema'
import { findVisibleAlignment } from '../alignment/findVisibleAlignment'
import { addFlags } from '../flag/addFlags'
import type { Person } from '../person/person'
import { ionsOf } from './ions'
import type { DemoStudy } from './studies'

const NEAR_PPM = 8
const NEAR_MINUTES = 0.25

/** The scientist's flags on the compounds of the study's story, all at once, where the alignment has none yet. */
export function flagDemoStory(db: Database, study: DemoStudy, studyId: string, alignmentId: string, scientist: Person) {
  if (db.select({ id: flags.id }).from(flags).where(eq(flags.alignmentId, alignmentId)).get()) return
  const alignment = findVisibleAlignment(db, studyId, alignmentId, scientist)
  db.transaction(() => {
    for (const { compound, kind, reason } of study.flags) {
      const index = featureOf(db, study, alignmentId, compound)
      if (index !== null) addFlags(db, alignment, { featureIndexes: [index], kind, reason }, scientist)
    }
  })
}

/** The aligned feature of a compound's main ion: of those near its m/z and time, the one most tables hold. */
function featureOf(db: Database, study: DemoStudy, alignmentId: string, compound: string): number | null {
  const row = db.select({ mz: alignments.mz, retentionMinutes: alignments.retentionMinutes, groupSize: alignments.groupSize }).from(alignments).where(eq(alignments.id, alignmentId)).get()
  const ion = ionsOf(study.compounds.filter(({ name }) => name === compound))[0]
  if (!row || !ion) return null
  const minutes = unpackFloat64(row.retentionMinutes)
  const size = unpackInt32(row.groupSize)
  let best: number | null = null
  unpackFloat64(row.mz).forEach((mz, index) => {
    if (Math.abs(mz - ion.mz) / ion.mz * 1e6 > NEAR_PPM || Math.abs(minutes[index]! - ion.retentionMinutes) > NEAR_MINUTES) return
    if (best === null || size[index]! > size[best]!) best = index
  })
  return best
}
