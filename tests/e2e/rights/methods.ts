import type { RightsFile } from '../../support/rights'

const file: RightsFile = {
  rows: [
    { route: 'GET /api/methods', needs: 'readStudy' },
    { route: 'POST /api/methods', needs: 'editStudy', ok: 400 },
    { route: 'PATCH /api/methods/[methodId]', needs: 'editStudy', body: () => ({ name: 'from the rights test', polarity: 'positive' }) },
  ],
}
export default file
