import { addComparedAlignment } from '../../support/comparedAlignment'
import { addKeptComparison } from '../../support/keptComparison'
import type { RightsFile, RightsRow } from '../../support/rights'

const columns = (whose: string) => [{ name: `${whose} A`, side: 'A' as const, intensity: [1000] }, { name: `${whose} B`, side: 'B' as const, intensity: [4000] }]

/** The student's own practice, new for each request: there for nobody else. */
const before: RightsRow['before'] = (fixture, laboratory) => {
  const { studyId = '', studentId = '' } = fixture
  const { alignment } = addComparedAlignment(laboratory, studyId, studentId, columns('own'), { practice: true })
  fixture.practiceAlignmentId = alignment.id
  fixture.practiceComparisonId = addKeptComparison(laboratory, studyId, studentId, alignment.id, { practice: true })
}
const practice: Pick<RightsRow, 'before' | 'needs' | 'except'> = { before, needs: 'readStudy', except: { analyst: 404, scientist: 404, reviewer: 404, labLead: 404 } }
/** Official work is refused to everyone. */
const official: Pick<RightsRow, 'needs' | 'ok'> = { needs: 'readStudy', ok: 403 }

const file: RightsFile = {
  prepare: (fixture, laboratory) => {
    const { studyId = '', analystId = '' } = fixture
    const { alignment } = addComparedAlignment(laboratory, studyId, analystId, columns('official'))
    fixture.officialAlignmentId = alignment.id
    fixture.officialComparisonId = addKeptComparison(laboratory, studyId, analystId, alignment.id)
  },
  rows: [
    { route: 'DELETE /api/studies/[studyId]/alignments/[alignmentId]', from: { alignmentId: 'practiceAlignmentId' }, ...practice },
    { route: 'DELETE /api/studies/[studyId]/alignments/[alignmentId]', from: { alignmentId: 'officialAlignmentId' }, ...official },
    { route: 'DELETE /api/studies/[studyId]/comparisons/[comparisonId]', from: { comparisonId: 'practiceComparisonId' }, ...practice },
    { route: 'DELETE /api/studies/[studyId]/comparisons/[comparisonId]', from: { comparisonId: 'officialComparisonId' }, ...official },
  ],
}
export default file
