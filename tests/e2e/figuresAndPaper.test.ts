import { readFileSync } from 'node:fs'
import type { Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { openBenchPages, type BenchPages } from '../support/benchPages'
import { readSvg } from '../support/readSvg'

let pages: BenchPages
beforeAll(async () => {
  pages = await openBenchPages(300)
})
afterAll(() => pages?.close())
const onBench: BenchPages['onBench'] = (...asked) => pages.onBench(...asked)

/** Saves a figure; what arrives as a file, and what was sent meanwhile: anything but plain reading from the own server. */
async function saved(page: Page, figure: RegExp, format: 'SVG' | 'PNG') {
  const asked: string[] = []
  page.on('request', request => asked.push(`${request.method()} ${request.url()}`))
  const [download] = await Promise.all([
    page.waitForEvent('download', { timeout: 120_000 }),
    page.getByRole('group', { name: figure }).getByRole('button', { name: format }).click(),
  ])
  const bytes = readFileSync(await download.path())
  return { name: download.suggestedFilename(), bytes, sent: asked.filter(each => !/^GET (?:blob|data):/.test(each) && !each.startsWith(`GET ${pages.url}/`)) }
}

const pngSize = (bytes: Buffer) => [bytes.readUInt32BE(16), bytes.readUInt32BE(20)]

describe('figures', () => {
  it('are saved as SVG and PNG in the browser, with axes, units and limits', () => onBench('?feature=12', async (page) => {
    const figure = /Save figure: Fold change/
    await page.getByRole('button', { name: /found only in Millrace/ }).click()
    await expect.poll(() => new URL(page.url()).searchParams.get('verdict')).toBe('onlyA')
    const svg = await saved(page, figure, 'SVG')
    expect(svg.name).toMatch(/^fold-change_.+_v2\.svg$/)
    expect(svg.sent).toEqual([])
    const read = readSvg(svg.bytes.toString('utf8'))
    expect(read.width).toBe(1008)
    expect(read.elements).not.toContain('script')
    for (const part of ['across: log2 ratio, Tallow Lane over Millrace', 'certainty, −log10 q', 'Mass tolerance between tables and of traces: 10 ppm', 'Reach limit: ×5', 'A Millrace: 3 preparations', 'Screening indication only', 'version 2', 'Sent to waste: 0 to 0.8 min']) expect(read.texts.join(' ')).toContain(part)
    expect(read.texts.join('\n')).toMatch(/\d+ of \d+ features: found only in Millrace/)

    const png = await saved(page, figure, 'PNG')
    expect(png.bytes.subarray(1, 4).toString('latin1')).toBe('PNG')
    expect(pngSize(png.bytes)).toEqual([2 * read.width, 2 * read.height])
    expect(png.sent).toEqual([])
  }))

  it('show the abundance of what is selected, and say how', () => onBench('?feature=12&verdict=onlyA', async (page) => {
    await page.getByRole('tab', { name: 'Abundance' }).click()
    await page.getByRole('radio', { name: 'as injected' }).click()
    await expect.poll(() => new URL(page.url()).searchParams.get('signal')).toBe('injected')
    const read = readSvg((await saved(page, /Save figure: Abundance of m\/z/, 'SVG')).bytes.toString('utf8'))
    expect(read.texts.join('\n')).toContain('intensity, counts as injected')
    expect(read.texts.join('\n')).not.toContain('features: found only')
    expect(pngSize((await saved(page, /Save figure: Abundance of m\/z/, 'PNG')).bytes)).toEqual([2 * read.width, 2 * read.height])
  }))

  it('are not offered to who may not export', () => onBench('?feature=12', async (page) => {
    await page.getByText('Values per sample').waitFor()
    expect(await page.getByRole('button', { name: 'SVG' }).count()).toBe(0)
  }, { signInName: 'student' }))
})

describe('the card on a phone', () => {
  it('does not lie over what has the focus, and can be put away', () => onBench('?feature=12', async (page) => {
    const sheet = page.getByRole('complementary', { name: 'Feature card' })
    const help = page.getByRole('button', { name: 'Keys of the bench (?)' })
    await sheet.getByRole('button', { name: 'Put the card away' }).waitFor()
    await help.focus()
    await expect.poll(async () => {
      const [focused, over] = [await help.boundingBox(), await sheet.boundingBox()]
      return focused !== null && over !== null && focused.y + focused.height <= over.y
    }).toBe(true)
    await sheet.getByRole('button', { name: 'Put the card away' }).click()
    await expect.poll(() => page.getByText('Values per sample').first().isVisible()).toBe(false)
    await sheet.getByRole('button', { name: 'Show the feature card' }).click()
    await page.getByText('Values per sample').first().waitFor()
  }, { width: 390 }))
})

describe('the printed bench', () => {
  it('says where it comes from, and has nothing to press', () => onBench('?feature=12&verdict=onlyA', async (page) => {
    await page.emulateMedia({ media: 'print' })
    await page.getByText(/“Millrace against Tallow Lane”; version 2/).waitFor()
    await page.getByText(/Rows in view: 1 to \d+ of \d+/).waitFor()
    expect(await page.getByRole('tab').count()).toBe(0)
    expect(await page.getByRole('textbox').count()).toBe(0)
    expect(await page.getByRole('button', { name: 'Show as table' }).count()).toBe(0)
  }))
})
