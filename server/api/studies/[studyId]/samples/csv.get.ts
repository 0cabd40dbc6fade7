import { writeSheet } from '../../../../../shared/formats/sampleSheet/writeSheet'
import { readSheet } from '../../../../domain/sample/readSheet'

export default defineRoute(async (event) => {
  const { db, study } = await requireStudy(event, 'export')
  setDownload(event, 'sample-sheet.csv', 'text/csv; charset=utf-8')
  return writeSheet(readSheet(db, study.id).samples)
})
