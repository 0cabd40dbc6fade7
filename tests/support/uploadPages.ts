import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { Browser } from 'playwright-core'
import { openDatabase } from '../../server/db/open'
import { people, samples } from '../../server/db/schema'
import { launchBrowser } from './browser'
import { startBuiltServer, type BuiltServer } from './builtServer'
import { addTestPerson, addTestStudy, migrations } from './laboratory'
import { signInCookie, TEST_PASSWORD, testPasswordHash } from './signIn'
import { watchedPage, type WatchedPage, type WatchedPageOptions } from './watchedPage'

export interface UploadPages {
  server: BuiltServer
  folder: string
  studyIds: string[]
  /** Headers of a request by the signed-in analyst. */
  headers: () => Promise<Record<string, string>>
  /** A page of a study, signed in; part: its name in the address. */
  at: (studyId: string, part: string, options?: WatchedPageOptions) => Promise<WatchedPage>
  /** After each test: closes its pages. */
  closePages: () => Promise<void>
  close: () => Promise<void>
}

/** A laboratory of its own with an analyst and two studies with samples of these names, on a built server with a browser. */
export async function openUploadPages(sampleNames: string[]): Promise<UploadPages> {
  const folder = mkdtempSync(join(tmpdir(), 'steelyard-uploads-'))
  const database = await openDatabase(folder, 'lab', migrations)
  const { signInName, ...analyst } = addTestPerson(database, 'analyst')
  database.db.update(people).set({ passwordHash: await testPasswordHash() }).run()
  const studyIds = [1, 2].map(() => addTestStudy(database, { signInName, ...analyst }).id)
  for (const studyId of studyIds) for (const [position, name] of sampleNames.entries()) database.db.insert(samples).values({ studyId, name, position }).run()
  database.close()
  const server = await startBuiltServer({ folder, env: { NUXT_SESSION_COOKIE_SECURE: 'false' } })
  const browser: Browser = await launchBrowser()
  const open: WatchedPage[] = []
  return {
    server, folder, studyIds,
    headers: async () => ({ cookie: await signInCookie(server.url, signInName), origin: server.url }),
    async at(studyId, part, options) {
      const watched = await watchedPage(browser, options)
      open.push(watched)
      const { page } = watched
      await page.goto(`${server.url}/sign-in`, { waitUntil: 'networkidle' })
      await page.getByLabel('Sign-in name').fill(signInName)
      await page.getByLabel('Password', { exact: true }).fill(TEST_PASSWORD)
      await page.getByRole('button', { name: 'Sign in' }).click()
      await page.waitForURL(`${server.url}/`)
      await page.goto(`${server.url}/studies/${studyId}/${part}`, { waitUntil: 'networkidle' })
      return watched
    },
    async closePages() {
      await Promise.all(open.splice(0).map(watched => watched.close()))
    },
    async close() {
      await browser.close()
      await server.stop()
      rmSync(folder, { recursive: true, force: true })
    },
  }
}
