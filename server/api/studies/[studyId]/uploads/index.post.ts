import { uploadQuerySchema } from '../../../../../shared/schemas/table'
import { acceptUpload } from '../../../../domain/table/acceptUpload'

/** One file a request, as the raw body; its name in the query. */
export default defineRoute(async (event) => {
  const { person, study } = await requireStudy(event, 'editStudy')
  const query = readQueryInput(event, uploadQuerySchema)
  const laboratory = useLaboratory()
  const file = await readUploadBody(event, laboratory.folder)
  const answer = acceptUpload(laboratory, study.id, file, query, person)
  setResponseStatus(event, 202)
  return answer
})
