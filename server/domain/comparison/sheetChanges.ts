import { and, asc, eq, isNotNull } from 'drizzle-orm'
import type { ComparedSample } from '../../../shared/science/verdict/settings'
import type { Database } from '../../db/open'
import { alignmentTables, tables } from '../../db/schema'
import { sampleDifferences } from './sampleDifferences'
import { snapshotSamples } from './snapshotSamples'

/** What the sample sheet and the tables say otherwise now than a version's snapshot did, as sentences; empty where nothing changed. */
export function sheetChanges(db: Database, alignmentId: string, samples: readonly ComparedSample[]): string[] {
  const replaced = db.select({ name: alignmentTables.sampleName }).from(alignmentTables)
    .innerJoin(tables, eq(tables.id, alignmentTables.tableId))
    .where(and(eq(alignmentTables.alignmentId, alignmentId), isNotNull(tables.replacedAt)))
    .orderBy(asc(alignmentTables.position)).all()
  return [
    ...sampleDifferences(samples, snapshotSamples(db, alignmentId), { handSides: false }).filter(sentence => !sentence.endsWith(' is new.')),
    ...replaced.map(({ name }) => `The table of ${name} was replaced since. Align anew to use the new one.`),
  ]
}
