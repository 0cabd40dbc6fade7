import { alignmentData, tableIntensities } from '../domain/comparison/alignmentData'
import type { CompareInput } from '../domain/comparison/compareInput'
import { keepVersion, type ComparedResult } from '../domain/comparison/keepVersion'
import { readSamples } from '../domain/comparison/storedSample'
import { notFound } from '../domain/DomainError'
import type { JobKind } from './kind'

/** Judges the aligned features of two sides and keeps the verdicts as a version of a comparison. */
export const compare: JobKind<CompareInput, ComparedResult> = {
  worker: 'compare',
  heapMb: 2048,
  prepare: ({ db }, input) => {
    const data = alignmentData(db, input.alignmentId)
    const samples = readSamples(input.samples)
    const unknown = samples.some(sample => sample.floorSource === 'estimated' && Number.isNaN(sample.floor))
    return { data: { ...data, samples, settings: input.settings, tableIntensity: unknown ? tableIntensities(db, input.alignmentId) : null } }
  },
  finish: ({ db }, input, result, job) => {
    if (!job.studyId) throw notFound()
    return keepVersion(db, job.studyId, input, result, job.createdBy)
  },
}
