import { eq } from 'drizzle-orm'
import { alignments } from '../db/schema'
import { alignmentData, tableIntensities } from '../domain/comparison/alignmentData'
import type { CompareInput } from '../domain/comparison/compareInput'
import type { CompareWork } from '../domain/comparison/compareWork'
import { keepVersion, type ComparedResult } from '../domain/comparison/keepVersion'
import { readSamples } from '../domain/comparison/storedSample'
import { notFound } from '../domain/DomainError'
import { usedTraces } from '../domain/trace/alignedTraces'
import { readTraceMaxima, traceGone } from '../domain/trace/traceMaxima'
import type { JobContext, JobKind } from './kind'

/** Judges the aligned features of two sides and keeps the verdicts as a version of a comparison. */
export const compare: JobKind<CompareInput, ComparedResult> = {
  worker: 'compare',
  heapMb: 2048,
  prepare: (context, input) => {
    const { db } = context
    const samples = readSamples(input.samples)
    const unknown = samples.some(sample => sample.floorSource === 'estimated' && Number.isNaN(sample.floor))
    const data: CompareWork = {
      ...alignmentData(db, input.alignmentId), samples, settings: input.settings,
      tableIntensity: unknown ? tableIntensities(db, input.alignmentId) : null,
      ...traceWork(context, input),
    }
    return { data }
  },
  finish: ({ db }, input, result, job) => {
    if (!job.studyId) throw notFound()
    return keepVersion(db, job.studyId, input, result, job.createdBy)
  },
}

/** What earlier versions found in the traces, and those that are still to be looked into. */
function traceWork({ db, folder }: JobContext, { alignmentId, traces = [], samples }: CompareInput): Pick<CompareWork, 'traceMaxima' | 'folder' | 'toLookInto' | 'window'> {
  const alignment = db.select({ settings: alignments.settings }).from(alignments).where(eq(alignments.id, alignmentId)).get()
  if (!alignment) throw notFound()
  const known = readTraceMaxima(db, alignmentId, traces)
  const unknown = traces.filter(({ position }) => !known.has(position))
  const toLookInto = usedTraces(db, alignmentId, unknown)
  if (toLookInto.length < unknown.length) throw traceGone()
  const { alignMassPpm, massFloorDa, retentionMinutes } = alignment.settings
  return { traceMaxima: samples.map((_, position) => known.get(position) ?? null), folder, toLookInto, window: { alignMassPpm, massFloorDa, retentionMinutes } }
}
