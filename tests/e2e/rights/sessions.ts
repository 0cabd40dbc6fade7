import type { RightsFile } from '../../support/rights'

const file: RightsFile = {
  rows: [
    { route: 'GET /api/me', needs: 'public' },
    { route: 'POST /api/sessions', needs: 'public', ok: 400 },
    { route: 'DELETE /api/sessions', needs: 'signedIn', ok: 200 },
  ],
}
export default file
