import type { RightsFile } from '../../support/rights'

// The rights test runs on a real laboratory, which has no demo.
const file: RightsFile = {
  rows: [{ route: 'GET /api/demo', needs: 'signedIn', ok: 404 }],
}
export default file
