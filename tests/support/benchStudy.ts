import { mkdtempSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { openDatabase } from '../../server/db/open'
import { methods, people, personRoles, studies } from '../../server/db/schema'
import type { Role } from '../../shared/permissions'
import { addComparedAlignment } from './comparedAlignment'
import { addKeptComparison } from './keptComparison'
import { migrations } from './laboratory'
import { manyFeatures } from './manyFeatures'
import { testPasswordHash } from './signIn'

export interface BenchStudy { folder: string, studyId: string, comparisonId: string, path: string }

/**
 * A data folder with one study and a comparison of so many invented features, two versions of it, and two people who can
 * sign in with TEST_PASSWORD: analyst and student. For browser tests and measurements of the bench.
 */
export async function addBenchStudy(features: number, { perSide = 3 } = {}): Promise<BenchStudy> {
  const folder = mkdtempSync(join(tmpdir(), 'steelyard-bench-'))
  const open = await openDatabase(folder, 'lab', migrations)
  const { db } = open
  const passwordHash = await testPasswordHash()
  const person = (signInName: string, role: Role) => {
    const row = db.insert(people).values({ name: signInName, signInName, passwordHash }).returning().get()
    db.insert(personRoles).values({ personId: row.id, role }).run()
    return row
  }
  const analyst = person('analyst', 'analyst')
  person('student', 'student')
  const method = db.insert(methods).values({ name: 'RP 20 min', polarity: 'negative', divertWindows: [{ startMinutes: 0, endMinutes: 0.8 }], createdBy: analyst.id }).returning().get()
  const study = db.insert(studies).values({ title: 'Apple juices', question: 'What does the pressed juice hold that the carton lacks?', matrix: 'apple juice', sideAName: 'Millrace', sideBName: 'Tallow Lane', methodId: method.id, createdBy: analyst.id }).returning().get()
  const input = manyFeatures(features, { perSide })
  const columns = input.samples.map(({ name, kind, side, preparation, amount }, s) => ({ name, kind, side, preparation, amount, statedFloor: 2000, intensity: input.intensity[s] ?? [] }))
  const { alignment } = addComparedAlignment(open, study.id, analyst.id, columns, input)
  const comparisonId = addKeptComparison(open, study.id, analyst.id, alignment.id, { settings: { divertWindows: [{ startMinutes: 0, endMinutes: 0.8 }] } })
  addKeptComparison(open, study.id, analyst.id, alignment.id, { comparisonId, settings: { divertWindows: [{ startMinutes: 0, endMinutes: 0.8 }], reachLimit: 5 } })
  open.close()
  return { folder, studyId: study.id, comparisonId, path: `/studies/${study.id}/comparisons/${comparisonId}` }
}
