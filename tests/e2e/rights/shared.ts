import { eq } from 'drizzle-orm'
import { people } from '../../../server/db/schema'
import { createShareLink } from '../../../server/domain/share/createShareLink'
import { withdrawShareLink } from '../../../server/domain/share/withdrawShareLink'
import { newSecret } from '../../../server/domain/secret/secret'
import { addBareTrace } from '../../support/bareTrace'
import { addComparedAlignment } from '../../support/comparedAlignment'
import { addKeptComparison, versionIdOf } from '../../support/keptComparison'
import { addTestPerson } from '../../support/laboratory'
import { secretName, type GuestLink, type RightsFile } from '../../support/rights'

const DAY_MS = 86_400_000

/** Two versions on alignments of their own, and a link of each kind; `right` opens the first. */
const file: RightsFile = {
  prepare: (fixture, laboratory) => {
    const { db } = laboratory
    const { studyId = '', analystId = '' } = fixture
    const keep = (b: number, rest: Parameters<typeof addKeptComparison>[4] = {}) => {
      const { alignment, placed: [first] } = addComparedAlignment(laboratory, studyId, analystId, [{ name: `shared A ${b}`, side: 'A', intensity: [1000, 900] }, { name: `shared B ${b}`, side: 'B', intensity: [1000, b] }])
      const traces = first ? [addBareTrace(laboratory, studyId, analystId, { position: 0, sampleId: first.sampleId }, `shared A ${b}.mzML`, [1, 2, b])] : []
      return addKeptComparison(laboratory, studyId, analystId, alignment.id, { ...rest, traces })
    }
    const comparisonId = keep(4000)
    keep(90_000, { comparisonId, settings: { reachLimit: 4 } })
    const maker = addTestPerson(laboratory, 'reviewer')
    const link = (number: number, days = 30, allowExport = true, now = new Date()) =>
      createShareLink(db, studyId, { versionId: versionIdOf(laboratory, comparisonId, number), label: '', days, allowExport }, maker, now)
    const withdrawn = link(1)
    withdrawShareLink(db, studyId, withdrawn.id, maker)
    const made: Record<GuestLink, string> = {
      right: link(1).secret,
      withoutExport: link(1, 30, false).secret,
      closedMaker: link(1).secret,
      otherVersion: link(2).secret,
      wrong: newSecret(),
      ended: link(1, 1, true, new Date(Date.now() - 2 * DAY_MS)).secret,
      withdrawn: withdrawn.secret,
    }
    db.update(people).set({ closedAt: new Date() }).where(eq(people.id, maker.id)).run()
    for (const [name, secret] of Object.entries(made)) fixture[secretName(name as GuestLink)] = secret
  },
  rows: ['', '/data', '/input', '/traces', '/extracted', '/verdicts.csv'].map(part => ({
    route: `GET /api/shared/[secret]${part}`,
    needs: 'public' as const,
    from: { secret: secretName('right') },
    ...(part === '/extracted' ? { query: 'features=0.1' } : {}),
    guest: part === '/verdicts.csv' ? { withoutExport: 403 } : {},
  })),
}
export default file
