import { removeUpload } from '../../../../../domain/table/removeUpload'

export default defineRoute(async (event) => {
  const { person, study } = await requireStudy(event, 'editStudy')
  return removeUpload(useLaboratory(), study.id, readParam(event, 'uploadId'), person)
})
