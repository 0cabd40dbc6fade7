import type { RightsFile } from '../../support/rights'

const file: RightsFile = {
  rows: [
    { route: 'GET /api/studies', needs: 'readStudy' },
    { route: 'POST /api/studies', needs: 'editStudy', body: ({ methodId }) => ({ title: 'from the rights test', methodId }) },
    { route: 'GET /api/studies/[studyId]', needs: 'readStudy' },
  ],
}
export default file
