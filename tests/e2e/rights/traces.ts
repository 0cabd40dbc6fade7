import { randomBytes } from 'node:crypto'
import { traces } from '../../../server/db/schema'
import type { RightsFile, RightsRow } from '../../support/rights'

/** A trace, new for each request. */
const before: RightsRow['before'] = (fixture, { db }) => {
  const { studyId, analystId } = fixture
  if (!studyId || !analystId) throw new Error('the fixture has no study')
  const none = Buffer.alloc(0)
  fixture.traceId = db.insert(traces).values({ studyId, fileName: 'a.mzML', sha256: '', bytes: 3, keptBytes: 1, polarity: 'negative', profile: false, scans: 0, centroids: 0, intensityLimit: 0, lowestMz: 100, highestMz: 200, minutes: none, total: none, base: none, createdBy: analystId }).returning().get().id
}

const trace = '/api/studies/[studyId]/traces'

const file: RightsFile = {
  rows: [
    { route: `POST ${trace}/uploads`, needs: 'editStudy', query: 'name=a.mzML', ok: 202, body: () => new Uint8Array(randomBytes(64)) },
    { route: `GET ${trace}`, needs: 'readStudy' },
    { route: `PATCH ${trace}/[traceId]`, needs: 'editStudy', before, body: () => ({ sampleId: null }) },
    { route: `DELETE ${trace}/[traceId]`, needs: 'editStudy', before },
  ],
}
export default file
