import type { Browser, Page } from 'playwright-core'

/** What the drawing library alone has: a page without a chart must not send it. */
const CHART_MARK = /echarts|zrender/i

interface Sent { url: string, bytes: number, hasCharts: boolean }

/** The JavaScript that a page is sent while it opens, by what its browser asks for: scripts, module preloads and what they load. */
async function scriptsOf(page: Page, open: () => Promise<unknown>): Promise<Sent[]> {
  const sent: Promise<Sent>[] = []
  const seen = new Set<string>()
  page.on('response', (response) => {
    if (!/javascript/.test(response.headers()['content-type'] ?? '') || seen.has(response.url())) return
    seen.add(response.url())
    sent.push((async () => {
      const body = await response.body()
      const { responseBodySize } = await response.request().sizes()
      return { url: response.url(), bytes: responseBodySize, hasCharts: CHART_MARK.test(body.toString('utf8')) && body.length > 100_000 }
    })())
  })
  await open()
  await page.waitForLoadState('networkidle')
  return Promise.all(sent)
}

/** Prints the JavaScript of the page that people come to first, and where the drawing code is loaded; each in a browser that knows nothing yet. */
export async function benchFirstPage(browser: Browser, url: string, benchPath: string, signIn: (page: Page) => Promise<void>) {
  const visits: { name: string, path: string, signedIn: boolean, most: number | null }[] = [
    { name: 'First page of a visitor (sign in)', path: '/', signedIn: false, most: 250 },
    { name: 'First page of a person (studies)', path: '/', signedIn: true, most: 250 },
    { name: 'A comparison (bench)', path: benchPath, signedIn: true, most: null },
  ]
  for (const { name, path, signedIn, most } of visits) {
    const context = await browser.newContext({ viewport: { width: 1440, height: 900 } })
    const page = await context.newPage()
    if (signedIn) await signIn(page)
    const scripts = await scriptsOf(page, () => page.goto(url + path, { waitUntil: 'load' }))
    const html = await (await page.request.get(url + path)).text()
    const named = new Set([...html.matchAll(/(?:src|href)="(?<path>\/_nuxt\/[^"]+\.js)"/g)].map(({ groups }) => groups?.path))
    const kilobytes = scripts.reduce((sum, script) => sum + script.bytes, 0) / 1000
    console.log(`${name.padEnd(36)} ${kilobytes.toFixed(0).padStart(4)} kB of JavaScript as sent, ${scripts.length} files, ${scripts.filter(script => named.has(new URL(script.url).pathname)).length} of them named in its HTML; `
      + `drawing code: ${scripts.some(script => script.hasCharts) ? 'yes' : 'no'}${most === null ? '' : `; at most ${most} kB: ${kilobytes < most ? 'kept' : 'NOT kept'}`}`)
    await context.close()
  }
}
