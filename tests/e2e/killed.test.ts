import { request } from 'node:http'
import { mkdtempSync, readdirSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { openDatabase } from '../../server/db/open'
import { alignments, alignmentTables, jobs, originals, people, samples, tables, traces, uploads } from '../../server/db/schema'
import { Jobs } from '../../server/jobs/runner'
import { startBuiltServer, type BuiltServer } from '../support/builtServer'
import { mzmlText, writtenScan } from '../support/mzmlText'
import { seededRandom } from '../support/seededRandom'
import { addTestPerson, addTestStudy, migrations, type TestLaboratory } from '../support/laboratory'
import { secondConnection } from '../support/secondConnection'
import { signInCookie, testPasswordHash } from '../support/signIn'
import { simulate } from '../support/simulate'
import { addTestTable } from '../support/testTable'

let folder: string
let server: BuiltServer | undefined
let look: TestLaboratory
let studyId: string
let signInName: string

/** A laboratory with an analyst and a study, as the server finds it. */
beforeEach(async () => {
  folder = mkdtempSync(join(tmpdir(), 'steelyard-killed-'))
  const open = await openDatabase(folder, 'lab', migrations)
  const laboratory: TestLaboratory = { ...open, folder, jobs: new Jobs({ db: open.db, folder }, {}, {}) }
  const analyst = addTestPerson(laboratory, 'analyst')
  open.db.update(people).set({ passwordHash: await testPasswordHash() }).run()
  signInName = analyst.signInName
  studyId = addTestStudy(laboratory, analyst).id
  for (const [k, table] of simulate({ tables: 12, compounds: 6000, seed: 12 }).tables.entries()) {
    addTestTable(laboratory, studyId, analyst.id, { mz: table.mz, minutes: table.retentionMinutes, intensity: table.intensity }, { name: `sample ${k}` })
  }
  open.close()
  look = secondConnection(folder)
})
afterEach(async () => {
  look.close()
  await server?.stop()
  rmSync(folder, { recursive: true, force: true })
})

async function restart() {
  await server?.kill()
  server = await startBuiltServer({ folder })
  expect(look.sqlite.pragma('integrity_check', { simple: true })).toBe('ok')
  expect(look.sqlite.pragma('foreign_key_check')).toEqual([])
  return server
}
const settled = () => vi.waitFor(() => {
  const states = look.db.select({ status: jobs.status }).from(jobs).all().map(job => job.status)
  expect(states.filter(status => status === 'queued' || status === 'running')).toEqual([])
}, { timeout: 60_000, interval: 100 })

const csv = `m/z,RT (min),Area\n${Array.from({ length: 200_000 }, (_, i) => `${100 + i / 1000},${(i % 1500) / 100},${1000 + i}`).join('\n')}\n`

/** Sends the first `share` of the file and leaves the connection open. */
async function sendPart(url: string, cookie: string, share: number) {
  const call = request(`${url}/api/studies/${studyId}/uploads?name=big.csv`, { method: 'POST', headers: { 'origin': url, cookie, 'content-type': 'application/octet-stream', 'content-length': Buffer.byteLength(csv) } })
  call.on('error', () => {})
  call.write(csv.slice(0, Math.floor(csv.length * share)))
  await vi.waitFor(() => expect(readdirSync(join(folder, 'incoming'))).toHaveLength(1), { timeout: 5000, interval: 10 })
  return call
}

async function post(url: string, cookie: string, path: string, body: string, type: string) {
  const response = await fetch(url + path, { method: 'POST', headers: { 'origin': url, cookie, 'content-type': type }, body })
  expect(response.status, await response.clone().text()).toBe(202)
  return await response.json() as { jobId: string }
}

describe('kill -9', () => {
  it('during an upload leaves nothing of it', async () => {
    const { url } = await restart()
    await sendPart(url, await signInCookie(url, signInName), 0.6)
    const before = look.db.select().from(tables).all().length
    await restart()
    expect(readdirSync(join(folder, 'incoming'))).toEqual([])
    expect(look.db.select().from(uploads).all().filter(upload => upload.fileName === 'big.csv')).toEqual([])
    expect(look.db.select().from(tables).all()).toHaveLength(before)
  })

  it('while a file is read: it is read again, once', async () => {
    const { url } = await restart()
    await post(url, await signInCookie(url, signInName), `/api/studies/${studyId}/uploads?name=big.csv`, csv, 'application/octet-stream')
    await restart()
    await settled()
    const read = look.db.select({ features: tables.features, fileName: tables.fileName }).from(tables).all().filter(table => table.fileName === 'big.csv')
    expect(read).toEqual([{ fileName: 'big.csv', features: 200_000 }])
    expect(look.db.select().from(originals).all().filter(original => original.bytes === Buffer.byteLength(csv))).toHaveLength(1)
    expect(readdirSync(join(folder, 'originals'), { recursive: true }).filter(name => String(name).endsWith('.gz'))).toHaveLength(1)
  })

  it('while raw data are read: they are read again, once, and nothing is left half kept', async () => {
    const random = seededRandom(4)
    const run = mzmlText(Array.from({ length: 300 }, (_, scan) => writtenScan({ minutes: scan / 50, mz: Array.from({ length: 2000 }, () => 100 + 900 * random.uniform()), intensity: Array.from({ length: 2000 }, () => 1 + 1000 * random.uniform()) })))
    const { url } = await restart()
    await post(url, await signInCookie(url, signInName), `/api/studies/${studyId}/traces/uploads?name=run.mzML`, run, 'application/octet-stream')
    await restart()
    await settled()
    const kept = look.db.select({ id: traces.id, fileName: traces.fileName, scans: traces.scans, centroids: traces.centroids }).from(traces).all()
    expect(kept).toEqual([{ id: expect.any(String), fileName: 'run.mzML', scans: 300, centroids: 600_000 }])
    expect(readdirSync(join(folder, 'traces'))).toEqual(kept.map(trace => trace.id))
    expect(readdirSync(join(folder, 'received'))).toEqual([])
  })

  it('during an alignment: it runs again, and one whole alignment stands', async () => {
    const { url } = await restart()
    const cookie = await signInCookie(url, signInName)
    await post(url, cookie, `/api/studies/${studyId}/alignments`, JSON.stringify({ settings: {} }), 'application/json')
    await vi.waitFor(() => expect(look.db.select().from(jobs).all()[0]).toMatchObject({ status: 'running', attempts: 1 }), { timeout: 10_000, interval: 5 })
    await restart()
    expect(look.db.select().from(alignments).all().length).toBeLessThanOrEqual(1)
    await settled()
    expect(look.db.select().from(jobs).all()[0]).toMatchObject({ status: 'done', attempts: 2 })
    expect(look.db.select().from(alignments).all()).toHaveLength(1)
    expect(look.db.select({ id: alignmentTables.id }).from(alignmentTables).all()).toHaveLength(look.db.select().from(samples).all().length)
    // Nothing asks for repair: the session made before the kill still opens the study.
    expect((await fetch(`${server?.url}/api/studies/${studyId}/alignments`, { headers: { cookie } })).status).toBe(200)
  })
})
