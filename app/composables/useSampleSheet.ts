import { readCell } from '#shared/formats/sampleSheet/readCell'
import { withSplitAmount } from '#shared/formats/sampleSheet/readBlock'
import { sampleFields, sampleSchema, type SampleField } from '#shared/schemas/sample'
import type { SampleRow } from '#shared/types/sample'
import { addRows, clearTyped, forget, keyOf, setTyped, type SheetDraft } from '~/utils/sampleSheet/draft'
import type { CellText } from '~/utils/sampleSheet/placeBlock'
import { reuseRows } from '~/utils/sampleSheet/reuseRows'
import { addAgain, letGo } from '~/utils/sampleSheet/settle'
import { sheetRows, type RowView } from '~/utils/sampleSheet/sheetRows'

const UNDO_STEPS = 100

/** The sheet as one person edits it: rows as they see them, and every way to change them. `base` is what stands on the server. */
export function useSampleSheet(base: Ref<SampleRow[]>, draft: SheetDraft, names: Ref<{ sideAName: string, sideBName: string }>) {
  const rows = computed<RowView[]>(before => reuseRows(before ?? [], sheetRows(base.value, draft, names.value)))
  const byKey = computed(() => new Map(rows.value.map(row => [row.key, row])))
  const standing = computed(() => new Map(base.value.map(row => [keyOf(draft, row.id), row])))
  const undoSteps: CellText[][] = []
  /** Counts up with each change that may have to be saved. */
  const changes = ref(0)

  /** Writes texts into cells. What a person saw in a cell when they began is what stands now, unless they began before. */
  function write(cells: readonly CellText[], undoable = true) {
    const before = cells.map(({ key, field }) => ({ key, field, text: byKey.value.get(key)?.cells[field].text ?? '' }))
    for (const cell of cells.flatMap(withUnit)) writeOne(cell)
    if (undoable && before.length > 0) undoSteps.splice(0, Math.max(0, undoSteps.push(before) - UNDO_STEPS))
    changes.value++
  }

  function writeOne({ key, field, text }: CellText) {
    const row = standing.value.get(key)
    const from = draft.typed[key]?.[field]?.from ?? row?.[field]
    const read = readCell(field, text, names.value)
    const asBefore = row ? 'value' in read && read.value === row[field] : text === ''
    if (asBefore) clearTyped(draft, key, field)
    else setTyped(draft, key, field, { text, from: from ?? sampleSchema.shape[field].safeParse(undefined).data ?? null })
  }

  function undo() {
    const step = undoSteps.pop()
    if (step) write(step.filter(({ key }) => byKey.value.has(key)), false)
  }

  /** Takes rows away: new ones at once, standing ones with the next save. */
  function remove(keys: readonly string[]) {
    for (const key of keys) {
      const row = standing.value.get(key)
      if (row) draft.removed[row.id] = sampleSchema.parse(Object.fromEntries(sampleFields.map(field => [field, row[field]])))
      forget(draft, key)
    }
    draft.newRows = draft.newRows.filter(key => !keys.includes(key))
    changes.value++
  }

  /** Keeps what the person wrote over what someone else wrote meanwhile: from now on they have seen it. */
  function keepMine(key: string, field: SampleField) {
    const row = standing.value.get(key)
    const typed = draft.typed[key]?.[field]
    if (row && typed) setTyped(draft, key, field, { text: typed.text, from: row[field] })
    changes.value++
  }

  function takeTheirs(key: string, field: SampleField) {
    clearTyped(draft, key, field)
  }

  function restoreRow(row: RowView) {
    if (!row.sampleId) return
    addAgain(draft, row.sampleId, Object.fromEntries(sampleFields.map(field => [field, row.cells[field].text])))
    changes.value++
  }

  return {
    rows,
    write,
    undo,
    remove,
    keepMine,
    takeTheirs,
    restoreRow,
    letRowGo: (row: RowView) => row.sampleId && letGo(draft, row.sampleId),
    addRows: (count: number) => addRows(draft, count),
    changes,
    forgetNotes: () => draft.notes.splice(0),
  }
}

/** "12 mg" typed as an amount fills the unit's cell too. */
function withUnit(cell: CellText): CellText[] {
  if (cell.field !== 'amount') return [cell]
  const split = withSplitAmount({ amount: cell.text })
  return [{ ...cell, text: split.amount ?? '' }, ...(split.amountUnit ? [{ key: cell.key, field: 'amountUnit' as const, text: split.amountUnit }] : [])]
}
