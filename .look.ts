import { mkdtempSync, readFileSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { eq } from 'drizzle-orm'
import { openDatabase } from './server/db/open'
import { people, samples, studies } from './server/db/schema'
import { launchBrowser } from './tests/support/browser'
import { startBuiltServer } from './tests/support/builtServer'
import { addTestPerson, addTestStudy, migrations } from './tests/support/laboratory'
import { TEST_PASSWORD, testPasswordHash } from './tests/support/signIn'
import { watchedPage } from './tests/support/watchedPage'
import axe from 'axe-core'
const ref = (n: string) => './tests/reference/data/tables/' + n
async function main() {
  const folder = mkdtempSync(join(tmpdir(), 'steelyard-look-'))
  const open = await openDatabase(folder, 'lab', migrations)
  const person = addTestPerson(open, 'analyst')
  const study = addTestStudy(open, person)
  open.db.update(studies).set({ title: 'Two apple juices', question: 'What does the pressed juice hold that the carton lacks?' }).where(eq(studies.id, study.id)).run()
  for (const [k, name] of ['plain', 'Press A1', 'Press A2', 'Carton B1', 'Carton B2'].entries()) open.db.insert(samples).values({ studyId: study.id, name, position: k }).run()
  open.db.update(people).set({ passwordHash: await testPasswordHash(), name: 'Ada Test' }).run()
  open.close()
  const server = await startBuiltServer({ folder, env: { NUXT_SESSION_COOKIE_SECURE: 'false' } })
  const browser = await launchBrowser()
  for (const [width, scheme] of [[1440, 'light'], [390, 'dark']] as const) {
    const w = await watchedPage(browser, { width, height: 1000, scheme })
    const { page } = w
    const shot = async (name: string) => {
      await page.waitForTimeout(300)
      await page.screenshot({ path: `/tmp/wt-tables-shots/${width}-${name}.png`, fullPage: true })
      await page.evaluate(axe.source)
      const r = await page.evaluate('axe.run()') as { violations: { id: string, nodes: { html: string }[] }[] }
      console.log(width, name, r.violations.map(v => `${v.id}: ${v.nodes.map(n => n.html.slice(0, 160)).join(' | ')}`), 'overflow', await page.evaluate('document.documentElement.scrollWidth - innerWidth'))
    }
    await page.goto(server.url + '/sign-in', { waitUntil: 'networkidle' })
    await page.getByLabel(/name/i).first().fill(person.signInName)
    await page.getByLabel('Password').fill(TEST_PASSWORD)
    await page.getByRole('button', { name: 'Sign in' }).click()
    await page.waitForTimeout(1500)
    await page.goto(`${server.url}/studies/${study.id}/tables`, { waitUntil: 'networkidle' })
    if (width === 1440) {
      await shot('1-empty')
      await page.setInputFiles('input[type=file]', ['plain.csv', 'seven-bad-rows.csv', 'wide-four-samples.csv', 'ambiguous-thousands.csv', 'no-mass-column.csv', 'not-a-table.csv', 'seconds-without-a-word.csv', 'empty.csv'].map(ref))
      await page.waitForTimeout(6000)
    }
    await shot('2-mixed')
    if (width === 1440) {
      await page.getByRole('button', { name: /refused rows of/ }).first().click()
      await shot('3-refused')
      await page.keyboard.press('Escape')
    }
    await page.getByRole('button', { name: /^More about/ }).first().click()
    await page.getByRole('button', { name: 'Read it differently' }).click()
    await page.waitForTimeout(800)
    await page.getByRole('dialog').getByText('Columns and units').click()
    await shot('4-details')
    await page.keyboard.press('Escape')
    if (width === 1440) {
      await page.getByLabel(/a thousands mark/).check()
      await shot('5-answered')
      await page.getByLabel(/a thousands mark/).locator('xpath=ancestor::form').getByRole('button', { name: 'Read it like this' }).click()
      await page.waitForTimeout(4000)
      await shot('6-after')
    }
    console.log(width, w.problems())
    await w.close()
  }
  writeFileSync('/tmp/wt-tables-shots/log.txt', server.output())
  await browser.close()
  await server.stop()
}
void main()
