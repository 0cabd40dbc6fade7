import { readdirSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import { and, eq } from 'drizzle-orm'
import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { alignments, comparisons, comparisonVersions, people, studies } from '../../server/db/schema'
import { demoPassword } from '../../server/domain/demo/accounts'
import { createShareLink } from '../../server/domain/share/createShareLink'
import { issueSecret } from '../../server/domain/secret/issueSecret'
import { axeFindings } from '../support/axe'
import { launchBrowser } from '../support/browser'
import { startBuiltServer, type BuiltServer } from '../support/builtServer'
import type { TestLaboratory } from '../support/laboratory'
import { secondConnection } from '../support/secondConnection'
import { signInCookie } from '../support/signIn'
import { watchedPage } from '../support/watchedPage'

/** Who opens each page of app/pages; `lab`: on an empty real laboratory instead of the demo. */
const pages: Record<string, { as: 'analyst' | 'scientist' | 'reviewer' | 'student' | 'lead' | 'visitor', lab?: true, secret?: 'share' | 'invitation' }> = {
  'demo-files': { as: 'analyst' },
  'first': { as: 'visitor', lab: true },
  'index': { as: 'student' },
  'invitation/[secret]': { as: 'visitor', secret: 'invitation' },
  'methods': { as: 'analyst' },
  'people': { as: 'lead' },
  'profile': { as: 'scientist' },
  'shared/[secret]': { as: 'visitor', secret: 'share' },
  'sign-in': { as: 'visitor' },
  'studies/new': { as: 'analyst' },
  'studies/[studyId]/index': { as: 'analyst' },
  'studies/[studyId]/edit': { as: 'analyst' },
  'studies/[studyId]/samples': { as: 'analyst' },
  'studies/[studyId]/tables': { as: 'analyst' },
  'studies/[studyId]/traces': { as: 'analyst' },
  'studies/[studyId]/flags': { as: 'scientist' },
  'studies/[studyId]/share-links': { as: 'reviewer' },
  'studies/[studyId]/alignments/index': { as: 'analyst' },
  'studies/[studyId]/alignments/[alignmentId]': { as: 'student' },
  'studies/[studyId]/comparisons/index': { as: 'scientist' },
  'studies/[studyId]/comparisons/[comparisonId]/index': { as: 'scientist' },
  'studies/[studyId]/comparisons/[comparisonId]/changes': { as: 'student' },
}

const views = [
  { scheme: 'light', width: 1440, height: 900 },
  { scheme: 'dark', width: 390, height: 844 },
  { scheme: 'light', width: 320, height: 640 },
] as const

let demo: BuiltServer
let lab: BuiltServer
let laboratory: TestLaboratory
let browser: Browser
const ids: Record<string, string> = {}
const cookies = new Map<string, string>()

beforeAll(async () => {
  [demo, lab, browser] = await Promise.all([startBuiltServer({ kind: 'demo' }), startBuiltServer(), launchBrowser()])
  laboratory = secondConnection(demo.folder)
  for (const name of new Set(Object.values(pages).map(page => page.as))) {
    if (name !== 'visitor') cookies.set(name, await signInCookie(demo.url, name, demoPassword))
  }
  await demoMade()
  readIds()
}, 240_000)

afterAll(async () => {
  laboratory?.close()
  await Promise.all([browser?.close(), demo?.stop(), lab?.stop()])
})

async function demoMade() {
  for (;;) {
    const state = await (await fetch(`${demo.url}/api/demo`, { headers: { cookie: cookies.get('lead') ?? '' } })).json() as { making: boolean }
    if (!state.making) return
    await new Promise(resolve => setTimeout(resolve, 500))
  }
}

/** The first demo study, its alignment and comparison, and a secret for each kind of secret page. */
function readIds() {
  const { db } = laboratory
  const version = db.select({ studyId: studies.id, alignmentId: alignments.id, comparisonId: comparisons.id, versionId: comparisonVersions.id }).from(comparisonVersions)
    .innerJoin(comparisons, eq(comparisons.id, comparisonVersions.comparisonId)).innerJoin(alignments, eq(alignments.id, comparisonVersions.alignmentId))
    .innerJoin(studies, eq(studies.id, comparisonVersions.studyId)).where(and(eq(comparisonVersions.number, 1), eq(comparisons.practice, false))).orderBy(studies.createdAt).get()
  const reviewer = db.select().from(people).where(eq(people.signInName, 'reviewer')).get()
  if (!version || !reviewer) throw new Error('the demo laboratory holds no comparison')
  const asReviewer = { id: reviewer.id, name: reviewer.name, signInName: reviewer.signInName, roles: ['reviewer' as const] }
  const share = createShareLink(db, version.studyId, { versionId: version.versionId, days: 30, label: 'a customer', allowExport: true }, asReviewer).secret
  const invitation = issueSecret(db, { kind: 'invitation', subject: reviewer.id, createdBy: null, expiresAt: new Date(Date.now() + 3_600_000) })
  Object.assign(ids, version, { share, invitation })
}

const pageFiles = (folder: string, path = ''): string[] => readdirSync(folder, { withFileTypes: true }).flatMap(entry =>
  entry.isDirectory() ? pageFiles(`${folder}/${entry.name}`, `${path}${entry.name}/`) : [`${path}${entry.name.replace('.vue', '')}`])

it('has a row for every page', () => {
  const files = pageFiles(fileURLToPath(new URL('../../app/pages', import.meta.url)))
  // A page that only frames those in the folder of its name is seen with each of them.
  expect(files.filter(file => !files.some(other => other.startsWith(`${file}/`))).sort()).toEqual(Object.keys(pages).sort())
})

describe.each(Object.entries(pages))('%s', (name, { as, lab: onLab, secret }) => {
  it.each(views)('is sound in $scheme at $width px', async ({ scheme, width, height }) => {
    const server = onLab ? lab : demo
    const path = name.replace(/\/?index$/, '').replaceAll(/\[(\w+)\]/g, (_, parameter: string) => ids[parameter === 'secret' && secret ? secret : parameter] ?? `no-${parameter}`)
    const watched = await watchedPage(browser, { scheme, width, height })
    const cookie = cookies.get(as)
    if (cookie) await watched.page.context().addCookies(cookie.split('; ').map(pair => ({ name: pair.split('=')[0] ?? '', value: pair.slice(pair.indexOf('=') + 1), url: server.url })))
    await watched.page.goto(`${server.url}/${path}`)
    await watched.page.locator('h1').first().waitFor()
    await watched.page.waitForLoadState('networkidle')
    expect(await axeFindings(watched.page)).toEqual([])
    // Nothing but a table of its own may be wider than the window.
    expect(await watched.page.evaluate<number>('document.documentElement.scrollWidth')).toBeLessThanOrEqual(width)
    expect(await watched.page.title()).toMatch(/\S · Steelyard$/)
    expect(watched.problems()).toEqual([])
    await watched.close()
  })
})
