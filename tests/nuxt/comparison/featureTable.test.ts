import { mountSuspended } from '@nuxt/test-utils/runtime'
import { beforeAll, beforeEach, describe, expect, it, vi } from 'vitest'
import ColumnChoice from '~/components/comparison/ColumnChoice.vue'
import ColumnMenu from '~/components/comparison/ColumnMenu.vue'
import FeatureTable from '~/components/comparison/FeatureTable.vue'
import { initialView } from '~/utils/benchView'
import { DEFAULT_LAYOUT } from '~/utils/columnLayout'
import { chosenColumns, featureColumns, type ColumnSources } from '~/utils/featureColumns'
import { manyVerdicts } from '../../support/manyFeatures'

const { result } = manyVerdicts(500)
const names = { a: 'Millrace', b: 'Tallow Lane' }
const sources: ColumnSources = { result, foldLimit: 1, names, masses: { polarity: 'negative', massKind: 'mz' }, flags: new Map(), asked: [] }
const all = featureColumns(sources)
const rows = Int32Array.from({ length: 500 }, (_, i) => i)
const bench = () => useBenchStore()
// No layout here: the frame gets a height by hand.
beforeAll(() => void vi.spyOn(HTMLElement.prototype, 'clientHeight', 'get').mockReturnValue(448))
beforeEach(() => {
  localStorage.clear()
  bench().show(initialView())
})

/** The table as the bench holds it: the selected row follows the store. */
async function mountTable(more: { picksByPress?: boolean } = {}) {
  const columns = chosenColumns(all, bench().columns.shown, bench().columns.frozen, sources)
  const table = await mountSuspended(FeatureTable, { props: { result, columns, rows, selectedRow: -1, names, flags: new Map(), ...more }, attachTo: document.body })
  const grid = table.get('[role=grid]')
  const press = async (key: string, how: { shiftKey?: boolean, ctrlKey?: boolean, altKey?: boolean } = {}) => {
    await grid.trigger('keydown', { key, ...how })
    await table.setProps({ selectedRow: bench().selected ?? -1 })
  }
  const header = (label: string) => table.findAll('[role=columnheader]').find(cell => cell.text().startsWith(label))
  return { table, grid, press, header }
}
const looked = () => ({ selected: bench().selected, picked: [...bench().picked] })

describe('the feature table', () => {
  it('is a grid that knows how many rows there are, with only those in view, and one stop of the Tab key', async () => {
    const { table, grid } = await mountTable()
    expect(grid.attributes('aria-rowcount')).toBe('501')
    expect(grid.attributes('aria-multiselectable')).toBe('true')
    expect(table.findAll('[role=row]').length).toBeLessThan(60)
    expect(table.findAll('button').every(button => button.attributes('tabindex') === '-1')).toBe(true)
  })

  it('sorts by a column, the other way round the second time, and by a further one with Shift', async () => {
    const { header } = await mountTable()
    await header('m/z')?.get('button').trigger('click')
    expect(header('m/z')?.attributes('aria-sort')).toBe('ascending')
    await header('m/z')?.get('button').trigger('click')
    expect(bench().sort).toEqual([{ key: 'mz', descending: true }])
    await header('min')?.get('button').trigger('click', { shiftKey: true })
    expect(bench().sort).toEqual([{ key: 'mz', descending: true }, { key: 'minutes', descending: false }])
    expect([header('m/z')?.text(), header('min')?.text()]).toEqual([expect.stringContaining('m/z ↓1'), expect.stringContaining('min ↑2')])
    expect(header('min')?.attributes('aria-sort')).toBeUndefined()
  })

  it('tells the full value of a cell on hover', async () => {
    const { table } = await mountTable()
    const row = table.get('[aria-rowindex="2"]')
    await row.trigger('mouseover')
    expect(row.findAll('[role=gridcell]').map(cell => cell.attributes('title'))).toContain(String(result.columns.mz[0]))
  })

  it('moves and selects by keys', async () => {
    const { press } = await mountTable()
    for (const [key, selected] of [['ArrowDown', 0], ['ArrowDown', 1], ['ArrowUp', 0], ['End', 499], ['Home', 0]] as const) {
      await press(key)
      expect(bench().selected).toBe(selected)
    }
    await press('PageDown')
    expect(bench().selected).toBeGreaterThan(5)
  })

  it('picks by Space, then moves without letting go, and selects one alone by Enter', async () => {
    const { table, press } = await mountTable()
    for (const key of ['ArrowDown', 'ArrowDown', ' ', 'ArrowDown', 'ArrowDown', ' ', 'ArrowDown']) await press(key)
    expect(looked()).toEqual({ selected: 1, picked: [3] })
    expect(table.findAll('[role=row][aria-selected=true]').map(row => row.attributes('aria-rowindex'))).toEqual(['3', '5'])
    await press(' ')
    await press(' ')
    expect(looked()).toEqual({ selected: 1, picked: [3] })
    await press('Enter')
    expect(looked()).toEqual({ selected: 4, picked: [] })
    await press('ArrowDown')
    expect(bench().selected).toBe(5)
  })

  it('moves without selecting with Ctrl, and picks what it passes with Shift', async () => {
    const { press } = await mountTable()
    await press('ArrowDown')
    await press('ArrowDown', { ctrlKey: true })
    expect(looked()).toEqual({ selected: 0, picked: [] })
    await press('Home')
    await press('ArrowDown', { shiftKey: true })
    await press('ArrowDown', { shiftKey: true })
    expect(looked()).toEqual({ selected: 0, picked: [1, 2] })
    await press('Escape')
    expect(looked()).toEqual({ selected: 0, picked: [] })
  })

  it('picks a range no longer than may be, and says what is left out', async () => {
    const { table, press } = await mountTable()
    await press('Home')
    await press('End', { shiftKey: true })
    expect(bench().picked).toHaveLength(100)
    expect(table.emitted('told')?.at(-1)).toEqual([expect.stringContaining('399 left out')])
  })

  it('picks by a press with Ctrl, with Shift, or where presses pick', async () => {
    const { table } = await mountTable()
    const row = (at: number) => table.get(`[role=row][aria-rowindex="${at}"]`)
    await row(3).trigger('click')
    await row(6).trigger('click', { ctrlKey: true })
    expect(looked()).toEqual({ selected: 1, picked: [4] })
    await row(3).trigger('click')
    await row(6).trigger('click', { shiftKey: true })
    expect(looked()).toEqual({ selected: 1, picked: [2, 3, 4] })
    await row(2).trigger('click')
    await table.setProps({ picksByPress: true })
    await row(4).trigger('click')
    expect(looked()).toEqual({ selected: 0, picked: [2] })
  })

  it('reaches the heads by keys: sorts, sorts further, opens the menu, and comes back', async () => {
    const { grid, header, press } = await mountTable()
    await press('ArrowDown')
    await press('ArrowUp')
    const active = () => grid.attributes('aria-activedescendant')
    expect(active()).toBe(header('flags')?.attributes('id'))
    for (const key of ['ArrowRight', 'ArrowRight', 'Enter']) await press(key)
    expect(bench().sort).toEqual([{ key: 'mz', descending: false }])
    await press('ArrowRight')
    await press('Enter', { shiftKey: true })
    expect(bench().sort.map(({ key }) => key)).toEqual(['mz', 'minutes'])
    await press('ArrowDown', { altKey: true })
    await expect.poll(() => document.querySelector('[role=menu]')?.textContent).toContain('Freeze to here')
  })

  it('keeps the frozen columns at the left', async () => {
    const { table } = await mountTable()
    const cells = table.get('[role=row][aria-rowindex="2"]').findAll('[role=gridcell]')
    expect(cells.map(cell => cell.classes().includes('sticky')).lastIndexOf(true)).toBe(2)
    expect(cells[2]?.attributes('style')).toContain('left: 8rem')
  })
})

describe('the menu of a column', () => {
  it('sorts, freezes, moves and puts away', async () => {
    const column = all.find(({ id }) => id === 'minutes') ?? null
    const anchor = document.body.appendChild(document.createElement('span'))
    const choose = async (says: string) => {
      const menu = await mountSuspended(ColumnMenu, { props: { column, anchor }, attachTo: document.body })
      await expect.poll(() => [...document.querySelectorAll('[role=menuitem]')].some(item => item.textContent === says)).toBe(true)
      const item = [...document.querySelectorAll<HTMLElement>('[role=menuitem]')].find(each => each.textContent === says)
      item?.click()
      await nextTick()
      menu.unmount()
    }
    await choose('Then sort by it')
    expect(bench().sort.map(({ key }) => key)).toEqual(['intensity', 'minutes'])
    await choose('Freeze to here')
    expect(bench().columns.frozen).toBe(4)
    await choose('Move to the left')
    expect(bench().columns.shown.slice(1, 4)).toEqual(['number', 'minutes', 'mz'])
    await choose('Put this column away')
    expect(bench().columns.shown).not.toContain('minutes')
  })
})

describe('the choice of columns', () => {
  const mount = () => mountSuspended(ColumnChoice, { props: { columns: all }, attachTo: document.body })

  it('shows, puts away, moves and freezes, and keeps it in this browser', async () => {
    const choice = await mount()
    const box = (title: string) => choice.findAll('label').find(label => label.text() === title)?.get('input')
    await box('p of equivalence')?.setValue(true)
    expect(bench().columns.shown.at(-1)).toBe('equivalenceP')
    expect(document.activeElement).toBe(box('p of equivalence')?.element)
    await box('reason')?.setValue(false)
    expect(bench().columns.shown).not.toContain('reason')
    await choice.get('[aria-label="verdict: to the left"]').trigger('click')
    expect(bench().columns.shown.slice(3, 5)).toEqual(['verdict', 'minutes'])
    await choice.get('[aria-label="verdict: frozen to here"]').trigger('click')
    expect(bench().columns.frozen).toBe(4)
    await nextTick()
    expect(localStorage.getItem('steelyard-feature-columns')).toMatch(/^g\.n\.z\.v~t\./)
    await choice.findAll('button').find(button => button.text() === 'Columns as at first')?.trigger('click')
    expect(bench().columns).toEqual(DEFAULT_LAYOUT)
  })

  it('takes a column that is dragged to its place', async () => {
    const choice = await mount()
    await choice.get('[data-column=reason]').trigger('dragstart')
    await choice.get('[data-column=minutes]').trigger('drop')
    expect(bench().columns.shown.slice(3, 5)).toEqual(['reason', 'minutes'])
  })

  it('never puts the m/z away', async () => {
    const choice = await mount()
    expect(choice.get('[data-column=mz] input').attributes('disabled')).toBeDefined()
  })
})
