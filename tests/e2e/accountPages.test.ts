import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, expect, it } from 'vitest'
import { demoAccounts } from '../../server/domain/demo/accounts'
import { launchBrowser } from '../support/browser'
import { startBuiltServer, type BuiltServer } from '../support/builtServer'
import { lookAt } from '../support/lookAt'
import { watchedPage, type WatchedPage } from '../support/watchedPage'

const PASSWORD = 'tangle ferry cobalt'
let server: BuiltServer
let demo: BuiltServer
let browser: Browser
let lead: WatchedPage
let link = ''

beforeAll(async () => {
  server = await startBuiltServer()
  demo = await startBuiltServer({ kind: 'demo' })
  browser = await launchBrowser()
  lead = await watchedPage(browser)
})
afterAll(async () => {
  await browser?.close()
  await server?.stop()
  await demo?.stop()
})

const open = (page: Page, path: string, url = server.url) => page.goto(url + path, { waitUntil: 'networkidle' })
const fill = (page: Page, label: string, value: string) => page.getByLabel(label, { exact: true }).fill(value)
const press = (page: Page, name: string) => page.getByRole('button', { name, exact: true }).click()

it('a new laboratory leads from the sign-in page to its first lab lead', async () => {
  const { page } = lead
  await open(page, '/')
  expect(new URL(page.url()).pathname).toBe('/sign-in')
  expect(await lookAt(page, 'sign-in of a new laboratory')).toEqual([])
  await page.getByRole('link', { name: 'Make the first lab lead' }).click()
  await page.waitForURL('**/first')
  expect(await lookAt(page, 'first')).toEqual([])

  await fill(page, 'Code on the console', / {4}((?:\w{4}-){5}\w{4})\n/.exec(server.output())?.[1]?.toLowerCase() ?? '')
  await fill(page, 'Your name', 'Ines Vane')
  await fill(page, 'Sign-in name', 'Ines')
  await fill(page, 'Password', 'ines12345678')
  lead.expectResponse({ status: 400, path: '/api/first' })
  await press(page, 'Make the first lab lead')
  await page.getByText('little more than the sign-in name').waitFor()
  expect(await lookAt(page, 'first refused')).toEqual([])
  expect(await page.getByLabel('Code on the console').inputValue()).not.toBe('')
  await fill(page, 'Password', PASSWORD)
  await press(page, 'Make the first lab lead')
  await page.waitForURL('**/people')
  await page.getByText('Ines Vane').first().waitFor()
})

it('a lab lead adds a person and hands on the link, by keyboard', async () => {
  const { page } = lead
  await page.getByRole('button', { name: 'Add a person' }).focus()
  await page.keyboard.press('Enter')
  await page.getByRole('dialog').waitFor()
  expect(await lookAt(page, 'add a person')).toEqual([])
  await page.getByLabel('Name', { exact: true }).focus()
  await page.keyboard.type('Ben Dow')
  await page.keyboard.press('Tab')
  await page.keyboard.type('bendow')
  for (const key of ['Tab', 'Tab', 'Space', 'Tab', 'Tab', 'Space', 'Enter']) await page.keyboard.press(key)
  const field = page.getByLabel('One-time link')
  await field.waitFor()
  link = await field.inputValue()
  expect(link.startsWith(`${server.url}/invitation/`)).toBe(true)
  expect(await lookAt(page, 'one-time link')).toEqual([])
  await page.keyboard.press('Escape')
  await page.getByRole('dialog').waitFor({ state: 'detached' })
  expect(await page.getByText('analyst, reviewer').count()).toBe(1)
  expect(await lookAt(page, 'people')).toEqual([])
})

it('the person sets their password behind the link, once, and finds nothing of the lab lead\'s', async () => {
  const ben = await watchedPage(browser)
  await open(ben.page, new URL(link).pathname)
  expect(await lookAt(ben.page, 'invitation')).toEqual([])
  await fill(ben.page, 'Password', PASSWORD)
  await ben.page.getByLabel('Show it').check()
  expect(await ben.page.getByLabel('Password', { exact: true }).getAttribute('type')).toBe('text')
  await press(ben.page, 'Set the password and sign in')
  await ben.page.getByRole('link', { name: 'Ben Dow' }).waitFor()
  expect(await ben.page.getByRole('link', { name: 'People' }).count()).toBe(0)

  for (const [path, api, status] of [[new URL(link).pathname, '/api/invitations', 404], ['/people', '/api/people', 403], ['/first', '/first', 404]] as const) {
    ben.expectResponse({ status, path })
    const response = await open(ben.page, path)
    expect(response?.status(), api).toBe(status)
    expect(await lookAt(ben.page, `refused ${path.split('/')[1]}`)).toEqual([])
  }
  expect(ben.problems()).toEqual([])
  await ben.close()
})

it('a person keeps their name, colours and password', async () => {
  const { page } = lead
  await page.getByRole('link', { name: 'Ines Vane' }).click()
  await page.getByRole('heading', { name: 'Profile' }).waitFor()
  expect(await lookAt(page, 'profile')).toEqual([])
  await fill(page, 'Name', 'Ines Harrow')
  await press(page, 'Save the name')
  await page.getByText('Saved.', { exact: true }).waitFor()
  await page.getByRole('link', { name: 'Ines Harrow' }).waitFor()

  await page.getByLabel('Colours').selectOption('Dark')
  await page.locator('html[data-scheme=dark]').waitFor()
  await page.reload({ waitUntil: 'networkidle' })
  expect(await page.locator('html').getAttribute('data-scheme')).toBe('dark')
  await page.getByLabel('Colours').selectOption('As this device has it')
  await page.locator('html:not([data-scheme])').waitFor()

  await fill(page, 'Present password', 'not this one')
  await fill(page, 'New password', 'another long phrase')
  lead.expectResponse({ status: 400, path: '/api/me/password' })
  await press(page, 'Change the password')
  await page.getByText('This is not your present password.').waitFor()
  await fill(page, 'Present password', PASSWORD)
  await press(page, 'Change the password')
  await page.getByText('You are signed out everywhere else.').waitFor()
})

it('a lab lead closes and reopens an account, and stays lab lead as the last one', async () => {
  const { page } = lead
  await open(page, '/people')
  const ben = page.getByRole('group', { name: 'Ben Dow' })
  await ben.getByRole('button', { name: 'Close' }).click()
  expect(await lookAt(page, 'close an account')).toEqual([])
  await page.getByRole('dialog').getByRole('button', { name: 'Close the account' }).click()
  await page.getByText(/^closed /).waitFor()
  await ben.getByRole('button', { name: 'Reopen' }).click()
  await page.getByText(/^closed /).waitFor({ state: 'detached' })

  await page.getByRole('group', { name: 'Ines Harrow' }).getByRole('button', { name: 'Edit' }).click()
  await page.getByLabel(/^lab lead/).uncheck()
  await page.getByLabel(/^analyst/).check()
  lead.expectResponse({ status: 409, path: '/api/people/' })
  await press(page, 'Save')
  await page.getByText('This is the last lab lead.').waitFor()
  expect(await lookAt(page, 'edit a person')).toEqual([])
  expect(lead.problems()).toEqual([])
})

it('a demo laboratory lists its accounts, and a button fills in the form', async () => {
  const visitor = await watchedPage(browser)
  await open(visitor.page, '/sign-in?then=/profile', demo.url)
  expect(await visitor.page.getByRole('row').count()).toBe(demoAccounts.length + 1)
  expect(await lookAt(visitor.page, 'sign-in of the demo')).toEqual([])
  await visitor.page.getByRole('button', { name: 'Use the account student' }).click()
  await visitor.page.keyboard.press('Enter')
  await visitor.page.waitForURL('**/profile')
  expect(visitor.problems()).toEqual([])
  await visitor.close()
})

it('a sign-in that goes wrong says so, and leads on to no other site', async () => {
  const visitor = await watchedPage(browser)
  await open(visitor.page, '/sign-in?then=/\\attacker.example', demo.url)
  await fill(visitor.page, 'Sign-in name', 'analyst')
  await fill(visitor.page, 'Password', 'not the password')
  visitor.expectResponse({ status: 401, path: '/api/sessions' })
  await press(visitor.page, 'Sign in')
  await visitor.page.getByRole('alert').waitFor()
  expect(await lookAt(visitor.page, 'sign-in refused')).toEqual([])
  expect(await visitor.page.getByLabel('Sign-in name').inputValue()).toBe('analyst')
  await visitor.page.getByRole('button', { name: 'Use the account analyst' }).click()
  await press(visitor.page, 'Sign in')
  await visitor.page.waitForURL(`${demo.url}/`)
  await visitor.close()
})
