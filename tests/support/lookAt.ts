import { mkdirSync } from 'node:fs'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import type { Page } from 'playwright-core'
import { axeFindings } from './axe'

const SCREENS = fileURLToPath(new URL('../../test-results/screens', import.meta.url))

/**
 * What is wrong with the page as it stands, in light and dark and at each width: axe's findings, and content wider than the
 * window. Leaves a picture of each in test-results/screens, and the page wide and light.
 */
export async function lookAt(page: Page, name: string, widths: readonly number[] = [1440, 390, 320]): Promise<string[]> {
  mkdirSync(SCREENS, { recursive: true })
  const wrong: string[] = []
  for (const colorScheme of ['light', 'dark'] as const) {
    await page.emulateMedia({ colorScheme })
    for (const width of widths) {
      await page.setViewportSize({ width, height: 900 })
      // Charts follow the width a moment later.
      await page.waitForTimeout(200)
      const at = `${name}, ${colorScheme}, ${width} px`
      const scrollWidth = await page.evaluate<number>('document.documentElement.scrollWidth')
      if (scrollWidth > width) wrong.push(`${at}: ${scrollWidth} px wide`)
      wrong.push(...(await axeFindings(page)).map(finding => `${at}: ${finding}`))
      await page.screenshot({ path: join(SCREENS, `${name.replaceAll(/\W+/g, '-')}-${width}-${colorScheme}.png`), fullPage: true })
    }
  }
  await page.emulateMedia({ colorScheme: 'light' })
  await page.setViewportSize({ width: 1440, height: 900 })
  return wrong
}
