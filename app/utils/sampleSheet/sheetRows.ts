import { cellText } from '#shared/formats/sampleSheet/cellText'
import { readCell, type SideNames } from '#shared/formats/sampleSheet/readCell'
import { sampleFields, type SampleField } from '#shared/schemas/sample'
import type { CellValue } from '#shared/schemas/sheet'
import type { SampleRow } from '#shared/types/sample'
import { keyOf, type SheetDraft } from './draft'

/** still: as on the server. waiting: to be saved. wrong: can't be saved. changed: someone else wrote another value meanwhile. */
export type CellState = 'still' | 'waiting' | 'wrong' | 'changed'

export interface CellView {
  text: string
  state: CellState
  /** What is wrong, or what happened. */
  sentence: string
  /** The value, where the text can be read. */
  value?: CellValue
  /** changed: what stands now, as text, and who wrote it where that is known. */
  theirs?: { text: string, byName: string | null }
}

export interface RowView {
  key: string
  sampleId: string | null
  state: 'standing' | 'new' | 'gone'
  cells: Record<SampleField, CellView>
  /** A new row in which nothing is written. */
  empty: boolean
  tables: number
  aligned: boolean
}

/** The sheet as the person sees it: what stands on the server with what they typed over it, then their new rows. */
export function sheetRows(base: readonly SampleRow[], draft: SheetDraft, names: SideNames): RowView[] {
  const standing = base.filter(row => !draft.removed[row.id]).map(row => view(keyOf(draft, row.id), row, 'standing', draft, names))
  const gone = Object.values(draft.gone).map(row => view(keyOf(draft, row.id), row, 'gone', draft, names))
  const made = draft.newRows.map(key => view(key, null, 'new', draft, names))
  const rows = [...standing, ...gone, ...made]
  markSameNames(rows)
  return rows
}

function view(key: string, row: SampleRow | null, state: RowView['state'], draft: SheetDraft, names: SideNames): RowView {
  const empty = row === null && Object.values(draft.typed[key] ?? {}).every(cell => cell.text.trim() === '')
  const cells = Object.fromEntries(sampleFields.map(field => [field, empty ? still('') : cellView(key, row, field, draft, names)])) as RowView['cells']
  return { key, sampleId: row?.id ?? null, state, cells, empty, tables: row?.tables ?? 0, aligned: row?.aligned ?? false }
}

function cellView(key: string, row: SampleRow | null, field: SampleField, draft: SheetDraft, names: SideNames): CellView {
  const typed = draft.typed[key]?.[field]
  if (!typed && row) return still(cellText(field, row[field]), row[field])
  const text = typed?.text ?? ''
  const read = readCell(field, text, names)
  if (!row) return 'value' in read ? { text, state: text.trim() === '' ? 'still' : 'waiting', sentence: '', value: read.value, ...refusal(draft, key, field, text) } : wrong(text, read.sentence)
  const stands = row[field]
  if ('value' in read && read.value === stands) return still(text, stands)
  if (typed && typed.from !== stands) return changed(text, field, row, read)
  if (!('value' in read)) return wrong(text, read.sentence)
  return { text, state: 'waiting', sentence: '', value: read.value, ...refusal(draft, key, field, text) }
}

const still = (text: string, value?: CellValue): CellView => ({ text, state: 'still', sentence: '', value })
const wrong = (text: string, sentence: string): CellView => ({ text, state: 'wrong', sentence })

function changed(text: string, field: SampleField, row: SampleRow, read: ReturnType<typeof readCell>): CellView {
  const byName = row.writtenBy[field] ?? null
  const theirs = cellText(field, row[field])
  return {
    text,
    state: 'changed',
    sentence: `Changed meanwhile${byName ? ` by ${byName}` : ''}: it now says ${theirs ? `“${theirs}”` : 'nothing'}. You wrote ${text ? `“${text}”` : 'nothing'}.`,
    theirs: { text: theirs, byName },
    ...('value' in read ? { value: read.value } : {}),
  }
}

function refusal(draft: SheetDraft, key: string, field: SampleField, text: string): Partial<CellView> {
  const refused = draft.refused[key]?.[field]
  return refused?.text === text ? { state: 'wrong', sentence: refused.sentence } : {}
}

/** Of rows with one name, those are marked whose name was typed, unless they come first and no standing row has it. */
function markSameNames(rows: RowView[]) {
  const holder = new Map<string, RowView>()
  const named = rows.filter(row => row.state !== 'gone' && !row.empty && row.cells.name.text.trim() !== '')
  const inOrder = [...named.filter(row => row.cells.name.state === 'still'), ...named.filter(row => row.cells.name.state !== 'still')]
  for (const row of inOrder) {
    const name = row.cells.name.text.trim().toLowerCase()
    if (!holder.has(name)) holder.set(name, row)
    else if (row.cells.name.state === 'waiting') row.cells.name = { ...row.cells.name, state: 'wrong', sentence: 'Another sample of this sheet has this name.' }
  }
}
