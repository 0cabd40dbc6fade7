import type { SampleField, SampleInput } from '#shared/schemas/sample'
import type { CellValue } from '#shared/schemas/sheet'
import type { SampleRow } from '#shared/types/sample'

/** What was typed into a cell and does not stand on the server yet, and what the person saw there when they began. */
export interface TypedCell { text: string, from: CellValue }
export type ByField<T> = Partial<Record<SampleField, T>>

/** Everything of a sheet that only this page knows. Rows go by a key that stays while a new row becomes a saved one. */
export interface SheetDraft {
  typed: Record<string, ByField<TypedCell>>
  /** Keys of rows that are not saved yet, in their order. */
  newRows: string[]
  /** Key of a sample whose row was made on this page, by the sample's id. */
  keys: Record<string, string>
  /** Rows on their way out, as the person saw them, by sample id. */
  removed: Record<string, SampleInput>
  /** What the server would not take, and why; it holds as long as the text stays the same. */
  refused: Record<string, ByField<{ text: string, sentence: string }>>
  /** Rows that someone else deleted while something was typed in them, as they last stood. */
  gone: Record<string, SampleRow>
  /** What happened and must be said once. */
  notes: string[]
  nextKey: number
}

export const emptyDraft = (): SheetDraft => ({ typed: {}, newRows: [], keys: {}, removed: {}, refused: {}, gone: {}, notes: [], nextKey: 1 })

export const keyOf = (draft: Pick<SheetDraft, 'keys'>, sampleId: string) => draft.keys[sampleId] ?? sampleId

/** Adds empty rows at the end; they reach the server once they have a name. */
export function addRows(draft: SheetDraft, count: number): string[] {
  const keys = Array.from({ length: count }, () => `new-${draft.nextKey++}`)
  draft.newRows.push(...keys)
  return keys
}

export function setTyped(draft: SheetDraft, key: string, field: SampleField, cell: TypedCell) {
  draft.typed[key] = { ...draft.typed[key], [field]: cell }
}

export function clearTyped(draft: SheetDraft, key: string, field: SampleField) {
  const { [field]: _, ...rest } = draft.typed[key] ?? {}
  if (Object.keys(rest).length > 0) draft.typed[key] = rest
  else forget(draft, key)
}

/** Lets go of all that was typed in a row. */
export function forget(draft: SheetDraft, key: string) {
  const { [key]: _, ...typed } = draft.typed
  draft.typed = typed
}
