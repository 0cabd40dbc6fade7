import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { comparisonDefaults } from '../../shared/science/verdict/settings'
import type { ComparisonDetail, VersionChanges } from '../../shared/types/comparison'
import { axeFindings } from '../support/axe'
import { launchBrowser } from '../support/browser'
import { startDemoServer, type DemoServer } from '../support/demoServer'
import { watchedPage, type WatchedPage, type WatchedPageOptions } from '../support/watchedPage'

let server: DemoServer
let browser: Browser
let study: string
let bench: string
beforeAll(async () => {
  [server, browser] = await Promise.all([startDemoServer(), launchBrowser()])
  study = `/studies/${server.studyId}`
  bench = `${study}/comparisons/${server.comparisonId}`
})
afterAll(async () => {
  await browser?.close()
  await server?.stop()
})

async function signedIn(who: string, options: WatchedPageOptions = {}): Promise<WatchedPage> {
  const watched = await watchedPage(browser, options)
  const { page } = watched
  await page.goto(`${server.url}/sign-in`, { waitUntil: 'networkidle' })
  await page.getByLabel('Sign-in name').fill(who)
  await page.getByLabel('Password').fill(server.password)
  await page.getByRole('button', { name: 'Sign in' }).click()
  await page.waitForURL(`${server.url}/`)
  return watched
}
const open = ({ page }: WatchedPage, path: string) => page.goto(server.url + path, { waitUntil: 'networkidle' })
/** Counts are written with thin spaces, 1\u202F904; here they are read as digits. */
const asDigits = (text: string) => text.replaceAll('\u202F', '')
const textOf = async ({ page }: WatchedPage) => asDigits(await page.locator('main').innerText())

describe('a scientist', () => {
  it('flags a feature with a reason, filters by flag, and finds it in the list of the study', async () => {
    const watched = await signedIn('scientist')
    const { page } = watched
    await open(watched, `${bench}?feature=5`)
    await page.getByRole('grid', { name: 'Features' }).focus()
    await page.getByRole('heading', { name: 'Flags' }).waitFor()
    await page.keyboard.press('f')
    await page.getByLabel('Kind').selectOption('artefact')
    await page.getByRole('textbox', { name: 'Reason' }).fill('A shoulder of the peak before it.')
    await page.getByRole('button', { name: 'Flag this feature' }).click()
    await page.getByText('Flag set.').waitFor()

    await page.getByRole('button', { name: 'Take back: artefact' }).click()
    await page.getByText('Flag taken back.').waitFor()
    await page.getByRole('button', { name: 'Undo' }).click()
    await page.getByText('Flag set again.').waitFor()
    expect(await axeFindings(page)).toEqual([])

    await page.getByRole('combobox', { name: 'Flags' }).selectOption('artefact')
    await page.getByText(/^1 of /).waitFor()
    await page.waitForURL(/flags=artefact/)

    await open(watched, `${bench}?verdict=onlyB`)
    await page.getByRole('button', { name: /^Flag these \d+$/ }).click()
    await page.getByRole('textbox', { name: 'Reason' }).fill('Asked for one by one.')
    await page.getByRole('button', { name: /^Flag \d+ features$/ }).click()
    await page.getByText(/^\d+ flags set\.$/).waitFor()
    await page.getByRole('button', { name: 'Undo' }).click()
    await page.getByText(/^\d+ flags taken back\.$/).waitFor()

    await open(watched, `${study}/flags`)
    const line = page.getByRole('row').filter({ hasText: 'A shoulder of the peak before it.' })
    expect(await line.innerText()).toContain('Teodor Wray')
    expect(await axeFindings(page)).toEqual([])
    await line.getByRole('link').click()
    await page.waitForURL(/feature=5/)
    await page.getByText('A shoulder of the peak before it.').waitFor()
    expect(watched.problems()).toEqual([])
    await watched.close()
  })
})

describe('a reviewer shares a version', () => {
  it('which a guest reads without signing in, nothing later, until it is withdrawn', async () => {
    const reviewer = await signedIn('reviewer')
    await open(reviewer, `${bench}?version=1`)
    await reviewer.page.getByRole('button', { name: 'Share' }).click()
    await reviewer.page.getByLabel('For whom').fill('the press house')
    await reviewer.page.getByRole('button', { name: 'Make the link' }).click()
    const address = await reviewer.page.getByLabel('Address').inputValue()
    const path = address.replace(server.url, '')

    const { jobId } = await server.ask<{ jobId: string }>('scientist', `/api${bench}/versions`, { method: 'POST', body: { from: 1, settings: { ...comparisonDefaults, reachLimit: 77 } } })
    await expect.poll(async () => (await server.ask<{ status: string }>('scientist', `/api/jobs/${jobId}`)).status, { timeout: 60_000 }).toBe('done')

    for (const options of [{}, { scheme: 'dark', width: 390, height: 844 }] as const) {
      const guest = await watchedPage(browser, options)
      const response = await guest.page.goto(address, { waitUntil: 'networkidle' })
      expect(response?.headers()).toMatchObject({ 'referrer-policy': 'no-referrer', 'cache-control': 'no-store' })
      const text = await textOf(guest)
      expect(text).toContain('Version 1, saved')
      expect(text).toContain('It does not mean absent.')
      expect(text).toContain('features')
      for (const hidden of ['Teodor Wray', 'Maren Oldacre', 'the press house', 'Version 2', '×77', 'Share', 'Verdicts as CSV', 'two apple juices']) expect(text).not.toContain(hidden)
      expect(await axeFindings(guest.page)).toEqual([])
      expect(await guest.page.evaluate('document.documentElement.scrollWidth <= window.innerWidth')).toBe(true)
      expect(guest.problems()).toEqual([])
      await guest.close()
    }

    await open(reviewer, `${study}/share-links`)
    const line = reviewer.page.getByRole('row').filter({ hasText: 'the press house' })
    expect(await line.innerText()).toContain('in force')
    await line.getByRole('button', { name: 'Withdraw' }).click()
    await reviewer.page.getByRole('button', { name: 'Withdraw the link' }).click()
    await line.getByText('withdrawn').waitFor()
    expect(await axeFindings(reviewer.page)).toEqual([])
    expect(reviewer.problems()).toEqual([])
    await reviewer.close()

    const said = await Promise.all([path, `/shared/${'w'.repeat(43)}`].map(async (gone) => {
      const guest = await watchedPage(browser)
      guest.expectResponse({ status: 404, path: gone })
      const response = await open(guest, gone)
      const text = await textOf(guest)
      const api = await (await fetch(`${server.url}/api${gone}`)).text()
      expect(guest.problems()).toEqual([])
      await guest.close()
      return { status: response?.status(), text, api: api.replaceAll(gone, '') }
    }))
    expect(said[0]).toEqual(said[1])
    expect(said[0]?.status).toBe(404)
    expect(server.output()).not.toContain(path.replace('/shared/', ''))
  })
})

describe('a student', () => {
  it('runs again tighter, reads what changed, alone, and deletes it', async () => {
    const watched = await signedIn('student')
    const { page } = watched
    await open(watched, `${study}/alignments?from=${server.alignmentId}`)
    await page.getByLabel('Mass tolerance', { exact: true }).fill('2')
    await page.getByLabel('Time tolerance').fill('0,01')
    await page.getByRole('button', { name: /^Practise aligning/ }).click()
    await page.waitForURL(/\/alignments\/[\w-]{22}$/, { timeout: 120_000 })
    const alignmentId = page.url().split('/').at(-1) ?? ''
    await page.getByRole('heading', { name: 'What would have changed?' }).waitFor()
    expect(await axeFindings(page)).toEqual([])

    await page.getByRole('button', { name: 'Compare and show what changed' }).click()
    await page.waitForURL(/\/changes\?/, { timeout: 120_000 })
    await page.getByRole('heading', { name: 'Features by verdict' }).waitFor()
    const comparisonId = /comparisons\/([\w-]{22})\/changes/.exec(page.url())?.[1] ?? ''
    const changes = await server.ask<VersionChanges>('student', `/api${study}/comparisons/${comparisonId}/changes${new URL(page.url()).search}`)
    expect(changes.before.comparisonId).toBe(server.comparisonId)
    const text = await textOf(watched)
    expect(text).toContain('make one-sided features by themselves')
    expect(text).toContain('practice, seen by you alone')
    const cells = await page.getByRole('row').filter({ hasText: 'unsettled' }).first().getByRole('cell').allInnerTexts()
    expect(cells.slice(0, 2).map(asDigits)).toEqual([String(changes.before.counts.unsettled), String(changes.after.counts.unsettled)])
    expect(changes.onlyAfter).toBeGreaterThan(0)
    expect(text).toContain(`${changes.onlyAfter} feature`)
    expect(await axeFindings(page)).toEqual([])

    for (const who of ['analyst', 'reviewer', 'lead']) {
      for (const gone of [`/api${study}/alignments/${alignmentId}`, `/api${study}/comparisons/${comparisonId}`]) expect(await server.statusFor(who, gone)).toBe(404)
      expect((await server.ask<{ id: string }[]>(who, `/api${study}/comparisons`)).map(line => line.id)).not.toContain(comparisonId)
    }
    const { mayChange } = await server.ask<ComparisonDetail>('student', `/api${bench}`)
    expect(mayChange).toBe(false)

    await open(watched, `${study}/alignments/${alignmentId}`)
    await page.getByRole('button', { name: 'Delete this practice run' }).click()
    await page.getByRole('button', { name: 'Delete it' }).click()
    await page.waitForURL(/\/alignments$/)
    expect(await server.statusFor('student', `/api${study}/comparisons/${comparisonId}`)).toBe(404)
    expect(watched.problems()).toEqual([])
    await watched.close()
  })
})
