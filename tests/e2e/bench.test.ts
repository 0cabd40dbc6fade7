import type { Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { axeFindings } from '../support/axe'
import { openBenchPages, type BenchPages } from '../support/benchPages'
import { BLANKS_IN_VIEW, queryOf } from '../support/openBench'

const FEATURES = 50_000
let pages: BenchPages
beforeAll(async () => {
  pages = await openBenchPages(FEATURES)
})
afterAll(() => pages?.close())
const onBench: BenchPages['onBench'] = (...asked) => pages.onBench(...asked)
const selected = (page: Page) => page.locator('[role=row][aria-selected=true]')
const showsFeatures = (page: Page, count: string | RegExp) => page.getByText(count).first().waitFor()

describe('the bench with 50,000 features', () => {
  it('has no blank row, however it is scrolled', () => onBench('', async (page) => {
    await page.locator('[role=grid]').hover()
    const seen: number[] = []
    for (const distance of [300, 5000, 40_000, 400_000, -200_000, -60_000, 900_000, -5_000_000]) {
      await page.mouse.wheel(0, distance)
      for (let look = 0; look < 4; look++) {
        // A frame later the page has drawn what it scrolled to.
        seen.push(await page.evaluate<number>(`new Promise(done => requestAnimationFrame(() => requestAnimationFrame(() => done(${BLANKS_IN_VIEW}))))`))
      }
    }
    expect(seen.filter(blanks => blanks > 0)).toEqual([])
    expect(await page.locator('[role=grid]').getAttribute('aria-rowcount')).not.toBe('1')
  }))

  it('goes by keys: next, previous, last, verdicts, find, clear', () => onBench('?feature=12', async (page) => {
    await page.locator('[role=grid]').focus()
    await page.keyboard.press('End')
    await expect.poll(async () => Number(await selected(page).getAttribute('aria-rowindex'))).toBe(Number(await page.locator('[role=grid]').getAttribute('aria-rowcount')))
    await page.keyboard.press('Home')
    await page.keyboard.press('j')
    await expect.poll(() => selected(page).getAttribute('aria-rowindex')).toBe('3')
    await page.keyboard.press('k')
    await expect.poll(() => selected(page).getAttribute('aria-rowindex')).toBe('2')
    await page.keyboard.press('1')
    await expect.poll(() => queryOf(page).verdict).toBe('onlyA')
    await page.keyboard.press('/')
    await page.keyboard.type('500.1')
    await expect.poll(() => queryOf(page).find).toBe('500.1')
    await page.locator('[role=grid]').focus()
    await page.keyboard.press('Escape')
    await expect.poll(() => queryOf(page)).not.toHaveProperty('verdict')
    await page.keyboard.press('?')
    await page.getByRole('dialog', { name: 'Keys of the bench' }).waitFor()
  }))

  it('keeps its view in the address: a copied link opens it, back takes a filter back', () => onBench('?verdict=onlyB&feature=40000&sort=mz', async (page) => {
    await page.getByText('feature #40000').waitFor()
    const part = page.getByRole('button', { name: /^found only in Tallow Lane \d/ })
    expect(await part.getAttribute('aria-pressed')).toBe('true')
    expect(await page.locator('[role=columnheader][aria-sort]').innerText()).toContain('m/z')
    await part.click()
    await expect.poll(() => queryOf(page).verdict).toBeUndefined()
    await page.goBack()
    await expect.poll(() => part.getAttribute('aria-pressed')).toBe('true')
    await page.goForward()
    await expect.poll(() => part.getAttribute('aria-pressed')).toBe('false')
  }))

  it('finds one m/z within its tolerance among all', () => onBench('?sort=mz', async (page) => {
    const mz = await page.locator('[role=row][aria-rowindex="10"] [role=gridcell]').nth(2).innerText()
    await page.getByLabel('Find a feature').fill(mz)
    await showsFeatures(page, /^[1-9] of /)
    expect(await page.locator('[role=row] [role=gridcell]:nth-child(3)').allInnerTexts()).toContain(mz)
  }))

  it('previews other limits at once and saves them as a new version', () => onBench('', async (page) => {
    await page.getByText('Limits and settings').click()
    await page.locator('details').getByLabel('Reach limit').fill('20')
    await page.getByText('Preview, not saved.').waitFor()
    await page.getByRole('button', { name: 'Save as a new version' }).click()
    await page.getByText('Reach limit: ×5 before, ×20 now').or(page.getByText(/Against version 2:.*×20/)).first().waitFor({ timeout: 60_000 })
    await expect.poll(() => page.getByText('Preview, not saved.').count()).toBe(0)
    expect(await page.getByLabel('Version', { exact: true }).innerText()).toContain('Version 3')
  }))

  it('lets a student try limits but not save them', () => onBench('', async (page) => {
    await page.getByText('Limits and settings').click()
    await page.locator('details').getByLabel('Fold limit').fill('4')
    await page.getByText('Preview, not saved.').waitFor()
    expect(await page.getByRole('button', { name: 'Save as a new version' }).count()).toBe(0)
  }, { signInName: 'student' }))

  it('computes principal components beside the page; what is chosen stands in the address', () => onBench('?plot=components&pc=2.1&with=blank', async (page) => {
    const part = page.getByRole('region', { name: 'Principal components' })
    await part.getByText(/^Variance: PC1 /).waitFor({ timeout: 60_000 })
    expect(await part.getByText(/in 8 samples/).count()).toBe(1)
    expect(await part.getByText(/^Across PC2 /).count()).toBe(1)
    expect(await axeFindings(page)).toEqual([])
    await part.getByLabel('blanks').uncheck()
    await part.getByText(/in 6 samples/).waitFor({ timeout: 60_000 })
    await expect.poll(() => queryOf(page), { timeout: 30_000 }).toMatchObject({ pc: '2.1', with: 'sides' })
    await part.getByRole('button', { name: 'Show as table' }).last().click()
    await part.getByRole('button', { name: /^m\/z/ }).first().click()
    await expect.poll(() => queryOf(page), { timeout: 30_000 }).toHaveProperty('feature')
    await page.getByRole('complementary', { name: 'Feature card' }).getByText('Values per sample').waitFor()
  }))

  it.each([[1440, 'light'], [1440, 'dark'], [390, 'light'], [390, 'dark'], [320, 'light']] as const)('has no axe finding at %i px, %s', (width, scheme) => onBench('?feature=12', async (page) => {
    await page.getByText('Limits and settings').click()
    await page.getByText('Values per sample').waitFor()
    expect(await axeFindings(page)).toEqual([])
    expect(await page.evaluate('document.documentElement.scrollWidth <= window.innerWidth')).toBe(true)
  }, { width, scheme }))
})
