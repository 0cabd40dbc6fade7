/** `npx tsx --tsconfig .nuxt/tsconfig.server.json tests/bench/componentsPage.ts [samples] [features]`: principal components in Chromium, from the choice to the drawing. Needs a build. */
import { rmSync } from 'node:fs'
import { addBenchStudy } from '../support/benchStudy'
import { launchBrowser } from '../support/browser'
import { startBuiltServer } from '../support/builtServer'
import { openBench, signInPage } from '../support/openBench'
import { seededRandom } from '../support/seededRandom'
import { shareOf } from './measure'
import { traceFrames } from './traceFrames'

const samples = Number(process.argv[2] ?? 100)
const features = Number(process.argv[3] ?? 50_000)

/** Runs in the page: notes the longest wait between two frames. */
const WATCH_FRAMES = `window.longestFrameMs = 0; (function look(before) {
  requestAnimationFrame(now => { window.longestFrameMs = Math.max(window.longestFrameMs, now - before); look(now) })
})(performance.now())`

async function run() {
  // Two of them are blanks.
  const study = await addBenchStudy(features, { perSide: (samples - 2) / 2 })
  const server = await startBuiltServer({ folder: study.folder, env: { NUXT_SESSION_COOKIE_SECURE: 'false' } })
  const browser = await launchBrowser()
  try {
    const page = await (await browser.newContext({ viewport: { width: 1440, height: 900 } })).newPage()
    await signInPage(page, server.url, 'analyst')
    await openBench(page, server.url, study, '?plot=components&with=blank')
    const part = page.getByRole('region', { name: 'Principal components' })
    const basis = (text: RegExp) => part.getByText(text).waitFor({ timeout: 120_000 })
    await basis(new RegExp(`in ${samples} samples`))
    await page.evaluate(WATCH_FRAMES)
    console.log(`Principal components of ${samples} samples × ${features} features in Chromium, the worker warm; the longest frame meanwhile`)
    for (const [scaling, words] of [['unitVariance', /unit variance: every/], ['pareto', /Pareto scaled/], ['none', /not scaled/]] as const) {
      await page.evaluate('window.longestFrameMs = 0')
      const start = performance.now()
      await part.getByLabel('Scaling').selectOption(scaling)
      await basis(words)
      console.log(`  ${scaling}: ${((performance.now() - start) / 1000).toFixed(2)} s, ${Math.round(await page.evaluate<number>('window.longestFrameMs'))} ms`)
    }
    const box = await part.locator('figure canvas').last().boundingBox()
    if (!box) throw new Error('No loadings are drawn.')
    const { uniform } = seededRandom(5)
    const { milliseconds, busy } = await traceFrames(browser, page, async () => {
      for (let way = 0; way < 12; way++) await page.mouse.move(box.x + box.width * (0.2 + 0.7 * uniform()), box.y + box.height * (0.1 + 0.7 * uniform()), { steps: 40 })
    })
    console.log(`  hovering over the loadings: 95 % of ${milliseconds.length} frames within ${shareOf(milliseconds, 0.95).toFixed(1)} ms, longest ${Math.max(...milliseconds).toFixed(1)} ms; computed a frame: 95 % within ${shareOf(busy, 0.95).toFixed(1)} ms`)
  }
  finally {
    await browser.close()
    await server.stop()
    rmSync(study.folder, { recursive: true, force: true })
  }
}

run().catch((error: unknown) => {
  console.error(error)
  process.exitCode = 1
})
