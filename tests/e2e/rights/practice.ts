import { addTestAlignment } from '../../support/testAlignment'
import { addTestComparison, addTestVersion } from '../../support/testComparison'
import type { RightsFile, RightsRow } from '../../support/rights'

/** The student's own practice, new for each request: there for nobody else. */
const before: RightsRow['before'] = (fixture, laboratory) => {
  const { studyId = '', studentId = '' } = fixture
  const alignment = addTestAlignment(laboratory, studyId, studentId, { practice: true })
  const comparison = addTestComparison(laboratory, studyId, studentId, { practice: true })
  addTestVersion(laboratory, comparison, alignment.id)
  Object.assign(fixture, { practiceAlignmentId: alignment.id, practiceComparisonId: comparison.id })
}
const practice: Pick<RightsRow, 'before' | 'needs' | 'except'> = { before, needs: 'readStudy', except: { analyst: 404, scientist: 404, reviewer: 404, labLead: 404 } }
/** Official work is refused to everyone. */
const official: Pick<RightsRow, 'needs' | 'ok'> = { needs: 'readStudy', ok: 403 }

const file: RightsFile = {
  prepare: (fixture, laboratory) => {
    const { studyId = '', analystId = '' } = fixture
    fixture.officialAlignmentId = addTestAlignment(laboratory, studyId, analystId).id
    fixture.officialComparisonId = addTestComparison(laboratory, studyId, analystId).id
  },
  rows: [
    { route: 'DELETE /api/studies/[studyId]/alignments/[alignmentId]', from: { alignmentId: 'practiceAlignmentId' }, ...practice },
    { route: 'DELETE /api/studies/[studyId]/alignments/[alignmentId]', from: { alignmentId: 'officialAlignmentId' }, ...official },
    { route: 'DELETE /api/studies/[studyId]/comparisons/[comparisonId]', from: { comparisonId: 'practiceComparisonId' }, ...practice },
    { route: 'DELETE /api/studies/[studyId]/comparisons/[comparisonId]', from: { comparisonId: 'officialComparisonId' }, ...official },
  ],
}
export default file
