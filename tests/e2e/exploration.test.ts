import { readFileSync } from 'node:fs'
import type { Browser, Locator, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { launchBrowser } from '../support/browser'
import { startDemoServer, type DemoServer } from '../support/demoServer'
import { lookAt } from '../support/lookAt'
import { queryOf } from '../support/openBench'
import { watchedPage } from '../support/watchedPage'

let server: DemoServer
let browser: Browser
beforeAll(async () => {
  server = await startDemoServer()
  browser = await launchBrowser()
})
afterAll(async () => {
  await browser?.close()
  await server?.stop()
})

const patient = { timeout: 60_000 }
const askedFor = (page: Page, name: string) => expect.poll(() => queryOf(page)[name] ?? '', patient)
const bench = () => `/studies/${server.studyId}/comparisons/${server.comparisonId}`
const table = (page: Page) => page.getByRole('grid', { name: 'Features' })
const card = (page: Page) => page.getByRole('complementary', { name: 'Feature card' })
const chromatogram = (page: Page) => page.locator('figure').filter({ hasText: /^\s*Mirrored chromatogram/ })
const foldPlot = (page: Page) => page.locator('figure').filter({ hasText: /^\s*Fold change and/ })
const whole = async (page: Page) => {
  await table(page).locator('[role=row][aria-selected]').first().waitFor(patient)
  await foldPlot(page).locator('canvas').first().waitFor(patient)
}

/** Signs in as the demo scientist by the page's own form; the page must have nothing to report at the end. */
async function explore(act: (page: Page) => Promise<void>) {
  const watched = await watchedPage(browser)
  try {
    const { page } = watched
    await page.context().grantPermissions(['clipboard-read', 'clipboard-write'], { origin: server.url })
    await page.goto(server.url + bench(), { waitUntil: 'networkidle' })
    await page.getByLabel('Sign-in name').fill('scientist')
    await page.getByLabel('Password').fill(server.password)
    await page.keyboard.press('Enter')
    await page.waitForURL(url => url.pathname === bench(), patient)
    await whole(page)
    await act(page)
    expect(watched.problems()).toEqual([])
  }
  finally {
    await watched.close()
  }
}

async function boxOf(locator: Locator) {
  await locator.scrollIntoViewIfNeeded()
  const box = await locator.boundingBox()
  if (!box) throw new Error('nothing is drawn there')
  return box
}

/** Drags through places of a box, given as shares of its width and height. */
async function drag(page: Page, locator: Locator, ...[from, ...on]: [number, number][]) {
  const { x, y, width, height } = await boxOf(locator)
  const to = ([across, down]: [number, number], steps: number) => page.mouse.move(x + across * width, y + down * height, { steps })
  await to(from ?? [0, 0], 1)
  await page.mouse.down()
  for (const place of on) await to(place, 6)
  await page.mouse.up()
}

/** Goes on by Tab until this has the focus. */
async function tabTo(page: Page, target: Locator, back = false) {
  for (let pressed = 0; pressed < 160; pressed++) {
    if (await target.and(page.locator(':focus')).count() > 0) return
    await page.keyboard.press(back ? 'Shift+Tab' : 'Tab')
  }
  throw new Error(`Tab does not come to ${String(target)}`)
}

describe('the bench explored', () => {
  it('by mouse, from the whole to one feature, into a link and a figure', () => explore(async (page) => {
    // The balance bar filters; the table and the plot follow.
    await page.getByRole('button', { name: /found only in Millrace/ }).first().click()
    await askedFor(page, 'verdict').toBe('onlyA')
    await table(page).locator('[role=row][aria-rowindex="2"]').click()
    await card(page).getByText('found only in Millrace').first().waitFor()
    await card(page).getByText(/trace/).first().waitFor()
    await page.goBack()
    await askedFor(page, 'verdict').toBe('')

    // A rectangle on the plot is a filter.
    const drawing = foldPlot(page).locator('.relative').first()
    await foldPlot(page).getByRole('button', { name: 'Rectangle' }).click()
    await drag(page, drawing, [0.35, 0.15], [0.65, 0.8])
    await page.getByText(/^Inside the area drawn, [\d\s]+ features?\./).waitFor()
    await askedFor(page, 'area').not.toBe('')
    await page.getByRole('button', { name: 'Drop the area' }).click()
    await foldPlot(page).getByRole('button', { name: 'Lasso' }).click()
    await drag(page, drawing, [0.4, 0.2], [0.6, 0.2], [0.6, 0.9], [0.4, 0.9])
    await page.getByText(/^Inside the area drawn, [\d\s]+ features?\./).waitFor()
    await askedFor(page, 'area').toMatch(/^certainty:/)

    // A limit is dragged: a preview, until it is dropped.
    await foldPlot(page).getByRole('button', { name: 'Pick' }).click()
    const limit = page.getByRole('slider').first()
    const before = await limit.getAttribute('aria-valuenow')
    const { x, y, width, height } = await boxOf(limit)
    await page.mouse.move(x + width / 2, y + height / 2)
    await page.mouse.down()
    await page.mouse.move(x + width / 2 + 30, y + height / 2 + 30, { steps: 6 })
    await page.mouse.up()
    await page.getByText('Preview, not saved.').waitFor()
    expect(await limit.getAttribute('aria-valuenow')).not.toBe(before)

    // The other plots.
    await page.getByRole('tab', { name: 'Components' }).click()
    await page.getByText(/^Variance: PC1 /).waitFor(patient)
    await page.getByRole('tab', { name: 'Abundance' }).click()
    await askedFor(page, 'plot').toBe('abundance')
    await page.goBack()
    await askedFor(page, 'plot').toBe('components')
    await page.getByRole('tab', { name: 'Fold change' }).click()
    await askedFor(page, 'plot').toBe('')
    await page.reload({ waitUntil: 'networkidle' })
    await whole(page)

    // The chromatogram: a part of the run by a drag, a peak by a click.
    await chromatogram(page).scrollIntoViewIfNeeded()
    const brush = chromatogram(page).locator('.cursor-crosshair')
    await brush.waitFor(patient)
    await drag(page, brush, [0.3, 0.4], [0.6, 0.4])
    await askedFor(page, 'tmin').toMatch(/^[\d.]+-[\d.]+$/)

    // The table: two keys of order, several rows, copied.
    const head = (name: string) => table(page).locator('[role=columnheader]').getByRole('button', { name, exact: false }).first()
    await head('m/z').click()
    await head('reach').click({ modifiers: ['Shift'] })
    await askedFor(page, 'sort').toMatch(/^mz\.-?reach$/)
    await table(page).locator('[role=row][aria-rowindex="3"]').click()
    await table(page).locator('[role=row][aria-rowindex="5"]').click({ modifiers: ['Control'] })
    await page.getByRole('button', { name: 'Copy 2 rows' }).click()
    await page.getByText('2 rows copied').first().waitFor()
    expect((await page.evaluate<string>('navigator.clipboard.readText()')).trim().split(/\r?\n/)).toHaveLength(3)

    // What is frozen covers what scrolls beneath it.
    expect(await page.evaluate('getComputedStyle(document.querySelector("[role=gridcell]")).backgroundColor')).not.toBe('rgba(0, 0, 0, 0)')

    // What is looked at, as extracted traces and in a link for a colleague.
    await page.getByLabel('Trace', { exact: true }).selectOption('extracted')
    await askedFor(page, 'trace').toBe('extracted')
    expect.soft(await lookAt(page, 'bench explored', [1440, 390])).toEqual([])
    const other = await page.context().newPage()
    await other.goto(page.url(), { waitUntil: 'networkidle' })
    await whole(other)
    expect(queryOf(other)).toEqual(queryOf(page))
    await expect.poll(() => table(other).locator('[role=row][aria-selected=true]').count(), patient).toBe(2)
    expect(await other.getByLabel('Trace', { exact: true }).inputValue()).toBe('extracted')
    await other.close()

    // A figure to hand on.
    const download = page.waitForEvent('download')
    await foldPlot(page).getByRole('button', { name: 'SVG' }).click()
    expect(readFileSync(await (await download).path(), 'utf8')).toContain('</svg>')
  }))

  it('by keyboard alone', () => explore(async (page) => {
    // To the balance bar, which filters, and to the table.
    await tabTo(page, page.getByRole('button', { name: /found only in Millrace/ }).first())
    await page.keyboard.press('Enter')
    await askedFor(page, 'verdict').toBe('onlyA')
    await tabTo(page, foldPlot(page).getByRole('button', { name: 'Area by numbers' }))
    await page.keyboard.press('Enter')
    const area = page.getByRole('form', { name: 'Area by numbers' })
    await tabTo(page, area.getByLabel('Where'))
    await page.keyboard.press('Tab')
    for (const value of ['50', '2000', '1', '100000']) {
      await page.keyboard.type(value)
      await page.keyboard.press('Tab')
    }
    await page.keyboard.press('Shift+Tab')
    await page.keyboard.press('Escape')
    await expect.poll(() => area.count(), patient).toBe(0)

    // A limit by its handle.
    const limit = page.getByRole('slider').first()
    await tabTo(page, limit, true)
    const before = await limit.getAttribute('aria-valuenow')
    await page.keyboard.press('ArrowRight')
    await page.getByText('Preview, not saved.').waitFor()
    expect(await limit.getAttribute('aria-valuenow')).not.toBe(before)

    // The tabs of the plots.
    await tabTo(page, page.getByRole('tab', { name: 'Fold change' }), true)
    await page.keyboard.press('ArrowRight')
    await askedFor(page, 'plot').toBe('components')
    await page.keyboard.press('ArrowRight')
    await askedFor(page, 'plot').toBe('abundance')
    await page.keyboard.press('ArrowLeft')
    await page.keyboard.press('ArrowLeft')
    await askedFor(page, 'plot').toBe('')

    // The table: next features, several picked, copied, and the keys of the bench.
    await tabTo(page, table(page))
    await page.keyboard.press('Home')
    await askedFor(page, 'feature').not.toBe('')
    const first = queryOf(page).feature
    await page.keyboard.press('j')
    await askedFor(page, 'feature').not.toBe(first)
    await page.keyboard.press('z')
    await askedFor(page, 'close').toBe('yes')
    await page.keyboard.press('z')
    await page.keyboard.press('/')
    await page.keyboard.type('found')
    await askedFor(page, 'find').toBe('found')
    await tabTo(page, table(page))
    await page.keyboard.press('Escape')
    await askedFor(page, 'find').toBe('')
    await askedFor(page, 'verdict').toBe('')
    await page.keyboard.press('4')
    await askedFor(page, 'verdict').not.toBe('')

    // The chromatogram's part of the run, typed; the card and its flag.
    const part = page.getByRole('form', { name: 'Part of the run' })
    await tabTo(page, part.getByLabel('To'), true)
    await page.keyboard.press('Control+A')
    await page.keyboard.type('6')
    await page.keyboard.press('Enter')
    await askedFor(page, 'tmin').toMatch(/-6$/)
    await page.keyboard.press('Tab')
    await tabTo(page, page.getByRole('button', { name: 'Whole run' }))
    await page.keyboard.press('Enter')
    await askedFor(page, 'tmin').toBe('')
  }))
})
