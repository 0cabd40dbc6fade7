import type { SampleField, SampleInput } from '../../../shared/schemas/sample'
import { parseCell, type CellEdit, type CellValue } from '../../../shared/schemas/sheet'
import type { SheetConflict } from '../../../shared/types/sample'
import type { StoredSample } from './readSheet'

export interface AppliedEdits {
  /** What each sample shall hold anew, by its id. */
  changed: Map<string, Partial<SampleInput>>
  conflicts: SheetConflict[]
}

/** Sets an edit against what stands by now: made only where its `from` still stands. An edit to what stands already is no conflict. */
export function applyEdits(rows: readonly StoredSample[], edits: readonly CellEdit[], nameOf: (personId: string) => string | undefined): AppliedEdits {
  const byId = new Map(rows.map(row => [row.id, row]))
  const changed = new Map<string, Partial<SampleInput>>()
  const conflicts: SheetConflict[] = []
  for (const { sampleId, field, from, to } of edits) {
    const row = byId.get(sampleId)
    const yours = parseCell(field, to)
    if (!row) {
      conflicts.push({ kind: 'rowGone', sampleId, field, yours })
      continue
    }
    const theirs: CellValue = changed.get(sampleId)?.[field] ?? row[field]
    if (theirs === yours) continue
    if (theirs !== from) {
      conflicts.push({ kind: 'cellChanged', sampleId, field, yours, theirs, byName: nameOf(row.writtenBy[field] ?? '') ?? null })
      continue
    }
    changed.set(sampleId, { ...changed.get(sampleId), ...{ [field]: yours } })
  }
  return { changed, conflicts }
}

/** Whether the row still is as the person saw it. */
export function stillAs(row: StoredSample, seen: SampleInput): boolean {
  return (Object.keys(seen) as SampleField[]).every(field => row[field] === seen[field])
}
