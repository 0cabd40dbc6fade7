import { newComparisonSchema } from '../../../../../shared/schemas/comparison'
import { prepareComparison } from '../../../../domain/comparison/prepareComparison'

export default defineRoute(async (event) => {
  const { db, person, study } = await requireStudy(event, 'practise')
  const input = prepareComparison(db, study, await readInput(event, newComparisonSchema), person)
  const job = useLaboratory().jobs.add({ kind: 'compare', studyId: study.id, input, personId: person.id })
  setResponseStatus(event, 202)
  return { jobId: job.id }
})
