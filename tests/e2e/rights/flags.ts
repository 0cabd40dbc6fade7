import { addTestAlignment } from '../../support/testAlignment'
import type { RightsFile, RightsRow } from '../../support/rights'

const route = (method: string) => `${method} /api/studies/[studyId]/alignments/[alignmentId]/flags`
/** A practice run is there for the student who made it, and for nobody else. */
const practice: Pick<RightsRow, 'from' | 'except'> = {
  from: { alignmentId: 'flagPracticeId' },
  except: { analyst: 404, scientist: 404, reviewer: 404, labLead: 404, student: 200 },
}
const official = { from: { alignmentId: 'flagAlignmentId' } }
const flag: RightsRow['body'] = () => ({ featureIndexes: [1], kind: 'ofInterest', reason: 'Asked by the rights test.' })

const file: RightsFile = {
  prepare: (fixture, laboratory) => {
    const { studyId = '', analystId = '', studentId = '' } = fixture
    fixture.flagAlignmentId = addTestAlignment(laboratory, studyId, analystId).id
    fixture.flagPracticeId = addTestAlignment(laboratory, studyId, studentId, { practice: true }).id
  },
  rows: [
    { route: 'GET /api/studies/[studyId]/flags', needs: 'readStudy' },
    { route: route('GET'), needs: 'readStudy', ...official },
    { route: route('POST'), needs: 'flag', body: flag, ...official },
    { route: route('PATCH'), needs: 'flag', ok: 400, ...official },
    { route: route('GET'), needs: 'readStudy', ...practice },
    { route: route('POST'), needs: 'flag', body: flag, ...practice },
    { route: route('PATCH'), needs: 'flag', ...practice, except: { ...practice.except, student: 400 } },
  ],
}
export default file
