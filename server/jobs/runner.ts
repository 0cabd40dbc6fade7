import { availableParallelism } from 'node:os'
import { Worker } from 'node:worker_threads'
import { and, asc, eq, inArray, sql } from 'drizzle-orm'
import { jobs } from '../db/schema'
import { DomainError } from '../domain/DomainError'
import type { AnyJobKind, Job, JobContext, WorkerMessage } from './kind'

const MAX_ATTEMPTS = 3 // the first, and twice more where the server was killed
const MAX_WAITING = 3
/** Far beyond honest work; but the widest tolerances on large tables would take days, and hold up everyone. */
const MOST_MINUTES = 30
const PROGRESS_MS = 250
/** Where the end of a job can't be written, as on a full disk, it is tried again. */
const AGAIN_MS = 10_000

export interface NewJob { kind: string, studyId: string | null, input: unknown, personId: string }

/** Runs the job table in worker threads, one core left free (at least one at once). */
export class Jobs {
  private readonly running = new Map<string, Worker>()
  private readonly atOnce = Math.max(1, availableParallelism() - 1)
  private stopped = false

  constructor(
    private readonly context: JobContext,
    private readonly kinds: Record<string, AnyJobKind>,
    private readonly workerSources: Record<string, string>,
    private readonly againMs = AGAIN_MS,
  ) {}

  /** At start-up: what was running when the server ended is queued again, at most twice. */
  resume() {
    const { db } = this.context
    for (const job of db.select().from(jobs).where(eq(jobs.status, 'running')).all()) {
      if (job.attempts < MAX_ATTEMPTS) db.update(jobs).set({ status: 'queued', progress: 0, message: 'Starts again: the server was stopped.' }).where(eq(jobs.id, job.id)).run()
      else this.end(job, 'failed', 'Stopped: the server ended three times while this ran.')
    }
    this.next()
  }

  /** Adds a job. `unlimited` is for work that an upload itself starts; else three may wait a person. */
  add(job: NewJob, { unlimited = false } = {}): Job {
    const { db } = this.context
    if (!unlimited) {
      const open = db.select().from(jobs).where(and(eq(jobs.createdBy, job.personId), eq(jobs.kind, job.kind), inArray(jobs.status, ['queued', 'running']))).all()
      if (open.length >= MAX_WAITING) throw new DomainError('tooMany', 'Three of your jobs are waiting already. Let one end, or cancel one.')
    }
    const row = db.insert(jobs).values({ kind: job.kind, studyId: job.studyId, input: job.input, createdBy: job.personId, message: 'Waiting for its turn.' }).returning().get()
    setImmediate(() => this.next())
    return row
  }

  /** Ends a job that waits or runs; nothing of it stays. */
  cancel(jobId: string) {
    const job = this.context.db.select().from(jobs).where(eq(jobs.id, jobId)).get()
    if (!job || (job.status !== 'queued' && job.status !== 'running')) return
    this.end(job, 'cancelled', 'Cancelled.')
    void this.running.get(jobId)?.terminate()
  }

  /** Waits until nothing runs or waits: for scripts and tests. */
  async idle() {
    const open = () => this.context.db.select({ id: jobs.id }).from(jobs).where(inArray(jobs.status, ['queued', 'running'])).get()
    while (!this.stopped && open()) await new Promise(resolve => setTimeout(resolve, 10))
  }

  async stop() {
    this.stopped = true
    await Promise.all([...this.running.values()].map(worker => worker.terminate()))
  }

  private next() {
    if (this.stopped || this.running.size >= this.atOnce) return
    const { db } = this.context
    const givingWay = Object.keys(this.kinds).filter(name => this.kinds[name]?.givesWay)
    const job = db.select().from(jobs).where(eq(jobs.status, 'queued')).orderBy(inArray(jobs.kind, givingWay), asc(jobs.createdAt), sql`rowid`).get()
    if (!job) return
    db.update(jobs).set({ status: 'running', startedAt: new Date(), attempts: job.attempts + 1, message: 'Starting.' }).where(eq(jobs.id, job.id)).run()
    this.start(job)
    this.next()
  }

  private start(job: Job) {
    const kind = this.kinds[job.kind]
    const source = kind && this.workerSources[kind.worker]
    if (!kind || !source) return this.end(job, 'failed', `This version does not know how to ${job.kind}.`)
    try {
      const { data, transfer } = kind.prepare(this.context, job.input, job)
      const worker = new Worker(source, { eval: true, workerData: data, transferList: transfer, resourceLimits: { maxOldGenerationSizeMb: kind.heapMb, maxYoungGenerationSizeMb: kind.youngHeapMb } })
      this.running.set(job.id, worker)
      this.listen(job, kind, worker)
    }
    catch (error) {
      this.fail(job, error)
    }
  }

  private listen(job: Job, kind: AnyJobKind, worker: Worker) {
    let lastProgress = 0
    let kept: { result: unknown } | undefined
    const limit = setTimeout(() => this.stopLate(job, kind, worker), (kind.mostMinutes ?? MOST_MINUTES) * 60_000)
    worker.on('message', (message: WorkerMessage<unknown>) => {
      if (this.stopped || !this.isRunning(job)) return
      if ('progress' in message) {
        if (Date.now() - lastProgress < PROGRESS_MS) return
        lastProgress = Date.now()
        this.context.db.update(jobs).set({ progress: message.progress, message: message.message }).where(eq(jobs.id, job.id)).run()
      }
      else if ('refusal' in message) this.end(job, 'failed', message.refusal)
      else {
        // Kept once the worker is gone, so that its memory and the database's are not needed at once.
        kept = message
        void worker.terminate()
      }
    })
    worker.on('error', error => this.fail(job, error))
    worker.on('exit', () => {
      clearTimeout(limit)
      this.running.delete(job.id)
      this.settle(job, kind, kept)
      kept = undefined
    })
  }

  /** Writes what came of a worker that is gone, and starts the next. Where the disk takes nothing it fails later: files of its result are let go by then. */
  private settle(job: Job, kind: AnyJobKind, kept?: { result: unknown }) {
    if (this.stopped) return
    try {
      if (kept && this.isRunning(job)) this.keep(job, kind, kept.result)
      if (this.isRunning(job)) this.end(job, 'failed', 'The work ended without a result. Please start it again.')
      this.next()
    }
    catch (error) {
      console.error(`[job ${job.id}] ${job.kind}: its end could not be written`, error)
      setTimeout(() => this.settle(job, kind), this.againMs).unref()
    }
  }

  private stopLate(job: Job, kind: AnyJobKind, worker: Worker) {
    if (!this.stopped && this.isRunning(job)) this.end(job, 'failed', `Stopped after ${kind.mostMinutes ?? MOST_MINUTES} minutes, so that others get their turn. Nothing of it was kept. Smaller tolerances or fewer tables take less time.`)
    void worker.terminate()
  }

  /** All or nothing: the result and the job's end are one transaction. */
  private keep(job: Job, kind: AnyJobKind, result: unknown) {
    const { db } = this.context
    try {
      db.transaction(() => {
        const resultId = kind.finish(this.context, job.input, result, job)
        db.update(jobs).set({ status: 'done', progress: 1, message: 'Done.', resultId, endedAt: new Date() }).where(eq(jobs.id, job.id)).run()
      }, { behavior: 'immediate' })
    }
    catch (error) {
      this.fail(job, error)
    }
  }

  private fail(job: Job, error: unknown) {
    if (error instanceof DomainError) return this.end(job, 'failed', error.message)
    console.error(`[job ${job.id}] ${job.kind}`, error)
    const outOfMemory = error instanceof Error && 'code' in error && error.code === 'ERR_WORKER_OUT_OF_MEMORY'
    this.end(job, 'failed', outOfMemory ? this.kinds[job.kind]?.tooMuch ?? 'This is more than the memory set for one job. Use fewer or smaller tables.' : 'Something went wrong in this job. Nothing of it was kept.')
  }

  private end(job: Job, status: 'failed' | 'cancelled', message: string) {
    const { db } = this.context
    db.transaction(() => {
      this.kinds[job.kind]?.abandon?.(this.context, job.input, message, job)
      db.update(jobs).set({ status, message, endedAt: new Date() }).where(eq(jobs.id, job.id)).run()
    }, { behavior: 'immediate' })
  }

  private isRunning(job: Job) {
    return this.context.db.select({ status: jobs.status }).from(jobs).where(eq(jobs.id, job.id)).get()?.status === 'running'
  }
}
