import type { RightsFile } from '../../support/rights'

const file: RightsFile = {
  rows: [
    { route: 'GET /api/studies/[studyId]/samples', needs: 'readStudy' },
    { route: 'PATCH /api/studies/[studyId]/samples', needs: 'editStudy', body: () => ({ added: [] }) },
    { route: 'GET /api/studies/[studyId]/samples/csv', needs: 'export' },
  ],
}
export default file
