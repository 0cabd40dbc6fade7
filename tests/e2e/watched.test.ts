import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { launchBrowser } from '../support/browser'
import { startBuiltServer, type BuiltServer } from '../support/builtServer'
import { watchedPage, type WatchedPage } from '../support/watchedPage'

let server: BuiltServer
let browser: Browser
beforeAll(async () => {
  server = await startBuiltServer()
  browser = await launchBrowser()
})
afterAll(async () => {
  await browser?.close()
  await server?.stop()
})

async function watched(act: (watched: WatchedPage) => Promise<void>): Promise<string[]> {
  const one = await watchedPage(browser)
  try {
    await act(one)
    return one.problems()
  }
  finally {
    await one.close()
  }
}
const open = (page: WatchedPage['page'], path: string) => page.goto(server.url + path, { waitUntil: 'networkidle' })

describe('a watched page', () => {
  it('has nothing to say of the sign-in page', async () => {
    expect(await watched(async ({ page }) => void await open(page, '/sign-in'))).toEqual([])
  })

  it('reports a hydration mismatch', async () => {
    const problems = await watched(async ({ page }) => {
      await page.route('**/sign-in', async (route) => {
        const response = await route.fetch()
        const html = await response.text()
        expect(html).toMatch(/<label[^>]*>Password</)
        await route.fulfill({ response, body: html.replace(/(<label[^>]*>)Password</, '$1Something else<') })
      })
      await open(page, '/sign-in')
      expect(await page.getByText('Something else').count()).toBe(0)
    })
    expect(problems).toEqual(['console error: Hydration completed but contains mismatches.'])
  })

  it('reports an uncaught error and a refused script', async () => {
    const problems = await watched(async ({ page }) => {
      await open(page, '/sign-in')
      await page.evaluate(`
        setTimeout(() => { throw new Error('on purpose') })
        document.body.insertAdjacentHTML('beforeend', '<button onclick="alert(1)">x</button>')
        document.body.lastElementChild.click()
      `)
      await page.waitForTimeout(100)
    })
    expect(problems.some(problem => problem === 'uncaught: on purpose')).toBe(true)
    expect(problems.some(problem => problem.includes('content policy: script-src-attr'))).toBe(true)
  })

  it('reports a response of 400 and above, unless it was meant, and one that was meant and did not come', async () => {
    const address = '/api/nothing-here'
    const ask = (page: WatchedPage['page']) => page.evaluate(path => fetch(path).then(response => response.status), address)
    const unmeant = await watched(async ({ page }) => {
      await open(page, '/sign-in')
      await ask(page)
    })
    expect(unmeant.some(problem => problem === `response 404: ${address}`)).toBe(true)
    const meant = await watched(async ({ page, expectResponse }) => {
      await open(page, '/sign-in')
      expectResponse({ status: 404, path: address })
      await ask(page)
    })
    expect(meant).toEqual([])
    const missed = await watched(async ({ page, expectResponse }) => {
      await open(page, '/sign-in')
      expectResponse({ status: 404, path: address })
    })
    expect(missed).toEqual([`expected 404 of ${address}, but it did not come`])
  })
})
