import { and, eq } from 'drizzle-orm'
import type { SampleField, SampleInput } from '../../../shared/schemas/sample'
import type { SheetChanges } from '../../../shared/schemas/sheet'
import type { SavedSheet, SheetConflict, SheetRefusal } from '../../../shared/types/sample'
import type { Database } from '../../db/open'
import { samples } from '../../db/schema'
import { record } from '../activity/record'
import { DomainError } from '../DomainError'
import type { Person } from '../person/person'
import { touchStudy } from '../study/touchStudy'
import { applyEdits, stillAs } from './applyEdits'
import { alignedSamples, namesOf, readRows, readSheet, type StoredSample } from './readSheet'
import { takenNames, type NameGiven } from './takenNames'

/** Rows a sheet may have. */
export const SHEET_ROWS = 5000
const NAME_TAKEN = 'Another sample of this study has this name.'

/**
 * Saves one person's changes of the sheet in one transaction. An edit is made only where the cell still holds what the person saw;
 * a row is deleted only if it still is as they saw it. What was not made comes back as conflicts and refusals, beside the fresh sheet.
 */
export function editSheet(db: Database, studyId: string, changes: SheetChanges, person: Person): SavedSheet {
  return db.transaction((tx) => {
    const { removed, conflicts, refusals } = chooseRemovals(tx, studyId, changes)
    const rows = readRows(tx, studyId).filter(row => !removed.has(row.id))
    if (rows.length + changes.added.length > SHEET_ROWS) throw new DomainError('tooLarge', `A sample sheet has at most ${SHEET_ROWS} rows.`)
    const names = namesOf(tx, rows)
    const edits = applyEdits(rows, changes.edits, id => names.get(id))
    const taken = refuseNames(rows, edits.changed, changes.added)
    for (const key of taken) refusals.push({ row: key, field: 'name', sentence: NAME_TAKEN })

    for (const id of removed) tx.delete(samples).where(and(eq(samples.id, id), eq(samples.studyId, studyId))).run()
    for (const [id, values] of edits.changed) {
      const before = rows.find(row => row.id === id)
      if (before && Object.keys(values).length > 0) write(tx, before, values, person)
    }
    const added: Record<string, string> = {}
    let position = rows.reduce((last, row) => Math.max(last, row.position), -1)
    for (const { key, sample } of changes.added) {
      if (taken.has(key)) continue
      added[key] = tx.insert(samples).values({ ...sample, studyId, position: ++position }).returning({ id: samples.id }).get().id
    }
    const cells = [...edits.changed.values()].reduce((sum, values) => sum + Object.keys(values).length, 0)
    const detail = summary(cells, edits.changed.size, Object.keys(added).length, removed.size)
    if (detail) {
      touchStudy(tx, studyId)
      record(tx, { personId: person.id, action: 'edit samples', studyId, detail })
    }
    return { ...readSheet(tx, studyId), conflicts: [...conflicts, ...edits.conflicts], refusals, added }
  }, { behavior: 'immediate' })
}

function chooseRemovals(tx: Pick<Database, 'select' | 'selectDistinct'>, studyId: string, { removed: asked }: SheetChanges) {
  const removed = new Set<string>()
  const conflicts: SheetConflict[] = []
  const refusals: SheetRefusal[] = []
  if (asked.length > 0) {
    const byId = new Map(readRows(tx, studyId).map(row => [row.id, row]))
    const aligned = alignedSamples(tx, studyId)
    for (const { sampleId, from } of asked) {
      const row = byId.get(sampleId)
      if (!row) continue
      if (aligned.has(sampleId)) refusals.push({ row: sampleId, field: null, sentence: `${row.name} stands in an alignment and can't be deleted. Take its side away to leave it out of new comparisons.` })
      else if (!stillAs(row, from)) conflicts.push({ kind: 'rowChanged', sampleId })
      else removed.add(sampleId)
    }
  }
  return { removed, conflicts, refusals }
}

/** Takes names that can't be had out of the changes, and returns whose they were. */
function refuseNames(rows: readonly StoredSample[], changed: Map<string, Partial<SampleInput>>, added: SheetChanges['added']): Set<string> {
  const given: NameGiven[] = [
    ...rows.flatMap((row) => {
      const name = changed.get(row.id)?.name
      return name === undefined ? [] : [{ key: row.id, name, before: row.name }]
    }),
    ...added.map(({ key, sample }) => ({ key, name: sample.name, before: null })),
  ]
  const taken = takenNames(rows.filter(row => changed.get(row.id)?.name === undefined).map(row => row.name), given)
  for (const key of taken) {
    const values = changed.get(key)
    if (values) delete values.name
  }
  return taken
}

function write(tx: Pick<Database, 'update'>, before: StoredSample, values: Partial<SampleInput>, person: Person) {
  const writtenBy = { ...before.writtenBy }
  for (const field of Object.keys(values) as SampleField[]) writtenBy[field] = person.id
  tx.update(samples).set({ ...values, writtenBy }).where(and(eq(samples.id, before.id), eq(samples.studyId, before.studyId))).run()
}

function summary(cells: number, rows: number, added: number, removed: number): string {
  const counted = (count: number, noun: string) => `${count} ${noun}${count === 1 ? '' : 's'}`
  return [
    cells > 0 ? `${counted(cells, 'cell')} of ${counted(rows, 'sample')} changed` : '',
    added > 0 ? `${counted(added, 'sample')} added` : '',
    removed > 0 ? `${counted(removed, 'sample')} deleted` : '',
  ].filter(Boolean).join(', ')
}
