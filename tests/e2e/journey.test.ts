import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { launchBrowser } from '../support/browser'
import { startBuiltServer, type BuiltServer } from '../support/builtServer'
import { lookAt } from '../support/lookAt'
import { watchedPage, type WatchedPage } from '../support/watchedPage'

let server: BuiltServer
let browser: Browser
let watched: WatchedPage
let page: Page
let studyAddress = ''

beforeAll(async () => {
  server = await startBuiltServer({ kind: 'demo' })
  browser = await launchBrowser()
  watched = await watchedPage(browser)
  page = watched.page
  await page.context().grantPermissions(['clipboard-read', 'clipboard-write'], { origin: server.url })
})
afterAll(async () => {
  await watched?.close()
  await browser?.close()
  await server?.stop()
})

const open = (path: string) => page.goto(server.url + path, { waitUntil: 'networkidle' })
/** Wide and narrow, light and dark; what is wrong is told at once, and the journey goes on. */
const look = async (name: string) => expect.soft(await lookAt(page, name, [1440, 390])).toEqual([])
const heading = (name: string | RegExp, level = 1) => page.getByRole('heading', { name, level })

/** The sides of the study, told by the demo's sample sheet, as a first day in the laboratory would go: each step goes on where the last one ended. */
describe('from sign-in to what only one side holds', () => {
  it('signs in as the demo analyst', async () => {
    await open('/')
    await heading('Sign in').waitFor()
    await look('01 sign in')
    await page.getByRole('button', { name: /analyst/i }).first().click()
    await page.getByRole('button', { name: 'Sign in', exact: true }).click()
    await heading('Studies').waitFor()
    expect(watched.problems()).toEqual([])
  })

  it('finds the demo laboratory made', async () => {
    await page.getByRole('link', { name: 'Orange peel: grove or market stall' }).waitFor({ timeout: 120_000 })
    await page.getByText('The demo laboratory is being made').waitFor({ state: 'detached', timeout: 120_000 })
    await look('02 studies')
    expect(watched.problems()).toEqual([])
  })

  it('copies the sample sheet of the files to try', async () => {
    await page.getByRole('link', { name: 'Files to try an upload with' }).click()
    await heading('Files to try an upload with').waitFor()
    await look('03 demo files')
    await page.getByRole('button', { name: 'Copy the sample sheet' }).click()
    await page.getByRole('button', { name: 'Copied' }).waitFor()
    expect(watched.problems()).toEqual([])
  })

  it('makes a study', async () => {
    await open('/')
    await page.getByRole('link', { name: 'New study' }).click()
    await heading(/new study/i).waitFor()
    await page.getByLabel('Title').fill('Two juices, my own run')
    await page.getByLabel('Question').fill('What does the pressed juice hold that the carton lacks?')
    await page.getByLabel('Matrix').fill('apple juice')
    await page.getByLabel('Name of side A').fill('Millrace')
    await page.getByLabel('Name of side B').fill('Tallow Lane')
    await page.getByLabel('Method', { exact: true }).selectOption({ label: 'Phenolics, negative, 15 min (negative)' })
    await look('04 new study')
    await page.getByRole('button', { name: 'Make the study' }).click()
    await heading('Two juices, my own run').waitFor()
    studyAddress = new URL(page.url()).pathname
    expect(studyAddress).toMatch(/^\/studies\/[\w-]{22}$/)
    await look('05 study')
    expect(watched.problems()).toEqual([])
  })

  it('pastes the sample sheet', async () => {
    await page.getByRole('link', { name: /^Samples/ }).click()
    await page.getByRole('grid').waitFor()
    await look('06 samples empty')
    await page.getByRole('gridcell').first().click()
    await page.keyboard.press('Control+V')
    await page.getByRole('status').filter({ hasText: /^Saved$/ }).waitFor()
    await look('07 samples')
    await page.reload({ waitUntil: 'networkidle' })
    expect(await page.getByRole('row').filter({ hasText: /Millrace-3/ }).textContent()).toContain('bottle M3')
    expect(watched.problems()).toEqual([])
  })

  it('drops the feature tables', async () => {
    await page.getByRole('link', { name: /^Tables/ }).click()
    await page.getByText('No feature tables yet').waitFor()
    await look('08 tables empty')
    const dropped = await page.evaluateHandle(DROPPED_FILES)
    await page.getByRole('region', { name: 'Add feature tables' }).dispatchEvent('drop', { dataTransfer: dropped })
    await page.getByRole('link', { name: /^Tables\s*16$/ }).waitFor({ timeout: 60_000 })
    await look('09 tables')
    expect(watched.problems()).toEqual([])
  })

  it('aligns them', async () => {
    await page.getByRole('link', { name: /^Alignments/ }).click()
    await look('10 align')
    await page.getByRole('button', { name: 'Align 16 tables' }).click()
    await heading('Alignment 1', 2).waitFor({ timeout: 60_000 })
    await look('11 alignment')
    expect(watched.problems()).toEqual([])
  })

  it('compares the sides and sees what is found only in A', async () => {
    await page.getByRole('link', { name: 'Compare the sides' }).click()
    await page.getByRole('button', { name: 'Compare', exact: true }).waitFor()
    await look('12 new comparison')
    await page.getByRole('button', { name: 'Compare', exact: true }).click()
    await heading('Millrace against Tallow Lane', 2).waitFor({ timeout: 60_000 })
    await page.getByRole('grid', { name: 'Features' }).waitFor()
    await look('13 bench')
    await page.getByRole('button', { name: /^found only in Millrace/ }).click()
    const rows = page.getByRole('grid', { name: 'Features' }).getByRole('row')
    await rows.filter({ hasText: 'found only in Millrace' }).first().waitFor()
    const shown = await page.getByRole('search', { name: 'Features' }).getByRole('status').filter({ hasText: /features$/ }).textContent()
    expect(Number(/^\d+/.exec(shown ?? '')?.[0])).toBeGreaterThan(20)
    await page.getByLabel('Find a feature').fill('153.0193')
    await rows.filter({ hasText: /153\.0[12]/ }).first().click()
    await page.getByRole('heading', { name: /153\.0[12]/ }).waitFor()
    await page.getByRole('complementary', { name: 'Feature card' }).getByText('found only in Millrace').first().waitFor()
    await look('14 only in A')
    expect(watched.problems()).toEqual([])
  })

  it('runs the alignment again, tighter, and reads what changed', async () => {
    await open(`${studyAddress}/alignments`)
    await page.getByLabel('Mass tolerance', { exact: true }).fill('3')
    await page.getByLabel('Time tolerance').fill('0,02')
    await page.getByLabel('A practice run, which only I see').check()
    await page.getByText('Tolerances under the instrument’s own scatter').waitFor()
    await look('15 tighter')
    await page.getByRole('button', { name: 'Practise aligning 16 tables' }).click()
    await heading(/^Alignment 2/, 2).waitFor({ timeout: 60_000 })
    await look('16 practice alignment')
    await page.getByRole('button', { name: 'Compare and show what changed' }).click()
    await heading(/^What changed in/, 2).waitFor({ timeout: 60_000 })
    await page.getByRole('region', { name: 'Features whose verdict changed' }).waitFor()
    await look('17 what changed')
    expect(watched.problems()).toEqual([])
  })
})

/** Runs in the page: the demo's feature tables as a drop from the desktop would bring them. */
const DROPPED_FILES = `(async () => {
  const { files } = await (await fetch('/api/demo')).json()
  const dropped = new DataTransfer()
  for (const name of files.filter(name => name !== 'sample-sheet.csv')) dropped.items.add(new File([await (await fetch('/demo/' + name)).arrayBuffer()], name))
  return dropped
})()`
