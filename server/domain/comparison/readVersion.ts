import { asc, eq } from 'drizzle-orm'
import type { ComparisonDetail, VersionLine } from '../../../shared/types/comparison'
import type { Database } from '../../db/open'
import { alignmentTables, comparisonVersions, tables } from '../../db/schema'
import { notFound } from '../DomainError'
import { alignedMasses } from './alignedMasses'
import type { FoundVersion } from './findComparison'
import { sheetChanges } from './sheetChanges'
import { readSamples, storeSample } from './storedSample'
import { traceChanges } from './traceChanges'

/** All of a version but its columns. Whoever calls has looked at the right to see it. */
export function versionDetail(db: Database, version: FoundVersion, line: VersionLine): ComparisonDetail['version'] {
  const { id, settings, engineVersion, cautions, alignmentId, traces } = version
  const samples = readSamples(version.samples)
  return {
    ...line, ...alignedMasses(db, alignmentId), id, settings, engineVersion, cautions, traces, samples: samples.map(storeSample), tables: versionTables(db, alignmentId),
    sheetChanges: sheetChanges(db, alignmentId, samples), traceChanges: traceChanges(db, { alignmentId, samples, traces }),
  }
}

/** The tables an alignment used, in its order. */
function versionTables(db: Database, alignmentId: string) {
  return db.select({ sampleName: alignmentTables.sampleName, fileName: tables.fileName, digest: alignmentTables.tableDigest })
    .from(alignmentTables).innerJoin(tables, eq(tables.id, alignmentTables.tableId))
    .where(eq(alignmentTables.alignmentId, alignmentId)).orderBy(asc(alignmentTables.position)).all()
}

/** The packed, gzipped columns of a version. Whoever calls has looked at the right to see it. */
export function versionColumns(db: Database, versionId: string): Buffer {
  const row = db.select({ columns: comparisonVersions.columns }).from(comparisonVersions).where(eq(comparisonVersions.id, versionId)).get()
  if (!row) throw notFound()
  return row.columns
}
