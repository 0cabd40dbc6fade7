import type { Transferable } from 'node:worker_threads'
import type { Database } from '../db/open'
import type { jobs } from '../db/schema'

export type Job = typeof jobs.$inferSelect

export interface JobContext { db: Database, folder: string }

/** One kind of long work: what its worker needs, and how its result is kept. */
export interface JobKind<Input, Result> {
  /** Name of the file in server/workers. */
  worker: string
  /** Megabytes the worker's heap may take. */
  heapMb: number
  /** Megabytes of it for what lives shortly; small where little memory counts more than speed. */
  youngHeapMb?: number
  /** What is told where that was not enough. */
  tooMuch?: string
  /** Begins only while no other kind waits: many come at once, and nobody looks at them meanwhile. */
  givesWay?: true
  /** Minutes after which the work is stopped, so that others get their turn; MOST_MINUTES where not said. */
  mostMinutes?: number
  /** Reads what the worker needs; runs just before it starts. Throw a DomainError where there is nothing to do. */
  prepare: (context: JobContext, input: Input, job: Job) => { data: unknown, transfer?: Transferable[] }
  /** Keeps the result, within the transaction that ends the job; returns what it made. */
  finish: (context: JobContext, input: Input, result: Result, job: Job) => string | null
  /** Tidies what the job leaves when it fails for good or is cancelled, within the same transaction. */
  abandon?: (context: JobContext, input: Input, reason: string, job: Job) => void
}

/** Any kind, for who holds several: each kind only ever meets its own input and result. */
// eslint-disable-next-line @typescript-eslint/no-explicit-any
export type AnyJobKind = JobKind<any, any>

/** What a worker may post: progress as often as it likes (the runner thins it), then one result or refusal. */
export type WorkerMessage<Result> =
  | { progress: number, message: string }
  | { result: Result }
  /** A fault of the input, in words for the person. */
  | { refusal: string }
