import { readFileSync } from 'node:fs'
import type { Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { axeFindings } from '../support/axe'
import { openBenchPages, type BenchPages } from '../support/benchPages'
import { queryOf } from '../support/openBench'

let pages: BenchPages
beforeAll(async () => {
  pages = await openBenchPages(2000)
})
afterAll(() => pages?.close())
const onBench: BenchPages['onBench'] = (...asked) => pages.onBench(...asked)
const grid = (page: Page) => page.locator('[role=grid]')
const heads = (page: Page) => page.locator('[role=columnheader]').evaluateAll(cells => cells.map(cell => [...cell.querySelectorAll('button:first-child > span:not(.sr-only), :scope > span')].map(part => part.textContent).join('').trim()))

describe('the feature table', () => {
  it('opens again from a copied link: sort by two keys, filters, columns', () => onBench('?sort=-reach.mz&min=2~8&columns=n.z~v.c.e', async (page) => {
    expect(await heads(page)).toEqual(['#', 'm/z ↑2', 'Verdict', 'reach ↓1', 'p equiv.'])
    await page.getByRole('button', { name: /Minutes from 2 min to 8 min/ }).click()
    await expect.poll(() => queryOf(page).min).toBeUndefined()
    expect(queryOf(page).columns).toBe('n.z~v.c.e')
    await page.goBack()
    await page.getByRole('button', { name: /Minutes from 2 min to 8 min/ }).waitFor()
  }))

  it('keeps a person\'s columns in the browser', () => onBench('', async (page) => {
    await page.getByText('Columns', { exact: true }).click()
    await page.getByRole('checkbox', { name: 'p of equivalence' }).click()
    await expect.poll(() => heads(page)).toContain('p equiv.')
    await expect.poll(() => queryOf(page).columns).toContain('~')
    await page.goto(pages.address)
    await expect.poll(() => heads(page)).toContain('p equiv.')
  }))

  it('filters by formula, says which ion fits, and calls it no identification', () => onBench('?sort=mz&mzs=430~440', async (page) => {
    await page.getByText('Filters by mass, formula and numbers').click()
    const formula = page.getByRole('group', { name: 'Formula' })
    await formula.getByLabel('within').fill('5000')
    await formula.getByLabel('of the molecule').fill('C21H24O10')
    await formula.getByLabel('of the molecule').press('Enter')
    await page.getByRole('button', { name: /C21H24O10 within 5000 ppm: not an identification/ }).waitFor()
    await page.getByRole('gridcell', { name: /\[M−H\]⁻ [+−]?[\d.]+ ppm/ }).first().waitFor()
    await expect.poll(() => queryOf(page).formula).toBe('C21H24O10~5000')
    await page.goto(page.url())
    await page.getByRole('button', { name: /C21H24O10 within 5000 ppm/ }).waitFor()
  }))

  it('goes by keyboard alone: picks, copies, reaches the heads, sorts by two, freezes from the menu', () => onBench('', async (page) => {
    await page.context().grantPermissions(['clipboard-read', 'clipboard-write'], { origin: pages.url })
    await grid(page).focus()
    for (const key of ['ArrowDown', 'Space', 'ArrowDown', 'ArrowDown', 'Space']) await page.keyboard.press(key)
    await expect.poll(() => page.locator('[role=row][aria-selected=true]').count()).toBe(2)
    await page.keyboard.press('Control+c')
    await page.getByText('2 rows copied.').waitFor()
    const copied = (await page.evaluate<string>('navigator.clipboard.readText()')).split(/\r?\n/)
    expect(copied).toHaveLength(3)
    expect(copied[0]).toMatch(/^flags\tfeature\tm\/z\tretention time \(min\)\tverdict\t/)
    expect(copied[1]?.split('\t')[2]).toMatch(/^\d+\.\d{5,}$/)
    await page.keyboard.press('Home')
    for (const key of ['ArrowUp', 'ArrowRight', 'ArrowRight', 'Enter', 'ArrowRight', 'Shift+Enter']) await page.keyboard.press(key)
    await expect.poll(() => queryOf(page).sort).toBe('mz.minutes')
    await page.keyboard.press('Alt+ArrowDown')
    await page.getByRole('menuitem', { name: 'Freeze to here' }).waitFor()
    expect(await axeFindings(page)).toEqual([])
    await page.keyboard.press('Escape')
    await expect.poll(() => grid(page).evaluate(element => element.matches(':focus'))).toBe(true)
  }))

  it('saves the rows shown as CSV: their order, columns, filter and settings', () => onBench('?verdict=onlyA&sort=-mz&columns=n.z~v', async (page) => {
    const downloading = page.waitForEvent('download')
    await page.getByRole('button', { name: 'Rows shown as CSV' }).click()
    const download = await downloading
    expect(download.suggestedFilename()).toMatch(/^steelyard-.*-version-2-shown\.csv$/)
    const lines = readFileSync(await download.path(), 'utf8').trimEnd().split('\r\n')
    const head = lines.indexOf('feature,m/z,verdict')
    expect(lines.slice(0, head).join('\n')).toMatch(/Filter: found only in Millrace[^]*Engine version[^]*SHA-256/)
    const rows = lines.slice(head + 1).map(line => line.split(','))
    expect(rows.length).toBe(Number((await page.getByText(/^\d+ of /).innerText()).split(' ')[0]))
    expect(rows.every(row => row[2] === 'found only in Millrace')).toBe(true)
    expect(rows.map(row => Number(row[1]))).toEqual(rows.map(row => Number(row[1])).toSorted((one, other) => other - one))
  }))

  it.each(['light', 'dark'] as const)('keeps the m/z in view while one scrolls sideways at 390 px, %s', scheme => onBench('?feature=12', async (page) => {
    const cell = page.locator('[role=row][aria-selected] [role=gridcell]:nth-child(3)').first()
    const before = await cell.boundingBox()
    await grid(page).evaluate(element => element.scrollLeft = 400)
    await expect.poll(() => grid(page).evaluate(element => element.scrollLeft)).toBe(400)
    expect((await cell.boundingBox())?.x).toBe(before?.x)
    const box = await cell.boundingBox()
    // What one sees at the place of the cell is the cell.
    expect(await page.evaluate<boolean>(`(() => {
      const cell = document.querySelectorAll('[role=row][aria-selected] [role=gridcell]:nth-child(3)')[0]
      const seen = document.elementFromPoint(${(box?.x ?? 0) + 20}, ${(box?.y ?? 0) + 10})
      cell.scrollIntoView({ block: 'nearest' })
      return seen === null || cell.contains(seen) || seen === cell
    })()`)).toBe(true)
    expect(await axeFindings(page)).toEqual([])
    expect(await page.evaluate('document.documentElement.scrollWidth <= window.innerWidth')).toBe(true)
  }, { width: 390, scheme }))
})
