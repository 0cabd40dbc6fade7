import { findUpload } from '../../../../../domain/table/listTables'

export default defineRoute(async (event) => {
  const { db, study } = await requireStudy(event)
  return findUpload(db, study.id, readParam(event, 'uploadId'))
})
