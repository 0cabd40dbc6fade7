import { join } from 'node:path'
import type { Page } from 'playwright-core'
import { axeFindings } from './axe'

const WIDTHS = [1440, 390, 320]

/**
 * What is wrong with the page as it stands, in light and dark and at each width: axe's findings, and content wider than the
 * window. With SCREENSHOTS=folder it also leaves a picture of each.
 */
export async function lookAt(page: Page, name: string): Promise<string[]> {
  const wrong: string[] = []
  for (const colorScheme of ['light', 'dark'] as const) {
    await page.emulateMedia({ colorScheme })
    for (const width of WIDTHS) {
      await page.setViewportSize({ width, height: 900 })
      const at = `${name}, ${colorScheme}, ${width} px`
      const scrollWidth = await page.evaluate<number>('document.documentElement.scrollWidth')
      if (scrollWidth > width) wrong.push(`${at}: ${scrollWidth} px wide`)
      wrong.push(...(await axeFindings(page)).map(finding => `${at}: ${finding}`))
      if (process.env.SCREENSHOTS) await page.screenshot({ path: join(process.env.SCREENSHOTS, `${name.replaceAll(/\W+/g, '-')}-${colorScheme}-${width}.png`), fullPage: true })
    }
  }
  await page.emulateMedia({ colorScheme: 'light' })
  await page.setViewportSize({ width: 1440, height: 900 })
  return wrong
}
