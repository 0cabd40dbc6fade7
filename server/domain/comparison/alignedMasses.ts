import { eq } from 'drizzle-orm'
import type { Polarity } from '../../../shared/schemas/method'
import type { MassKind } from '../../../shared/science/table/layout'
import type { Database } from '../../db/open'
import { alignments, alignmentTables, methods, studies, tables } from '../../db/schema'
import { notFound } from '../DomainError'

/** What the masses of an alignment are: of ions of this polarity, or of neutral molecules where its tables hold those. */
export interface AlignedMasses {
  polarity: Polarity
  massKind: MassKind
  /** Mass tolerance between tables, and of traces. */
  alignMassPpm: number
}

/** Whoever calls has looked at the right to see the alignment. */
export function alignedMasses(db: Database, alignmentId: string): AlignedMasses {
  const method = db.select({ polarity: methods.polarity, settings: alignments.settings }).from(alignments)
    .innerJoin(studies, eq(studies.id, alignments.studyId)).innerJoin(methods, eq(methods.id, studies.methodId))
    .where(eq(alignments.id, alignmentId)).get()
  if (!method) throw notFound()
  // One alignment never mixes the two kinds, so that any table tells.
  const table = db.select({ massKind: tables.massKind }).from(alignmentTables).innerJoin(tables, eq(tables.id, alignmentTables.tableId))
    .where(eq(alignmentTables.alignmentId, alignmentId)).limit(1).get()
  return { polarity: method.polarity, massKind: table?.massKind ?? 'mz', alignMassPpm: method.settings.alignMassPpm }
}
