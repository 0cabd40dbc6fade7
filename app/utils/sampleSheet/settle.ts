import { readCell, type SideNames } from '#shared/formats/sampleSheet/readCell'
import { sampleFields, sampleSchema, type SampleField } from '#shared/schemas/sample'
import type { SampleRow, SavedSheet } from '#shared/types/sample'
import { addRows, clearTyped, forget, keyOf, setTyped, type SheetDraft } from './draft'
import type { PendingChanges } from './pendingChanges'

/** Takes what the server answered to a save into the draft: what was saved is no longer typed, what was refused says why. */
export function settleSaved(draft: SheetDraft, sent: PendingChanges, saved: SavedSheet) {
  for (const [key, sampleId] of Object.entries(saved.added)) draft.keys[sampleId] = key
  draft.newRows = draft.newRows.filter(key => saved.added[key] === undefined)
  for (const { row, field, sentence } of saved.refusals) {
    const key = keyOf(draft, row)
    if (field === null) draft.notes.push(sentence)
    else draft.refused[key] = { ...draft.refused[key], [field]: { text: textOf(sent, key, field), sentence } }
  }
  for (const conflict of saved.conflicts) {
    if (conflict.kind !== 'rowChanged') continue
    const name = saved.samples.find(row => row.id === conflict.sampleId)?.name ?? 'A sample'
    draft.notes.push(`${name} was changed by someone else meanwhile, so it was not deleted. Look at it again.`)
  }
  for (const { sampleId } of sent.changes.removed) {
    const { [sampleId]: _, ...rest } = draft.removed
    draft.removed = rest
  }
  // What was typed while the save was under way starts from what was just saved.
  const byKey = new Map(saved.samples.map(row => [keyOf(draft, row.id), row]))
  const made = new Set(Object.keys(saved.added))
  const notMade = new Set(saved.conflicts.flatMap(conflict => conflict.kind === 'cellChanged' ? [`${keyOf(draft, conflict.sampleId)} ${conflict.field}`] : []))
  const moved = [...sent.texts.filter(({ key, field }) => !notMade.has(`${key} ${field}`)), ...[...made].flatMap(key => sampleFields.map(field => ({ key, field })))]
  for (const { key, field } of moved) {
    const row = byKey.get(key)
    const typed = draft.typed[key]?.[field]
    if (row && typed) setTyped(draft, key, field, { text: typed.text, from: row[field] })
  }
}

const textOf = (sent: PendingChanges, key: string, field: SampleField) => sent.texts.find(each => each.key === key && each.field === field)?.text ?? ''

/** Sets the draft against a fresh sheet: what stands there already is no longer typed; rows that went while one typed in them are kept in view. */
export function settleFresh(draft: SheetDraft, before: readonly SampleRow[], fresh: readonly SampleRow[], names: SideNames) {
  for (const row of fresh) {
    const key = keyOf(draft, row.id)
    for (const field of Object.keys(draft.typed[key] ?? {}) as SampleField[]) {
      const read = readCell(field, draft.typed[key]?.[field]?.text ?? '', names)
      if ('value' in read && read.value === row[field]) clearTyped(draft, key, field)
    }
  }
  const ids = new Set(fresh.map(row => row.id))
  for (const row of before) {
    if (ids.has(row.id)) continue
    const { [row.id]: _, ...removed } = draft.removed
    draft.removed = removed
    if (draft.typed[keyOf(draft, row.id)]) draft.gone[row.id] = row
  }
}

/** Makes a row that someone else deleted anew, with what was typed in it. */
export function addAgain(draft: SheetDraft, sampleId: string, texts: Partial<Record<SampleField, string>>) {
  const [key] = addRows(draft, 1)
  if (!key) return
  for (const field of sampleFields) {
    const text = texts[field]
    if (text) setTyped(draft, key, field, { text, from: sampleSchema.shape[field].safeParse(undefined).data ?? null })
  }
  letGo(draft, sampleId)
}

/** Forgets a row that someone else deleted. */
export function letGo(draft: SheetDraft, sampleId: string) {
  forget(draft, keyOf(draft, sampleId))
  const { [sampleId]: _, ...gone } = draft.gone
  draft.gone = gone
}
