import { newAlignmentSchema } from '../../../../../shared/schemas/alignment'
import { planAlignment } from '../../../../domain/alignment/planAlignment'

/** Official for those who may, practice for those who practise: planAlignment tells them apart. */
export default defineRoute(async (event) => {
  const { db, person, study } = await requireStudy(event, 'practise')
  const input = planAlignment(db, study.id, await readInput(event, newAlignmentSchema), person)
  const job = useLaboratory().jobs.add({ kind: 'align', studyId: study.id, input, personId: person.id })
  setResponseStatus(event, 202)
  return { jobId: job.id }
})
