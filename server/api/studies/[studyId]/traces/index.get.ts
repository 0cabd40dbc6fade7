import { listTraces } from '../../../../domain/trace/listTraces'

export default defineRoute(async (event) => {
  const { db, study } = await requireStudy(event)
  return listTraces(db, study.id)
})
