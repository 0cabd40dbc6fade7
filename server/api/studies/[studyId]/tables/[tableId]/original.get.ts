import { openOriginal } from '../../../../../domain/table/openOriginal'

/** The file as it came, byte for byte. */
export default defineRoute(async (event) => {
  const { db, study } = await requireStudy(event, 'export')
  const { fileName, bytes, stream } = openOriginal(db, useLaboratory().folder, study.id, readParam(event, 'tableId'))
  setDownload(event, fileName, 'application/octet-stream')
  setResponseHeader(event, 'content-length', bytes)
  return sendDownload(event, stream)
})
