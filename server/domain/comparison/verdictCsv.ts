import { canExportWork } from '../../../shared/permissions'
import { settingWords } from '../../../shared/science/verdict/settingWords'
import type { Database } from '../../db/open'
import { DomainError } from '../DomainError'
import type { Person } from '../person/person'
import type { VisibleStudy } from '../study/findVisibleStudy'
import { findComparison } from './findComparison'
import { readComparison } from './readComparison'
import { versionColumns } from './readVersion'
import { versionCsv, type VerdictCsv } from './versionCsv'

/** The verdicts of a version as CSV in chunks, so that a long one does not hold up other requests. */
export function verdictCsv(db: Database, study: VisibleStudy, comparisonId: string, person: Person, number?: number): VerdictCsv {
  const comparison = findComparison(db, study.id, comparisonId, person)
  if (!canExportWork(person, comparison)) throw new DomainError('forbidden', 'Your roles do not allow exports of official work.')
  const { version, title } = readComparison(db, study.id, comparisonId, person, number)
  const packed = versionColumns(db, version.id)
  const notes = [
    `Steelyard: verdicts of “${title}”, version ${version.number}, study “${study.title}”${comparison.practice ? ', practice copy' : ''}`,
    `Side A: ${version.sideAName}. Side B: ${version.sideBName}. Ratios are B over A.`,
    `Saved ${version.createdAt} by ${version.createdByName}. Engine version ${version.engineVersion}, alignment ${version.alignmentNumber}.`,
    ...settingWords(version.settings).map(([name, value]) => `${name}: ${value}`),
    ...version.samples.flatMap(sample => sample.kind === 'sample' && sample.side ? [`Sample ${sample.name}: side ${sample.side}, preparation ${sample.preparation || sample.name}, floor ${sample.floor ?? 'not known'} (${sample.floorSource})`] : []),
    ...version.tables.map(table => `Table of ${table.sampleName}: ${table.fileName}, SHA-256 ${table.digest}`),
    ...version.traces.map(({ position, fileName, sha256 }) => `Trace of ${version.samples[position]?.name ?? 'a sample'} looked into: ${fileName}, SHA-256 ${sha256}`),
    ...version.cautions.map(caution => `Caution: ${caution}`),
    ...version.sheetChanges.map(change => `Sample sheet changed since: ${change}`),
    ...version.traceChanges.map(change => `Traces changed since: ${change}`),
  ]
  return versionCsv(version, packed, notes)
}
