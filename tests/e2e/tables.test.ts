import { readdirSync, readFileSync } from 'node:fs'
import { request as httpRequest } from 'node:http'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest'
import { MAX_TABLE_BYTES } from '../../shared/schemas/table'
import type { StudyTables } from '../../shared/types/table'
import { axeFindings } from '../support/axe'
import { openUploadPages, type UploadPages } from '../support/uploadPages'
import type { WatchedPage, WatchedPageOptions } from '../support/watchedPage'

const reference = (name: string) => fileURLToPath(new URL(`../reference/data/tables/${name}`, import.meta.url))
let pages: UploadPages

beforeAll(async () => {
  pages = await openUploadPages(['Plain', 'Press A1', 'Press A2', 'Carton B1', 'Carton B2'])
})
afterEach(() => pages.closePages())
afterAll(() => pages?.close())

const atTables = (studyId: string, options?: WatchedPageOptions) => pages.at(studyId, 'tables', options)

/** With STEELYARD_SHOTS set to a folder, what the page looks like is kept there. */
async function look({ page }: WatchedPage, name: string) {
  const shots = process.env.STEELYARD_SHOTS
  if (shots) await page.screenshot({ path: join(shots, `tables-${name}.png`), fullPage: true })
}

describe('the page of tables', () => {
  it('takes many files at once, asks what is ambiguous, lists what was refused', async () => {
    const watched = await atTables(pages.studyIds[0] ?? '')
    const { page } = watched
    await page.getByText('No feature tables yet').waitFor()
    expect(await axeFindings(page)).toEqual([])
    await look(watched, '1-empty')
    await page.getByRole('region', { name: 'Add feature tables' }).locator('input').setInputFiles(['plain.csv', 'seven-bad-rows.csv', 'wide-four-samples.csv', 'ambiguous-thousands.csv', 'no-mass-column.csv', 'not-a-table.csv', 'empty.csv'].map(reference))
    await page.getByText('2 files wait for your answer').waitFor()
    await page.getByText('This is not a text table').waitFor()
    await page.getByText('Not sent: the file is empty.').waitFor()
    await page.getByText('0 on their way, 0 being read, 2 waiting for an answer, 6 read').waitFor({ state: 'attached' })
    expect(await page.getByLabel('Sample of plain.csv').locator('option:checked').textContent()).toBe('Plain')
    expect(await page.getByLabel('Sample of Press A2 in wide-four-samples.csv').locator('option:checked').textContent()).toBe('Press A2')
    await look(watched, '2-mixed')
    expect(await axeFindings(page)).toEqual([])

    await page.getByRole('button', { name: '7 refused rows of seven-bad-rows.csv' }).click()
    await page.getByRole('cell', { name: 'not a number' }).first().waitFor()
    await look(watched, '3-refused')
    expect(await axeFindings(page)).toEqual([])
    await page.keyboard.press('Escape')

    const card = page.getByRole('article').filter({ hasText: 'ambiguous-thousands.csv' })
    expect(await card.getByRole('button', { name: 'Read it like this' }).isDisabled()).toBe(true)
    await card.getByLabel('a thousands mark: 798905').check()
    await card.getByText('Line 2 is read as m/z 103.5935 at 13.412 min, intensity 798905.').waitFor()
    await look(watched, '4-answered')
    await card.getByRole('button', { name: 'Read it like this' }).click()
    await page.getByLabel('Sample of ambiguous-thousands.csv').waitFor()
    await page.getByText('One file waits for your answer').waitFor()
    expect(watched.problems()).toEqual([])
  })

  it('says that content is known, replaces a table and reads one differently, on a narrow dark screen', async () => {
    const watched = await atTables(pages.studyIds[1] ?? '', { width: 390, scheme: 'dark' })
    const { page } = watched
    await page.getByRole('region', { name: 'Add feature tables' }).locator('input').setInputFiles(reference('area-and-height.csv'))
    await page.getByLabel('Sample of area-and-height.csv').waitFor()
    await page.getByRole('region', { name: 'Add feature tables' }).locator('input').setInputFiles(reference('area-and-height.csv'))
    await page.getByText('The study has this content already, as area-and-height.csv.').waitFor()
    await page.getByRole('button', { name: 'More about area-and-height.csv' }).click()
    await page.getByLabel('Peak limit').fill('100,5')
    await page.getByRole('button', { name: 'Save the peak limit' }).click()
    await page.getByText('Saved.').waitFor()
    await page.getByRole('button', { name: 'Read it differently' }).click()
    await page.getByText('Columns and units').click()
    await page.getByLabel('Intensity', { exact: true }).selectOption({ label: '3: Height' })
    await page.getByText('intensity 99738.2.').waitFor()
    await look(watched, '5-differently')
    expect(await axeFindings(page)).toEqual([])
    await page.getByRole('button', { name: 'Read it again like this' }).click()
    await page.getByRole('dialog').waitFor({ state: 'detached' })
    await page.locator('td', { hasText: /^height$/ }).waitFor({ state: 'attached' })
    await page.getByRole('button', { name: 'More about area-and-height.csv' }).click()
    await page.getByText('peak heights').first().waitFor()
    expect(await page.getByLabel('Peak limit').inputValue()).toBe('100.5')
    await page.getByLabel('The file that replaces this table').setInputFiles(reference('plain.csv'))
    await page.getByLabel('Sample of plain.csv').waitFor()
    await page.getByLabel('Sample of area-and-height.csv').waitFor({ state: 'detached' })
    await look(watched, '6-narrow')
    expect(await axeFindings(page)).toEqual([])
    expect(await page.evaluate('document.documentElement.scrollWidth <= innerWidth')).toBe(true)
    expect(watched.problems()).toEqual([])
  })
})

describe('an upload over HTTP', () => {
  const headersOf = async () => ({ ...await pages.headers(), 'content-type': 'application/octet-stream' })
  const path = (name: string) => `/api/studies/${pages.studyIds[1]}/uploads?name=${encodeURIComponent(name)}`
  const incoming = () => readdirSync(join(pages.folder, 'incoming'))

  it('is refused with a sentence where it is announced as too large, and the connection ends', async () => {
    const answer = await new Promise<{ status: number, connection: string | undefined, text: string }>((resolve, reject) => {
      void headersOf().then((headers) => {
        const request = httpRequest(pages.server.url + path('large.csv'), { method: 'POST', headers: { ...headers, 'content-length': MAX_TABLE_BYTES + 1 } }, (response) => {
          let text = ''
          response.on('data', (chunk: Buffer) => text += chunk)
          response.on('end', () => resolve({ status: response.statusCode ?? 0, connection: response.headers.connection, text }))
        })
        request.on('error', reject)
        request.write('m/z')
      })
    })
    expect([answer.status, answer.connection, answer.text]).toEqual([413, 'close', expect.stringContaining('at most 64 MB')])
  })

  it('leaves nothing where it is cut off, and the server goes on', async () => {
    const headers = await headersOf()
    await new Promise<void>((resolve) => {
      const request = httpRequest(pages.server.url + path('cut.csv'), { method: 'POST', headers: { ...headers, 'content-length': 1000 } })
      request.on('error', () => resolve())
      request.write('m/z,RT,Area\n', () => setTimeout(() => request.destroy(), 200))
    })
    await expect.poll(incoming).toEqual([])
    const { uploads } = await (await fetch(`${pages.server.url}/api/studies/${pages.studyIds[1]}/tables`, { headers })).json() as StudyTables
    expect(uploads.filter(upload => upload.fileName === 'cut.csv')).toEqual([])
    expect(pages.server.output()).not.toContain('Uncaught')
  })

  it('keeps a name with any letters, and gives the original back under it, byte for byte', async () => {
    const headers = await headersOf()
    const content = readFileSync(reference('tabs-seconds.tsv'))
    expect((await fetch(pages.server.url + path('Äpfel “1”.tsv'), { method: 'POST', headers, body: Uint8Array.from(content) })).status).toBe(202)
    const find = async () => (await (await fetch(`${pages.server.url}/api/studies/${pages.studyIds[1]}/tables`, { headers })).json() as StudyTables).tables.find(table => table.fileName === 'Äpfel “1”.tsv')
    await expect.poll(find, { timeout: 20_000 }).toBeDefined()
    const original = await fetch(`${pages.server.url}/api/studies/${pages.studyIds[1]}/tables/${(await find())?.id}/original`, { headers })
    expect(original.headers.get('content-disposition')).toContain(`filename*=UTF-8''${encodeURIComponent('Äpfel “1”.tsv')}`)
    expect(Buffer.compare(Buffer.from(await original.arrayBuffer()), content)).toBe(0)
  })
})
