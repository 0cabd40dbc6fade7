import { createShareLink } from '../../../server/domain/share/createShareLink'
import { addTestAlignment } from '../../support/testAlignment'
import { addTestComparison, addTestVersion } from '../../support/testComparison'
import type { RightsFile, RightsRow } from '../../support/rights'

/** A link of the analyst's version, new for each request. */
const before: RightsRow['before'] = (fixture, { db }) => {
  const { studyId = '', shareVersionId = '', analystId = '' } = fixture
  fixture.shareLinkId = createShareLink(db, studyId, { versionId: shareVersionId, label: '', days: 1, allowExport: false }, { id: analystId, name: '', signInName: '', roles: [] }).id
}

const file: RightsFile = {
  prepare: (fixture, laboratory) => {
    const { studyId = '', analystId = '' } = fixture
    const alignment = addTestAlignment(laboratory, studyId, analystId)
    fixture.shareVersionId = addTestVersion(laboratory, addTestComparison(laboratory, studyId, analystId), alignment.id).id
  },
  rows: [
    { route: 'GET /api/studies/[studyId]/share-links', needs: 'share' },
    { route: 'POST /api/studies/[studyId]/share-links', needs: 'share', body: ({ shareVersionId }) => ({ versionId: shareVersionId }) },
    { route: 'DELETE /api/studies/[studyId]/share-links/[shareLinkId]', needs: 'share', before },
  ],
}
export default file
