import { newVersionSchema } from '../../../../../../../shared/schemas/comparison'
import { prepareVersion } from '../../../../../../domain/comparison/prepareComparison'

export default defineRoute(async (event) => {
  const { db, person, study } = await requireStudy(event, 'practise')
  const input = prepareVersion(db, study, readParam(event, 'comparisonId'), await readInput(event, newVersionSchema), person)
  const job = useLaboratory().jobs.add({ kind: 'compare', studyId: study.id, input, personId: person.id })
  setResponseStatus(event, 202)
  return { jobId: job.id }
})
