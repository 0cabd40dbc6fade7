import { traceUploadQuerySchema } from '../../../../../../shared/schemas/trace'
import { acceptTrace } from '../../../../../domain/trace/acceptTrace'
import { traceLimit } from '../../../../../domain/upload/receiveFile'

/** One mzML file a request, as the raw body; its name in the query. */
export default defineRoute(async (event) => {
  const { person, study } = await requireStudy(event, 'editStudy')
  const query = readQueryInput(event, traceUploadQuerySchema)
  const laboratory = useLaboratory()
  const file = await readUploadBody(event, laboratory.folder, traceLimit)
  const answer = acceptTrace(laboratory, study.id, file, query, person)
  setResponseStatus(event, 202)
  return answer
})
