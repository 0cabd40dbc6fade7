import { and, eq, inArray } from 'drizzle-orm'
import type { FlagChange } from '../../../shared/schemas/flag'
import type { Database } from '../../db/open'
import { flags } from '../../db/schema'
import { record } from '../activity/record'
import type { VisibleAlignment } from '../alignment/findVisibleAlignment'
import { notFound } from '../DomainError'
import type { Person } from '../person/person'
import { touchStudy } from '../study/touchStudy'

/** Takes flags back, or sets them again after that (undo). All of them, or none where one is not of this alignment. */
export function changeFlags(db: Database, alignment: VisibleAlignment, { flagIds, takenBack }: FlagChange, person: Person): { flagIds: string[] } {
  const ids = [...new Set(flagIds)]
  return db.transaction((tx) => {
    const change = takenBack ? { removedAt: new Date(), removedBy: person.id } : { removedAt: null, removedBy: null }
    const { changes } = tx.update(flags).set(change).where(and(inArray(flags.id, ids), eq(flags.alignmentId, alignment.id))).run()
    if (changes !== ids.length) throw notFound()
    if (!alignment.practice) touchStudy(tx, alignment.studyId)
    const detail = `${ids.length} ${ids.length === 1 ? 'flag' : 'flags'} of ${alignment.practice ? 'practice ' : ''}alignment ${alignment.number}`
    record(tx, { personId: person.id, action: takenBack ? 'take back flags' : 'set flags again', studyId: alignment.studyId, subjectId: alignment.id, detail })
    return { flagIds: ids }
  })
}
