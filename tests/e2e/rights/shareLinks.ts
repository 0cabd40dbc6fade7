import { createShareLink } from '../../../server/domain/share/createShareLink'
import { addComparedAlignment } from '../../support/comparedAlignment'
import { addKeptComparison, versionIdOf } from '../../support/keptComparison'
import type { RightsFile, RightsRow } from '../../support/rights'

/** A link of the analyst's version, new for each request. */
const before: RightsRow['before'] = (fixture, { db }) => {
  const { studyId = '', shareVersionId = '', analystId = '' } = fixture
  fixture.shareLinkId = createShareLink(db, studyId, { versionId: shareVersionId, label: '', days: 1, allowExport: false }, { id: analystId, name: '', signInName: '', roles: [] }).id
}

const file: RightsFile = {
  prepare: (fixture, laboratory) => {
    const { studyId = '', analystId = '' } = fixture
    const { alignment } = addComparedAlignment(laboratory, studyId, analystId, [{ name: 'share A', side: 'A', intensity: [1000] }, { name: 'share B', side: 'B', intensity: [4000] }])
    fixture.shareVersionId = versionIdOf(laboratory, addKeptComparison(laboratory, studyId, analystId, alignment.id))
  },
  rows: [
    { route: 'GET /api/studies/[studyId]/share-links', needs: 'share' },
    { route: 'POST /api/studies/[studyId]/share-links', needs: 'share', body: ({ shareVersionId }) => ({ versionId: shareVersionId }) },
    { route: 'DELETE /api/studies/[studyId]/share-links/[shareLinkId]', needs: 'share', before },
  ],
}
export default file
