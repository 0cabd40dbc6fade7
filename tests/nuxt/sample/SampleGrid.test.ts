import { mountSuspended } from '@nuxt/test-utils/runtime'
import type { VueWrapper } from '@vue/test-utils'
import { afterEach, describe, expect, it } from 'vitest'
import { nextTick, reactive, ref } from 'vue'
import SampleGrid from '~/components/sample/SampleGrid.vue'
import { useSampleSheet } from '~/composables/useSampleSheet'
import { emptyDraft } from '~/utils/sampleSheet/draft'
import { sampleFields, sampleSchema, type SampleField } from '#shared/schemas/sample'
import type { SampleRow } from '#shared/types/sample'

const stored = (id: string, rest: Partial<SampleRow> = {}): SampleRow => ({ ...sampleSchema.parse({ name: id }), id, tables: 0, aligned: false, writtenBy: {}, ...rest })
const names = ref({ sideAName: 'Millrace', sideBName: 'Tallow Lane' })
let wrapper: VueWrapper | undefined
afterEach(() => wrapper?.unmount())

/** The grid on a sheet of three rows, as its page holds it. */
async function mounted({ editable = true } = {}) {
  const sheet = useSampleSheet(ref([stored('one'), stored('two', { side: 'B', amount: 12.5 }), stored('three')]), reactive(emptyDraft()), names)
  const told: string[] = []
  const grid = await mountSuspended({
    components: { SampleGrid },
    setup: () => ({ sheet, names, editable, told }),
    template: '<SampleGrid :rows="sheet.rows.value" :editable="editable" :names="names" :add-rows="sheet.addRows" @write="sheet.write" @undo="sheet.undo" @told="told.push($event)" />',
  }, { attachTo: document.body })
  wrapper = grid
  const text = (row: number, field: SampleField) => sheet.rows.value[row]?.cells[field].text
  const cell = (row: number, field: SampleField) => grid.get<HTMLElement>(`[data-place="${row}-${sampleFields.indexOf(field)}"]`)
  const focused = () => document.activeElement?.getAttribute('data-place')
  const settle = async () => {
    await nextTick()
    await nextTick()
  }
  const focus = async (row: number, field: SampleField) => {
    await cell(row, field).trigger('mousedown')
    await settle()
  }
  /** Presses keys one after the other where the focus is: `Shift+` before a name extends. */
  const press = async (...keys: string[]) => {
    for (const each of keys) {
      const [key = '', ...modifiers] = each.split('+').reverse()
      document.activeElement?.dispatchEvent(new KeyboardEvent('keydown', { key, shiftKey: modifiers.includes('Shift'), ctrlKey: modifiers.includes('Control'), bubbles: true, cancelable: true }))
      await settle()
    }
  }
  const type = async (value: string) => {
    await grid.get('input').setValue(value)
  }
  const clipboard = async (kind: 'copy' | 'cut' | 'paste', content = '') => {
    const data = new Map([['text/plain', content]])
    const event = Object.assign(new Event(kind, { bubbles: true, cancelable: true }), { clipboardData: { getData: (type: string) => data.get(type) ?? '', setData: (type: string, value: string) => data.set(type, value) } })
    document.activeElement?.dispatchEvent(event)
    await settle()
    return data.get('text/plain') ?? ''
  }
  return { grid, sheet, told, text, cell, focused, focus, press, type, clipboard }
}

describe('movement', () => {
  it('has one cell to come to by Tab, and says how large the grid is', async () => {
    const { grid } = await mounted()
    expect(grid.findAll('[role=gridcell][tabindex="0"]').map(each => each.attributes('data-place'))).toEqual(['0-0'])
    expect(grid.get('[role=grid]').attributes()).toMatchObject({ 'aria-rowcount': '4', 'aria-colcount': '12' })
  })

  it('goes by arrows, Home, End and Control, and stays inside', async () => {
    const { focus, press, focused } = await mounted()
    await focus(1, 'kind')
    await press('ArrowDown', 'ArrowRight')
    expect(focused()).toBe('2-2')
    await press('ArrowDown')
    expect(focused()).toBe('2-2')
    await press('Home')
    expect(focused()).toBe('2-0')
    await press('End')
    expect(focused()).toBe('2-10')
    await press('Control+Home')
    expect(focused()).toBe('0-0')
    await press('Control+End')
    expect(focused()).toBe('2-10')
  })

  it('goes on by Tab over the end of a row, and lets the Tab key leave at the end and after Escape', async () => {
    const { focus, press, focused, cell } = await mounted()
    await focus(0, 'batch')
    await press('Tab')
    expect(focused()).toBe('1-0')
    await press('Shift+Tab')
    expect(focused()).toBe('0-10')
    const tab = () => {
      const event = new KeyboardEvent('keydown', { key: 'Tab', bubbles: true, cancelable: true })
      document.activeElement?.dispatchEvent(event)
      return event.defaultPrevented
    }
    await press('Escape')
    expect(tab()).toBe(false)
    await focus(2, 'batch')
    expect(tab()).toBe(false)
    cell(0, 'name').element.focus()
    expect(tab()).toBe(true)
  })
})

describe('editing', () => {
  it('by typing replaces what stands; Enter keeps it and goes down', async () => {
    const { focus, press, type, text, focused, grid } = await mounted()
    await focus(1, 'amount')
    await press('3')
    expect(grid.get<HTMLInputElement>('input').element.value).toBe('3')
    expect(grid.get('input').attributes('aria-label')).toBe('amount, row 2')
    await type('3,5')
    await press('Enter')
    expect(text(1, 'amount')).toBe('3,5')
    expect(focused()).toBe('2-4')
  })

  it('by F2 begins with what stands; Escape leaves it', async () => {
    const { focus, press, type, text, grid, focused } = await mounted()
    await focus(1, 'amount')
    await press('F2')
    expect(grid.get<HTMLInputElement>('input').element.value).toBe('12.5')
    await type('99')
    await press('ArrowLeft')
    expect(grid.find('input').exists()).toBe(true)
    await press('Escape')
    expect(text(1, 'amount')).toBe('12.5')
    expect(focused()).toBe('1-4')
  })

  it('is not begun by a second click, but by a double click or a second tap', async () => {
    const { focus, cell, grid, press } = await mounted()
    await focus(1, 'amount')
    await focus(1, 'amount')
    await cell(1, 'amount').trigger('click', { pointerType: 'mouse' })
    expect(grid.find('input').exists()).toBe(false)
    await cell(1, 'amount').trigger('dblclick')
    expect(grid.get<HTMLInputElement>('input').element.value).toBe('12.5')
    await press('Escape')
    await focus(1, 'amount')
    await cell(1, 'amount').trigger('click', { pointerType: 'touch' })
    expect(grid.find('input').exists()).toBe(true)
  })

  it('keeps what was typed when the focus leaves', async () => {
    const { focus, press, type, text, grid } = await mounted()
    await focus(0, 'batch')
    await press('x')
    await type('monday')
    await grid.get('input').trigger('blur')
    expect(text(0, 'batch')).toBe('monday')
    expect(grid.find('input').exists()).toBe(false)
  })

  it('goes to the right by Tab, and by an arrow where it was begun by typing', async () => {
    const { focus, press, text, focused } = await mounted()
    await focus(0, 'side')
    await press('B', 'Tab')
    expect(text(0, 'side')).toBe('B')
    expect(focused()).toBe('0-3')
    await press('p', 'ArrowDown')
    expect(text(0, 'preparation')).toBe('p')
    expect(focused()).toBe('1-3')
  })

  it('marks a wrong cell, keeps its text and says what is wrong', async () => {
    const { focus, press, type, cell, text } = await mounted()
    await focus(0, 'amount')
    await press('t')
    await type('ten')
    await press('Enter')
    expect(text(0, 'amount')).toBe('ten')
    expect(cell(0, 'amount').attributes('aria-invalid')).toBe('true')
    expect(cell(0, 'amount').attributes('title')).toBe('Not a number. Use digits with a point or a comma.')
  })

  it('clears a selected block, and takes it back', async () => {
    const { focus, press, text, grid } = await mounted()
    await focus(1, 'side')
    await press('Shift+ArrowRight', 'Shift+ArrowRight')
    expect(grid.findAll('[aria-selected=true]')).toHaveLength(3)
    await press('Delete')
    expect(text(1, 'side')).toBe('')
    expect(text(1, 'amount')).toBe('')
    await press('Control+z')
    expect([text(1, 'side'), text(1, 'amount')]).toEqual(['B', '12.5'])
  })

  it('does nothing for those who only read', async () => {
    const { focus, press, text, grid, clipboard } = await mounted({ editable: false })
    await focus(1, 'amount')
    await press('3', 'F2', 'Delete')
    await clipboard('paste', '7')
    expect(grid.find('input').exists()).toBe(false)
    expect(text(1, 'amount')).toBe('12.5')
    expect(grid.get('[role=grid]').attributes('aria-readonly')).toBe('true')
  })
})

describe('the clipboard', () => {
  it('takes the selected block, rows and columns apart', async () => {
    const { focus, press, clipboard } = await mounted()
    await focus(0, 'name')
    await press('Shift+ArrowDown', 'Shift+ArrowRight', 'Shift+ArrowRight')
    expect(await clipboard('copy')).toBe('one\tsample\t\ntwo\tsample\tB')
  })

  it('puts a block from the active cell on, with new rows beyond the end', async () => {
    const { focus, clipboard, text, sheet, told } = await mounted()
    await focus(2, 'name')
    await clipboard('paste', 'three\tQC\nfour\tblank\nfive\tstandard')
    expect(sheet.rows.value).toHaveLength(5)
    expect([2, 3, 4].map(row => [text(row, 'name'), sheet.rows.value[row]?.cells.kind.value])).toEqual([['three', 'pooledQc'], ['four', 'solventBlank'], ['five', 'standard']])
    expect(told).toEqual(['Pasted 3 rows.'])
  })

  it('takes columns by their names where the block has heads', async () => {
    const { focus, clipboard, text, told } = await mounted()
    await focus(0, 'batch')
    await clipboard('paste', 'Group\tRack\tWeight (g)\nMillrace\t4\t0,2')
    expect([text(0, 'side'), text(0, 'amount'), text(0, 'amountUnit'), text(0, 'batch')]).toEqual(['Millrace', '200', 'mg', ''])
    expect(told).toEqual(['Pasted 1 row, its columns taken by their names. Not understood and left out: “Rack”.'])
  })

  it('fills a selected block with one value', async () => {
    const { focus, press, clipboard, text } = await mounted()
    await focus(0, 'batch')
    await press('Shift+ArrowDown', 'Shift+ArrowDown')
    await clipboard('paste', 'b1')
    expect([0, 1, 2].map(row => text(row, 'batch'))).toEqual(['b1', 'b1', 'b1'])
  })

  it('is one step to take back', async () => {
    const { focus, press, clipboard, text } = await mounted()
    await focus(0, 'side')
    await clipboard('paste', 'A\tp1\t5\nA\tp2\t6')
    expect(text(1, 'amount')).toBe('6')
    await press('Control+z')
    expect([text(0, 'side'), text(1, 'side'), text(1, 'amount')]).toEqual(['', 'B', '12.5'])
  })
})
