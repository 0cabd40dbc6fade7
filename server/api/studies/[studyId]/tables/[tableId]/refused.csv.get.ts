import { refusedCsv } from '../../../../../domain/table/refusedRows'

export default defineRoute(async (event) => {
  const { db, study } = await requireStudy(event, 'export')
  const { name, text } = refusedCsv(db, study.id, readParam(event, 'tableId'))
  setDownload(event, name, 'text/csv; charset=utf-8')
  return text
})
