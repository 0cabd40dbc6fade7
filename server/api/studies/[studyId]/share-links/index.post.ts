import { shareSchema } from '../../../../../shared/schemas/share'
import { createShareLink } from '../../../../domain/share/createShareLink'

export default defineRoute(async (event) => {
  const { db, person, study } = await requireStudy(event, 'share')
  return createShareLink(db, study.id, await readInput(event, shareSchema), person)
})
