import { rmSync } from 'node:fs'
import { loadavg } from 'node:os'
import type { Browser, Page } from 'playwright-core'
import { addBenchStudy } from '../support/benchStudy'
import { launchBrowser } from '../support/browser'
import { startBuiltServer } from '../support/builtServer'
import { openBench, signInPage } from '../support/openBench'
import { seededRandom } from '../support/seededRandom'
import { benchFirstPage } from './firstPage'
import { shareOf } from './measure'
import { traceFrames, type Frames } from './traceFrames'

const FEATURES = 50_000

function tell(name: string, { milliseconds, busy }: Frames) {
  const share95 = shareOf(milliseconds, 0.95)
  const longest = Math.max(...milliseconds)
  const late = milliseconds.filter(each => each > 32).length
  console.log(`${name.padEnd(36)} ${String(milliseconds.length).padStart(5)} frames: median ${shareOf(milliseconds, 0.5).toFixed(1)} ms, 95 % within ${share95.toFixed(1)} ms (at most 32), longest ${longest.toFixed(1)} ms (at most 100), `
    + `${late} over 32 ms: ${share95 < 32 && longest < 100 ? 'kept' : 'NOT kept'}; computed a frame: 95 % within ${shareOf(busy, 0.95).toFixed(1)} ms, most ${Math.max(...busy).toFixed(1)} ms`)
}

/** Over the plot, on a way that passes thousands of marks. */
async function hoverOverPlot(page: Page) {
  const box = await page.locator('figure canvas').first().boundingBox()
  if (!box) throw new Error('No plot is drawn.')
  const { uniform } = seededRandom(3)
  for (let way = 0; way < 12; way++) await page.mouse.move(box.x + box.width * (0.05 + 0.9 * uniform()), box.y + box.height * (0.1 + 0.7 * uniform()), { steps: 40 })
}

/** A person turns the wheel some forty times, slowly and fast, and drags far. */
async function turnWheel(page: Page, distances: readonly number[]) {
  for (const distance of distances) {
    for (let turn = 0; turn < 15; turn++) {
      await page.mouse.wheel(0, distance)
      await page.waitForTimeout(16)
    }
  }
}

async function benchOf(browser: Browser, page: Page) {
  tell('Hovering over the plot', await traceFrames(browser, page, () => hoverOverPlot(page)))
  await page.locator('[role=grid]').scrollIntoViewIfNeeded()
  await page.locator('[role=grid]').hover()
  tell('Scrolling the table', await traceFrames(browser, page, () => turnWheel(page, [60, 240, 2000, 40_000, -9000, -200])))
  const grid = await page.locator('[role=grid]').boundingBox()
  await page.mouse.move(8, (grid?.y ?? 0) > 100 ? 50 : 100)
  tell('Scrolling the page, plot and table', await traceFrames(browser, page, () => turnWheel(page, [-120, 120, -300, 300])))
  await page.locator('[role=grid]').focus()
  tell('Selecting by key, 60 features', await traceFrames(browser, page, async () => {
    for (let step = 0; step < 60; step++) {
      await page.keyboard.press('ArrowDown')
      await page.waitForTimeout(16)
    }
  }))
}

/** Frame times of the bench with 50,000 features, and the JavaScript that pages are sent; on the built server in Chromium. */
export async function benchFrames() {
  const study = await addBenchStudy(FEATURES)
  const server = await startBuiltServer({ folder: study.folder, env: { NUXT_SESSION_COOKIE_SECURE: 'false' } })
  const browser = await launchBrowser()
  try {
    await benchFirstPage(browser, server.url, study.path, page => signInPage(page, server.url, 'analyst'))
    const page = await (await browser.newContext({ viewport: { width: 1440, height: 900 } })).newPage()
    await signInPage(page, server.url, 'analyst')
    await openBench(page, server.url, study, '?feature=12')
    await page.getByText('Values per sample').waitFor()
    await page.waitForTimeout(2000)
    console.log(`Frame times with ${FEATURES} features; the machine's load is ${loadavg().map(load => load.toFixed(1)).join(', ')}`)
    await benchOf(browser, page)
  }
  finally {
    await browser.close()
    await server.stop()
    rmSync(study.folder, { recursive: true, force: true })
  }
}
