import { comparisonDefaults } from '../../../shared/science/verdict/settings'
import { addComparedAlignment } from '../../support/comparedAlignment'
import { addKeptComparison } from '../../support/keptComparison'
import type { RightsFile, RightsRow } from '../../support/rights'

const base = '/api/studies/[studyId]/comparisons'
const one = `${base}/[comparisonId]`
const columns = (letter: string) => [{ name: `${letter}1`, side: 'A' as const, intensity: [1000, 900] }, { name: `${letter}2`, side: 'B' as const, intensity: [1000, 4000] }]
const newVersion: RightsRow['body'] = () => ({ from: 1, settings: { ...comparisonDefaults, foldLimit: 0.5 }, useTraces: true })
const official = { from: { comparisonId: 'comparedId' } }
/** A practice copy is there for the student who made it, and for nobody else. */
const practice: Pick<RightsRow, 'from' | 'except'> = {
  from: { comparisonId: 'comparedPracticeId' },
  except: { analyst: 404, scientist: 404, reviewer: 404, labLead: 404, student: 200 },
}

const file: RightsFile = {
  prepare: (fixture, laboratory) => {
    const { studyId = '', analystId = '', studentId = '' } = fixture
    const { alignment } = addComparedAlignment(laboratory, studyId, analystId, columns('official'))
    fixture.comparedAlignmentId = alignment.id
    fixture.comparedId = addKeptComparison(laboratory, studyId, analystId, alignment.id)
    addKeptComparison(laboratory, studyId, analystId, alignment.id, { comparisonId: fixture.comparedId, settings: { reachLimit: 4 } })
    const own = addComparedAlignment(laboratory, studyId, studentId, columns('practice'), { practice: true })
    fixture.comparedPracticeId = addKeptComparison(laboratory, studyId, studentId, own.alignment.id, { practice: true })
    addKeptComparison(laboratory, studyId, studentId, own.alignment.id, { practice: true, comparisonId: fixture.comparedPracticeId, settings: { reachLimit: 4 } })
  },
  rows: [
    { route: `GET ${base}`, needs: 'readStudy' },
    { route: `POST ${base}`, needs: 'compare', ok: 202, body: ({ comparedAlignmentId }) => ({ alignmentId: comparedAlignmentId }) },
    { route: `POST ${base}`, needs: 'practise', ok: 202, body: ({ comparedAlignmentId }) => ({ alignmentId: comparedAlignmentId, practice: true }) },
    { route: `GET ${one}`, needs: 'readStudy', ...official },
    { route: `GET ${one}`, needs: 'readStudy', ...practice },
    { route: `GET ${one}/data`, needs: 'readStudy', ...official },
    { route: `GET ${one}/data`, needs: 'readStudy', ...practice },
    { route: `GET ${one}/input`, needs: 'readStudy', ...official },
    { route: `GET ${one}/input`, needs: 'readStudy', ...practice },
    { route: `GET ${one}/traces`, needs: 'readStudy', ...official },
    { route: `GET ${one}/traces`, needs: 'readStudy', ...practice },
    { route: `GET ${one}/extracted`, query: 'features=0.1', needs: 'readStudy', ...official },
    { route: `GET ${one}/extracted`, query: 'features=0.1', needs: 'readStudy', ...practice },
    { route: `GET ${one}/changes`, needs: 'readStudy', ...official },
    { route: `GET ${one}/changes`, needs: 'readStudy', ...practice },
    { route: `GET ${one}/verdicts.csv`, needs: 'export', ...official },
    { route: `GET ${one}/verdicts.csv`, needs: 'export', ...practice },
    { route: `POST ${one}/versions`, needs: 'compare', ok: 202, body: newVersion, ...official },
    { route: `POST ${one}/versions`, needs: 'practise', body: newVersion, ...practice, except: { ...practice.except, reviewer: 403, student: 202 } },
  ],
}
export default file
