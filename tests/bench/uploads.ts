/**
 * Four feature tables of 64 MB at once, against the built server: how much memory it takes above idle, and how long other reads wait.
 * `npx nuxt build && npx tsx tests/bench/uploads.ts`. Seeded; nothing here is timed in CI.
 */
import { mkdtempSync, readFileSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { openDatabase } from '../../server/db/open'
import { people } from '../../server/db/schema'
import { MAX_TABLE_BYTES } from '../../shared/schemas/table'
import { startBuiltServer } from '../support/builtServer'
import { addTestPerson, addTestStudy, migrations } from '../support/laboratory'
import { seededRandom } from '../support/seededRandom'
import { signInCookie, testPasswordHash } from '../support/signIn'

const FILES = 4
const MEGABYTE = 2 ** 20

/** A table of nearly 64 MB with a little under two million rows. */
function largeTable(seed: number): Uint8Array {
  const random = seededRandom(seed)
  const bytes = Buffer.alloc(MAX_TABLE_BYTES)
  let length = bytes.write('m/z,RT (min),Area\n')
  for (;;) {
    const line = `${(90 + 900 * random.uniform()).toFixed(5)},${(20 * random.uniform()).toFixed(4)},${Math.exp(8 + 4 * random.uniform()).toFixed(10)}\n`
    if (length + line.length > bytes.length) return bytes.subarray(0, length)
    length += bytes.write(line, length)
  }
}

const residentMb = (pid: number) => Number(/VmRSS:\s+(\d+)/.exec(readFileSync(`/proc/${pid}/status`, 'utf8'))?.[1]) / 1024
const wait = (ms: number) => new Promise(resolve => setTimeout(resolve, ms))
const quantile = (values: number[], share: number) => values.toSorted((a, b) => a - b)[Math.floor(share * (values.length - 1))] ?? Number.NaN

async function main() {
  const files = Array.from({ length: FILES }, (_, index) => largeTable(index + 1))
  const folder = mkdtempSync(join(tmpdir(), 'steelyard-uploads-'))
  const open = await openDatabase(folder, 'lab', migrations)
  const person = addTestPerson(open, 'analyst')
  const study = addTestStudy(open, person)
  open.db.update(people).set({ passwordHash: await testPasswordHash() }).run()
  open.close()
  const server = await startBuiltServer({ folder })
  try {
    const headers = { cookie: await signInCookie(server.url, person.signInName), origin: server.url }
    const address = `${server.url}/api/studies/${study.id}`
    const reads: number[] = []
    let working = true
    let peak = 0
    const readOnce = async () => {
      const start = performance.now()
      await (await fetch(`${address}/tables`, { headers })).arrayBuffer()
      return performance.now() - start
    }
    for (let warm = 0; warm < 50; warm++) await readOnce()
    const idle = residentMb(server.pid)
    const idleReads = await Promise.all(Array.from({ length: 20 }, () => readOnce()))
    const watching = (async () => {
      while (working) {
        peak = Math.max(peak, residentMb(server.pid))
        await wait(5)
      }
    })()
    const reading = (async () => {
      while (working) {
        reads.push(await readOnce())
        await wait(20)
      }
    })()
    const start = performance.now()
    const answers = await Promise.all(files.map(async (file, index) => {
      const response = await fetch(`${address}/uploads?name=large${index}.csv`, { method: 'POST', headers: { ...headers, 'content-type': 'application/octet-stream' }, body: Uint8Array.from(file) })
      if (response.status !== 202) throw new Error(`upload ${index}: ${response.status} ${await response.text()}`)
      return response.status
    }))
    const sent = performance.now() - start
    const sentPeak = peak
    for (;;) {
      const { tables, uploads } = await (await fetch(`${address}/tables`, { headers })).json() as { tables: { features: number }[], uploads: { status: string, remark: string | null }[] }
      const refused = uploads.filter(upload => upload.status === 'refused' || upload.status === 'waiting')
      if (refused.length > 0) throw new Error(JSON.stringify(refused))
      if (tables.length === FILES) {
        console.log(`${answers.length} files of ${(files[0]?.length ?? 0) / MEGABYTE | 0} MB, ${tables.map(table => table.features).join(', ')} features`)
        break
      }
      await wait(200)
    }
    const read = performance.now() - start
    working = false
    await Promise.all([watching, reading])
    console.log(`sent in ${(sent / 1000).toFixed(1)} s, all read and kept after ${(read / 1000).toFixed(1)} s`)
    console.log(`memory: ${idle.toFixed(0)} MB idle, ${(sentPeak - idle).toFixed(0)} MB above it while sending, ${(peak - idle).toFixed(0)} MB at its peak (limit 150)`)
    console.log(`other reads: ${reads.length}, median ${quantile(reads, 0.5).toFixed(1)} ms (limit 50), 95 % within ${quantile(reads, 0.95).toFixed(1)} ms, longest ${Math.max(...reads).toFixed(0)} ms; idle median ${quantile(idleReads, 0.5).toFixed(1)} ms`)
  }
  catch (error) {
    console.error(server.output().slice(-4000))
    throw error
  }
  finally {
    await server.stop()
    rmSync(folder, { recursive: true, force: true })
  }
}

void main()
