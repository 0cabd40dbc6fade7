import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { Browser } from 'playwright-core'
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest'
import { openDatabase } from '../../server/db/open'
import { people } from '../../server/db/schema'
import { Jobs } from '../../server/jobs/runner'
import { axeFindings } from '../support/axe'
import { launchBrowser } from '../support/browser'
import { startBuiltServer, type BuiltServer } from '../support/builtServer'
import { addTestPerson, addTestStudy, migrations } from '../support/laboratory'
import { TEST_PASSWORD, testPasswordHash } from '../support/signIn'
import { simulate } from '../support/simulate'
import { addTestTable } from '../support/testTable'
import { watchedPage, type WatchedPage, type WatchedPageOptions } from '../support/watchedPage'

const folder = mkdtempSync(join(tmpdir(), 'steelyard-alignment-'))
let server: BuiltServer
let browser: Browser
let studyPath: string
const signInNames: Record<'analyst' | 'student', string> = { analyst: '', student: '' }
const open: WatchedPage[] = []

beforeAll(async () => {
  const database = await openDatabase(folder, 'lab', migrations)
  const laboratory = { ...database, folder, jobs: new Jobs({ db: database.db, folder }, {}, {}) }
  const analyst = addTestPerson(laboratory, 'analyst')
  signInNames.analyst = analyst.signInName
  signInNames.student = addTestPerson(laboratory, 'student').signInName
  database.db.update(people).set({ passwordHash: await testPasswordHash() }).run()
  const { id } = addTestStudy(laboratory, analyst)
  simulate({ tables: 6, compounds: 800, seed: 21 }).tables.forEach((table, position) => {
    addTestTable(laboratory, id, analyst.id, { mz: table.mz, minutes: table.retentionMinutes, intensity: table.intensity }, { name: `bottle ${position + 1}`, runOrder: position + 1 })
  })
  studyPath = `/studies/${id}`
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

async function atAlignments(role: 'analyst' | 'student', options?: WatchedPageOptions): Promise<WatchedPage> {
  const watched = await watchedPage(browser, options)
  open.push(watched)
  const { page } = watched
  await page.goto(`${server.url}/sign-in`, { waitUntil: 'networkidle' })
  await page.getByLabel('Sign-in name').fill(signInNames[role])
  await page.getByLabel('Password', { exact: true }).fill(TEST_PASSWORD)
  await page.getByRole('button', { name: 'Sign in' }).click()
  await page.waitForURL(`${server.url}/`)
  await page.goto(`${server.url}${studyPath}/alignments`, { waitUntil: 'networkidle' })
  return watched
}
const onResult = (address: URL) => /\/alignments\/[\w-]{22}$/.test(address.pathname)

describe('the pages of alignments', () => {
  it('align, show what was done in drawings and words, and run again with what differs', async () => {
    const watched = await atAlignments('analyst')
    const { page } = watched
    await page.getByText('6 tables stand ready').waitFor()
    expect(await axeFindings(page)).toEqual([])
    await page.getByRole('button', { name: 'Align 6 tables' }).click()
    await page.waitForURL(onResult)
    await page.getByText('The times of 6 of 6 tables were corrected.').waitFor()
    expect(await page.getByText('was left. Times were corrected by a curve').count()).toBe(5)
    await page.getByRole('button', { name: 'Show as table' }).first().click()
    await page.waitForLoadState('networkidle')
    expect(await axeFindings(page)).toEqual([])

    await page.getByRole('link', { name: 'Run again with other settings' }).click()
    await page.getByLabel('Time tolerance').fill('0,03')
    await page.getByText('within 0.03 min of their common centre').waitFor()
    await page.getByText('Time tolerance 0.03 min (before: time tolerance 0.1 min).').waitFor()
    expect(await page.getByText('scatter make one-sided features by themselves').count()).toBe(1)
    expect(await axeFindings(page)).toEqual([])
    await page.getByRole('button', { name: 'Align 6 tables' }).click()
    await page.waitForURL(onResult)
    await page.getByRole('heading', { name: 'Alignment 2' }).waitFor()
    // For a moment the form that was left is there too, and says the same in its list.
    await page.getByRole('list', { name: 'What differs from the run before' }).getByText('Time tolerance 0.03 min (before: time tolerance 0.1 min).').waitFor()
    expect(watched.problems()).toEqual([])
  })

  it('hold back a form with what is no number, and say what the server refuses beside its field', async () => {
    const watched = await atAlignments('analyst')
    const { page } = watched
    await page.getByLabel('Mass tolerance', { exact: true }).fill('ten')
    await page.getByRole('button', { name: 'Align 6 tables' }).click()
    await page.getByText('Not a number.').waitFor()
    expect(watched.problems()).toEqual([])
    watched.expectResponse({ status: 400, path: `/api${studyPath}/alignments` })
    await page.getByLabel('Mass tolerance', { exact: true }).fill('2000')
    await page.getByRole('button', { name: 'Align 6 tables' }).click()
    await page.getByText('At most 200 ppm.').waitFor()
    expect(watched.problems()).toEqual([])
  })

  it('let a student practise on a narrow screen, for their eyes alone', async () => {
    const watched = await atAlignments('student', { width: 390, scheme: 'dark' })
    const { page } = watched
    expect(await page.getByRole('button', { name: 'Align 6 tables' }).count()).toBe(0)
    await page.getByRole('button', { name: 'Practise aligning 6 tables' }).click()
    await page.waitForURL(onResult)
    await page.getByText('practice, seen by you alone').waitFor()
    await page.waitForLoadState('networkidle')
    expect(await axeFindings(page)).toEqual([])
    expect(await page.evaluate('document.documentElement.scrollWidth <= document.documentElement.clientWidth')).toBe(true)
    expect(await (await atAlignments('analyst')).page.getByText('practice, seen').count()).toBe(0)
    await page.getByRole('button', { name: 'Delete this practice run' }).click()
    await page.getByRole('button', { name: 'Delete it' }).click()
    await page.waitForURL(`${server.url}${studyPath}/alignments`)
    await page.getByText('6 tables stand ready').waitFor()
    expect(await page.getByText('practice, seen').count()).toBe(0)
    expect(watched.problems()).toEqual([])
  })
})
