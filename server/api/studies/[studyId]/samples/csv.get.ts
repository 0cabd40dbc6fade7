import { writeSheet } from '../../../../../shared/formats/sampleSheet/writeSheet'
import { readSheet } from '../../../../domain/sample/readSheet'

export default defineRoute(async (event) => {
  const { db, study } = await requireStudy(event, 'export')
  setResponseHeaders(event, { 'content-type': 'text/csv; charset=utf-8', 'content-disposition': 'attachment; filename="sample-sheet.csv"' })
  return writeSheet(readSheet(db, study.id).samples)
})
