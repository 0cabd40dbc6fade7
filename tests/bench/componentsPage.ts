/** `npx tsx --tsconfig .nuxt/tsconfig.server.json tests/bench/componentsPage.ts [samples] [features]`: principal components in Chromium, from the choice to the drawing. Needs a build. */
import { rmSync } from 'node:fs'
import { addBenchStudy } from '../support/benchStudy'
import { launchBrowser } from '../support/browser'
import { startBuiltServer } from '../support/builtServer'
import { openBench, signInPage } from '../support/openBench'

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
