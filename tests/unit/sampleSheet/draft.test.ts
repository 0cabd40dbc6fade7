import { describe, expect, it } from 'vitest'
import { addRows, emptyDraft, setTyped, type SheetDraft } from '../../../app/utils/sampleSheet/draft'
import { needsOf } from '../../../app/utils/sampleSheet/needs'
import { pendingChanges, type PendingChanges } from '../../../app/utils/sampleSheet/pendingChanges'
import { reuseRows } from '../../../app/utils/sampleSheet/reuseRows'
import { addAgain, letGo, settleFresh, settleSaved } from '../../../app/utils/sampleSheet/settle'
import { sheetRows, type RowView } from '../../../app/utils/sampleSheet/sheetRows'
import { sampleSchema, type SampleField } from '../../../shared/schemas/sample'
import { sheetChangesSchema } from '../../../shared/schemas/sheet'
import type { SampleRow, SavedSheet } from '../../../shared/types/sample'

const names = { sideAName: 'Millrace', sideBName: 'Tallow Lane' }
const stored = (id: string, name: string, rest: Partial<SampleRow> = {}): SampleRow => ({ ...sampleSchema.parse({ name }), id: id.padEnd(22, '0'), tables: 0, aligned: false, writtenBy: {}, ...rest })
const one = stored('one', 'one', { amount: 10 })
const two = stored('two', 'two')
const type = (draft: SheetDraft, row: SampleRow, field: SampleField, text: string) => setTyped(draft, row.id, field, { text, from: row[field] })
const typeNew = (draft: SheetDraft, key: string, cells: Partial<Record<SampleField, string>>) => {
  for (const [field, text] of Object.entries(cells)) setTyped(draft, key, field as SampleField, { text, from: null })
}
const cell = (rows: RowView[], key: string, field: SampleField) => {
  const row = rows.find(each => each.key === key)
  if (!row) throw new Error(`no row ${key}`)
  return row.cells[field]
}
const sent = (rows: RowView[], draft: SheetDraft): PendingChanges => {
  const changes = pendingChanges(rows, draft)
  if (!changes) throw new Error('nothing to send')
  expect(sheetChangesSchema.safeParse(changes.changes).success).toBe(true)
  return changes
}
const answer = (samples: SampleRow[], rest: Partial<SavedSheet> = {}): SavedSheet => ({ samples, conflicts: [], refusals: [], added: {}, ...rest })

describe('what is sent', () => {
  it('is what can be read; a wrong cell keeps its text and its sentence, and stays', () => {
    const draft = emptyDraft()
    type(draft, one, 'amount', 'ten')
    type(draft, one, 'side', 'tallow lane')
    const rows = sheetRows([one, two], draft, names)
    expect(cell(rows, one.id, 'amount')).toMatchObject({ text: 'ten', state: 'wrong', sentence: 'Not a number. Use digits with a point or a comma.' })
    expect(sent(rows, draft).changes).toEqual({ edits: [{ sampleId: one.id, field: 'side', from: null, to: 'B' }], added: [], removed: [] })
    expect(needsOf(rows).map(need => need.sentence)).toEqual(['“ten”. Not a number. Use digits with a point or a comma.'])
  })

  it('is nothing where what was typed is what stands', () => {
    const draft = emptyDraft()
    type(draft, one, 'amount', '10,0')
    const rows = sheetRows([one], draft, names)
    expect(cell(rows, one.id, 'amount').state).toBe('still')
    expect(pendingChanges(rows, draft)).toBeNull()
  })

  it('leaves out empty new rows, and rows without a name, which say so', () => {
    const draft = emptyDraft()
    const [empty = '', nameless = '', whole = ''] = addRows(draft, 3)
    typeNew(draft, nameless, { side: 'A' })
    typeNew(draft, whole, { name: 'x', amount: '1,5', dilution: '1:10' })
    const rows = sheetRows([], draft, names)
    expect(rows.find(row => row.key === empty)?.empty).toBe(true)
    expect(cell(rows, nameless, 'name').sentence).toBe('A sample needs a name.')
    expect(sent(rows, draft).changes.added).toEqual([{ key: whole, sample: { ...sampleSchema.parse({ name: 'x' }), amount: 1.5 } }])
  })

  it('leaves out names that are taken, in any case; of two new ones the first is good', () => {
    const draft = emptyDraft()
    const [a = '', b = '', c = ''] = addRows(draft, 3)
    typeNew(draft, a, { name: 'ONE' })
    typeNew(draft, b, { name: 'x' })
    typeNew(draft, c, { name: 'X' })
    const rows = sheetRows([one], draft, names)
    expect([a, b, c].map(key => cell(rows, key, 'name').state)).toEqual(['wrong', 'waiting', 'wrong'])
    expect(sent(rows, draft).changes.added.map(row => row.key)).toEqual([b])
  })

  it('may swap two names', () => {
    const draft = emptyDraft()
    type(draft, one, 'name', 'two')
    type(draft, two, 'name', 'one')
    expect(sent(sheetRows([one, two], draft, names), draft).changes.edits).toHaveLength(2)
  })
})

describe('rows seen again', () => {
  it('are the same objects where nothing about them changed', () => {
    const draft = emptyDraft()
    const before = sheetRows([one, two], draft, names)
    type(draft, two, 'batch', 'b')
    const after = reuseRows(before, sheetRows([one, two], draft, names))
    expect(after[0]).toBe(before[0])
    expect(after[1]).not.toBe(before[1])
    expect(after).toEqual(sheetRows([one, two], draft, names))
  })
})

describe('after a save', () => {
  it('nothing is typed any more, and the row made here keeps its key', () => {
    const draft = emptyDraft()
    const [key = ''] = addRows(draft, 1)
    typeNew(draft, key, { name: 'x', amount: 'ten' })
    type(draft, one, 'side', 'A')
    const before = sheetRows([one], draft, names)
    const fresh = [{ ...one, side: 'A' as const }, stored('x', 'x')]
    settleSaved(draft, sent(before, draft), answer(fresh, { added: { [key]: fresh[1]?.id ?? '' } }))
    settleFresh(draft, [one], fresh, names)
    const rows = sheetRows(fresh, draft, names)
    expect(rows.map(row => [row.key, row.state])).toEqual([[one.id, 'standing'], [key, 'standing']])
    expect(cell(rows, key, 'amount')).toMatchObject({ text: 'ten', state: 'wrong' })
    expect(pendingChanges(rows, draft)).toBeNull()
    expect(Object.keys(draft.typed)).toEqual([key])
  })

  it('what was typed while it was under way is still to be saved, and is no conflict with oneself', () => {
    const draft = emptyDraft()
    type(draft, one, 'amount', '11')
    const under = sent(sheetRows([one], draft, names), draft)
    setTyped(draft, one.id, 'amount', { text: '12', from: 10 })
    const fresh = [{ ...one, amount: 11 }]
    settleSaved(draft, under, answer(fresh))
    settleFresh(draft, [one], fresh, names)
    expect(sent(sheetRows(fresh, draft, names), draft).changes.edits).toEqual([{ sampleId: one.id, field: 'amount', from: 11, to: 12 }])
  })

  it('a name the server refused is marked until it is changed', () => {
    const draft = emptyDraft()
    type(draft, one, 'name', 'three')
    settleSaved(draft, sent(sheetRows([one], draft, names), draft), answer([one], { refusals: [{ row: one.id, field: 'name', sentence: 'taken' }] }))
    expect(cell(sheetRows([one], draft, names), one.id, 'name')).toMatchObject({ text: 'three', state: 'wrong', sentence: 'taken' })
    expect(pendingChanges(sheetRows([one], draft, names), draft)).toBeNull()
    type(draft, one, 'name', 'four')
    expect(cell(sheetRows([one], draft, names), one.id, 'name').state).toBe('waiting')
  })

  it('a row that was not deleted is back, with a note', () => {
    const draft = emptyDraft()
    draft.removed[one.id] = sampleSchema.parse(one)
    expect(sheetRows([one], draft, names)).toEqual([])
    settleSaved(draft, sent(sheetRows([one], draft, names), draft), answer([one], { conflicts: [{ kind: 'rowChanged', sampleId: one.id }] }))
    expect(sheetRows([one], draft, names)).toHaveLength(1)
    expect(draft.notes).toEqual(['one was changed by someone else meanwhile, so it was not deleted. Look at it again.'])
  })
})

describe('what others did meanwhile', () => {
  it('shows in cells that are not touched', () => {
    const draft = emptyDraft()
    type(draft, one, 'batch', 'b')
    const rows = sheetRows([{ ...one, side: 'B' }], draft, names)
    expect(cell(rows, one.id, 'side')).toMatchObject({ text: 'B', state: 'still' })
    expect(cell(rows, one.id, 'batch').state).toBe('waiting')
  })

  it('to a cell with something typed in it shows both, and is not sent', () => {
    const draft = emptyDraft()
    type(draft, one, 'amount', '11')
    const rows = sheetRows([{ ...one, amount: 12, writtenBy: { amount: 'Ben' } }], draft, names)
    expect(cell(rows, one.id, 'amount')).toMatchObject({ text: '11', state: 'changed', theirs: { text: '12', byName: 'Ben' }, sentence: 'Changed meanwhile by Ben: it now says “12”. You wrote “11”.' })
    expect(pendingChanges(rows, draft)).toBeNull()
  })

  it('to the same value is no matter', () => {
    const draft = emptyDraft()
    type(draft, one, 'amount', '12')
    const fresh = [{ ...one, amount: 12 }]
    settleFresh(draft, [one], fresh, names)
    expect(draft.typed).toEqual({})
    expect(cell(sheetRows(fresh, draft, names), one.id, 'amount').state).toBe('still')
  })

  it('by deleting a row one typed in keeps it in view, to add again or let go', () => {
    const draft = emptyDraft()
    type(draft, one, 'amount', '11')
    settleFresh(draft, [one, two], [two], names)
    const rows = sheetRows([two], draft, names)
    expect(rows.map(row => row.state)).toEqual(['standing', 'gone'])
    expect(pendingChanges(rows, draft)).toBeNull()
    const again = structuredClone(draft)
    addAgain(again, one.id, { name: 'one', amount: '11' })
    expect(sent(sheetRows([two], again, names), again).changes.added).toMatchObject([{ sample: { name: 'one', amount: 11 } }])
    letGo(draft, one.id)
    expect(draft).toMatchObject({ typed: {}, gone: {} })
  })

  it('by deleting a row one did not touch takes it away', () => {
    const draft = emptyDraft()
    settleFresh(draft, [one, two], [two], names)
    expect(sheetRows([two], draft, names)).toHaveLength(1)
  })
})
