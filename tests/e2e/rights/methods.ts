import type { RightsFile } from '../../support/rights'

const file: RightsFile = {
  rows: [
    { route: 'GET /api/methods', needs: 'readStudy' },
    { route: 'POST /api/methods', needs: 'editStudy', ok: 400 },
  ],
}
export default file
