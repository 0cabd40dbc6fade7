import { and, asc, desc, eq, isNull, or } from 'drizzle-orm'
import { unpackVerdicts } from '../../../shared/formats/verdictColumns'
import { VERDICTS } from '../../../shared/science/verdict/verdicts'
import { verdictPhrase } from '../../../shared/science/verdict/verdictPhrase'
import type { FlaggedFeature, JudgedFeature } from '../../../shared/types/flag'
import type { Database } from '../../db/open'
import { unpackFloat64 } from '../../db/packed'
import { alignments, comparisons, comparisonVersions, flags, people } from '../../db/schema'
import { unzip } from '../comparison/unzip'
import type { Person } from '../person/person'

/** The flagged features of a study that the person may see, oldest flag first, each with its verdict in the newest version on its alignment. */
export async function flaggedFeatures(db: Database, studyId: string, person: Person): Promise<FlaggedFeature[]> {
  const rows = db.select({
    id: flags.id, featureIndex: flags.featureIndex, kind: flags.kind, reason: flags.reason, by: people.name, at: flags.createdAt,
    alignmentId: alignments.id, alignmentNumber: alignments.number, practice: alignments.practice,
  }).from(flags)
    .innerJoin(alignments, eq(alignments.id, flags.alignmentId))
    .innerJoin(people, eq(people.id, flags.createdBy))
    .where(and(eq(flags.studyId, studyId), isNull(flags.removedAt), or(eq(alignments.practice, false), eq(alignments.createdBy, person.id))))
    .orderBy(asc(flags.createdAt), asc(flags.featureIndex)).all()
  const readers = new Map<string, FeatureReader>()
  for (const { alignmentId, practice } of rows) if (!readers.has(alignmentId)) readers.set(alignmentId, await readerOf(db, alignmentId, practice))
  return rows.map(({ at, ...row }) => ({ ...row, at: at.toISOString(), ...(readers.get(row.alignmentId) ?? unknown)(row.featureIndex) }))
}

type Read = Pick<FlaggedFeature, 'mz' | 'retentionMinutes' | 'judged'>
type FeatureReader = (index: number) => Read
const unknown: FeatureReader = () => ({ mz: Number.NaN, retentionMinutes: Number.NaN, judged: null })

/** Where a feature of the alignment stands, and what the newest version says of it: an official one of an official alignment, a practice one of a practice run. */
async function readerOf(db: Database, alignmentId: string, practice: boolean): Promise<FeatureReader> {
  const version = db.select({
    comparisonId: comparisons.id, title: comparisons.title, versionNumber: comparisonVersions.number, settings: comparisonVersions.settings,
    sideAName: comparisonVersions.sideAName, sideBName: comparisonVersions.sideBName, columns: comparisonVersions.columns,
  }).from(comparisonVersions).innerJoin(comparisons, eq(comparisons.id, comparisonVersions.comparisonId))
    .where(and(eq(comparisonVersions.alignmentId, alignmentId), isNull(comparisons.archivedAt), eq(comparisons.practice, practice)))
    .orderBy(desc(comparisonVersions.createdAt), desc(comparisonVersions.number)).limit(1).get()
  if (!version) return placeReader(db, alignmentId)
  const { columns: packed, settings, ...judgedBy } = version
  const { columns } = unpackVerdicts(await unzip(packed))
  const names = { a: judgedBy.sideAName, b: judgedBy.sideBName }
  return (i) => {
    const code = columns.verdict[i] ?? 0
    const facts = { reason: columns.reason[i] ?? 0, atLeast: columns.atLeast[i] ?? Number.NaN }
    const judged: JudgedFeature = { ...judgedBy, verdict: VERDICTS[code] ?? 'inNeither', phrase: verdictPhrase(code, settings.foldLimit, names, facts) }
    return { mz: columns.mz[i] ?? Number.NaN, retentionMinutes: columns.retentionMinutes[i] ?? Number.NaN, judged }
  }
}

function placeReader(db: Database, alignmentId: string): FeatureReader {
  const row = db.select({ mz: alignments.mz, retentionMinutes: alignments.retentionMinutes }).from(alignments).where(eq(alignments.id, alignmentId)).get()
  if (!row) return unknown
  const mz = unpackFloat64(row.mz)
  const minutes = unpackFloat64(row.retentionMinutes)
  return i => ({ mz: mz[i] ?? Number.NaN, retentionMinutes: minutes[i] ?? Number.NaN, judged: null })
}
