import { eq } from 'drizzle-orm'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { jobs as jobTable } from '../../../server/db/schema'
import { DomainError } from '../../../server/domain/DomainError'
import type { JobKind } from '../../../server/jobs/kind'
import { Jobs } from '../../../server/jobs/runner'
import { openTestLaboratory, type TestLaboratory } from '../../support/laboratory'

/** A worker that does as its data says. */
const worker = `
const { parentPort, workerData } = require('node:worker_threads')
if (workerData.act === 'double') { parentPort.postMessage({ progress: 0.5, message: 'half way' }); parentPort.postMessage({ result: workerData.value * 2 }) }
if (workerData.act === 'refuse') parentPort.postMessage({ refusal: 'This is no table.' })
if (workerData.act === 'throw') throw new Error('a fault of ours')
if (workerData.act === 'hang') setInterval(() => {}, 1000)
if (workerData.act === 'hoard') { const all = []; for (;;) all.push(new Array(1e5).fill(Math.random())) }
`
/** A busy machine may take long to start a worker. */
const PATIENCE_MS = 30_000
interface Input { act: 'double' | 'refuse' | 'throw' | 'hang' | 'hoard' | 'silent', value?: number }

let open: TestLaboratory
let runner: Jobs
const abandoned: string[] = []
const kept: number[] = []
let finish: (result: number) => string

const kind: JobKind<Input, number> = {
  worker: 'test',
  heapMb: 64,
  prepare: (_, input) => {
    if (input.value === -1) throw new DomainError('conflict', 'There is nothing to do.')
    return { data: input }
  },
  finish: (_, input, result) => finish(result),
  abandon: (_, input, reason) => { abandoned.push(reason) },
}

beforeEach(async () => {
  open = await openTestLaboratory()
  runner = new Jobs({ db: open.db, folder: open.folder }, { test: kind }, { test: worker })
  abandoned.length = kept.length = 0
  finish = (result) => {
    kept.push(result)
    return `made ${result}`
  }
})
afterEach(async () => {
  await runner.stop()
  open.close()
})

const add = (input: Input, personId = 'p') => runner.add({ kind: 'test', studyId: null, input, personId })
const read = (id: string) => open.db.select().from(jobTable).where(eq(jobTable.id, id)).get()

describe('jobs', () => {
  it('run in a worker and keep what it made', async () => {
    const job = add({ act: 'double', value: 21 })
    await runner.idle()
    expect(read(job.id)).toMatchObject({ status: 'done', progress: 1, resultId: 'made 42', attempts: 1 })
  })

  it('wait their turn and run in order', async () => {
    for (const value of [1, 2, 3]) add({ act: 'double', value })
    await runner.idle()
    expect(kept).toEqual([2, 4, 6])
  })

  it('of a kind that gives way begin when no other waits', async () => {
    runner = new Jobs({ db: open.db, folder: open.folder }, { test: kind, patient: { ...kind, givesWay: true } }, { test: worker })
    for (const value of [1, 2]) runner.add({ kind: 'patient', studyId: null, input: { act: 'double', value }, personId: 'p' })
    for (const value of [3, 4]) add({ act: 'double', value })
    await runner.idle()
    expect(kept).toEqual([6, 8, 2, 4])
  })

  it('end later where the disk takes nothing, and hold up nobody', async () => {
    const silence = vi.spyOn(console, 'error').mockImplementation(() => {})
    let full = 2
    const onDisk = { ...kind, abandon: (_: unknown, input: Input, reason: string) => {
      if (full-- > 0) throw new Error('database or disk is full')
      abandoned.push(reason)
    } }
    runner = new Jobs({ db: open.db, folder: open.folder }, { test: onDisk }, { test: worker }, 20)
    const job = add({ act: 'silent' })
    const next = add({ act: 'double', value: 2 })
    await runner.idle()
    expect([read(job.id)?.status, read(next.id)?.status]).toEqual(['failed', 'done'])
    expect(abandoned).toHaveLength(1)
    silence.mockRestore()
  })

  it('say a refusal in its own words, and a fault of ours without detail', async () => {
    const silence = vi.spyOn(console, 'error').mockImplementation(() => {})
    const refused = add({ act: 'refuse' })
    const thrown = add({ act: 'throw' })
    const silent = add({ act: 'silent' })
    await runner.idle()
    expect(read(refused.id)).toMatchObject({ status: 'failed', message: 'This is no table.' })
    expect(read(thrown.id)?.message).toBe('Something went wrong in this job. Nothing of it was kept.')
    expect(read(silent.id)?.message).toContain('ended without a result')
    expect(abandoned).toHaveLength(3)
    silence.mockRestore()
  })

  it('end where there is nothing to do', async () => {
    const job = add({ act: 'double', value: -1 })
    await runner.idle()
    expect(read(job.id)).toMatchObject({ status: 'failed', message: 'There is nothing to do.' })
  })

  it('keep nothing when keeping fails half way', async () => {
    const silence = vi.spyOn(console, 'error').mockImplementation(() => {})
    finish = () => {
      open.db.insert(jobTable).values({ kind: 'half', input: {}, createdBy: 'p', status: 'done' }).run()
      throw new Error('disk full')
    }
    const job = add({ act: 'double', value: 1 })
    await runner.idle()
    expect(read(job.id)?.status).toBe('failed')
    expect(open.db.select().from(jobTable).all()).toHaveLength(1)
    silence.mockRestore()
  })

  it('are cancelled while they run and while they wait', async () => {
    const running = add({ act: 'hang' })
    const waiting = add({ act: 'double', value: 1 })
    await vi.waitFor(() => expect(read(running.id)?.status).toBe('running'), PATIENCE_MS)
    runner.cancel(waiting.id)
    runner.cancel(running.id)
    await runner.idle()
    expect([read(running.id)?.status, read(waiting.id)?.status]).toEqual(['cancelled', 'cancelled'])
    expect(kept).toEqual([])
    expect(abandoned).toEqual(['Cancelled.', 'Cancelled.'])
  })

  it('are stopped at their memory limit, and say so', async () => {
    const silence = vi.spyOn(console, 'error').mockImplementation(() => {})
    const job = add({ act: 'hoard' })
    await runner.idle()
    expect(read(job.id)?.message).toContain('memory')
    runner = new Jobs({ db: open.db, folder: open.folder }, { test: { ...kind, tooMuch: 'The file is no mzML.' } }, { test: worker })
    const other = add({ act: 'hoard' })
    await runner.idle()
    expect(read(other.id)?.message).toBe('The file is no mzML.')
    silence.mockRestore()
  })

  it('are stopped when their time is over, and the next gets its turn', async () => {
    runner = new Jobs({ db: open.db, folder: open.folder }, { test: { ...kind, mostMinutes: 0.005 } }, { test: worker })
    const endless = add({ act: 'hang' })
    await runner.idle()
    expect(read(endless.id)).toMatchObject({ status: 'failed', message: expect.stringContaining('so that others get their turn') as unknown })
    expect(abandoned).toHaveLength(1)
    const next = add({ act: 'double', value: 4 })
    await vi.waitFor(() => expect(read(next.id)?.attempts).toBe(1), PATIENCE_MS)
  })

  it('may wait three a person, no more', () => {
    for (let n = 0; n < 3; n++) add({ act: 'hang' })
    expect(() => add({ act: 'hang' })).toThrow('Three of your jobs')
    expect(() => add({ act: 'hang' }, 'another')).not.toThrow()
  })

  it('found running at start-up are queued again, at most twice', async () => {
    const insert = (attempts: number) => open.db.insert(jobTable).values({ kind: 'test', input: { act: 'double', value: 1 }, createdBy: 'p', status: 'running', attempts }).returning().get()
    const first = insert(1)
    const third = insert(3)
    runner.resume()
    await runner.idle()
    expect(read(first.id)).toMatchObject({ status: 'done', attempts: 2 })
    expect(read(third.id)).toMatchObject({ status: 'failed', attempts: 3 })
  })
})
