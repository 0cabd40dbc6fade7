import { uploadAnswersSchema } from '../../../../../../shared/schemas/table'
import { answerUpload } from '../../../../../domain/table/answerUpload'

/** What a person says of a file's layout: it holds for all of its shape that wait in the study. */
export default defineRoute(async (event) => {
  const { person, study } = await requireStudy(event, 'editStudy')
  const { answers } = await readInput(event, uploadAnswersSchema)
  const answer = answerUpload(useLaboratory(), study.id, readParam(event, 'uploadId'), answers, person)
  setResponseStatus(event, 202)
  return answer
})
