import { eq } from 'drizzle-orm'
import { studies, studyMembers } from '../../../server/db/schema'
import { addTestPerson } from '../../support/laboratory'
import type { RightsFile, RightsRow } from '../../support/rights'

const body: RightsRow['body'] = ({ methodId }) => ({ title: 'from the rights test', methodId, restricted: true })

const notArchived: RightsRow['before'] = ({ studyId = '' }, { db }) => {
  db.update(studies).set({ archivedAt: null }).where(eq(studies.id, studyId)).run()
}
const isMember: RightsRow['before'] = ({ studyId = '', memberId = '' }, { db }) => {
  db.insert(studyMembers).values({ studyId, personId: memberId }).onConflictDoNothing().run()
}

const file: RightsFile = {
  prepare: (fixture, laboratory) => {
    fixture.memberId = addTestPerson(laboratory, 'scientist').id
  },
  rows: [
    { route: 'GET /api/studies', needs: 'readStudy' },
    { route: 'POST /api/studies', needs: 'editStudy', body },
    { route: 'GET /api/studies/[studyId]', needs: 'readStudy' },
    { route: 'PATCH /api/studies/[studyId]', needs: 'editStudy', body },
    { route: 'PUT /api/studies/[studyId]/archive', needs: 'archive', before: notArchived },
    { route: 'DELETE /api/studies/[studyId]/archive', needs: 'archive' },
    { route: 'GET /api/studies/[studyId]/members', needs: 'readStudy' },
    { route: 'PUT /api/studies/[studyId]/members/[memberId]', needs: 'editStudy' },
    { route: 'DELETE /api/studies/[studyId]/members/[memberId]', needs: 'editStudy', before: isMember },
  ],
}
export default file
