import { rmSync } from 'node:fs'
import type { Page } from 'playwright-core'
import { expect } from 'vitest'
import { addBenchStudy } from './benchStudy'
import { launchBrowser } from './browser'
import { startBuiltServer } from './builtServer'
import { openBench, signInPage } from './openBench'
import { watchedPage, type WatchedPageOptions } from './watchedPage'

export interface BenchPages {
  /** Address of the server, and of the bench on it. */
  url: string
  address: string
  /** Acts on the bench, opened with a query by one who may sign in; the page must have nothing to report. */
  onBench: (query: string, act: (page: Page) => Promise<void>, options?: WatchedPageOptions & { signInName?: 'analyst' | 'student' }) => Promise<void>
  close: () => Promise<void>
}

/** A laboratory of its own with the bench of so many invented features, on a built server with a browser. */
export async function openBenchPages(features: number): Promise<BenchPages> {
  const browser = await launchBrowser()
  const study = await addBenchStudy(features)
  const server = await startBuiltServer({ folder: study.folder, env: { NUXT_SESSION_COOKIE_SECURE: 'false' } })
  return {
    url: server.url,
    address: server.url + study.path,
    async onBench(query, act, { signInName = 'analyst', ...options } = {}) {
      const watched = await watchedPage(browser, options)
      try {
        await signInPage(watched.page, server.url, signInName)
        await openBench(watched.page, server.url, study, query)
        await act(watched.page)
        expect(watched.problems()).toEqual([])
      }
      finally {
        await watched.close()
      }
    },
    async close() {
      await browser.close()
      await server.stop()
      rmSync(study.folder, { recursive: true, force: true })
    },
  }
}
