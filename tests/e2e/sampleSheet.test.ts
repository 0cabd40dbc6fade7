import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { Browser, Locator, Page } from 'playwright-core'
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest'
import { openDatabase } from '../../server/db/open'
import { people } from '../../server/db/schema'
import { makeStudy } from '../../server/domain/study/makeStudy'
import { Jobs } from '../../server/jobs/runner'
import { studyFormSchema } from '../../shared/schemas/study'
import { axeFindings } from '../support/axe'
import { launchBrowser } from '../support/browser'
import { startBuiltServer, type BuiltServer } from '../support/builtServer'
import { addTestPerson, migrations } from '../support/laboratory'
import { TEST_PASSWORD, testPasswordHash } from '../support/signIn'
import { watchedPage, type WatchedPage } from '../support/watchedPage'

const PASTED = ['Sample\tType\tGroup\tWeight (mg)\tRun order', 'M1\tsample\tMillrace\t10,5\t1', 'M2\tsample\tMillrace\t9.8\t2', 'T1\tsample\tTallow Lane\tten\t3', 'T2\tsample\tB\t11\t4', 'QC 1\tQC\t\t\t5'].join('\n')
const folder = mkdtempSync(join(tmpdir(), 'steelyard-sheet-'))
let server: BuiltServer
let browser: Browser
let studyId: string
const signInNames: string[] = []
const open: WatchedPage[] = []

beforeAll(async () => {
  const database = await openDatabase(folder, 'lab', migrations)
  const laboratory = { ...database, folder, jobs: new Jobs({ db: database.db, folder }, {}, {}) }
  const [anna, ben] = [addTestPerson(laboratory, 'analyst'), addTestPerson(laboratory, 'analyst')]
  signInNames.push(anna.signInName, ben.signInName)
  database.db.update(people).set({ passwordHash: await testPasswordHash() }).run()
  studyId = makeStudy(database.db, studyFormSchema.parse({ title: 'Two juices', sideAName: 'Millrace', sideBName: 'Tallow Lane', newMethod: { name: 'C18', polarity: 'negative' } }), anna).id
  database.close()
  server = await startBuiltServer({ folder, env: { NUXT_SESSION_COOKIE_SECURE: 'false' } })
  browser = await launchBrowser()
})
afterEach(async () => {
  await Promise.all(open.splice(0).map(watched => watched.close()))
})
afterAll(async () => {
  await browser?.close()
  await server?.stop()
  rmSync(folder, { recursive: true, force: true })
})

/** A person at the sheet, in a browser of their own. */
async function atSheet(person: 0 | 1): Promise<WatchedPage> {
  const watched = await watchedPage(browser)
  open.push(watched)
  const { page } = watched
  await page.goto(`${server.url}/sign-in`, { waitUntil: 'networkidle' })
  await page.getByLabel('Sign-in name').fill(signInNames[person] ?? '')
  await page.getByLabel('Password', { exact: true }).fill(TEST_PASSWORD)
  await page.getByRole('button', { name: 'Sign in' }).click()
  await page.waitForURL(`${server.url}/`)
  await page.goto(`${server.url}/studies/${studyId}/samples`, { waitUntil: 'networkidle' })
  return watched
}
const column = { name: 0, side: 2, amount: 4, batch: 10 }
const cell = (page: Page, row: number, field: keyof typeof column): Locator => page.locator(`[data-place="${row}-${column[field]}"]`)
/** Runs in the page, as the browser does it on Control+V. */
const paste = (page: Page, text: string) => page.evaluate(`{
  const data = new DataTransfer()
  data.setData('text/plain', ${JSON.stringify(text)})
  document.activeElement.dispatchEvent(new ClipboardEvent('paste', { clipboardData: data, bubbles: true, cancelable: true }))
}`)
async function write(page: Page, row: number, field: keyof typeof column, text: string) {
  await cell(page, row, field).click()
  await page.keyboard.type(text)
  await page.keyboard.press('Enter')
}
const says = (page: Page, text: string) => page.getByRole('status').filter({ hasText: text }).waitFor()

describe('the sample sheet', () => {
  it('takes a pasted block, saves it, and keeps the one wrong cell for the person', async () => {
    const { page, problems } = await atSheet(0)
    await cell(page, 0, 'name').click()
    await paste(page, PASTED)
    await says(page, '1 cell needs you. The rest is saved')
    await page.getByText('The sides follow the run order').waitFor()
    expect(await axeFindings(page)).toEqual([])

    // Looking elsewhere in the study and coming back loses nothing of it.
    await page.getByRole('link', { name: 'Overview' }).click()
    await page.getByRole('heading', { name: 'Drop the feature tables' }).waitFor()
    await page.getByRole('link', { name: 'Samples' }).click()
    await page.getByText('“ten”. Not a number.').waitFor()
    await page.getByRole('button', { name: 'Go to the cell' }).click()
    await page.keyboard.type('10,2')
    await page.keyboard.press('Enter')
    await says(page, 'Saved')
    await page.reload({ waitUntil: 'networkidle' })
    expect(await cell(page, 2, 'amount').innerText()).toBe('10.2')
    expect(await cell(page, 1, 'side').innerText()).toContain('Millrace')
    expect(problems()).toEqual([])
  })

  it('shows a cell that another person changed meanwhile, with both values, and overwrites nothing', async () => {
    const [anna, ben] = [await atSheet(0), await atSheet(1)]
    await write(ben.page, 0, 'amount', '20')
    await says(ben.page, 'Saved')
    await write(anna.page, 0, 'amount', '30')
    await write(anna.page, 0, 'batch', 'monday')
    await anna.page.getByText('it now says “20”. You wrote “30”.').waitFor()
    expect(await axeFindings(anna.page)).toEqual([])
    await ben.page.reload({ waitUntil: 'networkidle' })
    expect(await cell(ben.page, 0, 'amount').innerText()).toBe('20')
    expect(await cell(ben.page, 0, 'batch').innerText()).toBe('monday')

    await anna.page.getByRole('button', { name: 'Keep mine' }).click()
    await says(anna.page, 'Saved')
    // Who comes back to the page sees what others saved.
    await ben.page.evaluate('void window.dispatchEvent(new Event("focus"))')
    await cell(ben.page, 0, 'amount').filter({ hasText: '30' }).waitFor()
    expect([...anna.problems(), ...ben.problems()]).toEqual([])
  })

  it('keeps what is typed when the connection breaks, says so, and saves it when it is back', async () => {
    const { page } = await atSheet(0)
    await page.context().setOffline(true)
    await write(page, 1, 'batch', 'tuesday')
    await says(page, 'Not saved: The server did not answer.')
    expect(await cell(page, 1, 'batch').innerText()).toBe('tuesday')
    await page.context().setOffline(false)
    await says(page, 'Saved')
    await page.reload({ waitUntil: 'networkidle' })
    expect(await cell(page, 1, 'batch').innerText()).toBe('tuesday')
  })

  it('brings a CSV in after a look at it, and gives one out', async () => {
    const { page, problems } = await atSheet(0)
    const content = 'name,kind,amount (mg)\nM1,sample,10.7\nNew 1,blank,\n,blank,1\n'
    await page.setInputFiles('input[type=file]', { name: 'sheet.csv', mimeType: 'text/csv', buffer: Buffer.from(content) })
    await page.getByText('1 new, 1 that change samples').waitFor()
    await page.getByText('Line 4, column name').waitFor()
    expect(await axeFindings(page)).toEqual([])
    await page.getByRole('button', { name: 'Bring in 2 rows' }).click()
    await says(page, 'Saved')
    const download = page.waitForEvent('download')
    await page.getByRole('link', { name: 'CSV out' }).click()
    const stream = await (await download).createReadStream()
    const chunks: Buffer[] = []
    for await (const chunk of stream) chunks.push(Buffer.from(chunk as Uint8Array))
    const lines = Buffer.concat(chunks).toString('utf8').split('\r\n')
    expect(lines[1]).toBe('M1,sample,A,,10.7,mg,,,,1,monday')
    expect(lines.at(-2)).toBe('New 1,solvent blank,,,,,,,,,')
    expect(problems()).toEqual([])
  })
})
