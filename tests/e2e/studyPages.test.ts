import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { openDatabase } from '../../server/db/open'
import { people } from '../../server/db/schema'
import { Jobs } from '../../server/jobs/runner'
import { axeFindings } from '../support/axe'
import { launchBrowser } from '../support/browser'
import { startBuiltServer, type BuiltServer } from '../support/builtServer'
import { addTestPerson, migrations } from '../support/laboratory'
import { TEST_PASSWORD, testPasswordHash } from '../support/signIn'
import { watchedPage, type WatchedPage } from '../support/watchedPage'

const folder = mkdtempSync(join(tmpdir(), 'steelyard-studies-'))
let server: BuiltServer
let browser: Browser
const person = { lead: '', student: '' }

beforeAll(async () => {
  const database = await openDatabase(folder, 'lab', migrations)
  const laboratory = { ...database, folder, jobs: new Jobs({ db: database.db, folder }, {}, {}) }
  person.lead = addTestPerson(laboratory, 'analyst', 'labLead').signInName
  person.student = addTestPerson(laboratory, 'student').signInName
  database.db.update(people).set({ passwordHash: await testPasswordHash() }).run()
  database.close()
  server = await startBuiltServer({ folder, env: { NUXT_SESSION_COOKIE_SECURE: 'false' } })
  browser = await launchBrowser()
})
afterAll(async () => {
  await browser?.close()
  await server?.stop()
  rmSync(folder, { recursive: true, force: true })
})

async function signedIn(signInName: string): Promise<WatchedPage> {
  const watched = await watchedPage(browser)
  const { page } = watched
  await page.goto(`${server.url}/sign-in`, { waitUntil: 'networkidle' })
  await page.getByLabel('Sign-in name').fill(signInName)
  await page.getByLabel('Password', { exact: true }).fill(TEST_PASSWORD)
  await page.getByRole('button', { name: 'Sign in' }).click()
  await page.waitForURL(`${server.url}/`)
  return watched
}

describe('the pages of a study', () => {
  it('lead from an empty laboratory to a restricted study with its method and members', async () => {
    const { page, problems, expectResponse, close } = await signedIn(person.lead)
    await page.getByRole('heading', { name: 'No studies yet' }).waitFor()
    expect(await axeFindings(page)).toEqual([])
    await page.getByRole('link', { name: 'Make the first study' }).click()

    await page.getByLabel('Title').fill('Two juices')
    await page.getByLabel('Name of the method').fill('C18')
    await page.getByRole('button', { name: 'Add a window' }).click()
    await page.getByLabel('To', { exact: true }).fill('0,8')
    expectResponse({ status: 400, path: '/api/studies' })
    await page.getByRole('button', { name: 'Make the study' }).click()
    await page.getByText('Choose negative or positive.').waitFor()
    expect(await axeFindings(page)).toEqual([])
    await page.getByLabel('Polarity').selectOption('negative')
    await page.getByLabel('Restricted').check()
    await page.getByRole('button', { name: 'Make the study' }).click()

    await page.getByRole('heading', { name: 'Describe the samples' }).waitFor()
    expect(await axeFindings(page)).toEqual([])
    await page.getByRole('link', { name: 'Edit' }).click()
    await page.getByLabel('Question').fill('What differs?')
    expect(await axeFindings(page)).toEqual([])
    await page.getByRole('button', { name: 'Save' }).click()
    await page.getByText('What differs?').waitFor()
    const address = page.url()

    const stranger = await signedIn(person.student)
    stranger.expectResponse({ status: 404, path: '/studies/' })
    await stranger.page.goto(address, { waitUntil: 'networkidle' })
    await stranger.page.getByRole('heading', { name: 'Nothing here' }).waitFor()
    await page.getByLabel('Add a member').selectOption({ index: 1 })
    await page.getByRole('button', { name: 'Add', exact: true }).click()
    await page.getByText('student').first().waitFor()
    await stranger.page.goto(`${server.url}/`, { waitUntil: 'networkidle' })
    await stranger.page.getByRole('link', { name: 'Two juices' }).click()
    await stranger.page.getByRole('heading', { name: 'No samples yet' }).waitFor()
    expect(await axeFindings(stranger.page)).toEqual([])
    expect(stranger.problems()).toEqual([])
    await stranger.close()

    await page.getByRole('link', { name: 'Methods' }).click()
    await page.getByText('0 to 0.8 min').waitFor()
    await page.getByRole('button', { name: 'Edit C18' }).click()
    await page.getByText('A study uses this method: Two juices.').waitFor()
    expect(await axeFindings(page)).toEqual([])

    await page.goto(address, { waitUntil: 'networkidle' })
    await page.getByRole('button', { name: 'Archive' }).click()
    await page.getByRole('button', { name: 'Archive it' }).click()
    await page.getByText('it can be read, not changed').waitFor()
    await page.getByRole('link', { name: 'Studies', exact: true }).click()
    await page.getByLabel('Show archived (1)').check()
    await page.getByRole('link', { name: 'Two juices' }).waitFor()
    expect(await axeFindings(page)).toEqual([])
    expect(problems()).toEqual([])
    await close()
  })
})
