import axe, { type AxeResults } from 'axe-core'
import type { Page } from 'playwright-core'

/** What axe finds on the page as it stands, under its real content policy: a line a finding with the elements it speaks of. */
export async function axeFindings(page: Page): Promise<string[]> {
  await page.evaluate(axe.source)
  const results = await page.evaluate<AxeResults>('axe.run()')
  return results.violations.flatMap(({ id, help, nodes }) => nodes.map(node => `${id}: ${help} — ${node.html.slice(0, 160)}${node.any[0] ? ` — ${node.any[0].message}` : ''}`))
}
