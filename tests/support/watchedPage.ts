import type { Browser, Page } from 'playwright-core'

/** A response that a test means to get: its status, and what its address (path and query) begins with. */
export interface ExpectedResponse { status: number, path: string }

export interface WatchedPage {
  page: Page
  /** Everything that went wrong on the page so far, a line each: a test ends with `expect(watched.problems()).toEqual([])`. */
  problems: () => string[]
  /** The next responses like this one are no problem; that none came is one. */
  expectResponse: (expected: ExpectedResponse) => void
  close: () => Promise<void>
}

export interface WatchedPageOptions {
  width?: number
  height?: number
  scheme?: 'light' | 'dark'
}

/** Runs in the page. */
const REPORT_VIOLATIONS = `document.addEventListener('securitypolicyviolation', event =>
  console.error('content policy: ' + event.violatedDirective + ' refused ' + event.blockedURI + ' (' + event.sourceFile + ':' + event.lineNumber + ')'))`

/**
 * A page in a context of its own that notes console errors and warnings, uncaught errors, hydration mismatches (Vue reports
 * them as a console error), violations of the content policy, failed requests, and responses of 400 and above.
 */
export async function watchedPage(browser: Browser, { width = 1440, height = 900, scheme = 'light' }: WatchedPageOptions = {}): Promise<WatchedPage> {
  const context = await browser.newContext({ viewport: { width, height }, colorScheme: scheme, reducedMotion: 'reduce' })
  const page = await context.newPage()
  const seen: string[] = []
  const expected: (ExpectedResponse & { came: boolean })[] = []
  const pathOf = (address: string) => address.replace(/^https?:\/\/[^/]+/, '')
  const meant = (address: string, status?: number) => {
    const found = expected.find(one => pathOf(address).startsWith(one.path) && (status === undefined || one.status === status))
    if (found && status !== undefined) found.came = true
    return found !== undefined
  }

  await page.addInitScript({ content: REPORT_VIOLATIONS })
  page.on('console', (message) => {
    if (message.type() !== 'error' && message.type() !== 'warning') return
    // Chromium's own line for a response that the test means to get.
    if (message.text().startsWith('Failed to load resource') && meant(message.location().url)) return
    seen.push(`console ${message.type()}: ${message.text()}`)
  })
  page.on('pageerror', error => seen.push(`uncaught: ${error.message}`))
  page.on('response', (response) => {
    if (response.status() >= 400 && !meant(response.url(), response.status())) seen.push(`response ${response.status()}: ${pathOf(response.url())}`)
  })
  page.on('requestfailed', (request) => {
    // A page that is left lets its open requests go.
    const why = request.failure()?.errorText ?? 'no reason'
    if (why !== 'net::ERR_ABORTED') seen.push(`request failed: ${pathOf(request.url())} (${why})`)
  })

  return {
    page,
    problems: () => [...seen, ...expected.filter(one => !one.came).map(one => `expected ${one.status} of ${one.path}, but it did not come`)],
    expectResponse: one => expected.push({ ...one, came: false }),
    close: () => context.close(),
  }
}
