import { and, eq } from 'drizzle-orm'
import { rememberAnswers, recallAnswers } from '../../../shared/science/table/rememberAnswers'
import { proposeLayout } from '../../../shared/science/table/proposeLayout'
import type { LayoutAnswers } from '../../../shared/science/table/layout'
import { layouts, uploads } from '../../db/schema'
import { record } from '../activity/record'
import { DomainError, notFound } from '../DomainError'
import type { Person } from '../person/person'
import type { UploadPlace } from '../upload/takeFile'
import type { Upload } from './uploadLine'

/**
 * A person's answer to what a file left open, or a correction of how it was read. It holds for all files of this shape that wait in the study,
 * and is remembered for later ones. Returns how many files are read now and how many of the shape still wait for more.
 */
export function answerUpload(place: UploadPlace, studyId: string, uploadId: string, answers: LayoutAnswers, person: Person): { reading: number, waiting: number } {
  const { db } = place
  const upload = db.select().from(uploads).where(and(eq(uploads.id, uploadId), eq(uploads.studyId, studyId))).get()
  if (!upload?.proposal) throw notFound()
  if (upload.status !== 'waiting' && upload.status !== 'read') throw new DomainError('conflict', 'This file is being read just now. Look again in a moment.')
  const { survey } = upload.proposal
  const { layout, questions } = proposeLayout(survey, answers)
  if (layout === null) throw new DomainError('invalid', 'This file still leaves something open.', questions.map(({ field, sentence }) => ({ field, sentence })))
  const remembered = rememberAnswers(survey, answers)
  return db.transaction(() => {
    if (Object.keys(answers).length > 0 && upload.fingerprint !== null) {
      const name = survey.header.filter(title => title.trim() !== '').join(', ').slice(0, 80)
      db.insert(layouts).values({ name, fingerprint: upload.fingerprint, layout: remembered, createdBy: person.id }).run()
      record(db, { personId: person.id, action: 'remember layout', studyId, subjectId: uploadId, detail: name })
    }
    readAgain(place, upload, answers, person)
    const others = upload.fingerprint === null ? [] : db.select().from(uploads).where(and(eq(uploads.studyId, studyId), eq(uploads.fingerprint, upload.fingerprint), eq(uploads.status, 'waiting'))).all().filter(other => other.id !== uploadId)
    const settled = others.filter(other => settle(place, other, remembered, person))
    return { reading: 1 + settled.length, waiting: others.length - settled.length }
  }, { behavior: 'immediate' })
}

/** Has a file read with these answers. */
function readAgain({ db, jobs }: UploadPlace, upload: Upload, answers: LayoutAnswers, person: Person) {
  if (!upload.proposal) return
  const job = jobs.add({ kind: 'read', studyId: upload.studyId, input: { uploadId: upload.id, decided: true }, personId: person.id }, { unlimited: true })
  const proposal = { survey: upload.proposal.survey, answers, remembered: false }
  db.update(uploads).set({ status: 'reading', proposal, jobId: job.id, remark: null, expiresAt: null }).where(eq(uploads.id, upload.id)).run()
}

/** Applies an answer to another file of the shape: read where it leaves nothing open, else kept with what is known now. */
function settle(place: UploadPlace, upload: Upload, remembered: ReturnType<typeof rememberAnswers>, person: Person): boolean {
  if (!upload.proposal) return false
  const { survey } = upload.proposal
  const answers = recallAnswers(survey, remembered)
  const { layout, confirmations } = proposeLayout(survey, answers, true)
  if (layout !== null && confirmations.length === 0) {
    readAgain(place, upload, answers, person)
    return true
  }
  place.db.update(uploads).set({ proposal: { survey, answers, remembered: true } }).where(eq(uploads.id, upload.id)).run()
  return false
}
