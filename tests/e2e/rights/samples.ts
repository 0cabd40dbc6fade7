import type { RightsFile } from '../../support/rights'

const file: RightsFile = {
  rows: [
    { route: 'GET /api/studies/[studyId]/samples', needs: 'readStudy' },
  ],
}
export default file
