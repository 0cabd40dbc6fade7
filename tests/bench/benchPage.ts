/**
 * How fast the bench opens and answers with 50,000 features, on the built server in Chromium: `npx tsx --tsconfig
 * .nuxt/tsconfig.server.json tests/bench/benchPage.ts [features]`. Seconds depend on the machine; nothing in CI is timed.
 */
import { rmSync } from 'node:fs'
import type { Page } from 'playwright-core'
import { addBenchStudy } from '../support/benchStudy'
import { launchBrowser } from '../support/browser'
import { startBuiltServer } from '../support/builtServer'
import { openBench, signInPage } from '../support/openBench'

const RUNS = 5
const median = (values: number[]) => values.toSorted((one, other) => one - other)[values.length >> 1] ?? Number.NaN
const print = (what: string, values: number[]) => console.log(`${what.padEnd(44)} ${median(values).toFixed(0).padStart(6)} ms (${values.map(value => value.toFixed(0)).join(', ')})`)

/** Milliseconds until the page has drawn again after an act. */
async function answer(page: Page, act: () => Promise<unknown>, until: string): Promise<number> {
  const start = performance.now()
  await act()
  await page.waitForFunction(until, null, { polling: 'raf' })
  return performance.now() - start
}

const features = Number(process.argv[2] ?? 50_000)
const study = await addBenchStudy(features)
const server = await startBuiltServer({ folder: study.folder, env: { NUXT_SESSION_COOKIE_SECURE: 'false' } })
const browser = await launchBrowser()
try {
  console.log(`The bench with ${features} features, 8 tables; median of ${RUNS}`)
  const times = { rows: [] as number[], plot: [] as number[], key: [] as number[], sort: [] as number[], filter: [] as number[] }
  for (let run = 0; run < RUNS; run++) {
    const page = await (await browser.newContext({ viewport: { width: 1440, height: 900 } })).newPage()
    await signInPage(page, server.url, 'analyst')
    const { rowsMs, plotMs } = await openBench(page, server.url, study)
    times.rows.push(rowsMs)
    times.plot.push(plotMs)
    await page.waitForTimeout(1500)
    await page.locator('[role=grid]').focus()
    times.key.push(await answer(page, () => page.keyboard.press('End'), 'document.querySelector("[aria-selected=true]")'))
    times.sort.push(await answer(page, () => page.getByRole('button', { name: 'log2 B/A' }).click(), 'document.querySelector("[aria-sort]").textContent.includes("log2")'))
    times.filter.push(await answer(page, () => page.locator('[role=grid]').press('1'), 'document.querySelector("button[aria-pressed=true]")'))
    await page.context().close()
  }
  print('opened: first rows', times.rows)
  print('opened: plot drawn', times.plot)
  print('to the last feature by key', times.key)
  print('sorted by ratio', times.sort)
  print('filtered by verdict', times.filter)
}
finally {
  await browser.close()
  await server.stop()
  rmSync(study.folder, { recursive: true, force: true })
}
