import { and, desc, eq } from 'drizzle-orm'
import { ENGINE_VERSION } from '../../../shared/science/engineVersion'
import type { ComparedSample } from '../../../shared/science/verdict/settings'
import type { VerdictResult } from '../../../shared/science/verdict/verdictResult'
import type { Database } from '../../db/open'
import { alignments, comparisons, comparisonVersions } from '../../db/schema'
import { record } from '../activity/record'
import { notFound } from '../DomainError'
import { touchStudy } from '../study/touchStudy'
import type { CompareInput } from './compareInput'
import { keepTraceMaxima, requireTraceMaxima, type TraceMaxima } from '../trace/traceMaxima'
import { readSamples, storeSample } from './storedSample'
import { versionDifferences } from './versionDifferences'

/** What the worker gives back: samples with their floors, counts and cautions, and the packed, gzipped columns. */
export interface ComparedResult extends Pick<VerdictResult, 'counts' | 'cautions'> {
  samples: ComparedSample[]
  columns: Uint8Array
  /** What was found in traces that nobody had looked into on this alignment; absent: nothing new. */
  maxima?: TraceMaxima[]
}

/** Writes a version, and its comparison where it is the first, in the transaction that ends the job. Gives the comparison's id. */
export function keepVersion(db: Database, studyId: string, input: CompareInput, result: ComparedResult, personId: string): string {
  const comparisonId = input.comparisonId
    ?? db.insert(comparisons).values({ studyId, title: input.title, practice: input.practice, createdBy: personId }).returning().get().id
  const before = db.select().from(comparisonVersions).innerJoin(alignments, eq(alignments.id, comparisonVersions.alignmentId))
    .where(eq(comparisonVersions.comparisonId, comparisonId)).orderBy(desc(comparisonVersions.number)).limit(1).get()
  const alignment = db.select({ number: alignments.number }).from(alignments).where(and(eq(alignments.id, input.alignmentId), eq(alignments.studyId, studyId))).get()
  if (!alignment) throw notFound()
  const { alignmentId, sideAName, sideBName, settings, traces = [] } = input
  keepTraceMaxima(db, alignmentId, result.maxima ?? [])
  requireTraceMaxima(db, alignmentId, traces)
  const content = { alignmentId, alignmentNumber: alignment.number, sideAName, sideBName, settings, samples: result.samples, traces, engineVersion: ENGINE_VERSION }
  const number = (before?.comparison_versions.number ?? 0) + 1
  db.insert(comparisonVersions).values({
    comparisonId, studyId, alignmentId, number, sideAName, sideBName, settings, traces, engineVersion: ENGINE_VERSION,
    samples: result.samples.map(storeSample) as ComparedSample[],
    differs: before ? versionDifferences({ ...before.comparison_versions, samples: readSamples(before.comparison_versions.samples), alignmentNumber: before.alignments.number }, content) : [],
    cautions: result.cautions,
    counts: result.counts,
    columns: Buffer.from(result.columns.buffer, result.columns.byteOffset, result.columns.byteLength),
    createdBy: personId,
  }).run()
  // What is called how in practice work stays with its maker.
  if (!input.practice) touchStudy(db, studyId)
  record(db, { personId, action: number === 1 ? 'make comparison' : 'save version', studyId, subjectId: comparisonId, detail: `${input.practice ? 'practice copy' : input.title}, version ${number}` })
  return comparisonId
}
