import type { AlignedResult, AlignInput } from '../domain/alignment/alignInput'
import { keepAlignment } from '../domain/alignment/keepAlignment'
import { readAlignTask } from '../domain/alignment/readAlignTask'
import { DomainError } from '../domain/DomainError'
import type { JobKind } from './kind'

/** Aligns the tables of a study. */
export const align: JobKind<AlignInput, AlignedResult> = {
  worker: 'align',
  heapMb: 1400,
  prepare({ db }, input) {
    const data = readAlignTask(db, input)
    return { data }
  },
  finish({ db }, input, result, job) {
    if (!job.studyId) throw new DomainError('conflict', 'An alignment belongs to a study.')
    return keepAlignment(db, job.studyId, input, result, job.createdBy)
  },
}
