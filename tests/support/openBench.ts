import type { Page } from 'playwright-core'
import type { BenchStudy } from './benchStudy'
import { signInCookie } from './signIn'

/** Signs the page's context in over HTTP. */
export async function signInPage(page: Page, url: string, signInName: string): Promise<void> {
  const cookies = (await signInCookie(url, signInName)).split('; ').map((pair) => {
    const at = pair.indexOf('=')
    return { name: pair.slice(0, at), value: pair.slice(at + 1), url }
  })
  await page.context().addCookies(cookies)
}

/** Opens the bench of a study and waits until its rows and its plot stand; gives the milliseconds until each. */
export async function openBench(page: Page, url: string, { path }: BenchStudy, query = ''): Promise<{ rowsMs: number, plotMs: number }> {
  const start = performance.now()
  await page.goto(url + path + query, { waitUntil: 'commit' })
  await page.locator('[role=grid] [role=row][aria-selected]').first().waitFor()
  const rowsMs = performance.now() - start
  await page.locator('figure canvas').first().waitFor()
  return { rowsMs, plotMs: performance.now() - start }
}

/** What the address of a page asks for. */
export const queryOf = (page: Page): Record<string, string> => Object.fromEntries(new URL(page.url()).searchParams)

/** Looks at what is in view: rows that have no text, and pixels of the frame that no row covers. Runs in the page. */
export const BLANKS_IN_VIEW = `(() => {
  const grid = document.querySelector('[role=grid]')
  const frame = grid.getBoundingClientRect()
  const rows = [...grid.querySelectorAll('[role=row][aria-selected]')]
  const boxes = rows.map(row => row.getBoundingClientRect()).sort((one, other) => one.top - other.top)
  const empty = rows.filter(row => row.textContent.trim() === '').length
  const top = frame.top + 34
  const bottom = frame.top + grid.clientHeight - 2
  let covered = top
  for (const box of boxes) if (box.top <= covered + 2) covered = Math.max(covered, box.bottom)
  return empty + (covered < bottom ? 1 : 0)
})()`
