import { readdirSync, readFileSync } from 'node:fs'
import { request as httpRequest } from 'node:http'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest'
import { MAX_TRACE_BYTES } from '../../shared/schemas/trace'
import type { StudyTraces } from '../../shared/types/trace'
import { axeFindings } from '../support/axe'
import { lookAt } from '../support/lookAt'
import { openUploadPages, type UploadPages } from '../support/uploadPages'

const reference = (name: string) => fileURLToPath(new URL(`../reference/data/mzml/${name}.mzML`, import.meta.url))
const bytesOf = (name: string) => readFileSync(reference(name))
let pages: UploadPages

beforeAll(async () => {
  pages = await openUploadPages(['Press A1', 'Press A2', 'Carton B1'])
})
afterEach(() => pages.closePages())
afterAll(() => pages?.close())

const file = (name: string, from: string) => ({ name, mimeType: 'application/octet-stream', buffer: bytesOf(from) })

describe('the page of traces', () => {
  it('takes many files at once, matches them by name, and says why it refuses one', async () => {
    const watched = await pages.at(pages.studyIds[0] ?? '', 'traces')
    const { page } = watched
    await page.getByText('Everything else works without them.').waitFor()
    expect(await lookAt(page, 'traces-empty')).toEqual([])
    const input = page.getByRole('region', { name: 'Add mzML files' }).locator('input[type=file]')
    await input.setInputFiles([file('Press A1.mzML', 'minutes-zlib-indexed'), file('carton_b1.mzML', 'param-group-32bit'), file('other.mzML', 'polarity-switching'), file('cut.mzML', 'refuse-cut-short'), file('packed.mzML', 'refuse-numpress')])
    await page.getByText('0 on their way, 0 being read, 3 read').waitFor({ state: 'attached', timeout: 60_000 })
    expect(await page.getByLabel('Sample of Press A1.mzML').locator('option:checked').textContent()).toBe('Press A1')
    expect(await page.getByLabel('Sample of carton_b1.mzML').locator('option:checked').textContent()).toBe('Carton B1')
    await page.getByText('the file ends early').waitFor()
    await page.getByText('MS-Numpress linear prediction compression').waitFor()
    await page.getByText('The file holds profile data').last().waitFor()
    await page.getByText('One trace has no sample yet.').waitFor()
    expect(await lookAt(page, 'traces-read')).toEqual([])

    await input.setInputFiles([file('again.mzML', 'minutes-zlib-indexed')])
    await page.getByText('The study has this content already, as Press A1.mzML.').waitFor()
    await page.getByLabel('Sample of other.mzML').selectOption({ label: 'Press A2' })
    await page.getByText('One trace has no sample yet.').waitFor({ state: 'detached' })
    await page.getByLabel('The file that replaces other.mzML').setInputFiles(file('better.mzML', 'seconds-plain-64bit'))
    await page.getByLabel('Sample of better.mzML').waitFor({ timeout: 60_000 })
    expect(await page.getByLabel('Sample of better.mzML').locator('option:checked').textContent()).toBe('Press A2')
    await page.getByLabel('Sample of other.mzML').waitFor({ state: 'detached' })
    await page.getByRole('button', { name: 'Remove better.mzML' }).click()
    await page.getByRole('button', { name: 'Remove it' }).click()
    await page.getByLabel('Sample of better.mzML').waitFor({ state: 'detached' })
    await page.getByRole('link', { name: 'Traces 2' }).waitFor()
    expect(await axeFindings(page)).toEqual([])
    expect(watched.problems()).toEqual([])
  })
})

describe('an mzML file over HTTP', () => {
  const address = (name: string) => `${pages.server.url}/api/studies/${pages.studyIds[1]}/traces/uploads?name=${name}`
  const headersOf = async () => ({ ...await pages.headers(), 'content-type': 'application/octet-stream' })
  const listed = async () => await (await fetch(`${pages.server.url}/api/studies/${pages.studyIds[1]}/traces`, { headers: await pages.headers() })).json() as StudyTraces

  it('is refused with a sentence where it is announced as too large', async () => {
    const headers = await headersOf()
    const answer = await new Promise<{ status: number, text: string }>((resolve, reject) => {
      const request = httpRequest(address('large.mzML'), { method: 'POST', headers: { ...headers, 'content-length': MAX_TRACE_BYTES + 1 } }, (response) => {
        let text = ''
        response.on('data', (chunk: Buffer) => text += chunk)
        response.on('end', () => resolve({ status: response.statusCode ?? 0, text }))
      })
      request.on('error', reject)
      request.write('<?xml')
    })
    expect([answer.status, answer.text]).toEqual([413, expect.stringContaining('at most 1024 MB')])
  })

  it('may come without its length, and larger than other bodies may be', async () => {
    const piece = bytesOf('seconds-plain-64bit')
    const text = piece.toString()
    // The same spectra again and again: over the 2 MB that hold elsewhere.
    const [head = '', ...spectra] = text.split(/(?=<spectrum )/)
    const tail = '</spectrumList></run></mzML>'
    const all = spectra.join('').replace(tail, '')
    const body = Buffer.from(`${head}${all.repeat(6)}${tail}`)
    expect(body.length).toBeGreaterThan(3_000_000)
    const headers = await headersOf()
    const status = await new Promise<number>((resolve, reject) => {
      const request = httpRequest(address('Press-A2.mzML'), { method: 'POST', headers: { ...headers, 'transfer-encoding': 'chunked' } }, response => resolve(response.resume().statusCode ?? 0))
      request.on('error', reject)
      request.end(body)
    })
    expect(status).toBe(202)
    await expect.poll(async () => (await listed()).traces.map(trace => [trace.sampleName, trace.scans]), { timeout: 60_000 }).toEqual([['Press A2', 1800]])
    expect(readdirSync(join(pages.folder, 'incoming'))).toEqual([])
    expect(pages.server.output()).not.toContain('Uncaught')
  })
})
