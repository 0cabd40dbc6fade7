import type { RightsFile, RightsRow } from '../../support/rights'
import { addTestAlignment } from '../../support/testAlignment'

const base = '/api/studies/[studyId]/alignments'
const official = { from: { alignmentId: 'officialAlignmentId' } }
/** A practice run is there for the student who made it, and for nobody else. */
const practice: Pick<RightsRow, 'from' | 'except'> = {
  from: { alignmentId: 'studentAlignmentId' },
  except: { analyst: 404, scientist: 404, reviewer: 404, labLead: 404 },
}

const file: RightsFile = {
  prepare(fixture, laboratory) {
    const { studyId = '', analystId = '', studentId = '' } = fixture
    fixture.officialAlignmentId = addTestAlignment(laboratory, studyId, analystId).id
    fixture.studentAlignmentId = addTestAlignment(laboratory, studyId, studentId, { practice: true }).id
  },
  rows: [
    { route: `GET ${base}`, needs: 'readStudy' },
    // A reference that is no table of the study: who may ask for a run is told so, before one is begun.
    { route: `POST ${base}`, needs: 'editStudy', ok: 400, body: () => ({ settings: { referenceDigest: 'f'.repeat(64) } }) },
    { route: `POST ${base}`, needs: 'practise', ok: 400, body: () => ({ settings: { referenceDigest: 'f'.repeat(64) }, practice: true }) },
    { route: `GET ${base}/[alignmentId]`, needs: 'readStudy', ...official },
    { route: `GET ${base}/[alignmentId]`, needs: 'readStudy', ...practice },
    { route: `GET ${base}/[alignmentId]/matrix.csv`, needs: 'export', ...official },
    { route: `GET ${base}/[alignmentId]/matrix.csv`, needs: 'readStudy', ...practice },
  ],
}
export default file
