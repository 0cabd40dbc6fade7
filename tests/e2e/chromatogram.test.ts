import type { Locator, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { axeFindings } from '../support/axe'
import { openBenchPages, type BenchPages } from '../support/benchPages'
import { manyFeatures } from '../support/manyFeatures'
import { queryOf } from '../support/openBench'
import type { WatchedPageOptions } from '../support/watchedPage'

const FEATURES = 2000
let pages: BenchPages
beforeAll(async () => {
  pages = await openBenchPages(FEATURES)
})
afterAll(() => pages?.close())

/** Acts on the chromatogram once it is drawn; the page must have nothing to report. */
const onChromatogram = (query: string, act: (page: Page, plot: Locator) => Promise<void>, options: WatchedPageOptions = {}) => pages.onBench(query, async (page) => {
  const figure = page.locator('figure').filter({ hasText: 'Mirrored chromatogram' })
  await figure.scrollIntoViewIfNeeded()
  await figure.getByText('drawn from features').first().waitFor()
  await figure.locator('canvas').waitFor()
  await figure.locator('.cursor-crosshair').waitFor()
  await act(page, figure.locator('.cursor-crosshair'))
}, options)
const patient = { timeout: 60_000 }
/** Room left and right of the plot, CSS pixels, as on wide pages. */
const [LEFT, RIGHT] = [96, 12]
async function placeAt(plot: Locator, share: number, half: 'A' | 'B' = 'A') {
  const box = await plot.boundingBox()
  if (!box) throw new Error('the chromatogram is not drawn')
  return { x: box.x + LEFT + share * (box.width - LEFT - RIGHT), y: box.y + box.height * (half === 'A' ? 0.3 : 0.6) }
}

describe('the chromatogram', () => {
  it('zooms to what is drawn over with the mouse, and back by a key', () => onChromatogram('?tmin=4-14', async (page, plot) => {
    const [from, to] = [await placeAt(plot, 0.2), await placeAt(plot, 0.6)]
    await page.mouse.move(from.x, from.y)
    await page.mouse.down()
    await page.mouse.move((from.x + to.x) / 2, from.y, { steps: 4 })
    await page.mouse.move(to.x, to.y, { steps: 4 })
    await page.mouse.up()
    await expect.poll(() => (queryOf(page).tmin ?? '').split('-').map(text => Math.round(Number(text) * 10) / 10), patient).toEqual([6, 10])
    await page.keyboard.press('0')
    await expect.poll(() => queryOf(page).tmin, patient).toBeUndefined()
  }))

  it('selects the feature whose peak is clicked', () => {
    const minutes = manyFeatures(FEATURES).retentionMinutes[700] ?? 0
    return onChromatogram(`?tmin=${(minutes - 0.03).toFixed(3)}-${(minutes + 0.03).toFixed(3)}`, async (page, plot) => {
      const { x, y } = await placeAt(plot, 0.5)
      await page.mouse.click(x, y)
      await expect.poll(() => queryOf(page).feature, patient).toBe('701')
      await page.getByText('feature #701').waitFor()
    })
  })

  it('does by keyboard alone what a drag does', () => onChromatogram('?feature=12', async (page) => {
    await page.locator('[role=grid]').focus()
    await page.keyboard.press('z')
    await expect.poll(() => queryOf(page).close, patient).toBe('yes')
    const part = page.getByRole('form', { name: 'Part of the run' })
    await part.getByLabel('From').fill('2,5')
    await part.getByLabel('To').fill('7')
    await page.keyboard.press('Enter')
    await expect.poll(() => queryOf(page).tmin, patient).toBe('2.5-7')
    for (const name of ['Zoom in', 'Later']) {
      await page.getByRole('button', { name, exact: true }).focus()
      await page.keyboard.press('Enter')
    }
    await expect.poll(() => (queryOf(page).tmin ?? '').split('-').map(Number), patient).toEqual([4.75, 7])
    await page.getByRole('button', { name: 'Whole run' }).press('Enter')
    await expect.poll(() => queryOf(page).tmin, patient).toBeUndefined()
  }))

  it('draws several features looked at, and a copied link does too', () => onChromatogram('?feature=12&also=40.300&trace=extracted&tscale=own', async (page) => {
    const key = page.getByRole('list', { name: 'Lines of the features' }).getByRole('button')
    await expect.poll(() => key.count(), patient).toBe(3)
    await key.nth(1).click()
    await expect.poll(() => queryOf(page).feature, patient).toBe('40')
    expect(queryOf(page).also).toBe('12.300')
    expect(await page.getByLabel('Height', { exact: true }).inputValue()).toBe('own')
  }))

  it.each([[1440, 'light'], [390, 'dark']] as const)('has no axe finding at %i px, %s', (width, scheme) => onChromatogram('?also=12.40&trace=extracted', async (page) => {
    await page.locator('figure').filter({ hasText: 'Mirrored chromatogram' }).getByRole('button', { name: 'Show as table' }).click()
    expect(await axeFindings(page)).toEqual([])
    expect(await page.evaluate('document.documentElement.scrollWidth <= window.innerWidth')).toBe(true)
  }, { width, scheme }))
})
