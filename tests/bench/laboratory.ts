import { mkdtempSync, rmSync } from 'node:fs'
import { get } from 'node:http'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { and, eq, inArray } from 'drizzle-orm'
import { openDatabase } from '../../server/db/open'
import { alignments, jobs, people, samples, tables } from '../../server/db/schema'
import { Jobs } from '../../server/jobs/runner'
import type { FeatureTable } from '../../shared/science/alignment/types'
import { startBuiltServer, type BuiltServer } from '../support/builtServer'
import { addTestPerson, addTestStudy, migrations, type TestLaboratory } from '../support/laboratory'
import { secondConnection } from '../support/secondConnection'
import { signInCookie, testPasswordHash } from '../support/signIn'
import { simulate } from '../support/simulate'
import { processFigures, shareOf } from './measure'

interface Place { server: BuiltServer, look: TestLaboratory, cookie: string }

const features = 10_000

/** Tables sent to the built server, read, aligned and stored there, and how long reads of /api take meanwhile. */
export async function benchLaboratory(sortSeconds: number) {
  const folder = mkdtempSync(join(tmpdir(), 'steelyard-bench-'))
  const { signInName, few, many } = await prepare(folder)
  const server = await startBuiltServer({ folder })
  const look = secondConnection(folder)
  try {
    const place: Place = { server, look, cookie: await signInCookie(server.url, signInName) }
    const ten = await run(place, few, 10)
    const hundred = await run(place, many, 100)
    console.log(`From 10 to 100 tables: reading ${(hundred.reading / ten.reading).toFixed(1)} times, aligning and storing ${(hundred.aligning / ten.aligning).toFixed(1)} times as long (at most 15)`)
    console.log(`Aligning and storing a million features takes ${(hundred.processor / sortSeconds).toFixed(0)} times the sort in processor time of the server, reads beside it included`)
  }
  catch (error) {
    console.error(server.output())
    throw error
  }
  finally {
    look.close()
    await server.stop()
    rmSync(folder, { recursive: true, force: true })
  }
}

/** A laboratory with an analyst and two studies whose samples wait for their tables. */
async function prepare(folder: string) {
  const open = await openDatabase(folder, 'lab', migrations)
  const laboratory: TestLaboratory = { ...open, folder, jobs: new Jobs({ db: open.db, folder }, {}, {}) }
  const analyst = addTestPerson(laboratory, 'analyst')
  open.db.update(people).set({ passwordHash: await testPasswordHash() }).run()
  const study = (count: number) => {
    const { id } = addTestStudy(laboratory, analyst)
    for (let position = 0; position < count; position++) open.db.insert(samples).values({ studyId: id, position, name: `sample ${position + 1}`, runOrder: position + 1 }).run()
    return id
  }
  const prepared = { signInName: analyst.signInName, few: study(10), many: study(100) }
  open.close()
  return prepared
}

async function run(place: Place, studyId: string, count: number): Promise<{ reading: number, aligning: number, processor: number }> {
  const { server, look } = place
  const files = simulate({ tables: count, compounds: Math.round(features / 1.05), seed: 11 }).tables.map(csvOf)
  const reading = await watched(place, studyId, async () => {
    for (const [position, text] of files.entries()) {
      await post(place, `/api/studies/${studyId}/uploads?name=${encodeURIComponent(`sample ${position + 1}.csv`)}`, text, 'application/octet-stream')
    }
    await settled(look, studyId)
  })
  const stored = look.db.select({ features: tables.features, sampleId: tables.sampleId }).from(tables).where(eq(tables.studyId, studyId)).all()
  const total = stored.reduce((sum, table) => sum + table.features, 0)
  if (stored.length !== count || stored.some(table => !table.sampleId)) throw new Error(`${stored.length} of ${count} tables were read and matched to a sample.`)

  const stages = new Map<string, number>()
  const aligning = await watched(place, studyId, async () => {
    await post(place, `/api/studies/${studyId}/alignments`, JSON.stringify({ settings: {} }), 'application/json')
    await settled(look, studyId, stages)
  })
  const groups = look.db.select({ groups: alignments.groups }).from(alignments).where(eq(alignments.studyId, studyId)).get()?.groups
  if (!groups) throw new Error(`Not aligned: ${look.db.select({ message: jobs.message }).from(jobs).where(eq(jobs.studyId, studyId)).all().at(-1)?.message}`)

  console.log(`${count} tables, ${total} features, ${groups} aligned features; most memory of the server so far ${processFigures(server.pid).peakMb.toFixed(0)} MB`)
  for (const [name, stage] of [['sent, read and stored', reading], ['aligned and stored', aligning]] as const) {
    console.log(`   ${name}: ${stage.seconds.toFixed(1)} s (processor ${stage.processor.toFixed(1)} s), ${Math.round(total / stage.seconds)} features/s; `
      + `/api reads meanwhile: median ${shareOf(stage.reads, 0.5).toFixed(0)} ms (at most 50), 95 % ${shareOf(stage.reads, 0.95).toFixed(0)} ms (at most 250), ${stage.reads.length} reads`)
  }
  console.log(`   stages of the alignment: ${[...stages].map(([name, seconds]) => `${name} ${seconds.toFixed(2)} s`).join(' · ')}`)
  return { reading: reading.seconds, aligning: aligning.seconds, processor: aligning.processor }
}

/** Times a piece of work by the clock and the server's processor, and reads the study every 20 ms beside it. */
async function watched({ server, cookie }: Place, studyId: string, work: () => Promise<void>) {
  const reads: number[] = []
  let going = true
  const watching = (async () => {
    while (going) {
      const start = performance.now()
      await read(`${server.url}/api/studies/${studyId}`, cookie)
      reads.push(performance.now() - start)
      await new Promise(resolve => setTimeout(resolve, 20))
    }
  })()
  const before = processFigures(server.pid).processorSeconds
  const start = performance.now()
  await work()
  const seconds = (performance.now() - start) / 1000
  going = false
  await watching
  return { seconds, processor: processFigures(server.pid).processorSeconds - before, reads }
}

/** A read on a connection of its own: one kept open may be closed by the server just as it is used again. */
function read(url: string, cookie: string): Promise<void> {
  return new Promise((resolve, reject) => {
    get(url, { agent: false, headers: { cookie } }, response => response.resume().once('end', resolve).once('error', reject)).once('error', reject)
  })
}

/** Waits until no job of the study is open; notes how long each message of a job stood. */
async function settled({ db }: TestLaboratory, studyId: string, stages = new Map<string, number>()) {
  for (let last = performance.now(); ;) {
    const open = db.select({ message: jobs.message }).from(jobs).where(and(eq(jobs.studyId, studyId), inArray(jobs.status, ['queued', 'running']))).get()
    if (!open) return
    await new Promise(resolve => setTimeout(resolve, 20))
    const now = performance.now()
    stages.set(open.message, (stages.get(open.message) ?? 0) + (now - last) / 1000)
    last = now
  }
}

async function post({ server, cookie }: Place, path: string, body: string, type: string) {
  const response = await fetch(server.url + path, { method: 'POST', headers: { 'origin': server.url, cookie, 'content-type': type }, body })
  if (response.status !== 202) throw new Error(`${path}: ${response.status} ${await response.text()}`)
}

const csvOf = ({ mz, retentionMinutes, intensity }: FeatureTable) =>
  `m/z,RT (min),Area\n${Array.from(mz, (value, row) => `${value.toFixed(5)},${(retentionMinutes[row] ?? 0).toFixed(4)},${(intensity[row] ?? 0).toFixed(1)}`).join('\n')}\n`
