import { asc, eq } from 'drizzle-orm'
import { csvLine, csvLines } from '../../../shared/formats/delimitedText/writeCsv'
import { canExportWork } from '../../../shared/permissions'
import type { Database } from '../../db/open'
import { unpackFloat64 } from '../../db/packed'
import { alignments, alignmentTables } from '../../db/schema'
import { DomainError, notFound } from '../DomainError'
import type { Person } from '../person/person'
import type { VisibleStudy } from '../study/findVisibleStudy'
import { findVisibleAlignment } from './findVisibleAlignment'

const ROWS_AT_ONCE = 500

/** The aligned features with each sample's intensity as CSV, in chunks, so that a long one does not hold up other requests. Empty: not detected. */
export function matrixCsv(db: Database, study: VisibleStudy, alignmentId: string, person: Person): { fileName: string, chunks: AsyncGenerator<string> } {
  const visible = findVisibleAlignment(db, study.id, alignmentId, person)
  if (!canExportWork(person, visible)) throw new DomainError('forbidden', 'Your roles do not allow exports of official work.')
  const alignment = db.select().from(alignments).where(eq(alignments.id, alignmentId)).get()
  if (!alignment) throw notFound()
  const parts = db.select({ sampleName: alignmentTables.sampleName, digest: alignmentTables.tableDigest, intensity: alignmentTables.intensity }).from(alignmentTables)
    .where(eq(alignmentTables.alignmentId, alignmentId)).orderBy(asc(alignmentTables.position)).all()
  const { settings } = alignment
  const notes = [
    `Steelyard: alignment ${alignment.number} of study “${study.title}”${alignment.practice ? ', practice run' : ''}. Engine version ${alignment.engineVersion}.`,
    `Tolerances ${settings.alignMassPpm} ppm, ${settings.retentionMinutes} min. Mass offset ${settings.correctOffset ? 'taken out' : 'left'}, retention drift ${settings.correctDrift ? 'corrected' : 'left'}.`,
    'Intensities in each table\'s own counts, as injected; an empty cell means not detected.',
    ...parts.map(part => `Table of ${part.sampleName}: SHA-256 ${part.digest}`),
  ]
  async function* chunks() {
    yield `\uFEFF${[...csvLines(['feature', 'm/z', 'retention time (min)', ...parts.map(part => part.sampleName)], [], notes)].join('')}`
    const [mz, minutes, columns] = [unpackFloat64(alignment!.mz), unpackFloat64(alignment!.retentionMinutes), parts.map(part => unpackFloat64(part.intensity))]
    for (let start = 0; start < mz.length; start += ROWS_AT_ONCE) {
      let text = ''
      for (let i = start; i < Math.min(start + ROWS_AT_ONCE, mz.length); i++) text += csvLine([i + 1, Number(mz[i]!.toFixed(6)), Number(minutes[i]!.toFixed(5)), ...columns.map(column => column[i])])
      yield text
      await new Promise<void>(resolve => setImmediate(resolve))
    }
  }
  return { fileName: `steelyard-alignment-${alignment.number}.csv`, chunks: chunks() }
}
