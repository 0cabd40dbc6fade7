import { jobs } from '../../../server/db/schema'
import type { RightsFile, RightsRow } from '../../support/rights'

/** A job of the student's in the study, new for each request. */
const before: RightsRow['before'] = (fixture, { db }) => {
  const { studyId, studentId } = fixture
  if (!studyId || !studentId) throw new Error('the fixture has no study')
  fixture.jobId = db.insert(jobs).values({ kind: 'none', studyId, input: {}, status: 'done', createdBy: studentId }).returning().get().id
}

const file: RightsFile = {
  rows: [
    { route: 'GET /api/jobs/[jobId]', needs: 'readStudy', before, except: { stranger: 404 } },
    { route: 'DELETE /api/jobs/[jobId]', needs: 'editStudy', before, except: { stranger: 404, student: 200 } },
  ],
}
export default file
